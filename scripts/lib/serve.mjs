/** The running product: database, migrations, server. */
import { spawn } from 'node:child_process';
import { existsSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { DATA, kept, randomSecret, ROOT } from './project.mjs';
import { answers, ownCluster } from './postgres.mjs';
import { collect, must, wait } from './run.mjs';
import { step, Stop } from './say.mjs';

export const portWished = () => Number(process.env.PORT || 4000);

/** Says so before anything is started, if the port is taken. */
export async function checkPort(port) {
  if (await answers(port))
    throw new Stop(`Port ${port} is in use. Stop what uses it, or choose another: PORT=4100 npm start.`);
}

/** The database to work on: one's own by DATABASE_URL, else the project's cluster. */
export async function chooseDatabase() {
  if (process.env.DATABASE_URL) return { url: process.env.DATABASE_URL, own: false, stop: async () => undefined };
  const cluster = await ownCluster();
  return { url: cluster.url, own: true, stop: cluster.stop };
}

/** The environment of every process of the product. */
export function environment(databaseUrl, more = {}) {
  return {
    ...process.env,
    DATABASE_URL: databaseUrl,
    SESSION_SECRET: process.env.SESSION_SECRET || kept('session-secret', randomSecret),
    PORT: String(portWished()),
    APP_ROOT: ROOT,
    LOG_LEVEL: process.env.LOG_LEVEL || 'warn',
    NODE_ENV: 'production',
    ...more,
  };
}

export const migrate = (env) =>
  step('Migrating the database', () =>
    must('The database could not be migrated:', process.execPath, [join(ROOT, 'dist/jobs/migrate.mjs')], { env }).then(
      () => undefined,
    ),
  );

/** Fills an empty database with the demo association; says whether it did. */
export async function seed(env, args = []) {
  const path = join(ROOT, 'dist/jobs/seed.mjs');
  await step('Filling the demo association (only where the database is empty)', async () => {
    const output = await must('The demo association could not be filled in:', process.execPath, [path, ...args], {
      env,
    });
    return output.trim().split('\n').at(-1);
  });
}

export function startServer(env) {
  return spawn(process.execPath, [join(ROOT, 'dist/heddle/server/server.mjs')], {
    env,
    cwd: ROOT,
    stdio: ['ignore', 'inherit', 'inherit'],
  });
}

/** Waits until the server answers that it is ready. */
export async function untilReady(port, server) {
  for (let tries = 0; tries < 240; tries++) {
    if (server.exitCode !== null) throw new Stop('The server ended right after its start; what it said stands above.');
    const ready = await fetch(`http://127.0.0.1:${port}/api/ready`).then(
      (response) => response.ok,
      () => false,
    );
    if (ready) return;
    await wait(250);
  }
  throw new Stop('The server did not become ready within a minute; what it said stands above.');
}

const LOCK = join(DATA, 'start.pid');

/** True where another `npm start` of this project runs: then the cluster is its to stop. */
export async function claimStart() {
  const other = existsSync(LOCK) ? Number(readFileSync(LOCK, 'utf8')) : 0;
  if (other && other !== process.pid) {
    const { output } = await collect('ps', ['-o', 'args=', '-p', String(other)]);
    if (output.includes('scripts/')) return false;
  }
  writeFileSync(LOCK, String(process.pid));
  return true;
}

export const releaseStart = () => rmSync(LOCK, { force: true });
