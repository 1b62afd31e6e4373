/** `npm run db:migrate`, `db:seed [-- --size large]`, `db:reset`: work on the database of DATABASE_URL or of the project. */
import { buildJobs, ensurePackages } from './lib/project.mjs';
import { checkNode, main, step, Stop } from './lib/say.mjs';
import { chooseDatabase, claimStart, environment, migrate, releaseStart, seed } from './lib/serve.mjs';

let release = async () => undefined;

await main(async () => {
  const [deed, ...args] = process.argv.slice(2);
  if (!['migrate', 'seed', 'reset'].includes(deed ?? ''))
    throw new Stop('Say what to do: node scripts/database.mjs migrate, seed or reset.');
  checkNode();
  await ensurePackages();
  await step('Building the background jobs', () => buildJobs().then(() => undefined));
  const database = await chooseDatabase();
  const owns = database.own && (await claimStart());
  release = async () => {
    if (!owns) return;
    await database.stop();
    releaseStart();
  };
  if (deed === 'reset') {
    if (!database.own)
      throw new Stop('Only the project’s own database is emptied by this; yours (DATABASE_URL) stays.');
    await step('Emptying the database', () => emptyDatabase(database.url));
  }
  const env = environment(database.url, { DEMO: '1' });
  await migrate(env);
  if (deed !== 'migrate') await seed(env, args);
});
await release();
process.exit();

async function emptyDatabase(url) {
  const { default: pg } = await import('pg');
  const client = new pg.Client({ connectionString: url });
  await client.connect();
  await client.query(
    'drop schema if exists public, drizzle, pgboss cascade; create schema public; grant usage on schema public to public',
  );
  await client.end();
}
