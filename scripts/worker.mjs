/** `npm run worker`: a process for jobs and messages alone, beside one or more that serve. */
import { ensureBuild, ensurePackages } from './lib/project.mjs';
import { checkNode, main, step } from './lib/say.mjs';
import { chooseDatabase, environment, migrate, startServer, untilStopped } from './lib/serve.mjs';

await main(async () => {
  await step(`Node.js ${process.versions.node}`, checkNode);
  await ensurePackages();
  const database = await chooseDatabase();
  await ensureBuild();
  const env = environment(database.url, { HEDDLE_PROCESS: 'worker', ...(database.own ? { DEMO: '1' } : {}) });
  await migrate(env);
  const worker = startServer(env);
  worker.show();
  console.log('\nThe worker takes jobs and sends messages. Stop with Ctrl-C.');
  await untilStopped(worker);
});
