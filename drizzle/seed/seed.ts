/**
 * `node dist/jobs/seed.mjs [--size large]`: fills an empty database with the demo association, through the product's own verbs.
 * A database that has people in it is left as it is.
 */
import { parseArgs } from 'node:util';
import { findAssociation, insertAssociation, searchPeople } from '../../src/server/accounts';
import { questionThread } from '../../src/server/matching';
import type { Actor, Context } from '../../src/server/platform';
import { openDatabase } from '../../src/server/platform/database';
import { createLog } from '../../src/server/platform/log';
import { readSettings } from '../../src/server/platform/settings';
import { at, instantOf, todayThere } from './clock';
import { seedCycle } from './cycle';
import { DEMO_SEED, demoAssociation, largeAssociation, type DemoAssociation } from './data';
import { seedPeople, seedTags } from './people';

const LARGE = { mentees: 5000, mentors: 3000 };
const COORDINATOR = 'oona.rask@ellmark.example';

const { values } = parseArgs({ options: { size: { type: 'string', default: 'demo' } } });
if (!['demo', 'large'].includes(values.size)) {
  console.error('Sizes are demo and large.');
  process.exit(1);
}

const settings = readSettings(process.env);
const database = await openDatabase({ url: settings.databaseUrl });
const ctx: Context = {
  db: database.db,
  actor: null,
  now: () => new Date(),
  requestId: 'seed',
  settings,
  log: createLog('warn'),
  // Runs are worked out right here; nothing waits for a worker.
  enqueue: () => Promise.resolve(),
};

try {
  console.log(await fill(values.size === 'large'));
} finally {
  await questionThread(settings.root).end();
  await database.close();
}

async function fill(large: boolean): Promise<string> {
  const [somebody] = await searchPeople(ctx.db, '', 1);
  if (somebody) return 'there are people already; nothing was changed';
  const today = todayThere();
  const data = large ? largeAssociation(DEMO_SEED, LARGE, today) : demoAssociation(DEMO_SEED, today);
  await seedAssociation(data);
  const founding = at(ctx, instantOf(data.cycles[0]!.draft.applicationsOpenOn, 7));
  const tags = await seedTags(founding, data.tags);
  const people = await seedPeople(founding, data.people, tags);
  const coordinator: Actor = { personId: people.get(COORDINATOR)!, name: 'Oona Rask', roles: ['coordinator'] };
  for (const cycle of data.cycles) await seedCycle({ ctx, coordinator, people }, cycle);
  return `${data.people.length} people, ${data.cycles.length} ${data.cycles.length === 1 ? 'cycle' : 'cycles'}`;
}

async function seedAssociation({ towns }: DemoAssociation): Promise<void> {
  if (await findAssociation(ctx.db)) return;
  await insertAssociation(ctx.db, {
    name: 'Ellmark Institute of Surveyors',
    timeZone: 'Europe/Copenhagen',
    contactEmail: 'mentoring@ellmark.example',
    gazetteer: Object.fromEntries(
      towns.map(({ name, region, latitude, longitude }) => [name, { region, latitude, longitude }]),
    ),
  });
}
