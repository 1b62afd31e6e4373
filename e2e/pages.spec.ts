import { expect, type Page, test } from '@playwright/test';
import { readFileSync } from 'node:fs';
import { createRequire } from 'node:module';
import { pageOf } from './support';

const axeSource = readFileSync(createRequire(import.meta.url).resolve('axe-core/axe.min.js'), 'utf8');

interface Violation {
  id: string;
  nodes: { html: string }[];
}

/** WCAG 2.2 A and AA, by axe-core. */
async function violationsOf(page: Page): Promise<string[]> {
  await page.evaluate(axeSource);
  const found = await page.evaluate(async () => {
    const { axe } = globalThis as unknown as {
      axe: { run(context: Document, options: object): Promise<{ violations: Violation[] }> };
    };
    const tags = ['wcag2a', 'wcag2aa', 'wcag21a', 'wcag21aa', 'wcag22aa'];
    return (await axe.run(document, { runOnly: tags })).violations;
  });
  return found.flatMap((violation) => violation.nodes.map((node) => `${violation.id}: ${node.html.slice(0, 160)}`));
}

const PAGES: Record<'visitor' | 'coordinator' | 'mentee' | 'administrator', string[]> = {
  visitor: ['/', '/accounts/sign-in', '/accounts/register', '/accounts/forgotten', '/nothing'],
  mentee: ['/', '/profiles', '/profiles/mine', '/applications', '/pairings'],
  coordinator: ['/', '/cycles', '/cycles/new'],
  administrator: ['/accounts/people', '/messages'],
};

// Each page in one of two looks; `npm run e2e:matrix` looks at all of them in both.
for (const [role, paths] of Object.entries(PAGES)) {
  test(`pages of a ${role} are accessible, fit 360 px, and come whole from the server`, async ({ browser }) => {
    const { page, faults } = await pageOf(browser, role === 'visitor' ? undefined : (role as 'mentee'));
    const all = role === 'coordinator' ? [...paths, ...(await cyclePages(page))] : paths;
    for (const [position, path] of all.entries()) {
      await page.setViewportSize({ width: 1340, height: 800 });
      await page.emulateMedia({ colorScheme: 'light', reducedMotion: 'reduce' });
      await page.goto(path, { waitUntil: 'networkidle' });
      await expect(page.locator('h1').first()).toBeVisible();
      const whole = process.env['WHOLE_MATRIX'] === '1';
      if (whole || position % 2 === 0) expect(await violationsOf(page), `${path}, wide and light`).toEqual([]);
      await page.setViewportSize({ width: 360, height: 800 });
      await page.emulateMedia({ colorScheme: 'dark', reducedMotion: 'reduce' });
      if (whole || position % 2 === 1) expect(await violationsOf(page), `${path}, narrow and dark`).toEqual([]);
      const wider = await page.evaluate(() => document.documentElement.scrollWidth - innerWidth);
      expect(wider, `${path} scrolls sideways at 360 px`).toBeLessThanOrEqual(0);
    }
    expect(faults).toEqual([]);
  });
}

/** The pages of the demo's closed cycle and of the one in work. */
async function cyclePages(page: Page): Promise<string[]> {
  const { cycles } = (await (await page.request.get('/api/cycles')).json()) as {
    cycles: { id: string; name: string }[];
  };
  const parts = ['', '/applications', '/applications/import', '/rules', '/matching', '/pairings', '/edit'];
  const winter = cycles.find((cycle) => cycle.name.startsWith('Winter'))!;
  const summer = cycles.find((cycle) => cycle.name === 'Summer 2026')!;
  const { runs } = (await (await page.request.get(`/api/matching/cycles/${summer.id}/runs`)).json()) as {
    runs: { id: string }[];
  };
  const open = cycles.find((cycle) => cycle.name === 'Summer 2027')!;
  const plan = `/cycles/${summer.id}/matching/${runs[0]!.id}`;
  return [
    ...parts.map((part) => `/cycles/${winter.id}${part}`),
    ...['', '?tab=left-out', '?tab=shortages', '?tab=trade-off', '?tab=record'].map((tab) => plan + tab),
    `${plan}/review`,
    `/cycles/${open.id}/matching/forecast`,
  ];
}

test('the server draws what a visitor and a member read, for the right person', async ({ browser, request }) => {
  const publicPage = await (await request.get('/')).text();
  expect(publicPage).toContain('Summer 2027 is open for applications');
  expect(publicPage).not.toContain('Good to see you');
  const { page } = await pageOf(browser, 'mentee');
  const own = await page.request.get('/');
  expect(own.headers()['cache-control']).toContain('no-store');
  expect(await own.text()).toContain('Good to see you, Amara Nwosu');
});
