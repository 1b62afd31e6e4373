/** The running product: database, migrations, demo, server. */
import { spawn } from 'node:child_process';
import { existsSync, mkdirSync, rmSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { claimServer, endLeftServers } from './claims.mjs';
import { ownDatabase } from './cluster.mjs';
import { must } from './must.mjs';
import { hindrance } from './ports.mjs';
import { DATA, keptSecret, ROOT } from './project.mjs';
import { end, Interrupted, interrupted, interruption, tail, wait } from './run.mjs';
import { atEnd, ending, step, Stop } from './say.mjs';

/** The port to serve on; says so before anything is started if it cannot be had. */
export async function choosePort() {
  const port = Number(process.env.PORT || 4000);
  if (!Number.isInteger(port) || port < 1 || port > 65535)
    throw new Stop(`PORT is "${process.env.PORT}"; give a number from 1 to 65535, for example PORT=4100.`);
  if ((await endLeftServers()) > 0) console.log('· A server that an earlier, killed start left behind has been ended.');
  const code = await hindrance(port, process.env.HOST || undefined);
  if (code === 'EADDRINUSE')
    throw new Stop(`Port ${port} is in use. Stop what uses it, or choose another: PORT=${port + 100} npm start.`);
  if (code) throw new Stop(`Port ${port} cannot be listened on (${code}). Choose another: PORT=4100 npm start.`);
  return port;
}

/** The database to work on: one's own by DATABASE_URL, else the project's cluster, which is left when the script ends. */
export async function chooseDatabase() {
  if (process.env.DATABASE_URL) return { url: process.env.DATABASE_URL, own: false };
  return { url: await ownDatabase(), own: true };
}

/** The environment of every process of the product. */
export function environment(databaseUrl, more = {}) {
  return {
    ...process.env,
    DATABASE_URL: databaseUrl,
    SESSION_SECRET: more.SESSION_SECRET || process.env.SESSION_SECRET || keptSecret(join(DATA, 'session-secret')),
    APP_ROOT: ROOT,
    LOG_LEVEL: process.env.LOG_LEVEL || 'warn',
    NODE_ENV: 'production',
    ...more,
  };
}

export const migrate = (env) =>
  step('Migrating the database', async () => {
    const sentence =
      'The database could not be migrated. Check that it runs and that DATABASE_URL, if you set it, is right.';
    await must(sentence, process.execPath, [join(ROOT, 'dist/jobs/migrate.mjs')], { env });
  });

/** Fills an empty database with the demo association; the seed says whether it did. */
export const seed = (env, args = []) =>
  step('Filling the demo association, if the database is empty', async () => {
    const sentence = 'The demo association could not be filled in:';
    const output = await must(sentence, process.execPath, [join(ROOT, 'dist/jobs/seed.mjs'), ...args], { env });
    return tail(output, 1);
  });

const HALF = join(DATA, 'demo-unfinished');

/** The same on the project's own database; a demo that was cut short is begun again. */
export async function seedOwn(env, args) {
  const url = env.DATABASE_URL;
  if (existsSync(HALF)) {
    await step('Emptying the database, as filling it was cut short', () => emptyDatabase(url));
    await migrate(env);
  } else if (await hasPeople(url)) return step('Demo association', () => 'there are people already');
  mkdirSync(DATA, { recursive: true });
  writeFileSync(HALF, '');
  await seed(env, args);
  rmSync(HALF, { force: true });
}

async function query(url, text) {
  const { default: pg } = await import('pg');
  const client = new pg.Client({ connectionString: url });
  await client.connect();
  try {
    return (await client.query(text)).rows;
  } finally {
    await client.end();
  }
}

const hasPeople = async (url) => (await query(url, 'select from people limit 1')).length > 0;

/** Takes everything out of a database. */
export const emptyDatabase = (url) =>
  query(url, 'drop schema if exists public, drizzle, pgboss cascade; create schema public');

/** Starts the server, keeping its last lines; `show` lets out what it has said and will say. */
export function startServer(env) {
  const child = spawn(process.execPath, [join(ROOT, 'dist/heddle/server/server.mjs')], {
    env,
    cwd: ROOT,
    stdio: ['ignore', 'pipe', 'pipe'],
  });
  claimServer(child.pid);
  let said = '';
  let shown = false;
  for (const stream of [child.stdout, child.stderr])
    stream.on('data', (chunk) => {
      said = (said + chunk).slice(-20_000);
      if (shown) process.stdout.write(chunk);
    });
  const host = ['', '0.0.0.0', '::'].includes(env.HOST ?? '') ? '127.0.0.1' : env.HOST;
  const server = {
    address: `http://${host}:${env.PORT}`,
    ended: new Promise((resolve) => child.once('close', resolve)),
    isEnded: () => child.exitCode !== null || child.signalCode !== null,
    lastLines: () => tail(said, 20) || '(it said nothing)',
    show() {
      process.stdout.write(said);
      shown = true;
    },
    stop: () => end(child),
  };
  atEnd(async () => {
    if (!server.isEnded()) await ending('Stopping the server', server.stop);
  });
  return server;
}

/** Waits until the server answers that it is ready. */
export async function untilReady(server) {
  for (let tries = 0; tries < 240; tries++) {
    if (interrupted()) throw new Interrupted();
    if (server.isEnded())
      throw new Stop(`The server ended right after its start. Its last lines:\n${server.lastLines()}`);
    const ready = await fetch(`${server.address}/api/ready`).then(
      (response) => response.ok,
      () => false,
    );
    if (ready) return;
    await wait(250);
  }
  throw new Stop(`The server did not become ready within a minute. Its last lines:\n${server.lastLines()}`);
}

/** Waits until somebody stops the script; a server that ends by itself is an error. */
export async function untilStopped(server) {
  await Promise.race([interruption, server.ended]);
  if (!interrupted()) throw new Stop(`The server has ended by itself. Its last lines:\n${server.lastLines()}`);
  console.log('');
}
