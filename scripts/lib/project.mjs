/** The project's folder, its packages and its build. */
import { createHash, randomBytes } from 'node:crypto';
import { existsSync, mkdirSync, readdirSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { dirname, join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { must } from './must.mjs';
import { step } from './say.mjs';

export const ROOT = dirname(dirname(dirname(fileURLToPath(import.meta.url))));
/** What this machine keeps between starts: the cluster, its password, the session secret. Not in the repository. */
export const DATA = join(ROOT, '.data');
export const bin = (name) => join(ROOT, 'node_modules/.bin', name);

export const randomSecret = () => randomBytes(32).toString('hex');

/** A secret that is made once and read ever after; only its owner may read its file. */
export function keptSecret(path) {
  if (existsSync(path)) return readFileSync(path, 'utf8').trim();
  mkdirSync(dirname(path), { recursive: true });
  const value = randomSecret();
  writeFileSync(path, `${value}\n`, { mode: 0o600 });
  return value;
}

const hashOf = (paths) => {
  const hash = createHash('sha256');
  for (const path of paths) hash.update(path).update(readFileSync(join(ROOT, path)));
  return hash.digest('hex');
};

const isCurrent = (marker, hash) => existsSync(marker) && readFileSync(marker, 'utf8') === hash;

/** Installs the packages of package-lock.json where they are missing or stale. */
export async function ensurePackages() {
  const marker = join(ROOT, 'node_modules/.heddle-lock');
  const hash = hashOf(['package-lock.json']);
  if (isCurrent(marker, hash)) return step('Packages', () => 'as in package-lock.json');
  await step('Installing packages (npm ci, a minute or two)', async () => {
    await must(
      'The packages could not be installed. Check that the npm registry can be reached, then run this again.',
      'npm',
      ['ci', '--include=dev', '--no-audit', '--no-fund', '--no-update-notifier', '--loglevel=error'],
      { cwd: ROOT },
    );
    writeFileSync(marker, hash);
  });
}

function filesOf(path) {
  return readdirSync(join(ROOT, path), { withFileTypes: true }).flatMap((entry) => {
    const inside = `${path}/${entry.name}`;
    return entry.isDirectory() ? filesOf(inside) : [inside];
  });
}

function sources() {
  const folders = ['src', 'shared', 'drizzle', 'public'].flatMap(filesOf).filter((path) => !/\.spec\.ts$/.test(path));
  const files = ['server.ts', 'angular.json', 'package-lock.json', 'tsconfig.json', 'tsconfig.app.json'];
  return [...folders, ...files, 'scripts/build-server.mjs'].sort();
}

const BUILT = join(ROOT, 'dist/.heddle-sources');

/** Builds where sources have changed since the last build. */
export async function ensureBuild() {
  if (isCurrent(BUILT, hashOf(sources()))) return step('Build', () => 'of these sources');
  await step('Building (ng build and the jobs, a minute or so)', build);
}

/** Builds, and notes of which sources, so that the next start need not. */
export async function build() {
  const hash = hashOf(sources());
  rmSync(BUILT, { force: true });
  const options = { cwd: ROOT, env: { ...process.env, NG_CLI_ANALYTICS: 'false', CI: '1' } };
  await must('The application could not be built; the compiler says:', bin('ng'), ['build'], options);
  await buildJobs();
  writeFileSync(BUILT, hash);
}

export async function buildJobs() {
  const sentence = 'The background jobs could not be built; the compiler says:';
  await must(sentence, process.execPath, [join(ROOT, 'scripts/build-server.mjs')], { cwd: ROOT });
}
