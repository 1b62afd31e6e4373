import { sql } from 'drizzle-orm';
import {
  boolean,
  check,
  index,
  integer,
  pgTable,
  primaryKey,
  smallint,
  text,
  uniqueIndex,
  uuid,
} from 'drizzle-orm/pg-core';
import type { ApplicationSide, ApplicationStatus } from '../../shared/applications/applications-contract';
import { people } from './accounts';
import { id, instant, version } from './columns';
import { cycles } from './cycles';

/** One row per person, cycle and side. `taken` counts a mentor's pending and under-way pairings; a trigger on pairings keeps it. */
export const applications = pgTable(
  'applications',
  {
    id: id(),
    cycleId: uuid()
      .notNull()
      .references(() => cycles.id, { onDelete: 'cascade' }),
    personId: uuid()
      .notNull()
      .references(() => people.id, { onDelete: 'cascade' }),
    side: text().$type<ApplicationSide>().notNull(),
    status: text().$type<ApplicationStatus>().notNull().default('draft'),
    places: smallint().notNull().default(0),
    taken: smallint().notNull().default(0),
    oneMoreIfAsked: boolean().notNull().default(false),
    goals: text().notNull().default(''),
    consentVersion: integer(),
    consentAt: instant(),
    late: boolean().notNull().default(false),
    leftOutLastTime: boolean().notNull().default(false),
    submittedAt: instant(),
    withdrawnAt: instant(),
    createdAt: instant().notNull(),
    version: version(),
  },
  (t) => [
    uniqueIndex('applications_once_per_side').on(t.cycleId, t.personId, t.side),
    index('applications_person').on(t.personId),
    check('applications_side_known', sql`${t.side} in ('mentor', 'mentee')`),
    check(
      'applications_status_known',
      sql`${t.status} in ('draft', 'submitted', 'admitted', 'waiting-list', 'withdrawn')`,
    ),
    check(
      'applications_places_range',
      sql`(${t.side} = 'mentor' and ${t.places} between 1 and 6) or (${t.side} = 'mentee' and ${t.places} = 0)`,
    ),
    // The last place can never be taken twice: the trigger counts, this refuses.
    check(
      'applications_places_not_exceeded',
      sql`${t.taken} >= 0 and (${t.side} = 'mentee' or ${t.taken} <= ${t.places})`,
    ),
  ],
);

/** One row per mentor that a mentee's application names, rank 1 to 3. */
export const applicationPreferences = pgTable(
  'application_preferences',
  {
    applicationId: uuid()
      .notNull()
      .references(() => applications.id, { onDelete: 'cascade' }),
    mentorPersonId: uuid()
      .notNull()
      .references(() => people.id, { onDelete: 'cascade' }),
    rank: smallint().notNull(),
  },
  (t) => [
    primaryKey({ columns: [t.applicationId, t.rank] }),
    uniqueIndex('application_preferences_once').on(t.applicationId, t.mentorPersonId),
    check('application_preferences_rank', sql`${t.rank} between 1 and 3`),
  ],
);
