/** Profiles, rules and criteria → a pairing problem. */
import type { Pair, PairingProblem, SolveOptions } from '../assignment';
import { toColumns, type Columns } from './columns';
import { compileCriteria, fitOf, type CompiledCriterion } from './criteria';
import type { MatchingInput } from './matching-input';
import { compileRules, floorOf, type CompiledRule } from './rules';

/** A lock or bar of the input, as positions. */
export interface Decided {
  mentee: number;
  mentor: number;
  kind: 'lock' | 'bar';
  overridesRules: boolean;
}

export interface BuiltProblem {
  /** Mentees and mentors at the positions of the input; `fit` holds what is optimised: fit plus the mentee's bonus. */
  problem: PairingProblem;
  options: Required<Pick<SolveOptions, 'aim' | 'locked' | 'barred'>>;
  /** Added to every fit of a mentee, by position. */
  bonus: Int32Array;
  judge: Judge;
}

/** Everything that can be asked about two positions. */
export interface Judge {
  input: MatchingInput;
  columns: Columns;
  rules: CompiledRule[];
  criteria: CompiledCriterion[];
  /** Fit units; 0 = no floor. */
  floor: number;
}

export function judgeOf(input: MatchingInput): Judge {
  const columns = toColumns(input);
  return {
    input,
    columns,
    rules: compileRules(input, columns),
    criteria: compileCriteria(input, columns),
    floor: floorOf(input),
  };
}

const NOT_ELIGIBLE = -1;

/** Fit of an eligible pair, or −1. */
export function eligibleFit(judge: Judge, i: number, j: number): number {
  const { rules, criteria, floor } = judge;
  for (let k = 0; k < rules.length; k++) if (!rules[k]!.allows(i, j)) return NOT_ELIGIBLE;
  const fit = fitOf(criteria, i, j);
  return fit < floor ? NOT_ELIGIBLE : fit;
}

/** Pairs in compressed sparse rows. */
export type Rows = Pick<PairingProblem, 'rowStart' | 'target' | 'fit'>;

/** Collects pairs row by row into growing typed arrays. */
export class RowBuilder {
  private readonly rowStart: Int32Array;
  private target: Int32Array;
  private fit: Int32Array;
  private size = 0;
  private row = 0;

  constructor(rows: number, estimate = 1 << 16) {
    this.rowStart = new Int32Array(rows + 1);
    this.target = new Int32Array(estimate);
    this.fit = new Int32Array(estimate);
  }

  add(target: number, fit: number): void {
    if (this.size === this.target.length) {
      this.target = grown(this.target);
      this.fit = grown(this.fit);
    }
    this.target[this.size] = target;
    this.fit[this.size++] = fit;
  }

  endRow(): void {
    this.rowStart[++this.row] = this.size;
  }

  rows(): Rows {
    return { rowStart: this.rowStart, target: this.target.slice(0, this.size), fit: this.fit.slice(0, this.size) };
  }
}

function grown(values: Int32Array): Int32Array {
  const larger = new Int32Array(values.length * 2);
  larger.set(values);
  return larger;
}

/** The pairs of both, which have none in common, in rows of ascending mentors. Time and memory O(pairs). */
export function mergedRows(a: Rows, b: Rows): Rows {
  const builder = new RowBuilder(a.rowStart.length - 1, a.target.length + b.target.length);
  for (let row = 0; row + 1 < a.rowStart.length; row++) {
    let left = a.rowStart[row]!;
    let right = b.rowStart[row]!;
    while (left < a.rowStart[row + 1]! || right < b.rowStart[row + 1]!) {
      const takeLeft =
        right === b.rowStart[row + 1]! || (left < a.rowStart[row + 1]! && a.target[left]! < b.target[right]!);
      const from = takeLeft ? a : b;
      const at = takeLeft ? left++ : right++;
      builder.add(from.target[at]!, from.fit[at]!);
    }
    builder.endRow();
  }
  return builder.rows();
}

/** Locks and bars between people who are both in the input, as positions; others have no effect. */
export function decisionsOf(input: MatchingInput): Decided[] {
  const menteeAt = new Map(input.mentees.map((mentee, at) => [mentee.key, at]));
  const mentorAt = new Map(input.mentors.map((mentor, at) => [mentor.key, at]));
  return input.decisions.flatMap(({ mentee, mentor, kind, overridesRules }) => {
    const i = menteeAt.get(mentee);
    const j = mentorAt.get(mentor);
    return i === undefined || j === undefined ? [] : [{ mentee: i, mentor: j, kind, overridesRules }];
  });
}

/** What the engine adds to a mentee's fits: the bonus of those left out last time. */
export const bonusesOf = (input: MatchingInput): Int32Array =>
  Int32Array.from(input.mentees, (mentee) => (mentee.leftOutLastTime ? input.settings.leftOutBonus : 0));

/**
 * The problem of a run. Pairs that a rule excludes are absent, save locks that override the rules. Time O(mentees × mentors),
 * memory O(eligible pairs). `tick` is called after each mentee, with the share done; whatever it throws abandons the work.
 */
export function buildProblem(input: MatchingInput, tick: (share: number) => void = () => undefined): BuiltProblem {
  const judge = judgeOf(input);
  const { menteeCount, mentorCount } = judge.columns;
  const decided = decisionsOf(input);
  const overridden = new Set(
    decided
      .filter((each) => each.kind === 'lock' && each.overridesRules)
      .map((each) => each.mentee * mentorCount + each.mentor),
  );
  const bonus = bonusesOf(input);
  const builder = new RowBuilder(menteeCount);
  for (let i = 0; i < menteeCount; i++) {
    for (let j = 0; j < mentorCount; j++) {
      let fit = eligibleFit(judge, i, j);
      if (fit === NOT_ELIGIBLE && overridden.has(i * mentorCount + j)) fit = fitOf(judge.criteria, i, j);
      if (fit !== NOT_ELIGIBLE) builder.add(j, fit + bonus[i]!);
    }
    builder.endRow();
    tick((i + 1) / menteeCount);
  }
  return {
    problem: sidesOf(input, builder.rows()),
    options: { aim: input.settings.aim, ...locksAndBars(decided, judge, overridden) },
    bonus,
    judge,
  };
}

/** Completes rows with the mentors' places and charges. */
export function sidesOf(input: MatchingInput, rows: Rows): PairingProblem {
  return {
    menteeCount: input.mentees.length,
    mentorCount: input.mentors.length,
    capacity: Int32Array.from(input.mentors, (mentor) => mentor.places),
    placesTaken: Int32Array.from(input.mentors, (mentor) => mentor.taken),
    loadCharge: Int32Array.from(input.settings.loadCharges),
    ...rows,
  };
}

/** A bar on a pair that is not eligible anyway says nothing new; a lock on one is refused by the engine. */
function locksAndBars(
  decided: readonly Decided[],
  judge: Judge,
  overridden: ReadonlySet<number>,
): { locked: Pair[]; barred: Pair[] } {
  const pair = (each: Decided): Pair => [each.mentee, each.mentor];
  const mentorCount = judge.columns.mentorCount;
  return {
    locked: decided.filter((each) => each.kind === 'lock').map(pair),
    barred: decided
      .filter((each) => each.kind === 'bar' && !overridden.has(each.mentee * mentorCount + each.mentor))
      .map(pair),
  };
}
