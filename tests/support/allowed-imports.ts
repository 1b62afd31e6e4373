/** The table of allowed imports: an arrow means "may import"; nothing else may. DEVELOPERS.md draws the house. */
import ts from 'typescript';
import { readFileSync } from 'node:fs';
import { dirname, join, normalize, relative } from 'node:path';

/** Lower ones come first; a capability may use the doors of those before it. */
export const LADDER = [
  'audit',
  'messages',
  'accounts',
  'tags',
  'profiles',
  'cycles',
  'applications',
  'matching',
  'pairings',
  'announcements',
  'privacy',
  'statistics',
] as const;

export interface Import {
  /** Path of the importing file, from the project's folder. */
  from: string;
  /** Path of the imported file without its ending, or the name of a package. */
  to: string;
  isPackage: boolean;
}

/** Every import of a file, found by the compiler's own scanner. */
export function importsOf(root: string, file: string): Import[] {
  const { importedFiles } = ts.preProcessFile(readFileSync(join(root, file), 'utf8'), true, true);
  return importedFiles.map(({ fileName }) => {
    const isPackage = !fileName.startsWith('.');
    const to = isPackage
      ? fileName
      : normalize(join(dirname(file), fileName))
          .split('\\')
          .join('/');
    return { from: relative('', file), to, isPackage };
  });
}

const packageName = (specifier: string): string =>
  specifier.startsWith('@') ? specifier.split('/').slice(0, 2).join('/') : specifier.split('/')[0]!;

/** Why an import is not allowed; null where it is. */
export function violation({ from, to, isPackage }: Import): string | null {
  if (/\.spec\.ts$/.test(from)) return null;
  const zone = ZONES.find((each) => each.holds(from));
  if (!zone) return null;
  const name = isPackage ? packageName(to) : to;
  return zone.allows({ from, to: name, isPackage }) ? null : `${from} may not import ${to} (${zone.says})`;
}

interface Zone {
  says: string;
  holds(file: string): boolean;
  allows(imported: Import): boolean;
}

const inside = (folder: string) => (path: string) => path === folder || path.startsWith(`${folder}/`);
const capabilityOf = (path: string): string | undefined => /^src\/(?:server|app)\/([^/]+)/.exec(path)?.[1];
const isNode = (name: string): boolean => name.startsWith('node:');
const isAngular = (name: string): boolean =>
  name.startsWith('@angular/') || ['rxjs', 'zod', 'd3-scale', 'd3-shape', 'tslib'].includes(name);

/** The door, or a contract, of a capability lower on the ladder. */
function isLowerDoor(from: string, to: string): boolean {
  const mine = LADDER.indexOf(capabilityOf(from) as (typeof LADDER)[number]);
  const theirs = LADDER.indexOf(capabilityOf(to) as (typeof LADDER)[number]);
  return theirs >= 0 && theirs < mine && /^src\/server\/[^/]+(\/index)?$/.test(to);
}

const own = (from: string, to: string): boolean => capabilityOf(from) === capabilityOf(to);
const isQueries = (file: string): boolean => /-queries(\.ts)?$/.test(file);
const isRouter = (file: string): boolean => /-router(\.ts)?$/.test(file);
const isServerCapability = (file: string): boolean =>
  /^src\/server\/[^/]+\/.+/.test(file) && !inside('src/server/platform')(file);

const ZONES: readonly Zone[] = [
  {
    says: 'shared/assignment imports itself only',
    holds: inside('shared/assignment'),
    allows: ({ to, isPackage }) => !isPackage && inside('shared/assignment')(to),
  },
  {
    says: 'shared imports shared and zod',
    holds: inside('shared'),
    allows: ({ to, isPackage }) => (isPackage ? to === 'zod' : inside('shared')(to)),
  },
  {
    says: 'drizzle/schema imports itself, shared and drizzle-orm',
    holds: inside('drizzle/schema'),
    allows: ({ to, isPackage }) =>
      isPackage ? to === 'drizzle-orm' : inside('drizzle/schema')(to) || inside('shared')(to),
  },
  {
    says: 'drizzle/seed imports itself, doors of src/server, shared and packages',
    holds: inside('drizzle/seed'),
    allows: ({ to, isPackage }) =>
      isPackage ||
      inside('drizzle/seed')(to) ||
      inside('shared')(to) ||
      inside('src/server/platform')(to) ||
      /^src\/server\/[^/]+(\/index)?$/.test(to),
  },
  {
    says: 'src/app/ui imports itself, shared and the framework',
    holds: inside('src/app/ui'),
    allows: ({ to, isPackage }) => (isPackage ? isAngular(to) : inside('src/app/ui')(to) || inside('shared')(to)),
  },
  {
    says: 'src/app/core imports ui, shared and the framework',
    holds: inside('src/app/core'),
    allows: ({ to, isPackage }) =>
      isPackage ? isAngular(to) : ['src/app/core', 'src/app/ui', 'shared'].some((folder) => inside(folder)(to)),
  },
  {
    // The home page is composed of the capabilities' panels.
    says: 'src/app/home imports panels of capabilities, core, ui and shared',
    holds: inside('src/app/home'),
    allows: ({ to, isPackage }) =>
      isPackage
        ? isAngular(to)
        : ['src/app/home', 'src/app/core', 'src/app/ui', 'shared'].some((folder) => inside(folder)(to)) ||
          /-panel$/.test(to),
  },
  {
    says: 'a capability of src/app imports itself, core, ui and shared',
    holds: (file) => /^src\/app\/[^/]+\//.test(file),
    allows: ({ from, to, isPackage }) =>
      isPackage
        ? isAngular(to)
        : own(from, to) || ['src/app/core', 'src/app/ui', 'shared'].some((folder) => inside(folder)(to)),
  },
  {
    says: 'src/server/platform imports itself, the schema, shared and packages',
    holds: inside('src/server/platform'),
    allows: ({ to, isPackage }) =>
      isPackage || ['src/server/platform', 'drizzle/schema', 'shared'].some((folder) => inside(folder)(to)),
  },
  {
    says: 'queries import the platform, the schema, shared, drizzle-orm and (for types) zod',
    holds: (file) => isServerCapability(file) && isQueries(file),
    allows: ({ from, to, isPackage }) =>
      isPackage
        ? ['drizzle-orm', 'zod'].includes(to)
        : ['src/server/platform', 'drizzle/schema', 'shared'].some((folder) => inside(folder)(to)) ||
          (own(from, to) && isQueries(to)),
  },
  {
    says: 'a router imports its own verbs, the platform, shared, express and zod',
    holds: (file) => isServerCapability(file) && isRouter(file),
    allows: ({ from, to, isPackage }) =>
      isPackage
        ? ['express', 'zod'].includes(to)
        : own(from, to) || inside('src/server/platform')(to) || inside('shared')(to),
  },
  {
    says: 'a verb imports its own folder, lower doors, the platform, shared and packages but express and drizzle-orm',
    holds: isServerCapability,
    allows: ({ from, to, isPackage }) =>
      isPackage
        ? isNode(to) || !['express', 'drizzle-orm'].includes(to)
        : own(from, to) || inside('src/server/platform')(to) || inside('shared')(to) || isLowerDoor(from, to),
  },
];
