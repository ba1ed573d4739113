import { formatFixed, withUnit } from "./numbers";

/** Grams below a kilogram, else kilograms with one decimal: "412 g", "1.9 kg". */
export function formatMass(kilograms: number): string {
  const grams = Math.round(kilograms * 1000);
  if (Math.abs(grams) < 1000) return withUnit(formatFixed(grams), "g");
  return withUnit(formatFixed(kilograms, 1), "kg");
}
