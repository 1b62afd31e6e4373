/** `npm run dev`: the same preparation, then a server that rebuilds as files change. */
import { spawn } from 'node:child_process';
import { bin, buildJobs, ensurePackages, ROOT } from './lib/project.mjs';
import { end } from './lib/run.mjs';
import { checkNode, main, step } from './lib/say.mjs';
import {
  checkPort,
  chooseDatabase,
  claimStart,
  environment,
  migrate,
  portWished,
  releaseStart,
  seed,
} from './lib/serve.mjs';

let release = async () => undefined;
const interrupted = new Promise((resolve) => {
  for (const signal of ['SIGINT', 'SIGTERM']) process.on(signal, () => resolve());
});

await main(async () => {
  checkNode();
  const port = portWished();
  await checkPort(port);
  await ensurePackages();
  await step('Building the background jobs', () => buildJobs().then(() => undefined));
  const database = await chooseDatabase();
  const owns = database.own && (await claimStart());
  release = async () => {
    if (!owns) return;
    await database.stop();
    releaseStart();
  };
  const env = environment(database.url, { NODE_ENV: 'development', ...(database.own ? { DEMO: '1' } : {}) });
  await migrate(env);
  if (database.own) await seed(env);
  const server = spawn(bin('ng'), ['serve', '--port', String(port), '--host', '127.0.0.1'], {
    env: { ...env, NG_CLI_ANALYTICS: 'false' },
    cwd: ROOT,
    stdio: 'inherit',
  });
  await Promise.race([interrupted, new Promise((resolve) => server.once('exit', resolve))]);
  await end(server);
});
await release();
process.exit();
