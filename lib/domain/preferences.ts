import { z } from "zod";
import { PAPER_SIZES } from "./paper/schema";

export const SPEED_UNITS = ["km/h", "m/s", "mph", "knots", "Beaufort"] as const;
export const FORCE_UNITS = ["N", "kgf", "lbf"] as const;
export const LENGTH_UNITS = ["m", "ft"] as const;

export const preferencesSchema = z.object({
  speedUnit: z.enum(SPEED_UNITS),
  forceUnit: z.enum(FORCE_UNITS),
  lengthUnit: z.enum(LENGTH_UNITS),
  paperSize: z.enum(PAPER_SIZES),
});
export type Preferences = z.infer<typeof preferencesSchema>;

export const METRIC: Preferences = { speedUnit: "km/h", forceUnit: "N", lengthUnit: "m", paperSize: "A4" };
