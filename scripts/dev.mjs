/** `npm run dev`: the same preparation, then a server that rebuilds as files change. */
import { spawn } from 'node:child_process';
import { bin, buildJobs, ensurePackages, ROOT } from './lib/project.mjs';
import { end, interrupted, interruption } from './lib/run.mjs';
import { atEnd, checkNode, main, step, Stop } from './lib/say.mjs';
import { chooseDatabase, choosePort, environment, migrate, seedOwn } from './lib/serve.mjs';

await main(async () => {
  await step(`Node.js ${process.versions.node}`, checkNode);
  const port = await choosePort();
  await ensurePackages();
  const database = await chooseDatabase();
  await step('Building the background jobs', buildJobs);
  const demo = database.own ? { DEMO: '1' } : {};
  const env = environment(database.url, { PORT: String(port), NODE_ENV: 'development', ...demo });
  await migrate(env);
  if (database.own) await seedOwn(env);
  const server = spawn(bin('ng'), ['serve', '--port', String(port), '--host', '127.0.0.1'], {
    env: { ...env, NG_CLI_ANALYTICS: 'false' },
    cwd: ROOT,
    stdio: 'inherit',
  });
  atEnd(() => end(server));
  await Promise.race([interruption, new Promise((resolve) => server.once('exit', resolve))]);
  if (!interrupted()) throw new Stop('ng serve has ended by itself; what it said stands above.');
});
