import { and, asc, count, eq, gt, ilike, inArray, isNull, or, sql, type SQL } from 'drizzle-orm';
import { accountTokens, association, people, personRoles, sessions } from '../../../drizzle/schema';
import type { Role, TokenPurpose } from '../../../shared/accounts/accounts-contract';
import type { Db } from '../platform';

export type PersonRow = typeof people.$inferSelect;
export type AssociationRow = typeof association.$inferSelect;
export type TokenRow = typeof accountTokens.$inferSelect;

export async function findAssociation(db: Db): Promise<AssociationRow | null> {
  const [row] = await db.select().from(association).limit(1);
  return row ?? null;
}

export async function insertAssociation(db: Db, row: typeof association.$inferInsert): Promise<void> {
  await db.insert(association).values(row).onConflictDoNothing();
}

export async function findPerson(db: Db, id: string): Promise<PersonRow | null> {
  const [row] = await db.select().from(people).where(eq(people.id, id));
  return row ?? null;
}

export async function findPersonByEmail(db: Db, email: string): Promise<PersonRow | null> {
  const [row] = await db.select().from(people).where(eq(people.email, email));
  return row ?? null;
}

export async function findPeopleByAddressOrNumber(db: Db, emails: string[], numbers: string[]): Promise<PersonRow[]> {
  if (emails.length + numbers.length === 0) return [];
  return db
    .select()
    .from(people)
    .where(or(inArray(people.email, emails), inArray(people.membershipNumber, numbers)));
}

export async function findPeople(db: Db, ids: string[]): Promise<{ id: string; name: string; email: string }[]> {
  if (ids.length === 0) return [];
  return db
    .select({ id: people.id, name: people.name, email: people.email })
    .from(people)
    .where(inArray(people.id, ids));
}

export async function searchPeople(db: Db, text: string, limit: number): Promise<{ id: string; name: string }[]> {
  return db
    .select({ id: people.id, name: people.name })
    .from(people)
    .where(and(ilike(people.name, containing(text)), isNull(people.disabledAt)))
    .orderBy(asc(people.name))
    .limit(limit);
}

/** A pattern for "contains this text", with the pattern's own signs taken literally. */
const containing = (text: string): string => `%${text.replace(/[\\%_]/g, '\\$&')}%`;

export async function insertPerson(db: Db, row: typeof people.$inferInsert): Promise<PersonRow | null> {
  const [inserted] = await db.insert(people).values(row).onConflictDoNothing().returning();
  return inserted ?? null;
}

export async function updatePerson(db: Db, id: string, change: Partial<PersonRow>): Promise<void> {
  await db.update(people).set(change).where(eq(people.id, id));
}

export async function findRoles(db: Db, personId: string): Promise<Role[]> {
  const rows = await db.select({ role: personRoles.role }).from(personRoles).where(eq(personRoles.personId, personId));
  return rows.map((row) => row.role).sort();
}

export async function replaceRoles(db: Db, personId: string, roles: readonly Role[]): Promise<void> {
  await db.delete(personRoles).where(eq(personRoles.personId, personId));
  if (roles.length > 0) await db.insert(personRoles).values(roles.map((role) => ({ personId, role })));
}

export async function countHolders(db: Db, role: Role): Promise<number> {
  const [row] = await db
    .select({ total: count() })
    .from(personRoles)
    .innerJoin(people, eq(people.id, personRoles.personId))
    .where(and(eq(personRoles.role, role), isNull(people.disabledAt)));
  return row?.total ?? 0;
}

export async function insertToken(db: Db, row: typeof accountTokens.$inferInsert): Promise<void> {
  await db.insert(accountTokens).values(row);
}

/** A link that still works: known, unused, not expired. */
export async function findOpenToken(db: Db, tokenHash: string, now: Date): Promise<TokenRow | null> {
  const [row] = await db
    .select()
    .from(accountTokens)
    .where(and(eq(accountTokens.tokenHash, tokenHash), isNull(accountTokens.usedAt), gt(accountTokens.expiresAt, now)));
  return row ?? null;
}

/** Uses a link up; null where somebody else was faster, or it does not work any more. */
export async function useToken(db: Db, tokenHash: string, purpose: TokenPurpose, now: Date): Promise<TokenRow | null> {
  const [row] = await db
    .update(accountTokens)
    .set({ usedAt: now })
    .where(
      and(
        eq(accountTokens.tokenHash, tokenHash),
        eq(accountTokens.purpose, purpose),
        isNull(accountTokens.usedAt),
        gt(accountTokens.expiresAt, now),
      ),
    )
    .returning();
  return row ?? null;
}

/** Earlier links of the same purpose stop working. */
export async function voidTokens(db: Db, personId: string, purpose: TokenPurpose, now: Date): Promise<void> {
  await db
    .update(accountTokens)
    .set({ usedAt: now })
    .where(and(eq(accountTokens.personId, personId), eq(accountTokens.purpose, purpose), isNull(accountTokens.usedAt)));
}

export async function hasOpenInvitation(db: Db, now: Date): Promise<boolean> {
  const [row] = await db
    .select({ id: accountTokens.id })
    .from(accountTokens)
    .where(
      and(
        eq(accountTokens.purpose, 'invitation'),
        isNull(accountTokens.personId),
        isNull(accountTokens.usedAt),
        gt(accountTokens.expiresAt, now),
      ),
    );
  return row !== undefined;
}

export async function voidOpenInvitations(db: Db, now: Date): Promise<void> {
  await db
    .update(accountTokens)
    .set({ usedAt: now })
    .where(and(eq(accountTokens.purpose, 'invitation'), isNull(accountTokens.personId), isNull(accountTokens.usedAt)));
}

export async function deleteSessionsOf(db: Db, personId: string): Promise<void> {
  await db.delete(sessions).where(sql`${sessions.sess} -> 'passport' ->> 'user' = ${personId}`);
}

export interface PeopleFilter {
  search: string;
  role: Role | undefined;
}

function matching({ search, role }: PeopleFilter): SQL | undefined {
  const holds = role
    ? sql`exists (select from ${personRoles} where ${personRoles.personId} = ${people.id} and ${personRoles.role} = ${role})`
    : undefined;
  const found = search
    ? or(
        ilike(people.name, containing(search)),
        ilike(people.email, containing(search)),
        ilike(people.membershipNumber, containing(search)),
      )
    : undefined;
  return and(holds, found);
}

export async function listPeople(db: Db, filter: PeopleFilter, limit: number, offset: number): Promise<PersonRow[]> {
  return db
    .select()
    .from(people)
    .where(matching(filter))
    .orderBy(asc(people.name), asc(people.id))
    .limit(limit)
    .offset(offset);
}

export async function countPeople(db: Db, filter: PeopleFilter): Promise<number> {
  const [row] = await db.select({ total: count() }).from(people).where(matching(filter));
  return row?.total ?? 0;
}

export async function rolesOf(db: Db, personIds: string[]): Promise<Map<string, Role[]>> {
  const found = new Map<string, Role[]>();
  if (personIds.length === 0) return found;
  const rows = await db.select().from(personRoles).where(inArray(personRoles.personId, personIds));
  for (const row of rows) found.set(row.personId, [...(found.get(row.personId) ?? []), row.role].sort());
  return found;
}
