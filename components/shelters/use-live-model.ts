"use client";

import { useMemo, useState } from "react";
import { buildShelter, checkShelterSpec } from "@/lib/calc/shelter-kinds";
import type { ShelterModel, ShelterSpec } from "@/lib/calc/types";
import { readDecimal } from "@/lib/domain/form-data";

/** Typed metres (or feet) as numbers; what is empty or no number is left out, so that the typical value is drawn. */
export function readLengths(
  typed: Readonly<Record<string, string>>,
  metresPerUnit: number,
): Readonly<Record<string, number>> {
  return Object.fromEntries(
    Object.entries(typed).flatMap(([key, text]) => {
      const value = readDecimal(text);
      return typeof value === "number" ? [[key, value * metresPerUnit] as const] : [];
    }),
  );
}

/** The model of a spec while it is typed, what is wrong with it by field, and the last one that could be built. */
export function useLiveModel(spec: ShelterSpec): {
  readonly model: ShelterModel;
  readonly problems: Readonly<Record<string, readonly string[]>>;
} {
  const key = JSON.stringify(spec);
  const checked = useMemo(() => {
    const read = JSON.parse(key) as ShelterSpec;
    const found = checkShelterSpec(read);
    const problems: Record<string, string[]> = {};
    for (const { field, message } of found) (problems[field] ??= []).push(message);
    return { problems, model: found.length === 0 ? buildShelter(read) : null };
  }, [key]);
  const [last, setLast] = useState(() => checked.model ?? buildShelter({ ...spec, dimensions: {}, lineLengthsM: {} }));
  if (checked.model && checked.model !== last) setLast(checked.model);
  return { model: checked.model ?? last, problems: checked.problems };
}
