import { largestPairing } from './cardinality';
import { maximize } from './network-simplex';
import {
  assertProblem,
  chargeForLoad,
  lexicographicScale,
  pairBound,
  type Aim,
  type LiftWitness,
  type Method,
  type PairingPlan,
  type PairingProblem,
  type SolveOptions,
} from './problem';
import { reduceProblem, type ReducedProblem } from './reduction';
import type { Objective, SpanningTree } from './spanning-tree';

/**
 * The best plan for the aim, subject to locks, bars and floor, with the prices that prove it.
 *
 * Exact: whole numbers throughout. The same problem always gives the same plan. Throws AssignmentInputError for input that
 * breaks the contract and for contradicting options; whatever `onProgress` throws abandons the work.
 */
export function solve(problem: PairingProblem, options: SolveOptions = {}): PairingPlan {
  assertProblem(problem);
  const reduced = reduceProblem(problem, options);
  const objective = objectiveOf(problem, reduced.aim);
  const report = options.onProgress ?? (() => {});
  if (reduced.aim === 'lift-the-weakest') {
    const { lift, problem: above } = liftWeakest(reduced, () => report(0));
    return planOf(problem, reduced, objective, maximize(above, objective, report), lift);
  }
  return planOf(problem, reduced, objective, maximize(reduced.problem, objective, report));
}

/**
 * The whole-number objective of an aim: M for a pair where pairs come first, and for the best total a scale on fit so that
 * a pair more only breaks ties. Taken from the problem as given, so that locks and bars do not change it.
 */
export function objectiveOf(problem: PairingProblem, aim: Aim): Objective {
  const perPair = lexicographicScale(problem);
  return aim === 'best-total' ? { perPair: 1, perFit: pairBound(problem) + 1 } : { perPair, perFit: 1 };
}

/** The highest threshold at which as many can still be paired, by halving the interval of fits that occur. */
function liftWeakest(reduced: ReducedProblem, tick: () => void): { lift: LiftWitness; problem: PairingProblem } {
  const { problem } = reduced;
  const largest = largestPairing(problem, 0, tick);
  const fits = [...new Set(problem.fit)].sort((a, b) => a - b);
  let low = 0;
  let high = largest.size === 0 ? 0 : fits.length - 1;
  while (low < high) {
    const middle = (low + high + 1) >>> 1;
    if (largestPairing(problem, fits[middle], tick).size === largest.size) low = middle;
    else high = middle - 1;
  }
  const threshold = largest.size === 0 ? 0 : fits[low]!;
  const smaller = largestPairing(problem, threshold + 1, tick);
  const inOriginal = ({ mentees, mentors }: LiftWitness['cardinalityCover']): LiftWitness['cardinalityCover'] => ({
    mentees: mentees.map((mentee) => reduced.menteeOf[mentee]!),
    mentors,
  });
  return {
    lift: {
      threshold,
      cardinalityCover: inOriginal(largest.cover),
      thresholdCover: inOriginal(smaller.cover),
    },
    problem: reduceProblem(problem, { floor: threshold }).problem,
  };
}

function planOf(
  problem: PairingProblem,
  reduced: ReducedProblem,
  objective: Objective,
  tree: SpanningTree,
  lift?: LiftWitness,
): PairingPlan {
  const mentorOf = reduced.lockedMentor.slice();
  const menteePrice = new Float64Array(problem.menteeCount);
  let paired = reduced.lockedPairs;
  let totalFit = reduced.lockedFit;
  let weakestFit = reduced.lockedWeakest;
  for (let index = 0; index < reduced.menteeOf.length; index++) {
    const mentee = reduced.menteeOf[index]!;
    menteePrice[mentee] = tree.worth(index) + objective.perPair;
    if (tree.mate[index] === tree.root) continue;
    const fit = tree.mateWeight[index]! / objective.perFit;
    mentorOf[mentee] = tree.mate[index]!;
    paired++;
    totalFit += fit;
    weakestFit = Math.min(weakestFit, fit);
  }
  let totalCharge = reduced.lockedCharge;
  for (let mentor = 0; mentor < problem.mentorCount; mentor++) {
    totalCharge += chargeForLoad(reduced.problem, mentor, tree.load[mentor]!);
  }
  return {
    aim: reduced.aim,
    method: methodOf(reduced.aim, paired === problem.menteeCount),
    mentorOf,
    paired,
    totalFit,
    totalCharge,
    weakestFit: paired === 0 ? 0 : weakestFit,
    menteePrice,
    mentorPrice: mentorPrices(reduced.problem, tree, objective),
    lift,
  };
}

/** How a plan of this aim came about; see Method. */
export function methodOf(aim: Aim, everyoneIsPaired: boolean): Method {
  if (aim === 'best-total') return 'best-total';
  return everyoneIsPaired ? 'complete' : 'cardinality-first';
}

/** A mentor without places gets a price that no pair can pay. */
function mentorPrices(problem: PairingProblem, tree: SpanningTree, objective: Objective): Float64Array {
  let largestFit = 0;
  for (let edge = 0; edge < problem.fit.length; edge++) largestFit = Math.max(largestFit, problem.fit[edge]!);
  const unpayable = objective.perPair + objective.perFit * largestFit;
  return Float64Array.from(tree.price.subarray(0, problem.mentorCount), (price) =>
    price === Infinity ? unpayable : price,
  );
}
