import { Alternating, startOf } from './alternating';
import { findEdge, type Pair, type PairingPlan, type PairingProblem, type SolveOptions } from './problem';

/**
 * Small changes and how many more mentees each would pair. All gains are exact differences between largest pairings, found by
 * growing the plan's own pairing along alternating paths. Time O(pairs) each, and O(pairs) more for every mentee gained.
 */

/** 1 for each mentor whose taking one more would pair one more: those whom somebody left out reaches. */
export function mentorsWhosePlaceHelps(
  problem: PairingProblem,
  plan: PairingPlan,
  options: SolveOptions = {},
): Uint8Array {
  const { reduced, start } = startOf(problem, plan, options);
  const paths = new Alternating(reduced.problem, start);
  paths.grow();
  return paths.reach(paths.free()).mentors;
}

/** How many more could be paired if each of these mentors took one more. */
export function gainFromPlaces(
  problem: PairingProblem,
  plan: PairingPlan,
  mentors: readonly number[],
  options: SolveOptions = {},
): number {
  const { reduced, largest } = largestFrom(problem, plan, options);
  const capacity = reduced.problem.capacity.slice();
  for (const mentor of mentors) capacity[mentor]!++;
  return new Alternating(reduced.problem, largest, capacity).grow();
}

/**
 * How many more could be paired among the pairs of a wider problem (same sides, more pairs: one rule dropped), and through
 * which of the new pairs.
 */
export function gainFromPairs(
  problem: PairingProblem,
  plan: PairingPlan,
  wider: PairingProblem,
  options: SolveOptions = {},
): { gain: number; pairs: Pair[] } {
  const { largest } = largestFrom(problem, plan, options);
  const { reduced } = startOf(wider, plan, options);
  const paths = new Alternating(reduced.problem, largest);
  const gain = paths.grow();
  const pairs: Pair[] = [];
  paths.mentorOf.forEach((mentor, index) => {
    const mentee = reduced.menteeOf[index]!;
    if (mentor >= 0 && findEdge(problem, mentee, mentor) < 0) pairs.push([mentee, mentor]);
  });
  return { gain, pairs };
}

/** How many more could be paired if this lock were released; its pair stays eligible. */
export function gainWithoutLock(
  problem: PairingProblem,
  plan: PairingPlan,
  lock: Pair,
  options: SolveOptions = {},
): number {
  const isLock = ([mentee, mentor]: Pair): boolean => mentee === lock[0] && mentor === lock[1];
  const { largest, reduced } = largestFrom(problem, plan, options);
  const freed = startOf(problem, plan, {
    ...options,
    locked: options.locked?.filter((pair) => !isLock(pair)),
    overridden: options.overridden?.filter((pair) => !isLock(pair)),
  });
  // The largest pairing under the lock, the lock's own pair beside it, is where the search goes on.
  freed.start.forEach((_, index) => {
    const locked = reduced.reducedMenteeOf[freed.reduced.menteeOf[index]!]!;
    freed.start[index] = locked < 0 ? lock[1] : largest[locked]!;
  });
  return new Alternating(freed.reduced.problem, freed.start).grow();
}

/** How many more could be paired by one new mentor with this many places, whom exactly these mentees could have. */
export function gainFromNewMentor(
  problem: PairingProblem,
  plan: PairingPlan,
  mentees: readonly number[],
  places: number,
  options: SolveOptions = {},
): number {
  const { reduced, largest } = largestFrom(problem, plan, options);
  const eligible = mentees.map((mentee) => reduced.reducedMenteeOf[mentee]!).filter((index) => index >= 0);
  return new Alternating(reduced.problem, largest, reduced.problem.capacity, { mentees: eligible, places }).grow();
}

function largestFrom(problem: PairingProblem, plan: PairingPlan, options: SolveOptions) {
  const { reduced, start } = startOf(problem, plan, options);
  const paths = new Alternating(reduced.problem, start);
  paths.grow();
  return { reduced, largest: paths.mentorOf };
}
