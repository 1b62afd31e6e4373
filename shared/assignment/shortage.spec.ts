import { describe, expect, it } from 'vitest';
import { largestPairing } from './cardinality';
import { problemFromMatrix } from './matrix';
import type { PairingProblem } from './problem';
import { randomOptions, randomProblem } from './random-problems';
import { reduceProblem } from './reduction';
import { explainShortage, isPerfectOnBothSides, leftOutByChoice, smallestReason } from './shortage';
import { solve } from './solve';

const neighbours = (problem: PairingProblem, mentee: number): number[] => [
  ...problem.target.subarray(problem.rowStart[mentee], problem.rowStart[mentee + 1]),
];
const lists = (group: { mentees: Int32Array; mentors: Int32Array; leftOut: Int32Array }) => ({
  mentees: [...group.mentees],
  mentors: [...group.mentors],
  leftOut: group.leftOut.length,
});

describe('shortages', () => {
  it('name the set that breaks Hall’s condition', () => {
    // Three mentees share two mentors; a fourth has one alone (Hall 1935, On Representatives of Subsets).
    const problem = problemFromMatrix([
      [1, 1, null],
      [1, 1, null],
      [1, 1, null],
      [null, null, 1],
    ]);
    const [group, ...others] = explainShortage(problem, solve(problem));
    expect(others).toEqual([]);
    expect(lists(group!)).toEqual({ mentees: [0, 1, 2], mentors: [0, 1], leftOut: 1 });
    expect(group).toMatchObject({ places: 2, short: 1 });
  });

  it('say when both sides are paired completely (Frobenius 1917)', () => {
    const perfect = problemFromMatrix([
      [5, null],
      [1, 4],
    ]);
    expect(isPerfectOnBothSides(perfect, solve(perfect))).toBe(true);
    const idle = problemFromMatrix([[5, 3]]);
    expect(isPerfectOnBothSides(idle, solve(idle))).toBe(false);
  });

  it('are the over-demanded part of the Dulmage–Mendelsohn decomposition, apart from the rest', () => {
    // Mentees 0–2 over-demand mentor 0; mentees 3, 4 and mentors 1, 2 are exactly matched; mentee 5 has mentors to spare.
    const problem = problemFromMatrix([
      [1, null, null, null, null],
      [1, null, null, null, null],
      [1, null, null, null, null],
      [1, 1, null, null, null],
      [null, 1, 1, null, null],
      [null, null, 1, 1, 1],
    ]);
    const groups = explainShortage(problem, solve(problem));
    expect(groups.map(lists)).toEqual([{ mentees: [0, 1, 2], mentors: [0], leftOut: 2 }]);
  });

  it('put those without any eligible mentor into a group of their own', () => {
    const problem = problemFromMatrix([[null], [null], [3]], { capacity: [1] });
    expect(explainShortage(problem, solve(problem)).map(lists)).toEqual([{ mentees: [0, 1], mentors: [], leftOut: 2 }]);
  });

  it('are not connected by mentors without places', () => {
    const problem = problemFromMatrix(
      [
        [1, null, 1],
        [1, null, 1],
        [null, 1, 1],
        [null, 1, 1],
      ],
      { capacity: [1, 1, 0] },
    );
    expect(explainShortage(problem, solve(problem)).map((group) => [...group.mentees])).toEqual([
      [0, 1],
      [2, 3],
    ]);
  });

  it('can come from a lock', () => {
    const problem = problemFromMatrix([
      [1, null],
      [9, 1],
    ]);
    const options = { locked: [[1, 0]] as const };
    expect(explainShortage(problem, solve(problem), {})).toEqual([]);
    const [group] = explainShortage(problem, solve(problem, options), options);
    expect(lists(group!)).toEqual({ mentees: [0], mentors: [], leftOut: 1 });
  });

  it('leave apart those whom the best total leaves out by choice', () => {
    // Pairing both gives 1 + 1; the best total gives mentee 0 the only good pairing and leaves nobody short of a place.
    const problem = problemFromMatrix(
      [
        [10, 1],
        [1, null],
      ],
      { loadCharge: [5] },
    );
    const plan = solve(problem, { aim: 'best-total' });
    expect(plan.paired).toBe(1);
    expect([...leftOutByChoice(problem, plan)]).toEqual([1]);
    expect(explainShortage(problem, plan)).toEqual([]);
  });

  it('fulfil the deficiency formula on random problems: disjoint, closed, and short by those left out', () => {
    for (let seed = 1; seed <= 400; seed++) {
      const problem = randomProblem(seed, 12);
      const options = randomOptions(problem, seed);
      const plan = solve(problem, options);
      const groups = explainShortage(problem, plan, options);
      const { problem: reduced, reducedMenteeOf } = reduceProblem(problem, options);
      const mentees = groups.flatMap((group) => [...group.mentees]);
      const mentors = groups.flatMap((group) => [...group.mentors]);
      expect(new Set(mentees).size).toBe(mentees.length);
      expect(new Set(mentors).size).toBe(mentors.length);
      const short = groups.reduce((sum, group) => sum + group.short, 0);
      expect(short).toBe(reduced.menteeCount - largestPairing(reduced).size);
      for (const group of groups) {
        const around = new Set([...group.mentees].flatMap((mentee) => neighbours(reduced, reducedMenteeOf[mentee]!)));
        const withPlaces = [...around].filter((mentor) => reduced.capacity[mentor]! > 0).sort((a, b) => a - b);
        expect([...group.mentors]).toEqual(withPlaces);
        expect(group.leftOut.length).toBe(group.short);
        expect(group.short).toBe(group.mentees.length - group.places);
      }
    }
  });

  it('give one person a reason that holds for them alone', () => {
    for (let seed = 1; seed <= 200; seed++) {
      const problem = randomProblem(seed, 10);
      const plan = solve(problem);
      plan.mentorOf.forEach((mentor, mentee) => {
        if (mentor >= 0) return;
        const reason = smallestReason(problem, plan, mentee);
        expect([...reason.mentees]).toContain(mentee);
        expect(reason.mentees.length).toBeGreaterThan(reason.places);
      });
    }
  });
});
