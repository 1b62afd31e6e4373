/** Bundles what runs beside the Angular server: the matching thread, the migration, the seed. Packages stay outside. */
import { build } from 'esbuild';
import { existsSync } from 'node:fs';

const entries = {
  'matching.worker': 'src/server/matching/matching.worker.ts',
  migrate: 'drizzle/migrate.ts',
  seed: 'drizzle/seed/seed.ts',
};

await build({
  entryPoints: Object.fromEntries(Object.entries(entries).filter(([, source]) => existsSync(source))),
  outdir: 'dist/jobs',
  outExtension: { '.js': '.mjs' },
  bundle: true,
  platform: 'node',
  format: 'esm',
  target: 'node20',
  packages: 'external',
  sourcemap: 'linked',
  logLevel: 'warning',
});
