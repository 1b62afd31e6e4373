import { describe, expect, it } from 'vitest';
import { chargeOf, problemFromMatrix, solve } from './index';
import type { PairingProblem, SolveOptions } from './index';
import { randomOptions, randomProblem } from './random-problems';
import { tradeOff, type TradeOffPoint } from './trade-off';

/** Greatest net fit for each number of pairs, over all plans, each of them tried. */
function bruteForce(problem: PairingProblem, { floor = 0, barred = [], locked = [] }: SolveOptions): number[] {
  const load = new Int32Array(problem.mentorCount);
  const best: number[] = [];
  const extend = (mentee: number, pairs: number, netFit: number): void => {
    if (mentee === problem.menteeCount) {
      best[pairs] = Math.max(best[pairs] ?? -Infinity, netFit);
      return;
    }
    const lock = locked.find(([who]) => who === mentee)?.[1];
    if (lock === undefined) extend(mentee + 1, pairs, netFit);
    for (let edge = problem.rowStart[mentee]!; edge < problem.rowStart[mentee + 1]!; edge++) {
      const mentor = problem.target[edge]!;
      if (lock !== undefined && lock !== mentor) continue;
      if (problem.fit[edge]! < floor || load[mentor]! >= problem.capacity[mentor]!) continue;
      if (barred.some(([one, other]) => one === mentee && other === mentor)) continue;
      const charge = chargeOf(problem, mentor, load[mentor]!++);
      extend(mentee + 1, pairs + 1, netFit + problem.fit[edge]! - charge);
      load[mentor]!--;
    }
  };
  extend(0, 0, 0);
  return best;
}

function expectConcave(curve: readonly TradeOffPoint[]): void {
  for (let point = 2; point < curve.length; point++) {
    const gain = curve[point]!.netFit - curve[point - 1]!.netFit;
    expect(gain).toBeLessThanOrEqual(curve[point - 1]!.netFit - curve[point - 2]!.netFit);
  }
}

describe('the trade-off curve', () => {
  it('weighs a second place against a worse mentor without one', () => {
    const problem = problemFromMatrix(
      [
        [500, null],
        [500, null],
        [400, 250],
      ],
      { capacity: [2, 1], loadCharge: [0, 300] },
    );
    expect(tradeOff(problem)).toEqual([
      { pairs: 0, netFit: 0, totalFit: 0, weakestFit: 0 },
      { pairs: 1, netFit: 500, totalFit: 500, weakestFit: 500 },
      { pairs: 2, netFit: 750, totalFit: 750, weakestFit: 250 },
      { pairs: 3, netFit: 950, totalFit: 1250, weakestFit: 250 },
    ]);
  });

  it('falls where one pair more costs the others more than it brings', () => {
    const problem = problemFromMatrix([
      [900, null],
      [1000, 50],
    ]);
    expect(tradeOff(problem).map(({ netFit }) => netFit)).toEqual([0, 1000, 950]);
  });

  it('starts at the locks, and is one point when nobody can be paired', () => {
    const problem = problemFromMatrix([
      [9, 6],
      [8, 7],
    ]);
    expect(tradeOff(problem, { locked: [[1, 0]] })).toEqual([
      { pairs: 1, netFit: 8, totalFit: 8, weakestFit: 8 },
      { pairs: 2, netFit: 14, totalFit: 14, weakestFit: 6 },
    ]);
    const nobody = { pairs: 0, netFit: 0, totalFit: 0, weakestFit: 0 };
    expect(tradeOff(problemFromMatrix([]))).toEqual([nobody]);
    expect(tradeOff(problem, { floor: 10 })).toEqual([nobody]);
  });

  it('equals the best of all plans of each size, each tried', () => {
    for (let seed = 1; seed <= 2000; seed++) {
      const problem = randomProblem(seed, 6);
      const options = randomOptions(problem, seed);
      const from = options.locked?.length ?? 0;
      const curve = tradeOff(problem, options);
      expect(curve.map(({ pairs }) => pairs)).toEqual(curve.map((_, index) => from + index));
      expect(
        curve.map(({ netFit }) => netFit),
        `seed ${seed}`,
      ).toEqual(bruteForce(problem, options).slice(from));
    }
  });

  it('is concave, ends where solve() ends, and peaks at the best total', () => {
    for (let seed = 1; seed <= 600; seed++) {
      const problem = randomProblem(seed, 40);
      const options = randomOptions(problem, seed);
      const curve = tradeOff(problem, options);
      expectConcave(curve);
      const plan = solve(problem, options);
      expect(curve.at(-1), `seed ${seed}`).toMatchObject({
        pairs: plan.paired,
        netFit: plan.totalFit - plan.totalCharge,
      });
      const total = solve(problem, { ...options, aim: 'best-total' });
      const peak = curve.findLast(({ netFit }) => netFit === Math.max(...curve.map((point) => point.netFit)));
      expect(peak).toMatchObject({ pairs: total.paired, netFit: total.totalFit - total.totalCharge });
    }
  });

  it('tells of a plan that exists: fit and weakest fit agree with the number of pairs', () => {
    for (let seed = 1; seed <= 300; seed++) {
      const problem = randomProblem(seed, 20);
      for (const { pairs, netFit, totalFit, weakestFit } of tradeOff(problem)) {
        expect(totalFit).toBeGreaterThanOrEqual(netFit);
        expect(totalFit).toBeGreaterThanOrEqual(pairs * weakestFit);
        if (!problem.loadCharge) expect(totalFit).toBe(netFit);
      }
    }
  });

  it('reports its progress up to 1', () => {
    const shares: number[] = [];
    tradeOff(randomProblem(3, 30), { onProgress: (share) => shares.push(share) });
    expect(shares).toEqual([...shares].sort((a, b) => a - b));
    expect(shares.at(-1)).toBe(1);
  });
});
