import { describe, expect, it } from 'vitest';
import { problemFromMatrix, solve } from './index';
import { seededRandom } from './seeded-random';
import { steadiness } from './steadiness';

describe('steadiness', () => {
  /** Two criteria: the first mentee's lead with its partner is wide, the second and third mentees' is narrow. */
  const first = [1000, 0, 0, 0, 500, 490, 0, 490, 500];
  const second = [1000, 0, 0, 0, 500, 509, 0, 509, 500];
  const solveReweighted = (weights: Float64Array): Int32Array => {
    const fit = first.map((value, pair) => Math.round(value * weights[0]! + second[pair]! * weights[1]!));
    return solve(problemFromMatrix([fit.slice(0, 3), fit.slice(3, 6), fit.slice(6, 9)])).mentorOf;
  };
  const base = solveReweighted(Float64Array.of(1, 1));

  it('is 1 for what no weight can change, and less where the weights decide', () => {
    const share = steadiness(200, 7, solveReweighted, 2, base);
    expect([...base]).toEqual([0, 1, 2]);
    expect(share[0]).toBe(1);
    expect(share[1]).toBe(share[2]);
    expect(share[1]).toBeGreaterThan(0.5);
    expect(share[1]).toBeLessThan(0.9);
  });

  it('says the same for the same seed, and draws other weights for another', () => {
    expect(steadiness(50, 7, solveReweighted, 2, base)).toEqual(steadiness(50, 7, solveReweighted, 2, base));
    const drawn = (seed: number): number[] => {
      const seen: number[] = [];
      steadiness(3, seed, (weights) => (seen.push(...weights), base), 2, base);
      return seen;
    };
    expect(drawn(1)).not.toEqual(drawn(2));
  });

  it('moves each weight by at most a fifth, either way', () => {
    const seen: number[] = [];
    steadiness(500, 3, (weights) => (seen.push(...weights), base), 3, base);
    expect(seen).toHaveLength(1500);
    expect(Math.min(...seen)).toBeGreaterThanOrEqual(0.8);
    expect(Math.min(...seen)).toBeLessThan(0.81);
    expect(Math.max(...seen)).toBeLessThan(1.2);
    expect(Math.max(...seen)).toBeGreaterThan(1.19);
    expect(seen.reduce((sum, factor) => sum + factor, 0) / seen.length).toBeCloseTo(1, 1);
  });

  it('counts staying left out as steady', () => {
    expect([...steadiness(4, 1, () => Int32Array.of(-1), 1, Int32Array.of(-1))]).toEqual([1]);
  });

  it('refuses no runs, and answers about other people', () => {
    expect(() => steadiness(0, 1, () => base, 2, base)).toThrow('runs: 0 is not a number of runs');
    expect(() => steadiness(1, 1, () => base.subarray(1), 2, base)).toThrow(
      'solveReweighted[0]: 2 mentees, expected 3',
    );
  });
});

describe('the seeded generator', () => {
  it('spreads evenly over [0, 1)', () => {
    const random = seededRandom(42);
    const bins = new Int32Array(10);
    for (let draw = 0; draw < 100_000; draw++) bins[Math.floor(random() * 10)]!++;
    // chi-squared with 9 degrees of freedom: 27.9 is exceeded once in a thousand
    expect(bins.reduce((sum, count) => sum + (count - 10_000) ** 2 / 10_000, 0)).toBeLessThan(27.9);
  });
});
