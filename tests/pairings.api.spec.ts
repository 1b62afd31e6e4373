import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type { OwnPairing, OwnPairings, PairingLines } from '../shared/pairings/pairings-contract';
import type { ProblemDetails } from '../shared/problems/problems';
import { keepDeadlines } from '../src/server/pairings';
import { makeVocabulary, systemContext } from './support/build-cycle';
import { proposalToken, publishedCycle } from './support/publish-cycle';
import { startTestApp, type TestApp, type TestPerson } from './support/test-app';
import type { TestClient } from './support/test-client';

let app: TestApp;
let areas: { gis: string; hydrographic: string };
let visitor: TestClient;

beforeAll(async () => {
  app = await startTestApp();
  areas = await makeVocabulary(app);
  visitor = await app.visitor();
});
afterAll(() => app.stop());

const byLink = (token: string) => visitor.get<OwnPairing>(`/api/pairings/proposals/${token}`);
const answerByLink = <T = OwnPairing>(token: string, body: object) =>
  visitor.post<T>(`/api/pairings/proposals/${token}/answer`, body);

async function own(person: TestPerson): Promise<{ client: TestClient; pairing: OwnPairing }> {
  const client = await app.signIn(person);
  const { body } = await client.get<OwnPairings>('/api/pairings/mine');
  return { client, pairing: body.pairings[0]! };
}

const messagesTo = async (email: string): Promise<string[]> =>
  (
    await app.rows<{ template: string }>('select template from messages where address = $1 order by created_at, id', [
      email,
    ])
  ).map((row) => row.template);

const DAY = 86_400_000;
const later = (days: number) => ({ ...systemContext(app), now: () => new Date(Date.now() + days * DAY) });

describe('a proposal', () => {
  it('is shown by its link, without contact details, and looking answers nothing', async () => {
    const { mentees, mentors } = await publishedCycle(app, areas);
    const token = await proposalToken(app, mentees[0]!.email);
    for (let times = 0; times < 2; times++) {
      const { status, body, text } = await byLink(token);
      expect(status).toBe(200);
      expect(body).toMatchObject({
        mySide: 'mentee',
        state: 'pending',
        myAnswer: 'unanswered',
        mayAnswer: true,
        contact: null,
      });
      expect(body.partner.name).toBe(mentors[0]!.name);
      expect(text).not.toContain(mentors[0]!.email);
    }
    expect((await byLink('x'.repeat(43))).status).toBe(404);
  });

  it('becomes a pair when both accept, and introduces them', async () => {
    const { mentees, mentors } = await publishedCycle(app, areas);
    const { client, pairing } = await own(mentees[0]!);
    const accepted = await client.post<OwnPairing>(`/api/pairings/${pairing.id}/answer`, { answer: 'accepted' });
    expect(accepted.body).toMatchObject({ myAnswer: 'accepted', state: 'pending', mayTakeBack: true, contact: null });
    const token = await proposalToken(app, mentors[0]!.email);
    const { body } = await answerByLink(token, { answer: 'accepted' });
    expect(body).toMatchObject({ state: 'under-way', contact: { email: mentees[0]!.email } });
    expect(await messagesTo(mentees[0]!.email)).toEqual(['pairings/proposal-to-mentee', 'pairings/both-accepted']);
    expect(await messagesTo(mentors[0]!.email)).toEqual([
      'pairings/proposal-to-mentor',
      'pairings/other-side-accepted',
      'pairings/both-accepted',
    ]);
    const again = await answerByLink(token, { answer: 'accepted' });
    expect([again.status, again.body.state]).toEqual([200, 'under-way']);
    expect(await messagesTo(mentors[0]!.email)).toHaveLength(3);
    const tooLate = await answerByLink<ProblemDetails>(token, { answer: 'declined', reason: 'second thoughts' });
    expect([tooLate.status, tooLate.body.title]).toEqual([409, 'This proposal can no longer be answered']);
  });

  it('is declined with a reason that only coordinators read, for good', async () => {
    const { cycleId, mentees, mentors } = await publishedCycle(app, areas);
    const { client, pairing } = await own(mentors[0]!);
    const answer = (body: object) => client.post<ProblemDetails>(`/api/pairings/${pairing.id}/answer`, body);
    const bare = await answer({ answer: 'declined' });
    expect([bare.status, bare.body.fields?.[0]?.field]).toEqual([400, 'reason']);
    expect((await answer({ answer: 'declined', reason: 'I am abroad until June.' })).status).toBe(200);
    expect((await answer({ answer: 'accepted' })).status).toBe(409);
    await app.deliver();
    const mails = await app.rows<{ text: string }>('select text from mailbox where recipient = $1', [
      mentees[0]!.email,
    ]);
    expect(mails.map((mail) => mail.text).join()).not.toContain('abroad until June');
    expect(await messagesTo(mentees[0]!.email)).toContain('pairings/declined');
    const coordinator = await app.client('coordinator');
    const { body } = await coordinator.get<PairingLines>(`/api/pairings/cycles/${cycleId}`, {});
    expect(body.pairings.map((line) => line.mentorReason)).toContain('I am abroad until June.');
    const [row] = await app.rows<{ taken: number }>('select taken from applications where id = $1', [
      mentors[0]!.applicationId,
    ]);
    expect(row!.taken).toBe(0);
  });

  it('can be taken back while the other side has not answered', async () => {
    const { mentees } = await publishedCycle(app, areas);
    const token = await proposalToken(app, mentees[0]!.email);
    await answerByLink(token, { answer: 'accepted' });
    const { body } = await answerByLink(token, { answer: 'unanswered' });
    expect(body).toMatchObject({ myAnswer: 'unanswered', mayAnswer: true });
  });

  it('belongs to its two people: a stranger gets the answer of a missing one', async () => {
    const { mentees } = await publishedCycle(app, areas);
    const { pairing } = await own(mentees[0]!);
    const stranger = await app.client();
    const foreign = await stranger.post<ProblemDetails>(`/api/pairings/${pairing.id}/answer`, { answer: 'accepted' });
    const missing = await stranger.post<ProblemDetails>('/api/pairings/00000000-0000-4000-8000-000000000000/answer', {
      answer: 'accepted',
    });
    expect([foreign.status, foreign.body.title]).toEqual([404, missing.body.title]);
  });
});

describe('where the mentor is asked first', () => {
  it('the mentee hears and may answer once the mentor has accepted', async () => {
    const { mentees, mentors } = await publishedCycle(app, areas, { askFirst: 'mentor' });
    expect(await messagesTo(mentees[0]!.email)).toEqual([]);
    const client = await app.signIn(mentees[0]!);
    expect((await client.get<OwnPairings>('/api/pairings/mine')).body.pairings).toEqual([]);
    await answerByLink(await proposalToken(app, mentors[0]!.email), { answer: 'accepted' });
    expect(await messagesTo(mentees[0]!.email)).toEqual(['pairings/proposal-to-mentee']);
    const token = await proposalToken(app, mentees[0]!.email);
    expect((await answerByLink(token, { answer: 'accepted' })).body.state).toBe('under-way');
  });
});

describe('deadlines', () => {
  it('bring each reminder once, then expire what was not answered and free the place', async () => {
    const { mentees, mentors } = await publishedCycle(app, areas);
    await answerByLink(await proposalToken(app, mentees[0]!.email), { answer: 'accepted' });
    for (let times = 0; times < 2; times++) await keepDeadlines(later(8));
    await keepDeadlines(later(13));
    const reminders = (await messagesTo(mentors[0]!.email)).filter((template) => template === 'pairings/reminder');
    expect(reminders).toHaveLength(2);
    expect(await messagesTo(mentees[0]!.email)).not.toContain('pairings/reminder');
    await Promise.all([keepDeadlines(later(30)), keepDeadlines(later(30))]);
    const { pairing } = await own(mentees[0]!);
    expect(pairing.state).toBe('expired');
    expect((await messagesTo(mentors[0]!.email)).filter((template) => template === 'pairings/expired')).toHaveLength(1);
    const [row] = await app.rows<{ taken: number }>('select taken from applications where id = $1', [
      mentors[0]!.applicationId,
    ]);
    expect(row!.taken).toBe(0);
  });
});

describe('a mentor’s last place', () => {
  it('cannot be taken twice, whatever writes it', async () => {
    const { mentees, mentors, cycleId } = await publishedCycle(app, areas);
    const [pairing] = await app.rows<{ round_id: string }>('select round_id from pairings where cycle_id = $1', [
      cycleId,
    ]);
    const insert = app.rows(
      `insert into pairings (cycle_id, round_id, mentee_application_id, mentor_application_id, fit, shared,
         mentee_token_hash, mentor_token_hash, answers_due_at, created_at)
       values ($1, $2, $3, $4, 5000, '{}', 'a', 'b', now(), now())`,
      [cycleId, pairing!.round_id, mentees[1]!.applicationId, mentors[0]!.applicationId],
    );
    await expect(insert).rejects.toThrow(/pairings_one_for_mentee|applications_places_not_exceeded/);
  });
});
