import type { z } from 'zod';
import type { ApplicationSide } from '../../../shared/applications/applications-contract';
import {
  answerOf,
  mayAnswer,
  mayTakeBack,
  otherSide,
  stateAfter,
  wasAsked,
} from '../../../shared/pairings/answer-rules';
import type { AnswerForm, OwnPairing, PairingAnswer } from '../../../shared/pairings/pairings-contract';
import { recordAudit } from '../audit';
import { actorOf, hashToken, inTransaction, notFound, Problem, type Context } from '../platform';
import { askMentee, introduce, tellDeclined, tellOtherAccepted } from './pairing-messages';
import { findByToken, findPairing, holdPairing, updatePairing, type PairingRow } from './pairings-queries';
import { describe, sideOf } from './show-pairings';

type Form = z.output<typeof AnswerForm>;

/** Answers as the signed-in person. */
export async function answerOwn(ctx: Context, pairingId: string, form: Form): Promise<OwnPairing> {
  const { personId } = actorOf(ctx);
  const row = await findPairing(ctx.db, pairingId);
  const side = row ? sideOf(row, personId) : null;
  if (!row || !side) throw notFound('pairing');
  return answer(ctx, row.pairing.id, side, form);
}

/** Answers through the link of an e-mail; the link says who it is. */
export async function answerByToken(ctx: Context, token: string, form: Form): Promise<OwnPairing> {
  const found = await findByToken(ctx.db, hashToken(token));
  if (!found) throw notFound('proposal');
  return answer(ctx, found.row.pairing.id, found.side, form);
}

/** One transaction for the answer, what follows from it, its audit row and its messages. The same answer again changes nothing. */
async function answer(ctx: Context, pairingId: string, side: ApplicationSide, form: Form): Promise<OwnPairing> {
  return inTransaction(ctx, async (tx) => {
    await holdPairing(tx.db, pairingId);
    const before = await findPairing(tx.db, pairingId);
    if (!before || !wasAsked(before.pairing, side, before.cycle.askFirst)) throw notFound('proposal');
    if (answerOf(before.pairing, side) !== form.answer) {
      assertPossible(tx, before, side, form.answer);
      await write(tx, before, side, form);
    }
    const after = await findPairing(tx.db, pairingId);
    const [described] = await describe(tx, [{ row: after!, side }]);
    return described!;
  });
}

function assertPossible(tx: Context, row: PairingRow, side: ApplicationSide, wanted: PairingAnswer): void {
  const { pairing, cycle } = row;
  if (wanted === 'unanswered') {
    if (mayTakeBack(pairing, side)) return;
    throw new Problem('conflict', 'This answer can no longer be taken back', {
      detail: 'The other side has answered. If something has changed, write to the coordinators.',
    });
  }
  if (mayAnswer(pairing, side, cycle.askFirst, tx.now())) return;
  // Whoever accepted may still decline as long as the other side has not answered.
  if (wanted === 'declined' && mayTakeBack(pairing, side) && tx.now() <= pairing.answersDueAt) return;
  throw new Problem('conflict', 'This proposal can no longer be answered', { detail: WHY_NOT[pairing.state] });
}

const WHY_NOT: Record<PairingRow['pairing']['state'], string> = {
  pending: 'The time for answers is over, or you have answered already.',
  'under-way': 'Both of you have accepted already.',
  declined: 'It was declined.',
  expired: 'It was not answered in time.',
  withdrawn: 'It was withdrawn.',
  completed: 'The pair has completed its cycle.',
  'ended-early': 'The pair has ended.',
};

async function write(tx: Context, row: PairingRow, side: ApplicationSide, form: Form): Promise<void> {
  const { pairing } = row;
  const now = tx.now();
  const answers = {
    menteeAnswer: side === 'mentee' ? form.answer : pairing.menteeAnswer,
    mentorAnswer: side === 'mentor' ? form.answer : pairing.mentorAnswer,
  };
  const state = stateAfter(answers.menteeAnswer, answers.mentorAnswer);
  const answeredAt = form.answer === 'unanswered' ? null : now;
  const reason = form.answer === 'declined' ? form.reason : '';
  await updatePairing(tx.db, pairing.id, {
    ...answers,
    ...(side === 'mentee'
      ? { menteeAnsweredAt: answeredAt, menteeReason: reason }
      : { mentorAnsweredAt: answeredAt, mentorReason: reason }),
    state,
    ...(state === 'under-way' ? { underWayAt: now } : {}),
    ...(state === 'declined' ? { endedAt: now } : {}),
  });
  // The reason is private; the trail names the field alone.
  await recordAudit(tx, {
    action: `pairings.${form.answer === 'unanswered' ? 'take-back' : form.answer}`,
    subjectId: pairing.id,
    cycleId: pairing.cycleId,
    actorId: row[side].personId,
    fields: form.answer === 'declined' ? ['answer', 'reason'] : ['answer'],
  });
  await tellWhatFollows(tx, row, side, form.answer, state);
}

async function tellWhatFollows(
  tx: Context,
  row: PairingRow,
  side: ApplicationSide,
  given: PairingAnswer,
  state: PairingRow['pairing']['state'],
): Promise<void> {
  const other = otherSide(side);
  if (state === 'under-way') return introduce(tx, row);
  if (given === 'declined') {
    // A mentee who was never asked is not told of a mentor's decline.
    if (wasAsked(row.pairing, other, row.cycle.askFirst)) await tellDeclined(tx, row, other);
    return;
  }
  if (given !== 'accepted') return;
  if (side === 'mentor' && row.cycle.askFirst === 'mentor') await askMentee(tx, row);
  else await tellOtherAccepted(tx, row, other);
}
