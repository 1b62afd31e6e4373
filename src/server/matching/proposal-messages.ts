import type { ApplicationSide } from '../../../shared/applications/applications-contract';
import type { MentoringProfile } from '../../../shared/profiles/profiles-contract';
import type { SharedThings } from '../../../shared/pairings/pairings-contract';
import type { OutgoingMessage } from '../messages';

/** A person as a message names them. */
export interface MessagePerson {
  personId: string;
  name: string;
  email: string;
  headline: string;
  employer: string;
  /** Practice areas in words: sought by a mentee, offered by a mentor. */
  areas: string;
  words: string;
}

export interface ProposalNotice {
  pairingId: string;
  to: MessagePerson;
  toSide: ApplicationSide;
  partner: MessagePerson;
  shared: SharedThings;
  cycleName: string;
  associationName: string;
  contactEmail: string;
  answersDue: string;
}

/** Purposes of the two links of a pairing; their tokens are derived, see platform/tokens. */
export const PROPOSAL_PURPOSE = { mentee: 'proposal-mentee', mentor: 'proposal-mentor' } as const;

/** The message that asks one side for an answer. */
export function proposalMessage(notice: ProposalNotice): OutgoingMessage {
  const { pairingId, to, toSide, partner } = notice;
  return {
    template: `pairings/proposal-to-${toSide}`,
    cause: `proposal:${pairingId}:${toSide}`,
    recipientId: to.personId,
    address: to.email,
    data: {
      name: to.name,
      associationName: notice.associationName,
      contactEmail: notice.contactEmail,
      cycleName: notice.cycleName,
      partnerName: partner.name,
      partnerHeadline: partner.headline,
      partnerEmployer: partner.employer,
      partnerAreas: partner.areas,
      partnerWords: partner.words,
      shared: sharedSentences(notice.shared).map((text) => ({ text })),
      answersDue: notice.answersDue,
    },
    links: {
      proposal: { path: '/pairings/proposal/:token', purpose: PROPOSAL_PURPOSE[toSide], rowId: pairingId },
    },
  };
}

/** What two people share, a sentence each. */
export function sharedSentences(shared: SharedThings): string[] {
  return [
    shared.tags.length > 0 ? `Sought and offered: ${shared.tags.join(', ')}` : '',
    shared.times.length > 0 ? `Times that suit both: ${shared.times.join(', ')}` : '',
    shared.languages.length > 0
      ? `Common ${shared.languages.length === 1 ? 'language' : 'languages'}: ${shared.languages.join(', ')}`
      : '',
    `Meeting: ${shared.meeting}`,
  ].filter(Boolean);
}

/** A profile as a message's partner; `words` are the mentee's goals or hopes, or the mentor's style. */
export function messagePerson(
  profile: MentoringProfile,
  email: string,
  areas: readonly string[],
  words: string,
): MessagePerson {
  return {
    personId: profile.personId,
    name: profile.about.name,
    email,
    headline: profile.about.headline,
    employer: profile.about.employer,
    areas: areas.join(', '),
    words,
  };
}
