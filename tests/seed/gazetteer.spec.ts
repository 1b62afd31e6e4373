import { describe, expect, it } from 'vitest';
import { Region } from '../../shared/profiles/profiles-contract';
import { TOWNS } from '../../drizzle/seed/data';

const radians = (degrees: number): number => (degrees * Math.PI) / 180;
/** Great-circle distance in km (haversine, mean Earth radius of the IUGG). */
function distance(one: (typeof TOWNS)[number], other: (typeof TOWNS)[number]): number {
  const half =
    Math.sin(radians(other.latitude - one.latitude) / 2) ** 2 +
    Math.cos(radians(one.latitude)) *
      Math.cos(radians(other.latitude)) *
      Math.sin(radians(other.longitude - one.longitude) / 2) ** 2;
  return 2 * 6371.0088 * Math.asin(Math.sqrt(half));
}

describe('the towns of Ellmark', () => {
  it('lie 15 to 320 km from each other', () => {
    const distances = TOWNS.flatMap((town, index) => TOWNS.slice(0, index).map((other) => distance(town, other)));
    expect(Math.min(...distances)).toBeGreaterThan(15);
    expect(Math.max(...distances)).toBeLessThan(320);
  });

  it('cover all regions, and the named five are among them', () => {
    expect(new Set(TOWNS.map(({ region }) => region))).toEqual(new Set(Region.options));
    const names = TOWNS.map(({ name }) => name);
    expect(names).toEqual(expect.arrayContaining(['Port Ansel', 'Greyford', 'Tarnwick', 'Whitmoor', 'Sallow Bridge']));
    expect(new Set(names).size).toBe(names.length);
  });
});
