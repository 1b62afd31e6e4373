/** What every verb is given: who acts, on which connection, at what time. Nothing is global. */
import type PgBoss from 'pg-boss';
import type { Logger } from 'pino';
import type { Role } from '../../../shared/accounts/accounts-contract';
import { transaction, type Db } from './database';
import { Problem } from './problems';
import type { Settings } from './settings';

export interface Actor {
  personId: string;
  name: string;
  roles: readonly Role[];
}

/** Puts a job into the queue; with a transaction, together with the change that asks for it. */
export type Enqueue = (db: Db, queue: string, data: object, options?: PgBoss.SendOptions) => Promise<void>;

export interface Context {
  db: Db;
  actor: Actor | null;
  now(): Date;
  requestId: string;
  settings: Settings;
  log: Logger;
  enqueue: Enqueue;
}

/** Runs `work` with a context whose connection is one transaction. */
export function inTransaction<T>(ctx: Context, work: (tx: Context) => Promise<T>): Promise<T> {
  return transaction(ctx.db, (db) => work({ ...ctx, db }));
}

/** The signed-in person; routes that need one have checked it, so a missing one is our own fault. */
export function actorOf(ctx: Context): Actor {
  if (!ctx.actor) throw new Problem('unauthenticated', 'Please sign in');
  return ctx.actor;
}

export const hasRole = (actor: Actor | null, role: Role): boolean => actor?.roles.includes(role) ?? false;
