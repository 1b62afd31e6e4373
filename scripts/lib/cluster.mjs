/** The project's own cluster, and those that tests throw away. */
import { createHash } from 'node:crypto';
import { chmodSync, existsSync, mkdirSync, mkdtempSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { dirname, join } from 'node:path';
import { claimCluster, othersOnCluster } from './claims.mjs';
import {
  canEnter,
  ensureBinaries,
  ensureDatabase,
  halt,
  initialise,
  launch,
  ownerOf,
  runningPort,
} from './postgres.mjs';
import { freePort, hindrance } from './ports.mjs';
import { DATA, keptSecret, randomSecret, ROOT } from './project.mjs';
import { atEnd, ending, step } from './say.mjs';

const INSIDE = join(DATA, 'postgres');

/** Where the cluster's files are: in the project, or where PostgreSQL's user can go. */
async function chooseFolder() {
  mkdirSync(DATA, { recursive: true });
  if (existsSync(INSIDE) || (await canEnter(await ownerOf(INSIDE), DATA))) return INSIDE;
  const outside = join('/var/lib', `heddle-${createHash('sha256').update(ROOT).digest('hex').slice(0, 10)}`);
  if (!existsSync(outside)) {
    mkdirSync(outside);
    // Whatever the umask says, PostgreSQL's user has to pass.
    chmodSync(outside, 0o755);
    console.log(`· PostgreSQL’s user cannot enter ${ROOT}; the data go to ${outside}.`);
  }
  return join(outside, 'postgres');
}

/** The port of last time, or another where somebody else has taken it. */
async function choosePort(folder) {
  const file = join(dirname(folder), 'postgres-port');
  const last = existsSync(file) ? Number(readFileSync(file, 'utf8')) : 0;
  const port = last && !(await hindrance(last)) ? last : await freePort();
  writeFileSync(file, `${port}\n`);
  return port;
}

async function running(binaries, folder, owner) {
  const left = await runningPort(folder);
  if (left) {
    await step('PostgreSQL', () => `runs already on port ${left} and is used`);
    return left;
  }
  const port = await choosePort(folder);
  await step(`Starting PostgreSQL on 127.0.0.1:${port}`, () =>
    launch(binaries, folder, owner, port, ['-c max_connections=100']),
  );
  return port;
}

/** The address of the project's database: made at the first start, found ever after. Who ends last stops the cluster. */
export async function ownDatabase() {
  const binaries = await ensureBinaries();
  const folder = await chooseFolder();
  const owner = await ownerOf(folder);
  const password = keptSecret(join(dirname(folder), 'postgres-password'));
  claimCluster();
  if (!existsSync(folder))
    await step(`Making a PostgreSQL cluster in ${folder}`, () => initialise(binaries, folder, owner, password));
  atEnd(async () => {
    if (othersOnCluster().length > 0) return;
    await ending('Stopping PostgreSQL', async () => void (await halt(binaries, folder, owner)));
  });
  const port = await running(binaries, folder, owner);
  return ensureDatabase(port, password, 'heddle');
}

/** A cluster for one run of the tests, gone afterwards. Quick rather than safe: nothing in it is meant to last. */
export async function throwAwayCluster() {
  const binaries = await ensureBinaries();
  const owner = await ownerOf('');
  const base = (await canEnter(owner, tmpdir())) ? tmpdir() : '/var/tmp';
  const parent = mkdtempSync(join(base, 'heddle-test-'));
  chmodSync(parent, 0o755);
  const folder = join(parent, 'postgres');
  const password = randomSecret();
  atEnd(async () => {
    await halt(binaries, folder, owner);
    rmSync(parent, { recursive: true, force: true });
  });
  const quick = ['-c fsync=off', '-c synchronous_commit=off', '-c full_page_writes=off', '-c max_connections=200'];
  const port = await step('Starting a throw-away PostgreSQL cluster', async () => {
    await initialise(binaries, folder, owner, password, ['--no-sync']);
    const free = await freePort();
    await launch(binaries, folder, owner, free, quick);
    return free;
  });
  return { url: (name) => ensureDatabase(port, password, name) };
}
