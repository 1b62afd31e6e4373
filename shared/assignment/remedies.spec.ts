import { describe, expect, it } from 'vitest';
import type { Pair, PairingProblem } from './problem';
import { randomOptions, randomProblem } from './random-problems';
import { gainFromNewMentor, gainFromPairs, gainFromPlaces, gainWithoutLock, mentorsWhosePlaceHelps } from './remedies';
import { seededRandom } from './seeded-random';
import { solve } from './solve';

/** The problem with more pairs: what was not eligible becomes so by chance, with fit 0. */
function widened(problem: PairingProblem, seed: number): PairingProblem {
  const random = seededRandom(seed);
  const rowStart = [0];
  const target: number[] = [];
  const fit: number[] = [];
  for (let mentee = 0; mentee < problem.menteeCount; mentee++) {
    const row = new Map<number, number>();
    for (let edge = problem.rowStart[mentee]!; edge < problem.rowStart[mentee + 1]!; edge++)
      row.set(problem.target[edge]!, problem.fit[edge]!);
    for (let mentor = 0; mentor < problem.mentorCount; mentor++) {
      if (!row.has(mentor) && random() > 0.3) continue;
      target.push(mentor);
      fit.push(row.get(mentor) ?? 0);
    }
    rowStart.push(target.length);
  }
  return {
    ...problem,
    rowStart: Int32Array.from(rowStart),
    target: Int32Array.from(target),
    fit: Int32Array.from(fit),
  };
}

/** The problem with one more mentor for these mentees. */
function withMentor(problem: PairingProblem, mentees: readonly number[], places: number): PairingProblem {
  const rowStart = [0];
  const target: number[] = [];
  const fit: number[] = [];
  for (let mentee = 0; mentee < problem.menteeCount; mentee++) {
    target.push(...problem.target.subarray(problem.rowStart[mentee], problem.rowStart[mentee + 1]));
    fit.push(...problem.fit.subarray(problem.rowStart[mentee], problem.rowStart[mentee + 1]));
    if (mentees.includes(mentee)) {
      target.push(problem.mentorCount);
      fit.push(0);
    }
    rowStart.push(target.length);
  }
  return {
    menteeCount: problem.menteeCount,
    mentorCount: problem.mentorCount + 1,
    capacity: Int32Array.from([...problem.capacity, places]),
    rowStart: Int32Array.from(rowStart),
    target: Int32Array.from(target),
    fit: Int32Array.from(fit),
  };
}

const plus = (capacity: Int32Array, mentors: readonly number[]): Int32Array =>
  capacity.map((places, mentor) => places + mentors.filter((each) => each === mentor).length);

describe('remedies gain exactly what solving again gains', () => {
  const cases = Array.from({ length: 250 }, (_, at) => {
    const problem = randomProblem(at + 1, 10);
    const options = { barred: randomOptions(problem, at + 1).barred };
    return { seed: at + 1, problem, options, plan: solve(problem, options) };
  });

  it('by one more place at each mentor', () => {
    for (const { problem, options, plan } of cases) {
      const helps = mentorsWhosePlaceHelps(problem, plan, options);
      helps.forEach((mark, mentor) => {
        const more = solve({ ...problem, capacity: plus(problem.capacity, [mentor]) }, options).paired - plan.paired;
        expect(mark).toBe(more);
      });
    }
  });

  it('by one more place at several mentors', () => {
    for (const { problem, options, plan } of cases) {
      const mentors = [...problem.capacity.keys()].filter((mentor) => mentor % 2 === 0);
      const more = solve({ ...problem, capacity: plus(problem.capacity, mentors) }, options).paired - plan.paired;
      expect(gainFromPlaces(problem, plan, mentors, options)).toBe(more);
    }
  });

  it('by the pairs that a rule alone excludes, named', () => {
    for (const { seed, problem, options, plan } of cases) {
      const wider = widened(problem, seed);
      const { gain, pairs } = gainFromPairs(problem, plan, wider, options);
      expect(gain).toBe(solve(wider, options).paired - plan.paired);
      expect(pairs.length).toBeGreaterThanOrEqual(gain);
    }
  });

  it('by releasing a lock', () => {
    for (let seed = 1; seed <= 250; seed++) {
      const problem = randomProblem(seed, 10);
      const { locked = [], barred } = randomOptions(problem, seed);
      const options = { locked, barred };
      const plan = solve(problem, options);
      for (const lock of locked) {
        const rest = locked.filter((pair: Pair) => pair !== lock);
        const more = solve(problem, { ...options, locked: rest }).paired - plan.paired;
        expect(gainWithoutLock(problem, plan, lock, options)).toBe(more);
      }
    }
  });

  it('by a new mentor', () => {
    for (const { problem, options, plan } of cases) {
      const mentees = [...Array(problem.menteeCount).keys()].filter((mentee) => mentee % 3 !== 0);
      const more = solve(withMentor(problem, mentees, 2), options).paired - plan.paired;
      expect(gainFromNewMentor(problem, plan, mentees, 2, options)).toBe(more);
    }
  });
});
