/** `npm start`: from a clean clone to the running product with its demo association. */
import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import { ensureBuild, ensurePackages, ROOT } from './lib/project.mjs';
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
  startServer,
  untilReady,
} from './lib/serve.mjs';

let stopping = false;
let release = async () => undefined;
const interrupted = new Promise((resolve) => {
  for (const signal of ['SIGINT', 'SIGTERM', 'SIGHUP']) process.on(signal, () => resolve((stopping = true)));
});

await main(async () => {
  checkNode();
  const port = portWished();
  await checkPort(port);
  await ensurePackages();
  await ensureBuild();
  const database = await chooseDatabase();
  const owns = database.own && (await claimStart());
  release = async () => {
    if (!owns) return;
    await database.stop();
    releaseStart();
  };
  const env = environment(database.url, database.own ? { DEMO: '1' } : {});
  await migrate(env);
  if (database.own) await seed(env);
  if (stopping) return;
  const server = startServer(env);
  const ended = new Promise((resolve) => server.once('exit', resolve));
  await Promise.race([step('Starting the server', () => untilReady(port, server)), interrupted]);
  if (!stopping) greet(port, database.own);
  await Promise.race([interrupted, ended]);
  if (!stopping) {
    console.error('\nThe server has ended by itself; what it said stands above.');
    process.exitCode = 1;
  }
  console.log('\nStopping the server and PostgreSQL …');
  await end(server);
});
await release();
process.exit();

function greet(port, demo) {
  console.log(`\nHeddle is ready: http://localhost:${port}\n`);
  if (!demo) return;
  const signIns = JSON.parse(readFileSync(join(ROOT, 'drizzle/seed/demo-sign-ins.json'), 'utf8'));
  console.log('Demo sign-ins (Ellmark Institute of Surveyors, invented):');
  for (const { role, email, password } of signIns) console.log(`  ${role.padEnd(14)} ${email.padEnd(42)} ${password}`);
  console.log('\nE-mail stays here: the administrator reads it under Messages. Stop with Ctrl-C.');
}
