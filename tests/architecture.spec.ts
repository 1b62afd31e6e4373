import { readdirSync, statSync } from 'node:fs';
import { join } from 'node:path';
import { describe, expect, it } from 'vitest';
import { importsOf, LADDER, violation } from './support/allowed-imports';

const ROOT = process.cwd();

function sources(folder: string): string[] {
  return readdirSync(join(ROOT, folder), { withFileTypes: true }).flatMap((entry) => {
    const path = `${folder}/${entry.name}`;
    if (entry.isDirectory()) return sources(path);
    return /\.ts$/.test(path) ? [path] : [];
  });
}

describe('the house', () => {
  const files = ['shared', 'drizzle', 'src'].flatMap(sources);

  it('has imports that go down only', () => {
    const violations = files
      .flatMap((file) => importsOf(ROOT, file))
      .map(violation)
      .filter((each) => each !== null);
    expect(violations).toEqual([]);
  });

  it('reads imports where there are some', () => {
    expect(files.length).toBeGreaterThan(200);
    expect(importsOf(ROOT, 'src/server/backend.ts').length).toBeGreaterThan(5);
  });

  it('gives every capability of the server a door', () => {
    const capabilities = readdirSync(join(ROOT, 'src/server')).filter(
      (name) => name !== 'platform' && statSync(join(ROOT, 'src/server', name)).isDirectory(),
    );
    expect(capabilities.filter((name) => !(LADDER as readonly string[]).includes(name))).toEqual([]);
    expect(capabilities.filter((name) => !files.includes(`src/server/${name}/index.ts`))).toEqual([]);
  });
});

describe('the guard of the house', () => {
  it.each([
    ['shared/assignment/solve.ts', 'shared/matching/rules', false],
    ['shared/assignment/solve.ts', 'zod', true],
    ['shared/matching/rules.ts', 'rxjs', true],
    ['shared/matching/rules.ts', 'src/server/platform', false],
    ['drizzle/schema/cycles.ts', 'src/server/cycles', false],
    ['drizzle/seed/seed.ts', 'src/server/cycles/cycles-queries', false],
    ['src/app/ui/avatar/avatar.ts', 'src/app/core/session-store', false],
    ['src/app/core/guards.ts', 'src/app/profiles/profiles-client', false],
    ['src/app/profiles/profile-page/profile-page.ts', 'src/app/matching/matching-client', false],
    ['src/app/home/home-page.ts', 'src/app/matching/matching-client', false],
    ['src/server/platform/app.ts', 'src/server/accounts', false],
    ['src/server/profiles/profiles-queries.ts', 'src/server/accounts', false],
    ['src/server/profiles/profiles-queries.ts', 'argon2', true],
    ['src/server/profiles/show-profile.ts', 'src/server/matching', false],
    ['src/server/profiles/show-profile.ts', 'src/server/accounts/accounts-queries', false],
    ['src/server/profiles/show-profile.ts', 'drizzle-orm/pg-core', true],
    ['src/server/profiles/show-profile.ts', 'express', true],
    ['src/server/profiles/profiles-router.ts', 'src/server/accounts', false],
  ])('refuses %s → %s', (from, to, isPackage) => {
    expect(violation({ from, to, isPackage })).not.toBeNull();
  });

  it.each([
    ['shared/matching/rules.ts', 'shared/assignment', false],
    ['src/server/profiles/show-profile.ts', 'src/server/accounts', false],
    ['src/server/profiles/profiles-queries.ts', 'drizzle-orm', true],
    ['src/app/home/home-page.ts', 'src/app/profiles/completeness-panel/completeness-panel', false],
  ])('lets %s → %s through', (from, to, isPackage) => {
    expect(violation({ from, to, isPackage })).toBeNull();
  });
});
