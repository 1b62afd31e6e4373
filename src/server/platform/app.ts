/** The API as an Express router: one pipeline for every route of the table. */
import { randomUUID, timingSafeEqual } from 'node:crypto';
import express, { type ErrorRequestHandler, type NextFunction, type Request, type Response, Router } from 'express';
import type { Logger } from 'pino';
import { pinoHttp } from 'pino-http';
import type { Enqueue } from './context';
import { databaseCode, type Database } from './database';
import { loggedUrl } from './log';
import { describeApi } from './openapi';
import { HTTP_STATUS, notFound, Problem } from './problems';
import { createRateLimits, type RateLimits } from './rate-limits';
import { authorise, BODY_LIMIT, send, type RequestContext, type Route } from './routes';
import { createSessions, endSession, startSession, type SessionHandling, type SignInDoor } from './session';
import type { Settings } from './settings';

export interface ApiParts {
  database: Database;
  settings: Settings;
  log: Logger;
  enqueue: Enqueue;
  door: SignInDoor;
  routes: readonly Route[];
  /** Known to this process alone: marks calls that its own page rendering makes. */
  ssrSecret: string;
  /** Sentences that say what is not ready; empty = ready. */
  notReady(): Promise<string[]>;
}

export interface Api {
  /** Session and request log; comes before pages and API alike. */
  before: express.RequestHandler[];
  router: Router;
}

const UNSAFE = new Set(['POST', 'PUT', 'PATCH', 'DELETE']);

export function createApi(parts: ApiParts): Api {
  const sessions = createSessions(parts.database.pool, parts.settings, parts.door);
  const limits = createRateLimits(parts.database.pool);
  const router = Router();
  router.get('/api/health', (_req, res) => void res.json({ status: 'live' }));
  router.get('/api/ready', async (_req, res) => {
    const missing = await parts
      .notReady()
      .catch((error: unknown) => [error instanceof Error ? error.message : 'unknown']);
    res
      .status(missing.length === 0 ? 200 : 503)
      .json({ status: missing.length === 0 ? 'ready' : 'not ready', missing });
  });
  router.get('/api/openapi.json', (_req, res) => void res.json(describeApi(parts.routes, 'Heddle')));
  router.use('/api', (_req, res, next) => {
    res.setHeader('cache-control', 'private, no-store');
    next();
  });
  router.use('/api', sameOriginOnly(parts.settings));
  router.use('/api', ...sessions.middleware);
  router.use('/api', (req, res, next) => (UNSAFE.has(req.method) ? sessions.csrfCheck(req, res, next) : next()));
  // Clients that never load a page get their token where they ask who they are.
  router.get('/api/accounts/session', sessions.csrfCookie);
  for (const table of parts.routes) mount(router, table, parts, sessions, limits);
  router.use('/api', () => {
    throw notFound('address');
  });
  router.use('/api', problemAnswers(parts.log));
  return { before: [requestLog(parts.log), ...pagesOnly(sessions)], router };
}

// Pages only need the token cookie; the session itself is read by the API calls that rendering makes.
function pagesOnly(sessions: SessionHandling): express.RequestHandler[] {
  return [...sessions.middleware, sessions.csrfCookie].map(
    (step): express.RequestHandler =>
      (req, res, next) =>
        req.path.startsWith('/api/') || req.method !== 'GET' || /\.\w{2,5}$/.test(req.path)
          ? next()
          : step(req, res, next),
  );
}

function requestLog(log: Logger): express.RequestHandler {
  return pinoHttp({
    logger: log,
    genReqId: () => randomUUID(),
    autoLogging: {
      ignore: (req) => req.url === '/api/health' || req.url === '/api/ready' || /\.\w{2,5}$/.test(req.url ?? ''),
    },
    customLogLevel: (_req, res, error) => (error || res.statusCode >= 500 ? 'error' : 'info'),
    serializers: {
      req: (req: { id: string; method: string; url: string }) => ({
        id: req.id,
        method: req.method,
        url: loggedUrl(req.url),
      }),
      res: (res: { statusCode: number }) => ({ status: res.statusCode }),
    },
  });
}

/** Refuses changes that another site's page asks for (OWASP, Cross-Site Request Forgery Prevention: Fetch Metadata). */
function sameOriginOnly(settings: Settings): express.RequestHandler {
  return (req, _res, next) => {
    if (!UNSAFE.has(req.method)) return next();
    const site = req.get('sec-fetch-site');
    const origin = req.get('origin');
    const foreign = site
      ? site !== 'same-origin' && site !== 'none'
      : origin !== undefined && !isOwnOrigin(origin, req, settings);
    next(foreign ? new Problem('forbidden', 'This request came from another site') : undefined);
  };
}

const isOwnOrigin = (origin: string, req: Request, settings: Settings): boolean =>
  origin === settings.origin || origin === `${req.protocol}://${req.get('host')}`;

function mount(router: Router, table: Route, parts: ApiParts, sessions: SessionHandling, limits: RateLimits): void {
  const parse = express.json({ limit: table.bodyLimit ?? BODY_LIMIT, strict: true });
  const steps: express.RequestHandler[] = [
    (req, _res, next) => {
      authorise(table, req.user ?? null);
      next();
    },
    ...(table.body ? [jsonOnly, parse] : []),
    async (req, res) => {
      const ctx = contextOf(req, res, parts, sessions, limits);
      if (table.limit) await limits.count(table.limit, req.user?.personId ?? ctx.address);
      send(res, table, await table.answerTo(ctx, req));
    },
  ];
  router[table.method](table.path, ...steps);
}

function jsonOnly(req: Request, _res: Response, next: NextFunction): void {
  if (!req.is('application/json')) throw new Problem('unsupported-media-type', 'This address takes application/json');
  next();
}

function contextOf(
  req: Request,
  res: Response,
  parts: ApiParts,
  sessions: SessionHandling,
  limits: RateLimits,
): RequestContext {
  return {
    db: parts.database.db,
    actor: req.user ?? null,
    now: () => new Date(),
    requestId: String(req.id),
    settings: parts.settings,
    log: parts.log,
    enqueue: parts.enqueue,
    address: visitorAddress(req, parts.ssrSecret),
    limits,
    session: {
      authenticate: () => sessions.authenticate(req, res),
      async start(actor) {
        await startSession(req, actor);
        sessions.renewCsrf(req, res);
      },
      async end() {
        await endSession(req);
        res.setHeader('clear-site-data', '"cache", "storage"');
        sessions.renewCsrf(req, res);
      },
    },
  };
}

// Rendering calls the API over loopback for a visitor; only this process knows the secret, so nobody else can claim an address.
function visitorAddress(req: Request, ssrSecret: string): string {
  const claimed = Buffer.from(req.get('x-heddle-ssr') ?? '');
  const secret = Buffer.from(ssrSecret);
  if (claimed.length === secret.length && timingSafeEqual(claimed, secret))
    return req.get('x-visitor-address') ?? 'unknown';
  return req.ip ?? 'unknown';
}

const UNREACHABLE = /^(57P0[123]|53300|08\w{3}|25P03)$/;
const LOST = /ECONNREFUSED|ECONNRESET|Connection terminated|timeout exceeded when trying to connect|Connection ended/;

/** Turns whatever was thrown into problem details; our own faults keep their insides inside. */
export function toProblem(error: unknown): Problem {
  if (error instanceof Problem) return error;
  if (error instanceof Error && 'status' in error && 'expose' in error && error.expose === true)
    return parserProblem(Number(error.status));
  const code = databaseCode(error) ?? '';
  const text =
    error instanceof Error ? `${error.message} ${error.cause instanceof Error ? error.cause.message : ''}` : '';
  if (UNREACHABLE.test(code) || LOST.test(text))
    return new Problem('unavailable', 'The service is busy or restarting. Please try again in a moment', {
      retryAfterSeconds: 5,
    });
  return new Problem('fault', 'Something went wrong on our side. Nothing was changed; please try again');
}

function parserProblem(status: number): Problem {
  if (status === 413) return new Problem('too-large', 'That is more than this address takes');
  if (status === 415) return new Problem('unsupported-media-type', 'This address takes application/json');
  return new Problem('invalid', 'The request could not be read');
}

export function problemAnswers(log: Logger): ErrorRequestHandler {
  return (error, req, res, next) => {
    if (res.headersSent) return next(error);
    const problem = toProblem(error);
    if (problem.code === 'fault') (req.log ?? log).error({ err: error as Error }, 'unexpected error');
    else if (problem.code === 'unavailable') log.warn({ err: error as Error }, 'not available');
    if (problem.extras.retryAfterSeconds) res.setHeader('retry-after', String(problem.extras.retryAfterSeconds));
    res
      .status(HTTP_STATUS[problem.code])
      .type('application/problem+json')
      .send(JSON.stringify(problem.toDetails(loggedUrl(req.originalUrl))));
  };
}
