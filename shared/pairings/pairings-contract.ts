/** Pairings: a proposal to two people, their answers, and the pair that comes of it. */
import { z } from 'zod';
import { ApplicationSide } from '../applications/applications-contract';
import { CareerStage, Region } from '../profiles/profiles-contract';

export const PairingAnswer = z.enum(['unanswered', 'accepted', 'declined']);
export type PairingAnswer = z.infer<typeof PairingAnswer>;
export const PairingState = z.enum([
  'pending',
  'under-way',
  'declined',
  'expired',
  'withdrawn',
  'completed',
  'ended-early',
]);
export type PairingState = z.infer<typeof PairingState>;
export const PAIRING_STATE_LABEL: Record<PairingState, string> = {
  pending: 'Waiting for answers',
  'under-way': 'Under way',
  declined: 'Declined',
  expired: 'Not answered in time',
  withdrawn: 'Withdrawn',
  completed: 'Completed',
  'ended-early': 'Ended early',
};

/** What two people have in common, in words ready to be read. */
export const SharedThings = z.object({
  tags: z.array(z.string()),
  times: z.array(z.string()),
  languages: z.array(z.string()),
  meeting: z.string(),
});
export type SharedThings = z.infer<typeof SharedThings>;

/** The other person, before both have accepted: no contact details. */
export const PartnerCard = z.object({
  personId: z.uuid(),
  name: z.string(),
  pronouns: z.string(),
  headline: z.string(),
  employer: z.string(),
  region: Region.nullable(),
  careerStage: CareerStage.nullable(),
  yearsInPractice: z.int().nullable(),
  /** As the partner wrote it; the mentee's hopes, the mentor's style. */
  words: z.string(),
  practiceAreas: z.array(z.string()),
});
export type PartnerCard = z.infer<typeof PartnerCard>;

/** A pairing as one of its two people sees it. */
export const OwnPairing = z.object({
  id: z.uuid(),
  cycleId: z.uuid(),
  cycleName: z.string(),
  mySide: ApplicationSide,
  state: PairingState,
  myAnswer: PairingAnswer,
  partnerAnswer: PairingAnswer,
  /** False while the mentor is asked first and has not answered. */
  mayAnswer: z.boolean(),
  mayTakeBack: z.boolean(),
  answersDueAt: z.iso.datetime(),
  partner: PartnerCard,
  shared: SharedThings,
  /** Present only once both have accepted. */
  contact: z.object({ email: z.string(), town: z.string().nullable(), timeZone: z.string() }).nullable(),
  underWayAt: z.iso.datetime().nullable(),
  version: z.int(),
});
export type OwnPairing = z.infer<typeof OwnPairing>;
export const OwnPairings = z.object({ pairings: z.array(OwnPairing) });
export type OwnPairings = z.infer<typeof OwnPairings>;

export const PairingParams = z.object({ pairingId: z.uuid() });
export const ProposalLinkParams = z.object({ token: z.string().max(100) });

export const AnswerForm = z
  .strictObject({
    answer: z.enum(['accepted', 'declined', 'unanswered']),
    reason: z.string().trim().max(1000, 'At most 1000 characters').default(''),
  })
  .refine((form) => form.answer !== 'declined' || form.reason.length >= 3, {
    path: ['reason'],
    message: 'A short reason helps the coordinators find someone who suits better',
  });
export type AnswerForm = z.input<typeof AnswerForm>;

/** A pairing as coordinators see it in the responses table. */
export const PairingLine = z.object({
  id: z.uuid(),
  round: z.int(),
  mentee: z.object({ applicationId: z.uuid(), name: z.string() }),
  mentor: z.object({ applicationId: z.uuid(), name: z.string() }),
  fit: z.int(),
  state: PairingState,
  menteeAnswer: PairingAnswer,
  mentorAnswer: PairingAnswer,
  menteeReason: z.string(),
  mentorReason: z.string(),
  answersDueAt: z.iso.datetime(),
  publishedAt: z.iso.datetime(),
  underWayAt: z.iso.datetime().nullable(),
});
export type PairingLine = z.infer<typeof PairingLine>;
export const PairingsQuery = z.object({
  state: PairingState.optional(),
  search: z.string().trim().max(100).default(''),
});
export type PairingsQuery = z.input<typeof PairingsQuery>;
export const PairingLines = z.object({ pairings: z.array(PairingLine) });
export type PairingLines = z.infer<typeof PairingLines>;
