import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type { Cycle, CycleList, CycleSettings, CycleToApply, SettingsHistory } from '../shared/cycles/cycles-contract';
import { DEFAULT_MATCHING_SETTINGS } from '../shared/matching/matching-contract';
import type { ProblemDetails } from '../shared/problems/problems';
import { cycleDraft, dayFrom, makeApplicant, makeCycle, makeVocabulary } from './support/build-cycle';
import { publishedCycle } from './support/publish-cycle';
import { startTestApp, type TestApp } from './support/test-app';
import type { TestClient } from './support/test-client';

let app: TestApp;
let areas: { gis: string; hydrographic: string };
let coordinator: TestClient;
let visitor: TestClient;

beforeAll(async () => {
  app = await startTestApp();
  areas = await makeVocabulary(app);
  coordinator = await app.client('coordinator');
  visitor = await app.visitor();
});
afterAll(() => app.stop());

let counter = 0;
const named = (change: object = {}) => ({ ...cycleDraft({ name: `Cycle no. ${++counter}` }), ...change });
const made = async (change: object = {}): Promise<Cycle> =>
  (await coordinator.post<Cycle>('/api/cycles', named(change))).body;
const move = <T = Cycle>(id: string, to: string, reason = '') =>
  coordinator.post<T>(`/api/cycles/${id}/phase`, { to, reason });

describe('making and changing cycles', () => {
  it('starts with a draft that only coordinators see', async () => {
    const answer = await coordinator.post<Cycle>('/api/cycles', named());
    expect(answer.status).toBe(201);
    expect(answer.body).toMatchObject({ phase: 'draft', next: 'open', previous: null, consentVersion: 1 });
    const ids = async (client: TestClient) =>
      (await client.get<CycleList>('/api/cycles')).body.cycles.map((cycle) => cycle.id);
    expect(await ids(coordinator)).toContain(answer.body.id);
    expect(await ids(visitor)).not.toContain(answer.body.id);
    expect((await visitor.get(`/api/cycles/${answer.body.id}/summary`)).status).toBe(404);
  });

  it('says at each field what is wrong, and refuses a name twice', async () => {
    const wrong = await coordinator.post<ProblemDetails>(
      '/api/cycles',
      named({ name: 'x', answersDueOn: dayFrom(-40) }),
    );
    expect(wrong.status).toBe(400);
    expect(wrong.body.fields!.map((fault) => fault.field)).toContain('name');
    const order = await coordinator.post<ProblemDetails>('/api/cycles', named({ answersDueOn: dayFrom(-40) }));
    expect(order.body.fields!.map((fault) => fault.field)).toEqual(['answersDueOn']);
    const { name } = await made();
    const twice = await coordinator.post<ProblemDetails>('/api/cycles', named({ name }));
    expect(twice.body.fields).toEqual([{ field: 'name', message: 'Another cycle has this name' }]);
  });

  it('takes rules and criteria of an earlier cycle', async () => {
    const first = await made();
    const settings = { ...DEFAULT_MATCHING_SETTINGS, leftOutBonus: 900 };
    await coordinator.putVersion(`/api/cycles/${first.id}/settings`, settings, 1);
    const second = await made({ copyFrom: first.id });
    const { body } = await coordinator.get<CycleSettings>(`/api/cycles/${second.id}/settings`);
    expect(body.settings.leftOutBonus).toBe(900);
  });

  it('refuses a stale form, with the other version at hand; a changed consent text is a new version', async () => {
    const cycle = await made();
    await move(cycle.id, 'open');
    const { body: open } = await coordinator.get<Cycle>(`/api/cycles/${cycle.id}`);
    const draft = { ...named({ name: cycle.name }), consentText: 'I agree to the new text of the association.' };
    const saved = await coordinator.putVersion<Cycle>(`/api/cycles/${cycle.id}`, draft, open.version);
    expect(saved.body).toMatchObject({ consentVersion: 2, version: open.version + 1 });
    const stale = await coordinator.putVersion<ProblemDetails>(`/api/cycles/${cycle.id}`, draft, open.version);
    expect(stale.status).toBe(412);
    expect(stale.body.current).toMatchObject({ version: open.version + 1, consentText: draft.consentText });
    const summary = await visitor.get<CycleToApply>(`/api/cycles/${cycle.id}/summary`);
    expect(summary.body).toMatchObject({ consentText: draft.consentText, consentVersion: 2 });
  });
});

describe('moving a cycle', () => {
  it('goes on step by step, and stops where something is missing', async () => {
    const { id } = await made();
    expect((await move<ProblemDetails>(id, 'matching')).status).toBe(409);
    expect((await move(id, 'open')).body.phase).toBe('open');
    expect((await move(id, 'applications-closed')).body.phase).toBe('applications-closed');
    const missing = await move<ProblemDetails>(id, 'matching');
    expect(missing.status).toBe(409);
    expect(missing.body.detail).toBe('At least one admitted mentee. At least one admitted mentor with a place');
    await makeApplicant(app, id, { name: 'Eli', side: 'mentee', area: areas.gis });
    await makeApplicant(app, id, { name: 'Ruo', side: 'mentor', area: areas.gis });
    expect((await move(id, 'matching')).body.phase).toBe('matching');
    const byHand = await move<ProblemDetails>(id, 'responses');
    expect(byHand.body.title).toBe('Responses open when a plan is published');
  });

  it('goes back with a reason, and never once a plan is published', async () => {
    const { id } = await made();
    await move(id, 'open');
    const bare = await move<ProblemDetails>(id, 'draft');
    expect(bare.body.fields).toEqual([{ field: 'reason', message: expect.stringContaining('audit') }]);
    expect((await move(id, 'draft', 'Dates were wrong')).body.phase).toBe('draft');
    const [audit] = await app.rows<{ note: string }>(
      `select note from audit_entries where cycle_id = $1 and action = 'cycles.move-back'`,
      [id],
    );
    expect(audit!.note).toBe('Dates were wrong');
    const { cycleId } = await publishedCycle(app, areas);
    expect((await move<ProblemDetails>(cycleId, 'matching', 'once more')).status).toBe(409);
  });

  it('is cancelled with a message to everybody who applied; open proposals end, and it stays as it is', async () => {
    const { cycleId, mentees, mentors } = await publishedCycle(app, areas);
    expect((await move<ProblemDetails>(cycleId, 'cancelled')).status).toBe(400);
    expect((await move(cycleId, 'cancelled', 'Too few rooms')).body.phase).toBe('cancelled');
    const told = await app.rows<{ address: string }>(
      `select address from messages where template = 'cycles/cancelled' and cause = $1`,
      [`cycle-cancelled:${cycleId}`],
    );
    expect(told.map((row) => row.address).sort()).toEqual(
      [...mentees, ...mentors].map((person) => person.email).sort(),
    );
    const states = await app.rows<{ state: string }>('select distinct state from pairings where cycle_id = $1', [
      cycleId,
    ]);
    expect(states).toEqual([{ state: 'withdrawn' }]);
    const edit = await coordinator.putVersion<ProblemDetails>(`/api/cycles/${cycleId}`, named(), 99);
    expect([409, 412]).toContain(edit.status);
    expect((await move<ProblemDetails>(cycleId, 'open')).status).toBe(409);
  });
});

describe('rules and criteria', () => {
  it('are saved as versions; a colleague’s save is not overwritten unseen', async () => {
    const id = await makeCycle(app, 'open', { name: `Cycle no. ${++counter}` });
    const url = `/api/cycles/${id}/settings`;
    const first = { ...DEFAULT_MATCHING_SETTINGS, seed: 7 };
    expect((await coordinator.putVersion<CycleSettings>(url, first, 1)).body.version).toBe(2);
    const stale = await coordinator.putVersion<ProblemDetails>(url, { ...first, seed: 8 }, 1);
    expect(stale.status).toBe(412);
    expect(stale.body.current).toMatchObject({ version: 2, settings: { seed: 7 } });
    expect((await coordinator.put(url, first)).status).toBe(428);
    const { body } = await coordinator.get<SettingsHistory>(`${url}/history`);
    expect(body.versions.map((version) => [version.version, version.settings.seed])).toEqual([
      [2, 7],
      [1, 1],
    ]);
  });

  it('stay as they are once the cycle is closing', async () => {
    const id = await makeCycle(app, 'closing', { name: `Cycle no. ${++counter}` });
    const refused = await coordinator.putVersion<ProblemDetails>(
      `/api/cycles/${id}/settings`,
      DEFAULT_MATCHING_SETTINGS,
      1,
    );
    expect(refused.status).toBe(409);
  });
});
