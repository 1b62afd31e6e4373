import { describe, expect, it } from 'vitest';
import { problemFromMatrix, solve, verify } from '../../shared/assignment';

/** Instances with their optimum in print, none of them made here; the source stands beside each. */
interface Published {
  source: string;
  /** Costs to be made as small as possible; null = not allowed. */
  costs: (number | null)[][];
  least: number;
}

const SCIPY = 'scipy, sparse/csgraph/tests/test_matching.py';
const COLLECTED =
  'collected teaching examples (scipy documentation, Wikipedia, Wolfram documentation), as listed in a public language reference on the Kuhn–Munkres algorithm';

const INSTANCES: Published[] = [
  {
    source: SCIPY,
    costs: [
      [400, 150, 400],
      [400, 450, 600],
      [300, 225, 300],
    ],
    least: 850,
  },
  {
    source: SCIPY,
    costs: [
      [400, 150, 400, 1],
      [400, 450, 600, 2],
      [300, 225, 300, 3],
    ],
    least: 452,
  },
  {
    source: SCIPY,
    costs: [
      [10, 10, 8],
      [9, 8, 1],
      [9, 7, 4],
    ],
    least: 18,
  },
  {
    source: SCIPY,
    costs: [
      [10, null, null],
      [null, null, 1],
      [null, 7, null],
    ],
    least: 18,
  },
  {
    source: COLLECTED,
    costs: [
      [82, 83, 69, 92],
      [77, 37, 49, 92],
      [11, 69, 5, 86],
      [8, 9, 98, 23],
    ],
    least: 140,
  },
  {
    source: COLLECTED,
    costs: [
      [10, 25, 15, 20],
      [15, 30, 5, 15],
      [35, 20, 12, 24],
      [17, 25, 24, 20],
    ],
    least: 55,
  },
  {
    source: COLLECTED,
    costs: [
      [5, 3, -1],
      [2, 4, -6],
      [9, 9, -9],
    ],
    least: -4,
  },
  {
    source: COLLECTED,
    costs: [
      [9, 5, 5, 6, 5],
      [1, 9, 4, 7, 3],
      [1, 2, 7, 4, 9],
      [8, 1, 4, 4, 4],
      [1, 6, 4, 9, 4],
    ],
    least: 14,
  },
  {
    source: COLLECTED,
    costs: [
      [7, 2, 1, 9, 4, 4],
      [9, 6, 9, 5, 5, 2],
      [3, 8, 3, 1, 8, 9],
      [7, 9, 4, 2, 2, 3],
      [8, 4, 7, 4, 8, 2],
      [4, 2, 9, 3, 1, 9],
    ],
    least: 13,
  },
  {
    source: COLLECTED,
    costs: [
      [4, 1, 3],
      [2, 0, 5],
      [3, 2, 2],
    ],
    least: 5,
  },
  {
    source: COLLECTED,
    costs: [
      [1, 1, 1],
      [1, 1, 1],
      [0, 0, 0],
    ],
    least: 2,
  },
  {
    source: 'R package lpSolve, help page of lp.assign',
    costs: [
      [2, 7, 7, 1],
      [7, 7, 2, 9],
      [7, 3, 8, 8],
      [2, 2, 10, 2],
    ],
    least: 8,
  },
];

/** As large as a fit can get here, so that greater fit is less cost. */
const TOP = 1000;

/** Least cost over complete pairings, as the greatest fit. */
function leastCost(costs: (number | null)[][]): number {
  const problem = problemFromMatrix(costs.map((row) => row.map((cost) => (cost === null ? null : TOP - cost))));
  const plan = solve(problem);
  expect(plan.paired).toBe(costs.length);
  expect(verify(problem, plan)).toEqual({ ok: true, faults: [] });
  return TOP * plan.paired - plan.totalFit;
}

describe('published instances', () => {
  it.each(INSTANCES.map((instance, at) => [at + 1, instance.source, instance] as const))(
    'no. %i has the optimum in print (%s)',
    (_number, _source, { costs, least }) => {
      expect(leastCost(costs)).toBe(least);
    },
  );

  it('stay the same when rows and columns change places', () => {
    for (const { costs, least } of INSTANCES) {
      if (costs.length !== costs[0]!.length) continue;
      expect(leastCost(costs[0]!.map((_, column) => costs.map((row) => row[column]!)))).toBe(least);
    }
  });
});
