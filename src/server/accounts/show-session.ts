import type { AssociationView, Session } from '../../../shared/accounts/accounts-contract';
import type { Context } from '../platform';
import { findAssociation, findPerson, type AssociationRow } from './accounts-queries';

const toAssociation = (row: AssociationRow | null): AssociationView => ({
  name: row?.name ?? 'Heddle',
  timeZone: row?.timeZone ?? 'UTC',
  locale: row?.locale ?? 'en-GB',
  contactEmail: row?.contactEmail ?? '',
  towns: Object.entries(row?.gazetteer ?? {})
    .map(([name, town]) => ({ name, region: town.region }))
    .sort((a, b) => a.name.localeCompare(b.name)),
});

/** Who is signed in, and the association everybody sees. */
export async function showSession(ctx: Context): Promise<Session> {
  const association = toAssociation(await findAssociation(ctx.db));
  const row = ctx.actor ? await findPerson(ctx.db, ctx.actor.personId) : null;
  const person =
    row && ctx.actor ? { id: row.id, name: row.name, email: row.email, roles: [...ctx.actor.roles] } : null;
  return { person, association, localMailbox: ctx.settings.smtpUrl === null, demo: ctx.settings.demo };
}
