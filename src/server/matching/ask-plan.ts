import type { Alternatives, DecisionPrice, PairReasons, ProofArrays } from '../../../shared/matching/runs-contract';
import type { Forecast, RuleEffects } from '../../../shared/matching/effects-contract';
import type { MatchingInput } from '../../../shared/matching/matching-input';
import type { MatchingSettings } from '../../../shared/matching/matching-contract';
import { findCycle } from '../cycles';
import { inTransaction, notFound, Problem, type Context } from '../platform';
import { listApplicants } from './cycle-facts-queries';
import { freeze } from './gather-queries';
import { gatherInput } from './gather-input';
import { questionThread } from './matching-thread';
import type { PlanOf } from './matching-tasks';
import { findRun, findRunInput, findRunPlan } from './runs-queries';
import { zipped } from './zipped';

async function planOf(ctx: Context, runId: string): Promise<PlanOf> {
  const run = await findRun(ctx.db, runId);
  if (!run) throw notFound('run');
  const [input, plan] = [await findRunInput(ctx.db, runId), await findRunPlan(ctx.db, runId)];
  if (!input || !plan) throw new Problem('conflict', `Run ${run.number} has no plan`);
  return { runId, input, plan };
}

/** For one mentee: all eligible mentors, and what choosing each would cost the plan. */
export async function showAlternatives(ctx: Context, runId: string, mentee: string): Promise<Alternatives> {
  const of = await planOf(ctx, runId);
  const found = await questionThread(ctx.settings.root).ask<'alternatives'>({ kind: 'alternatives', of, mentee });
  if (!found) throw notFound('mentee in this run');
  const run = await findRun(ctx.db, runId);
  const names = new Map((await listApplicants(ctx.db, run!.cycleId)).map((each) => [each.applicationId, each.name]));
  return {
    ...found,
    options: found.options.map((option) => ({ ...option, name: names.get(option.mentor) ?? 'Erased' })),
  };
}

/** For any two people of a run: may they be paired, why not, and how well they fit. */
export async function showReasons(ctx: Context, runId: string, mentee: string, mentor: string): Promise<PairReasons> {
  const of = await planOf(ctx, runId);
  const found = await questionThread(ctx.settings.root).ask<'reasons'>({ kind: 'reasons', of, mentee, mentor });
  if (!found) throw notFound('pair in this run');
  return found;
}

export async function showPrice(
  ctx: Context,
  runId: string,
  { mentee, mentor }: { mentee: string; mentor: string },
  decision: 'lock' | 'bar',
): Promise<DecisionPrice> {
  const of = await planOf(ctx, runId);
  const found = await questionThread(ctx.settings.root).ask<'price'>({ kind: 'price', of, mentee, mentor, decision });
  if (!found) throw notFound('pair in this run');
  return found;
}

export async function showProof(ctx: Context, runId: string): Promise<ProofArrays> {
  return questionThread(ctx.settings.root).ask<'proof'>({ kind: 'proof', of: await planOf(ctx, runId) });
}

/** What these settings would do to the applicants as they are now. */
export async function showEffects(ctx: Context, cycleId: string, settings: MatchingSettings): Promise<RuleEffects> {
  const input = zipped(await gatherNow(ctx, cycleId, settings));
  return questionThread(ctx.settings.root).ask<'effects'>({ kind: 'effects', input });
}

/** Where places would be short if applications closed now. */
export async function showForecast(ctx: Context, cycleId: string): Promise<Forecast> {
  const input = zipped(await gatherNow(ctx, cycleId, null));
  return questionThread(ctx.settings.root).ask<'forecast'>({ kind: 'forecast', input });
}

async function gatherNow(ctx: Context, cycleId: string, settings: MatchingSettings | null): Promise<MatchingInput> {
  const cycle = await findCycle(ctx.db, cycleId);
  if (!cycle) throw notFound('cycle');
  return inTransaction(ctx, async (tx) => {
    await freeze(tx.db);
    return gatherInput(tx.db, cycle, settings ?? cycle.settings);
  });
}
