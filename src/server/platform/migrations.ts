/** Brings the database to the version of the code; safe to run from several processes at once. */
import { drizzle } from 'drizzle-orm/node-postgres';
import { migrate } from 'drizzle-orm/node-postgres/migrator';
import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import pg from 'pg';
import type { Db } from './database';
import { sql } from 'drizzle-orm';

// Any number that nothing else locks: Drizzle's migrator itself takes no lock.
const LOCK = 4_332_353;

/** Applies what is missing, as the schema's owner, under an advisory lock. */
export async function migrateDatabase(url: string, root: string): Promise<void> {
  const client = new pg.Client({ connectionString: url });
  await client.connect();
  try {
    await client.query('select pg_advisory_lock($1)', [LOCK]);
    await migrate(drizzle(client), { migrationsFolder: join(root, 'drizzle/migrations') });
  } finally {
    await client.end();
  }
}

/** How many of the code's migrations the database lacks. */
export async function missingMigrations(db: Db, root: string): Promise<number> {
  const journal = JSON.parse(readFileSync(join(root, 'drizzle/migrations/meta/_journal.json'), 'utf8')) as {
    entries: unknown[];
  };
  const result = await db.execute<{ applied: number }>(
    sql`select count(*)::int as applied from drizzle.__drizzle_migrations`,
  );
  return Math.max(0, journal.entries.length - (result.rows[0]?.applied ?? 0));
}
