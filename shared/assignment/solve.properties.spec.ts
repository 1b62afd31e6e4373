import fc from 'fast-check';
import highsLoader from 'highs';
import { beforeAll, describe, expect, it } from 'vitest';
import { chargeOf, problemFromMatrix, solve, verify } from './index';
import type { Aim, Pair, PairingPlan, PairingProblem, SolveOptions } from './index';

const AIMS: Aim[] = ['everyone-first', 'best-total', 'lift-the-weakest'];
const seeded = (numRuns: number, seed: number) => ({ numRuns, seed });

/** Problems of every shape: empty sides, no places, no pairs, all ties, complete, disconnected, charged. */
function problems(largest: number): fc.Arbitrary<PairingProblem> {
  return fc
    .record({
      mentees: fc.nat(largest),
      mentors: fc.nat(largest),
      topFit: fc.constantFrom(0, 1, 3, 100, 10_000),
      density: fc.constantFrom(0, 0.15, 0.4, 0.7, 1),
      topCapacity: fc.constantFrom(0, 1, 1, 2, 4),
      blocks: fc.constantFrom(1, 1, 2, 3),
      charges: fc.oneof(fc.constant(undefined), fc.array(fc.nat(40), { maxLength: 4 })),
      seed: fc.nat(1_000_000),
    })
    .map(({ mentees, mentors, topFit, density, topCapacity, blocks, charges, seed }) => {
      const random = generator(seed);
      const fits = Array.from({ length: mentees }, (_, mentee) =>
        Array.from({ length: mentors }, (_, mentor) => {
          const connected = mentee % blocks === mentor % blocks && random() < density;
          return connected ? Math.floor(random() * (topFit + 1)) : null;
        }),
      );
      const capacity = Array.from({ length: mentors }, () => Math.floor(random() * (topCapacity + 1)));
      if (!charges) return problemFromMatrix(fits, { capacity });
      const placesTaken = capacity.map(() => Math.floor(random() * 3));
      return problemFromMatrix(fits, { capacity, placesTaken, loadCharge: [...charges].sort((a, b) => a - b) });
    });
}

function generator(seed: number): () => number {
  let state = seed;
  return () => {
    state = (Math.imul(state, 1664525) + 1013904223) >>> 0;
    return state / 2 ** 32;
  };
}

/** Options that fit the problem: some bars, a floor, and locks taken one by one where they do not contradict. */
function optionsFor(problem: PairingProblem, seed: number): SolveOptions {
  const random = generator(seed);
  const floor = random() < 0.3 ? Math.floor(random() * 50) : 0;
  const barred: Pair[] = [];
  const locked: Pair[] = [];
  const places = problem.capacity.slice();
  for (let mentee = 0; mentee < problem.menteeCount; mentee++) {
    for (let edge = problem.rowStart[mentee]!; edge < problem.rowStart[mentee + 1]!; edge++) {
      const mentor = problem.target[edge]!;
      const chance = random();
      if (chance < 0.1) barred.push([mentee, mentor]);
      else if (chance < 0.2 && places[mentor]! > 0 && problem.fit[edge]! >= floor) {
        locked.push([mentee, mentor]);
        places[mentor]!--;
        break;
      }
    }
  }
  return { floor, barred, locked };
}

interface Outcome {
  paired: number;
  netFit: number;
  weakest: number;
}

/** The best outcome for an aim over all plans, each of them tried. `weakest` speaks of unlocked pairs. */
function bruteForce(problem: PairingProblem, options: SolveOptions): Outcome {
  const { aim = 'everyone-first', floor = 0, barred = [], locked = [] } = options;
  const load = new Int32Array(problem.mentorCount);
  let best: Outcome | null = null;
  const better = (a: Outcome, b: Outcome): boolean => {
    const ranks: Record<Aim, (outcome: Outcome) => number[]> = {
      'everyone-first': (outcome) => [outcome.paired, outcome.netFit],
      'best-total': (outcome) => [outcome.netFit, outcome.paired],
      'lift-the-weakest': (outcome) => [outcome.paired, outcome.weakest, outcome.netFit],
    };
    const [left, right] = [ranks[aim](a), ranks[aim](b)];
    const first = left.findIndex((value, index) => value !== right[index]);
    return first >= 0 && left[first]! > right[first]!;
  };
  const extend = (mentee: number, soFar: Outcome): void => {
    if (mentee === problem.menteeCount) {
      if (!best || better(soFar, best)) best = soFar;
      return;
    }
    const lock = locked.find(([who]) => who === mentee)?.[1];
    if (lock === undefined) extend(mentee + 1, soFar);
    for (let edge = problem.rowStart[mentee]!; edge < problem.rowStart[mentee + 1]!; edge++) {
      const mentor = problem.target[edge]!;
      const fit = problem.fit[edge]!;
      if (lock !== undefined && lock !== mentor) continue;
      if (fit < floor || load[mentor]! >= problem.capacity[mentor]!) continue;
      if (barred.some(([a, b]) => a === mentee && b === mentor)) continue;
      const charge = chargeOf(problem, mentor, load[mentor]!++);
      const weakest = lock === undefined ? Math.min(soFar.weakest, fit) : soFar.weakest;
      extend(mentee + 1, { paired: soFar.paired + 1, netFit: soFar.netFit + fit - charge, weakest });
      load[mentor]!--;
    }
  };
  extend(0, { paired: 0, netFit: 0, weakest: Infinity });
  return best!;
}

function outcomeOf(problem: PairingProblem, plan: PairingPlan, { locked = [] }: SolveOptions = {}): Outcome {
  let weakest = Infinity;
  plan.mentorOf.forEach((mentor, mentee) => {
    if (mentor >= 0 && !locked.some(([who]) => who === mentee))
      weakest = Math.min(weakest, fitOf(problem, mentee, mentor));
  });
  return { paired: plan.paired, netFit: plan.totalFit - plan.totalCharge, weakest };
}

function fitOf(problem: PairingProblem, mentee: number, mentor: number): number {
  const row = problem.target.subarray(problem.rowStart[mentee], problem.rowStart[mentee + 1]);
  return problem.fit[problem.rowStart[mentee]! + row.indexOf(mentor)]!;
}

function expectVerified(problem: PairingProblem, plan: PairingPlan, options: SolveOptions): void {
  expect(verify(problem, plan, options).faults).toEqual([]);
}

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

describe('verify', () => {
  const changed = (plan: PairingPlan, change: Partial<PairingPlan>): PairingPlan => ({ ...plan, ...change });
  const withValue = <T extends Int32Array | Float64Array>(values: T, index: number, value: number): T => {
    const copy = values.slice() as T;
    copy[index] = value;
    return copy;
  };

  it.each(AIMS)(
    '%s: refuses every price that is moved, every claim that is changed, every pair that is undone',
    (aim) => {
      fc.assert(
        fc.property(problems(12), fc.nat(), (problem, seed) => {
          const options = { aim, ...optionsFor(problem, seed) };
          const plan = solve(problem, options);
          const refuses = (change: Partial<PairingPlan>): void => {
            expect(verify(problem, changed(plan, change), options).ok).toBe(false);
          };
          const load = new Int32Array(problem.mentorCount);
          plan.mentorOf.forEach((mentor) => mentor >= 0 && load[mentor]!++);
          options.locked?.forEach(([, mentor]) => load[mentor]!--);
          for (const step of [-1, 1]) {
            plan.menteePrice.forEach((price, mentee) => {
              refuses({ menteePrice: withValue(plan.menteePrice, mentee, price + step) });
            });
            plan.mentorPrice.forEach((price, mentor) => {
              if (load[mentor]! > 0) refuses({ mentorPrice: withValue(plan.mentorPrice, mentor, price + step) });
            });
            for (const claim of ['paired', 'totalFit', 'totalCharge', 'weakestFit'] as const)
              refuses({ [claim]: plan[claim] + step });
          }
          plan.mentorOf.forEach((mentor, mentee) => {
            if (mentor < 0) return;
            const fit = fitOf(problem, mentee, mentor);
            const mentorOf = withValue(plan.mentorOf, mentee, -1);
            refuses({ mentorOf });
            refuses({ mentorOf, paired: plan.paired - 1, totalFit: plan.totalFit - fit });
          });
        }),
        seeded(150, 16),
      );
    },
  );

  it('refuses a plan that is worth less, even when it is honest about it', () => {
    fc.assert(
      fc.property(problems(5), fc.nat(), (problem, seed) => {
        const plan = solve(problem);
        const random = generator(seed);
        const load = new Int32Array(problem.mentorCount);
        const mentorOf = plan.mentorOf.map((_, mentee) => {
          const row = [...problem.target.subarray(problem.rowStart[mentee], problem.rowStart[mentee + 1])];
          const free = row.filter((mentor) => load[mentor]! < problem.capacity[mentor]!);
          if (free.length === 0) return -1;
          const mentor = free[Math.floor(random() * free.length)]!;
          load[mentor]!++;
          return mentor;
        });
        const honest = claimsOf(problem, plan, mentorOf);
        const best = bruteForce(problem, {});
        const asGood = honest.paired === best.paired && honest.totalFit - honest.totalCharge === best.netFit;
        // prices that prove one best plan prove every other one
        expect(verify(problem, honest).ok).toBe(asGood);
      }),
      seeded(1500, 17),
    );
  });

  it('refuses a threshold that is moved and a cover with a hole', () => {
    fc.assert(
      fc.property(problems(12), (problem) => {
        const options = { aim: 'lift-the-weakest' } as const;
        const plan = solve(problem, options);
        if (plan.paired === 0) return;
        const lift = plan.lift!;
        const refuses = (change: Partial<typeof lift>): void => {
          expect(verify(problem, changed(plan, { lift: { ...lift, ...change } }), options).ok).toBe(false);
        };
        refuses({ threshold: lift.threshold + 1 });
        refuses({ threshold: lift.threshold - 1 });
        lift.cardinalityCover.mentees.forEach((_, hole) => {
          const mentees = lift.cardinalityCover.mentees.filter((_, index) => index !== hole);
          refuses({ cardinalityCover: { ...lift.cardinalityCover, mentees } });
        });
        expect(verify(problem, changed(plan, { lift: undefined }), options).faults).toContain(
          'the plan shows no threshold',
        );
      }),
      seeded(150, 18),
    );
  });
});

/** The same prices with other pairs, and with claims that are true of them. */
function claimsOf(problem: PairingProblem, plan: PairingPlan, mentorOf: Int32Array): PairingPlan {
  const load = new Int32Array(problem.mentorCount);
  const fits: number[] = [];
  let totalCharge = 0;
  mentorOf.forEach((mentor, mentee) => {
    if (mentor < 0) return;
    fits.push(fitOf(problem, mentee, mentor));
    totalCharge += chargeOf(problem, mentor, load[mentor]!++);
  });
  const totalFit = fits.reduce((sum, fit) => sum + fit, 0);
  const weakestFit = fits.length === 0 ? 0 : Math.min(...fits);
  const method = fits.length === problem.menteeCount ? 'complete' : 'cardinality-first';
  return { ...plan, mentorOf, paired: fits.length, totalFit, totalCharge, weakestFit, method };
}
