import geomagnetism from "geomagnetism";
import type { LatLon } from "@/lib/calc/places/utm";

/** Days on which WMM2025 is good (NOAA/NCEI and BGS, World Magnetic Model 2025; its end as the package has it). */
const FIRST_DAY = "2025-01-01";
const LAST_DAY = "2029-11-12";

/**
 * Angle from true to magnetic north on a day, degrees, positive east; null on days that the model does not cover.
 * @param altitudeM above the sea, taken for the height above the ellipsoid: the difference of under 110 m changes nothing seen
 * @param day yyyy-mm-dd
 */
export function declinationDeg(place: LatLon, altitudeM: number | null, day: string): number | null {
  if (day < FIRST_DAY || day > LAST_DAY) return null;
  const model = geomagnetism.model(new Date(`${day}T12:00:00Z`));
  return model.point([place.latitude, place.longitude, (altitudeM ?? 0) / 1000]).decl;
}
