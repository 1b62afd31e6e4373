import type { z } from 'zod';
import type { Invitation, InvitationAnswer, InvitationView, Outcome } from '../../../shared/accounts/accounts-contract';
import { recordAudit } from '../audit';
import { postMessage } from '../messages';
import { actorOf, hashToken, inTransaction, Problem, type Context } from '../platform';
import { createLink } from './account-links';
import {
  countHolders,
  findAssociation,
  findOpenToken,
  findPerson,
  findPersonByEmail,
  findRoles,
  insertPerson,
  replaceRoles,
  updatePerson,
  useToken,
  voidOpenInvitations,
  voidTokens,
} from './accounts-queries';
import { linkExpired } from './confirm-address';
import { hashPassword } from './passwords';

/** Invites somebody by e-mail; their roles start when they accept. */
export function invite(ctx: Context, form: z.output<typeof Invitation>): Promise<Outcome> {
  return inTransaction(ctx, async (tx) => {
    const known = await findPersonByEmail(tx.db, form.email);
    if (known?.passwordHash)
      throw new Problem('conflict', 'This person has an account already; give them the role in the list', {
        fields: [{ field: 'email', message: 'This person has an account already' }],
      });
    const person = known ?? (await insertPerson(tx.db, { email: form.email, name: form.name, createdAt: tx.now() }));
    if (!person) throw new Problem('conflict', 'Somebody invited this person at the same moment');
    await voidTokens(tx.db, person.id, 'invitation', tx.now());
    const link = await createLink(tx, 'invitation', person.id, form.roles);
    const association = await findAssociation(tx.db);
    await postMessage(tx, {
      template: 'accounts/invitation',
      cause: `link:${link.rowId}`,
      recipientId: person.id,
      address: person.email,
      data: { name: person.name, associationName: association?.name ?? 'Heddle', inviterName: actorOf(tx).name },
      links: { invitation: link.ref },
    });
    await recordAudit(tx, { action: 'accounts.invite', subjectId: person.id, fields: form.roles });
    return { message: `An invitation is on its way to ${form.email}. It works for 14 days.` };
  });
}

/** What an invitation's page shows before it is answered. */
export async function showInvitation(ctx: Context, token: string): Promise<InvitationView> {
  const row = await findOpenToken(ctx.db, hashToken(token), ctx.now());
  if (!row || row.purpose !== 'invitation') throw linkExpired();
  const person = row.personId ? await findPerson(ctx.db, row.personId) : null;
  return { purpose: row.purpose, email: person?.email ?? null, roles: row.roles };
}

/** Accepts an invitation: name, password, and the roles it brings. */
export async function acceptInvitation(ctx: Context, form: z.output<typeof InvitationAnswer>): Promise<Outcome> {
  const passwordHash = await hashPassword(form.password);
  return inTransaction(ctx, async (tx) => {
    const now = tx.now();
    const used = await useToken(tx.db, hashToken(form.token), 'invitation', now);
    if (!used) throw linkExpired();
    const personId = used.personId ?? (await newPerson(tx, form));
    await updatePerson(tx.db, personId, { name: form.name, passwordHash, emailConfirmedAt: now });
    const roles = new Set([...(await findRoles(tx.db, personId)), ...used.roles]);
    await replaceRoles(tx.db, personId, [...roles]);
    await recordAudit(tx, {
      action: 'accounts.accept-invitation',
      subjectId: personId,
      actorId: personId,
      fields: used.roles,
    });
    return { message: 'Welcome. Sign in with your e-mail address and the password you have just chosen.' };
  });
}

async function newPerson(tx: Context, form: z.output<typeof InvitationAnswer>): Promise<string> {
  if (!form.email)
    throw new Problem('invalid', 'Some fields need another look', {
      fields: [{ field: 'email', message: 'Enter your e-mail address' }],
    });
  const person = await insertPerson(tx.db, { email: form.email, name: form.name, createdAt: tx.now() });
  if (!person)
    throw new Problem('conflict', 'This address has an account already', {
      fields: [{ field: 'email', message: 'This address has an account already' }],
    });
  return person.id;
}

/** A one-time link for the first administrator, where there is none yet; earlier ones stop working. Null where not needed. */
export function inviteFirstAdministrator(ctx: Context): Promise<string | null> {
  return inTransaction(ctx, async (tx) => {
    if ((await countHolders(tx.db, 'administrator')) > 0) return null;
    await voidOpenInvitations(tx.db, tx.now());
    const link = await createLink(tx, 'invitation', null, ['administrator']);
    return `${tx.settings.origin}${link.ref.path.replace(':token', link.token)}`;
  });
}
