/** The connection to PostgreSQL: pool, role, transactions. */
import { drizzle, type NodePgQueryResultHKT } from 'drizzle-orm/node-postgres';
import type { PgDatabase } from 'drizzle-orm/pg-core';
import type { ExtractTablesWithRelations } from 'drizzle-orm';
import pg from 'pg';
import * as schema from '../../../drizzle/schema';

type Schema = typeof schema;
/** Either the pool or a transaction; queries do not care which. */
export type Db = PgDatabase<NodePgQueryResultHKT, Schema, ExtractTablesWithRelations<Schema>>;

export const APP_ROLE = 'heddle_app';
export const MATCHING_ROLE = 'heddle_matching';

export interface DatabaseOptions {
  url: string;
  poolSize?: number;
  onError?: (error: Error) => void;
}

export interface Database {
  db: Db;
  pool: pg.Pool;
  /** True where the database has the application's own roles and this connection steps down to them. */
  separateRoles: boolean;
  close(): Promise<void>;
}

/** Opens a pool whose connections act as `heddle_app` where that role exists and may be taken. */
export async function openDatabase({ url, poolSize = 10, onError }: DatabaseOptions): Promise<Database> {
  const separateRoles = await mayStepDown(url);
  const pool = new pg.Pool({
    connectionString: url,
    max: poolSize,
    connectionTimeoutMillis: 3000,
    statement_timeout: 30_000,
    lock_timeout: 10_000,
    idle_in_transaction_session_timeout: 60_000,
    ...(separateRoles ? { options: `-c role=${APP_ROLE}` } : {}),
  });
  // Without a listener a connection that the server ends would end this process too.
  pool.on('error', (error) => onError?.(error));
  pool.on('connect', (client) => client.on('error', (error) => onError?.(error)));
  const db = drizzle(pool, { schema, casing: 'snake_case' });
  return { db, pool, separateRoles, close: () => pool.end() };
}

async function mayStepDown(url: string): Promise<boolean> {
  const client = new pg.Client({ connectionString: url, connectionTimeoutMillis: 5000 });
  await client.connect();
  try {
    const answer = await client.query<{ may: boolean }>(
      `select exists (select from pg_roles where rolname = $1 and pg_has_role(current_user, oid, 'member')
         and has_table_privilege(oid, to_regclass('public.people'), 'select')) as may`,
      [APP_ROLE],
    );
    return answer.rows[0]?.may ?? false;
  } finally {
    await client.end();
  }
}

const RETRIABLE = new Set(['40001', '40P01']);

/** Runs `work` in one transaction; repeats it where the database asks for that (serialisation failure, deadlock). */
export async function transaction<T>(db: Db, work: (tx: Db) => Promise<T>, tries = 3): Promise<T> {
  try {
    return await db.transaction(work);
  } catch (error) {
    if (tries > 1 && RETRIABLE.has(databaseCode(error) ?? '')) return transaction(db, work, tries - 1);
    throw error;
  }
}

/** The SQLSTATE behind an error, wherever Drizzle put it; null for other errors. */
export function databaseCode(error: unknown): string | null {
  for (let at: unknown = error; at instanceof Error; at = at.cause)
    if ('code' in at && typeof at.code === 'string' && /^[0-9A-Z]{5}$/.test(at.code)) return at.code;
  return null;
}

/** The name of the constraint that refused a change; null where none did. */
export function violatedConstraint(error: unknown): string | null {
  for (let at: unknown = error; at instanceof Error; at = at.cause)
    if ('constraint' in at && typeof at.constraint === 'string') return at.constraint;
  return null;
}
