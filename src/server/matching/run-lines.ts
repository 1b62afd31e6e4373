import type { RunLine, RunList } from '../../../shared/matching/runs-contract';
import { notFound, type Context } from '../platform';
import { findCycle } from '../cycles';
import { findListedRun, listRuns, type ListedRun } from './runs-queries';

/** One place where a run's row becomes its line. */
export function toRunLine({ run, author, round, counts }: ListedRun): RunLine {
  const done = run.state === 'succeeded';
  return {
    id: run.id,
    number: run.number,
    state: run.state,
    progress: run.progress,
    stage: run.stage,
    cancelRequested: run.cancelRequested,
    fault: run.fault,
    requestedBy: author,
    createdAt: run.createdAt.toISOString(),
    startedAt: run.startedAt?.toISOString() ?? null,
    finishedAt: run.finishedAt?.toISOString() ?? null,
    paired: done ? counts.paired : null,
    leftOut: done ? counts.leftOut : null,
    meanFit: done ? counts.meanFit : null,
    weakestFit: done ? counts.weakestFit : null,
    publishedAsRound: round,
  };
}

/** The runs of a cycle, newest first. */
export async function showRuns(ctx: Context, cycleId: string): Promise<RunList> {
  if (!(await findCycle(ctx.db, cycleId))) throw notFound('cycle');
  return { runs: (await listRuns(ctx.db, cycleId)).map(toRunLine) };
}

/** One run, for watching it. */
export async function showRun(ctx: Context, runId: string): Promise<RunLine> {
  const run = await findListedRun(ctx.db, runId);
  if (!run) throw notFound('run');
  return toRunLine(run);
}
