import { problemFromMatrix } from './matrix';
import type { Pair, PairingProblem, SolveOptions } from './problem';
import { seededRandom } from './seeded-random';

/**
 * For property tests: a problem of up to `largest` people a side, of every shape: empty sides, no places, no pairs, all ties,
 * complete, disconnected, charged. The same seed gives the same problem.
 */
export function randomProblem(seed: number, largest: number): PairingProblem {
  const random = seededRandom(seed);
  const count = (most: number): number => Math.floor(random() * (most + 1));
  const oneOf = <T>(...values: T[]): T => values[Math.floor(random() * values.length)]!;
  const mentees = count(largest);
  const mentors = count(largest);
  const topFit = oneOf(0, 1, 3, 100, 10_000);
  const density = oneOf(0, 0.15, 0.4, 0.7, 1);
  const topCapacity = oneOf(0, 1, 1, 2, 4);
  const blocks = oneOf(1, 1, 2, 3);
  const isCharged = oneOf(true, false);
  const fits = Array.from({ length: mentees }, (_, mentee) =>
    Array.from({ length: mentors }, (_, mentor) =>
      mentee % blocks === mentor % blocks && random() < density ? count(topFit) : null,
    ),
  );
  const capacity = Array.from({ length: mentors }, () => count(topCapacity));
  if (!isCharged) return problemFromMatrix(fits, { capacity });
  const loadCharge = Array.from({ length: count(4) }, () => count(Math.min(40, topFit + 1))).sort((a, b) => a - b);
  return problemFromMatrix(fits, { capacity, placesTaken: capacity.map(() => count(2)), loadCharge });
}

/** Options that the problem can take: some bars, a floor, and locks taken one by one where they do not contradict. */
export function randomOptions(problem: PairingProblem, seed: number): SolveOptions {
  const random = seededRandom(seed);
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
