/** `npm run db:migrate`, `db:seed [-- --size large]`, `db:reset`: work on the database of DATABASE_URL or of the project. */
import { othersOnCluster } from './lib/claims.mjs';
import { buildJobs, ensurePackages } from './lib/project.mjs';
import { checkNode, main, step, Stop } from './lib/say.mjs';
import { chooseDatabase, emptyDatabase, environment, migrate, seed, seedOwn } from './lib/serve.mjs';

await main(async () => {
  const [deed, ...args] = process.argv.slice(2);
  if (!['migrate', 'seed', 'reset'].includes(deed ?? ''))
    throw new Stop('Say what to do: node scripts/database.mjs migrate, seed or reset.');
  checkNode();
  if (deed === 'reset' && process.env.DATABASE_URL)
    throw new Stop('Only the project’s own database is emptied by this; yours (DATABASE_URL) stays as it is.');
  if (deed === 'reset' && othersOnCluster().length > 0)
    throw new Stop('The product runs on this database. Stop it first (Ctrl-C), then run this again.');
  await ensurePackages();
  const database = await chooseDatabase();
  await step('Building the background jobs', buildJobs);
  if (deed === 'reset') await step('Emptying the database', () => emptyDatabase(database.url));
  const env = environment(database.url, { DEMO: '1' });
  await migrate(env);
  if (deed !== 'migrate') await (database.own ? seedOwn : seed)(env, args);
});
