import fc from 'fast-check';
import highsLoader from 'highs';
import { beforeAll, describe, expect, it } from 'vitest';
import { chargeOf, problemFromMatrix, solve } from './index';
import type { PairingProblem } from './index';
import {
  AIMS,
  seeded,
  problems,
  generator,
  optionsFor,
  bruteForce,
  outcomeOf,
  fitOf,
  expectVerified,
} from '../../tests/support/solve-oracles';

describe('solve, on small problems', () => {
  it.each(AIMS)('%s equals the best of all plans, each tried', (aim) => {
    fc.assert(
      fc.property(problems(6), fc.nat(), (problem, seed) => {
        const options = { aim, ...optionsFor(problem, seed) };
        const plan = solve(problem, options);
        const expected = bruteForce(problem, options);
        const found = outcomeOf(problem, plan, options);
        if (aim === 'lift-the-weakest') expect(found).toEqual(expected);
        else expect(found).toMatchObject({ paired: expected.paired, netFit: expected.netFit });
        expectVerified(problem, plan, options);
      }),
      seeded(1500, 11),
    );
  });
});

describe('solve, on problems up to 60 by 60', () => {
  it.each(AIMS)('%s always carries a certificate that verifies', (aim) => {
    fc.assert(
      fc.property(problems(60), fc.nat(), (problem, seed) => {
        const options = { aim, ...optionsFor(problem, seed) };
        expectVerified(problem, solve(problem, options), options);
      }),
      seeded(1500, 12),
    );
  });

  it.each(AIMS)('%s gives the same values whatever the order of people', (aim) => {
    fc.assert(
      fc.property(problems(40), fc.nat(), (problem, seed) => {
        const expected = outcomeOf(problem, solve(problem, { aim }));
        const shuffled = shuffle(problem, seed);
        const found = outcomeOf(shuffled, solve(shuffled, { aim }));
        if (aim === 'lift-the-weakest') expect(found).toEqual(expected);
        else expect(found).toMatchObject({ paired: expected.paired, netFit: expected.netFit });
      }),
      seeded(300, 13),
    );
  });

  it('gives the same plan when asked twice', () => {
    fc.assert(
      fc.property(problems(40), (problem) => {
        expect(solve(problem)).toEqual(solve(problem));
      }),
      seeded(50, 14),
    );
  });
});

function shuffle(problem: PairingProblem, seed: number): PairingProblem {
  const random = generator(seed);
  const mix = (count: number): number[] =>
    Array.from({ length: count }, (_, index) => ({ index, key: random() }))
      .sort((a, b) => a.key - b.key)
      .map(({ index }) => index);
  const [mentees, mentors] = [mix(problem.menteeCount), mix(problem.mentorCount)];
  const fits = mentees.map((mentee) =>
    mentors.map((mentor) => {
      const row = problem.target.subarray(problem.rowStart[mentee], problem.rowStart[mentee + 1]);
      return row.includes(mentor) ? fitOf(problem, mentee, mentor) : null;
    }),
  );
  return problemFromMatrix(fits, {
    capacity: mentors.map((mentor) => problem.capacity[mentor]!),
    ...(problem.loadCharge ? { loadCharge: [...problem.loadCharge] } : {}),
    ...(problem.placesTaken ? { placesTaken: mentors.map((mentor) => problem.placesTaken![mentor]!) } : {}),
  });
}

describe('solve, beside HiGHS', () => {
  let highs: Awaited<ReturnType<typeof highsLoader>>;
  beforeAll(async () => {
    highs = await highsLoader();
  });

  /** Greatest net fit (or count) of pairs with at least the fit, with exactly `pairs` of them where that is given. */
  function highsValue(problem: PairingProblem, objective: 'count' | 'net', leastFit = 0, pairs?: number): number {
    const edges: { name: string; mentee: number; mentor: number; fit: number }[] = [];
    for (let mentee = 0; mentee < problem.menteeCount; mentee++) {
      for (let edge = problem.rowStart[mentee]!; edge < problem.rowStart[mentee + 1]!; edge++) {
        const [mentor, fit] = [problem.target[edge]!, problem.fit[edge]!];
        if (fit >= leastFit) edges.push({ name: `x${edge}`, mentee, mentor, fit });
      }
    }
    if (edges.length === 0) return 0;
    const places: { name: string; mentor: number; charge: number }[] = [];
    problem.capacity.forEach((capacity, mentor) => {
      for (let place = 0; place < capacity; place++) {
        places.push({ name: `y${mentor}_${place}`, mentor, charge: chargeOf(problem, mentor, place) });
      }
    });
    const terms = edges.map(({ name, fit }) => `+ ${objective === 'count' ? 1 : fit} ${name}`);
    if (objective === 'net') terms.push(...places.map(({ name, charge }) => `- ${charge} ${name}`));
    const rows: string[] = [];
    const sum = (names: string[]): string => names.map((name) => `+ ${name}`).join(' ');
    for (let mentee = 0; mentee < problem.menteeCount; mentee++) {
      const own = edges.filter((edge) => edge.mentee === mentee).map(({ name }) => name);
      if (own.length > 0) rows.push(`${sum(own)} <= 1`);
    }
    for (let mentor = 0; mentor < problem.mentorCount; mentor++) {
      const own = edges.filter((edge) => edge.mentor === mentor).map(({ name }) => name);
      const used = places.filter((place) => place.mentor === mentor).map(({ name }) => `- ${name}`);
      if (own.length > 0) rows.push(`${sum(own)} ${used.join(' ')} <= 0`);
    }
    if (pairs !== undefined) rows.push(`${sum(edges.map(({ name }) => name))} = ${pairs}`);
    const lines = rows.map((row, index) => ` r${index}: ${row}`).join('\n');
    const bounds = [...edges, ...places].map(({ name }) => ` 0 <= ${name} <= 1`).join('\n');
    const answer = highs.solve(`Maximize\n obj: ${terms.join(' ')}\nSubject To\n${lines}\nBounds\n${bounds}\nEnd`);
    expect(answer.Status).toBe('Optimal');
    return Math.round(answer.ObjectiveValue);
  }

  it('agrees on the number paired, on the net fit, on the best total and on the weakest fit', () => {
    fc.assert(
      fc.property(problems(30), (problem) => {
        const pairs = highsValue(problem, 'count');
        const first = solve(problem);
        expect(first.paired).toBe(pairs);
        expect(first.totalFit - first.totalCharge).toBe(highsValue(problem, 'net', 0, pairs));
        const total = solve(problem, { aim: 'best-total' });
        expect(total.totalFit - total.totalCharge).toBe(highsValue(problem, 'net'));
        const lifted = solve(problem, { aim: 'lift-the-weakest' });
        expect(lifted.paired).toBe(pairs);
        if (pairs === 0) return;
        expect(highsValue(problem, 'count', lifted.weakestFit)).toBe(pairs);
        expect(highsValue(problem, 'count', lifted.weakestFit + 1)).toBeLessThan(pairs);
        const net = highsValue(problem, 'net', lifted.weakestFit, pairs);
        expect(lifted.totalFit - lifted.totalCharge).toBe(net);
      }),
      seeded(150, 15),
    );
  });
});
