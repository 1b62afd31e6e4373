import { EmailAddress } from '../../../shared/accounts/accounts-contract';
import type { Actor, Context, Db } from '../platform';
import { Problem } from '../platform';
import type { RequestContext } from '../platform';
import { findPerson, findPersonByEmail, findRoles, updatePerson, type PersonRow } from './accounts-queries';
import { hashPassword, needsRehash, passwordFits } from './passwords';

export const WRONG_CREDENTIALS =
  'This e-mail address and password do not fit together, or the address is not confirmed yet';

const mayAct = (person: PersonRow | null): person is PersonRow =>
  person !== null && person.emailConfirmedAt !== null && person.disabledAt === null;

/** The person behind a session; null ends it. */
export async function findActor(db: Db, personId: string): Promise<Actor | null> {
  const person = await findPerson(db, personId);
  if (!mayAct(person)) return null;
  return { personId, name: person.name, roles: await findRoles(db, personId) };
}

/** The person whom an address and a password name together; takes the same time for unknown addresses. */
export async function checkPassword(db: Db, email: string, password: string): Promise<Actor | null> {
  // passport hands the field over as it was typed.
  const address = EmailAddress.safeParse(email);
  const person = address.success ? await findPersonByEmail(db, address.data) : null;
  const fits = await passwordFits(person?.passwordHash ?? null, password);
  if (!fits || !mayAct(person)) return null;
  if (person.passwordHash && needsRehash(person.passwordHash))
    await updatePerson(db, person.id, { passwordHash: await hashPassword(password) });
  return findActor(db, person.id);
}

/** Signs in, counting failures by address and by account. */
export async function signIn(ctx: RequestContext, email: string): Promise<Actor> {
  await ctx.limits.check('sign-in-address', ctx.address);
  // Bound to account and network address together: an outsider cannot lock anybody out for good.
  const account = `${email}|${ctx.address}`;
  await ctx.limits.check('sign-in-account', account);
  const actor = await ctx.session.authenticate();
  if (!actor) {
    ctx.log.info({ address: ctx.address }, 'sign-in refused');
    await ctx.limits.count('sign-in-address', ctx.address);
    await ctx.limits.count('sign-in-account', account);
    throw new Problem('invalid', WRONG_CREDENTIALS);
  }
  await ctx.limits.reset('sign-in-account', account);
  await ctx.session.start(actor);
  ctx.log.info({ personId: actor.personId }, 'signed in');
  return actor;
}

/** Context as seen by the person who has just signed in. */
export const asActor = <C extends Context>(ctx: C, actor: Actor | null): C => ({ ...ctx, actor });
