import type { PairingPlan, PairingProblem, SolveOptions } from './problem';
import { reduceProblem } from './reduction';

/** Fit of the weakest unlocked pairing of a mentor who has none: nobody is better. */
const NO_OTHER = 2 ** 31 - 1;

/**
 * Blocking pairs: unlocked, eligible pairs of people who would each rather have the other than what the plan gives them, a
 * mentor with a free place rather having anybody (Gale and Shapley 1962, College Admissions and the Stability of Marriage).
 * `menteeFit` and `mentorFit` say how each side sees a pair, parallel to `problem.target`. A plan that serves everyone
 * together need not be stable; 0 = stable. Time O(pairs).
 */
export function blockingPairs(
  problem: PairingProblem,
  plan: PairingPlan,
  menteeFit: Int32Array,
  mentorFit: Int32Array,
  options: SolveOptions = {},
): number {
  const { lockedMentor } = reduceProblem(problem, options);
  const barred = new Set((options.barred ?? []).map(([mentee, mentor]) => mentee * problem.mentorCount + mentor));
  const { rowStart, target, fit, menteeCount, mentorCount, capacity } = problem;
  const ownFit = new Int32Array(menteeCount).fill(-1);
  const weakestOf = new Int32Array(mentorCount).fill(NO_OTHER);
  const load = new Int32Array(mentorCount);
  for (let mentee = 0; mentee < menteeCount; mentee++) {
    for (let edge = rowStart[mentee]!; edge < rowStart[mentee + 1]!; edge++) {
      const mentor = target[edge]!;
      if (plan.mentorOf[mentee] !== mentor) continue;
      ownFit[mentee] = menteeFit[edge]!;
      load[mentor]!++;
      // A locked pairing cannot be left for another.
      if (lockedMentor[mentee]! < 0) weakestOf[mentor] = Math.min(weakestOf[mentor]!, mentorFit[edge]!);
    }
  }
  let blocking = 0;
  for (let mentee = 0; mentee < menteeCount; mentee++) {
    if (lockedMentor[mentee]! >= 0) continue;
    for (let edge = rowStart[mentee]!; edge < rowStart[mentee + 1]!; edge++) {
      const mentor = target[edge]!;
      if (plan.mentorOf[mentee] === mentor || fit[edge]! < (options.floor ?? 0)) continue;
      if (barred.has(mentee * mentorCount + mentor) || menteeFit[edge]! <= ownFit[mentee]!) continue;
      const mentorWould =
        load[mentor]! < capacity[mentor]! || (load[mentor]! > 0 && mentorFit[edge]! > weakestOf[mentor]!);
      if (mentorWould) blocking++;
    }
  }
  return blocking;
}
