import { asTyped, dropEmpty, metresPerUnit, scaleAll, type Typed } from "./typed-values";

/** The form of a shelter in the shape of its schema: metres, and empty lengths left out. */
export function readShelterDetails(value: unknown, lengthUnit: unknown): Typed {
  const typed = asTyped(value);
  const spec = asTyped(typed.spec);
  return { ...typed, massKg: typed.massKg ?? null, spec: { ...spec, ...readLengths(spec, lengthUnit) } };
}

/** The form of a pitch: heading and patch as they are, heights and lines in metres. */
export function readPitchDetails(value: unknown, lengthUnit: unknown): Typed {
  const typed = asTyped(value);
  return { ...typed, ...readLengths(typed, lengthUnit) };
}

function readLengths(typed: Typed, lengthUnit: unknown): Typed {
  const metres = metresPerUnit(lengthUnit);
  return {
    dimensions: scaleAll(dropEmpty(asTyped(typed.dimensions)), metres),
    lineLengthsM: scaleAll(dropEmpty(asTyped(typed.lineLengthsM)), metres),
  };
}
