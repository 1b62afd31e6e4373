import { and, asc, count, desc, eq, inArray, isNull, lt, max, or, sql } from 'drizzle-orm';
import { people, planPairings, rounds, runs } from '../../../drizzle/schema';
import type { MatchingSettings } from '../../../shared/matching/matching-contract';
import type { PlanReport } from '../../../shared/matching/runs-contract';
import type { Db } from '../platform';

/** A run without its large fields. */
export type RunRow = Omit<typeof runs.$inferSelect, 'input' | 'plan' | 'report'>;
export type PlanPairingRow = typeof planPairings.$inferSelect;

const slim = {
  id: runs.id,
  cycleId: runs.cycleId,
  number: runs.number,
  state: runs.state,
  settings: runs.settings,
  inputHash: runs.inputHash,
  progress: runs.progress,
  stage: runs.stage,
  cancelRequested: runs.cancelRequested,
  fault: runs.fault,
  requestedBy: runs.requestedBy,
  createdAt: runs.createdAt,
  startedAt: runs.startedAt,
  heartbeatAt: runs.heartbeatAt,
  finishedAt: runs.finishedAt,
};

export interface ListedRun {
  run: RunRow;
  author: string | null;
  round: number | null;
  counts: Pick<PlanReport, 'paired' | 'meanFit' | 'weakestFit'> & { leftOut: number };
}

const listed = {
  run: slim,
  author: people.name,
  round: rounds.number,
  // Only the figures of the report: the whole of it is large.
  counts: {
    paired: sql<number>`(${runs.report}->>'paired')::int`,
    leftOut: sql<number>`jsonb_array_length(${runs.report}->'leftOut')`,
    meanFit: sql<number>`(${runs.report}->>'meanFit')::float8`,
    weakestFit: sql<number>`(${runs.report}->>'weakestFit')::int`,
  },
};

const withAuthorAndRound = (db: Db) =>
  db
    .select(listed)
    .from(runs)
    .leftJoin(people, eq(people.id, runs.requestedBy))
    .leftJoin(rounds, eq(rounds.runId, runs.id));

export async function listRuns(db: Db, cycleId: string): Promise<ListedRun[]> {
  return withAuthorAndRound(db).where(eq(runs.cycleId, cycleId)).orderBy(desc(runs.number));
}

export async function findListedRun(db: Db, runId: string): Promise<ListedRun | null> {
  const [row] = await withAuthorAndRound(db).where(eq(runs.id, runId));
  return row ?? null;
}

export async function findRun(db: Db, runId: string): Promise<RunRow | null> {
  const [row] = await db.select(slim).from(runs).where(eq(runs.id, runId));
  return row ?? null;
}

/** What a run read, as it was frozen: gzipped JSON. */
export async function findRunInput(db: Db, runId: string): Promise<Buffer | null> {
  const [row] = await db.select({ input: runs.input }).from(runs).where(eq(runs.id, runId));
  return row?.input ?? null;
}

export async function findRunPlan(db: Db, runId: string): Promise<Buffer | null> {
  const [row] = await db.select({ plan: runs.plan }).from(runs).where(eq(runs.id, runId));
  return row?.plan ?? null;
}

export async function findReport(db: Db, runId: string): Promise<PlanReport | null> {
  const [row] = await db.select({ report: runs.report }).from(runs).where(eq(runs.id, runId));
  return row?.report ?? null;
}

export async function nextRunNumber(db: Db, cycleId: string): Promise<number> {
  const [row] = await db
    .select({ last: max(runs.number) })
    .from(runs)
    .where(eq(runs.cycleId, cycleId));
  return (row?.last ?? 0) + 1;
}

export interface NewRun {
  cycleId: string;
  number: number;
  settings: MatchingSettings;
  input: Buffer;
  inputHash: string;
  requestedBy: string | null;
  createdAt: Date;
}

export async function insertRun(db: Db, row: NewRun): Promise<string> {
  const [inserted] = await db
    .insert(runs)
    .values({ ...row, stage: 'Waiting for a worker' })
    .returning({ id: runs.id });
  return inserted!.id;
}

/** Takes a run that waits, or one whose worker has not been heard of since `silentSince`; null where there is nothing to take. */
export async function claimRun(db: Db, runId: string, now: Date, silentSince: Date): Promise<RunRow | null> {
  const [row] = await db
    .update(runs)
    .set({ state: 'running', startedAt: sql`coalesce(${runs.startedAt}, ${now})`, heartbeatAt: now, stage: 'Starting' })
    .where(
      and(
        eq(runs.id, runId),
        or(eq(runs.state, 'queued'), and(eq(runs.state, 'running'), lt(runs.heartbeatAt, silentSince))),
      ),
    )
    .returning(slim);
  return row ?? null;
}

/** Runs whose worker has gone silent, and runs that nobody took up for as long. */
export async function listSilentRuns(db: Db, silentSince: Date): Promise<RunRow[]> {
  return db
    .select(slim)
    .from(runs)
    .where(
      or(
        and(eq(runs.state, 'running'), lt(runs.heartbeatAt, silentSince)),
        and(eq(runs.state, 'queued'), lt(runs.createdAt, silentSince)),
      ),
    );
}

export async function writeProgress(
  db: Db,
  runId: string,
  { progress, stage, at }: { progress: number; stage: string; at: Date },
): Promise<void> {
  await db
    .update(runs)
    .set({ progress, stage, heartbeatAt: at })
    .where(and(eq(runs.id, runId), eq(runs.state, 'running')));
}

export async function isCancelRequested(db: Db, runId: string): Promise<boolean> {
  const [row] = await db.select({ asked: runs.cancelRequested }).from(runs).where(eq(runs.id, runId));
  return row?.asked ?? true;
}

/** Asks for a stop; a run that nobody has taken up yet is stopped at once. Null where it is over already. */
export async function requestCancel(db: Db, runId: string, now: Date): Promise<RunRow | null> {
  const [row] = await db
    .update(runs)
    .set({
      cancelRequested: true,
      state: sql`case when ${runs.state} = 'queued' then 'cancelled' else ${runs.state} end`,
      finishedAt: sql`case when ${runs.state} = 'queued' then ${now} else ${runs.finishedAt} end`,
    })
    .where(and(eq(runs.id, runId), inArray(runs.state, ['queued', 'running'])))
    .returning(slim);
  return row ?? null;
}

/** Ends a run without a plan; false where somebody else ended it. */
export async function endRun(
  db: Db,
  runId: string,
  end: { state: 'failed' | 'cancelled'; fault: string | null; at: Date },
): Promise<boolean> {
  const rows = await db
    .update(runs)
    .set({ state: end.state, fault: end.fault, finishedAt: end.at, stage: '' })
    .where(and(eq(runs.id, runId), inArray(runs.state, ['queued', 'running'])))
    .returning({ id: runs.id });
  return rows.length > 0;
}

/** Stores what a run found; false where it is not running any more. */
export async function storePlan(
  db: Db,
  runId: string,
  result: { plan: Buffer; report: PlanReport; at: Date },
): Promise<boolean> {
  const rows = await db
    .update(runs)
    .set({
      state: 'succeeded',
      plan: result.plan,
      report: result.report,
      progress: 1,
      stage: '',
      heartbeatAt: result.at,
      finishedAt: result.at,
    })
    .where(and(eq(runs.id, runId), eq(runs.state, 'running')))
    .returning({ id: runs.id });
  return rows.length > 0;
}

export async function insertPlanPairings(db: Db, rows: PlanPairingRow[]): Promise<void> {
  for (let from = 0; from < rows.length; from += 1000)
    await db.insert(planPairings).values(rows.slice(from, from + 1000));
}

export async function listPlanPairings(db: Db, runId: string): Promise<PlanPairingRow[]> {
  return db
    .select()
    .from(planPairings)
    .where(eq(planPairings.runId, runId))
    .orderBy(desc(planPairings.fit), asc(planPairings.menteeApplicationId));
}

export async function countUnfinishedRuns(db: Db, cycleId: string): Promise<number> {
  const [row] = await db
    .select({ total: count() })
    .from(runs)
    .where(and(eq(runs.cycleId, cycleId), isNull(runs.finishedAt)));
  return row?.total ?? 0;
}
