import { and, asc, eq, ilike, inArray, isNull, ne, sql } from 'drizzle-orm';
import { alias } from 'drizzle-orm/pg-core';
import { declaredInterests, people, profileExclusions, profiles, profileTags } from '../../../drizzle/schema';
import type { PrivateSection, ProfileSection, TagChoice } from '../../../shared/profiles/profiles-contract';
import { grouped, type Db } from '../platform';

export type ProfileRow = typeof profiles.$inferSelect;

export interface ProfileRows {
  profile: ProfileRow;
  name: string;
  offers: TagChoice[];
  seeks: TagChoice[];
  exclusions: PrivateSection['exclusions'];
  declaredInterests: PrivateSection['declaredInterests'];
}

export async function insertProfile(db: Db, personId: string, timeZone: string, now: Date): Promise<void> {
  await db.insert(profiles).values({ personId, timeZone, updatedAt: now }).onConflictDoNothing();
}

export async function loadProfileRows(db: Db, personIds: string[]): Promise<ProfileRows[]> {
  if (personIds.length === 0) return [];
  const other = alias(people, 'other');
  // One after the other: inside a transaction there is one connection.
  const heads = await db
    .select({ profile: profiles, name: people.name })
    .from(profiles)
    .innerJoin(people, eq(people.id, profiles.personId))
    .where(inArray(profiles.personId, personIds));
  const tags = await db
    .select()
    .from(profileTags)
    .where(inArray(profileTags.personId, personIds))
    .orderBy(asc(profileTags.priority));
  const exclusions = await db
    .select({ personId: profileExclusions.personId, otherId: profileExclusions.otherId, name: other.name })
    .from(profileExclusions)
    .innerJoin(other, eq(other.id, profileExclusions.otherId))
    .where(inArray(profileExclusions.personId, personIds));
  const interests = await db
    .select({
      personId: declaredInterests.personId,
      otherId: declaredInterests.otherId,
      name: other.name,
      kind: declaredInterests.kind,
    })
    .from(declaredInterests)
    .innerJoin(other, eq(other.id, declaredInterests.otherId))
    .where(inArray(declaredInterests.personId, personIds));
  const tagsOf = grouped(tags, (row) => row.personId);
  const exclusionsOf = grouped(exclusions, (row) => row.personId);
  const interestsOf = grouped(interests, (row) => row.personId);
  return heads.map(({ profile, name }) => {
    const own = tagsOf.get(profile.personId) ?? [];
    const choices = (direction: 'offers' | 'seeks'): TagChoice[] =>
      own.filter((tag) => tag.direction === direction).map(({ tagId, priority }) => ({ tagId, priority }));
    return {
      profile,
      name,
      offers: choices('offers'),
      seeks: choices('seeks'),
      exclusions: (exclusionsOf.get(profile.personId) ?? []).map((row) => ({ personId: row.otherId, name: row.name })),
      declaredInterests: (interestsOf.get(profile.personId) ?? []).map((row) => ({
        personId: row.otherId,
        name: row.name,
        kind: row.kind,
      })),
    };
  });
}

const VERSION_COLUMN = {
  about: profiles.aboutVersion,
  practice: profiles.practiceVersion,
  interests: profiles.interestsVersion,
  meeting: profiles.meetingVersion,
  wishes: profiles.wishesVersion,
  private: profiles.privateVersion,
} as const satisfies Record<ProfileSection, unknown>;

/** Raises a section's version where it still is the expected one; null where somebody was faster. */
export async function claimSection(
  db: Db,
  personId: string,
  section: ProfileSection,
  expected: number | null,
  now: Date,
): Promise<number | null> {
  const column = VERSION_COLUMN[section];
  const [row] = await db
    .update(profiles)
    .set({ [`${section}Version`]: sql`${column} + 1`, updatedAt: now })
    .where(and(eq(profiles.personId, personId), expected === null ? undefined : eq(column, expected)))
    .returning({ version: column });
  return row?.version ?? null;
}

export async function updateProfileColumns(db: Db, personId: string, change: Partial<ProfileRow>): Promise<void> {
  await db.update(profiles).set(change).where(eq(profiles.personId, personId));
}

export async function replaceTags(db: Db, personId: string, offers: TagChoice[], seeks: TagChoice[]): Promise<void> {
  await db.delete(profileTags).where(eq(profileTags.personId, personId));
  const rows = [
    ...offers.map((choice) => ({ personId, direction: 'offers' as const, ...choice })),
    ...seeks.map((choice) => ({ personId, direction: 'seeks' as const, ...choice })),
  ];
  if (rows.length > 0) await db.insert(profileTags).values(rows);
}

export async function replacePrivatePeople(db: Db, personId: string, content: PrivateSection): Promise<void> {
  await db.delete(profileExclusions).where(eq(profileExclusions.personId, personId));
  await db.delete(declaredInterests).where(eq(declaredInterests.personId, personId));
  if (content.exclusions.length > 0)
    await db
      .insert(profileExclusions)
      .values(content.exclusions.map((other) => ({ personId, otherId: other.personId })));
  if (content.declaredInterests.length > 0)
    await db
      .insert(declaredInterests)
      .values(content.declaredInterests.map((other) => ({ personId, otherId: other.personId, kind: other.kind })));
}

export async function searchMembers(db: Db, text: string, exceptId: string, limit: number) {
  const pattern = `%${text.replace(/[\\%_]/g, '\\$&')}%`;
  return db
    .select({ personId: people.id, name: people.name, employer: profiles.employer })
    .from(people)
    .innerJoin(profiles, eq(profiles.personId, people.id))
    .where(and(ilike(people.name, pattern), ne(people.id, exceptId), isNull(people.disabledAt)))
    .orderBy(asc(people.name))
    .limit(limit);
}
