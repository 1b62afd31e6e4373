import type { PublishReview } from '../../../shared/matching/runs-contract';
import { findAssociation } from '../accounts';
import { findCycle } from '../cycles';
import { actorOf, notFound, type Context } from '../platform';
import { changedSince } from './changed-since';
import { listApplicants } from './cycle-facts-queries';
import { answersDue } from './deadlines';
import { findApproval, nextRoundNumber } from './publish-queries';
import { toldReason } from './publish-run';
import { toRunLine } from './run-lines';
import { listPlanPairings } from './runs-queries';
import { loadFinishedRun } from './show-plan';

/** Who would get what, before anything is sent. */
export async function reviewPublish(ctx: Context, runId: string): Promise<PublishReview> {
  const finished = await loadFinishedRun(ctx, runId);
  const { listed, report, input } = finished;
  const cycle = await findCycle(ctx.db, listed.run.cycleId);
  const association = await findAssociation(ctx.db);
  if (!cycle || !association) throw notFound('cycle');
  const facts = new Map((await listApplicants(ctx.db, cycle.id)).map((each) => [each.applicationId, each]));
  const nameOf = (key: string): string => facts.get(key)?.name ?? 'Erased';
  const approval = await findApproval(ctx.db, runId);
  const pairings = await listPlanPairings(ctx.db, runId);
  const changes =
    listed.round === null ? await changedSince(ctx, { cycle, input, facts, settings: listed.run.settings }) : [];
  return {
    run: toRunLine(listed),
    round: listed.round ?? (await nextRoundNumber(ctx.db, cycle.id)),
    proposals: pairings.length,
    messages: pairings.length * (cycle.askFirst === 'both' ? 2 : 1) + report.leftOut.length,
    askFirst: cycle.askFirst,
    pairings: pairings.map((row) => ({
      mentee: row.menteeApplicationId,
      menteeName: nameOf(row.menteeApplicationId),
      mentor: row.mentorApplicationId,
      mentorName: nameOf(row.mentorApplicationId),
      fit: row.fit,
    })),
    leftOut: report.leftOut.map((key) => ({
      applicationId: key,
      name: nameOf(key),
      told: toldReason(report.leftOutBecause[key]?.shortage ?? null, finished),
    })),
    answersDueAt: answersDue(cycle.answersDueOn, association.timeZone, ctx.now()).toISOString(),
    changedSince: changes,
    refusal:
      refusalOf(listed.round, cycle.phase, changes) ??
      approvalRefusal(cycle.needsApproval, approval, actorOf(ctx).personId),
    approval: {
      needed: cycle.needsApproval,
      by: approval?.name ?? null,
      mayApprove: cycle.needsApproval && !approval && listed.run.requestedBy !== actorOf(ctx).personId,
    },
    version: cycle.version,
  };
}

function approvalRefusal(needed: boolean, approval: { personId: string } | null, reader: string): string | null {
  if (!needed) return null;
  if (!approval) return 'A second coordinator has to approve this plan before it is published.';
  return approval.personId === reader ? 'You approved this plan; another coordinator publishes it.' : null;
}

function refusalOf(round: number | null, phase: string, changes: PublishReview['changedSince']): string | null {
  if (round !== null) return `This plan was published as round ${round}; what was published stays as it is.`;
  if (!['matching', 'responses', 'under-way'].includes(phase))
    return 'Plans are published while the cycle is in matching, or later for a repair round.';
  const blocking = changes.filter((change) => change.blocks);
  return blocking.length === 0 ? null : `${blocking.map((change) => change.text).join('. ')}. Run the matching again.`;
}
