import { METRES } from "@/lib/format/factors";

/** What came from a form, before a schema has looked at it. */
export type Typed = Readonly<Record<string, unknown>>;

export function asTyped(value: unknown): Typed {
  return typeof value === "object" && value !== null && !Array.isArray(value) ? (value as Typed) : {};
}

/** A typed number in SI; whatever is no number stays as it is, so that the schema names the field. */
export function scale(value: unknown, factor: number): unknown {
  return typeof value === "number" ? value * factor : value;
}

export function scaleAll(values: Typed, factor: number): Typed {
  return Object.fromEntries(Object.entries(values).map(([key, value]) => [key, scale(value, factor)]));
}

/** Without the fields that were left empty. */
export function dropEmpty(values: Typed): Typed {
  return Object.fromEntries(Object.entries(values).filter(([, value]) => value !== null && value !== ""));
}

export function metresPerUnit(unit: unknown): number {
  return unit === "ft" ? METRES.ft : METRES.m;
}
