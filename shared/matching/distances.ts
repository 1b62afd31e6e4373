/** Great-circle distances between towns. */

/** Mean radius of the Earth in kilometres: IUGG 1980, (2a + b)/3 of the reference ellipsoid (value from domain practice, as given by IUGG). */
const EARTH_RADIUS_KM = 6371.0088;

export interface Coordinates {
  /** Degrees. */
  latitude: number;
  longitude: number;
}

/** Kilometres by the haversine formula (Sinnott 1984, Virtues of the Haversine, Sky and Telescope 68). */
export function distanceKm(a: Coordinates, b: Coordinates): number {
  const radians = Math.PI / 180;
  const north = Math.sin(((b.latitude - a.latitude) * radians) / 2);
  const east = Math.sin(((b.longitude - a.longitude) * radians) / 2);
  const h = north * north + Math.cos(a.latitude * radians) * Math.cos(b.latitude * radians) * east * east;
  return 2 * EARTH_RADIUS_KM * Math.asin(Math.min(1, Math.sqrt(h)));
}
