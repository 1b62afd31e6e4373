import type { Outcome } from '../../../shared/accounts/accounts-contract';
import { recordAudit } from '../audit';
import { hashToken, inTransaction, Problem, type Context } from '../platform';
import { updatePerson, useToken } from './accounts-queries';

export const linkExpired = (): Problem =>
  new Problem('not-found', 'This link does not work any more', {
    detail: 'It may have been used already, or a newer one may have been sent, or its time is over.',
  });

/** Confirms an address by the link sent to it. */
export function confirmAddress(ctx: Context, token: string): Promise<Outcome> {
  return inTransaction(ctx, async (tx) => {
    const used = await useToken(tx.db, hashToken(token), 'confirm-address', tx.now());
    if (!used?.personId) throw linkExpired();
    await updatePerson(tx.db, used.personId, { emailConfirmedAt: tx.now() });
    await recordAudit(tx, { action: 'accounts.confirm-address', subjectId: used.personId, actorId: used.personId });
    return { message: 'Your address is confirmed. You can sign in now.' };
  });
}
