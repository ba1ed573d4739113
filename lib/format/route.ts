import type { Preferences } from "@/lib/domain/preferences";
import type { LegResult, RouteView } from "@/lib/domain/route/views";
import { describeDaylight } from "./daylight";
import { formatClimb, formatClock, formatDistance } from "./distances";
import { joinWords, numberWord, plural, startSentence } from "./words";

type LengthUnit = Preferences["lengthUnit"];

const nameOf = (leg: LegResult) => (leg.key === "home" ? "the way home" : `the way to ${leg.toName}`);

/** The verdict on the days as a headline, and what is to do next. */
export function describeRoute(
  legs: readonly LegResult[],
  view: Pick<RouteView, "line" | "stops" | "settings">,
  unit: LengthUnit,
): { readonly title: string; readonly lead: string } {
  if (view.stops.length === 0) {
    return view.line
      ? {
          title: "A way without camps",
          lead: "Make places of the file camps below, or add camps; then the days follow.",
        }
      : { title: "No route yet", lead: "Import a GPX file or draw the way, and add camps: the days follow from both." };
  }
  const tones = legs.map((leg) => ({ leg, tone: describeDaylight(leg, view.settings.pitchingMin).tone }));
  const dark = tones.filter((one) => one.tone === "dark");
  const lead = describeTotals(legs, unit);
  if (dark.length > 0) {
    const names = dark.map(({ leg }) => nameOf(leg));
    return {
      title: startSentence(
        `${joinWords(names.slice(0, 2))} ${names.length > 2 ? "and more end" : names.length > 1 ? "end" : "ends"} in the dark`,
      ),
      lead,
    };
  }
  const open = tones.filter((one) => one.tone === "unknown").length;
  if (open === legs.length)
    return { title: "Route and days", lead: `${lead} No day has an arrival yet: ${nextStep(legs, view)}` };
  if (open > 0)
    return {
      title: startSentence(`${numberWord(open)} of ${plural(legs.length, "day")} ${open === 1 ? "is" : "are"} open`),
      lead,
    };
  const thin = tones.filter((one) => one.tone === "thin").length;
  if (thin > 0)
    return {
      title: startSentence(`${numberWord(thin)} ${thin === 1 ? "day ends" : "days end"} with little light left`),
      lead,
    };
  return { title: "Every day ends in daylight", lead };
}

function nextStep(legs: readonly LegResult[], view: Pick<RouteView, "line" | "settings">): string {
  if (!view.line && legs.every((leg) => leg.distanceM === null))
    return "import a GPX file, draw the way or type its legs.";
  if (view.settings.setOffMinute === null) return "say below when you set off.";
  return "look at what each day misses.";
}

function describeTotals(legs: readonly LegResult[], unit: LengthUnit): string {
  const known = legs.filter((leg) => leg.distanceM !== null);
  if (known.length === 0) return "";
  const distanceM = known.reduce((sum, leg) => sum + (leg.distanceM ?? 0), 0);
  const climbs = known.filter((leg) => leg.ascentM !== null);
  const up = climbs.reduce((sum, leg) => sum + (leg.ascentM ?? 0), 0);
  const parts = [
    `${formatDistance(distanceM, unit)} in ${plural(known.length, "leg")}`,
    climbs.length === known.length ? `${formatClimb(up, unit)} up` : null,
    known.length < legs.length ? `${plural(legs.length - known.length, "leg")} not known` : null,
  ];
  return `${parts.filter((part) => part !== null).join(", ")}.`;
}

/** A day's way on paper: "From Otterbed: 10.4 km, 430 m up, 50 m down." and when it ends. */
export function describeWay(leg: LegResult, pitchingMin: number | null, unit: LengthUnit): readonly string[] {
  if (leg.distanceM === null) return [];
  const parts = [
    formatDistance(leg.distanceM, unit),
    leg.ascentM === null ? null : `${formatClimb(leg.ascentM, unit)} up`,
    leg.descentM === null ? null : `${formatClimb(leg.descentM, unit)} down`,
  ];
  const from = leg.fromName === "Start" ? "From the start" : `From ${leg.fromName}`;
  const length = `${from}: ${parts.filter((part) => part !== null).join(", ")}.`;
  if (leg.arriveMin === null || leg.setOffMin === null) return [length];
  const hours = `${formatClock(leg.setOffMin)} to ${formatClock(leg.arriveMin)}.`;
  return [length, `${hours} ${describeDaylight(leg, pitchingMin).text}`];
}
