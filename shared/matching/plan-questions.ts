/** Questions about a finished run, answered from what it read and what it found; nothing is looked up anew. */
import { findEdge, priceOfChoice, pricesOfPartners, type Pair, type PairingPlan, type Price } from '../assignment';
import { buildProblem, type BuiltProblem } from './build-problem';
import { NEVER_OVERRIDDEN } from './catalogue';
import { explainPair } from './explain-pair';
import { fitOf } from './criteria';
import type { MatchingInput } from './matching-input';
import type { Alternatives, DecisionPrice, PairReasons, ProofArrays } from './runs-contract';
import { packPlan, unpackPlan, type StoredPlan } from './stored-plan';

export interface OpenPlan {
  built: BuiltProblem;
  plan: PairingPlan;
  /** Positions by application. */
  menteeAt: ReadonlyMap<string, number>;
  mentorAt: ReadonlyMap<string, number>;
}

export function openPlan(input: MatchingInput, stored: StoredPlan): OpenPlan {
  return {
    built: buildProblem(input),
    plan: unpackPlan(stored),
    menteeAt: new Map(input.mentees.map((mentee, at) => [mentee.key, at])),
    mentorAt: new Map(input.mentors.map((mentor, at) => [mentor.key, at])),
  };
}

/** Names come from elsewhere: the frozen input knows pseudonymous keys alone. */
export type NamelessAlternatives = Omit<Alternatives, 'options'> & {
  options: Omit<Alternatives['options'][number], 'name'>[];
};

/** All eligible mentors of a mentee with the price of each; null where the mentee was not in the run. */
export function alternativesOf({ built, plan, menteeAt }: OpenPlan, mentee: string): NamelessAlternatives | null {
  const i = menteeAt.get(mentee);
  if (i === undefined) return null;
  const { problem, options, judge } = built;
  const current = plan.mentorOf[i]!;
  const locked = options.locked.some(([each]) => each === i);
  const row = [...problem.target.subarray(problem.rowStart[i], problem.rowStart[i + 1])];
  const prices: (Price | null)[] = locked ? row.map(() => null) : pricesOfPartners(problem, plan, i, options);
  const mentorKey = (j: number): string => judge.input.mentors[j]!.key;
  const choices = row.flatMap((j, at) => {
    const price = j === current ? NOTHING_LOST : prices[at];
    if (!price) return [];
    return [{ mentor: mentorKey(j), fit: fitOf(judge.criteria, i, j), ...price, current: j === current }];
  });
  return {
    mentee,
    current: current < 0 ? null : mentorKey(current),
    barring: current < 0 || locked ? null : priceOfChoice(problem, plan, { bar: [i, current] }, options),
    options: choices.sort((a, b) => a.pairsLost - b.pairsLost || a.fitLost - b.fitLost || b.fit - a.fit),
  };
}

const NOTHING_LOST: Price = { pairsLost: 0, fitLost: 0 };

export function reasonsOf({ built, menteeAt, mentorAt }: OpenPlan, mentee: string, mentor: string): PairReasons | null {
  const i = menteeAt.get(mentee);
  const j = mentorAt.get(mentor);
  return i === undefined || j === undefined ? null : explainPair(built.judge, i, j);
}

/** What a lock or a bar would cost this plan; null where one of the two was not in the run. */
export function priceOfDecision(
  open: OpenPlan,
  mentee: string,
  mentor: string,
  kind: 'lock' | 'bar',
): DecisionPrice | null {
  const { built, plan, menteeAt, mentorAt } = open;
  const { problem, options } = built;
  const i = menteeAt.get(mentee);
  const j = mentorAt.get(mentor);
  if (i === undefined || j === undefined) return null;
  const pair: Pair = [i, j];
  const refused = (refusal: string, mayOverride = false): DecisionPrice => ({
    pairsLost: 0,
    fitLost: 0,
    refusal,
    mayOverride,
  });
  if (options.locked.some(([each]) => each === i))
    return refused('This mentee is locked already; release that lock first');
  if (kind === 'bar') {
    if (plan.mentorOf[i] !== j) return { ...NOTHING_LOST, refusal: null, mayOverride: false };
    return { ...priceOfChoice(problem, plan, { bar: pair }, options), refusal: null, mayOverride: false };
  }
  if (findEdge(problem, i, j) < 0) {
    const { reasons } = explainPair(built.judge, i, j);
    const never = reasons.some((reason) => NEVER_OVERRIDDEN.has(reason.rule));
    return refused(`The rules exclude this pairing: ${reasons.map((reason) => reason.text).join(' ')}`, !never);
  }
  if (plan.mentorOf[i] === j) return { ...NOTHING_LOST, refusal: null, mayOverride: false };
  const locksThere = options.locked.filter(([, each]) => each === j).length;
  if (locksThere >= problem.capacity[j]!) return refused('All places of this mentor are locked or taken already');
  if (options.barred.some(([a, b]) => a === i && b === j)) return refused('This pairing is barred; lift the bar first');
  return { ...priceOfChoice(problem, plan, { force: pair }, options), refusal: null, mayOverride: false };
}

/** Problem, options and plan as plain arrays, for checking the proof elsewhere. */
export function proofOf({ built, plan }: OpenPlan): ProofArrays {
  const { problem, options } = built;
  const { loadCharge, placesTaken } = problem;
  const pairs = (list: readonly Pair[]): [number, number][] => list.map(([mentee, mentor]) => [mentee, mentor]);
  return {
    problem: {
      menteeCount: problem.menteeCount,
      mentorCount: problem.mentorCount,
      capacity: [...problem.capacity],
      rowStart: [...problem.rowStart],
      target: [...problem.target],
      fit: [...problem.fit],
      loadCharge: loadCharge ? [...loadCharge] : null,
      placesTaken: placesTaken ? [...placesTaken] : null,
    },
    options: {
      aim: options.aim,
      floor: 0,
      locked: pairs(options.locked),
      barred: pairs(options.barred),
      overridden: [],
    },
    plan: packPlan(plan),
  };
}
