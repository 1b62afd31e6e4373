import type { z } from 'zod';
import type { PeoplePage, PeopleQuery, PersonLine, Role } from '../../../shared/accounts/accounts-contract';
import { recordAudit } from '../audit';
import { inTransaction, notFound, Problem, type Context } from '../platform';
import {
  countHolders,
  countPeople,
  deleteSessionsOf,
  findPerson,
  findRoles,
  listPeople,
  replaceRoles,
  rolesOf,
  type PersonRow,
} from './accounts-queries';

const PAGE_SIZE = 50;

function stateOf(person: PersonRow): PersonLine['state'] {
  if (person.disabledAt) return 'disabled';
  if (person.emailConfirmedAt) return 'confirmed';
  return person.passwordHash ? 'registered' : 'invited';
}

const toLine = (person: PersonRow, roles: Role[]): PersonLine => ({
  id: person.id,
  name: person.name,
  email: person.email,
  roles,
  state: stateOf(person),
  membershipNumber: person.membershipNumber,
  membershipCurrent: person.membershipCurrent,
  createdAt: person.createdAt.toISOString(),
});

export async function showPeople(ctx: Context, query: z.output<typeof PeopleQuery>): Promise<PeoplePage> {
  const filter = { search: query.search, role: query.role };
  const rows = await listPeople(ctx.db, filter, PAGE_SIZE, (query.page - 1) * PAGE_SIZE);
  const roles = await rolesOf(
    ctx.db,
    rows.map((row) => row.id),
  );
  return {
    people: rows.map((row) => toLine(row, roles.get(row.id) ?? [])),
    total: await countPeople(ctx.db, filter),
    page: query.page,
    pageSize: PAGE_SIZE,
  };
}

/** Gives and takes roles. Their sessions end, so that a new right starts with a new sign-in. */
export function changeRoles(ctx: Context, personId: string, roles: Role[]): Promise<PersonLine> {
  return inTransaction(ctx, async (tx) => {
    const person = await findPerson(tx.db, personId);
    if (!person) throw notFound('person');
    const before = await findRoles(tx.db, personId);
    const takesLast = before.includes('administrator') && !roles.includes('administrator');
    await replaceRoles(tx.db, personId, roles);
    if (takesLast && (await countHolders(tx.db, 'administrator')) === 0)
      throw new Problem('conflict', 'The association needs at least one administrator');
    await deleteSessionsOf(tx.db, personId);
    await recordAudit(tx, { action: 'accounts.change-roles', subjectId: personId, fields: roles });
    return toLine(person, [...roles].sort());
  });
}
