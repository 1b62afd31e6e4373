/** Everybody of the demo association, with profile, roles and, for the demo sign-ins, a password. */
import { changeRoles, ensurePerson, hashPassword, updatePerson } from '../../src/server/accounts';
import { inTransaction, type Context } from '../../src/server/platform';
import { updateSection } from '../../src/server/profiles';
import { insertTag } from '../../src/server/tags';
import type { DemoPerson, DemoTag, DemoTagChoice } from './data';
import signIns from './demo-sign-ins.json';

/** Tags by slug; parents come before what belongs to them. */
export async function seedTags(ctx: Context, tags: readonly DemoTag[]): Promise<Map<string, string>> {
  const ids = new Map<string, string>();
  const ordered = [...tags].sort((a, b) => Number(a.parent !== null) - Number(b.parent !== null));
  for (const { slug, kind, label, synonyms, parent } of ordered) {
    const parentId = parent === null ? null : (ids.get(parent) ?? null);
    const row = { slug, kind, label, synonyms, parentId, state: 'approved' as const, createdAt: ctx.now() };
    const id = await insertTag(ctx.db, row);
    if (id) ids.set(slug, id);
  }
  return ids;
}

/** People by address. Accounts first, because profiles name other people. */
export async function seedPeople(
  ctx: Context,
  people: readonly DemoPerson[],
  tagIds: ReadonlyMap<string, string>,
): Promise<Map<string, string>> {
  const ids = new Map<string, string>();
  await inTransaction(ctx, async (tx) => {
    for (const person of people) ids.set(person.email, await seedAccount(tx, person));
  });
  for (const person of people) {
    const { roles, email } = person;
    await inTransaction(ctx, async (tx) => {
      await seedProfile(tx, person, ids, tagIds);
      if (roles.length > 0) await changeRoles(tx, ids.get(email)!, roles);
    });
  }
  return ids;
}

async function seedAccount(tx: Context, person: DemoPerson): Promise<string> {
  const { email, name, membershipNumber, membershipCurrent } = person;
  const { id } = await ensurePerson(tx, { email, name, membershipNumber, membershipCurrent });
  const signIn = signIns.find((each) => each.email === email);
  await updatePerson(tx.db, id, {
    emailConfirmedAt: tx.now(),
    ...(signIn ? { passwordHash: await hashPassword(signIn.password) } : {}),
  });
  return id;
}

async function seedProfile(
  tx: Context,
  person: DemoPerson,
  ids: ReadonlyMap<string, string>,
  tagIds: ReadonlyMap<string, string>,
): Promise<void> {
  const id = ids.get(person.email)!;
  const chosen = (choices: DemoTagChoice[]) =>
    choices.map(({ slug, priority }) => ({ tagId: tagIds.get(slug)!, priority }));
  const named = (email: string) => ({ personId: ids.get(email)!, name: '' });
  await updateSection(tx, id, 'about', person.about);
  await updateSection(tx, id, 'practice', person.practice);
  await updateSection(tx, id, 'interests', {
    offers: chosen(person.interests.offers),
    seeks: chosen(person.interests.seeks),
  });
  await updateSection(tx, id, 'meeting', person.meeting);
  await updateSection(tx, id, 'wishes', person.wishes);
  const { exclusions, declaredInterests, adjustments } = person.private;
  if (exclusions.length + declaredInterests.length === 0 && adjustments === '') return;
  await updateSection(tx, id, 'private', {
    exclusions: exclusions.map(named),
    declaredInterests: declaredInterests.map(({ email, kind }) => ({ ...named(email), kind })),
    adjustments,
  });
}
