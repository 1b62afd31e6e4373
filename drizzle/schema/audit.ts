import { bigint, index, pgTable, text, uuid } from 'drizzle-orm/pg-core';
import { instant } from './columns';

/** One row per change of state: who, when, what, about whom, and the names of changed fields. Never private values. */
export const auditEntries = pgTable(
  'audit_entries',
  {
    id: bigint({ mode: 'number' }).primaryKey().generatedAlwaysAsIdentity(),
    at: instant().notNull(),
    actorId: uuid(),
    action: text().notNull(),
    subjectId: text().notNull(),
    cycleId: uuid(),
    fields: text().array().notNull().default([]),
    note: text().notNull().default(''),
    requestId: text().notNull().default(''),
  },
  (t) => [index('audit_entries_subject').on(t.subjectId, t.at), index('audit_entries_at').on(t.at)],
);
