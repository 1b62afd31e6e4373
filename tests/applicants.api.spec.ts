import { randomUUID } from 'node:crypto';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type { AdmissionOutcome, ApplicantDetail, ApplicantsPage } from '../shared/applications/applications-contract';
import {
  apply,
  APPLY,
  giveVocabulary,
  makeCycle,
  member,
  mine,
  MENTOR,
  propose,
  setPhase,
} from './support/application-cycles';
import { startTestApp, type TestApp } from './support/test-app';
import type { TestClient } from './support/test-client';

let app: TestApp;
let tagId: string;
beforeAll(async () => {
  app = await startTestApp();
  tagId = (await giveVocabulary(app)).get('GIS and data') ?? '';
});
afterAll(() => app.stop());

const applicants = (client: TestClient, cycleId: string, query = '') =>
  client.get<ApplicantsPage>(`/api/applications/cycles/${cycleId}/applicants${query}`);
const decide = <T = AdmissionOutcome>(client: TestClient, cycleId: string, status: string, applicationIds: string[]) =>
  client.post<T>(`/api/applications/cycles/${cycleId}/decisions`, { status, applicationIds });
describe('the coordinators’ table', () => {
  it('is refused to members and visitors', async () => {
    const cycleId = await makeCycle(app);
    const client = await member(app);
    for (const path of ['applicants', 'applicants.csv', `applicants/${randomUUID()}`])
      expect((await client.get(mine(cycleId, path))).status).toBe(403);
    for (const path of ['decisions', 'import', 'import/preview'])
      expect((await client.post(mine(cycleId, path), {})).status).toBe(403);
    expect((await (await app.visitor()).get(mine(cycleId, 'applicants'))).status).toBe(401);
    expect((await (await app.client('organiser')).get(mine(cycleId, 'applicants'))).status).toBe(403);
  });

  it('searches, filters, sorts and pages', async () => {
    const cycleId = await makeCycle(app);
    const coordinator = await app.client('coordinator');
    for (const name of ['Åsa Berg_holm', 'Ben Carr', 'Cleo Dunn'])
      await apply(await member(app, { name, ...(name === 'Ben Carr' ? {} : { tagId }) }), cycleId);
    const both = await member(app, { name: 'Dai Ellis', tagId });
    await apply(both, cycleId);
    await apply(both, cycleId, MENTOR);

    const all = (await applicants(coordinator, cycleId, '?sort=name&pageSize=10')).body;
    expect(all.total).toBe(5);
    const ben = all.applicants.find((line) => line.name === 'Ben Carr');
    expect(ben).toMatchObject({
      completeness: 0,
      flags: ['Profile lacks what matching needs', 'Employer unknown'],
      practiceAreas: [],
    });
    const dai = all.applicants.filter((line) => line.name === 'Dai Ellis');
    expect(dai.map((line) => line.flags)).toEqual([['Applies on both sides'], ['Applies on both sides']]);
    expect(dai[0]).toMatchObject({ completeness: 64, practiceAreas: ['GIS and data'] });

    const names = async (query: string) =>
      (await applicants(coordinator, cycleId, query)).body.applicants.map((line) => line.name);
    expect(await names('?search=berg_')).toEqual(['Åsa Berg_holm']);
    expect(await names('?search=%25')).toEqual([]);
    expect(await names('?side=mentor')).toEqual(['Dai Ellis']);
    expect(await names(`?tag=${tagId}&side=mentee&sort=name&direction=desc`)).not.toContain('Ben Carr');
    expect(await names('?flagged=yes&side=mentee&sort=completeness')).toEqual(['Ben Carr', 'Dai Ellis']);
    expect(await names('?region=islands')).toEqual([]);
    expect((await applicants(coordinator, cycleId, '?sort=secret')).status).toBe(400);
    expect((await applicants(coordinator, randomUUID())).status).toBe(404);
  });

  it('shows one application whole, and writes the look down', async () => {
    const cycleId = await makeCycle(app);
    const coordinator = await app.client('coordinator');
    const client = await member(app, { tagId });
    const { id } = (await apply(client, cycleId)).body;
    await app.rows(`update profiles set adjustments = 'Large print' where person_id = $1`, [client.person.id]);
    await app.rows('insert into profile_exclusions values ($1, $2)', [client.person.id, coordinator.person.id]);
    const detail = await coordinator.get<ApplicantDetail>(mine(cycleId, `applicants/${id}`));
    expect(detail.body).toMatchObject({ goals: APPLY.goals, seeks: ['GIS and data'] });
    // A coordinator who is named there is not told.
    expect(detail.body.profile.private).toMatchObject({ adjustments: 'Large print', exclusions: [] });
    const audit = await app.rows<{ actor_id: string }>(
      `select actor_id from audit_entries where action = 'applications.view-private' and subject_id = $1`,
      [id],
    );
    expect(audit).toEqual([{ actor_id: coordinator.person.id }]);
    expect((await coordinator.get(mine(await makeCycle(app), `applicants/${id}`))).status).toBe(404);
  });

  it('changes what can be changed, says what cannot, and can be undone', async () => {
    const cycleId = await makeCycle(app, { autoAdmit: false });
    const coordinator = await app.client('coordinator');
    const [one, two, gone] = [await member(app, { tagId }), await member(app, { tagId }), await member(app, { tagId })];
    const ids = [];
    for (const client of [one, two, gone]) ids.push((await apply(client, cycleId)).body.id);
    const [first = '', second = '', third = ''] = ids;
    await gone.post(`/api/applications/${third}/withdraw`);
    const stranger = randomUUID();
    const admitted = await decide(coordinator, cycleId, 'admitted', [...ids, stranger, first]);
    expect(admitted.body.changed.map((each) => [each.id, each.from, each.to]).sort()).toEqual(
      [first, second].map((id) => [id, 'submitted', 'admitted']).sort(),
    );
    expect(admitted.body.refused.map((each) => each.id).sort()).toEqual([third, stranger].sort());
    const undone = await decide(coordinator, cycleId, 'submitted', [first, second]);
    expect(undone.body.changed).toHaveLength(2);
    const withdrawn = await decide(coordinator, cycleId, 'withdrawn', [first]);
    expect(withdrawn.body.changed).toHaveLength(1);
    const told = await app.rows<{ data: { byCoordinator: boolean } }>(
      "select data from messages where template = 'applications/withdrawn' and address = $1",
      [one.person.email],
    );
    expect(told.map((row) => row.data.byCoordinator)).toEqual([true]);
    expect((await decide(coordinator, cycleId, 'admitted', [first])).body.changed).toHaveLength(1);
    const audit = await app.rows<{ note: string }>(
      `select note from audit_entries where action = 'applications.decide' and subject_id = $1 order by id`,
      [first],
    );
    expect(audit.map((row) => row.note)).toEqual([
      'submitted → admitted',
      'admitted → submitted',
      'submitted → withdrawn',
      'withdrawn → admitted',
    ]);
    await setPhase(app, cycleId, 'closed');
    expect((await decide(coordinator, cycleId, 'submitted', [first])).status).toBe(409);
  });

  it('refuses decisions that pairings stand against', async () => {
    const cycleId = await makeCycle(app);
    const coordinator = await app.client('coordinator');
    const mentor = await apply(await member(app, { tagId }), cycleId, MENTOR);
    const [waits, meets] = [
      await apply(await member(app, { tagId }), cycleId),
      await apply(await member(app, { tagId }), cycleId),
    ];
    await propose(app, cycleId, waits.body.id, mentor.body.id);
    await propose(app, cycleId, meets.body.id, mentor.body.id, 'under-way');
    const ids = [waits.body.id, meets.body.id];
    expect((await decide(coordinator, cycleId, 'waiting-list', ids)).body.changed).toEqual([]);
    const withdrawn = await decide(coordinator, cycleId, 'withdrawn', ids);
    expect(withdrawn.body.changed.map((each) => each.id)).toEqual([waits.body.id]);
    expect(withdrawn.body.refused).toMatchObject([
      { id: meets.body.id, reason: expect.stringContaining('pair') as string },
    ]);
  });

  it('exports the same filter as a file that no spreadsheet runs', async () => {
    const cycleId = await makeCycle(app, { name: 'Øst 2027' });
    const coordinator = await app.client('coordinator');
    const client = await member(app, { tagId, name: '=HYPERLINK("http://x.example")' });
    await apply(client, cycleId, { ...APPLY, goals: '@sum of "all", lines;\nand more of them' });
    await apply(await member(app, { tagId }), cycleId, MENTOR);
    const file = await coordinator.get<string>(mine(cycleId, 'applicants.csv?side=mentee'));
    expect(file.headers.get('content-type')).toContain('text/csv');
    expect(file.headers.get('content-disposition')).toContain("filename*=UTF-8''%C3%98st%202027%20applicants.csv");
    const lines = file.text.replace(/^\uFEFF/, '').split('\r\n');
    expect(lines[1]).toMatch(/^"'=HYPERLINK\(""http:\/\/x\.example""\)",/);
    expect(lines[1]).toContain(`"'@sum of ""all"", lines;\nand more of them"`);
    expect(lines).toHaveLength(3);
  });
});
