/** U+2009: stands between every number and its unit, and never breaks the line in the fonts we use. */
export const THIN_SPACE = "\u2009";
const MINUS = "\u2212";

export function withUnit(text: string, unit: string): string {
  if (unit === "") return text;
  return unit === "°" ? `${text}°` : `${text}${THIN_SPACE}${unit}`;
}

function withMinus(text: string): string {
  return text.startsWith("-") ? MINUS + text.slice(1) : text;
}

/** A number with so many significant figures, without an exponent: 238 → "240", 0.648 → "0.65", 1 → "1.0". */
export function formatSignificant(value: number, figures = 2): string {
  if (!Number.isFinite(value)) return "–";
  const text = value.toPrecision(figures);
  return withMinus(text.includes("e") ? Number(text).toFixed(0) : text);
}

/** With so many decimals; never "−0". */
export function formatFixed(value: number, decimals = 0): string {
  if (!Number.isFinite(value)) return "–";
  const text = value.toFixed(decimals);
  return withMinus(Number(text) === 0 ? (0).toFixed(decimals) : text);
}

/** Cuts to significant figures towards zero, so that what is shown is never better than what was found. */
export function floorSignificant(value: number, figures = 2): number {
  if (value === 0 || !Number.isFinite(value)) return value;
  const step = 10 ** (Math.floor(Math.log10(Math.abs(value))) - figures + 1);
  // The small part keeps 0.65, which is 64.99999… steps in binary, at 0.65.
  return Math.trunc(value / step + Math.sign(value) * 1e-6) * step;
}

/** dependable ÷ demand, cut to two figures: 0.996 is "0.99", never "1.0". */
export function formatMargin(margin: number): string {
  return formatSignificant(floorSignificant(margin));
}

/** A share of one as a percentage, kept off 0 and 100 unless it is exactly that. */
export function formatChance(chance: number): string {
  if (chance > 0 && chance < 0.01) return withUnit("< 1", "%");
  if (chance < 1 && chance > 0.99) return withUnit("> 99", "%");
  return withUnit(formatFixed(chance * 100), "%");
}
