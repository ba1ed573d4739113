import geodesic from "geographiclib-geodesic";
import { normaliseLongitude, type LatLon } from "@/lib/calc/places/utm";

const { WGS84 } = geodesic.Geodesic;
const DISTANCE = geodesic.Geodesic.DISTANCE;

/** Shortest way on the WGS 84 ellipsoid, m (C. F. F. Karney, J. Geodesy 87 (2013) 43). */
export function distanceM(from: LatLon, to: LatLon): number {
  return WGS84.Inverse(from.latitude, from.longitude, to.latitude, to.longitude, DISTANCE).s12 ?? 0;
}

/** The place a share of the way from one place to the next, along the shortest way. @param share 0…1 */
export function placeBetween(from: LatLon, to: LatLon, share: number): LatLon {
  if (share <= 0) return from;
  if (share >= 1) return to;
  const { s12 = 0, azi1 = 0 } = WGS84.Inverse(from.latitude, from.longitude, to.latitude, to.longitude);
  const { lat2 = from.latitude, lon2 = from.longitude } = WGS84.Direct(
    from.latitude,
    from.longitude,
    azi1,
    s12 * share,
  );
  return { latitude: lat2, longitude: normaliseLongitude(lon2) };
}
