/** Puts the capabilities together: the one place that knows them all. */
import { randomBytes, randomUUID } from 'node:crypto';
import type { Logger } from 'pino';
import {
  accountsRoutes,
  checkPassword,
  findActor,
  findAssociation,
  insertAssociation,
  inviteFirstAdministrator,
} from './accounts';
import { applicationsRoutes } from './applications';
import { cyclesRoutes } from './cycles';
import { matchingRoutes, questionThread, reviveRuns, workRun } from './matching';
import { createMailTransport, messagesRoutes, startDelivery } from './messages';
import { keepDeadlines, pairingsRoutes } from './pairings';
import { createApi, type Api } from './platform/app';
import type { Context, Enqueue } from './platform/context';
import { openDatabase, type Database } from './platform/database';
import { missingQueues, startJobs, type Jobs } from './platform/jobs';
import { createLog } from './platform/log';
import { missingMigrations } from './platform/migrations';
import type { Route } from './platform/routes';
import type { Settings } from './platform/settings';
import { profilesRoutes } from './profiles';
import { tagsRoutes } from './tags';

export const ROUTES: readonly Route[] = [
  ...accountsRoutes,
  ...messagesRoutes,
  ...tagsRoutes,
  ...profilesRoutes,
  ...cyclesRoutes,
  ...applicationsRoutes,
  ...matchingRoutes,
  ...pairingsRoutes,
];

export interface Backend {
  api: Api;
  log: Logger;
  ssrSecret: string;
  database: Database;
  /** A context for work that no request asked for. */
  context(): Context;
  inviteFirstAdministrator(): Promise<string | null>;
  /** Answers "not ready" from now on, while running requests end. */
  beginStop(): void;
  stop(): Promise<void>;
}

export async function startBackend(settings: Settings): Promise<Backend> {
  const log = createLog(settings.logLevel);
  const database = await openDatabase({
    url: settings.databaseUrl,
    onError: (error) => log.warn({ err: error }, 'database connection lost'),
  });
  const works = settings.process !== 'web';
  const jobs = await startJobs(settings.databaseUrl, log, works);
  const context = contextFactory(database, settings, log, jobs.enqueue);
  await ensureAssociation(context());
  const stopWork = works ? await startWork(jobs, context, settings) : async () => undefined;
  const ssrSecret = randomBytes(32).toString('base64url');
  let stopping = false;
  const api = createApi({
    database,
    settings,
    log,
    enqueue: jobs.enqueue,
    door: {
      checkPassword: (email, password) => checkPassword(database.db, email, password),
      findActor: (personId) => findActor(database.db, personId),
    },
    routes: ROUTES,
    ssrSecret,
    notReady: async () => (stopping ? ['the server is stopping'] : notReady(database, settings)),
  });
  return {
    api,
    log,
    ssrSecret,
    database,
    context,
    inviteFirstAdministrator: () => inviteFirstAdministrator(context()),
    beginStop: () => void (stopping = true),
    async stop() {
      await stopWork();
      await jobs.stop();
      await questionThread(settings.root).end();
      await database.close();
    },
  };
}

const contextFactory =
  (database: Database, settings: Settings, log: Logger, enqueue: Enqueue): (() => Context) =>
  () => ({ db: database.db, actor: null, now: () => new Date(), requestId: randomUUID(), settings, log, enqueue });

/** Takes jobs, keeps the schedule and sends what is in the outbox, until stopped. */
async function startWork({ boss }: Jobs, context: () => Context, settings: Settings): Promise<() => Promise<void>> {
  const stopDelivery = startDelivery(context(), createMailTransport(settings));
  await boss.work<{ runId: string }>('matching-run', { pollingIntervalSeconds: 0.5 }, async ([job]) => {
    if (job) await workRun(context(), job.data.runId);
  });
  await boss.work('pairings-deadlines', () => keepDeadlines(context()));
  await boss.work('housekeeping', () => reviveRuns(context()));
  await boss.schedule('pairings-deadlines', '*/10 * * * *');
  await boss.schedule('housekeeping', '* * * * *');
  return stopDelivery;
}

async function notReady(database: Database, settings: Settings): Promise<string[]> {
  const missing = await missingMigrations(database.db, settings.root);
  if (missing > 0) return [`the database lacks ${missing} of the migrations`];
  return (await missingQueues(database.db)).map((queue) => `the job queue ${queue} is missing`);
}

// A new database has no association yet; the administrator names it later.
async function ensureAssociation(ctx: Context): Promise<void> {
  if (await findAssociation(ctx.db)) return;
  await insertAssociation(ctx.db, { name: 'Your association', timeZone: 'UTC', contactEmail: '' });
}
