/** Columns that many tables share, so that they read the same everywhere. */
import { integer, timestamp, uuid } from 'drizzle-orm/pg-core';

/** A random identifier; says nothing about order or number. */
export const id = () => uuid().primaryKey().defaultRandom();

/** An instant, stored in UTC. */
export const instant = () => timestamp({ withTimezone: true, mode: 'date' });

/** Counts changes of a row; the ETag of everything two people can edit. */
export const version = () => integer().notNull().default(1);
