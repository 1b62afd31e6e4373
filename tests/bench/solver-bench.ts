/**
 * The solver beside others, on seeded problems: medians of CPU seconds, how many times ours they take, and peak memory.
 * Times are told and never judged, since they depend on the machine; that all who finish agree on pairs and fit is judged.
 *
 *   npm run bench                  sizes 200, 500, 1000, 2000 and 5000; half an hour and more
 *   npm run bench -- --quick       small sizes, under a minute
 *   npm run bench -- --families=uniform,too-few-places --sizes=1000 --solvers=ours,scipy --limit=20
 */
import { spawnSync } from 'node:child_process';
import { mkdirSync, writeFileSync } from 'node:fs';
import { cpus } from 'node:os';
import { join } from 'node:path';
import { parseArgs } from 'node:util';
import { FAMILIES, type Family } from './families';

const SOLVERS = ['ours', 'munkres', 'linear-sum-assignment', 'munkres-algorithm', 'munkres-js', 'HiGHS', 'scipy'];
const QUESTIONS = ['verify', 'a row of prices', 'barring each pair', 'trade-off curve'];
const QUICK_FAMILIES = ['uniform', 'i-by-j', 'too-few-places'];
const SEED = 1;

interface Run {
  family: string;
  size: number;
  name: string;
  /** Median; null when it did not finish or does not take such problems. */
  seconds: number | null;
  megabytes: number | null;
  paired?: number | undefined;
  totalFit?: number | undefined;
  why?: string | undefined;
}

interface Answer {
  seconds: number[];
  megabytes: number;
  paired?: number;
  totalFit?: number;
  questions?: Record<string, number[]>;
}

const { values: options } = parseArgs({
  options: {
    quick: { type: 'boolean', default: false },
    families: { type: 'string' },
    sizes: { type: 'string' },
    solvers: { type: 'string' },
    limit: { type: 'string' },
  },
});
const asked = options.families?.split(',') ?? (options.quick ? QUICK_FAMILIES : FAMILIES.map(({ name }) => name));
const families = FAMILIES.filter(({ name }) => asked.includes(name));
const solvers = options.solvers?.split(',') ?? SOLVERS;
const limit = Number(options.limit ?? (options.quick ? 5 : 60));
/** Seconds of runs that are enough for a median. */
const budget = options.quick ? '0.05' : '0.3';
const sizesOf = ({ dense }: Family): number[] => {
  if (options.sizes) return options.sizes.split(',').map(Number);
  if (options.quick) return [dense ? 100 : 300];
  return dense ? [200, 500, 1000, 2000, 5000] : [1000, 2000, 5000, 20_000];
};

const runs: Run[] = [];
const faults: string[] = [];
/** Who did not finish a smaller problem of the family is not asked a larger one. */
const gaveUp = new Set<string>();
for (const family of families) {
  for (const size of sizesOf(family)) {
    console.error(`${family.name}, n = ${size}: ${family.about}`);
    const own = solvers.flatMap((name) => runOne(family, size, name));
    runs.push(...own, ...runOne(family, size, 'questions'));
    findFaults(own);
  }
}
printTable('CPU seconds, median (and times ours)', solvers, secondsCell);
printTable('Peak memory, MB', solvers, ({ megabytes }) => (megabytes === null ? '—' : megabytes.toFixed(0)));
printTable('What else is asked of a plan, CPU seconds', QUESTIONS, ({ seconds }) => shortSeconds(seconds));
store();
for (const fault of faults) console.error(fault);
process.exitCode = faults.length > 0 ? 1 : 0;

/** One run for a solver, and for the questions one each. */
function runOne(family: Family, size: number, name: string): Run[] {
  const run: Run = { family: family.name, size, name, seconds: null, megabytes: null };
  const key = `${family.name} ${name}`;
  if (gaveUp.has(key)) return [{ ...run, why: 'did not finish a smaller one' }];
  const child = spawnSync(
    process.execPath,
    ['--import', 'tsx', join(import.meta.dirname, 'run-one.ts'), name, family.name, String(size), String(SEED), budget],
    { encoding: 'utf8', timeout: limit * 1000, killSignal: 'SIGKILL' },
  );
  if (child.status !== 0) {
    gaveUp.add(key);
    const why = child.signal ? `not done in ${limit} s` : (child.stderr.match(/^.*Error: .*$/m)?.[0] ?? 'failed');
    return [{ ...run, why }];
  }
  const { questions, ...answer } = JSON.parse(child.stdout) as Answer;
  if (questions) {
    return Object.entries(questions).map(([question, seconds]) => ({
      ...run,
      name: question,
      seconds: median(seconds),
    }));
  }
  if (answer.seconds.length === 0) return [{ ...run, why: 'not asked' }];
  return [{ ...run, ...answer, seconds: median(answer.seconds) }];
}

function median(values: readonly number[]): number {
  const sorted = [...values].sort((a, b) => a - b);
  return (sorted[(sorted.length - 1) >> 1]! + sorted[sorted.length >> 1]!) / 2;
}

/** All who finished must have found the same number of pairs and the same fit. */
function findFaults(own: readonly Run[]): void {
  const finished = own.filter(({ paired }) => paired !== undefined);
  const [first] = finished;
  for (const other of finished) {
    if (other.paired === first!.paired && other.totalFit === first!.totalFit) continue;
    const found = (run: Run): string => `${run.name} finds ${run.paired} pairs of fit ${run.totalFit}`;
    faults.push(`${other.family} ${other.size}: ${found(first!)}, ${found(other)}`);
  }
}

function secondsCell(run: Run, ours: Run | undefined): string {
  if (run.seconds === null || !ours?.seconds || run === ours) return shortSeconds(run.seconds);
  return `${shortSeconds(run.seconds)} (${Number((run.seconds / ours.seconds).toPrecision(2))}×)`;
}

function shortSeconds(seconds: number | null): string {
  return seconds === null ? '—' : seconds.toPrecision(2);
}

function printTable(title: string, names: readonly string[], cell: (run: Run, ours: Run | undefined) => string): void {
  console.log(`\n${title}\n\n| family | n | ${names.join(' | ')} |\n|---|---|${'---|'.repeat(names.length)}`);
  for (const key of new Set(runs.map(({ family, size }) => `${family} | ${size}`))) {
    const row = runs.filter(({ family, size }) => `${family} | ${size}` === key);
    const ours = row.find(({ name }) => name === 'ours');
    const cells = names.map((name) => {
      const run = row.find((one) => one.name === name);
      return run ? cell(run, ours) : '—';
    });
    console.log(`| ${key} | ${cells.join(' | ')} |`);
  }
}

function store(): void {
  const folder = join(import.meta.dirname, '..', '..', 'bench-results');
  mkdirSync(folder, { recursive: true });
  const machine = { node: process.version, processor: cpus()[0]?.model, processors: cpus().length };
  const file = join(folder, `solver-${options.quick ? 'quick' : 'full'}.json`);
  writeFileSync(file, `${JSON.stringify({ seed: SEED, limit, machine, runs }, null, 2)}\n`);
  console.log('\nStored in bench-results.');
}
