/** A run from its frozen input to its verified plan and everything the plan page shows. No I/O and no clock of its own. */
import {
  blockingPairs,
  leftOutByChoice,
  solve,
  standbys,
  steadiness,
  tradeOff,
  verify,
  type PairingPlan,
} from '../assignment';
import { buildProblem, type BuiltProblem } from './build-problem';
import { fitOf, scoresOf } from './criteria';
import { describeShortages } from './describe-shortages';
import { edgeScores, fitsOfSide, reweighted } from './edge-scores';
import type { MatchingInput } from './matching-input';
import { reasonsForLeftOut } from './left-out';
import { proofStatement } from './proof-statement';
import type { PlanReport } from './runs-contract';
import { soleObjections } from './rule-effects';

export const ENGINE_VERSION = 'heddle-assignment 1';
const STEADINESS_RUNS = 50;
/** A pairing is steady where it stays in at least this share of the reweighted runs. */
const STEADY_SHARE = 0.9;
/** Beyond this, 50 more solves and the scores of every pair cost more than the answer is worth. */
const MOST_PAIRS_FOR_STEADINESS = 300_000;
/** The curve is one solve a step in memory of the last; beyond this it is left to be asked for. */
const MOST_PAIRS_FOR_CURVE = 3_000_000;

export interface PlannedPairing {
  mentee: string;
  mentor: string;
  fit: number;
  /** 1 = the mentor's first place in this run. */
  place: number;
  scores: number[];
  stays: number | null;
  locked: boolean;
}

export interface MadePlan {
  plan: PairingPlan;
  report: Omit<PlanReport, 'record'> & { record: Omit<PlanReport['record'], 'inputHash'> };
  pairings: PlannedPairing[];
}

/** Thrown where the plan does not verify: it is never shown. */
export class UnprovenPlan extends Error {
  constructor(faults: readonly string[]) {
    super(`The plan did not pass its verification: ${faults.join('; ')}`);
    this.name = 'UnprovenPlan';
  }
}

export interface Watch {
  /** Share of the whole done, and what is being done; throw to abandon. */
  report(share: number, stage: string): void;
  /** Milliseconds. */
  now(): number;
}

export function makePlan(input: MatchingInput, watch: Watch): MadePlan {
  const timings: Record<string, number> = {};
  const timed = <T>(
    stage: string,
    words: string,
    from: number,
    to: number,
    work: (tick: (share: number) => void) => T,
  ): T => {
    const start = watch.now();
    watch.report(from, words);
    const result = work((share) => watch.report(from + (to - from) * share, words));
    timings[stage] = watch.now() - start;
    return result;
  };
  const built = timed('build', 'Weighing every pair', 0, 0.3, (tick) => buildProblem(input, tick));
  const plan = timed('solve', 'Finding the best plan', 0.3, 0.55, (tick) =>
    solve(built.problem, { ...built.options, onProgress: tick }),
  );
  timed('verify', 'Checking the proof', 0.55, 0.6, () => {
    const verdict = verify(built.problem, plan, built.options);
    if (!verdict.ok) throw new UnprovenPlan(verdict.faults);
  });
  const shortages = timed('shortages', 'Explaining who is left out', 0.6, 0.75, (tick) =>
    describeShortages(built, plan, soleObjections(built.judge), () => tick(0.5)),
  );
  const curve = timed('tradeOff', 'Drawing the trade-off', 0.75, 0.8, () =>
    built.problem.target.length > MOST_PAIRS_FOR_CURVE ? [] : tradeOff(built.problem, built.options),
  );
  const spare = timed('standbys', 'Choosing standbys', 0.8, 0.85, () => standbys(built.problem, plan, built.options));
  const robust = timed('steadiness', 'Moving the weights', 0.85, 1, (tick) => robustness(built, plan, tick));

  const pairings = pairingsOf(built, plan, robust.stays);
  const fits = pairings.map((pairing) => pairing.fit);
  const totalFit = fits.reduce((sum, fit) => sum + fit, 0);
  const byChoice = new Set(leftOutByChoice(built.problem, plan, built.options));
  const leftOut = [...plan.mentorOf.keys()].filter((i) => plan.mentorOf[i]! < 0);
  const keyOf = (i: number): string => input.mentees[i]!.key;
  return {
    plan,
    pairings,
    report: {
      mentees: input.mentees.length,
      mentors: input.mentors.length,
      places: input.mentors.reduce((sum, mentor) => sum + mentor.places, 0),
      eligiblePairs: built.problem.target.length,
      paired: plan.paired,
      leftOut: leftOut.map(keyOf),
      leftOutByChoice: [...byChoice].map(keyOf),
      leftOutBecause: reasonsForLeftOut(built, leftOut, byChoice, shortages),
      meanFit: fits.length === 0 ? 0 : totalFit / fits.length,
      weakestFit: fits.length === 0 ? 0 : Math.min(...fits),
      totalFit,
      totalCharge: plan.totalCharge,
      steady: robust.stays ? pairings.filter((pairing) => pairing.stays! >= STEADY_SHARE).length : null,
      blockingPairs: robust.blocking,
      method: plan.method,
      proof: { ok: true, statement: proofStatement(built, plan), checkedAt: new Date(watch.now()).toISOString() },
      shortages: shortages.views,
      tradeOff: curve,
      standbys: standbysOf(built, spare.mentor),
      record: { seed: input.settings.seed, engine: ENGINE_VERSION, settings: input.settings, timings },
    },
  };
}

function robustness(
  built: BuiltProblem,
  plan: PairingPlan,
  tick: (share: number) => void,
): { stays: Float64Array | null; blocking: number | null } {
  const { problem, judge, bonus, options } = built;
  if (problem.target.length > MOST_PAIRS_FOR_STEADINESS) return { stays: null, blocking: null };
  const scores = edgeScores(problem, judge);
  let done = 0;
  const solveReweighted = (factors: Float64Array): Int32Array => {
    tick(++done / (STEADINESS_RUNS + 1));
    return solve({ ...problem, fit: reweighted(problem, scores, factors, bonus) }, options).mentorOf;
  };
  return {
    stays: steadiness(
      STEADINESS_RUNS,
      judge.input.settings.seed,
      solveReweighted,
      judge.criteria.length,
      plan.mentorOf,
    ),
    blocking: blockingPairs(
      problem,
      plan,
      fitsOfSide(problem, judge, scores, 'mentee'),
      fitsOfSide(problem, judge, scores, 'mentor'),
      options,
    ),
  };
}

function pairingsOf(built: BuiltProblem, plan: PairingPlan, stays: Float64Array | null): PlannedPairing[] {
  const { judge, options } = built;
  const locked = new Set(options.locked.map(([mentee]) => mentee));
  const used = new Int32Array(judge.input.mentors.length);
  const pairings: PlannedPairing[] = [];
  plan.mentorOf.forEach((j, i) => {
    if (j < 0) return;
    pairings.push({
      mentee: judge.input.mentees[i]!.key,
      mentor: judge.input.mentors[j]!.key,
      fit: fitOf(judge.criteria, i, j),
      place: ++used[j]!,
      scores: scoresOf(judge.criteria, i, j),
      stays: stays ? stays[i]! : null,
      locked: locked.has(i),
    });
  });
  return pairings;
}

function standbysOf({ judge }: BuiltProblem, mentorOf: Int32Array): PlanReport['standbys'] {
  const { mentees, mentors } = judge.input;
  return Object.fromEntries(
    [...mentorOf.entries()]
      .filter(([, j]) => j >= 0)
      .map(([i, j]) => [mentees[i]!.key, { mentor: mentors[j]!.key, fit: fitOf(judge.criteria, i, j) }]),
  );
}
