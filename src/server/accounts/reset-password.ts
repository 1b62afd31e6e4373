import type { z } from 'zod';
import type { Outcome, PasswordReset } from '../../../shared/accounts/accounts-contract';
import { recordAudit } from '../audit';
import { postMessage } from '../messages';
import { hashToken, inTransaction, type Context } from '../platform';
import { createLink } from './account-links';
import {
  deleteSessionsOf,
  findAssociation,
  findPerson,
  findPersonByEmail,
  updatePerson,
  useToken,
  voidTokens,
} from './accounts-queries';
import { linkExpired } from './confirm-address';
import { hashPassword } from './passwords';

/** Sends a link for a new password where the address has an account; answers the same where it has none. */
export async function requestReset(ctx: Context, email: string): Promise<Outcome> {
  await inTransaction(ctx, async (tx) => {
    const person = await findPersonByEmail(tx.db, email);
    if (!person || person.disabledAt) return;
    await voidTokens(tx.db, person.id, 'reset-password', tx.now());
    const link = await createLink(tx, 'reset-password', person.id);
    const association = await findAssociation(tx.db);
    await postMessage(tx, {
      template: 'accounts/reset-password',
      cause: `link:${link.rowId}`,
      recipientId: person.id,
      address: person.email,
      data: { name: person.name, associationName: association?.name ?? 'Heddle' },
      links: { reset: link.ref },
    });
    await recordAudit(tx, { action: 'accounts.request-reset', subjectId: person.id });
  });
  return { message: 'If this address has an account, a link for a new password is on its way. It works for one hour.' };
}

/** Sets a new password by the link; ends all sessions and tells the owner. */
export async function resetPassword(ctx: Context, form: z.output<typeof PasswordReset>): Promise<Outcome> {
  const passwordHash = await hashPassword(form.password);
  return inTransaction(ctx, async (tx) => {
    const used = await useToken(tx.db, hashToken(form.token), 'reset-password', tx.now());
    const person = used?.personId ? await findPerson(tx.db, used.personId) : null;
    if (!used || !person) throw linkExpired();
    // Whoever can read the mail has shown that the address is theirs.
    await updatePerson(tx.db, person.id, { passwordHash, emailConfirmedAt: person.emailConfirmedAt ?? tx.now() });
    await deleteSessionsOf(tx.db, person.id);
    const association = await findAssociation(tx.db);
    await postMessage(tx, {
      template: 'accounts/password-changed',
      cause: `reset:${used.id}`,
      recipientId: person.id,
      address: person.email,
      data: {
        name: person.name,
        associationName: association?.name ?? 'Heddle',
        contactEmail: association?.contactEmail ?? '',
      },
    });
    await recordAudit(tx, { action: 'accounts.reset-password', subjectId: person.id, actorId: person.id });
    return { message: 'Your password is changed. Sign in with the new one.' };
  });
}
