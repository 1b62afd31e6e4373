/**
 * `npm test`: every test on a throw-away PostgreSQL cluster, summed into one last line. `--only lint,types,unit,api,build,components,e2e`
 * chooses steps.
 */
import { existsSync, mkdirSync, readFileSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { ensureBrowser } from './lib/browser.mjs';
import { freePort, throwAwayCluster } from './lib/postgres.mjs';
import { bin, build, buildJobs, ensurePackages, randomSecret, ROOT } from './lib/project.mjs';
import { collect, end } from './lib/run.mjs';
import { checkNode, main, step, Stop } from './lib/say.mjs';
import { environment, migrate, seed, startServer, untilReady } from './lib/serve.mjs';

const STEPS = ['lint', 'types', 'unit', 'api', 'build', 'components', 'e2e'];
const only = process.argv.includes('--only') ? process.argv[process.argv.indexOf('--only') + 1]?.split(',') : STEPS;
const reports = join(tmpdir(), `heddle-reports-${process.pid}`);
const total = { passed: 0, failed: 0 };
let cluster = null;
let server = null;

async function cleanUp() {
  if (server) await end(server);
  if (cluster) await cluster.stop();
  rmSync(reports, { recursive: true, force: true });
}
for (const signal of ['SIGINT', 'SIGTERM']) process.on(signal, () => void cleanUp().then(() => process.exit(1)));

/** Counts a command as one test. */
async function check(label, command, args, options = {}) {
  await counted(label, async () => {
    const { code, output } = await collect(command, args, { cwd: ROOT, ...options });
    return { passed: code === 0 ? 1 : 0, failed: code === 0 ? 0 : 1, output };
  });
}

/** Runs one step and adds its counts; what it said is shown only where something failed. */
async function counted(label, work) {
  const since = performance.now();
  process.stdout.write(`· ${label} … `);
  const { passed, failed, output } = await work().catch((error) => ({
    passed: 0,
    failed: 1,
    output: String(error.message),
  }));
  total.passed += passed;
  total.failed += failed;
  const seconds = ((performance.now() - since) / 1000).toFixed(1);
  console.log(`${passed} passed, ${failed} failed, in ${seconds} s`);
  if (failed > 0) console.log(output);
}

/** A runner that writes vitest's JSON report. A runner that ends badly without a failed test counts as one failure. */
async function vitest(label, command, args, env = {}) {
  const report = join(reports, `${label.replace(/\W+/g, '-')}.json`);
  await counted(label, async () => {
    const { code, output } = await collect(command, args(report), { cwd: ROOT, env: { ...process.env, ...env } });
    const found = existsSync(report) ? JSON.parse(readFileSync(report, 'utf8')) : null;
    const failed = found?.numFailedTests ?? 0;
    return {
      passed: found?.numPassedTests ?? 0,
      failed: failed > 0 || code === 0 ? failed : 1,
      output: `${output}\n${failures(found)}`,
    };
  });
}

function failures(report) {
  const suites = report?.testResults ?? [];
  return suites
    .flatMap((suite) => [
      ...(suite.message ? [`${suite.name}: ${suite.message}`] : []),
      ...suite.assertionResults
        .filter((test) => test.status === 'failed')
        .map((test) => `${suite.name}: ${test.fullName}\n${test.failureMessages.join('\n')}`),
    ])
    .join('\n');
}

const STEP = {
  async lint() {
    await check('Lint (eslint)', bin('eslint'), ['.']);
    await check('Format (prettier)', bin('prettier'), ['--check', '--log-level=warn', '.']);
  },
  async types() {
    await check('Types of server, tests and shared code (tsc)', bin('tsc'), ['-p', 'tsconfig.node.json', '--noEmit']);
    await check('Types of the client and its templates (ngc)', bin('ngc'), ['-p', 'tsconfig.app.json', '--noEmit']);
  },
  unit: () =>
    vitest('Unit and property tests (vitest)', bin('vitest'), (report) => [
      ...['run', '--project', 'unit', '--reporter=default', '--reporter=json', `--outputFile.json=${report}`],
    ]),
  async api() {
    const url = await cluster.url('postgres');
    await vitest(
      'API tests on PostgreSQL (vitest)',
      bin('vitest'),
      (report) => ['run', '--project', 'api', '--reporter=default', '--reporter=json', `--outputFile.json=${report}`],
      { DATABASE_URL: url },
    );
  },
  build: () =>
    counted('Build', async () => {
      await build();
      return { passed: 1, failed: 0, output: '' };
    }),
  components: () =>
    vitest(
      'Component tests (ng test)',
      bin('ng'),
      (report) => ['test', '--watch=false', '--reporters=default', '--reporters=json', `--output-file=${report}`],
      { NG_CLI_ANALYTICS: 'false', CI: '1' },
    ),
  e2e: browserTests,
};

/** The built product with its demo, on a database of its own, driven in a real browser. */
async function browserTests() {
  const chromium = await ensureBrowser();
  if (!existsSync(join(ROOT, 'dist/heddle/server/server.mjs'))) await step('Building', build);
  await buildJobs();
  const port = await freePort();
  const env = environment(await cluster.url('heddle_e2e'), {
    PORT: String(port),
    APP_ORIGIN: `http://localhost:${port}`,
    SESSION_SECRET: randomSecret(),
    DEMO: '1',
    LOG_LEVEL: 'error',
  });
  await migrate(env);
  await seed(env);
  server = startServer(env);
  await step('Starting the product for the browser', () => untilReady(port, server));
  const report = join(reports, 'e2e.json');
  await counted('Browser tests (playwright)', async () => {
    const { code, output } = await collect(bin('playwright'), ['test', '--reporter=list,json'], {
      cwd: ROOT,
      env: {
        ...process.env,
        BASE_URL: `http://localhost:${port}`,
        CHROMIUM: chromium,
        PLAYWRIGHT_JSON_OUTPUT_NAME: report,
      },
    });
    const stats = existsSync(report) ? JSON.parse(readFileSync(report, 'utf8')).stats : null;
    const failed = (stats?.unexpected ?? 0) + (stats?.flaky ?? 0);
    return { passed: stats?.expected ?? 0, failed: failed > 0 || code === 0 ? failed : 1, output };
  });
  await end(server);
  server = null;
}

await main(async () => {
  checkNode();
  const unknown = only.filter((name) => !STEPS.includes(name));
  if (unknown.length > 0) throw new Stop(`There is no step "${unknown[0]}". Steps: ${STEPS.join(', ')}.`);
  mkdirSync(reports, { recursive: true });
  await ensurePackages();
  if (only.some((name) => name === 'api' || name === 'e2e'))
    cluster = await step('Starting a throw-away PostgreSQL cluster', throwAwayCluster);
  for (const name of STEPS) if (only.includes(name)) await STEP[name]();
});
await cleanUp();
if (process.exitCode) total.failed++;
console.log(`\n${total.passed} passed, ${total.failed} failed`);
process.exit(total.failed === 0 ? 0 : 1);
