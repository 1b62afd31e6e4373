import { and, asc, desc, eq, inArray, lt, ne, sql } from 'drizzle-orm';
import { alias } from 'drizzle-orm/pg-core';
import {
  applicationPreferences,
  applications,
  cycles,
  pairings,
  people,
  profiles,
  profileTags,
  tags,
} from '../../../drizzle/schema';
import type { ApplicationSide } from '../../../shared/applications/applications-contract';
import { grouped, type Db } from '../platform';

export type ApplicationRow = typeof applications.$inferSelect;

/** One's applications with the names of their cycles, newest cycle first. */
export async function listApplicationsOf(db: Db, personId: string, cycleId?: string) {
  return db
    .select({ application: applications, cycleName: cycles.name, phase: cycles.phase })
    .from(applications)
    .innerJoin(cycles, eq(cycles.id, applications.cycleId))
    .where(and(eq(applications.personId, personId), cycleId ? eq(applications.cycleId, cycleId) : undefined))
    .orderBy(desc(cycles.startsOn), asc(applications.side));
}

export async function findApplication(db: Db, id: string): Promise<ApplicationRow | null> {
  const [row] = await db.select().from(applications).where(eq(applications.id, id)).for('update');
  return row ?? null;
}

/** The row of a person on one side of a cycle, held for the rest of the transaction. */
export async function holdApplication(
  db: Db,
  cycleId: string,
  personId: string,
  side: ApplicationSide,
): Promise<ApplicationRow | null> {
  const [row] = await db
    .select()
    .from(applications)
    .where(and(eq(applications.cycleId, cycleId), eq(applications.personId, personId), eq(applications.side, side)))
    .for('update');
  return row ?? null;
}

/** Null where the person applied on this side in the same moment. */
export async function insertApplication(db: Db, row: typeof applications.$inferInsert): Promise<ApplicationRow | null> {
  const [inserted] = await db.insert(applications).values(row).onConflictDoNothing().returning();
  return inserted ?? null;
}

/** Changes a row and raises its version. */
export async function updateApplication(
  db: Db,
  id: string,
  change: Partial<ApplicationRow>,
): Promise<ApplicationRow | null> {
  const [row] = await db
    .update(applications)
    .set({ ...change, version: sql`${applications.version} + 1` })
    .where(eq(applications.id, id))
    .returning();
  return row ?? null;
}

export async function replacePreferences(db: Db, applicationId: string, mentorIds: readonly string[]): Promise<void> {
  await db.delete(applicationPreferences).where(eq(applicationPreferences.applicationId, applicationId));
  if (mentorIds.length > 0)
    await db
      .insert(applicationPreferences)
      .values(mentorIds.map((mentorPersonId, index) => ({ applicationId, mentorPersonId, rank: index + 1 })));
}

/** Named mentors by application, the first choice first. */
export async function preferencesOf(db: Db, applicationIds: string[]) {
  if (applicationIds.length === 0) return new Map<string, { personId: string; name: string }[]>();
  const rows = await db
    .select({
      applicationId: applicationPreferences.applicationId,
      personId: applicationPreferences.mentorPersonId,
      name: people.name,
    })
    .from(applicationPreferences)
    .innerJoin(people, eq(people.id, applicationPreferences.mentorPersonId))
    .where(inArray(applicationPreferences.applicationId, applicationIds))
    .orderBy(asc(applicationPreferences.rank));
  const byApplication = grouped(rows, (row) => row.applicationId);
  return new Map(
    [...byApplication].map(([id, named]) => [id, named.map(({ personId, name }) => ({ personId, name }))] as const),
  );
}

/** Mentors of a cycle who agreed to be listed, with the labels of the practice areas that they offer. */
export async function listListedMentors(db: Db, cycleId: string) {
  const areas = db
    .select({
      personId: profileTags.personId,
      labels: sql<string[]>`array_agg(${tags.label} order by ${profileTags.priority}, ${tags.label})`.as('labels'),
    })
    .from(profileTags)
    .innerJoin(tags, and(eq(tags.id, profileTags.tagId), eq(tags.kind, 'practice-area')))
    .where(eq(profileTags.direction, 'offers'))
    .groupBy(profileTags.personId)
    .as('areas');
  return db
    .select({
      personId: people.id,
      name: people.name,
      headline: profiles.headline,
      region: profiles.region,
      practiceAreas: sql<string[]>`coalesce(${areas.labels}, '{}')`,
    })
    .from(applications)
    .innerJoin(people, eq(people.id, applications.personId))
    .innerJoin(profiles, eq(profiles.personId, people.id))
    .leftJoin(areas, eq(areas.personId, people.id))
    .where(
      and(
        eq(applications.cycleId, cycleId),
        eq(applications.side, 'mentor'),
        inArray(applications.status, ['submitted', 'admitted', 'waiting-list']),
        eq(profiles.listed, true),
      ),
    )
    .orderBy(asc(people.name), asc(people.id));
}

/** States of an application's pairings that are pending or under way, on either side. */
export async function livePairingStates(db: Db, applicationId: string): Promise<('pending' | 'under-way')[]> {
  const rows = await db
    .select({ state: pairings.state })
    .from(pairings)
    .where(
      and(
        sql`${applicationId} in (${pairings.menteeApplicationId}, ${pairings.mentorApplicationId})`,
        inArray(pairings.state, ['pending', 'under-way']),
      ),
    );
  return rows.map((row) => (row.state === 'pending' ? 'pending' : 'under-way'));
}

/** Takes back proposals of these applications that wait for answers; the trigger gives the places back. */
export async function withdrawPendingPairings(db: Db, applicationIds: string[], now: Date): Promise<string[]> {
  if (applicationIds.length === 0) return [];
  const rows = await db
    .update(pairings)
    .set({ state: 'withdrawn', endedAt: now, version: sql`${pairings.version} + 1` })
    .where(
      and(
        eq(pairings.state, 'pending'),
        sql`(${inArray(pairings.menteeApplicationId, applicationIds)} or ${inArray(pairings.mentorApplicationId, applicationIds)})`,
      ),
    )
    .returning({ id: pairings.id });
  return rows.map((row) => row.id);
}

/** The latest cycle before this one whose pairs were made. */
async function cycleBefore(db: Db, cycleId: string, startsOn: string): Promise<string | null> {
  const [row] = await db
    .select({ id: cycles.id })
    .from(cycles)
    .where(
      and(
        ne(cycles.id, cycleId),
        lt(cycles.startsOn, startsOn),
        inArray(cycles.phase, ['under-way', 'closing', 'closed']),
      ),
    )
    .orderBy(desc(cycles.startsOn))
    .limit(1);
  return row?.id ?? null;
}

/** Those of the people who were admitted as mentees in the cycle before and came to no pair there. */
export async function leftOutBefore(
  db: Db,
  cycle: { id: string; startsOn: string },
  personIds: string[],
): Promise<Set<string>> {
  const before = await cycleBefore(db, cycle.id, cycle.startsOn);
  if (!before || personIds.length === 0) return new Set();
  const earlier = alias(applications, 'earlier');
  const rows = await db
    .select({ personId: earlier.personId })
    .from(earlier)
    .leftJoin(
      pairings,
      and(
        eq(pairings.menteeApplicationId, earlier.id),
        inArray(pairings.state, ['under-way', 'completed', 'ended-early']),
      ),
    )
    .where(
      and(
        eq(earlier.cycleId, before),
        eq(earlier.side, 'mentee'),
        eq(earlier.status, 'admitted'),
        inArray(earlier.personId, personIds),
        sql`${pairings.id} is null`,
      ),
    );
  return new Set(rows.map((row) => row.personId));
}
