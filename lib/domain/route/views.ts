import type { Profile } from "@/lib/calc/route/types";
import type { RouteBreak, RoutePlace, RouteSettings, SimplifiedLine, TypedLeg } from "./schema";

/** A camp on the way. */
export interface RouteStop {
  readonly campId: string;
  readonly name: string;
  readonly version: number;
  readonly days: readonly string[];
  readonly latitude: number | null;
  readonly longitude: number | null;
  readonly altitudeM: number | null;
  /** Place along the line; null: not placed on it. */
  readonly atM: number | null;
  readonly leg: TypedLeg | null;
}

/** Evening light where a leg ends, in minutes after midnight of its day on the trip's clock; over 1440 after the next. */
export interface EveningLight {
  readonly light: "usual" | "light-all-night" | "sun-all-day" | "no-sun" | "dark-all-day";
  readonly sunsetMin: number | null;
  readonly duskMin: number | null;
}

export interface RouteLineView {
  readonly name: string;
  readonly source: "file" | "drawn";
  readonly pointCount: number;
  readonly lengthM: number;
  readonly breaks: readonly RouteBreak[];
  readonly simplified: SimplifiedLine;
  readonly profile: Profile;
  readonly places: readonly RoutePlace[];
  readonly remarks: readonly string[];
}

export interface RouteView {
  readonly tripId: string;
  readonly line: RouteLineView | null;
  readonly stops: readonly RouteStop[];
  /** The day home, after the last night. */
  readonly homeDay: string;
  readonly homeLeg: TypedLeg | null;
  /** One per leg: to each camp, and home; null where the place is not known. */
  readonly evenings: readonly (EveningLight | null)[];
  readonly settings: RouteSettings;
  /** 0: nothing saved yet. */
  readonly settingsVersion: number;
}

export type RuleTimes = Readonly<Record<"naismith" | "langmuir" | "tobler" | "din" | "tranter", number | null>>;
export type TimedRule = keyof RuleTimes;

export interface LegResult {
  /** Id of the camp it leads to, or "home". */
  readonly key: string;
  readonly fromName: string;
  readonly toName: string;
  readonly day: string;
  /** Where the figures are from; null: there are none. */
  readonly source: "line" | "typed" | null;
  /** Place along the line of its ends; null when it is not from the line. */
  readonly span: { readonly fromM: number; readonly toM: number } | null;
  readonly distanceM: number | null;
  readonly ascentM: number | null;
  readonly descentM: number | null;
  /** Hours of walking by each rule, at the group's pace; null where the rule needs more than is known. */
  readonly times: RuleTimes;
  readonly usedRule: TimedRule | null;
  readonly walkingH: number | null;
  /** With breaks. */
  readonly totalH: number | null;
  readonly setOffMin: number | null;
  readonly arriveMin: number | null;
  readonly evening: EveningLight | null;
  /** What is missing, in words: "the height of the way". */
  readonly missing: readonly string[];
  readonly warnings: readonly string[];
  readonly energyJ: { readonly low: number; readonly high: number } | null;
  readonly waterL: { readonly low: number | null; readonly high: number } | null;
}
