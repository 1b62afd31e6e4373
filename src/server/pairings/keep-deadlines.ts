import { answerOf, otherSide, reminderMoments, wasAsked } from '../../../shared/pairings/answer-rules';
import { recordAudit } from '../audit';
import { inTransaction, type Context } from '../platform';
import { remind, tellExpired } from './pairing-messages';
import { listPairings, listPending, takeOverdue, updatePairing, type PairingRow } from './pairings-queries';

const BATCH = 100;
const SIDES = ['mentee', 'mentor'] as const;

/** Ends pairings whose time is over and reminds those who have not answered. Any number of processes may do this at once. */
export async function keepDeadlines(ctx: Context): Promise<void> {
  while ((await expireBatch(ctx)) === BATCH);
  for (const row of await listPending(ctx.db)) await remindOf(ctx, row);
}

function expireBatch(ctx: Context): Promise<number> {
  return inTransaction(ctx, async (tx) => {
    const ids = await takeOverdue(tx.db, tx.now(), BATCH);
    for (const row of await listPairings(tx.db, ids)) await expire(tx, row);
    return ids.length;
  });
}

async function expire(tx: Context, row: PairingRow): Promise<void> {
  await updatePairing(tx.db, row.pairing.id, { state: 'expired', endedAt: tx.now() });
  await recordAudit(tx, { action: 'pairings.expire', subjectId: row.pairing.id, cycleId: row.pairing.cycleId });
  for (const side of SIDES) {
    if (!wasAsked(row.pairing, side, row.cycle.askFirst)) continue;
    await tellExpired(tx, row, side, answerOf(row.pairing, side) !== 'unanswered');
  }
}

/** Each reminder exists once, whoever writes it: its cause names pairing, side and moment. */
async function remindOf(ctx: Context, row: PairingRow): Promise<void> {
  const { pairing } = row;
  const now = ctx.now();
  if (now > pairing.answersDueAt) return;
  const due = reminderMoments(pairing.createdAt, pairing.answersDueAt).filter((moment) => moment.at <= now);
  const latest = due.at(-1);
  if (!latest) return;
  for (const side of SIDES) {
    if (answerOf(pairing, side) !== 'unanswered' || !wasAsked(pairing, side, row.cycle.askFirst)) continue;
    // Where the mentor was asked first, the mentee's time begins with the mentor's answer.
    const askedAt = side === 'mentee' && row.cycle.askFirst === 'mentor' ? pairing.mentorAnsweredAt : pairing.createdAt;
    if (askedAt && answerOf(pairing, otherSide(side)) !== 'declined' && askedAt < latest.at)
      await remind(ctx, row, side, latest.name);
  }
}
