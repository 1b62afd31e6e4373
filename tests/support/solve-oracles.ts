/** Random problems and slow, sure answers to hold the solver against. */
import fc from 'fast-check';
import { expect } from 'vitest';
import { chargeOf, problemFromMatrix, verify } from '../../shared/assignment';
import type { Aim, Pair, PairingPlan, PairingProblem, SolveOptions } from '../../shared/assignment';

export const AIMS: Aim[] = ['everyone-first', 'best-total', 'lift-the-weakest'];
export const seeded = (numRuns: number, seed: number) => ({ numRuns, seed });

/** Problems of every shape: empty sides, no places, no pairs, all ties, complete, disconnected, charged. */
export function problems(largest: number): fc.Arbitrary<PairingProblem> {
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

export function generator(seed: number): () => number {
  let state = seed;
  return () => {
    state = (Math.imul(state, 1664525) + 1013904223) >>> 0;
    return state / 2 ** 32;
  };
}

/** Options that fit the problem: some bars, a floor, and locks taken one by one where they do not contradict. */
export function optionsFor(problem: PairingProblem, seed: number): SolveOptions {
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

export interface Outcome {
  paired: number;
  netFit: number;
  weakest: number;
}

/** The best outcome for an aim over all plans, each of them tried. `weakest` speaks of unlocked pairs. */
export function bruteForce(problem: PairingProblem, options: SolveOptions): Outcome {
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

export function outcomeOf(problem: PairingProblem, plan: PairingPlan, { locked = [] }: SolveOptions = {}): Outcome {
  let weakest = Infinity;
  plan.mentorOf.forEach((mentor, mentee) => {
    if (mentor >= 0 && !locked.some(([who]) => who === mentee))
      weakest = Math.min(weakest, fitOf(problem, mentee, mentor));
  });
  return { paired: plan.paired, netFit: plan.totalFit - plan.totalCharge, weakest };
}

export function fitOf(problem: PairingProblem, mentee: number, mentor: number): number {
  const row = problem.target.subarray(problem.rowStart[mentee], problem.rowStart[mentee + 1]);
  return problem.fit[problem.rowStart[mentee]! + row.indexOf(mentor)]!;
}

export function expectVerified(problem: PairingProblem, plan: PairingPlan, options: SolveOptions): void {
  expect(verify(problem, plan, options).faults).toEqual([]);
}
