/** `npm run worker`: a process for jobs and messages alone, beside one or more that serve. */
import { ensureBuild, ensurePackages } from './lib/project.mjs';
import { end } from './lib/run.mjs';
import { checkNode, main, Stop } from './lib/say.mjs';
import { chooseDatabase, environment, migrate, startServer } from './lib/serve.mjs';

await main(async () => {
  checkNode();
  await ensurePackages();
  await ensureBuild();
  const database = await chooseDatabase();
  const env = environment(database.url, { HEDDLE_PROCESS: 'worker' });
  await migrate(env);
  const worker = startServer(env);
  console.log('The worker takes jobs and sends messages. Stop with Ctrl-C.');
  const interrupted = new Promise((resolve) => {
    for (const signal of ['SIGINT', 'SIGTERM']) process.on(signal, () => resolve(true));
  });
  const ended = new Promise((resolve) => worker.once('exit', () => resolve(false)));
  if (!(await Promise.race([interrupted, ended])))
    throw new Stop('The worker has ended by itself; what it said stands above.');
  await end(worker);
});
process.exit();
