import { mayDecide } from '../../../shared/applications/application-rules';
import type { OwnApplication } from '../../../shared/applications/applications-contract';
import { recordAll, recordAudit } from '../audit';
import { findCycle } from '../cycles';
import { actorOf, inTransaction, notFound, Problem, type Context } from '../platform';
import { tellWithdrawn } from './application-messages';
import { findApplication, livePairingStates, updateApplication, withdrawPendingPairings } from './applications-queries';
import { showOwn } from './show-own';

/** Takes back one's own application; a proposal that waits for answers goes with it, a pair under way does not. */
export function withdrawApplication(ctx: Context, applicationId: string): Promise<OwnApplication> {
  return inTransaction(ctx, async (tx) => {
    const before = await findApplication(tx.db, applicationId);
    if (!before || before.personId !== actorOf(tx).personId) throw notFound('application');
    if (before.status === 'withdrawn') return showOwn(tx, before);
    const cycle = await findCycle(tx.db, before.cycleId);
    if (!cycle || !mayDecide(cycle.phase))
      throw new Problem('conflict', 'This cycle is over; there is nothing to withdraw');
    if ((await livePairingStates(tx.db, applicationId)).includes('under-way'))
      throw new Problem('conflict', 'You are in a pair; end the pair on its own page before you withdraw');

    const after = await updateApplication(tx.db, applicationId, { status: 'withdrawn', withdrawnAt: tx.now() });
    if (!after) throw notFound('application');
    await recordAudit(tx, { action: 'applications.withdraw', subjectId: applicationId, cycleId: cycle.id });
    await withdrawProposals(tx, [applicationId], cycle.id);
    await tellWithdrawn(tx, [after], cycle, false);
    return showOwn(tx, after);
  });
}

/** Takes back the proposals of these applications that still wait for answers. */
export async function withdrawProposals(tx: Context, applicationIds: string[], cycleId: string): Promise<void> {
  const pairingIds = await withdrawPendingPairings(tx.db, applicationIds, tx.now());
  await recordAll(
    tx,
    pairingIds.map((subjectId) => ({ action: 'pairings.withdraw', subjectId, cycleId })),
  );
}
