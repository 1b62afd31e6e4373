import { spawnSync } from 'node:child_process';
import { mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { createRequire } from 'node:module';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { pairBound, solve, type PairingProblem } from '../../shared/assignment';

/** What a solver made of a problem: pairs, their fit, and the CPU seconds of each run. */
export interface Outcome {
  paired: number;
  totalFit: number;
  seconds: number[];
}

export interface Solver {
  name: string;
  /** Whether it is asked at all; some need a table, some a problem small enough. */
  takes(problem: PairingProblem): boolean;
  /** Solves until `enough` says so; building what the solver needs is not counted. */
  run(problem: PairingProblem, enough: (seconds: readonly number[]) => boolean): Promise<Outcome>;
}

type Choice = { mentorOf: ArrayLike<number | null> };

const MOST_CELLS = 4_000_000;
const MOST_PAIRS_OF_A_PROGRAMME = 60_000;

export async function solvers(): Promise<Solver[]> {
  const require = createRequire(import.meta.url);
  const { linearSumAssignment } = await import('linear-sum-assignment');
  const { munkres } = await import('munkres');
  // these two ship no types that can be resolved
  const munkresJs = require('munkres-js') as (cost: number[][]) => [number, number][];
  const { maxWeightAssign } = require('munkres-algorithm') as {
    maxWeightAssign(weights: number[][]): { assignments: (number | null)[] };
  };
  return [
    { name: 'ours', takes: () => true, run: (problem, enough) => timed(problem, enough, () => solve(problem)) },
    ofTable('munkres', (worth) => pairsToChoice(munkres(negated(worth)), worth.length)),
    ofTable('linear-sum-assignment', (worth) => ({
      mentorOf: linearSumAssignment(worth, { maximaze: true }).rowAssignments,
    })),
    ofTable('munkres-algorithm', (worth) => ({ mentorOf: maxWeightAssign(worth).assignments })),
    ofTable('munkres-js', (worth) => pairsToChoice(munkresJs(negated(worth)), worth.length)),
    { name: 'HiGHS', takes: (problem) => problem.target.length <= MOST_PAIRS_OF_A_PROGRAMME, run: runHighs },
    { name: 'scipy', takes: () => true, run: runScipy },
  ];
}

function cpuSeconds(): number {
  const { user, system } = process.cpuUsage();
  return (user + system) / 1e6;
}

async function timed(
  problem: PairingProblem,
  enough: (seconds: readonly number[]) => boolean,
  once: () => Choice,
): Promise<Outcome> {
  const seconds: number[] = [];
  let choice: Choice;
  do {
    const start = cpuSeconds();
    choice = once();
    seconds.push(cpuSeconds() - start);
  } while (!enough(seconds));
  return { ...valueOf(problem, choice), seconds };
}

/** Counts the pairs that are eligible, since a table has cells for all others too. */
function valueOf(problem: PairingProblem, { mentorOf }: Choice): { paired: number; totalFit: number } {
  let paired = 0;
  let totalFit = 0;
  for (let mentee = 0; mentee < problem.menteeCount; mentee++) {
    const row = problem.target.subarray(problem.rowStart[mentee], problem.rowStart[mentee + 1]);
    const at = row.indexOf(mentorOf[mentee] ?? -1);
    if (at < 0) continue;
    paired++;
    totalFit += problem.fit[problem.rowStart[mentee]! + at]!;
  }
  return { paired, totalFit };
}

/** A solver that takes a table: one column for each place, and pairs worth more than all fits together. */
function ofTable(name: string, solveTable: (worth: number[][]) => Choice): Solver {
  return {
    name,
    takes: (problem) => problem.menteeCount * placesOf(problem).length <= MOST_CELLS,
    run: (problem, enough) => {
      const places = placesOf(problem);
      const worth = tableOf(problem, places);
      return timed(problem, enough, () => {
        const { mentorOf } = solveTable(worth);
        return { mentorOf: Array.from(mentorOf, (place) => places[place ?? -1] ?? null) };
      });
    },
  };
}

/** The mentor of each place. */
function placesOf(problem: PairingProblem): number[] {
  return [...problem.capacity].flatMap((capacity, mentor) => new Array<number>(capacity).fill(mentor));
}

function tableOf(problem: PairingProblem, places: readonly number[]): number[][] {
  const pairsFirst = (pairBound(problem) + 1) * (largestFit(problem) + 1);
  return Array.from({ length: problem.menteeCount }, (_, mentee) => {
    const byMentor = new Float64Array(problem.mentorCount);
    for (let edge = problem.rowStart[mentee]!; edge < problem.rowStart[mentee + 1]!; edge++) {
      byMentor[problem.target[edge]!] = pairsFirst + problem.fit[edge]!;
    }
    return places.map((mentor) => byMentor[mentor]!);
  });
}

function largestFit(problem: PairingProblem): number {
  return problem.fit.reduce((largest, fit) => Math.max(largest, fit), 0);
}

function negated(worth: number[][]): number[][] {
  const top = worth.reduce((most, row) => row.reduce((a, b) => Math.max(a, b), most), 0);
  return worth.map((row) => row.map((value) => top - value));
}

function pairsToChoice(pairs: readonly (readonly [number, number])[], length: number): Choice {
  const mentorOf = new Array<number | null>(length).fill(null);
  for (const [mentee, place] of pairs) mentorOf[mentee] = place;
  return { mentorOf };
}

/** As a linear programme: first the most pairs, then the greatest fit of so many. Reading the text is part of the time. */
async function runHighs(problem: PairingProblem, enough: (seconds: readonly number[]) => boolean): Promise<Outcome> {
  const { default: load } = await import('highs');
  const highs = await load();
  const mentees: string[][] = Array.from({ length: problem.menteeCount }, () => []);
  const mentors: string[][] = Array.from({ length: problem.mentorCount }, () => []);
  const names = Array.from(problem.target, (mentor, edge) => {
    mentors[mentor]!.push(`x${edge}`);
    return `x${edge}`;
  });
  mentees.forEach((own, mentee) => own.push(...names.slice(problem.rowStart[mentee], problem.rowStart[mentee + 1])));
  const sum = (own: readonly string[]): string => own.join(' + ');
  const rows = [
    ...mentees.filter((own) => own.length > 0).map((own) => `${sum(own)} <= 1`),
    ...mentors.flatMap((own, mentor) => (own.length > 0 ? [`${sum(own)} <= ${problem.capacity[mentor]}`] : [])),
  ];
  const best = (objective: string, more: string[]): number => {
    const answer = highs.solve(`Maximize\n o: ${objective}\nSubject To\n ${[...rows, ...more].join('\n ')}\nEnd`);
    return Math.round(answer.ObjectiveValue);
  };
  const fits = names.map((name, edge) => `${problem.fit[edge]} ${name}`);
  const seconds: number[] = [];
  let value: { paired: number; totalFit: number };
  do {
    const start = cpuSeconds();
    const paired = best(sum(names), []);
    value = { paired, totalFit: best(sum(fits), [`${sum(names)} = ${paired}`]) };
    seconds.push(cpuSeconds() - start);
  } while (!enough(seconds));
  return { ...value, seconds };
}

/** In Python, timed there; the problem goes over as a file. Fails where Python or scipy is missing. */
async function runScipy(problem: PairingProblem, _enough: unknown): Promise<Outcome> {
  const folder = mkdtempSync(join(tmpdir(), 'bench-'));
  try {
    const header = Int32Array.of(problem.menteeCount, problem.mentorCount, problem.target.length);
    const parts = [header, problem.capacity, problem.rowStart, problem.target, problem.fit];
    const file = join(folder, 'problem.bin');
    writeFileSync(file, Buffer.concat(parts.map((part) => Buffer.from(part.buffer, part.byteOffset, part.byteLength))));
    const script = join(import.meta.dirname, 'scipy_solver.py');
    const answer = spawnSync('python3', [script, file], { encoding: 'utf8' });
    if (answer.status !== 0) throw new Error(answer.error?.message ?? answer.stderr.trim().split('\n').at(-1));
    return JSON.parse(answer.stdout) as Outcome;
  } finally {
    rmSync(folder, { recursive: true });
  }
}
