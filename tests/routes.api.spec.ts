import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type { Role } from '../shared/accounts/accounts-contract';
import { ROUTES } from '../src/server/backend';
import type { Route } from '../src/server/platform/routes';
import { startTestApp, type TestApp } from './support/test-app';
import type { TestClient } from './support/test-client';

type Who = 'visitor' | 'member' | Role;
const EVERYBODY: readonly Who[] = ['visitor', 'member', 'coordinator', 'organiser', 'administrator'];

let app: TestApp;
const clients = new Map<Who, TestClient>();

beforeAll(async () => {
  app = await startTestApp();
  clients.set('visitor', await app.visitor());
  clients.set('member', await app.client());
  for (const role of ['coordinator', 'organiser', 'administrator'] as const) clients.set(role, await app.client(role));
});
afterAll(() => app.stop());

/** Who may pass, by the table alone; everybody who is signed in is a member. */
function mayPass({ may }: Route, who: Who): boolean {
  if (may.includes('anyone')) return true;
  if (who === 'visitor') return false;
  return may.includes('member') || (who !== 'member' && may.includes(who));
}

/** An address of the route that leads to nothing in particular. */
const addressOf = (path: string): string =>
  path
    .replace(/:side\b/, 'mentee')
    .replace(/:section\b/, 'about')
    .replace(/:token\b/, 'x'.repeat(43))
    .replace(/:\w+/g, '00000000-0000-4000-8000-000000000000');

async function ask(client: TestClient, { method, path }: Route): Promise<number> {
  const url = addressOf(path);
  if (method === 'get') return (await client.get(url)).status;
  if (method === 'delete') return (await client.delete(url)).status;
  return (await client[method](url, {}, { 'if-match': '"1"' })).status;
}

// Signing in and out would change who asks; their own specs look at them.
const routes = ROUTES.filter((route) => !(route.path === '/api/accounts/session' && route.method !== 'get'));

describe('authorisation', () => {
  it.each(routes.map((route) => [`${route.method.toUpperCase()} ${route.path}`, route] as const))(
    '%s lets in whom the table names, and nobody else',
    async (_name, route) => {
      for (const who of EVERYBODY) {
        const status = await ask(clients.get(who)!, route);
        const expected = mayPass(route, who) ? 'let in' : who === 'visitor' ? 401 : 403;
        const seen = status === 401 || status === 403 ? status : 'let in';
        expect({ who, seen }).toEqual({ who, seen: expected });
        expect(status).not.toBe(500);
      }
    },
  );

  it('is decided for every route: each names who may call it, once', () => {
    for (const route of ROUTES) expect(route.may.length, route.path).toBeGreaterThan(0);
    const names = ROUTES.map((route) => `${route.method} ${route.path}`);
    expect(new Set(names).size).toBe(names.length);
  });

  it('keeps what only coordinators may do from organisers and administrators', () => {
    const open = ROUTES.filter((route) => /\/(matching|cycles\/:cycleId\/applicants)/.test(route.path));
    expect(open.length).toBeGreaterThan(10);
    for (const route of open) expect(route.may, route.path).toEqual(['coordinator']);
  });
});

describe('the description of the API', () => {
  it('lists every route with its answers', async () => {
    const { body } = await clients
      .get('visitor')!
      .get<{ openapi: string; paths: Record<string, Record<string, object>> }>('/api/openapi.json');
    expect(body.openapi).toMatch(/^3\.1/);
    for (const route of ROUTES) {
      const path = route.path.replace(/:(\w+)/g, '{$1}');
      expect(body.paths[path]?.[route.method], `${route.method} ${path}`).toBeDefined();
    }
  });
});

describe('foreign and broken requests', () => {
  it('are refused: another site, no token, no JSON, too much', async () => {
    const coordinator = clients.get('coordinator')!;
    const post = (headers: Record<string, string>, body: unknown = {}) =>
      coordinator.post('/api/cycles', body, headers);
    expect((await post({ 'sec-fetch-site': 'cross-site' })).status).toBe(403);
    expect((await post({ 'x-xsrf-token': 'wrong' })).status).toBe(403);
    expect((await post({ 'content-type': 'text/plain' })).status).toBe(415);
    expect((await post({}, { name: 'x'.repeat(300_000) })).status).toBe(413);
  });

  it('answer unknown addresses with problem details', async () => {
    const { status, headers, body } = await clients.get('visitor')!.get<{ code: string }>('/api/nothing');
    expect(status).toBe(404);
    expect(headers.get('content-type')).toContain('application/problem+json');
    expect(body.code).toBe('not-found');
  });
});
