import { aliasedTable, and, asc, desc, eq, ilike, inArray, lt, or, sql, type SQL } from 'drizzle-orm';
import { applications, cycles, pairings, people, rounds } from '../../../drizzle/schema';
import type { ApplicationSide } from '../../../shared/applications/applications-contract';
import type { PairingState } from '../../../shared/pairings/pairings-contract';
import type { Db } from '../platform';

const menteeApplication = aliasedTable(applications, 'mentee_application');
const mentorApplication = aliasedTable(applications, 'mentor_application');
const mentee = aliasedTable(people, 'mentee');
const mentor = aliasedTable(people, 'mentor');

const columns = {
  pairing: pairings,
  cycle: { id: cycles.id, name: cycles.name, askFirst: cycles.askFirst, phase: cycles.phase },
  mentee: {
    applicationId: menteeApplication.id,
    personId: mentee.id,
    name: mentee.name,
    email: mentee.email,
    goals: menteeApplication.goals,
  },
  mentor: {
    applicationId: mentorApplication.id,
    personId: mentor.id,
    name: mentor.name,
    email: mentor.email,
    goals: mentorApplication.goals,
  },
  round: { number: rounds.number, publishedAt: rounds.publishedAt },
};

const joined = (db: Db) =>
  db
    .select(columns)
    .from(pairings)
    .innerJoin(cycles, eq(cycles.id, pairings.cycleId))
    .innerJoin(rounds, eq(rounds.id, pairings.roundId))
    .innerJoin(menteeApplication, eq(menteeApplication.id, pairings.menteeApplicationId))
    .innerJoin(mentorApplication, eq(mentorApplication.id, pairings.mentorApplicationId))
    .innerJoin(mentee, eq(mentee.id, menteeApplication.personId))
    .innerJoin(mentor, eq(mentor.id, mentorApplication.personId));

/** A pairing with its cycle and both people. */
export type PairingRow = Awaited<ReturnType<typeof listOwnPairings>>[number];

export async function listOwnPairings(db: Db, personId: string) {
  return joined(db)
    .where(or(eq(mentee.id, personId), eq(mentor.id, personId)))
    .orderBy(desc(pairings.createdAt), asc(pairings.id));
}

export async function findPairing(db: Db, pairingId: string): Promise<PairingRow | null> {
  const [row] = await joined(db).where(eq(pairings.id, pairingId));
  return row ?? null;
}

/** The pairing and the side that a link belongs to. */
export async function findByToken(
  db: Db,
  tokenHash: string,
): Promise<{ row: PairingRow; side: ApplicationSide } | null> {
  const [row] = await joined(db).where(
    or(eq(pairings.menteeTokenHash, tokenHash), eq(pairings.mentorTokenHash, tokenHash)),
  );
  if (!row) return null;
  return { row, side: row.pairing.menteeTokenHash === tokenHash ? 'mentee' : 'mentor' };
}

/** Held until the transaction ends: answers of both sides wait for each other. */
export async function holdPairing(db: Db, pairingId: string): Promise<void> {
  await db.select({ id: pairings.id }).from(pairings).where(eq(pairings.id, pairingId)).for('update');
}

export async function updatePairing(
  db: Db,
  pairingId: string,
  change: Partial<typeof pairings.$inferInsert>,
): Promise<void> {
  await db
    .update(pairings)
    .set({ ...change, version: sql`${pairings.version} + 1` })
    .where(eq(pairings.id, pairingId));
}

const containing = (text: string): string => `%${text.replace(/[\\%_]/g, '\\$&')}%`;

export async function listPairingsOfCycle(
  db: Db,
  cycleId: string,
  filter: { state: PairingState | undefined; search: string },
): Promise<PairingRow[]> {
  const conditions: (SQL | undefined)[] = [
    eq(pairings.cycleId, cycleId),
    filter.state ? eq(pairings.state, filter.state) : undefined,
    filter.search
      ? or(ilike(mentee.name, containing(filter.search)), ilike(mentor.name, containing(filter.search)))
      : undefined,
  ];
  return joined(db)
    .where(and(...conditions))
    .orderBy(asc(mentee.name), asc(pairings.id));
}

/** Pending pairings whose answers were due before `now`; rows that somebody else works on are passed over. */
export async function takeOverdue(db: Db, now: Date, most: number): Promise<string[]> {
  const rows = await db
    .select({ id: pairings.id })
    .from(pairings)
    .where(and(eq(pairings.state, 'pending'), lt(pairings.answersDueAt, now)))
    .limit(most)
    .for('update', { skipLocked: true });
  return rows.map((row) => row.id);
}

export async function listPairings(db: Db, ids: readonly string[]): Promise<PairingRow[]> {
  return ids.length === 0 ? [] : joined(db).where(inArray(pairings.id, [...ids]));
}

export async function listPending(db: Db): Promise<PairingRow[]> {
  return joined(db).where(eq(pairings.state, 'pending'));
}
