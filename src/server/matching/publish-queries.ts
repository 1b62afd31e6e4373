import { and, eq, inArray, max } from 'drizzle-orm';
import { applications, pairings, people, planApprovals, rounds } from '../../../drizzle/schema';
import type { Db } from '../platform';

export async function nextRoundNumber(db: Db, cycleId: string): Promise<number> {
  const [row] = await db
    .select({ last: max(rounds.number) })
    .from(rounds)
    .where(eq(rounds.cycleId, cycleId));
  return (row?.last ?? 0) + 1;
}

export async function findRoundOfRun(db: Db, runId: string): Promise<{ id: string; number: number } | null> {
  const [row] = await db.select({ id: rounds.id, number: rounds.number }).from(rounds).where(eq(rounds.runId, runId));
  return row ?? null;
}

export async function insertRound(db: Db, row: typeof rounds.$inferInsert): Promise<string> {
  const [inserted] = await db.insert(rounds).values(row).returning({ id: rounds.id });
  return inserted!.id;
}

export async function findApproval(db: Db, runId: string): Promise<{ personId: string; name: string } | null> {
  const [row] = await db
    .select({ personId: people.id, name: people.name })
    .from(planApprovals)
    .innerJoin(people, eq(people.id, planApprovals.approvedBy))
    .where(eq(planApprovals.runId, runId));
  return row ?? null;
}

export async function insertApproval(db: Db, row: typeof planApprovals.$inferInsert): Promise<void> {
  await db.insert(planApprovals).values(row).onConflictDoNothing();
}

export type NewPairing = typeof pairings.$inferInsert;

export async function insertPairings(db: Db, rows: NewPairing[]): Promise<void> {
  for (let from = 0; from < rows.length; from += 1000) await db.insert(pairings).values(rows.slice(from, from + 1000));
}

export async function countProposals(db: Db, roundId: string): Promise<number> {
  return db.$count(pairings, eq(pairings.roundId, roundId));
}

/** Who is behind applications, with what a notice needs. */
export async function listRecipients(db: Db, applicationIds: readonly string[]) {
  if (applicationIds.length === 0) return [];
  return db
    .select({
      applicationId: applications.id,
      personId: applications.personId,
      goals: applications.goals,
      status: applications.status,
      name: people.name,
      email: people.email,
    })
    .from(applications)
    .innerJoin(people, eq(people.id, applications.personId))
    .where(and(inArray(applications.id, [...applicationIds])));
}
