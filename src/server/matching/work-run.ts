import { hostname } from 'node:os';
import { inTransaction, type Context } from '../platform';
import { recordAudit } from '../audit';
import { MatchingThread, ThreadEnded } from './matching-thread';
import type { Answers } from './matching-tasks';
import {
  claimRun,
  endRun,
  findRunInput,
  insertPlanPairings,
  isCancelRequested,
  listSilentRuns,
  storePlan,
  writeProgress,
  type RunRow,
} from './runs-queries';

/** How often a running run looks whether somebody asked it to stop, and says how far it is. */
const TICK_MS = 100;
/** A worker that was not heard of for this long is taken for dead. */
const SILENCE_MS = 30_000;

/** Works one run out in a thread of its own. Whoever claims it first works; a second call does nothing. */
export async function workRun(ctx: Context, runId: string): Promise<void> {
  const run = await claimRun(ctx.db, runId, ctx.now(), new Date(ctx.now().getTime() - SILENCE_MS));
  if (!run) return;
  const input = await findRunInput(ctx.db, runId);
  const thread = new MatchingThread(ctx.settings.root);
  const watch = watchRun(ctx, runId, thread);
  try {
    if (!input) throw new Error('The frozen input of the run is missing');
    const found = await thread.ask<'plan'>({ kind: 'plan', input }, watch.progress);
    await store(ctx, run, found);
  } catch (error) {
    await finishWithout(ctx, run, error, watch.cancelled());
  } finally {
    watch.stop();
    await thread.end();
  }
}

interface Watching {
  progress(share: number, stage: string): void;
  cancelled(): boolean;
  stop(): void;
}

/** Writes progress and looks for requests to stop, never more than one query at a time. */
function watchRun(ctx: Context, runId: string, thread: MatchingThread): Watching {
  let latest = { progress: 0, stage: `Working on ${hostname()}` };
  let busy = false;
  let cancelled = false;
  const look = async (): Promise<void> => {
    if (busy) return;
    busy = true;
    try {
      await writeProgress(ctx.db, runId, { ...latest, at: ctx.now() });
      if (await isCancelRequested(ctx.db, runId)) {
        cancelled = true;
        await thread.end();
      }
    } catch (error) {
      ctx.log.warn({ err: error as Error, runId }, 'progress of a run could not be written');
    } finally {
      busy = false;
    }
  };
  const timer = setInterval(() => void look(), TICK_MS);
  return {
    progress: (progress, stage) => void (latest = { progress, stage }),
    cancelled: () => cancelled,
    stop: () => clearInterval(timer),
  };
}

async function store(ctx: Context, run: RunRow, found: Answers['plan']): Promise<void> {
  await inTransaction(ctx, async (tx) => {
    const report = { ...found.report, record: { ...found.report.record, inputHash: run.inputHash ?? '' } };
    const stored = await storePlan(tx.db, run.id, { plan: Buffer.from(found.plan), report, at: tx.now() });
    if (!stored) return;
    await insertPlanPairings(
      tx.db,
      found.pairings.map(({ mentee, mentor, ...rest }) => ({
        ...rest,
        runId: run.id,
        menteeApplicationId: mentee,
        mentorApplicationId: mentor,
      })),
    );
    await recordAudit(tx, { action: 'matching.finish-run', subjectId: run.id, cycleId: run.cycleId });
  });
}

async function finishWithout(ctx: Context, run: RunRow, error: unknown, cancelled: boolean): Promise<void> {
  if (cancelled) {
    await endRun(ctx.db, run.id, { state: 'cancelled', fault: null, at: ctx.now() });
    return;
  }
  // The process is stopping: the run stays as it is, and another worker takes it up.
  if (error instanceof ThreadEnded) throw error;
  ctx.log.error({ err: error as Error, runId: run.id }, 'run failed');
  const fault = error instanceof Error ? error.message : 'unknown';
  await endRun(ctx.db, run.id, { state: 'failed', fault, at: ctx.now() });
}

/** Puts runs whose worker died, or which nobody took up, back into the queue. */
export async function reviveRuns(ctx: Context): Promise<void> {
  const silentSince = new Date(ctx.now().getTime() - SILENCE_MS);
  for (const run of await listSilentRuns(ctx.db, silentSince)) {
    ctx.log.warn({ runId: run.id }, 'a run without a living worker is taken up again');
    await ctx.enqueue(ctx.db, 'matching-run', { runId: run.id });
  }
}
