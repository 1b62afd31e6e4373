/** Runs test runners and sums what they counted. */
import { existsSync, mkdtempSync, readFileSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { ROOT } from './project.mjs';
import { attempt, Interrupted, interrupted } from './run.mjs';
import { atEnd, since } from './say.mjs';

export const total = { passed: 0, failed: 0 };

const reports = mkdtempSync(join(tmpdir(), 'heddle-reports-'));
atEnd(() => rmSync(reports, { recursive: true, force: true }));

/** Runs one step and adds its counts; what it said is shown only where something failed. */
export async function counted(label, work) {
  if (interrupted()) throw new Interrupted();
  const start = performance.now();
  process.stdout.write(`· ${label} … `);
  const { passed, failed, output } = await work().catch((error) => {
    if (error instanceof Interrupted) throw error;
    return { passed: 0, failed: 1, output: String(error.message) };
  });
  total.passed += passed;
  total.failed += failed;
  console.log(`${passed} passed, ${failed} failed in ${since(start)}`);
  if (failed > 0) console.log(output);
}

/** Commands that hold or fail together, as one test. */
export const check = (label, ...commands) =>
  counted(label, async () => {
    const outputs = [];
    for (const [command, ...args] of commands) {
      const { code, output } = await attempt(command, args, { cwd: ROOT });
      if (code !== 0) outputs.push(output);
    }
    return { passed: outputs.length ? 0 : 1, failed: outputs.length ? 1 : 0, output: outputs.join('\n') };
  });

/** Runs a runner that writes a JSON report, which `read` counts. A bad end without a failed test is a failure of its own. */
function reported(label, command, args, env, read) {
  return counted(label, async () => {
    const path = join(reports, `${label.replace(/\W+/g, '-')}.json`);
    const { code, output } = await attempt(command, args(path), { cwd: ROOT, env: { ...process.env, ...env(path) } });
    const { passed, failed, details } = read(existsSync(path) ? JSON.parse(readFileSync(path, 'utf8')) : {});
    return { passed, failed: failed === 0 && code !== 0 ? 1 : failed, output: `${output}\n${details}` };
  });
}

/** A runner that writes vitest's report. */
export const vitest = (label, command, args, env = {}) =>
  reported(
    label,
    command,
    args,
    () => env,
    ({ numPassedTests = 0, numFailedTests = 0, testResults = [] }) => {
      // A file that could not even be loaded has failed without a test to say so.
      const broken = testResults.filter((file) => file.status === 'failed' && !file.assertionResults.some(hasFailed));
      return { passed: numPassedTests, failed: numFailedTests + broken.length, details: failures(testResults) };
    },
  );

const hasFailed = (test) => test.status === 'failed';

const failures = (files) =>
  files
    .flatMap(({ name, message, assertionResults }) => [
      ...(message ? [`${name}: ${message}`] : []),
      ...assertionResults
        .filter(hasFailed)
        .map(({ fullName, failureMessages }) => `${name}: ${fullName}\n${failureMessages.join('\n')}`),
    ])
    .join('\n');

/** Playwright; a test that passes only at a second try has failed. */
export const playwright = (label, command, args, env) =>
  reported(
    label,
    command,
    () => args,
    (path) => ({ ...env, PLAYWRIGHT_JSON_OUTPUT_NAME: path }),
    ({ stats = {}, errors = [] }) => ({
      passed: stats.expected ?? 0,
      failed: (stats.unexpected ?? 0) + (stats.flaky ?? 0),
      details: errors.map(({ message }) => message).join('\n'),
    }),
  );
