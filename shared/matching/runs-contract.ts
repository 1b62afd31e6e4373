/** Runs and plans: what coordinators start, watch, read and publish. */
import { z } from 'zod';
import { AskFirst } from '../cycles/cycles-contract';
import { Aim, MatchingSettings } from './matching-contract';

export const RunState = z.enum(['queued', 'running', 'succeeded', 'failed', 'cancelled']);
export type RunState = z.infer<typeof RunState>;
export const RUN_STATE_LABEL: Record<RunState, string> = {
  queued: 'Waiting',
  running: 'Running',
  succeeded: 'Done',
  failed: 'Failed',
  cancelled: 'Cancelled',
};

const Applicants = z.array(z.uuid());

/** A group of mentees who compete for too few places. People are application ids. */
export const ShortageView = z.object({
  mentees: Applicants,
  mentors: Applicants,
  leftOut: Applicants,
  places: z.int(),
  short: z.int(),
  /** Who could have whom, as positions in `mentees` and `mentors`; empty where the group is too large to be drawn. */
  links: z.array(z.tuple([z.int(), z.int()])),
  /** What the mentees have in common, in words: "hydrographic · Islands". Empty where nothing stands out. */
  inCommon: z.string(),
  remedies: z.array(
    z.object({
      kind: z.enum(['more-places', 'without-rule', 'release-lock', 'recruit']),
      label: z.string(),
      detail: z.string(),
      gain: z.int(),
      /** Mentors (application ids) or the rule's key, for acting on it at once. */
      mentors: Applicants,
      rule: z.string().nullable(),
    }),
  ),
});
export type ShortageView = z.infer<typeof ShortageView>;

export const TradeOffPoint = z.object({
  pairs: z.int(),
  netFit: z.number(),
  totalFit: z.number(),
  weakestFit: z.int(),
});
export type TradeOffPoint = z.infer<typeof TradeOffPoint>;

/** Everything the plan page shows before anyone asks for more. Fits are 0..10000. */
export const PlanReport = z.object({
  mentees: z.int(),
  mentors: z.int(),
  places: z.int(),
  eligiblePairs: z.int(),
  paired: z.int(),
  leftOut: Applicants,
  /** Left out though a place could be had: only under other aims. */
  leftOutByChoice: Applicants,
  /** For each person left out (application id): why, in a sentence, and the shortage (its position) they belong to. */
  leftOutBecause: z.record(z.string(), z.object({ text: z.string(), shortage: z.int().nullable() })),
  meanFit: z.number(),
  weakestFit: z.int(),
  totalFit: z.number(),
  totalCharge: z.number(),
  /** Pairings that stay in at least nine of ten reweighted runs; null where not computed. */
  steady: z.int().nullable(),
  blockingPairs: z.int().nullable(),
  method: z.string(),
  proof: z.object({ ok: z.boolean(), statement: z.string(), checkedAt: z.iso.datetime() }),
  shortages: z.array(ShortageView),
  tradeOff: z.array(TradeOffPoint),
  standbys: z.record(z.string(), z.object({ mentor: z.uuid(), fit: z.int() })),
  record: z.object({
    inputHash: z.string(),
    seed: z.int(),
    engine: z.string(),
    settings: MatchingSettings,
    timings: z.record(z.string(), z.number()),
  }),
});
export type PlanReport = z.infer<typeof PlanReport>;

export const RunLine = z.object({
  id: z.uuid(),
  number: z.int(),
  state: RunState,
  progress: z.number(),
  stage: z.string(),
  cancelRequested: z.boolean(),
  fault: z.string().nullable(),
  requestedBy: z.string().nullable(),
  createdAt: z.iso.datetime(),
  startedAt: z.iso.datetime().nullable(),
  finishedAt: z.iso.datetime().nullable(),
  paired: z.int().nullable(),
  leftOut: z.int().nullable(),
  meanFit: z.number().nullable(),
  weakestFit: z.int().nullable(),
  publishedAsRound: z.int().nullable(),
});
export type RunLine = z.infer<typeof RunLine>;
export const RunList = z.object({ runs: z.array(RunLine) });
export type RunList = z.infer<typeof RunList>;
export const RunParams = z.object({ runId: z.uuid() });

/** One person of a plan, by application. */
export const PlanPerson = z.object({
  applicationId: z.uuid(),
  name: z.string(),
  /** The first practice area that the mentee seeks or the mentor offers; empty where none is given. */
  area: z.string(),
  region: z.string(),
  employer: z.string(),
  /** A mentor's places in this run; 0 for a mentee. */
  places: z.int(),
});
export type PlanPerson = z.infer<typeof PlanPerson>;

export const PlanPairing = z.object({
  mentee: z.uuid(),
  mentor: z.uuid(),
  fit: z.int(),
  place: z.int(),
  /** In the order of `criteria`; −1 = missing data, counted as half. */
  scores: z.array(z.int()),
  stays: z.number().nullable(),
  locked: z.boolean(),
});
export type PlanPairing = z.infer<typeof PlanPairing>;

export const Plan = z.object({
  run: RunLine,
  cycleId: z.uuid(),
  report: PlanReport,
  criteria: z.array(z.object({ key: z.string(), label: z.string(), short: z.string(), weight: z.number() })),
  mentees: z.array(PlanPerson),
  mentors: z.array(PlanPerson),
  pairings: z.array(PlanPairing),
  decisions: z.array(
    z.object({
      mentee: z.uuid(),
      mentor: z.uuid(),
      kind: z.enum(['lock', 'bar']),
      note: z.string(),
      overridesRules: z.boolean(),
    }),
  ),
  /** What changed since the run froze its inputs: sentences; a withdrawn applicant always blocks publishing. */
  changedSince: z.array(z.object({ text: z.string(), blocks: z.boolean() })),
  mayPublish: z.boolean(),
});
export type Plan = z.infer<typeof Plan>;

/** One criterion's part in a pair's fit. */
export const CriterionPart = z.object({
  key: z.string(),
  label: z.string(),
  score: z.number(),
  weight: z.number(),
  share: z.number(),
  missing: z.boolean(),
  text: z.string(),
});
export type CriterionPart = z.infer<typeof CriterionPart>;

/** Why two people may or may not be paired, and how well they fit. */
export const PairReasons = z.object({
  eligible: z.boolean(),
  reasons: z.array(z.object({ rule: z.string(), label: z.string(), text: z.string() })),
  fit: z.int(),
  criteria: z.array(CriterionPart),
});
export type PairReasons = z.infer<typeof PairReasons>;

/** For one mentee: every eligible mentor, and what choosing each would cost the whole plan. */
export const Alternatives = z.object({
  mentee: z.uuid(),
  current: z.uuid().nullable(),
  barring: z.object({ pairsLost: z.int(), fitLost: z.int() }).nullable(),
  options: z.array(
    z.object({
      mentor: z.uuid(),
      name: z.string(),
      fit: z.int(),
      pairsLost: z.int(),
      fitLost: z.int(),
      current: z.boolean(),
    }),
  ),
});
export type Alternatives = z.infer<typeof Alternatives>;

export const PairOfApplications = z.object({ mentee: z.uuid(), mentor: z.uuid() });
export type PairOfApplications = z.infer<typeof PairOfApplications>;
export const PairDecisionForm = z.strictObject({
  mentee: z.uuid(),
  mentor: z.uuid(),
  kind: z.enum(['lock', 'bar', 'none']),
  note: z.string().trim().max(500, 'At most 500 characters').default(''),
  /** Keep a lock that a rule forbids; needs a note. */
  overridesRules: z.boolean().default(false),
});
export type PairDecisionForm = z.input<typeof PairDecisionForm>;

export const PairDecisions = z.object({
  decisions: z.array(
    z.object({
      mentee: z.uuid(),
      menteeName: z.string(),
      mentor: z.uuid(),
      mentorName: z.string(),
      kind: z.enum(['lock', 'bar']),
      note: z.string(),
      overridesRules: z.boolean(),
      decidedAt: z.iso.datetime(),
    }),
  ),
});
export type PairDecisions = z.infer<typeof PairDecisions>;

export const RunRequest = z.strictObject({
  /** Try with these settings instead of the cycle's; null = the cycle's. */
  settings: MatchingSettings.nullable().default(null),
});
export type RunRequest = z.input<typeof RunRequest>;

export const PublishReview = z.object({
  run: RunLine,
  round: z.int(),
  proposals: z.int(),
  messages: z.int(),
  askFirst: AskFirst,
  pairings: z.array(
    z.object({ mentee: z.uuid(), menteeName: z.string(), mentor: z.uuid(), mentorName: z.string(), fit: z.int() }),
  ),
  leftOut: z.array(z.object({ applicationId: z.uuid(), name: z.string(), told: z.string() })),
  answersDueAt: z.iso.datetime(),
  changedSince: z.array(z.object({ text: z.string(), blocks: z.boolean() })),
  refusal: z.string().nullable(),
  /** Where the cycle asks for a second coordinator: who approved, and whether the reader may. */
  approval: z.object({ needed: z.boolean(), by: z.string().nullable(), mayApprove: z.boolean() }),
  version: z.int(),
});
export type PublishReview = z.infer<typeof PublishReview>;
export const PublishRequest = z.strictObject({
  /** The differences since the run that were on the screen are acknowledged. */
  acknowledgedChanges: z.boolean().default(false),
});
export type PublishRequest = z.input<typeof PublishRequest>;
export const PublishOutcome = z.object({ round: z.int(), proposals: z.int(), messages: z.int() });
export type PublishOutcome = z.infer<typeof PublishOutcome>;

export const PriceQuery = z.object({ kind: z.enum(['lock', 'bar']) });
export const PersonOfRunParams = RunParams.extend({ applicationId: z.uuid() });
export const PairOfRunParams = RunParams.extend({ mentee: z.uuid(), mentor: z.uuid() });

/** What a lock or a bar would cost the run's plan, before it is made. */
export const DecisionPrice = z.object({
  /** Mentees who could no longer be paired, and fit (0..10000 a pair) lost at that number. */
  pairsLost: z.int(),
  fitLost: z.int(),
  /** Why it cannot be, or only on purpose; null where nothing stands in the way. */
  refusal: z.string().nullable(),
  /** True where a coordinator may keep the lock all the same, with a note. */
  mayOverride: z.boolean(),
});
export type DecisionPrice = z.infer<typeof DecisionPrice>;
export const DecisionPrices = z.object({ lock: DecisionPrice, bar: DecisionPrice });
export type DecisionPrices = z.infer<typeof DecisionPrices>;

const Ints = z.array(z.int());
const Numbers = z.array(z.number());
const IndexPairs = z.array(z.tuple([z.int(), z.int()]));

/** The problem and the plan as arrays, for checking the proof with one's own machine (see shared/assignment, `verify`). */
export const ProofArrays = z.object({
  problem: z.object({
    menteeCount: z.int(),
    mentorCount: z.int(),
    capacity: Ints,
    rowStart: Ints,
    target: Ints,
    fit: Ints,
    loadCharge: Ints.nullable(),
    placesTaken: Ints.nullable(),
  }),
  options: z.object({
    aim: Aim,
    floor: z.int(),
    locked: IndexPairs,
    barred: IndexPairs,
    overridden: IndexPairs,
  }),
  plan: z.object({
    aim: Aim,
    method: z.enum(['complete', 'cardinality-first', 'best-total']),
    mentorOf: Ints,
    paired: z.int(),
    totalFit: z.number(),
    totalCharge: z.number(),
    weakestFit: z.int(),
    menteePrice: Numbers,
    mentorPrice: Numbers,
    lift: z
      .object({
        threshold: z.int(),
        cardinalityCover: z.object({ mentees: Ints, mentors: Ints }),
        thresholdCover: z.object({ mentees: Ints, mentors: Ints }),
      })
      .nullable(),
  }),
});
export type ProofArrays = z.infer<typeof ProofArrays>;

/** Two plans of one cycle, person by person: only those mentees whose mentor differs. */
export const ComparisonParams = RunParams.extend({ otherId: z.uuid() });
const PlacedWith = z.object({ mentor: z.uuid().nullable(), name: z.string(), fit: z.int().nullable() });
export const PlanComparison = z.object({
  before: RunLine,
  after: RunLine,
  same: z.int(),
  changed: z.array(z.object({ mentee: z.uuid(), name: z.string(), before: PlacedWith, after: PlacedWith })),
  /** Differences of settings and people between the two, in sentences. */
  because: z.array(z.string()),
});
export type PlanComparison = z.infer<typeof PlanComparison>;
