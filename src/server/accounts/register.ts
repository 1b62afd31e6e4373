import type { z } from 'zod';
import type { Outcome, Registration } from '../../../shared/accounts/accounts-contract';
import { recordAudit } from '../audit';
import { postMessage } from '../messages';
import { inTransaction, type Context } from '../platform';
import { createLink } from './account-links';
import {
  findAssociation,
  findPersonByEmail,
  insertPerson,
  updatePerson,
  voidTokens,
  type PersonRow,
} from './accounts-queries';
import { hashPassword } from './passwords';

// The same sentence for known and unknown addresses, so that nobody learns who has an account.
export const CHECK_YOUR_MAIL: Outcome = {
  message: 'We have sent you an e-mail. Open the link in it to confirm your address; it works for two days.',
};

/** Signs a person up, or tells the owner of a known address, by mail alone, that somebody tried. */
export async function register(ctx: Context, form: z.output<typeof Registration>): Promise<Outcome> {
  const passwordHash = await hashPassword(form.password);
  await inTransaction(ctx, async (tx) => {
    const known = await findPersonByEmail(tx.db, form.email);
    if (known?.emailConfirmedAt) return tellOwner(tx, known);
    const person =
      known ?? (await insertPerson(tx.db, { email: form.email, name: form.name, passwordHash, createdAt: tx.now() }));
    if (!person) return;
    // Until the address is confirmed, whoever can read its mail decides: the newest sign-up replaces an unconfirmed one.
    if (known) await updatePerson(tx.db, known.id, { name: form.name, passwordHash });
    await sendConfirmation(tx, person.id, form.name, form.email);
    await recordAudit(tx, { action: 'accounts.register', subjectId: person.id, actorId: person.id });
  });
  return CHECK_YOUR_MAIL;
}

async function sendConfirmation(tx: Context, personId: string, name: string, email: string): Promise<void> {
  await voidTokens(tx.db, personId, 'confirm-address', tx.now());
  const link = await createLink(tx, 'confirm-address', personId);
  const association = await findAssociation(tx.db);
  await postMessage(tx, {
    template: 'accounts/confirm-address',
    cause: `link:${link.rowId}`,
    recipientId: personId,
    address: email,
    data: { name, associationName: association?.name ?? 'Heddle', hours: link.hours },
    links: { confirm: link.ref },
  });
}

async function tellOwner(tx: Context, owner: PersonRow): Promise<void> {
  const association = await findAssociation(tx.db);
  // At most one such notice an hour, so that a form cannot be used to fill somebody's mailbox.
  const hour = Math.floor(tx.now().getTime() / 3_600_000);
  await postMessage(tx, {
    template: 'accounts/address-known',
    cause: `address-known:${owner.id}:${hour}`,
    recipientId: owner.id,
    address: owner.email,
    data: { name: owner.name, associationName: association?.name ?? 'Heddle' },
  });
}
