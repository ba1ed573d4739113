import { normaliseLongitude, type LatLon } from "@/lib/calc/places/utm";

const DEGREE_M = 111_320;

export interface PlanProjection {
  readonly toXy: (place: LatLon) => { readonly x: number; readonly y: number };
  readonly toPlace: (x: number, y: number) => LatLon;
  readonly metresPerPixel: number;
}

/** North up, true to scale at its middle: good for the few dozen kilometres of a walk, also across the antimeridian. */
export function projectAround(
  centre: LatLon,
  metresPerPixel: number,
  size: { readonly width: number; readonly height: number },
): PlanProjection {
  const eastM = DEGREE_M * Math.max(0.01, Math.cos((centre.latitude * Math.PI) / 180));
  return {
    metresPerPixel,
    toXy: (place) => ({
      x: size.width / 2 + (normaliseLongitude(place.longitude - centre.longitude) * eastM) / metresPerPixel,
      y: size.height / 2 - ((place.latitude - centre.latitude) * DEGREE_M) / metresPerPixel,
    }),
    toPlace: (x, y) => ({
      latitude: Math.min(90, Math.max(-90, centre.latitude - ((y - size.height / 2) * metresPerPixel) / DEGREE_M)),
      longitude: normaliseLongitude(centre.longitude + ((x - size.width / 2) * metresPerPixel) / eastM),
    }),
  };
}

/** The projection that shows all places with a margin; a box of 10 km around a single one. */
export function projectAll(
  places: readonly LatLon[],
  size: { readonly width: number; readonly height: number },
  margin = 56,
): PlanProjection | null {
  const [first] = places;
  if (!first) return null;
  const easts = places.map((place) => normaliseLongitude(place.longitude - first.longitude));
  const norths = places.map((place) => place.latitude);
  const [west, east] = [Math.min(...easts), Math.max(...easts)];
  const [south, north] = [Math.min(...norths), Math.max(...norths)];
  const centre = { latitude: (south + north) / 2, longitude: normaliseLongitude(first.longitude + (west + east) / 2) };
  const widthM = (east - west) * DEGREE_M * Math.cos((centre.latitude * Math.PI) / 180);
  const heightM = (north - south) * DEGREE_M;
  const room = (pixels: number) => Math.max(40, pixels - 2 * margin);
  const scale = Math.max(widthM / room(size.width), heightM / room(size.height));
  return projectAround(centre, scale > 0.5 ? scale : 10_000 / size.width, size);
}
