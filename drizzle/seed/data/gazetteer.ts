/** Towns of Ellmark, an invented country: it lies in the open North Sea, so that no real place is meant. */
import type { DemoTown } from './demo-shapes';

// Distances between towns run from about 17 to about 263 km; the Islands lie to the north-west, the Uplands to the south-east.
export const TOWNS: readonly DemoTown[] = [
  { name: 'Port Ansel', region: 'coast', latitude: 56.31, longitude: 3.62 },
  { name: 'Greyford', region: 'midvale', latitude: 56.12, longitude: 4.28 },
  { name: 'Tarnwick', region: 'uplands', latitude: 55.71, longitude: 5.06 },
  { name: 'Whitmoor', region: 'islands', latitude: 57.02, longitude: 2.74 },
  { name: 'Sallow Bridge', region: 'midvale', latitude: 55.93, longitude: 4.55 },
  { name: 'Herring Stair', region: 'coast', latitude: 56.47, longitude: 3.55 },
  { name: 'Lowmarch', region: 'coast', latitude: 56.03, longitude: 3.41 },
  { name: 'Saltholm Cross', region: 'coast', latitude: 55.68, longitude: 3.52 },
  { name: 'Ashbeck', region: 'midvale', latitude: 56.24, longitude: 4.47 },
  { name: 'Penny Weir', region: 'midvale', latitude: 55.81, longitude: 4.3 },
  { name: 'Coldharrow', region: 'uplands', latitude: 55.54, longitude: 5.31 },
  { name: 'Ironlow', region: 'uplands', latitude: 55.42, longitude: 4.83 },
  { name: 'Skerry Hythe', region: 'islands', latitude: 57.16, longitude: 2.62 },
  { name: 'Outer Marl', region: 'islands', latitude: 57.24, longitude: 2.33 },
  { name: 'Kittiwake Sound', region: 'islands', latitude: 56.89, longitude: 2.91 },
];

/** Towns of one region, the largest first. */
export function townsOf(region: DemoTown['region']): DemoTown[] {
  return TOWNS.filter((town) => town.region === region);
}
