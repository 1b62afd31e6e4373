/** What the scripts say: a line a step with the time it took, and one sentence when something is missing. */
import { readFileSync } from 'node:fs';
import { endChildren, Interrupted, interrupted } from './run.mjs';

/** Something that a person has to do; its message is the whole sentence. */
export class Stop extends Error {}

// A reader that has gone away (a closed terminal, `| head`) is no reason to leave PostgreSQL behind.
for (const stream of [process.stdout, process.stderr]) stream.on('error', () => undefined);

export const since = (start) => `${((performance.now() - start) / 1000).toFixed(1)} s`;

/** Does one step and prints what it was, how long it took and, where the step says one, a note. */
export async function step(label, work) {
  if (interrupted()) throw new Interrupted();
  return ending(label, work);
}

/** The same for what is done while the script ends, whoever asked for that. */
export async function ending(label, work) {
  const start = performance.now();
  process.stdout.write(`· ${label} … `);
  try {
    const result = await work();
    console.log(`done in ${since(start)}${typeof result === 'string' ? ` (${result})` : ''}`);
    return result;
  } catch (error) {
    console.log(`${error instanceof Interrupted ? 'interrupted' : 'failed'} after ${since(start)}`);
    throw error;
  }
}

const endings = [];
/** Has something done when the script ends, however it ends; what was begun last is ended first. */
export const atEnd = (work) => void endings.unshift(work);

/** Runs a script to its end and leaves; a Stop is said in its sentence, anything else with its trace. */
export async function main(work, farewell = () => undefined) {
  try {
    await work();
  } catch (error) {
    process.exitCode = error instanceof Interrupted ? 130 : 1;
    console.error(sentenceOf(error));
  }
  await endChildren();
  for (const last of endings) {
    await Promise.resolve(last()).catch((error) => {
      process.exitCode = 1;
      console.error(sentenceOf(error));
    });
  }
  farewell();
  process.exit();
}

function sentenceOf(error) {
  if (error instanceof Interrupted) return '\nStopped.';
  if (error instanceof Stop) return `\n${error.message}`;
  if (error.code === 'EACCES' || error.code === 'EPERM')
    return `\n${error.path ?? 'A file of the project'} cannot be written: it or its folder belongs to another user, perhaps from a start as root. Start as that user, or hand the project’s folder over with chown.`;
  if (error.code === 'ENOSPC') return '\nThe disk is full. Free some space, then run this again.';
  return error;
}

const numbers = (version) => version.split('.').map(Number);

function compare(one, other) {
  const [left, right] = [numbers(one), numbers(other)];
  for (const place of [0, 1, 2])
    if ((left[place] ?? 0) !== (right[place] ?? 0)) return left[place] - (right[place] ?? 0);
  return 0;
}

/** Whether a version lies in a range made of `>=a` and `<b`, with `||` between alternatives. */
function within(version, range) {
  const holds = (bound) =>
    bound.startsWith('>=') ? compare(version, bound.slice(2)) >= 0 : compare(version, bound.slice(1)) < 0;
  return range.split('||').some((alternative) => alternative.trim().split(/\s+/).every(holds));
}

/** Refuses versions of Node that the packages do not run on. */
export function checkNode() {
  const { engines } = JSON.parse(readFileSync(new URL('../../package.json', import.meta.url), 'utf8'));
  const version = process.versions.node;
  if (!within(version, engines.node))
    throw new Stop(`Node.js ${version} does not run this: install a version in ${engines.node}, then run this again.`);
}
