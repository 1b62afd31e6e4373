import { sql } from 'drizzle-orm';
import { check, index, integer, jsonb, pgTable, text, uniqueIndex, uuid } from 'drizzle-orm/pg-core';
import type { PairingAnswer, PairingState, SharedThings } from '../../shared/pairings/pairings-contract';
import { applications } from './applications';
import { id, instant, version } from './columns';
import { cycles } from './cycles';
import { rounds } from './matching';

/** One row per proposed pairing; once both accept it is the pair. */
export const pairings = pgTable(
  'pairings',
  {
    id: id(),
    cycleId: uuid()
      .notNull()
      .references(() => cycles.id, { onDelete: 'cascade' }),
    roundId: uuid()
      .notNull()
      .references(() => rounds.id, { onDelete: 'cascade' }),
    menteeApplicationId: uuid()
      .notNull()
      .references(() => applications.id, { onDelete: 'cascade' }),
    mentorApplicationId: uuid()
      .notNull()
      .references(() => applications.id, { onDelete: 'cascade' }),
    fit: integer().notNull(),
    shared: jsonb().$type<SharedThings>().notNull(),
    state: text().$type<PairingState>().notNull().default('pending'),
    menteeAnswer: text().$type<PairingAnswer>().notNull().default('unanswered'),
    menteeAnsweredAt: instant(),
    menteeReason: text().notNull().default(''),
    /** SHA-256 of the token in the mentee's link; the token itself is nowhere. */
    menteeTokenHash: text().notNull(),
    mentorAnswer: text().$type<PairingAnswer>().notNull().default('unanswered'),
    mentorAnsweredAt: instant(),
    mentorReason: text().notNull().default(''),
    mentorTokenHash: text().notNull(),
    answersDueAt: instant().notNull(),
    underWayAt: instant(),
    endedAt: instant(),
    createdAt: instant().notNull(),
    version: version(),
  },
  (t) => [
    uniqueIndex('pairings_mentee_token').on(t.menteeTokenHash),
    uniqueIndex('pairings_mentor_token').on(t.mentorTokenHash),
    // A mentee has at most one pairing that is pending or under way.
    uniqueIndex('pairings_one_for_mentee')
      .on(t.menteeApplicationId)
      .where(sql`${t.state} in ('pending', 'under-way')`),
    // A pair declined in a cycle is never proposed again in that cycle (applications belong to one cycle).
    uniqueIndex('pairings_never_again')
      .on(t.menteeApplicationId, t.mentorApplicationId)
      .where(sql`${t.state} not in ('expired', 'withdrawn')`),
    index('pairings_mentor').on(t.mentorApplicationId),
    index('pairings_cycle').on(t.cycleId, t.state),
    check(
      'pairings_state_known',
      sql`${t.state} in ('pending', 'under-way', 'declined', 'expired', 'withdrawn', 'completed', 'ended-early')`,
    ),
    check(
      'pairings_answers_known',
      sql`${t.menteeAnswer} in ('unanswered', 'accepted', 'declined') and ${t.mentorAnswer} in ('unanswered', 'accepted', 'declined')`,
    ),
    check(
      'pairings_pair_means_both_accepted',
      sql`${t.state} not in ('under-way', 'completed', 'ended-early') or (${t.menteeAnswer} = 'accepted' and ${t.mentorAnswer} = 'accepted')`,
    ),
  ],
);
