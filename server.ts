/**
 * Composition only: settings → database → routes → Angular → listen. HEDDLE_PROCESS chooses what this process does:
 * `web` serves, `worker` takes jobs and sends messages, `all` does both.
 */
import {
  AngularNodeAppEngine,
  createNodeRequestHandler,
  isMainModule,
  writeResponseToNodeResponse,
} from '@angular/ssr/node';
import compression from 'compression';
import express from 'express';
import helmet from 'helmet';
import { randomBytes } from 'node:crypto';
import type { Server } from 'node:http';
import { join } from 'node:path';
import type { RenderContext } from './src/app/core/ssr-api-backend';
import { startBackend, type Backend } from './src/server/backend';
import { problemAnswers } from './src/server/platform/app';
import { readSettings, type Settings } from './src/server/platform/settings';

// The Angular CLI imports this file too (for its list of routes): nothing connects or listens at import time.
const NONCE_PLACEHOLDER = 'nonce-placeholder-6f1d0c2b9a7e4d58';
const LONGEST_TARGET = 2048;

function securityHeaders(settings: Settings): express.RequestHandler[] {
  const nonce = (_req: unknown, res: unknown): string =>
    `'nonce-${(res as express.Response).locals['nonce'] as string}'`;
  return [
    (_req, res, next) => {
      res.locals['nonce'] = randomBytes(18).toString('base64');
      res.setHeader('permissions-policy', 'camera=(), geolocation=(), microphone=(), payment=()');
      next();
    },
    helmet({
      contentSecurityPolicy: {
        useDefaults: false,
        directives: {
          defaultSrc: ["'self'"],
          scriptSrc: [nonce, "'strict-dynamic'"],
          styleSrcElem: [nonce, "'self'"],
          styleSrcAttr: ["'unsafe-inline'"],
          imgSrc: ["'self'", 'data:'],
          // Message previews are shown in a sandboxed frame that runs nothing.
          frameSrc: ["'self'"],
          objectSrc: ["'none'"],
          baseUri: ["'self'"],
          frameAncestors: ["'none'"],
          formAction: ["'self'"],
        },
      },
      strictTransportSecurity: settings.secure ? { maxAge: 31_536_000, includeSubDomains: true } : false,
      referrerPolicy: { policy: 'no-referrer' },
    }),
  ];
}

/** Refuses request targets longer than any page of ours needs, before rendering sees them. */
const shortTargets: express.RequestHandler = (req, res, next) => {
  if (req.originalUrl.length > LONGEST_TARGET) res.status(414).type('text/plain').send('This address is too long.');
  else next();
};

function pages(settings: Settings, ssrSecret: string): express.RequestHandler {
  const engine = new AngularNodeAppEngine({
    allowedHosts: [new URL(settings.origin).hostname, 'localhost', '127.0.0.1'],
  });
  return async (req, res, next) => {
    const nonce = res.locals['nonce'] as string;
    const context: RenderContext = {
      nonce,
      apiOrigin: `http://127.0.0.1:${settings.port}`,
      ssrSecret,
      visitorAddress: req.ip ?? 'unknown',
    };
    const answer = await engine.handle(req, context);
    if (!answer) return next();
    if (!answer.headers.get('content-type')?.includes('text/html')) return writeResponseToNodeResponse(answer, res);
    const headers = new Headers(answer.headers);
    headers.delete('content-length');
    headers.delete('etag');
    headers.set('cache-control', 'private, no-store');
    const html = (await answer.text()).replaceAll(`="${NONCE_PLACEHOLDER}"`, `="${nonce}"`);
    return writeResponseToNodeResponse(new Response(html, { status: answer.status, headers }), res);
  };
}

function createApp(settings: Settings, backend: Backend): express.Express {
  const app = express();
  app.disable('x-powered-by');
  app.set('trust proxy', settings.trustProxy);
  app.use(...securityHeaders(settings));
  app.use(shortTargets);
  app.use(compression());
  app.use(
    express.static(join(import.meta.dirname, '../browser'), {
      index: false,
      redirect: false,
      setHeaders: (res, path) =>
        res.setHeader(
          'cache-control',
          /-[A-Z0-9]{8}\.\w+$/.test(path) ? 'public, max-age=31536000, immutable' : 'public, max-age=3600',
        ),
    }),
  );
  app.use(...backend.api.before);
  app.use(backend.api.router);
  app.use(pages(settings, backend.ssrSecret));
  app.use(problemAnswers(backend.log));
  return app;
}

function listen(app: express.Express, settings: Settings): Promise<Server> {
  return new Promise((resolve, reject) => {
    const server = app.listen(settings.port, settings.host, (error?: Error) =>
      error ? reject(error) : resolve(server),
    );
    server.requestTimeout = 60_000;
    server.headersTimeout = 20_000;
  });
}

async function main(): Promise<void> {
  const settings = readSettings(process.env);
  const backend = await startBackend(settings);
  const server = settings.process === 'worker' ? null : await listen(createApp(settings, backend), settings);
  backend.log.info({ origin: settings.origin, process: settings.process }, 'ready');
  if (settings.process !== 'worker') {
    const invitation = await backend.inviteFirstAdministrator();
    if (invitation)
      console.log(
        `\nThere is no administrator yet. Open this link once, within 14 days, to become the first one:\n  ${invitation}\n`,
      );
  }
  stopOnSignals(backend, server);
}

function stopOnSignals(backend: Backend, server: Server | null): void {
  let stopping = false;
  const stop = (): void => {
    if (stopping) return;
    stopping = true;
    backend.beginStop();
    // Whatever hangs must not keep the process for ever.
    setTimeout(() => process.exit(1), 10_000).unref();
    const closed = new Promise<void>((resolve) => (server ? server.close(() => resolve()) : resolve()));
    server?.closeIdleConnections();
    void closed.then(() => backend.stop()).then(() => process.exit(0));
  };
  process.on('SIGINT', stop);
  process.on('SIGTERM', stop);
}

if (isMainModule(import.meta.url)) {
  main().catch((error: unknown) => {
    console.error(error instanceof Error ? error.message : error);
    process.exit(1);
  });
}

// Under `ng serve` the CLI's own server asks this handler; it starts the backend at the first request.
let developed: Promise<express.Express> | null = null;
export const reqHandler = createNodeRequestHandler(async (req, res, next) => {
  // The build asks too, while it lists the routes; there is no database then.
  if (!process.env['DATABASE_URL']) return void res.writeHead(503).end();
  developed ??= (async () => {
    const settings = readSettings(process.env);
    const app = express();
    const backend = await startBackend(settings);
    app.use(...backend.api.before);
    app.use(backend.api.router);
    app.use(pages(settings, backend.ssrSecret));
    return app;
  })();
  (await developed)(req as express.Request, res as express.Response, next);
});
