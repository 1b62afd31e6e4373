/**
 * Which scripts of this project run, a file each in `.data/running`: so that the last one stops PostgreSQL, and so that what a
 * killed start left behind is found.
 */
import { existsSync, mkdirSync, readdirSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { DATA } from './project.mjs';
import { wait } from './run.mjs';
import { atEnd } from './say.mjs';

const FOLDER = join(DATA, 'running');
const mine = join(FOLDER, String(process.pid));
const claim = { cluster: false, server: null };

/** Whether a process runs, and is what its number once stood for. */
function lives(pid, words) {
  try {
    process.kill(pid, 0);
  } catch (error) {
    return error.code === 'EPERM';
  }
  const said = `/proc/${pid}/cmdline`;
  return !existsSync(said) || readFileSync(said, 'utf8').includes(words);
}

function write() {
  mkdirSync(FOLDER, { recursive: true });
  if (!existsSync(mine)) atEnd(() => rmSync(mine, { force: true }));
  writeFileSync(mine, JSON.stringify(claim));
}

export function claimCluster() {
  claim.cluster = true;
  write();
}

export function claimServer(pid) {
  claim.server = pid;
  write();
}

function claims() {
  const names = existsSync(FOLDER) ? readdirSync(FOLDER) : [];
  return names
    .filter((name) => Number(name) !== process.pid)
    .map((name) => ({ pid: Number(name), path: join(FOLDER, name), ...parse(join(FOLDER, name)) }));
}

// A start that was killed while it wrote leaves half a line.
function parse(path) {
  try {
    return JSON.parse(readFileSync(path, 'utf8'));
  } catch {
    return {};
  }
}

/** The other scripts that use the project's cluster right now. */
export const othersOnCluster = () => claims().filter(({ pid, cluster }) => cluster && lives(pid, 'scripts/'));

/** Ends the servers whose start was killed; they would hold their port for ever. Gives how many there were. */
export async function endLeftServers() {
  const left = claims().filter(({ pid }) => !lives(pid, 'scripts/'));
  const servers = left.filter(({ server }) => server && lives(server, 'dist/heddle/server/server.mjs'));
  for (const { server } of servers) {
    process.kill(server, 'SIGTERM');
    for (let tries = 0; tries < 60 && lives(server, 'server.mjs'); tries++) await wait(200);
  }
  for (const { path } of left) rmSync(path, { force: true });
  return servers.length;
}
