import { and, asc, count, desc, eq, inArray, max, ne, notInArray, sql } from 'drizzle-orm';
import { applications, cycles, cycleSettingsHistory, pairings, people, rounds, runs } from '../../../drizzle/schema';
import type { CycleCounts } from '../../../shared/cycles/cycles-contract';
import type { MatchingSettings } from '../../../shared/matching/matching-contract';
import type { Db } from '../platform';

export type CycleRow = typeof cycles.$inferSelect;

export async function findCycle(db: Db, cycleId: string): Promise<CycleRow | null> {
  const [row] = await db.select().from(cycles).where(eq(cycles.id, cycleId));
  return row ?? null;
}

/** The same, held until the transaction ends, so that two deeds on one cycle wait for each other. */
export async function holdCycle(db: Db, cycleId: string): Promise<CycleRow | null> {
  const [row] = await db.select().from(cycles).where(eq(cycles.id, cycleId)).for('update');
  return row ?? null;
}

/** The latest first. */
export async function listCycles(db: Db): Promise<CycleRow[]> {
  return db.select().from(cycles).orderBy(desc(cycles.startsOn), asc(cycles.name));
}

export async function insertCycle(db: Db, row: typeof cycles.$inferInsert): Promise<CycleRow> {
  const [inserted] = await db.insert(cycles).values(row).returning();
  return inserted!;
}

/** Changes a cycle and counts its version up. */
export async function updateCycle(db: Db, cycleId: string, change: Partial<typeof cycles.$inferInsert>): Promise<void> {
  await db
    .update(cycles)
    .set({ ...change, version: sql`${cycles.version} + 1` })
    .where(eq(cycles.id, cycleId));
}

export async function insertSettingsVersion(db: Db, row: typeof cycleSettingsHistory.$inferInsert): Promise<void> {
  await db.insert(cycleSettingsHistory).values(row);
}

export interface SettingsVersionRow {
  version: number;
  savedBy: string | null;
  savedAt: Date;
  settings: MatchingSettings;
}

/** The newest first. */
export async function listSettingsVersions(db: Db, cycleId: string, most = 50): Promise<SettingsVersionRow[]> {
  return db
    .select({
      version: cycleSettingsHistory.version,
      savedBy: people.name,
      savedAt: cycleSettingsHistory.savedAt,
      settings: cycleSettingsHistory.settings,
    })
    .from(cycleSettingsHistory)
    .leftJoin(people, eq(people.id, cycleSettingsHistory.savedBy))
    .where(eq(cycleSettingsHistory.cycleId, cycleId))
    .orderBy(desc(cycleSettingsHistory.version))
    .limit(most);
}

type Counts = Omit<CycleCounts, 'activeRules' | 'activeCriteria'>;

/** What is counted in a cycle; mentees, mentors and places count admitted applications once admission has begun. */
export async function countCycle(db: Db, cycleId: string): Promise<Counts> {
  const sent = await db
    .select({
      side: applications.side,
      status: applications.status,
      total: count(),
      places: sql<number>`coalesce(sum(${applications.places}), 0)::int`,
    })
    .from(applications)
    .where(and(eq(applications.cycleId, cycleId), ne(applications.status, 'draft')))
    .groupBy(applications.side, applications.status);
  const total = (holds: (row: (typeof sent)[number]) => boolean, value: 'total' | 'places' = 'total'): number =>
    sent.filter(holds).reduce((sum, row) => sum + row[value], 0);
  const inPairings = await db
    .select({ state: pairings.state, total: count() })
    .from(pairings)
    .where(eq(pairings.cycleId, cycleId))
    .groupBy(pairings.state);
  const pairingsIn = (...states: string[]): number =>
    inPairings.filter((row) => states.includes(row.state)).reduce((sum, row) => sum + row.total, 0);
  const [run] = await db
    .select({ total: count(), latest: max(runs.number) })
    .from(runs)
    .where(eq(runs.cycleId, cycleId));
  return {
    applications: total((row) => row.status !== 'withdrawn'),
    mentees: total((row) => row.side === 'mentee' && row.status === 'admitted'),
    mentors: total((row) => row.side === 'mentor' && row.status === 'admitted'),
    places: total((row) => row.side === 'mentor' && row.status === 'admitted', 'places'),
    undecided: total((row) => row.status === 'submitted'),
    waitingList: total((row) => row.status === 'waiting-list'),
    withdrawn: total((row) => row.status === 'withdrawn'),
    runs: run?.total ?? 0,
    latestRun: run?.latest ?? null,
    rounds: await db.$count(rounds, eq(rounds.cycleId, cycleId)),
    pending: pairingsIn('pending'),
    underWay: pairingsIn('under-way', 'completed', 'ended-early'),
    declined: pairingsIn('declined', 'expired', 'withdrawn'),
  };
}

/** Everybody who has applied and not withdrawn, once a person. */
export async function listApplicantsToTell(db: Db, cycleId: string) {
  return db
    .selectDistinct({ personId: people.id, name: people.name, email: people.email })
    .from(applications)
    .innerJoin(people, eq(people.id, applications.personId))
    .where(and(eq(applications.cycleId, cycleId), notInArray(applications.status, ['draft', 'withdrawn'])));
}

/** Proposals that wait for answers are withdrawn, runs that wait or work are asked to stop. */
export async function stopWorkOfCycle(db: Db, cycleId: string, now: Date): Promise<void> {
  await db
    .update(pairings)
    .set({ state: 'withdrawn', endedAt: now, version: sql`${pairings.version} + 1` })
    .where(and(eq(pairings.cycleId, cycleId), eq(pairings.state, 'pending')));
  await db
    .update(runs)
    .set({ state: 'cancelled', cancelRequested: true, finishedAt: now })
    .where(and(eq(runs.cycleId, cycleId), eq(runs.state, 'queued')));
  await db
    .update(runs)
    .set({ cancelRequested: true })
    .where(and(eq(runs.cycleId, cycleId), inArray(runs.state, ['running'])));
}
