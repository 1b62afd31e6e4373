/** Pure decisions about answers to a proposal, made alike by server and pages. */
import type { ApplicationSide } from '../applications/applications-contract';
import type { AskFirst } from '../cycles/cycles-contract';
import type { PairingAnswer, PairingState } from './pairings-contract';

export interface Answered {
  state: PairingState;
  menteeAnswer: PairingAnswer;
  mentorAnswer: PairingAnswer;
  /** An instant. */
  answersDueAt: Date;
}

export const answerOf = (
  pairing: Pick<Answered, 'menteeAnswer' | 'mentorAnswer'>,
  side: ApplicationSide,
): PairingAnswer => (side === 'mentee' ? pairing.menteeAnswer : pairing.mentorAnswer);

export const otherSide = (side: ApplicationSide): ApplicationSide => (side === 'mentee' ? 'mentor' : 'mentee');

/** Has this side been asked yet? Where mentors are asked first, mentees hear once their mentor has accepted. */
export const wasAsked = (pairing: Answered, side: ApplicationSide, askFirst: AskFirst): boolean =>
  side === 'mentor' || askFirst === 'both' || pairing.mentorAnswer === 'accepted';

/** May this side accept or decline now? */
export function mayAnswer(pairing: Answered, side: ApplicationSide, askFirst: AskFirst, now: Date): boolean {
  return (
    pairing.state === 'pending' &&
    answerOf(pairing, side) === 'unanswered' &&
    now <= pairing.answersDueAt &&
    wasAsked(pairing, side, askFirst)
  );
}

/** An acceptance can be taken back until the other side has answered; a decline is final. */
export function mayTakeBack(pairing: Answered, side: ApplicationSide): boolean {
  return (
    pairing.state === 'pending' &&
    answerOf(pairing, side) === 'accepted' &&
    answerOf(pairing, otherSide(side)) === 'unanswered'
  );
}

/** The state that follows from both answers. */
export function stateAfter(menteeAnswer: PairingAnswer, mentorAnswer: PairingAnswer): PairingState {
  if (menteeAnswer === 'declined' || mentorAnswer === 'declined') return 'declined';
  return menteeAnswer === 'accepted' && mentorAnswer === 'accepted' ? 'under-way' : 'pending';
}

const DAY = 86_400_000;

/** The moments of reminders: half-way to the deadline, and two days before it; only those that lie after the proposal. */
export function reminderMoments(proposedAt: Date, answersDueAt: Date): { name: 'half-way' | 'two-days'; at: Date }[] {
  const half = new Date((proposedAt.getTime() + answersDueAt.getTime()) / 2);
  const late = new Date(answersDueAt.getTime() - 2 * DAY);
  const moments = [{ name: 'half-way' as const, at: half }];
  return late > half ? [...moments, { name: 'two-days' as const, at: late }] : moments;
}
