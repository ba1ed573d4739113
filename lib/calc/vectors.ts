import type { Vec3 } from "./types";

/** Small vector helpers of the shelter geometry; all lengths in metres. */
export const vec = (x: number, y: number, z: number): Vec3 => ({ x, y, z });
export const add = (a: Vec3, b: Vec3): Vec3 => vec(a.x + b.x, a.y + b.y, a.z + b.z);
export const subtract = (a: Vec3, b: Vec3): Vec3 => vec(a.x - b.x, a.y - b.y, a.z - b.z);
export const scale = (a: Vec3, factor: number): Vec3 => vec(a.x * factor, a.y * factor, a.z * factor);
export const mix = (a: Vec3, b: Vec3, share: number): Vec3 =>
  vec(a.x + (b.x - a.x) * share, a.y + (b.y - a.y) * share, a.z + (b.z - a.z) * share);
export const dot = (a: Vec3, b: Vec3): number => a.x * b.x + a.y * b.y + a.z * b.z;
export const cross = (a: Vec3, b: Vec3): Vec3 =>
  vec(a.y * b.z - a.z * b.y, a.z * b.x - a.x * b.z, a.x * b.y - a.y * b.x);
export const lengthOf = (a: Vec3): number => Math.sqrt(dot(a, a));
export const distance = (a: Vec3, b: Vec3): number => lengthOf(subtract(a, b));

/** Bearing of a point seen from the origin, degrees clockwise from +y, 0…360. */
export const bearingDeg = (a: { readonly x: number; readonly y: number }): number => {
  const degrees = (Math.atan2(a.x, a.y) * 180) / Math.PI;
  return degrees < 0 ? degrees + 360 : degrees;
};
