import type { PublishReview } from '../../../shared/matching/runs-contract';
import { recordAudit } from '../audit';
import { holdCycle } from '../cycles';
import { actorOf, inTransaction, notFound, Problem, type Context } from '../platform';
import { findRoundOfRun, insertApproval } from './publish-queries';
import { reviewPublish } from './review-publish';
import { findRun } from './runs-queries';

/** A second pair of eyes: not those of the coordinator who started the run. Approving twice changes nothing. */
export async function approvePlan(ctx: Context, runId: string): Promise<PublishReview> {
  const { personId } = actorOf(ctx);
  await inTransaction(ctx, async (tx) => {
    const run = await findRun(tx.db, runId);
    if (!run) throw notFound('run');
    const cycle = await holdCycle(tx.db, run.cycleId);
    if (!cycle?.needsApproval) throw new Problem('conflict', 'Plans of this cycle need no approval');
    if (run.state !== 'succeeded') throw new Problem('conflict', `Run ${run.number} has no plan`);
    if (run.requestedBy === personId)
      throw new Problem('conflict', 'You started this run; another coordinator approves its plan');
    if (await findRoundOfRun(tx.db, runId)) throw new Problem('conflict', 'This plan is published already');
    await insertApproval(tx.db, { runId, approvedBy: personId, approvedAt: tx.now() });
    await recordAudit(tx, { action: 'matching.approve', subjectId: runId, cycleId: run.cycleId });
  });
  return reviewPublish(ctx, runId);
}
