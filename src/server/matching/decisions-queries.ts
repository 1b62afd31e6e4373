import { and, asc, eq } from 'drizzle-orm';
import { pairDecisions } from '../../../drizzle/schema';
import type { Db } from '../platform';

export type DecisionRow = typeof pairDecisions.$inferSelect;

export async function listDecisions(db: Db, cycleId: string): Promise<DecisionRow[]> {
  return db
    .select()
    .from(pairDecisions)
    .where(eq(pairDecisions.cycleId, cycleId))
    .orderBy(asc(pairDecisions.menteeApplicationId), asc(pairDecisions.mentorApplicationId));
}

export async function saveDecision(db: Db, row: DecisionRow): Promise<void> {
  await db
    .insert(pairDecisions)
    .values(row)
    .onConflictDoUpdate({
      target: [pairDecisions.menteeApplicationId, pairDecisions.mentorApplicationId],
      set: {
        kind: row.kind,
        note: row.note,
        overridesRules: row.overridesRules,
        decidedBy: row.decidedBy,
        decidedAt: row.decidedAt,
      },
    });
}

/** False where there was none. */
export async function deleteDecision(db: Db, mentee: string, mentor: string): Promise<boolean> {
  const rows = await db
    .delete(pairDecisions)
    .where(and(eq(pairDecisions.menteeApplicationId, mentee), eq(pairDecisions.mentorApplicationId, mentor)))
    .returning({ mentee: pairDecisions.menteeApplicationId });
  return rows.length > 0;
}
