import { asc, eq } from 'drizzle-orm';
import { tags } from '../../../drizzle/schema';
import type { Tag } from '../../../shared/tags/tags-contract';
import type { Db } from '../platform';

export async function listTags(db: Db): Promise<Tag[]> {
  return db
    .select({
      id: tags.id,
      slug: tags.slug,
      kind: tags.kind,
      label: tags.label,
      synonyms: tags.synonyms,
      parentId: tags.parentId,
      state: tags.state,
    })
    .from(tags)
    .orderBy(asc(tags.kind), asc(tags.label));
}

export async function findTagBySlug(db: Db, slug: string) {
  const [row] = await db.select().from(tags).where(eq(tags.slug, slug));
  return row ?? null;
}

export async function insertTag(db: Db, row: typeof tags.$inferInsert): Promise<string | null> {
  const [inserted] = await db.insert(tags).values(row).onConflictDoNothing().returning({ id: tags.id });
  return inserted?.id ?? null;
}
