import { randomUUID } from 'node:crypto';
import { judgeOf } from '../../../shared/matching/build-problem';
import { sharedThings } from '../../../shared/matching/shared-things';
import type { PublishOutcome } from '../../../shared/matching/runs-contract';
import { findAssociation, type AssociationRow } from '../accounts';
import { recordAll, recordAudit } from '../audit';
import { holdCycle, movePhase, type CycleRow } from '../cycles';
import { postMessages, type OutgoingMessage } from '../messages';
import {
  actorOf,
  databaseCode,
  hashToken,
  inTransaction,
  notFound,
  Problem,
  stale,
  tokenFor,
  violatedConstraint,
  type Context,
} from '../platform';
import { loadProfiles } from '../profiles';
import { changedSince } from './changed-since';
import { listApplicants } from './cycle-facts-queries';
import { answersDue, dueInWords } from './deadlines';
import { messagePerson, proposalMessage, PROPOSAL_PURPOSE, type MessagePerson } from './proposal-messages';
import {
  countProposals,
  findApproval,
  findRoundOfRun,
  insertPairings,
  insertRound,
  listRecipients,
  nextRoundNumber,
  type NewPairing,
} from './publish-queries';
import { listPlanPairings, type PlanPairingRow } from './runs-queries';
import { loadFinishedRun, type FinishedRun } from './show-plan';

/** Phases in which proposals may go out: the first round from matching, repair rounds later. */
const PUBLISHING_PHASES = ['matching', 'responses', 'under-way'] as const;

/**
 * Publishes a run's plan: round, proposals, messages and audit rows in one transaction, or nothing. Asking again for the
 * same run answers with what was published. `version` is that of the cycle on the reviewer's screen.
 */
export async function publishRun(
  ctx: Context,
  runId: string,
  { acknowledgedChanges, version }: { acknowledgedChanges: boolean; version: number },
): Promise<PublishOutcome> {
  const known = await published(ctx, runId);
  if (known) return known;
  try {
    return await inTransaction(ctx, (tx) => publish(tx, runId, acknowledgedChanges, version));
  } catch (error) {
    const constraint = databaseCode(error) ? violatedConstraint(error) : null;
    if (constraint === 'pairings_one_for_mentee' || constraint === 'applications_places_not_exceeded')
      throw new Problem('conflict', 'Somebody in this plan has another proposal by now', {
        detail: 'Nothing was published. Run the matching again; it will see what changed.',
      });
    if (constraint === 'pairings_never_again')
      throw new Problem('conflict', 'A pairing of this plan was declined meanwhile', {
        detail: 'Nothing was published. Run the matching again.',
      });
    throw error;
  }
}

async function published(ctx: Context, runId: string): Promise<PublishOutcome | null> {
  const round = await findRoundOfRun(ctx.db, runId);
  if (!round) return null;
  return { round: round.number, proposals: await countProposals(ctx.db, round.id), messages: 0 };
}

async function publish(tx: Context, runId: string, acknowledged: boolean, version: number): Promise<PublishOutcome> {
  const finished = await loadFinishedRun(tx, runId);
  const cycle = await holdCycle(tx.db, finished.listed.run.cycleId);
  if (!cycle) throw notFound('cycle');
  const meanwhile = await published(tx, runId);
  if (meanwhile) return meanwhile;
  if (cycle.version !== version) throw stale({ cycleVersion: cycle.version, phase: cycle.phase });
  await assertPublishable(tx, cycle, finished, acknowledged);
  const association = await findAssociation(tx.db);
  if (!association) throw notFound('association');

  const number = await nextRoundNumber(tx.db, cycle.id);
  const roundId = await insertRound(tx.db, {
    cycleId: cycle.id,
    runId,
    number,
    publishedBy: actorOf(tx).personId,
    publishedAt: tx.now(),
  });
  const proposals = await makeProposals(tx, { cycle, association, finished, roundId });
  const leftOut = await leftOutMessages(tx, { cycle, association, finished, number });
  await insertPairings(tx.db, proposals.rows);
  await postMessages(tx, [...proposals.messages, ...leftOut]);
  if (cycle.phase === 'matching') await movePhase(tx, cycle.id, 'responses');
  await recordAudit(tx, { action: 'matching.publish', subjectId: runId, cycleId: cycle.id });
  await recordAll(
    tx,
    proposals.rows.map((row) => ({ action: 'pairings.propose', subjectId: row.id!, cycleId: cycle.id })),
  );
  return { round: number, proposals: proposals.rows.length, messages: proposals.messages.length + leftOut.length };
}

async function assertPublishable(
  tx: Context,
  cycle: CycleRow,
  { listed, input }: FinishedRun,
  acknowledged: boolean,
): Promise<void> {
  if (!(PUBLISHING_PHASES as readonly string[]).includes(cycle.phase))
    throw new Problem('conflict', 'Plans are published while the cycle is in matching, or later for a repair round');
  await assertApproved(tx, cycle, listed.run.id);
  const facts = new Map((await listApplicants(tx.db, cycle.id)).map((each) => [each.applicationId, each]));
  const changes = await changedSince(tx, { cycle, input, facts, settings: listed.run.settings });
  const blocking = changes.filter((change) => change.blocks);
  if (blocking.length > 0)
    throw new Problem('conflict', 'This plan can no longer be published', {
      detail: `${blocking.map((change) => change.text).join('. ')}. Run the matching again.`,
    });
  if (changes.length > 0 && !acknowledged)
    throw new Problem('conflict', 'Things have changed since this run', {
      detail: `${changes.map((change) => change.text).join('. ')}. Acknowledge the differences, or run again.`,
    });
}

/** Whoever publishes cannot be the one who approved. */
async function assertApproved(tx: Context, cycle: CycleRow, runId: string): Promise<void> {
  if (!cycle.needsApproval) return;
  const approval = await findApproval(tx.db, runId);
  if (!approval) throw new Problem('conflict', 'A second coordinator has to approve this plan before it is published');
  if (approval.personId === actorOf(tx).personId)
    throw new Problem('conflict', 'You approved this plan; another coordinator publishes it');
}

interface Publishing {
  cycle: CycleRow;
  association: AssociationRow;
  finished: FinishedRun;
}

async function makeProposals(
  tx: Context,
  { cycle, association, finished, roundId }: Publishing & { roundId: string },
): Promise<{ rows: NewPairing[]; messages: OutgoingMessage[] }> {
  const planned = await listPlanPairings(tx.db, finished.listed.run.id);
  const person = await messagePeople(tx, finished, planned);
  const judge = judgeOf(finished.input);
  const menteeAt = new Map(finished.input.mentees.map((mentee, at) => [mentee.key, at]));
  const mentorAt = new Map(finished.input.mentors.map((mentor, at) => [mentor.key, at]));
  const due = answersDue(cycle.answersDueOn, association.timeZone, tx.now());
  const rows: NewPairing[] = [];
  const messages: OutgoingMessage[] = [];
  for (const pairing of planned) {
    const id = randomUUID();
    const shared = sharedThings(
      judge,
      menteeAt.get(pairing.menteeApplicationId)!,
      mentorAt.get(pairing.mentorApplicationId)!,
    );
    const hashed = (side: 'mentee' | 'mentor'): string =>
      hashToken(tokenFor(tx.settings.sessionSecret, PROPOSAL_PURPOSE[side], id));
    rows.push({
      id,
      cycleId: cycle.id,
      roundId,
      menteeApplicationId: pairing.menteeApplicationId,
      mentorApplicationId: pairing.mentorApplicationId,
      fit: pairing.fit,
      shared,
      menteeTokenHash: hashed('mentee'),
      mentorTokenHash: hashed('mentor'),
      answersDueAt: due,
      createdAt: tx.now(),
    });
    const mentee = person(pairing.menteeApplicationId);
    const mentor = person(pairing.mentorApplicationId);
    const common = {
      pairingId: id,
      shared,
      cycleName: cycle.name,
      associationName: association.name,
      contactEmail: association.contactEmail,
      answersDue: dueInWords(due, association.timeZone, association.locale),
    };
    messages.push(proposalMessage({ ...common, to: mentor, toSide: 'mentor', partner: mentee }));
    // Where mentors are asked first, the mentee hears when the mentor has accepted.
    if (cycle.askFirst === 'both')
      messages.push(proposalMessage({ ...common, to: mentee, toSide: 'mentee', partner: mentor }));
  }
  return { rows, messages };
}

async function messagePeople(
  tx: Context,
  { input }: FinishedRun,
  planned: readonly PlanPairingRow[],
): Promise<(applicationId: string) => MessagePerson> {
  const ids = planned.flatMap((row) => [row.menteeApplicationId, row.mentorApplicationId]);
  const recipients = await listRecipients(tx.db, [...new Set(ids)]);
  const profiles = await loadProfiles(tx.db, [...new Set(recipients.map((each) => each.personId))]);
  const areas = new Map(input.tags.filter((tag) => tag.kind === 'practice-area').map((tag) => [tag.id, tag.label]));
  const mentees = new Set(planned.map((row) => row.menteeApplicationId));
  const people = new Map(
    recipients.map((recipient): [string, MessagePerson] => {
      const profile = profiles.get(recipient.personId)!;
      const isMentee = mentees.has(recipient.applicationId);
      const chosen = isMentee ? profile.interests.seeks : profile.interests.offers;
      const named = chosen.map((choice) => areas.get(choice.tagId)).filter((label) => label !== undefined);
      const words = isMentee ? recipient.goals || profile.wishes.hopes : profile.wishes.style;
      return [recipient.applicationId, messagePerson(profile, recipient.email, named, words)];
    }),
  );
  return (applicationId) => people.get(applicationId)!;
}

/** What each person left out is told: the same reason that the committee sees, without names. */
async function leftOutMessages(
  tx: Context,
  { cycle, association, finished, number }: Publishing & { number: number },
): Promise<OutgoingMessage[]> {
  const { report } = finished;
  const recipients = await listRecipients(tx.db, report.leftOut);
  return recipients.map((recipient) => ({
    template: 'pairings/left-out',
    cause: `left-out:${recipient.applicationId}:round-${number}`,
    recipientId: recipient.personId,
    address: recipient.email,
    data: {
      name: recipient.name,
      associationName: association.name,
      contactEmail: association.contactEmail,
      cycleName: cycle.name,
      reason: toldReason(report.leftOutBecause[recipient.applicationId]?.shortage ?? null, finished),
      waitingListNote: true,
    },
  }));
}

/** A sentence for the person themselves: about places and areas, never about other people. */
export function toldReason(shortage: number | null, { report }: Pick<FinishedRun, 'report'>): string {
  const group = shortage === null ? undefined : report.shortages[shortage];
  if (!group) return 'This time there were more people who seek a mentor than places that suit.';
  if (group.mentors.length === 0)
    return 'This time no mentor with a free place met the rules of this cycle together with your profile.';
  const who = group.inCommon ? ` (${group.inCommon})` : '';
  const places = group.places === 1 ? '1 place' : `${group.places} places`;
  return `This time ${group.mentees.length} people${who} sought one of the same mentors as you, who have ${places} in all.`;
}
