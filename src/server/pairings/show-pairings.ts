import type { ApplicationSide } from '../../../shared/applications/applications-contract';
import { mayAnswer, mayTakeBack, otherSide, wasAsked, answerOf } from '../../../shared/pairings/answer-rules';
import type { OwnPairing, OwnPairings, PairingLines, PartnerCard } from '../../../shared/pairings/pairings-contract';
import type { MentoringProfile } from '../../../shared/profiles/profiles-contract';
import { findCycle } from '../cycles';
import { actorOf, hashToken, notFound, type Context } from '../platform';
import { loadProfiles } from '../profiles';
import { listTags } from '../tags';
import { findByToken, listOwnPairings, listPairingsOfCycle, type PairingRow } from './pairings-queries';

/** One's own pairings, the newest first; a mentee does not see what only the mentor was asked yet. */
export async function showOwnPairings(ctx: Context): Promise<OwnPairings> {
  const { personId } = actorOf(ctx);
  const rows = (await listOwnPairings(ctx.db, personId)).map((row) => ({ row, side: sideOf(row, personId)! }));
  const visible = rows.filter(({ row, side }) => wasAsked(row.pairing, side, row.cycle.askFirst));
  return { pairings: await describe(ctx, visible) };
}

/** What a link in an e-mail shows. Looking changes nothing. */
export async function showProposal(ctx: Context, token: string): Promise<OwnPairing> {
  const found = await findByToken(ctx.db, hashToken(token));
  if (!found || !wasAsked(found.row.pairing, found.side, found.row.cycle.askFirst)) throw notFound('proposal');
  const [described] = await describe(ctx, [found]);
  return described!;
}

/** The side on which a person is in a pairing; null for a stranger. */
export function sideOf(row: PairingRow, personId: string): ApplicationSide | null {
  if (row.mentee.personId === personId) return 'mentee';
  return row.mentor.personId === personId ? 'mentor' : null;
}

export async function describe(
  ctx: Context,
  rows: readonly { row: PairingRow; side: ApplicationSide }[],
): Promise<OwnPairing[]> {
  const partnerIds = rows.map(({ row, side }) => row[otherSide(side)].personId);
  const profiles = await loadProfiles(ctx.db, [...new Set(partnerIds)]);
  const areas = new Map(
    (await listTags(ctx.db)).filter((tag) => tag.kind === 'practice-area').map((tag) => [tag.id, tag.label]),
  );
  return rows.map(({ row, side }) => toOwnPairing(row, side, profiles, areas, ctx.now()));
}

function toOwnPairing(
  row: PairingRow,
  side: ApplicationSide,
  profiles: ReadonlyMap<string, MentoringProfile>,
  areas: ReadonlyMap<string, string>,
  now: Date,
): OwnPairing {
  const { pairing, cycle } = row;
  const partner = row[otherSide(side)];
  const profile = profiles.get(partner.personId);
  const introduced = pairing.underWayAt !== null;
  return {
    id: pairing.id,
    cycleId: cycle.id,
    cycleName: cycle.name,
    mySide: side,
    state: pairing.state,
    myAnswer: answerOf(pairing, side),
    partnerAnswer: answerOf(pairing, otherSide(side)),
    mayAnswer: mayAnswer(pairing, side, cycle.askFirst, now),
    mayTakeBack: mayTakeBack(pairing, side),
    answersDueAt: pairing.answersDueAt.toISOString(),
    partner: partnerCard(partner, side, profile, areas),
    shared: pairing.shared,
    contact: introduced
      ? { email: partner.email, town: profile?.about.town ?? null, timeZone: profile?.about.timeZone ?? 'UTC' }
      : null,
    underWayAt: pairing.underWayAt?.toISOString() ?? null,
    version: pairing.version,
  };
}

/** What one side may know of the other before both have accepted. */
function partnerCard(
  partner: PairingRow['mentee'],
  mySide: ApplicationSide,
  profile: MentoringProfile | undefined,
  areas: ReadonlyMap<string, string>,
): PartnerCard {
  const isMentee = mySide === 'mentor';
  const chosen = isMentee ? profile?.interests.seeks : profile?.interests.offers;
  const words = isMentee ? partner.goals || profile?.wishes.hopes : profile?.wishes.style;
  return {
    personId: partner.personId,
    name: partner.name,
    pronouns: profile?.about.pronouns ?? '',
    headline: profile?.about.headline ?? '',
    employer: profile?.about.employer ?? '',
    region: profile?.about.region ?? null,
    careerStage: profile?.practice.careerStage ?? null,
    yearsInPractice: profile?.practice.yearsInPractice ?? null,
    words: words ?? '',
    practiceAreas: (chosen ?? []).flatMap((choice) => areas.get(choice.tagId) ?? []),
  };
}

/** Coordinators: every pairing of a cycle and how it stands. */
export async function showResponses(
  ctx: Context,
  cycleId: string,
  filter: Parameters<typeof listPairingsOfCycle>[2],
): Promise<PairingLines> {
  if (!(await findCycle(ctx.db, cycleId))) throw notFound('cycle');
  const rows = await listPairingsOfCycle(ctx.db, cycleId, filter);
  return {
    pairings: rows.map(({ pairing, mentee, mentor, round }) => ({
      id: pairing.id,
      round: round.number,
      mentee: { applicationId: mentee.applicationId, name: mentee.name },
      mentor: { applicationId: mentor.applicationId, name: mentor.name },
      fit: pairing.fit,
      state: pairing.state,
      menteeAnswer: pairing.menteeAnswer,
      mentorAnswer: pairing.mentorAnswer,
      menteeReason: pairing.menteeReason,
      mentorReason: pairing.mentorReason,
      answersDueAt: pairing.answersDueAt.toISOString(),
      publishedAt: round.publishedAt.toISOString(),
      underWayAt: pairing.underWayAt?.toISOString() ?? null,
    })),
  };
}
