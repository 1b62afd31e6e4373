import {
  AssignmentInputError,
  chargeOf,
  findEdge,
  type Aim,
  type Pair,
  type PairingProblem,
  type SolveOptions,
} from './problem';

/**
 * The problem that is left once bars, floor and locks are applied.
 *
 * Bars and floor remove pairs. A lock is contracted: its mentee leaves, its mentor has one place fewer and one more place
 * taken, so that charges shift. Mentors keep their indices; mentees are renumbered and can be mapped back.
 */
export interface ReducedProblem {
  /** Shares its arrays with the original when nothing had to be removed. */
  problem: PairingProblem;
  aim: Aim;
  /** Original index of each mentee of the reduced problem. */
  menteeOf: Int32Array;
  /** Index in the reduced problem of each original mentee, −1 for locked ones. */
  reducedMenteeOf: Int32Array;
  /** Mentor each original mentee is locked to, or −1. */
  lockedMentor: Int32Array;
  /** Of the locked pairs together. */
  lockedPairs: number;
  lockedFit: number;
  lockedCharge: number;
  /** Least fit among the locked pairs; Infinity without locks. */
  lockedWeakest: number;
}

/**
 * Applies the options to the problem. Refuses, naming the option and its index: pairs that do not exist, a mentee locked
 * twice, more locks than places, a lock on a pair that is barred, not eligible, or below the floor and not overridden.
 * Time and memory O(mentees + mentors + pairs); without options O(mentees + mentors).
 */
export function reduceProblem(problem: PairingProblem, options: SolveOptions = {}): ReducedProblem {
  const { aim = 'everyone-first', floor = 0, locked = [], barred = [], overridden = [] } = options;
  if (!['everyone-first', 'best-total', 'lift-the-weakest'].includes(aim)) {
    throw new AssignmentInputError('options.aim', null, `unknown aim ${String(aim)}`);
  }
  if (!Number.isSafeInteger(floor) || floor < 0) {
    throw new AssignmentInputError('options.floor', null, `${floor} is not a fit`);
  }
  for (const [field, pairs] of Object.entries({ locked, barred, overridden })) {
    pairs.forEach((pair, index) => assertPair(problem, pair, `options.${field}`, index));
  }
  const barredKeys = new Set(barred.map((pair) => keyOf(problem, pair)));
  const overriddenKeys = new Set(overridden.map((pair) => keyOf(problem, pair)));
  const lockedKeys = new Set(locked.map((pair) => keyOf(problem, pair)));
  overridden.forEach((pair, index) => {
    if (!lockedKeys.has(keyOf(problem, pair))) {
      throw new AssignmentInputError('options.overridden', index, `pair (${pair.join(', ')}) is not locked`);
    }
  });

  const locks = contractLocks(problem, locked, (pair, edge) => {
    if (barredKeys.has(keyOf(problem, pair))) return 'is barred';
    if (edge < 0) return 'is not eligible';
    if (problem.fit[edge]! < floor && !overriddenKeys.has(keyOf(problem, pair))) return 'is below the floor';
    return null;
  });
  const rows = locked.length + barred.length + floor > 0 ? keepPairs(problem, locks, barredKeys, floor) : {};
  const menteeOf = new Int32Array(problem.menteeCount - locks.lockedPairs);
  const reducedMenteeOf = new Int32Array(problem.menteeCount).fill(-1);
  let next = 0;
  for (let mentee = 0; mentee < problem.menteeCount; mentee++) {
    if (locks.lockedMentor[mentee]! >= 0) continue;
    menteeOf[next] = mentee;
    reducedMenteeOf[mentee] = next++;
  }
  const { capacity, placesTaken, ...totals } = locks;
  return {
    problem: { ...problem, menteeCount: next, capacity, placesTaken, ...rows },
    aim,
    menteeOf,
    reducedMenteeOf,
    ...totals,
  };
}

function keyOf(problem: PairingProblem, [mentee, mentor]: Pair): number {
  return mentee * problem.mentorCount + mentor;
}

function assertPair(problem: PairingProblem, [mentee, mentor]: Pair, field: string, index: number): void {
  if (!Number.isInteger(mentee) || mentee < 0 || mentee >= problem.menteeCount) {
    throw new AssignmentInputError(field, index, `mentee ${mentee} does not exist`);
  }
  if (!Number.isInteger(mentor) || mentor < 0 || mentor >= problem.mentorCount) {
    throw new AssignmentInputError(field, index, `mentor ${mentor} does not exist`);
  }
}

type Locks = Pick<ReducedProblem, 'lockedMentor' | 'lockedPairs' | 'lockedFit' | 'lockedCharge' | 'lockedWeakest'> & {
  capacity: Int32Array;
  placesTaken: Int32Array;
};

function contractLocks(
  problem: PairingProblem,
  locked: readonly Pair[],
  refusal: (pair: Pair, edge: number) => string | null,
): Locks {
  const locks: Locks = {
    lockedMentor: new Int32Array(problem.menteeCount).fill(-1),
    lockedPairs: locked.length,
    lockedFit: 0,
    lockedCharge: 0,
    lockedWeakest: Infinity,
    capacity: problem.capacity.slice(),
    placesTaken: problem.placesTaken?.slice() ?? new Int32Array(problem.mentorCount),
  };
  locked.forEach((pair, index) => {
    const [mentee, mentor] = pair;
    const fail = (because: string): never => {
      throw new AssignmentInputError('options.locked', index, because);
    };
    const edge = findEdge(problem, mentee, mentor);
    const because = refusal(pair, edge);
    if (because) fail(`pair (${mentee}, ${mentor}) ${because}`);
    if (locks.lockedMentor[mentee]! >= 0) fail(`mentee ${mentee} is locked twice`);
    if (locks.capacity[mentor] === 0) fail(`mentor ${mentor} has no place for this lock`);
    locks.lockedCharge += chargeOf({ ...problem, placesTaken: locks.placesTaken }, mentor, 0);
    locks.lockedMentor[mentee] = mentor;
    locks.lockedFit += problem.fit[edge]!;
    locks.lockedWeakest = Math.min(locks.lockedWeakest, problem.fit[edge]!);
    locks.capacity[mentor]!--;
    locks.placesTaken[mentor]!++;
  });
  return locks;
}

/** The rows of unlocked mentees without barred pairs and pairs below the floor. */
function keepPairs(
  problem: PairingProblem,
  locks: Locks,
  barredKeys: ReadonlySet<number>,
  floor: number,
): Pick<PairingProblem, 'rowStart' | 'target' | 'fit'> {
  const rowStart = new Int32Array(problem.menteeCount - locks.lockedPairs + 1);
  const target = new Int32Array(problem.target.length);
  const fit = new Int32Array(problem.fit.length);
  let row = 0;
  let kept = 0;
  const rowsWithBars = new Set([...barredKeys].map((key) => Math.floor(key / problem.mentorCount)));
  for (let mentee = 0; mentee < problem.menteeCount; mentee++) {
    if (locks.lockedMentor[mentee]! >= 0) continue;
    const hasBars = rowsWithBars.has(mentee);
    for (let edge = problem.rowStart[mentee]!; edge < problem.rowStart[mentee + 1]!; edge++) {
      if (problem.fit[edge]! < floor) continue;
      if (hasBars && barredKeys.has(mentee * problem.mentorCount + problem.target[edge]!)) continue;
      target[kept] = problem.target[edge]!;
      fit[kept++] = problem.fit[edge]!;
    }
    rowStart[++row] = kept;
  }
  return { rowStart, target: target.subarray(0, kept), fit: fit.subarray(0, kept) };
}
