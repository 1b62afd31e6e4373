/** The people of the demo association. */
import { DEMO_SEED, demoCast } from './cast';
import type { DemoPerson } from './demo-shapes';
import { STAFF } from './named-people';

/** Staff first, then members. The same seed gives the same people. */
export function demoPeople(seed: number = DEMO_SEED): DemoPerson[] {
  return [...STAFF.map((person) => structuredClone(person)), ...demoCast(seed).map(({ person }) => person)];
}
