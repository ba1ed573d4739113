import { formatFixed } from "./numbers";

/** Decimal degrees, WGS 84, five decimals (about a metre): "57.21340° N, 9.20110° W". */
export function formatPosition(latitude: number, longitude: number): string {
  const north = latitude < 0 ? "S" : "N";
  const east = longitude < 0 ? "W" : "E";
  return `${formatFixed(Math.abs(latitude), 5)}° ${north}, ${formatFixed(Math.abs(longitude), 5)}° ${east}`;
}
