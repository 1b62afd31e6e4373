import munkres from 'munkres-js';
import { describe, expect, it } from 'vitest';
import { problemFromMatrix, solve } from '../../shared/assignment';
import { seededRandom } from '../../shared/assignment/seeded-random';

/** Least cost of a complete pairing, by a package that nobody here wrote. */
function byMunkres(costs: number[][]): number {
  return munkres(costs).reduce((sum, [row, column]) => sum + costs[row]![column]!, 0);
}

describe('the solver beside munkres-js', () => {
  it.each([
    ['as many mentors as mentees', 0],
    ['more mentors than mentees', 3],
  ])('has the same least cost with %s', (_case, more) => {
    const random = seededRandom(20_261_201 + more);
    for (let round = 0; round < 150; round++) {
      const mentees = 1 + Math.floor(random() * 9);
      const top = [1, 5, 100, 10_000][round % 4]!;
      const costs = Array.from({ length: mentees }, () =>
        Array.from({ length: mentees + more }, () => Math.floor(random() * (top + 1))),
      );
      const plan = solve(problemFromMatrix(costs.map((row) => row.map((cost) => top - cost))));
      expect(top * plan.paired - plan.totalFit).toBe(byMunkres(costs));
    }
  });
});
