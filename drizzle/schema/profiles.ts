import { sql } from 'drizzle-orm';
import { boolean, check, index, integer, jsonb, pgTable, primaryKey, smallint, text, uuid } from 'drizzle-orm/pg-core';
import type {
  CareerStage,
  InterestKind,
  LanguageSkill,
  MeetingMode,
  Region,
  Sector,
  SectorWish,
  Slot,
} from '../../shared/profiles/profiles-contract';
import { people } from './accounts';
import { instant } from './columns';
import { tags } from './tags';

/** One row per person: the mentoring profile. Each section has a version of its own, so that two tabs cannot overwrite each other. */
export const profiles = pgTable(
  'profiles',
  {
    personId: uuid()
      .primaryKey()
      .references(() => people.id, { onDelete: 'cascade' }),
    knownAs: text().notNull().default(''),
    pronouns: text().notNull().default(''),
    headline: text().notNull().default(''),
    employer: text().notNull().default(''),
    region: text().$type<Region>(),
    town: text(),
    timeZone: text().notNull(),
    languages: jsonb().$type<LanguageSkill[]>().notNull().default([]),
    careerStage: text().$type<CareerStage>(),
    yearsInPractice: smallint(),
    sector: text().$type<Sector>(),
    credentials: text().notNull().default(''),
    meetingMode: text().$type<MeetingMode>(),
    maxDistanceKm: smallint(),
    availability: text().array().$type<Slot[]>().notNull().default([]),
    hopes: text().notNull().default(''),
    style: text().notNull().default(''),
    cannotHelpWith: text().notNull().default(''),
    wishedYearsMin: smallint(),
    wishedYearsMax: smallint(),
    wishedSector: text().$type<SectorWish>().notNull().default('any'),
    wishedStages: text().array().$type<CareerStage[]>().notNull().default([]),
    listed: boolean().notNull().default(false),
    adjustments: text().notNull().default(''),
    aboutVersion: integer().notNull().default(1),
    practiceVersion: integer().notNull().default(1),
    interestsVersion: integer().notNull().default(1),
    meetingVersion: integer().notNull().default(1),
    wishesVersion: integer().notNull().default(1),
    privateVersion: integer().notNull().default(1),
    updatedAt: instant().notNull(),
  },
  (t) => [
    check('profiles_years_range', sql`${t.yearsInPractice} between 0 and 70`),
    check('profiles_distance_range', sql`${t.maxDistanceKm} between 0 and 1000`),
  ],
);

/** One row per tag a person offers or seeks, with priority 1 (most) to 3. */
export const profileTags = pgTable(
  'profile_tags',
  {
    personId: uuid()
      .notNull()
      .references(() => people.id, { onDelete: 'cascade' }),
    tagId: uuid()
      .notNull()
      .references(() => tags.id),
    direction: text().$type<'offers' | 'seeks'>().notNull(),
    priority: smallint().$type<1 | 2 | 3>().notNull(),
  },
  (t) => [
    primaryKey({ columns: [t.personId, t.direction, t.tagId] }),
    index('profile_tags_tag').on(t.tagId),
    check('profile_tags_priority', sql`${t.priority} between 1 and 3`),
    check('profile_tags_direction', sql`${t.direction} in ('offers', 'seeks')`),
  ],
);

/** One row per person whom the owner does not wish to be paired with. Coordinators only. */
export const profileExclusions = pgTable(
  'profile_exclusions',
  {
    personId: uuid()
      .notNull()
      .references(() => people.id, { onDelete: 'cascade' }),
    otherId: uuid()
      .notNull()
      .references(() => people.id, { onDelete: 'cascade' }),
  },
  (t) => [primaryKey({ columns: [t.personId, t.otherId] })],
);

/** One row per declared interest between the owner and another person. Coordinators only. */
export const declaredInterests = pgTable(
  'declared_interests',
  {
    personId: uuid()
      .notNull()
      .references(() => people.id, { onDelete: 'cascade' }),
    otherId: uuid()
      .notNull()
      .references(() => people.id, { onDelete: 'cascade' }),
    kind: text().$type<InterestKind>().notNull(),
  },
  (t) => [primaryKey({ columns: [t.personId, t.otherId] })],
);
