import { recordAudit } from '../audit';
import { inTransaction, notFound, Problem, type Context } from '../platform';
import { findPairing, holdPairing, updatePairing } from './pairings-queries';

/** Ends a pair under way: it has completed its cycle, or ended before. Ending it the same way again changes nothing. */
export async function endPairing(ctx: Context, pairingId: string, ending: 'completed' | 'ended-early'): Promise<void> {
  await inTransaction(ctx, async (tx) => {
    await holdPairing(tx.db, pairingId);
    const row = await findPairing(tx.db, pairingId);
    if (!row) throw notFound('pairing');
    if (row.pairing.state === ending) return;
    if (row.pairing.state !== 'under-way') throw new Problem('conflict', 'Only a pair under way can end');
    await updatePairing(tx.db, pairingId, { state: ending, endedAt: tx.now() });
    await recordAudit(tx, { action: `pairings.${ending}`, subjectId: pairingId, cycleId: row.pairing.cycleId });
  });
}
