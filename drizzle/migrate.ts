/** `node dist/jobs/migrate.mjs`: brings DATABASE_URL to the version of the code. */
import { migrateDatabase } from '../src/server/platform/migrations';

const url = process.env['DATABASE_URL'];
if (!url) {
  console.error('DATABASE_URL is not set; it names the database to migrate.');
  process.exit(1);
}
await migrateDatabase(url, process.env['APP_ROOT'] ?? process.cwd());
