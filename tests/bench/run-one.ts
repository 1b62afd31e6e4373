/**
 * One solver on one problem in a process of its own, so that its peak memory can be told and its time can be limited.
 * Prints one line of JSON. Arguments: a solver or `questions`, family, size, seed, and the
 * seconds of runs that are enough.
 */
import {
  priceOfBarring,
  pricesOfPartners,
  solve,
  tradeOff,
  verify,
  type PairingProblem,
} from '../../shared/assignment';
import { FAMILIES } from './families';
import { solvers } from './solvers';

const [name = '', familyName = '', size = '', seed = '', seconds = '0.3'] = process.argv.slice(2);
const budget = Number(seconds);

/** Several runs, so that the median is one of compiled code, but not more than time allows. */
const enough = (seconds: readonly number[]): boolean => {
  const total = sum(seconds);
  return total > 7 * budget || seconds.length >= 50 || (seconds.length >= 5 && total > budget);
};

const WARM_UP_SIZE = 100;
/** What is compiled at first use is not counted, as it is not in a server that has run for a while. */
const isWarm = (seconds: readonly number[]): boolean => sum(seconds) > budget;

const family = FAMILIES.find((one) => one.name === familyName);
if (!family) throw new Error(`no family ${familyName}`);
const problem = family.make(Number(size), Number(seed));
if (name === 'questions') print({ questions: answerQuestions(problem) });
else {
  const solver = (await solvers()).find((one) => one.name === name);
  if (!solver) throw new Error(`no solver ${name}`);
  await solver.run(family.make(WARM_UP_SIZE, Number(seed)), isWarm);
  print(solver.takes(problem) ? await solver.run(problem, enough) : { seconds: [] });
}

/** Seconds of each run of what else is asked of a plan. */
function answerQuestions(problem: PairingProblem): Record<string, number[]> {
  const plan = solve(problem);
  return {
    verify: secondsOf(() => verify(problem, plan)),
    'a row of prices': secondsOf(() => pricesOfPartners(problem, plan, 0)),
    'barring each pair': secondsOf(() => priceOfBarring(problem, plan)),
    'trade-off curve': secondsOf(() => tradeOff(problem)),
  };
}

function sum(values: readonly number[]): number {
  return values.reduce((total, value) => total + value, 0);
}

function secondsOf(once: () => unknown): number[] {
  const seconds: number[] = [];
  do {
    const start = process.cpuUsage();
    once();
    const { user, system } = process.cpuUsage(start);
    seconds.push((user + system) / 1e6);
  } while (!enough(seconds));
  return seconds;
}

/** With the most memory this process has held, unless the answer brings its own. */
function print(answer: object): void {
  console.log(JSON.stringify({ megabytes: process.resourceUsage().maxRSS / 1024, ...answer }));
}
