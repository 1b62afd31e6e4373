/** Matching cycles: phases, dates, rules and criteria. */
import { z } from 'zod';
import { MatchingSettings } from '../matching/matching-contract';

export const CYCLE_PHASES = [
  'draft',
  'open',
  'applications-closed',
  'matching',
  'responses',
  'under-way',
  'closing',
  'closed',
  'cancelled',
] as const;
export const CyclePhase = z.enum(CYCLE_PHASES);
export type CyclePhase = z.infer<typeof CyclePhase>;
export const PHASE_LABEL: Record<CyclePhase, string> = {
  draft: 'Draft',
  open: 'Open for applications',
  'applications-closed': 'Applications closed',
  matching: 'Matching',
  responses: 'Responses',
  'under-way': 'Under way',
  closing: 'Closing',
  closed: 'Closed',
  cancelled: 'Cancelled',
};

/** Who is asked first: both sides at once, or the mentor and then the mentee. */
export const AskFirst = z.enum(['both', 'mentor']);
export type AskFirst = z.infer<typeof AskFirst>;

const day = z.iso.date('Enter a date');

/** Dates are days in the association's time zone; a deadline is the end of its day. */
export const CycleDates = z.object({
  applicationsOpenOn: day,
  applicationsCloseOn: day,
  answersDueOn: day,
  startsOn: day,
  checkInOn: day,
  endsOn: day,
});
export type CycleDates = z.infer<typeof CycleDates>;

const DATE_ORDER: readonly [keyof CycleDates, keyof CycleDates, string][] = [
  ['applicationsOpenOn', 'applicationsCloseOn', 'Applications close on or after the day they open'],
  ['applicationsCloseOn', 'answersDueOn', 'Answers are due on or after the day applications close'],
  ['answersDueOn', 'endsOn', 'The cycle ends after answers are due'],
  ['startsOn', 'checkInOn', 'The half-way check-in is on or after the day pairs start'],
  ['checkInOn', 'endsOn', 'The cycle ends on or after the half-way check-in'],
];

const cycleFields = CycleDates.extend({
  name: z.string().trim().min(3, 'At least 3 characters').max(80, 'At most 80 characters').normalize('NFC'),
  introduction: z.string().trim().max(4000, 'At most 4000 characters'),
  consentText: z
    .string()
    .trim()
    .min(20, 'Say what applicants agree to, in at least 20 characters')
    .max(8000, 'At most 8000 characters'),
  askFirst: AskFirst,
  /** Complete applications sent before the deadline are admitted without a coordinator's decision. */
  autoAdmit: z.boolean(),
  /** A second coordinator approves a plan before it is published. */
  needsApproval: z.boolean().default(false),
});

function checkDates(cycle: CycleDates, check: z.RefinementCtx): void {
  for (const [earlier, later, message] of DATE_ORDER) {
    if (cycle[earlier] > cycle[later]) check.addIssue({ code: 'custom', path: [later], message });
  }
}

export const CycleDraft = z.strictObject(cycleFields.shape).superRefine(checkDates);
export type CycleDraft = z.infer<typeof CycleDraft>;
/** `copyFrom`: a cycle whose rules, criteria and weights the new one starts with; null = the default set. */
export const NewCycle = z
  .strictObject({ ...cycleFields.shape, copyFrom: z.uuid().nullable().default(null) })
  .superRefine(checkDates);
export type NewCycle = z.input<typeof NewCycle>;

/** What anybody may know of a cycle. */
export const CycleSummary = cycleFields
  .omit({ autoAdmit: true, needsApproval: true, consentText: true, askFirst: true })
  .extend({
    id: z.uuid(),
    phase: CyclePhase,
  });
export type CycleSummary = z.infer<typeof CycleSummary>;
/** What an applicant reads before applying. */
export const CycleToApply = CycleSummary.extend({ consentText: z.string(), consentVersion: z.int() });
export type CycleToApply = z.infer<typeof CycleToApply>;
export const CycleList = z.object({ cycles: z.array(CycleSummary) });
export type CycleList = z.infer<typeof CycleList>;

export const CycleCounts = z.object({
  applications: z.int(),
  mentees: z.int(),
  mentors: z.int(),
  places: z.int(),
  /** Submitted, not yet admitted or put on the waiting list. */
  undecided: z.int(),
  waitingList: z.int(),
  withdrawn: z.int(),
  runs: z.int(),
  latestRun: z.int().nullable(),
  rounds: z.int(),
  pending: z.int(),
  underWay: z.int(),
  declined: z.int(),
  activeRules: z.int(),
  activeCriteria: z.int(),
});
export type CycleCounts = z.infer<typeof CycleCounts>;

/** One line of the check-list for moving a cycle on. `blocks` = the server refuses the move while it is not done. */
export const CheckItem = z.object({ text: z.string(), done: z.boolean(), blocks: z.boolean() });
export type CheckItem = z.infer<typeof CheckItem>;

export const Cycle = cycleFields.extend({
  id: z.uuid(),
  phase: CyclePhase,
  consentVersion: z.int(),
  version: z.int(),
  settingsVersion: z.int(),
  counts: CycleCounts,
  next: CyclePhase.nullable(),
  checklist: z.array(CheckItem),
  previous: CyclePhase.nullable(),
});
export type Cycle = z.infer<typeof Cycle>;

export const CycleParams = z.object({ cycleId: z.uuid() });

export const PhaseMove = z.strictObject({
  to: CyclePhase,
  /** Needed for moving back and for cancelling. */
  reason: z.string().trim().max(500, 'At most 500 characters').default(''),
});
export type PhaseMove = z.input<typeof PhaseMove>;

export const CycleSettings = z.object({
  cycleId: z.uuid(),
  version: z.int(),
  settings: MatchingSettings,
  savedBy: z.string().nullable(),
  savedAt: z.iso.datetime().nullable(),
});
export type CycleSettings = z.infer<typeof CycleSettings>;

export const SettingsHistory = z.object({
  versions: z.array(
    z.object({
      version: z.int(),
      savedBy: z.string().nullable(),
      savedAt: z.iso.datetime(),
      settings: MatchingSettings,
    }),
  ),
});
export type SettingsHistory = z.infer<typeof SettingsHistory>;
