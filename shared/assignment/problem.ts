/**
 * What the pairing engine is asked, and what it answers: the types, the checks on both, and the scale that makes
 * "most pairs first, then greatest net fit" one exact integer objective.
 *
 * Mentees are numbered 0 … menteeCount − 1 and each wants one mentor; mentors are numbered 0 … mentorCount − 1 and have
 * places. Eligible pairs lie in compressed sparse rows, one row per mentee, mentors ascending within a row.
 */

/** Mentees, mentors with places, and the fit of each eligible pair. */
export interface PairingProblem {
  menteeCount: number;
  mentorCount: number;
  /** Places per mentor, ≥ 0. */
  capacity: Int32Array;
  /** Mentee i's mentors are `target[rowStart[i] .. rowStart[i + 1])`; length menteeCount + 1. */
  rowStart: Int32Array;
  target: Int32Array;
  /** Fit of each eligible pair, ≥ 0, parallel to `target`. */
  fit: Int32Array;
  /** Charge for a mentor's 1st, 2nd, … place: ≥ 0, non-decreasing, the last value repeats. None when absent or empty. */
  loadCharge?: Int32Array;
  /** Places a mentor gave away before this problem, ≥ 0: the next mentee is charged as one more than these. */
  placesTaken?: Int32Array;
}

/**
 * - `everyone-first`: as many mentees as possible, then the greatest net fit (fit less charges).
 * - `best-total`: the greatest net fit, then most pairs.
 * - `lift-the-weakest`: as many as possible, then the greatest least fit among unlocked pairs, then net fit.
 */
export type Aim = 'everyone-first' | 'best-total' | 'lift-the-weakest';

/** A mentee and a mentor, by index. */
export type Pair = readonly [mentee: number, mentor: number];

export interface SolveOptions {
  /** Default `everyone-first`. */
  aim?: Aim | undefined;
  /** Pairs below this fit are not eligible, whatever the aim. */
  floor?: number | undefined;
  /** Pairs that must be in the plan. */
  locked?: readonly Pair[] | undefined;
  /** Locked pairs that may lie below the floor, because the coordinator said so; each must be among `locked`. */
  overridden?: readonly Pair[] | undefined;
  /** Pairs that must not be in the plan. */
  barred?: readonly Pair[] | undefined;
  /** Called with a share from 0 to 1, at least every 50 ms of work; throw from it to abandon the work. */
  onProgress?: ((share: number) => void) | undefined;
}

/** Mentees and mentors that together touch every pair of some set; its size counts a mentor's places. */
export interface Cover {
  mentees: Int32Array;
  mentors: Int32Array;
}

/** What `lift-the-weakest` must show besides prices; all of it speaks of unlocked pairs. */
export interface LiftWitness {
  /** Every unlocked pair of the plan has at least this fit. */
  threshold: number;
  /** Covers all eligible pairs, as large as the number paired: no plan pairs more. */
  cardinalityCover: Cover;
  /** Covers the eligible pairs with fit above the threshold, smaller than the number paired: no threshold is higher. */
  thresholdCover: Cover;
}

/**
 * How the plan came about: `complete` when every mentee is paired under an aim that pairs as many as possible,
 * `cardinality-first` when not everyone could be, and the aim's own name otherwise.
 */
export type Method = 'complete' | 'cardinality-first' | 'best-total';

export interface PairingPlan {
  aim: Aim;
  method: Method;
  /** Mentor of each mentee, −1 when left out. */
  mentorOf: Int32Array;
  paired: number;
  /** Fit of all pairs, locked ones included, without charges. */
  totalFit: number;
  totalCharge: number;
  /** Least fit of all pairs, locked ones included; 0 when nobody is paired. */
  weakestFit: number;
  /** Dual price of each mentee; 0 for locked mentees, who leave the problem. */
  menteePrice: Float64Array;
  /** Dual price of a place at each mentor. */
  mentorPrice: Float64Array;
  /** Only for `lift-the-weakest`. */
  lift?: LiftWitness | undefined;
}

/** Input that the engine refuses; says which field and, where there is one, which index. */
export class AssignmentInputError extends Error {
  constructor(
    readonly field: string,
    readonly index: number | null,
    because: string,
  ) {
    super(index === null ? `${field}: ${because}` : `${field}[${index}]: ${because}`);
    this.name = 'AssignmentInputError';
  }
}

/** Throws an AssignmentInputError at the first thing wrong with the problem; mends nothing. Time O(mentees + mentors + pairs). */
export function assertProblem(problem: PairingProblem): void {
  const { menteeCount, mentorCount, capacity, rowStart, target, fit, loadCharge, placesTaken } = problem;
  assertCount('menteeCount', menteeCount);
  assertCount('mentorCount', mentorCount);
  assertNonNegative('capacity', capacity, mentorCount);
  assertRows(menteeCount, rowStart, target);
  assertNonNegative('fit', fit, target.length);
  for (let mentee = 0; mentee < menteeCount; mentee++) assertRow(rowStart, target, mentee, mentorCount);
  if (placesTaken) assertNonNegative('placesTaken', placesTaken, mentorCount);
  if (!loadCharge) return;
  assertNonNegative('loadCharge', loadCharge, loadCharge.length);
  for (let place = 1; place < loadCharge.length; place++) {
    if (loadCharge[place]! < loadCharge[place - 1]!) {
      throw new AssignmentInputError('loadCharge', place, 'less than the charge before it; charges may not decrease');
    }
  }
}

function assertCount(field: string, count: number): void {
  if (!Number.isSafeInteger(count) || count < 0 || count > 2 ** 31 - 2) {
    throw new AssignmentInputError(field, null, `${count} is not a count`);
  }
}

function assertNonNegative(field: string, values: Int32Array, length: number): void {
  if (!(values instanceof Int32Array)) throw new AssignmentInputError(field, null, 'not an Int32Array');
  if (values.length !== length) {
    throw new AssignmentInputError(field, null, `length ${values.length}, expected ${length}`);
  }
  for (let index = 0; index < length; index++) {
    if (values[index]! < 0) throw new AssignmentInputError(field, index, `${values[index]} is negative`);
  }
}

function assertRows(menteeCount: number, rowStart: Int32Array, target: Int32Array): void {
  if (!(target instanceof Int32Array)) throw new AssignmentInputError('target', null, 'not an Int32Array');
  assertNonNegative('rowStart', rowStart, menteeCount + 1);
  if (rowStart[0] !== 0) throw new AssignmentInputError('rowStart', 0, `${rowStart[0]}, expected 0`);
  for (let mentee = 0; mentee < menteeCount; mentee++) {
    if (rowStart[mentee + 1]! < rowStart[mentee]!) {
      throw new AssignmentInputError('rowStart', mentee + 1, 'less than the start before it');
    }
  }
  if (rowStart[menteeCount] !== target.length) {
    throw new AssignmentInputError(
      'rowStart',
      menteeCount,
      `${rowStart[menteeCount]}, expected ${target.length} pairs`,
    );
  }
}

function assertRow(rowStart: Int32Array, target: Int32Array, mentee: number, mentorCount: number): void {
  let previous = -1;
  for (let edge = rowStart[mentee]!; edge < rowStart[mentee + 1]!; edge++) {
    const mentor = target[edge]!;
    if (mentor < 0 || mentor >= mentorCount) {
      throw new AssignmentInputError('target', edge, `mentor ${mentor} of mentee ${mentee} does not exist`);
    }
    if (mentor <= previous) {
      const fault = mentor === previous ? 'appears twice' : 'is out of order';
      throw new AssignmentInputError('target', edge, `mentor ${mentor} of mentee ${mentee} ${fault}`);
    }
    previous = mentor;
  }
}

/** Index of the pair in `target` and `fit`, or −1 when the two are not eligible. Time O(log row). */
export function findEdge(problem: PairingProblem, mentee: number, mentor: number): number {
  let low = problem.rowStart[mentee]!;
  let high = problem.rowStart[mentee + 1]! - 1;
  while (low <= high) {
    const middle = (low + high) >>> 1;
    const found = problem.target[middle]!;
    if (found === mentor) return middle;
    if (found < mentor) low = middle + 1;
    else high = middle - 1;
  }
  return -1;
}

/** Charge for a mentor's place in this problem, counted from 0, after the places taken before it. */
export function chargeOf(problem: PairingProblem, mentor: number, place: number): number {
  const charges = problem.loadCharge;
  if (!charges || charges.length === 0) return 0;
  const used = (problem.placesTaken?.[mentor] ?? 0) + place;
  return charges[Math.min(used, charges.length - 1)]!;
}

/** Sum of the charges for a mentor's first `load` places in this problem. */
export function chargeForLoad(problem: PairingProblem, mentor: number, load: number): number {
  let sum = 0;
  if (problem.loadCharge) for (let place = 0; place < load; place++) sum += chargeOf(problem, mentor, place);
  return sum;
}

/** k: the number of pairs that no plan can exceed, whatever is eligible. */
export function pairBound(problem: PairingProblem): number {
  let places = 0;
  for (const capacity of problem.capacity) places += capacity;
  return Math.min(problem.menteeCount, places);
}

/**
 * M = (k + 2)(C + L + 1), with C the largest fit, L the largest charge and k the bound on pairs: one pair more weighs more
 * than anything that fits and charges of all others can do. Taken from the problem as given, so that locks and bars do not
 * change it. Throws when k · M ≥ 2^53, beyond which float64 no longer holds every integer.
 */
export function lexicographicScale(problem: PairingProblem): number {
  let largestFit = 0;
  for (let edge = 0; edge < problem.fit.length; edge++)
    if (problem.fit[edge]! > largestFit) largestFit = problem.fit[edge]!;
  const largestCharge = problem.loadCharge?.at(-1) ?? 0;
  const bound = pairBound(problem);
  const scale = (bound + 2) * (largestFit + largestCharge + 1);
  if (bound * scale >= 2 ** 53) {
    throw new AssignmentInputError(
      'fit',
      null,
      `${bound} pairs with fits up to ${largestFit} and charges up to ${largestCharge} exceed exact arithmetic (2^53)`,
    );
  }
  return scale;
}
