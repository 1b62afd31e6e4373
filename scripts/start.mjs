/** `npm start`: from a clean clone to the running product with its demo association. */
import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import { ensureBuild, ensurePackages, ROOT } from './lib/project.mjs';
import { checkNode, main, step } from './lib/say.mjs';
import {
  chooseDatabase,
  choosePort,
  environment,
  migrate,
  seedOwn,
  startServer,
  untilReady,
  untilStopped,
} from './lib/serve.mjs';

await main(async () => {
  await step(`Node.js ${process.versions.node}`, checkNode);
  const port = await choosePort();
  await ensurePackages();
  const database = await chooseDatabase();
  await ensureBuild();
  const env = environment(database.url, { PORT: String(port), ...(database.own ? { DEMO: '1' } : {}) });
  await migrate(env);
  if (database.own) await seedOwn(env);
  const server = startServer(env);
  await step('Starting the server', () => untilReady(server));
  server.show();
  greet(port, database.own);
  await untilStopped(server);
});

function greet(port, demo) {
  console.log(`\nHeddle is ready: ${process.env.APP_ORIGIN || `http://localhost:${port}`}\n`);
  if (demo) {
    const signIns = JSON.parse(readFileSync(join(ROOT, 'drizzle/seed/demo-sign-ins.json'), 'utf8'));
    console.log('Demo sign-ins (Ellmark Institute of Surveyors, invented):');
    for (const { role, email, password } of signIns)
      console.log(`  ${role.padEnd(14)} ${email.padEnd(42)} ${password}`);
    console.log('\nE-mail stays here: the administrator reads it under Messages.');
  }
  console.log('Stop with Ctrl-C.');
}
