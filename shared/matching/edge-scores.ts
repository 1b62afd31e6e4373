/** Scores of every eligible pair by criterion, for questions that weigh them anew. */
import type { PairingProblem } from '../assignment';
import type { Judge } from './build-problem';
import { CRITERIA } from './catalogue';
import { MISSING } from './criteria';

export interface EdgeScores {
  /** One array a criterion, in their order: 0..1, missing data as a half; parallel to `problem.target`. */
  byCriterion: Float32Array[];
  /** Normalised weights in the same order. */
  shares: Float64Array;
}

/** Time and memory O(pairs × criteria). */
export function edgeScores(problem: PairingProblem, judge: Judge): EdgeScores {
  const byCriterion = judge.criteria.map(() => new Float32Array(problem.target.length));
  for (let i = 0; i < problem.menteeCount; i++) {
    for (let edge = problem.rowStart[i]!; edge < problem.rowStart[i + 1]!; edge++) {
      judge.criteria.forEach((criterion, k) => {
        const score = criterion.score(i, problem.target[edge]!);
        byCriterion[k]![edge] = score === MISSING ? 0.5 : score;
      });
    }
  }
  return { byCriterion, shares: Float64Array.from(judge.criteria, (criterion) => criterion.share) };
}

/** Fits with each share multiplied by its factor, the mentee's bonus included; parallel to `problem.target`. */
export function reweighted(
  problem: PairingProblem,
  scores: EdgeScores,
  factors: Float64Array,
  bonus: Int32Array,
): Int32Array {
  const weights = scores.shares.map((share, k) => share * factors[k]!);
  const total = weights.reduce((sum, weight) => sum + weight, 0) || 1;
  const fit = new Int32Array(problem.target.length);
  for (let i = 0; i < problem.menteeCount; i++) {
    for (let edge = problem.rowStart[i]!; edge < problem.rowStart[i + 1]!; edge++) {
      let sum = 0;
      for (let k = 0; k < weights.length; k++) sum += weights[k]! * scores.byCriterion[k]![edge]!;
      fit[edge] = Math.round((10_000 * sum) / total) + bonus[i]!;
    }
  }
  return fit;
}

/** Fits as one side sees them: by the criteria that speak of that side's wishes, and those of both. */
export function fitsOfSide(
  problem: PairingProblem,
  judge: Judge,
  scores: EdgeScores,
  side: 'mentee' | 'mentor',
): Int32Array {
  const factors = Float64Array.from(judge.criteria, (criterion) => {
    const speaksOf = CRITERIA[criterion.key].side;
    return speaksOf === side || speaksOf === 'both' ? 1 : 0;
  });
  return reweighted(problem, scores, factors, new Int32Array(problem.menteeCount));
}
