import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type {
  ApplicationDesk,
  ListedMentors,
  OwnApplication,
  OwnApplications,
} from '../shared/applications/applications-contract';
import type { ProblemDetails } from '../shared/problems/problems';
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

let app: TestApp;
let tagId: string;
beforeAll(async () => {
  app = await startTestApp();
  tagId = (await giveVocabulary(app)).get('GIS and data') ?? '';
});
afterAll(() => app.stop());

const sentTo = (email: string) =>
  app.rows<{ template: string; data: Record<string, unknown> }>(
    'select template, data from messages where address = $1 order by created_at',
    [email],
  );

describe('applying', () => {
  it('admits a complete application on time and tells the applicant once', async () => {
    const cycleId = await makeCycle(app);
    const client = await member(app, { tagId });
    const desk = await client.get<ApplicationDesk>(mine(cycleId, 'mine'));
    expect(desk.body).toMatchObject({ takesApplications: true, late: false, consentVersion: 1, applications: [] });
    const answer = await apply(client, cycleId);
    expect(answer.body).toMatchObject({ status: 'admitted', late: false, version: 1, side: 'mentee' });
    expect(await sentTo(client.person.email)).toMatchObject([
      {
        template: 'applications/received',
        data: {
          isMentor: false,
          waitingList: false,
          closesOn: expect.stringMatching(/^Saturday,? 31 January 2099$/) as string,
          side: 'mentee',
        },
      },
    ]);
    await app.deliver();
    const [mail] = await app.rows<{ text: string }>('select text from mailbox where recipient = $1', [
      client.person.email,
    ]);
    expect(mail?.text).toContain(`http://localhost:4000/applications/${cycleId}`);
    const audit = await app.rows<{ action: string }>('select action from audit_entries where subject_id = $1', [
      answer.body.id,
    ]);
    expect(audit.map((row) => row.action)).toEqual(['applications.submit']);
    const list = await client.get<OwnApplications>('/api/applications/mine');
    expect(list.body.applications.map((each) => each.id)).toEqual([answer.body.id]);
  });

  it('keeps an incomplete one for a coordinator, and looks again when its owner saves', async () => {
    const cycleId = await makeCycle(app);
    const client = await member(app);
    const first = await apply(client, cycleId);
    expect(first.body.status).toBe('submitted');
    const { id } = client.person;
    await app.rows(
      `insert into profiles (person_id, time_zone, languages, years_in_practice, meeting_mode, availability, updated_at)
       values ($1, 'UTC', '[{"code":"en","level":"C1"}]', 3, 'remote', '{mon-morning}', now())`,
      [id],
    );
    await app.rows(`insert into profile_tags values ($1, $2, 'seeks', 1)`, [id, tagId]);
    const again = await apply(client, cycleId, { ...APPLY, goals: 'To learn the trade from the ground up.' }, 1);
    expect(again.body).toMatchObject({ status: 'admitted', version: 2 });
    expect(await sentTo(client.person.email)).toHaveLength(1);
  });

  it('leaves the decision to a coordinator where the cycle says so', async () => {
    const cycleId = await makeCycle(app, { autoAdmit: false });
    expect((await apply(await member(app, { tagId }), cycleId)).body.status).toBe('submitted');
  });

  it('puts late ones on the waiting list, by phase and by date', async () => {
    const late = await makeCycle(app, { applicationsCloseOn: '2020-02-01' });
    const closed = await makeCycle(app, { phase: 'responses' });
    for (const cycleId of [late, closed]) {
      const client = await member(app, { tagId });
      expect((await apply(client, cycleId)).body).toMatchObject({ status: 'waiting-list', late: true });
      expect((await sentTo(client.person.email))[0]?.data).toMatchObject({ waitingList: true });
    }
  });

  it.each(['under-way', 'closed', 'cancelled'] as const)('takes nothing when the cycle is %s', async (phase) => {
    const cycleId = await makeCycle(app, { phase });
    expect((await apply(await member(app, { tagId }), cycleId)).status).toBe(409);
  });

  it('shows no draft', async () => {
    const cycleId = await makeCycle(app, { phase: 'draft' });
    const client = await member(app);
    expect((await apply(client, cycleId)).status).toBe(404);
    expect((await client.get(mine(cycleId, 'mine'))).status).toBe(404);
  });

  it('asks for a current membership, and says whom to ask', async () => {
    const answer = await apply<ProblemDetails>(await member(app, { tagId, current: false }), await makeCycle(app));
    expect(answer.status).toBe(409);
    expect(answer.body.detail).toContain('office@ellmark.example');
  });

  it('asks for agreement to the text as it stands', async () => {
    const cycleId = await makeCycle(app, { consentVersion: 2 });
    const client = await member(app, { tagId });
    const old = await apply<ProblemDetails>(client, cycleId);
    expect(old.body.fields?.[0]?.field).toBe('consentVersion');
    const none = await apply<ProblemDetails>(client, cycleId, { ...APPLY, consentVersion: null });
    expect([none.status, none.body.fields?.[0]?.field]).toEqual([400, 'consentVersion']);
  });

  it('needs the version, and refuses what another tab changed meanwhile', async () => {
    const cycleId = await makeCycle(app);
    const client = await member(app, { tagId });
    expect((await client.put(mine(cycleId), APPLY)).status).toBe(428);
    await apply(client, cycleId);
    const stale = await apply<ProblemDetails>(client, cycleId);
    expect(stale.status).toBe(412);
    expect(stale.body.current).toMatchObject({ version: 1, goals: APPLY.goals });
    const race = await Promise.all(
      [1, 2, 3].map((n) => apply(client, cycleId, { ...APPLY, goals: `${APPLY.goals} ${n}` }, 1)),
    );
    expect(race.map((answer) => answer.status).sort()).toEqual([200, 412, 412]);
  });

  it('is one’s own until matching begins', async () => {
    const cycleId = await makeCycle(app);
    const client = await member(app, { tagId });
    await apply(client, cycleId);
    await setPhase(app, cycleId, 'applications-closed');
    expect((await apply(client, cycleId, APPLY, 1)).body).toMatchObject({ status: 'admitted', late: false });
    await setPhase(app, cycleId, 'matching');
    expect((await apply(client, cycleId, APPLY, 2)).status).toBe(409);
  });

  it('lets one name mentors who are listed in this cycle, and nobody else', async () => {
    const cycleId = await makeCycle(app);
    const listed = await member(app, { tagId, listed: true, name: 'Listed Mentor' });
    const hidden = await member(app, { tagId });
    await apply(listed, cycleId, MENTOR);
    await apply(hidden, cycleId, MENTOR);
    const client = await member(app, { tagId });
    const found = await client.get<ListedMentors>(mine(cycleId, 'listed-mentors'));
    expect(found.body.mentors).toEqual([
      {
        personId: listed.person.id,
        name: 'Listed Mentor',
        headline: '',
        region: 'coast',
        practiceAreas: ['GIS and data'],
      },
    ]);
    const good = await apply(client, cycleId, { ...APPLY, preferredMentors: [listed.person.id] });
    expect(good.body.preferredMentors).toEqual([{ personId: listed.person.id, name: 'Listed Mentor' }]);
    const bad = await apply<ProblemDetails>(client, cycleId, { ...APPLY, preferredMentors: [hidden.person.id] }, 1);
    expect(bad.body.fields?.[0]?.field).toBe('preferredMentors');
  });

  it('remembers who was left out last time', async () => {
    const before = await makeCycle(app, { startsOn: '2098-03-01', checkInOn: '2099-05-01' });
    const [left, paired, mentor] = [
      await member(app, { tagId }),
      await member(app, { tagId }),
      await member(app, { tagId }),
    ];
    await apply(left, before);
    const lucky = await apply(paired, before);
    const host = await apply(mentor, before, MENTOR);
    await propose(app, before, lucky.body.id, host.body.id, 'under-way');
    await setPhase(app, before, 'under-way');
    const now = await makeCycle(app);
    await apply(left, now);
    await apply(paired, now);
    const rows = await app.rows<{ person_id: string; left_out_last_time: boolean }>(
      'select person_id, left_out_last_time from applications where cycle_id = $1',
      [now],
    );
    expect(Object.fromEntries(rows.map((row) => [row.person_id, row.left_out_last_time]))).toEqual({
      [left.person.id]: true,
      [paired.person.id]: false,
    });
    await setPhase(app, before, 'cancelled');
  });
});

it('describes its addresses', async () => {
  const answer = await (await app.visitor()).get<{ paths: Record<string, unknown> }>('/api/openapi.json');
  expect(Object.keys(answer.body.paths).filter((path) => path.startsWith('/api/applications'))).toHaveLength(11);
});

describe('withdrawing', () => {
  it('is for the owner alone, takes a waiting proposal along, and gives the place back', async () => {
    const cycleId = await makeCycle(app);
    const [mentee, mentor] = [await member(app, { tagId }), await member(app, { tagId })];
    const sought = await apply(mentee, cycleId);
    const offered = await apply(mentor, cycleId, MENTOR);
    await setPhase(app, cycleId, 'responses');
    await propose(app, cycleId, sought.body.id, offered.body.id);
    const path = `/api/applications/${sought.body.id}/withdraw`;
    expect((await mentor.post(path)).status).toBe(404);
    expect((await mentee.post<OwnApplication>(path)).body.status).toBe('withdrawn');
    expect((await mentee.post<OwnApplication>(path)).status).toBe(200);
    const [pairing] = await app.rows<{ state: string }>('select state from pairings where cycle_id = $1', [cycleId]);
    const [place] = await app.rows<{ taken: number }>('select taken from applications where id = $1', [
      offered.body.id,
    ]);
    expect([pairing?.state, place?.taken]).toEqual(['withdrawn', 0]);
    expect((await sentTo(mentee.person.email)).map((row) => row.template)).toEqual([
      'applications/received',
      'applications/withdrawn',
    ]);
    const again = await apply(mentee, cycleId, APPLY, 2);
    expect(again.body).toMatchObject({ status: 'waiting-list', late: true });
  });

  it('does not end a pair', async () => {
    const cycleId = await makeCycle(app);
    const [mentee, mentor] = [await member(app, { tagId }), await member(app, { tagId })];
    const sought = await apply(mentee, cycleId);
    const offered = await apply(mentor, cycleId, MENTOR);
    await propose(app, cycleId, sought.body.id, offered.body.id, 'under-way');
    expect((await mentor.post(`/api/applications/${offered.body.id}/withdraw`)).status).toBe(409);
  });
});
