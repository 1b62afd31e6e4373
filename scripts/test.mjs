/**
 * `npm test`: every test on a throw-away PostgreSQL cluster, summed into one last line. `--only lint,types,unit,api,build,components,e2e`
 * chooses steps.
 */
import { existsSync, readdirSync } from 'node:fs';
import { join } from 'node:path';
import { ensureBrowser } from './lib/browser.mjs';
import { throwAwayCluster } from './lib/cluster.mjs';
import { check, counted, playwright, total, vitest } from './lib/counting.mjs';
import { freePort } from './lib/ports.mjs';
import { bin, build, buildJobs, ensureBuild, ensurePackages, randomSecret, ROOT } from './lib/project.mjs';
import { checkNode, main, step, Stop } from './lib/say.mjs';
import { environment, migrate, seed, startServer, untilReady } from './lib/serve.mjs';

let cluster = null;
let chromium = null;

const json = (report) => ['--reporter=default', '--reporter=json', `--outputFile.json=${report}`];

const STEP = {
  lint: () =>
    check('Lint (eslint, prettier)', [bin('eslint'), '.'], [bin('prettier'), '--check', '--log-level=warn', '.']),
  types: () =>
    check(
      'Types (tsc for server, tests and shared code; ngc for the client and its templates)',
      [bin('tsc'), '-p', 'tsconfig.node.json', '--noEmit'],
      [bin('ngc'), '-p', 'tsconfig.app.json', '--noEmit'],
    ),
  unit: () =>
    vitest('Unit and property tests (vitest)', bin('vitest'), (report) => [
      'run',
      '--project',
      'unit',
      ...json(report),
    ]),
  api: async () =>
    vitest(
      'API tests on PostgreSQL (vitest)',
      bin('vitest'),
      (report) => ['run', '--project', 'api', ...json(report)],
      { DATABASE_URL: await cluster.url('postgres') },
    ),
  build: () =>
    counted('Build (ng build and the jobs)', () => build().then(() => ({ passed: 1, failed: 0, output: '' }))),
  components: () =>
    vitest(
      'Component tests (ng test)',
      bin('ng'),
      (report) => ['test', '--watch=false', '--reporters=default', '--reporters=json', `--output-file=${report}`],
      { NG_CLI_ANALYTICS: 'false', CI: '1' },
    ),
  e2e: browserTests,
};

const hasJourneys = () =>
  existsSync(join(ROOT, 'e2e')) &&
  readdirSync(join(ROOT, 'e2e'), { recursive: true }).some((name) => /\.spec\.ts$/.test(name));

/** The built product with its demo, on a database of its own, driven in a real browser. */
async function browserTests() {
  const label = 'Browser tests (playwright)';
  if (!hasJourneys()) return counted(label, async () => ({ passed: 0, failed: 0, output: '' }));
  await ensureBuild();
  await buildJobs();
  const port = await freePort();
  const env = environment(await cluster.url('heddle_e2e'), {
    PORT: String(port),
    APP_ORIGIN: `http://localhost:${port}`,
    SESSION_SECRET: randomSecret(),
    DEMO: '1',
    LOG_LEVEL: 'error',
    // What a developer has set for a server of their own must not reach this one: least of all a real mail server.
    ...Object.fromEntries(['HOST', 'SMTP_URL', 'HEDDLE_PROCESS', 'TRUST_PROXY'].map((name) => [name, ''])),
  });
  await migrate(env);
  await seed(env);
  const server = startServer(env);
  await step('Starting the product for the browser', () => untilReady(server));
  const failedBefore = total.failed;
  await playwright(label, bin('playwright'), ['test', '--reporter=list,json'], {
    BASE_URL: `http://localhost:${port}`,
    CHROMIUM: chromium,
  });
  if (total.failed > failedBefore) console.log(`The server’s last lines:\n${server.lastLines()}`);
}

function chosenSteps() {
  const at = process.argv.indexOf('--only');
  const all = Object.keys(STEP);
  const names = at < 0 ? all : (process.argv[at + 1] ?? '').split(',');
  const unknown = names.find((name) => !all.includes(name));
  if (unknown !== undefined) throw new Stop(`There is no step "${unknown}". Steps: ${all.join(', ')}.`);
  return all.filter((name) => names.includes(name));
}

await main(
  async () => {
    const steps = chosenSteps();
    await step(`Node.js ${process.versions.node}`, checkNode);
    await ensurePackages();
    if (steps.includes('e2e')) chromium = await ensureBrowser();
    if (steps.includes('api') || steps.includes('e2e')) cluster = await throwAwayCluster();
    for (const name of steps) await STEP[name]();
  },
  () => {
    // Whatever ended the run before its time has failed too.
    if (process.exitCode) total.failed++;
    console.log(`\n${total.passed} passed, ${total.failed} failed`);
    if (total.failed > 0) process.exitCode ??= 1;
  },
);
