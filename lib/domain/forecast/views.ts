import type { Verdict } from "@/lib/calc/types";
import type { PlannedWind } from "./plan-wind";
import type { ForecastContent } from "./schema";

/** The camp as it is planned and as it would be with a forecast's wind. */
export interface OutlookView {
  /** "Skarn Edge now gives way: was holds". */
  readonly sentence: string;
  readonly isWorse: boolean;
  readonly before: OutlookSide;
  readonly after: OutlookSide;
}

export interface OutlookSide {
  readonly verdict: Verdict;
  readonly designGustMs: number | null;
  readonly holdsToGustMs: number | null;
}

/** A camp's forecasts: the newest fetched, what was accepted, and whether the last look failed. */
export interface CampForecastView {
  readonly campId: string;
  readonly campName: string;
  readonly campVersion: number;
  readonly days: readonly string[];
  readonly hasPosition: boolean;
  readonly latest: (ForecastContent & { readonly id: string }) | null;
  readonly accepted: AcceptedForecastView | null;
  readonly failure: { readonly sentence: string; readonly failedAt: string; readonly count: number } | null;
  /** What accepting the newest would change; null when it is accepted already, or can't be. */
  readonly proposal: { readonly planned: PlannedWind; readonly outlook: OutlookView } | null;
  /** Why the newest can't be accepted. */
  readonly hindrance: string | null;
}

export interface AcceptedForecastView extends ForecastContent {
  readonly acceptedAt: string;
  readonly acceptedByName: string;
  /** The camp is still planned for it: same nights, and nobody has typed another wind since. */
  readonly isPlanned: boolean;
}
