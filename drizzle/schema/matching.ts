import { sql } from 'drizzle-orm';
import {
  boolean,
  check,
  customType,
  index,
  integer,
  jsonb,
  pgTable,
  primaryKey,
  real,
  text,
  uniqueIndex,
  uuid,
} from 'drizzle-orm/pg-core';
import type { MatchingSettings } from '../../shared/matching/matching-contract';
import type { PlanReport, RunState } from '../../shared/matching/runs-contract';
import { people } from './accounts';
import { applications } from './applications';
import { id, instant } from './columns';
import { cycles } from './cycles';

const bytes = customType<{ data: Buffer }>({ dataType: () => 'bytea' });

/** One row per matching run. What it read is frozen in `input` (gzipped canonical JSON, people as application ids) and never changes. */
export const runs = pgTable(
  'runs',
  {
    id: id(),
    cycleId: uuid()
      .notNull()
      .references(() => cycles.id, { onDelete: 'cascade' }),
    number: integer().notNull(),
    state: text().$type<RunState>().notNull().default('queued'),
    settings: jsonb().$type<MatchingSettings>().notNull(),
    input: bytes(),
    inputHash: text(),
    /** Gzipped JSON of the plan's arrays: mentorOf, prices, witness. */
    plan: bytes(),
    /** What pages show at once: counts, figures, shortages, remedies, trade-off, record. */
    report: jsonb().$type<PlanReport>(),
    progress: real().notNull().default(0),
    stage: text().notNull().default(''),
    cancelRequested: boolean().notNull().default(false),
    fault: text(),
    requestedBy: uuid().references(() => people.id, { onDelete: 'set null' }),
    createdAt: instant().notNull(),
    startedAt: instant(),
    heartbeatAt: instant(),
    finishedAt: instant(),
  },
  (t) => [
    uniqueIndex('runs_number').on(t.cycleId, t.number),
    // One run at a time in a cycle, whoever asks and from whichever process.
    uniqueIndex('runs_one_at_a_time')
      .on(t.cycleId)
      .where(sql`${t.state} in ('queued', 'running')`),
    check('runs_state_known', sql`${t.state} in ('queued', 'running', 'succeeded', 'failed', 'cancelled')`),
  ],
);

/** One row per pairing of a run's plan. */
export const planPairings = pgTable(
  'plan_pairings',
  {
    runId: uuid()
      .notNull()
      .references(() => runs.id, { onDelete: 'cascade' }),
    menteeApplicationId: uuid()
      .notNull()
      .references(() => applications.id, { onDelete: 'cascade' }),
    mentorApplicationId: uuid()
      .notNull()
      .references(() => applications.id, { onDelete: 'cascade' }),
    fit: integer().notNull(),
    place: integer().notNull(),
    /** Scores by criterion in the order of the run's active criteria, 0..10000; −1 = missing data, counted as half. */
    scores: integer().array().notNull(),
    /** Share of reweighted runs in which the pairing stays, 0..1; null where steadiness was not computed. */
    stays: real(),
    locked: boolean().notNull().default(false),
  },
  (t) => [
    primaryKey({ columns: [t.runId, t.menteeApplicationId] }),
    index('plan_pairings_mentor').on(t.runId, t.mentorApplicationId),
  ],
);

/** One row per pair that a coordinator locked or barred in a cycle. */
export const pairDecisions = pgTable(
  'pair_decisions',
  {
    cycleId: uuid()
      .notNull()
      .references(() => cycles.id, { onDelete: 'cascade' }),
    menteeApplicationId: uuid()
      .notNull()
      .references(() => applications.id, { onDelete: 'cascade' }),
    mentorApplicationId: uuid()
      .notNull()
      .references(() => applications.id, { onDelete: 'cascade' }),
    kind: text().$type<'lock' | 'bar'>().notNull(),
    note: text().notNull().default(''),
    /** A lock that a rule forbids, kept on purpose, with its note. */
    overridesRules: boolean().notNull().default(false),
    decidedBy: uuid().references(() => people.id, { onDelete: 'set null' }),
    decidedAt: instant().notNull(),
  },
  (t) => [
    primaryKey({ columns: [t.menteeApplicationId, t.mentorApplicationId] }),
    // A mentee can be locked to one mentor only.
    uniqueIndex('pair_decisions_one_lock')
      .on(t.menteeApplicationId)
      .where(sql`${t.kind} = 'lock'`),
    index('pair_decisions_cycle').on(t.cycleId),
    check('pair_decisions_kind_known', sql`${t.kind} in ('lock', 'bar')`),
  ],
);

/** One row per plan that a second coordinator approved for publishing. */
export const planApprovals = pgTable('plan_approvals', {
  runId: uuid()
    .primaryKey()
    .references(() => runs.id, { onDelete: 'cascade' }),
  approvedBy: uuid()
    .notNull()
    .references(() => people.id, { onDelete: 'cascade' }),
  approvedAt: instant().notNull(),
});

/** One row per published run: the set of proposals, numbered within the cycle and frozen. */
export const rounds = pgTable(
  'rounds',
  {
    id: id(),
    cycleId: uuid()
      .notNull()
      .references(() => cycles.id, { onDelete: 'cascade' }),
    runId: uuid()
      .notNull()
      .references(() => runs.id, { onDelete: 'cascade' }),
    number: integer().notNull(),
    publishedBy: uuid().references(() => people.id, { onDelete: 'set null' }),
    publishedAt: instant().notNull(),
  },
  (t) => [uniqueIndex('rounds_number').on(t.cycleId, t.number), uniqueIndex('rounds_run').on(t.runId)],
);
