import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { DEFAULT_MATCHING_SETTINGS } from '../shared/matching/matching-contract';
import type { Forecast, RuleEffects } from '../shared/matching/effects-contract';
import { verify } from '../shared/assignment';
import { unpackPlan } from '../shared/matching/stored-plan';
import type {
  Alternatives,
  DecisionPrice,
  PairReasons,
  Plan,
  PlanComparison,
  ProofArrays,
  PublishReview,
  RunLine,
  RunList,
} from '../shared/matching/runs-contract';
import type { ProblemDetails } from '../shared/problems/problems';
import { workRun } from '../src/server/matching';
import { makeApplicant, makeCycle, makeVocabulary, systemContext, type Applicant } from './support/build-cycle';
import { startTestApp, type TestApp } from './support/test-app';
import type { TestClient } from './support/test-client';

let app: TestApp;
let areas: { gis: string; hydrographic: string };
let coordinator: TestClient;

beforeAll(async () => {
  app = await startTestApp();
  areas = await makeVocabulary(app);
  coordinator = await app.client('coordinator');
});
afterAll(() => app.stop());

interface Cast {
  cycleId: string;
  mentees: Applicant[];
  mentors: Applicant[];
}

let counter = 0;

/** Three mentees of one area for two places of it: one too few; and one mentee of another area with a mentor of their own. */
async function castOf(phase: 'matching' | 'applications-closed' = 'matching'): Promise<Cast> {
  counter++;
  const cycleId = await makeCycle(app, phase, { name: `Cycle ${counter}` });
  const mentee = (name: string, area: string) => makeApplicant(app, cycleId, { name, area, side: 'mentee' });
  const mentor = (name: string, area: string, places = 1) =>
    makeApplicant(app, cycleId, { name, area, places, side: 'mentor' });
  return {
    cycleId,
    mentees: [
      await mentee(`Ada ${counter}`, areas.hydrographic),
      await mentee(`Bo ${counter}`, areas.hydrographic),
      await mentee(`Cy ${counter}`, areas.hydrographic),
      await mentee(`Di ${counter}`, areas.gis),
    ],
    mentors: [await mentor(`Mo ${counter}`, areas.hydrographic, 2), await mentor(`No ${counter}`, areas.gis)],
  };
}

async function finished(cycleId: string, settings: unknown = null): Promise<RunLine> {
  const started = await coordinator.post<RunLine>(`/api/matching/cycles/${cycleId}/runs`, { settings });
  expect(started.status).toBe(202);
  await workRun(systemContext(app), started.body.id);
  return (await coordinator.get<RunLine>(`/api/matching/runs/${started.body.id}`)).body;
}

const planOf = async (runId: string): Promise<Plan> =>
  (await coordinator.get<Plan>(`/api/matching/runs/${runId}/plan`)).body;

describe('runs', () => {
  it('are refused before applications are closed, and without applicants, each with a sentence', async () => {
    const early = await makeCycle(app, 'open', { name: 'Early' });
    const refused = await coordinator.post<ProblemDetails>(`/api/matching/cycles/${early}/runs`, {});
    expect([refused.status, refused.body.title]).toEqual([409, 'Runs start once applications are closed']);
    const empty = await makeCycle(app, 'matching', { name: 'Empty' });
    const nobody = await coordinator.post<ProblemDetails>(`/api/matching/cycles/${empty}/runs`, {});
    expect([nobody.status, nobody.body.title]).toEqual([422, 'There is no admitted mentee who waits for a mentor']);
    await makeApplicant(app, empty, { name: 'Alone', area: areas.gis, side: 'mentee' });
    const noMentor = await coordinator.post<ProblemDetails>(`/api/matching/cycles/${empty}/runs`, {});
    expect([noMentor.status, noMentor.body.title]).toEqual([422, 'There is no admitted mentor with a place left']);
  });

  it('find a proven plan with its shortage, and equal input gives the equal plan', async () => {
    const { cycleId, mentees } = await castOf();
    const run = await finished(cycleId);
    expect(run).toMatchObject({ state: 'succeeded', paired: 3, leftOut: 1, number: 1 });
    const plan = await planOf(run.id);
    expect(plan.report.proof.ok).toBe(true);
    expect(plan.report.shortages).toHaveLength(1);
    expect(plan.report.shortages[0]).toMatchObject({ places: 2, short: 1 });
    expect(plan.report.shortages[0]!.mentees.sort()).toEqual(
      mentees
        .slice(0, 3)
        .map((mentee) => mentee.applicationId)
        .sort(),
    );
    expect(plan.report.shortages[0]!.remedies.map((remedy) => [remedy.kind, remedy.gain])).toContainEqual([
      'more-places',
      1,
    ]);
    expect(plan.report.tradeOff.at(-1)!.pairs).toBe(3);
    expect(plan.changedSince).toEqual([]);
    const again = await planOf((await finished(cycleId)).id);
    expect(again.pairings.map(({ stays, ...rest }) => [rest, stays])).toEqual(
      plan.pairings.map(({ stays, ...rest }) => [rest, stays]),
    );
    expect(again.report.record.inputHash).toBe(plan.report.record.inputHash);
  });

  it('run one at a time in a cycle, can be stopped, and stay in the list', async () => {
    const { cycleId } = await castOf();
    const first = await coordinator.post<RunLine>(`/api/matching/cycles/${cycleId}/runs`, {});
    const second = await coordinator.post<ProblemDetails>(`/api/matching/cycles/${cycleId}/runs`, {});
    expect([second.status, second.body.code]).toEqual([409, 'conflict']);
    const stopped = await coordinator.post<RunLine>(`/api/matching/runs/${first.body.id}/cancel`, {});
    expect(stopped.body.state).toBe('cancelled');
    await workRun(systemContext(app), first.body.id);
    const { body } = await coordinator.get<RunList>(`/api/matching/cycles/${cycleId}/runs`);
    expect(body.runs.map((run) => run.state)).toEqual(['cancelled']);
  });

  it('can be checked by anybody with the same arrays', async () => {
    const { cycleId } = await castOf();
    const run = await finished(cycleId);
    const { body } = await coordinator.get<ProofArrays>(`/api/matching/runs/${run.id}/proof`);
    const problem = {
      menteeCount: body.problem.menteeCount,
      mentorCount: body.problem.mentorCount,
      capacity: Int32Array.from(body.problem.capacity),
      rowStart: Int32Array.from(body.problem.rowStart),
      target: Int32Array.from(body.problem.target),
      fit: Int32Array.from(body.problem.fit),
      loadCharge: Int32Array.from(body.problem.loadCharge!),
      placesTaken: Int32Array.from(body.problem.placesTaken!),
    };
    expect(verify(problem, unpackPlan(body.plan), body.options)).toEqual({ ok: true, faults: [] });
    const wrong = { ...body.plan, paired: body.plan.paired + 1 };
    expect(verify(problem, unpackPlan(wrong), body.options).ok).toBe(false);
  });
});

describe('questions about a plan', () => {
  it('are answered with prices and reasons', async () => {
    const { cycleId, mentees, mentors } = await castOf();
    const run = await finished(cycleId);
    const left = (await planOf(run.id)).report.leftOut[0]!;
    const { body } = await coordinator.get<Alternatives>(`/api/matching/runs/${run.id}/mentees/${left}/alternatives`);
    expect(body.current).toBeNull();
    expect(body.options).toEqual([expect.objectContaining({ mentor: mentors[0]!.applicationId, pairsLost: 0 })]);
    const reasons = await coordinator.get<PairReasons>(
      `/api/matching/runs/${run.id}/pairs/${mentees[3]!.applicationId}/${mentors[0]!.applicationId}`,
    );
    expect(reasons.body.eligible).toBe(false);
    expect(reasons.body.reasons.map((reason) => reason.rule)).toEqual(['practice-areas']);
    const price = await coordinator.get<DecisionPrice>(
      `/api/matching/runs/${run.id}/pairs/${mentees[3]!.applicationId}/${mentors[1]!.applicationId}/price?kind=bar`,
    );
    expect(price.body).toMatchObject({ pairsLost: 1, refusal: null });
  });

  it('show the effect of rules before a run', async () => {
    const { cycleId } = await castOf('applications-closed');
    const { body } = await coordinator.post<RuleEffects>(`/api/matching/cycles/${cycleId}/effects`, {
      settings: DEFAULT_MATCHING_SETTINGS,
    });
    expect(body).toMatchObject({ mentees: 4, mentors: 2, places: 3, eligiblePairs: 4, pairable: 3 });
    const zero = {
      ...DEFAULT_MATCHING_SETTINGS,
      criteria: DEFAULT_MATCHING_SETTINGS.criteria.map((each) => ({ ...each, weight: 0 })),
    };
    const refused = await coordinator.post<ProblemDetails>(`/api/matching/cycles/${cycleId}/effects`, {
      settings: zero,
    });
    expect(refused.status).toBe(400);
    expect(refused.body.fields![0]!.message).toBe('Give at least one criterion a weight');
  });
});

describe('the forecast', () => {
  it('says where places would be short while applications are open', async () => {
    const { cycleId } = await castOf('applications-closed');
    const { body } = await coordinator.get<Forecast>(`/api/matching/cycles/${cycleId}/forecast`);
    expect(body).toMatchObject({ mentees: 4, places: 3, pairable: 3 });
    expect(body.shortages).toEqual([{ inCommon: 'Hydrographic', mentees: 3, mentors: 1, places: 2, short: 1 }]);
    expect(body.areas).toContainEqual({ label: 'Hydrographic', seekers: 3, places: 2 });
  });
});

describe('locks and bars', () => {
  it('are kept by the next run and compared with the one before', async () => {
    const { cycleId, mentors } = await castOf();
    const before = await finished(cycleId);
    const left = (await planOf(before.id)).report.leftOut[0]!;
    const locked = await coordinator.put(`/api/matching/cycles/${cycleId}/decisions`, {
      mentee: left,
      mentor: mentors[0]!.applicationId,
      kind: 'lock',
      note: 'agreed at the conference',
    });
    expect(locked.status).toBe(200);
    expect((await planOf(before.id)).changedSince.map((change) => change.text)).toEqual(['Locks or bars changed']);
    const after = await finished(cycleId);
    const plan = await planOf(after.id);
    expect(plan.pairings.find((pairing) => pairing.mentee === left)).toMatchObject({ locked: true });
    const { body } = await coordinator.get<PlanComparison>(`/api/matching/runs/${after.id}/compare/${before.id}`);
    expect(body.changed.map((row) => row.mentee)).toContain(left);
  });

  it('are refused with reasons where rules forbid, and kept with a note where they may be', async () => {
    const { cycleId, mentees, mentors } = await castOf();
    const pair = { mentee: mentees[3]!.applicationId, mentor: mentors[0]!.applicationId, kind: 'lock' };
    const put = (form: object) => coordinator.put<ProblemDetails>(`/api/matching/cycles/${cycleId}/decisions`, form);
    const refused = await put(pair);
    expect([refused.status, refused.body.title]).toEqual([409, 'The rules exclude this pairing']);
    expect(refused.body.detail).toContain('practice areas');
    const noNote = await put({ ...pair, overridesRules: true });
    expect([noNote.status, noNote.body.fields?.[0]?.field]).toEqual([400, 'note']);
    expect((await put({ ...pair, overridesRules: true, note: 'she changes to hydrography' })).status).toBe(200);
    const plan = await planOf((await finished(cycleId)).id);
    expect(plan.pairings.find((pairing) => pairing.mentee === pair.mentee)?.mentor).toBe(pair.mentor);
  });

  it('cannot take more places than a mentor has, nor lock one mentee twice', async () => {
    const { cycleId, mentees, mentors } = await castOf();
    const lock = (mentee: number, mentor: number) =>
      coordinator.put<ProblemDetails>(`/api/matching/cycles/${cycleId}/decisions`, {
        mentee: mentees[mentee]!.applicationId,
        mentor: mentors[mentor]!.applicationId,
        kind: 'lock',
        note: 'wished for',
        overridesRules: true,
      });
    expect((await lock(0, 0)).status).toBe(200);
    expect((await lock(1, 0)).status).toBe(200);
    expect((await lock(2, 0)).body.title).toBe('All places of this mentor are locked or taken already');
    expect((await lock(0, 1)).body.title).toBe(
      'This mentee is locked to another mentor already; release that lock first',
    );
  });
});

describe('publishing', () => {
  it('sends proposals, messages and audit rows together, once', async () => {
    const { cycleId } = await castOf();
    const run = await finished(cycleId);
    const { body: review } = await coordinator.get<PublishReview>(`/api/matching/runs/${run.id}/review`);
    expect(review).toMatchObject({ round: 1, proposals: 3, messages: 7, refusal: null });
    const publish = () =>
      coordinator.post(`/api/matching/runs/${run.id}/publish`, {}, { 'if-match': `"${review.version}"` });
    const [first, second] = await Promise.all([publish(), publish()]);
    expect([first.status, second.status]).toEqual([200, 200]);
    const rows = await app.rows<{ proposals: string; messages: string; audit: string }>(
      `select (select count(*) from pairings where cycle_id = $1) proposals,
              (select count(*) from messages where template like 'pairings/%' and data->>'cycleName' = $2) messages,
              (select count(*) from audit_entries where action = 'pairings.propose' and cycle_id = $1) audit`,
      [cycleId, `Cycle ${counter}`],
    );
    expect(rows[0]).toEqual({ proposals: '3', messages: '7', audit: '3' });
    const plan = await planOf(run.id);
    expect(plan.run.publishedAsRound).toBe(1);
    expect(plan.mayPublish).toBe(false);
  });

  it('is refused when an applicant has withdrawn, who is named', async () => {
    const { cycleId, mentees } = await castOf();
    const run = await finished(cycleId);
    await app.rows(`update applications set status = 'withdrawn', withdrawn_at = now() where id = $1`, [
      mentees[3]!.applicationId,
    ]);
    const { body: review } = await coordinator.get<PublishReview>(`/api/matching/runs/${run.id}/review`);
    expect(review.refusal).toContain(`${mentees[3]!.name} has withdrawn`);
    const refused = await coordinator.post<ProblemDetails>(
      `/api/matching/runs/${run.id}/publish`,
      { acknowledgedChanges: true },
      { 'if-match': `"${review.version}"` },
    );
    expect(refused.status).toBe(409);
    expect(refused.body.detail).toContain(`${mentees[3]!.name} has withdrawn`);
  });

  it('wants other differences acknowledged, and the cycle as it was on the screen', async () => {
    const { cycleId } = await castOf();
    const run = await finished(cycleId);
    await makeApplicant(app, cycleId, { name: 'Late', area: areas.gis, side: 'mentee' });
    const { body: review } = await coordinator.get<PublishReview>(`/api/matching/runs/${run.id}/review`);
    expect(review.changedSince).toEqual([{ text: 'Late was admitted since', blocks: false }]);
    const publish = (body: object, version: number) =>
      coordinator.post<ProblemDetails>(`/api/matching/runs/${run.id}/publish`, body, { 'if-match': `"${version}"` });
    expect((await publish({}, review.version)).status).toBe(409);
    expect((await publish({ acknowledgedChanges: true }, review.version + 1)).status).toBe(412);
    expect((await publish({ acknowledgedChanges: true }, review.version)).status).toBe(200);
  });

  it('waits for a second coordinator where the cycle asks for one', async () => {
    const { cycleId } = await castOf();
    await app.rows('update cycles set needs_approval = true where id = $1', [cycleId]);
    const run = await finished(cycleId);
    const { body: review } = await coordinator.get<PublishReview>(`/api/matching/runs/${run.id}/review`);
    expect(review.refusal).toContain('second coordinator');
    const publish = () =>
      coordinator.post<ProblemDetails>(
        `/api/matching/runs/${run.id}/publish`,
        {},
        { 'if-match': `"${review.version}"` },
      );
    expect((await publish()).status).toBe(409);
    const own = await coordinator.post<ProblemDetails>(`/api/matching/runs/${run.id}/approve`, {});
    expect(own.body.title).toBe('You started this run; another coordinator approves its plan');
    const second = await app.client('coordinator');
    expect((await second.post<PublishReview>(`/api/matching/runs/${run.id}/approve`, {})).body.approval.by).toBe(
      'Test Person',
    );
    const bySecond = await second.post<ProblemDetails>(
      `/api/matching/runs/${run.id}/publish`,
      {},
      { 'if-match': `"${review.version}"` },
    );
    expect(bySecond.body.title).toBe('You approved this plan; another coordinator publishes it');
    expect((await publish()).status).toBe(200);
  });
});
