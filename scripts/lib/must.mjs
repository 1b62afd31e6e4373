/** Commands that have to succeed. */
import { attempt, tail } from './run.mjs';
import { Stop } from './say.mjs';

/** Runs a command; where it fails, a sentence, followed by the end of what it said. */
export async function must(sentence, command, args, options) {
  const { code, output } = await attempt(command, args, options);
  if (code !== 0) throw new Stop(`${sentence}\n${tail(output)}`);
  return output;
}
