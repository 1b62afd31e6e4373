import { sql } from 'drizzle-orm';
import {
  bigint,
  boolean,
  check,
  index,
  integer,
  jsonb,
  pgTable,
  primaryKey,
  text,
  timestamp,
  uniqueIndex,
  uuid,
  varchar,
} from 'drizzle-orm/pg-core';
import type { Gazetteer, Role, TokenPurpose } from '../../shared/accounts/accounts-contract';
import { id, instant, version } from './columns';

/** One row: the association that this deployment serves. */
export const association = pgTable(
  'association',
  {
    id: integer().primaryKey().default(1),
    name: text().notNull(),
    timeZone: text().notNull(),
    locale: text().notNull().default('en-GB'),
    contactEmail: text().notNull(),
    gazetteer: jsonb().$type<Gazetteer>().notNull().default({}),
    version: version(),
  },
  (t) => [check('association_one_row', sql`${t.id} = 1`)],
);

/** One row per person with an account or an invitation. */
export const people = pgTable(
  'people',
  {
    id: id(),
    /** Lower case; the address that signs in. */
    email: text().notNull(),
    name: text().notNull(),
    passwordHash: text(),
    emailConfirmedAt: instant(),
    disabledAt: instant(),
    membershipNumber: text(),
    membershipCurrent: boolean().notNull().default(false),
    createdAt: instant().notNull(),
  },
  (t) => [
    uniqueIndex('people_email').on(t.email),
    uniqueIndex('people_membership_number').on(t.membershipNumber),
    check('people_email_lower', sql`${t.email} = lower(${t.email})`),
    check('people_name_length', sql`char_length(${t.name}) between 1 and 100`),
  ],
);

/** One row per role a person holds beside being a member. */
export const personRoles = pgTable(
  'person_roles',
  {
    personId: uuid()
      .notNull()
      .references(() => people.id, { onDelete: 'cascade' }),
    role: text().$type<Role>().notNull(),
  },
  (t) => [
    primaryKey({ columns: [t.personId, t.role] }),
    check('person_roles_known', sql`${t.role} in ('coordinator', 'organiser', 'administrator')`),
  ],
);

/** One row per link sent to confirm an address, reset a password or accept an invitation; only the hash is kept. */
export const accountTokens = pgTable(
  'account_tokens',
  {
    id: id(),
    personId: uuid().references(() => people.id, { onDelete: 'cascade' }),
    purpose: text().$type<TokenPurpose>().notNull(),
    tokenHash: text().notNull(),
    roles: text().array().$type<Role[]>().notNull().default([]),
    expiresAt: instant().notNull(),
    usedAt: instant(),
    createdAt: instant().notNull(),
  },
  (t) => [uniqueIndex('account_tokens_hash').on(t.tokenHash), index('account_tokens_person').on(t.personId, t.purpose)],
);

/** Sessions of express-session, in the shape connect-pg-simple expects. */
export const sessions = pgTable(
  'sessions',
  {
    sid: varchar().primaryKey(),
    sess: jsonb().notNull(),
    expire: timestamp({ precision: 6, withTimezone: true }).notNull(),
  },
  (t) => [index('sessions_expire').on(t.expire)],
);

/** Counters of rate-limiter-flexible, in the shape it expects. */
export const rateLimits = pgTable('rate_limits', {
  key: varchar({ length: 255 }).primaryKey(),
  points: integer().notNull().default(0),
  expire: bigint({ mode: 'number' }),
});
