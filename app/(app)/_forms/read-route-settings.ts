import { LONG_UNITS } from "@/lib/format/distances";
import { asTyped, metresPerUnit, scale, type Typed } from "./typed-values";

/** "07:30" as minutes after midnight; empty is null, and anything else stays for the schema to name. */
function readClock(value: unknown): unknown {
  if (value === undefined || value === null || value === "") return null;
  const [, hours, minutes] = /^(\d{1,2}):(\d{2})(?::\d{2})?$/.exec(String(value)) ?? [];
  if (hours === undefined || Number(hours) > 23 || Number(minutes) > 59) return value;
  return Number(hours) * 60 + Number(minutes);
}

function readLeg(value: unknown, lengthUnit: unknown): Typed {
  const leg = asTyped(value);
  const metres = metresPerUnit(lengthUnit);
  const long = lengthUnit === "ft" ? LONG_UNITS.ft.metres : LONG_UNITS.m.metres;
  return {
    distanceM: scale(leg.distanceM ?? null, long),
    ascentM: scale(leg.ascentM ?? null, metres),
    descentM: scale(leg.descentM ?? null, metres),
    setOffMinute: readClock(leg.setOffMinute),
  };
}

/** The form of how the group walks in the shape of its schema: metres, minutes, shares of one. */
export function readRouteSettings(input: Typed): Typed {
  const settings = asTyped(input.settings);
  const legs = Array.isArray(input.legs) ? (input.legs as unknown[]) : [];
  return {
    settings: {
      ...settings,
      paceRatio: scale(settings.paceRatio ?? null, 0.01),
      setOffMinute: readClock(settings.setOffMinute),
    },
    legs: legs.map((one) => ({ campId: asTyped(one).campId, leg: readLeg(asTyped(one).leg, input.lengthUnit) })),
    homeLeg: readLeg(input.homeLeg, input.lengthUnit),
  };
}
