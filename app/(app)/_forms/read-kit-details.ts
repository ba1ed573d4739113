import { asTyped, scale, type Typed } from "./typed-values";

const METRES_PER_MILLIMETRE = 0.001;
const KILOGRAMS_PER_GRAM = 0.001;

/** The form of an anchor, a cord or a shock cord in the shape of its schema: sizes were typed in mm, mass in g. */
export function readKitItemDetails(value: unknown): Typed {
  const typed = asTyped(value);
  const details = { ...typed, massKg: scale(typed.massKg, KILOGRAMS_PER_GRAM) };
  return typed.type === "anchor" ? { ...details, spec: readAnchorSpec(asTyped(typed.spec)) } : details;
}

function readAnchorSpec(spec: Typed): Typed {
  const read = millimetresToMetres(spec);
  return spec.class === "stake" ? { ...read, section: millimetresToMetres(asTyped(spec.section)) } : read;
}

/** Lengths are the keys that end in "M"; newtons, kilograms and words stay. */
function millimetresToMetres(part: Typed): Typed {
  return Object.fromEntries(
    Object.entries(part).map(([key, value]) => [
      key,
      /[a-z]M$/.test(key) ? scale(value, METRES_PER_MILLIMETRE) : value,
    ]),
  );
}
