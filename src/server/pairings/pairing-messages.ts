/** The messages of a pairing after it was proposed. */
import type { ApplicationSide } from '../../../shared/applications/applications-contract';
import { otherSide } from '../../../shared/pairings/answer-rules';
import { findAssociation } from '../accounts';
import { dueInWords, messagePerson, PROPOSAL_PURPOSE, proposalMessage } from '../matching';
import { postMessage, type LinkRef, type MessageData, type OutgoingMessage } from '../messages';
import { notFound, type Context } from '../platform';
import { loadProfiles } from '../profiles';
import { listTags } from '../tags';
import type { PairingRow } from './pairings-queries';

type Notice = Pick<OutgoingMessage, 'template'> & {
  /** Distinguishes notices of one template about one pairing and side. */
  occasion?: string;
  data: MessageData;
  links?: Record<string, LinkRef>;
};

const proposalLink = (row: PairingRow, side: ApplicationSide): LinkRef => ({
  path: '/pairings/proposal/:token',
  purpose: PROPOSAL_PURPOSE[side],
  rowId: row.pairing.id,
});

async function tell(tx: Context, row: PairingRow, side: ApplicationSide, notice: Notice): Promise<void> {
  const association = await findAssociation(tx.db);
  if (!association) throw notFound('association');
  const recipient = row[side];
  await postMessage(tx, {
    template: notice.template,
    cause: ['pairing', row.pairing.id, side, notice.occasion].filter(Boolean).join(':'),
    recipientId: recipient.personId,
    address: recipient.email,
    data: {
      name: recipient.name,
      associationName: association.name,
      contactEmail: association.contactEmail,
      cycleName: row.cycle.name,
      partnerName: row[otherSide(side)].name,
      answersDue: dueInWords(row.pairing.answersDueAt, association.timeZone, association.locale),
      ...notice.data,
    },
    ...(notice.links ? { links: notice.links } : {}),
  });
}

/** Asks the mentee, once the mentor has accepted. */
export async function askMentee(tx: Context, row: PairingRow): Promise<void> {
  const association = await findAssociation(tx.db);
  if (!association) throw notFound('association');
  const profiles = await loadProfiles(tx.db, [row.mentee.personId, row.mentor.personId]);
  const areas = new Map(
    (await listTags(tx.db)).filter((tag) => tag.kind === 'practice-area').map((tag) => [tag.id, tag.label]),
  );
  const person = (side: ApplicationSide) => {
    const profile = profiles.get(row[side].personId)!;
    const chosen = side === 'mentee' ? profile.interests.seeks : profile.interests.offers;
    const words = side === 'mentee' ? row.mentee.goals || profile.wishes.hopes : profile.wishes.style;
    return messagePerson(
      profile,
      row[side].email,
      chosen.flatMap((choice) => areas.get(choice.tagId) ?? []),
      words,
    );
  };
  await postMessage(
    tx,
    proposalMessage({
      pairingId: row.pairing.id,
      to: person('mentee'),
      toSide: 'mentee',
      partner: person('mentor'),
      shared: row.pairing.shared,
      cycleName: row.cycle.name,
      associationName: association.name,
      contactEmail: association.contactEmail,
      answersDue: dueInWords(row.pairing.answersDueAt, association.timeZone, association.locale),
    }),
  );
}

export const tellOtherAccepted = (tx: Context, row: PairingRow, to: ApplicationSide): Promise<void> =>
  tell(tx, row, to, {
    template: 'pairings/other-side-accepted',
    data: {},
    links: { proposal: proposalLink(row, to) },
  });

/** The reason stays with the coordinators. */
export const tellDeclined = (tx: Context, row: PairingRow, to: ApplicationSide): Promise<void> =>
  tell(tx, row, to, { template: 'pairings/declined', data: { isMentee: to === 'mentee' } });

export const tellExpired = (tx: Context, row: PairingRow, to: ApplicationSide, answered: boolean): Promise<void> =>
  tell(tx, row, to, { template: 'pairings/expired', data: { answered } });

export const remind = (tx: Context, row: PairingRow, to: ApplicationSide, occasion: string): Promise<void> =>
  tell(tx, row, to, {
    template: 'pairings/reminder',
    occasion,
    data: {},
    links: { proposal: proposalLink(row, to) },
  });

/** Introduces both: from now on each has the other's address. */
export async function introduce(tx: Context, row: PairingRow): Promise<void> {
  const profiles = await loadProfiles(tx.db, [row.mentee.personId, row.mentor.personId]);
  for (const side of ['mentee', 'mentor'] as const) {
    const partner = row[otherSide(side)];
    const about = profiles.get(partner.personId)?.about;
    await tell(tx, row, side, {
      template: 'pairings/both-accepted',
      data: {
        partnerEmail: partner.email,
        partnerTown: about?.town ?? '',
        partnerTimeZone: about?.timeZone ?? '',
        times: row.pairing.shared.times.map((text) => ({ text })),
        meeting: row.pairing.shared.meeting,
        isMentee: side === 'mentee',
      },
      links: { pairing: { path: '/pairings', purpose: 'page', rowId: row.pairing.id } },
    });
  }
}
