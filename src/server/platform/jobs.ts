/** Background jobs through pg-boss, whose schema comes from our migrations. */
import PgBoss from 'pg-boss';
import pg from 'pg';
import type { Logger } from 'pino';
import { SQL, sql, StringChunk } from 'drizzle-orm';
import type { Enqueue } from './context';
import type { Db } from './database';

export const QUEUES = ['matching-run', 'pairings-deadlines', 'housekeeping'] as const;
export type Queue = (typeof QUEUES)[number];

export interface Jobs {
  boss: PgBoss;
  enqueue: Enqueue;
  stop(): Promise<void>;
}

/**
 * Starts pg-boss. Queues are partitions, which only the schema's owner may create, so it has a small pool of its own.
 * `works` = this process also takes jobs and keeps the schedule.
 */
export async function startJobs(databaseUrl: string, log: Logger, works: boolean): Promise<Jobs> {
  const pool = new pg.Pool({ connectionString: databaseUrl, max: works ? 3 : 2, connectionTimeoutMillis: 5000 });
  pool.on('error', (error) => log.warn({ err: error }, 'job connection lost'));
  const boss = new PgBoss({
    db: { executeSql: (text, values) => pool.query(text, values) },
    schema: 'pgboss',
    migrate: false,
    supervise: works,
    schedule: works,
  });
  boss.on('error', (error) => log.error({ err: error }, 'jobs'));
  await boss.start();
  const known = new Set((await boss.getQueues()).map((queue) => queue.name));
  for (const queue of QUEUES) if (!known.has(queue)) await boss.createQueue(queue);
  return {
    boss,
    enqueue: (db, queue, data, options) => send(boss, db, queue, data, options),
    async stop() {
      await boss.stop({ graceful: true, timeout: 8000, close: false, wait: true });
      await pool.end();
    },
  };
}

async function send(
  boss: PgBoss,
  db: Db,
  queue: string,
  data: object,
  options: PgBoss.SendOptions = {},
): Promise<void> {
  const executeSql = async (text: string, values: unknown[]) => {
    const result = await db.execute(withParameters(text, values));
    return { rows: result.rows as unknown[] };
  };
  await boss.send(queue, data, { ...options, db: { executeSql } });
}

/** Queues that the database does not know; empty = jobs can be taken. */
export async function missingQueues(db: Db): Promise<Queue[]> {
  const { rows } = await db.execute<{ name: string }>(sql`select name from pgboss.queue`);
  const known = new Set(rows.map((row) => row.name));
  return QUEUES.filter((queue) => !known.has(queue));
}

/** Rebuilds a text with $1, $2 … as a Drizzle query, so that it runs in the caller's transaction. */
function withParameters(text: string, values: unknown[]): SQL {
  const parts = text.split(/\$(\d+)/);
  return sql.join(
    parts.map((part, index) => (index % 2 === 0 ? literal(part) : sql`${values[Number(part) - 1] ?? null}`)),
  );
}

/** A piece of pg-boss's own SQL text. */
const literal = (text: string): SQL => new SQL([new StringChunk(text)]);
