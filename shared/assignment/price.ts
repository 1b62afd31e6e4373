import {
  AssignmentInputError,
  assertProblem,
  findEdge,
  type Pair,
  type PairingPlan,
  type PairingProblem,
  type SolveOptions,
} from './problem';
import { Residual, type Price } from './residual';
import { solve } from './solve';

export type { Price } from './residual';

/** A pairing to be made whatever it costs, or one to be ruled out; both together are solved again. */
export interface Change {
  force?: Pair | undefined;
  bar?: Pair | undefined;
}

/**
 * Net fit that would be lost if this mentee got each mentor of its row, parallel to the row in `problem.target`, with as many
 * paired as in the plan. 0 for the partner in the plan and for those as good; −1 where it cannot be done without losing a
 * pair, or not at all. Never less than −1: where the weakest are lifted and a choice gains net fit, it is 0.
 */
export function priceOfPartner(
  problem: PairingProblem,
  plan: PairingPlan,
  mentee: number,
  options: SolveOptions = {},
): Int32Array {
  return Int32Array.from(pricesOfPartners(problem, plan, mentee, options), (price) =>
    price === null || price.pairsLost > 0 ? -1 : Math.max(0, price.fitLost),
  );
}

/**
 * What it would cost if this mentee got each mentor of its row, parallel to the row in `problem.target`; null where that cannot
 * be: the pair is barred or below the floor, or locks hold all the mentor's places.
 *
 * Each price is the exact difference to solving again with the pair locked, all of them from one search over the plan's
 * residual graph, O(pairs · log mentors). Under `lift-the-weakest` each is solved again, and net fit may be gained where the
 * weakest fit falls. Throws AssignmentInputError for a mentee who is locked or does not exist, and for a plan that is not
 * the best under these options.
 */
export function pricesOfPartners(
  problem: PairingProblem,
  plan: PairingPlan,
  mentee: number,
  options: SolveOptions = {},
): (Price | null)[] {
  assertUnlocked(problem, mentee, options, 'mentee');
  const row = [...problem.target.subarray(problem.rowStart[mentee], problem.rowStart[mentee + 1])];
  if (options.aim === 'lift-the-weakest') {
    return row.map((mentor) =>
      canForce(problem, [mentee, mentor], options)
        ? solvedAgain(problem, plan, { force: [mentee, mentor] }, options)
        : null,
    );
  }
  const residual = new Residual(problem, plan, options);
  const { reducedMenteeOf, problem: inner } = residual.reduced;
  const own = reducedMenteeOf[mentee]!;
  const distance = residual.distancesTo(residual.position[own]!);
  return row.map((mentor) => {
    const edge = findEdge(inner, own, mentor);
    const loss = edge < 0 ? Infinity : residual.slack(own, edge) + distance[mentor]!;
    return loss === Infinity ? null : residual.priceOf(loss);
  });
}

/**
 * What it would cost to force a pair, or to bar one: the exact difference to solving again. One search; see pricesOfPartners.
 * Throws AssignmentInputError where solving again would, and for locked mentees.
 */
export function priceOfChoice(
  problem: PairingProblem,
  plan: PairingPlan,
  change: Change,
  options: SolveOptions = {},
): Price {
  const { force, bar } = change;
  if (force) assertUnlocked(problem, force[0], options, 'change.force');
  if (bar) assertUnlocked(problem, bar[0], options, 'change.bar');
  if (options.aim === 'lift-the-weakest' || (force && bar)) return solvedAgain(problem, plan, change, options);
  if (force) {
    const edge = findEdge(problem, ...force);
    const price =
      edge < 0 ? null : pricesOfPartners(problem, plan, force[0], options)[edge - problem.rowStart[force[0]]!];
    if (price) return price;
    throw new AssignmentInputError('change.force', null, `pair (${force.join(', ')}) cannot be had`);
  }
  const residual = new Residual(problem, plan, options);
  if (!bar || plan.mentorOf[bar[0]] !== bar[1]) return { pairsLost: 0, fitLost: 0 };
  const mentee = residual.reduced.reducedMenteeOf[bar[0]]!;
  return residual.priceOf(lossesWithout(residual, bar[1], [mentee])[0]!);
}

/**
 * What it would cost to bar each mentee's pairing, parallel to the mentees; null for those left out or locked. Pairings that
 * cost little to bar have a good alternative. One search for each mentor with mentees; see pricesOfPartners.
 */
export function priceOfBarring(
  problem: PairingProblem,
  plan: PairingPlan,
  options: SolveOptions = {},
): (Price | null)[] {
  const report = options.onProgress ?? (() => {});
  const prices = new Array<Price | null>(problem.menteeCount).fill(null);
  if (options.aim === 'lift-the-weakest') {
    const locked = new Set((options.locked ?? []).map(([mentee]) => mentee));
    return prices.map((_, mentee) => {
      report(mentee / problem.menteeCount);
      const mentor = plan.mentorOf[mentee]!;
      return mentor < 0 || locked.has(mentee) ? null : solvedAgain(problem, plan, { bar: [mentee, mentor] }, options);
    });
  }
  const residual = new Residual(problem, plan, options);
  residual.sortArcs();
  const menteesAt: number[][] = Array.from(residual.load, () => []);
  residual.position.forEach((mentor, mentee) => menteesAt[mentor]?.push(mentee));
  menteesAt.forEach((mentees, mentor) => {
    report(mentor / problem.mentorCount);
    const losses = lossesWithout(residual, mentor, mentees);
    mentees.forEach((mentee, index) => {
      prices[residual.reduced.menteeOf[mentee]!] = residual.priceOf(losses[index]!);
    });
  });
  return prices;
}

/**
 * What the aim loses when each of these mentees, one at a time, may not be with the mentor they all have: the least over where
 * they might go instead, nobody included. The search ends when no place farther away can be better for any of them.
 */
function lossesWithout(residual: Residual, mentor: number, mentees: readonly number[]): number[] {
  const losses = mentees.map(() => Infinity);
  if (mentees.length === 0) return losses;
  const { problem } = residual.reduced;
  residual.distancesTo(mentor, (node, distance) => {
    if (node === mentor) return Infinity;
    let greatest = 0;
    for (let index = 0; index < mentees.length; index++) {
      const mentee = mentees[index]!;
      if (node === residual.root) losses[index] = Math.min(losses[index]!, residual.menteePrice(mentee) + distance);
      else if (distance < losses[index]!) {
        const edge = findEdge(problem, mentee, node);
        if (edge >= 0) losses[index] = Math.min(losses[index]!, residual.slack(mentee, edge) + distance);
      }
      greatest = Math.max(greatest, losses[index]!);
    }
    return greatest;
  });
  return losses;
}

function solvedAgain(problem: PairingProblem, plan: PairingPlan, { force, bar }: Change, options: SolveOptions): Price {
  const again = solve(problem, {
    ...options,
    locked: [...(options.locked ?? []), ...(force ? [force] : [])],
    barred: [...(options.barred ?? []), ...(bar ? [bar] : [])],
    onProgress: undefined,
  });
  return {
    pairsLost: plan.paired - again.paired,
    fitLost: plan.totalFit - plan.totalCharge - (again.totalFit - again.totalCharge),
  };
}

function canForce(problem: PairingProblem, [mentee, mentor]: Pair, options: SolveOptions): boolean {
  const { locked = [], barred = [], floor = 0 } = options;
  const free = problem.capacity[mentor]! - locked.filter(([, other]) => other === mentor).length;
  const isBarred = barred.some(([one, other]) => one === mentee && other === mentor);
  return free > 0 && !isBarred && problem.fit[findEdge(problem, mentee, mentor)]! >= floor;
}

function assertUnlocked(problem: PairingProblem, mentee: number, options: SolveOptions, field: string): void {
  assertProblem(problem);
  if (!Number.isInteger(mentee) || mentee < 0 || mentee >= problem.menteeCount) {
    throw new AssignmentInputError(field, null, `mentee ${mentee} does not exist`);
  }
  if (options.locked?.some(([locked]) => locked === mentee)) {
    throw new AssignmentInputError(field, null, `mentee ${mentee} is locked; release the lock to ask for a price`);
  }
}
