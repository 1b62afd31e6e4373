import { describe, expect, it } from 'vitest';
import { problemFromMatrix } from './matrix';
import { blockingPairs } from './stability';
import { solve } from './solve';

// Gale and Shapley (1962), example 1: three men and three women, every pairing of first choices of one side is stable.
// Ranks 1 to 3, the men's first; as fits 3, 2, 1. (The ranking matrix is typed from memory of the paper.)
const MEN = [
  [1, 2, 3],
  [3, 1, 2],
  [2, 3, 1],
];
const WOMEN = [
  [3, 2, 1],
  [1, 3, 2],
  [2, 1, 3],
];
const fits = (ranks: number[][]): Int32Array => Int32Array.from(ranks.flat(), (rank) => 4 - rank);
const problem = problemFromMatrix(MEN.map((row) => row.map(() => 1)));
const planOf = (...mentors: number[]) => ({ ...solve(problem), mentorOf: Int32Array.from(mentors) });

describe('blocking pairs', () => {
  it.each([
    ['each man his first choice', [0, 1, 2], 0],
    ['each woman her first choice', [2, 0, 1], 0],
    ['everybody the second choice', [1, 2, 0], 0],
  ])('are none where %s', (_case, mentors, expected) => {
    expect(blockingPairs(problem, planOf(...mentors), fits(MEN), fits(WOMEN))).toBe(expected);
  });

  it.each([[[0, 2, 1]], [[2, 1, 0]], [[1, 0, 2]]])('exist in the other three pairings of the example', (mentors) => {
    expect(blockingPairs(problem, planOf(...mentors), fits(MEN), fits(WOMEN))).toBeGreaterThan(0);
  });

  it('leave locked pairings alone', () => {
    const options = {
      locked: [
        [0, 0],
        [1, 2],
      ] as [number, number][],
    };
    const all = blockingPairs(problem, planOf(0, 2, 1), fits(MEN), fits(WOMEN));
    expect(blockingPairs(problem, planOf(0, 2, 1), fits(MEN), fits(WOMEN), options)).toBeLessThan(all);
  });

  it('count a mentor with a free place as willing', () => {
    const wide = problemFromMatrix([[1, 1]], { capacity: [1, 1] });
    const plan = { ...solve(wide), mentorOf: Int32Array.of(0) };
    expect(blockingPairs(wide, plan, Int32Array.of(1, 2), Int32Array.of(5, 5))).toBe(1);
  });
});
