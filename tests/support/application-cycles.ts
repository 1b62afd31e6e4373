/** Cycles, members, profiles and proposals for specs of applications. */
import { randomUUID } from 'node:crypto';
import { eq } from 'drizzle-orm';
import { association, cycles, people, profiles, profileTags, tags } from '../../drizzle/schema';
import { TAGS } from '../../drizzle/seed/data/tags';
import { TOWNS } from '../../drizzle/seed/data/gazetteer';
import type { OwnApplication } from '../../shared/applications/applications-contract';
import { DEFAULT_MATCHING_SETTINGS } from '../../shared/matching/matching-contract';
import type { TestApp, TestPerson } from './test-app';
import type { TestClient } from './test-client';

export const APPLY = {
  side: 'mentee' as const,
  places: 0,
  oneMoreIfAsked: false,
  goals: 'To lead a small site team by spring.',
  preferredMentors: [] as string[],
  consentVersion: 1,
};
export const MENTOR = { ...APPLY, side: 'mentor' as const, places: 2, goals: '' };

let count = 0;

/** A cycle that is open and closes far in the future, unless the spec says otherwise. */
export async function makeCycle(app: TestApp, change: Partial<typeof cycles.$inferInsert> = {}): Promise<string> {
  const [row] = await app.backend.database.db
    .insert(cycles)
    .values({
      name: `Cycle ${++count}`,
      phase: 'open',
      applicationsOpenOn: '2020-01-01',
      applicationsCloseOn: '2099-01-31',
      answersDueOn: '2099-02-28',
      startsOn: '2099-03-01',
      checkInOn: '2099-06-01',
      endsOn: '2099-12-01',
      consentText: 'I agree to the code of conduct.',
      settings: DEFAULT_MATCHING_SETTINGS,
      createdAt: new Date(),
      ...change,
    })
    .returning();
  if (!row) throw new Error('no cycle was made');
  return row.id;
}

/** The demo association's words: its tags by label, its towns. */
export async function giveVocabulary(app: TestApp): Promise<Map<string, string>> {
  const db = app.backend.database.db;
  await db.update(association).set({
    name: 'Ellmark Institute of Surveyors',
    timeZone: 'Europe/Copenhagen',
    contactEmail: 'office@ellmark.example',
    gazetteer: Object.fromEntries(
      TOWNS.map(({ name, region, latitude, longitude }) => [name, { region, latitude, longitude }]),
    ),
  });
  const rows = await db
    .insert(tags)
    .values(TAGS.map(({ slug, kind, label, synonyms }) => ({ slug, kind, label, synonyms, createdAt: new Date() })))
    .returning();
  return new Map(rows.map((row) => [row.label, row.id]));
}

/** Somebody whose membership is current, signed in; with a profile that matching can use where a tag is given. */
export async function member(
  app: TestApp,
  about: { name?: string; tagId?: string; current?: boolean; listed?: boolean } = {},
): Promise<TestClient & { person: TestPerson }> {
  const db = app.backend.database.db;
  const client = await app.client();
  const { id } = client.person;
  await db
    .update(people)
    .set({ membershipCurrent: about.current ?? true, ...(about.name ? { name: about.name } : {}) })
    .where(eq(people.id, id));
  if (about.tagId) {
    await db.insert(profiles).values({
      personId: id,
      timeZone: 'Europe/Copenhagen',
      employer: 'Quarrick & Sons Surveying',
      region: 'coast',
      town: 'Port Ansel',
      languages: [{ code: 'en', level: 'C1' }],
      yearsInPractice: 4,
      meetingMode: 'both',
      availability: ['mon-morning'],
      listed: about.listed ?? false,
      updatedAt: new Date(),
    });
    await db.insert(profileTags).values([
      { personId: id, tagId: about.tagId, direction: 'seeks', priority: 1 },
      { personId: id, tagId: about.tagId, direction: 'offers', priority: 1 },
    ]);
  }
  return client;
}

export const setPhase = (app: TestApp, cycleId: string, phase: string): Promise<unknown> =>
  app.rows('update cycles set phase = $2 where id = $1', [cycleId, phase]);

/** Addresses below a cycle. */
export const mine = (cycleId: string, side = 'mentee') => `/api/applications/cycles/${cycleId}/${side}`;
export const apply = <T = OwnApplication>(client: TestClient, cycleId: string, form: object = APPLY, version = 0) =>
  client.putVersion<T>(mine(cycleId, 'side' in form ? String(form.side) : 'mentee'), form, version);
/** A proposal between two applications, as publishing would write it. */
export async function propose(
  app: TestApp,
  cycleId: string,
  menteeId: string,
  mentorId: string,
  state = 'pending',
): Promise<void> {
  const runId = randomUUID();
  const roundId = randomUUID();
  await app.rows(
    `insert into runs (id, cycle_id, number, state, settings, created_at) values ($1, $2, (select count(*) + 1 from runs where cycle_id = $2), 'failed', '{}', now())`,
    [runId, cycleId],
  );
  await app.rows(
    `insert into rounds (id, cycle_id, run_id, number, published_at) values ($1, $2, $3, (select count(*) + 1 from rounds where cycle_id = $2), now())`,
    [roundId, cycleId, runId],
  );
  const answer = state === 'pending' ? 'unanswered' : 'accepted';
  await app.rows(
    `insert into pairings (cycle_id, round_id, mentee_application_id, mentor_application_id, fit, shared, state, mentee_answer,
       mentor_answer, mentee_token_hash, mentor_token_hash, answers_due_at, created_at)
     values ($1, $2, $3, $4, 7000, '{}', $5, $6, $6, $7, $8, now(), now())`,
    [cycleId, roundId, menteeId, mentorId, state, answer, randomUUID(), randomUUID()],
  );
}
