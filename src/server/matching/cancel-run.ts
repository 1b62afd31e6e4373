import type { RunLine } from '../../../shared/matching/runs-contract';
import { recordAudit } from '../audit';
import { inTransaction, notFound, Problem, type Context } from '../platform';
import { showRun } from './run-lines';
import { findRun, requestCancel } from './runs-queries';

/** Stops a run that waits or works; its worker sees the request within a fraction of a second. */
export async function cancelRun(ctx: Context, runId: string): Promise<RunLine> {
  await inTransaction(ctx, async (tx) => {
    const run = await findRun(tx.db, runId);
    if (!run) throw notFound('run');
    if (run.state === 'cancelled') return;
    const asked = await requestCancel(tx.db, runId, tx.now());
    if (!asked) throw new Problem('conflict', `Run ${run.number} is finished already; there is nothing to stop`);
    await recordAudit(tx, { action: 'matching.cancel-run', subjectId: runId, cycleId: run.cycleId });
  });
  return showRun(ctx, runId);
}
