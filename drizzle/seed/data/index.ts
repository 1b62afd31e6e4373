/** The demo association as plain data: the door of this folder. */
import { DEMO_SEED } from './cast';
import { DEMO_TODAY, demoCycles } from './cycles';
import type { DemoAssociation } from './demo-shapes';
import { TOWNS } from './gazetteer';
import { demoPeople } from './people';
import { TAGS } from './tags';

export * from './demo-shapes';
export { DEMO_SEED } from './cast';
export { DEMO_TODAY, demoCycles } from './cycles';
export { EMPLOYER_GROUPS, EMPLOYERS } from './employers';
export { TOWNS } from './gazetteer';
export { largeAssociation } from './large';
export { demoPeople } from './people';
export { PRACTICE_AREA_SLUGS, TAGS } from './tags';

/** Everything at once. */
export function demoAssociation(seed: number = DEMO_SEED, today: string = DEMO_TODAY): DemoAssociation {
  return { towns: TOWNS, tags: TAGS, people: demoPeople(seed), cycles: demoCycles(seed, today) };
}
