/** A running API on a database of its own, with clients that sign in as people made for the test. */
import express from 'express';
import { randomUUID } from 'node:crypto';
import type { AddressInfo } from 'node:net';
import pg from 'pg';
import { inject } from 'vitest';
import type { Role } from '../../shared/accounts/accounts-contract';
import { people, personRoles } from '../../drizzle/schema';
import { startBackend, type Backend } from '../../src/server/backend';
import { hashPassword } from '../../src/server/accounts';
import { createMailTransport, deliverMessages } from '../../src/server/messages';
import { readSettings, type Settings } from '../../src/server/platform/settings';
import { TestClient } from './test-client';

export const PASSWORD = 'lantern orchard pewter';

export interface TestPerson {
  id: string;
  name: string;
  email: string;
}

export interface TestApp {
  backend: Backend;
  settings: Settings;
  url: string;
  pool: pg.Pool;
  /** Rows of a query as the database's owner, for looking behind the answers. */
  rows<T extends pg.QueryResultRow>(text: string, values?: unknown[]): Promise<T[]>;
  person(about?: { name?: string; email?: string; roles?: Role[]; confirmed?: boolean }): Promise<TestPerson>;
  visitor(): Promise<TestClient>;
  signIn(person: TestPerson): Promise<TestClient>;
  /** A new person with these roles, signed in. */
  client(...roles: Role[]): Promise<TestClient & { person: TestPerson }>;
  /** Sends what is in the outbox to the local mailbox. */
  deliver(): Promise<void>;
  stop(): Promise<void>;
}

let passwordHash: Promise<string> | null = null;

export async function startTestApp(
  options: { process?: 'web' | 'all'; env?: Record<string, string> } = {},
): Promise<TestApp> {
  const url = await copyTemplate();
  const settings = readSettings({
    DATABASE_URL: url,
    SESSION_SECRET: 'a secret that only these tests know, long enough',
    APP_ORIGIN: 'http://localhost:4000',
    LOG_LEVEL: process.env['TEST_LOG_LEVEL'] ?? 'silent',
    HEDDLE_PROCESS: options.process ?? 'web',
    PORT: '0',
    ...options.env,
  });
  const backend = await startBackend(settings);
  const app = express();
  app.use(...backend.api.before);
  app.use(backend.api.router);
  const server = app.listen(0, '127.0.0.1');
  await new Promise((resolve) => server.once('listening', resolve));
  const base = `http://127.0.0.1:${(server.address() as AddressInfo).port}`;
  const pool = new pg.Pool({ connectionString: url, max: 3 });
  pool.on('error', () => undefined);
  const db = backend.database.db;

  const self: TestApp = {
    backend,
    settings,
    url: base,
    pool,
    rows: async <T extends pg.QueryResultRow>(text: string, values: unknown[] = []) =>
      (await pool.query<T>(text, values)).rows,
    async person({
      name = 'Test Person',
      email = `person-${randomUUID()}@test.example`,
      roles = [],
      confirmed = true,
    } = {}) {
      passwordHash ??= hashPassword(PASSWORD);
      const now = new Date();
      const [row] = await db
        .insert(people)
        .values({
          name,
          email,
          passwordHash: await passwordHash,
          emailConfirmedAt: confirmed ? now : null,
          createdAt: now,
        })
        .returning();
      if (!row) throw new Error('no person was made');
      if (roles.length > 0) await db.insert(personRoles).values(roles.map((role) => ({ personId: row.id, role })));
      return { id: row.id, name, email };
    },
    async visitor() {
      const client = new TestClient(base);
      await client.get('/api/accounts/session');
      return client;
    },
    async signIn(person) {
      const client = await self.visitor();
      const answer = await client.post('/api/accounts/session', { email: person.email, password: PASSWORD });
      if (answer.status !== 200) throw new Error(`sign-in failed: ${JSON.stringify(answer.body)}`);
      return client;
    },
    async client(...roles) {
      const person = await self.person({ roles });
      return Object.assign(await self.signIn(person), { person });
    },
    async deliver() {
      await deliverMessages(backend.context(), createMailTransport(settings));
    },
    async stop() {
      await new Promise((resolve) => server.close(resolve));
      server.closeAllConnections();
      await backend.stop();
      await pool.end();
      await dropDatabase(url);
    },
  };
  return self;
}

async function copyTemplate(): Promise<string> {
  const name = `heddle_test_${randomUUID().replaceAll('-', '')}`;
  // Copying refuses while somebody else copies the same template; the lock makes them wait for each other.
  await administer(`create database ${name} template ${inject('template')}`);
  const url = new URL(inject('serverUrl'));
  url.pathname = `/${name}`;
  return url.href;
}

const dropDatabase = (url: string): Promise<void> =>
  administer(`drop database if exists ${new URL(url).pathname.slice(1)} with (force)`);

async function administer(statement: string): Promise<void> {
  const client = new pg.Client({ connectionString: inject('serverUrl') });
  await client.connect();
  try {
    await client.query('select pg_advisory_lock(7)');
    await client.query(statement);
  } finally {
    await client.end();
  }
}
