import { sql } from 'drizzle-orm';
import {
  boolean,
  check,
  date,
  index,
  integer,
  jsonb,
  pgTable,
  primaryKey,
  text,
  uniqueIndex,
  uuid,
} from 'drizzle-orm/pg-core';
import type { AskFirst, CyclePhase } from '../../shared/cycles/cycles-contract';
import type { MatchingSettings } from '../../shared/matching/matching-contract';
import { people } from './accounts';
import { id, instant, version } from './columns';

/** One row per matching cycle. Dates are days in the association's time zone; a deadline is the end of its day. */
export const cycles = pgTable(
  'cycles',
  {
    id: id(),
    name: text().notNull(),
    phase: text().$type<CyclePhase>().notNull().default('draft'),
    applicationsOpenOn: date({ mode: 'string' }).notNull(),
    applicationsCloseOn: date({ mode: 'string' }).notNull(),
    answersDueOn: date({ mode: 'string' }).notNull(),
    startsOn: date({ mode: 'string' }).notNull(),
    checkInOn: date({ mode: 'string' }).notNull(),
    endsOn: date({ mode: 'string' }).notNull(),
    introduction: text().notNull().default(''),
    consentText: text().notNull(),
    consentVersion: integer().notNull().default(1),
    askFirst: text().$type<AskFirst>().notNull().default('both'),
    autoAdmit: boolean().notNull().default(true),
    /** A second coordinator looks at a plan before it is published. */
    needsApproval: boolean().notNull().default(false),
    settings: jsonb().$type<MatchingSettings>().notNull(),
    settingsVersion: integer().notNull().default(1),
    createdBy: uuid().references(() => people.id, { onDelete: 'set null' }),
    createdAt: instant().notNull(),
    version: version(),
  },
  (t) => [
    uniqueIndex('cycles_name').on(t.name),
    index('cycles_phase').on(t.phase),
    check(
      'cycles_phase_known',
      sql`${t.phase} in ('draft', 'open', 'applications-closed', 'matching', 'responses', 'under-way', 'closing', 'closed', 'cancelled')`,
    ),
    check(
      'cycles_dates_in_order',
      sql`${t.applicationsOpenOn} <= ${t.applicationsCloseOn} and ${t.applicationsCloseOn} <= ${t.answersDueOn} and ${t.answersDueOn} <= ${t.endsOn} and ${t.startsOn} <= ${t.checkInOn} and ${t.checkInOn} <= ${t.endsOn}`,
    ),
  ],
);

/** One row per saved version of a cycle's rules and criteria: who changed what, when. */
export const cycleSettingsHistory = pgTable(
  'cycle_settings_history',
  {
    cycleId: uuid()
      .notNull()
      .references(() => cycles.id, { onDelete: 'cascade' }),
    version: integer().notNull(),
    settings: jsonb().$type<MatchingSettings>().notNull(),
    savedBy: uuid().references(() => people.id, { onDelete: 'set null' }),
    savedAt: instant().notNull(),
  },
  (t) => [primaryKey({ columns: [t.cycleId, t.version] })],
);
