import type { AnchorSpec } from "@/lib/calc/types";

/** Driven into the ground, so that it can lean, stand out, be doubled and be backed by a rock. */
export const isDriven = (spec: AnchorSpec): boolean => spec.class === "stake";
