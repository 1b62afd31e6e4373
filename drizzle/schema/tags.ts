import { sql } from 'drizzle-orm';
import { type AnyPgColumn, check, pgTable, text, uniqueIndex, uuid } from 'drizzle-orm/pg-core';
import type { TagKind, TagState } from '../../shared/tags/tags-contract';
import { people } from './accounts';
import { id, instant, version } from './columns';

/** One row per interest tag of the managed vocabulary: a practice area or a topic. */
export const tags = pgTable(
  'tags',
  {
    id: id(),
    slug: text().notNull(),
    kind: text().$type<TagKind>().notNull(),
    label: text().notNull(),
    synonyms: text().array().notNull().default([]),
    parentId: uuid().references((): AnyPgColumn => tags.id),
    state: text().$type<TagState>().notNull().default('approved'),
    suggestedBy: uuid().references(() => people.id, { onDelete: 'set null' }),
    createdAt: instant().notNull(),
    version: version(),
  },
  (t) => [
    uniqueIndex('tags_slug').on(t.slug),
    check('tags_kind_known', sql`${t.kind} in ('practice-area', 'topic')`),
    check('tags_state_known', sql`${t.state} in ('suggested', 'approved', 'retired')`),
  ],
);
