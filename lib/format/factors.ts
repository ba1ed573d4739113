import {
  METRES_PER_FOOT,
  METRES_PER_MILE,
  METRES_PER_NAUTICAL_MILE,
  NEWTONS_PER_KILOGRAM_FORCE,
  NEWTONS_PER_POUND_FORCE,
} from "@/lib/calc/units";

/** What one of each shown unit is in SI. */
export const METRES_PER_SECOND = {
  "km/h": 1000 / 3600,
  "m/s": 1,
  mph: METRES_PER_MILE / 3600,
  knots: METRES_PER_NAUTICAL_MILE / 3600,
} as const;
export const NEWTONS = { N: 1, kgf: NEWTONS_PER_KILOGRAM_FORCE, lbf: NEWTONS_PER_POUND_FORCE } as const;
export const METRES = { m: 1, ft: METRES_PER_FOOT } as const;
