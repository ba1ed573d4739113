import { formatFixed, withUnit } from "./numbers";

const POINTS = ["N", "NNE", "NE", "ENE", "E", "ESE", "SE", "SSE", "S", "SSW", "SW", "WSW", "W", "WNW", "NW", "NNW"];

export function formatAngle(degrees: number): string {
  return withUnit(formatFixed(degrees), "°");
}

/** The nearest of sixteen points: 250 → "WSW". */
export function formatCompass(bearingDeg: number): string {
  const index = Math.round((((bearingDeg % 360) + 360) % 360) / 22.5) % 16;
  return POINTS[index] ?? "N";
}

/** "W to NW", or "any direction" when it isn't known or goes all round. */
export function formatWindRange(fromDeg: number | null, toDeg: number | null): string {
  if (fromDeg === null || toDeg === null || Math.abs(toDeg - fromDeg) >= 360) return "any direction";
  const from = formatCompass(fromDeg);
  const to = formatCompass(toDeg);
  return from === to ? from : `${from} to ${to}`;
}

/** "upright", "10° back", "5° forward": a positive lean points the head away from the pull. */
export function formatLean(leanDeg: number): string {
  const whole = Math.round(leanDeg);
  if (whole === 0) return "upright";
  return whole > 0 ? `${whole}° back` : `${-whole}° forward`;
}
