import type { Utm } from "@/lib/calc/places/utm";
import { formatFixed } from "./numbers";

/** Decimal degrees, WGS 84, five decimals (about a metre): "57.21340° N, 9.20110° W". */
export function formatPosition(latitude: number, longitude: number): string {
  const north = latitude < 0 ? "S" : "N";
  const east = longitude < 0 ? "W" : "E";
  return `${formatFixed(Math.abs(latitude), 5)}° ${north}, ${formatFixed(Math.abs(longitude), 5)}° ${east}`;
}

/** "32V 485361 6866520": cut to the metre, as map references are. */
export function formatUtm(utm: Utm): string {
  const metres = (value: number) => String(Math.floor(value + 1e-6));
  return `${utm.zone}${utm.band} ${metres(utm.eastingM)} ${metres(utm.northingM)}`;
}

/** "4.1° east", "0.3° west". */
export function formatDeclination(degrees: number): string {
  const size = formatFixed(Math.abs(degrees), 1);
  if (Number(size) === 0) return "0.0°";
  return `${size}° ${degrees < 0 ? "west" : "east"}`;
}
