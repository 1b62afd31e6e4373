import type { PairingProblem } from '../../shared/assignment';
import { seededRandom } from '../../shared/assignment/seeded-random';

/** A seeded kind of problem; the same kind, size and seed always give the same problem. */
export interface Family {
  name: string;
  about: string;
  dense: boolean;
  make(size: number, seed: number): PairingProblem;
}

/** Every mentee with every mentor, one place each. */
function dense(name: string, about: string, fitsOf: (size: number, random: () => number) => FitOf): Family {
  const make = (size: number, seed: number): PairingProblem => {
    const fitOf = fitsOf(size, seededRandom(seed));
    const fit = new Int32Array(size * size);
    for (let mentee = 0; mentee < size; mentee++)
      for (let mentor = 0; mentor < size; mentor++) fit[mentee * size + mentor] = fitOf(mentee, mentor);
    return {
      menteeCount: size,
      mentorCount: size,
      capacity: new Int32Array(size).fill(1),
      rowStart: Int32Array.from({ length: size + 1 }, (_, mentee) => mentee * size),
      target: Int32Array.from({ length: size * size }, (_, pair) => pair % size),
      fit,
    };
  };
  return { name, about, dense: true, make };
}

type FitOf = (mentee: number, mentor: number) => number;

const PAIRS_A_MENTEE = 30;

/** About 30 eligible mentors a mentee, 1 to 3 places a mentor, `share` times as many places as mentees. */
function sparse(name: string, about: string, share: number, skew: number): Family {
  const make = (size: number, seed: number): PairingProblem => {
    const random = seededRandom(seed);
    const capacity: number[] = [];
    for (let places = 0; places < share * size; places += capacity.at(-1)!) {
      capacity.push(Math.min(1 + Math.floor(random() * 3), Math.ceil(share * size - places)));
    }
    const mentorCount = capacity.length;
    const rowStart = [0];
    const target: number[] = [];
    for (let mentee = 0; mentee < size; mentee++) {
      const row = new Set<number>();
      const pairs = Math.min(PAIRS_A_MENTEE, mentorCount);
      while (row.size < pairs) row.add(Math.floor(random() ** skew * mentorCount));
      target.push(...[...row].sort((a, b) => a - b));
      rowStart.push(target.length);
    }
    return {
      menteeCount: size,
      mentorCount,
      capacity: Int32Array.from(capacity),
      rowStart: Int32Array.from(rowStart),
      target: Int32Array.from(target),
      fit: Int32Array.from(target, () => Math.floor(random() * 10_001)),
    };
  };
  return { name, about, dense: false, make };
}

const TAGS = 8;

/** Each person has weights for a few of 8 tags; fit is the product of the two lists. */
function dotProduct(size: number, random: () => number): FitOf {
  const person = (): number[] => Array.from({ length: TAGS }, () => (random() < 0.4 ? Math.floor(random() * 36) : 0));
  const mentees = Array.from({ length: size }, person);
  const mentors = Array.from({ length: size }, person);
  return (mentee, mentor) => {
    let sum = 0;
    for (let tag = 0; tag < TAGS; tag++) sum += mentees[mentee]![tag]! * mentors[mentor]![tag]!;
    return sum;
  };
}

export const FAMILIES: readonly Family[] = [
  dense('uniform', 'every pair, fit 0 to 10,000', (_, random) => () => Math.floor(random() * 10_001)),
  dense('ties', 'every pair, fit 0 to 100', (_, random) => () => Math.floor(random() * 101)),
  dense('dot-product', 'every pair, fit from 8 tags', dotProduct),
  dense('i-by-j', 'every pair, fit (i + 1)(j + 1)', () => (mentee, mentor) => (mentee + 1) * (mentor + 1)),
  sparse('places-to-spare', '30 pairs a mentee, places for 120 %', 1.2, 1),
  sparse('too-few-places', '30 pairs a mentee, places for 80 %', 0.8, 1),
  sparse('some-popular', '30 pairs a mentee, places for 100 %, some mentors sought far more', 1, 3),
];
