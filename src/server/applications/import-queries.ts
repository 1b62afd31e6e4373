/** Reads and writes for whole lists: some statements for thousands of lines, not some for each line. */
import { and, eq, inArray, sql } from 'drizzle-orm';
import { applications, profiles, profileTags } from '../../../drizzle/schema';
import type { MentoringProfile } from '../../../shared/profiles/profiles-contract';
import type { Db } from '../platform';
import type { ApplicationRow } from './applications-queries';

// A statement takes at most 65,535 values.
const CHUNK = 2000;

export function* chunksOf<T>(rows: readonly T[]): Generator<T[]> {
  for (let from = 0; from < rows.length; from += CHUNK) yield rows.slice(from, from + CHUNK);
}

/** Applications of these people in the cycle, on either side; held for the rest of the transaction. */
export async function applicationsOfPeople(db: Db, cycleId: string, personIds: string[]): Promise<ApplicationRow[]> {
  if (personIds.length === 0) return [];
  return db
    .select()
    .from(applications)
    .where(and(eq(applications.cycleId, cycleId), inArray(applications.personId, personIds)))
    .for('update');
}

export async function insertApplications(
  db: Db,
  rows: (typeof applications.$inferInsert)[],
): Promise<ApplicationRow[]> {
  const inserted: ApplicationRow[] = [];
  for (const chunk of chunksOf(rows)) inserted.push(...(await db.insert(applications).values(chunk).returning()));
  return inserted;
}

/** Empty profiles for those who have none. */
export async function insertProfiles(db: Db, personIds: string[], timeZone: string, now: Date): Promise<void> {
  for (const chunk of chunksOf(personIds))
    await db
      .insert(profiles)
      .values(chunk.map((personId) => ({ personId, timeZone, updatedAt: now })))
      .onConflictDoNothing();
}

export type FilledSection = 'about' | 'practice' | 'interests' | 'meeting' | 'wishes';
export interface FilledProfile {
  profile: MentoringProfile;
  /** The sections that differ from what is stored; their versions rise, so that an open editor notices. */
  sections: readonly FilledSection[];
}

/** Stores what a list fills of profiles. */
export async function writeProfiles(db: Db, filled: readonly FilledProfile[], now: Date): Promise<void> {
  for (const chunk of chunksOf(filled)) {
    await db.execute(updateFrom(JSON.stringify(chunk.map(toRecord)), now));
    await replaceTags(
      db,
      chunk.filter((each) => each.sections.includes('interests')),
    );
  }
}

const toRecord = ({ profile: { personId, about, practice, meeting, wishes }, sections }: FilledProfile) => ({
  person_id: personId,
  headline: about.headline,
  employer: about.employer,
  region: about.region,
  town: about.town,
  time_zone: about.timeZone,
  languages: about.languages,
  career_stage: practice.careerStage,
  years_in_practice: practice.yearsInPractice,
  sector: practice.sector,
  meeting_mode: meeting.meetingMode,
  max_distance_km: meeting.maxDistanceKm,
  availability: meeting.availability,
  wished_years_min: wishes.wishedYearsMin,
  wished_years_max: wishes.wishedYearsMax,
  ...Object.fromEntries(sections.map((section) => [`${section}_changed`, 1])),
});

const updateFrom = (records: string, now: Date) => sql`
  update ${profiles} as p set
    headline = r.headline, employer = r.employer, region = r.region, town = r.town, time_zone = r.time_zone,
    languages = r.languages, career_stage = r.career_stage, years_in_practice = r.years_in_practice, sector = r.sector,
    meeting_mode = r.meeting_mode, max_distance_km = r.max_distance_km, availability = r.availability,
    wished_years_min = r.wished_years_min, wished_years_max = r.wished_years_max,
    about_version = p.about_version + coalesce(r.about_changed, 0),
    practice_version = p.practice_version + coalesce(r.practice_changed, 0),
    interests_version = p.interests_version + coalesce(r.interests_changed, 0),
    meeting_version = p.meeting_version + coalesce(r.meeting_changed, 0),
    wishes_version = p.wishes_version + coalesce(r.wishes_changed, 0),
    updated_at = ${now.toISOString()}::timestamptz
  from jsonb_to_recordset(${records}::jsonb) as r (
    person_id uuid, headline text, employer text, region text, town text, time_zone text, languages jsonb, career_stage text,
    years_in_practice smallint, sector text, meeting_mode text, max_distance_km smallint, availability text[],
    wished_years_min smallint, wished_years_max smallint, about_changed int, practice_changed int, interests_changed int,
    meeting_changed int, wishes_changed int
  )
  where p.person_id = r.person_id`;

async function replaceTags(db: Db, filled: readonly FilledProfile[]): Promise<void> {
  if (filled.length === 0) return;
  const personIds = filled.map((each) => each.profile.personId);
  await db.delete(profileTags).where(inArray(profileTags.personId, personIds));
  const rows = filled.flatMap(({ profile: { personId, interests } }) => [
    ...interests.offers.map((choice) => ({ personId, direction: 'offers' as const, ...choice })),
    ...interests.seeks.map((choice) => ({ personId, direction: 'seeks' as const, ...choice })),
  ]);
  for (const chunk of chunksOf(rows)) await db.insert(profileTags).values(chunk);
}
