import type { PairingProblem } from './problem';
import type { SpanningTree } from './spanning-tree';

/** Pairs kept per mentee. Rows up to `CORE_PAIRS` times `WORTH_KEEPING_WHOLE` are kept whole. */
const CORE_PAIRS = 16;
const WORTH_KEEPING_WHOLE = 4;
const PAIRS_PER_TICK = 500_000;

/** Some of the pairs of a problem, in the same form. */
export type Core = Pick<PairingProblem, 'rowStart' | 'target' | 'fit'>;

/** The pairs worth pricing at first: all of them where rows are short. */
export function coreOf(problem: PairingProblem, tree: SpanningTree, tick: () => void): Core {
  const { rowStart, menteeCount, target } = problem;
  if (target.length <= menteeCount * CORE_PAIRS * WORTH_KEEPING_WHOLE) return problem;
  const start = new Int32Array(menteeCount + 1);
  for (let mentee = 0; mentee < menteeCount; mentee++) {
    const length = rowStart[mentee + 1]! - rowStart[mentee]!;
    start[mentee + 1] = start[mentee]! + Math.min(CORE_PAIRS, length);
  }
  const pairs = start[menteeCount]!;
  const core = { rowStart: start, target: new Int32Array(pairs), fit: new Int32Array(pairs) };
  restOf(problem, tree, core, tick);
  return core;
}

/** Renews the core with each mentee's best pairs at the tree's prices; null when no pair of the problem gains anything. */
export function restOf(problem: PairingProblem, tree: SpanningTree, core: Core, tick: () => void): Core | null {
  const { rowStart, target, fit, menteeCount } = problem;
  const { price } = tree;
  const { perFit } = tree.objective;
  const best = new Float64Array(CORE_PAIRS);
  let gains = false;
  let scanned = 0;
  for (let mentee = 0; mentee < menteeCount; mentee++) {
    const start = rowStart[mentee]!;
    const length = rowStart[mentee + 1]! - start;
    const kept = core.rowStart[mentee]!;
    const stride = strideFor(length);
    let size = 0;
    let least = -Infinity;
    let leastAt = 0;
    let position = 0;
    for (let count = 0; count < length; count++) {
      const edge = start + position;
      // a scattered order, because values that rise along the row would each displace one
      position += stride;
      if (position >= length) position -= length;
      const value = fit[edge]! * perFit - price[target[edge]!]!;
      if (size === CORE_PAIRS && value <= least) continue;
      const slot = size < CORE_PAIRS ? size++ : leastAt;
      best[slot] = value;
      core.target[kept + slot] = target[edge]!;
      core.fit[kept + slot] = fit[edge]!;
      if (size < CORE_PAIRS) continue;
      least = best[0]!;
      leastAt = 0;
      for (let other = 1; other < CORE_PAIRS; other++) {
        if (best[other]! < least) {
          least = best[other]!;
          leastAt = other;
        }
      }
    }
    const worth = tree.worth(mentee);
    for (let slot = 0; slot < size; slot++) if (best[slot]! > worth) gains = true;
    scanned += length;
    if (scanned > PAIRS_PER_TICK) {
      scanned = 0;
      tick();
    }
  }
  return gains ? core : null;
}

/** A step that visits every place of a row once, near the golden section of its length. */
function strideFor(length: number): number {
  let stride = Math.max(1, Math.floor(length * 0.618));
  while (greatestCommonDivisor(stride, length) !== 1) stride++;
  return stride;
}

function greatestCommonDivisor(a: number, b: number): number {
  return b === 0 ? a : greatestCommonDivisor(b, a % b);
}
