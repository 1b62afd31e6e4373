/** Pure decisions about applications that both sides make. */
import type { CyclePhase } from '../cycles/cycles-contract';
import type { ApplicationStatus } from './applications-contract';

/** What a coordinator should look at, in the order in which the table names it. */
export const APPLICANT_FLAGS = {
  notReady: 'Profile lacks what matching needs',
  employerUnknown: 'Employer unknown',
  membershipNotCurrent: 'Membership not current',
  bothSides: 'Applies on both sides',
  late: 'Late',
  noConsent: 'Consent not given yet',
} as const;
export type ApplicantFlag = keyof typeof APPLICANT_FLAGS;

const ON_TIME: readonly CyclePhase[] = ['open'];
const LATE: readonly CyclePhase[] = ['applications-closed', 'matching', 'responses'];

/** New applications are taken; after the deadline for the waiting list. */
export const takesApplications = (phase: CyclePhase): boolean => ON_TIME.includes(phase) || LATE.includes(phase);

/** An application's content is the applicant's own until the cycle is in matching. */
export const mayChangeApplication = (phase: CyclePhase): boolean => phase === 'open' || phase === 'applications-closed';

/**
 * Late is who applies after the cycle stopped taking applications or after the end of the closing day.
 *
 * @param today the day of the application in the association's time zone, `YYYY-MM-DD`
 * @param closesOn the last day for applications, `YYYY-MM-DD`
 */
export const isLate = (phase: CyclePhase, today: string, closesOn: string): boolean =>
  !ON_TIME.includes(phase) || today > closesOn;

/** Coordinators decide about applications until the cycle closes. */
export const mayDecide = (phase: CyclePhase): boolean => !['closing', 'closed', 'cancelled'].includes(phase);

/** Lists are brought in before matching is over. */
export const mayImport = (phase: CyclePhase): boolean =>
  ['draft', 'open', 'applications-closed', 'matching'].includes(phase);

/** One sentence for the applicant: what happens next. */
export function nextStep(status: ApplicationStatus, phase: CyclePhase): string {
  if (status === 'withdrawn') return 'You take no part in this cycle.';
  if (phase === 'cancelled') return 'The cycle was cancelled; nothing more happens.';
  if (phase === 'closing' || phase === 'closed') return 'This cycle is over.';
  if (status === 'waiting-list')
    return 'You are on the waiting list: when a place becomes free, a coordinator draws on it and you hear from us.';
  if (phase === 'under-way') return 'Pairs are meeting. If you are in one, your pair’s room is the place to go on.';
  if (phase === 'responses') return 'Proposals have been sent. If you have one, please answer it before the deadline.';
  if (status === 'submitted') return 'A coordinator looks at it and admits it; a complete profile helps.';
  return phase === 'matching'
    ? 'Pairings are being made now. You will get a proposal, or a message that says why there is none.'
    : 'You take part in matching once applications are closed. Until then you can change what you sent.';
}
