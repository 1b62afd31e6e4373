/** Once for all API specs: a migrated template database, which each spec copies, and the bundles that run in threads. */
import { spawnSync } from 'node:child_process';
import { existsSync } from 'node:fs';
import pg from 'pg';
import type { TestProject } from 'vitest/node';
import { migrateDatabase } from '../../src/server/platform/migrations';

declare module 'vitest' {
  interface ProvidedContext {
    serverUrl: string;
    template: string;
  }
}

export default async function setup(project: TestProject): Promise<() => Promise<void>> {
  const serverUrl = process.env['DATABASE_URL'];
  if (!serverUrl)
    throw new Error(
      'API specs need DATABASE_URL: a PostgreSQL server where databases may be created. `npm test` provides one.',
    );
  const template = `heddle_template_${process.pid}`;
  await administer(serverUrl, `create database ${template}`);
  const url = new URL(serverUrl);
  url.pathname = `/${template}`;
  await migrateDatabase(url.href, process.cwd());
  buildJobs();
  project.provide('serverUrl', serverUrl);
  project.provide('template', template);
  return () => administer(serverUrl, `drop database if exists ${template} with (force)`);
}

function buildJobs(): void {
  if (!existsSync('scripts/build-server.mjs')) return;
  const result = spawnSync(process.execPath, ['scripts/build-server.mjs'], { encoding: 'utf8' });
  if (result.status !== 0) throw new Error(`The server's bundles could not be built:\n${result.stderr}`);
}

async function administer(serverUrl: string, statement: string): Promise<void> {
  const client = new pg.Client({ connectionString: serverUrl });
  await client.connect();
  await client.query(statement);
  await client.end();
}
