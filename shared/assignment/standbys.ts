import {
  AssignmentInputError,
  chargeOf,
  type Pair,
  type PairingPlan,
  type PairingProblem,
  type SolveOptions,
} from './problem';
import { reduceProblem } from './reduction';
import { solve } from './solve';

/**
 * For each paired mentee the mentor who could step in at once if theirs declines, with the fit of that pair: of the eligible
 * mentors with a place that the plan leaves free, the one of the greatest fit less that place's charge (the lower index among
 * equals). −1 in both for mentees left out and where there is no such mentor. Bars and floor hold. Two mentees may have the
 * same standby. O(pairs).
 */
export function standbys(
  problem: PairingProblem,
  plan: PairingPlan,
  options: SolveOptions = {},
): { mentor: Int32Array; fit: Int32Array } {
  // a locked mentee needs a standby like any other, so locks are not contracted
  const { problem: open } = reduceProblem(problem, { floor: options.floor, barred: options.barred });
  const load = new Int32Array(problem.mentorCount);
  for (const mentor of plan.mentorOf) if (mentor >= 0) load[mentor]!++;
  const mentor = new Int32Array(problem.menteeCount).fill(-1);
  const fit = new Int32Array(problem.menteeCount).fill(-1);
  for (let mentee = 0; mentee < problem.menteeCount; mentee++) {
    if (plan.mentorOf[mentee]! < 0) continue;
    let best = -Infinity;
    for (let edge = open.rowStart[mentee]!; edge < open.rowStart[mentee + 1]!; edge++) {
      const other = open.target[edge]!;
      if (other === plan.mentorOf[mentee] || load[other]! >= problem.capacity[other]!) continue;
      const netFit = open.fit[edge]! - chargeOf(problem, other, load[other]!);
      if (netFit <= best) continue;
      best = netFit;
      mentor[mentee] = other;
      fit[mentee] = open.fit[edge]!;
    }
  }
  return { mentor, fit };
}

/**
 * The best plan without one of the plan's pairings: that pair barred, its lock released where it had one, everything else
 * free to move within the options. Throws AssignmentInputError when the pair is not in the plan.
 */
export function repairWithout(
  problem: PairingProblem,
  plan: PairingPlan,
  [mentee, mentor]: Pair,
  options: SolveOptions = {},
): PairingPlan {
  if (mentor < 0 || plan.mentorOf[mentee] !== mentor) {
    throw new AssignmentInputError('pair', null, `(${mentee}, ${mentor}) is not in the plan`);
  }
  const others = (pairs: readonly Pair[] = []): Pair[] => pairs.filter(([one]) => one !== mentee);
  return solve(problem, {
    ...options,
    locked: others(options.locked),
    overridden: others(options.overridden),
    barred: [...(options.barred ?? []), [mentee, mentor]],
  });
}
