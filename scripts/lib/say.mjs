/** What the scripts say: a line a step with the time it took, and one sentence when something is missing. */

/** Something that a person has to do; its message is the whole sentence. */
export class Stop extends Error {}

const seconds = (since) => `${((performance.now() - since) / 1000).toFixed(1)} s`;

/** Does one step and prints what it was and how long it took. */
export async function step(label, work) {
  const since = performance.now();
  process.stdout.write(`· ${label} … `);
  try {
    const result = await work();
    const note = typeof result === 'string' ? ` (${result})` : '';
    console.log(`done in ${seconds(since)}${note}`);
    return result;
  } catch (error) {
    console.log(`failed after ${seconds(since)}`);
    throw error;
  }
}

/** Runs a script to its end; a Stop is said in one sentence, anything else with its trace. */
export async function main(work) {
  try {
    await work();
  } catch (error) {
    console.error(error instanceof Stop ? `\n${error.message}` : error);
    process.exitCode = 1;
  }
}

/** Refuses versions of Node that the packages do not run on. */
export function checkNode() {
  const [major = 0, minor = 0] = process.versions.node.split('.').map(Number);
  if ((major === 20 && minor >= 19) || (major === 22 && minor >= 12) || major > 22) return;
  throw new Stop(`Node.js ${process.versions.node} is too old: install Node.js 20.19 or later, then run this again.`);
}
