import { AssignmentInputError } from './problem';
import { seededRandom } from './seeded-random';

/** How far each weight may move, as a share of itself. */
const SPREAD = 0.2;

/**
 * Share of runs, from 0 to 1, in which each mentee keeps the partner of `base` (or stays left out) when the weights of the
 * criteria are not quite what they were.
 *
 * Each run draws one factor a criterion, uniform in [0.8, 1.2), from a generator that the seed fixes, and hands them to
 * `solveReweighted`, which multiplies the weights by them, computes the fits anew, solves and returns the mentor of each
 * mentee (−1 when left out). The array of factors is reused by the next run. Throws AssignmentInputError for fewer than one
 * run and for an answer of another length.
 */
export function steadiness(
  runs: number,
  seed: number,
  solveReweighted: (weights: Float64Array) => Int32Array,
  criterionCount: number,
  base: Int32Array,
): Float64Array {
  if (!Number.isSafeInteger(runs) || runs < 1)
    throw new AssignmentInputError('runs', null, `${runs} is not a number of runs`);
  const random = seededRandom(seed);
  const stays = new Float64Array(base.length);
  const factors = new Float64Array(criterionCount);
  for (let run = 0; run < runs; run++) {
    for (let criterion = 0; criterion < criterionCount; criterion++) {
      factors[criterion] = 1 - SPREAD + 2 * SPREAD * random();
    }
    const mentorOf = solveReweighted(factors);
    if (mentorOf.length !== base.length) {
      throw new AssignmentInputError('solveReweighted', run, `${mentorOf.length} mentees, expected ${base.length}`);
    }
    for (let mentee = 0; mentee < base.length; mentee++) if (mentorOf[mentee] === base[mentee]) stays[mentee]!++;
  }
  return stays.map((count) => count / runs);
}
