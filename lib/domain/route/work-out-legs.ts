import { legBetween, runningTotals, type RunningTotals } from "@/lib/calc/route/climb";
import { HEAT_ROWS, TERRAIN_FACTORS, waterWhileWalkingL } from "@/lib/calc/route/energy";
import { legEnergy } from "@/lib/calc/route/leg-energy";
import type { LegFacts } from "@/lib/calc/route/types";
import { withBreaksH } from "@/lib/calc/route/walking-time";
import type { RouteSettings, TypedLeg } from "./schema";
import type { LegResult, RouteLineView, RouteView } from "./views";
import { chooseRule, timeLeg } from "./walking-times";

type Span = { readonly fromM: number; readonly toM: number };

interface LegEnds {
  readonly key: string;
  readonly fromName: string;
  readonly toName: string;
  readonly day: string;
  readonly typed: TypedLeg | null;
  /** Places along the line; null where an end is not on it. */
  readonly fromM: number | null;
  readonly toM: number | null;
}

/** The ends of each leg: from the start to the first camp, from camp to camp, and home. */
function listEnds(view: Omit<RouteView, "evenings">): readonly LegEnds[] {
  const { stops, line } = view;
  const legs = stops.map((stop, index): LegEnds => {
    const before = stops[index - 1];
    return {
      key: stop.campId,
      fromName: before?.name ?? "Start",
      toName: stop.name,
      day: stop.days[0] ?? view.homeDay,
      typed: stop.leg,
      fromM: before ? before.atM : line && 0,
      toM: stop.atM,
    };
  });
  const last = stops[stops.length - 1];
  if (!last) return legs;
  const home = { key: "home", fromName: last.name, toName: "End", day: view.homeDay, typed: view.homeLeg };
  return [...legs, { ...home, fromM: last.atM, toM: line && line.lengthM }];
}

function typedFacts(typed: TypedLeg | null): LegFacts | null {
  if (!typed || typed.distanceM === null) return null;
  const { distanceM, ascentM, descentM } = typed;
  return { distanceM, ascentM, descentM, gentleDescentM: null, steepDescentM: null, toblerH: null };
}

interface Measured {
  readonly source: LegResult["source"];
  readonly span: Span | null;
  readonly facts: LegFacts | null;
  readonly missing: readonly string[];
}

function measure(ends: LegEnds, totals: RunningTotals | null): Measured {
  const { fromM, toM } = ends;
  if (totals && fromM !== null && toM !== null && fromM <= toM) {
    const facts = legBetween(totals, fromM, Math.min(toM, totals.profile.lengthM));
    const missing = facts.ascentM === null ? ["heights along the way"] : [];
    return { source: "line", span: { fromM, toM }, facts, missing };
  }
  const facts = typedFacts(ends.typed);
  if (facts) {
    return { source: "typed", span: null, facts, missing: facts.ascentM === null ? ["the ascent"] : [] };
  }
  const isBackwards = fromM !== null && toM !== null && fromM > toM;
  const place = isBackwards ? `${ends.toName} after ${ends.fromName} on the way` : "its length";
  return { source: null, span: null, facts: null, missing: [place] };
}

function estimateEnergy(line: RouteLineView | null, span: Span | null, hours: number | null, settings: RouteSettings) {
  const { bodyKg, packKg, terrain, heat } = settings;
  if (!line || !span || hours === null || bodyKg === null || packKg === null || terrain === null) {
    return { energyJ: null, waterL: null };
  }
  const [kind, harsh] = TERRAIN_FACTORS[terrain].map((factor) =>
    legEnergy(line.profile, { ...span, hours }, { bodyKg, packKg, terrain: factor }),
  );
  if (!kind || !harsh) return { energyJ: null, waterL: null };
  const known = HEAT_ROWS.find((row) => row === heat);
  const water = known && waterWhileWalkingL(harsh.powerW, Math.min(24, hours), known);
  return {
    energyJ: { low: kind.energyJ, high: harsh.energyJ },
    waterL: water ? { low: water.lowL, high: water.highL } : null,
  };
}

/** Distance, climb, hours, arrival and light of every leg. Runs on the server and, while a camp is dragged, in the browser. */
export function workOutLegs(view: RouteView): readonly LegResult[] {
  const { line, settings } = view;
  const totals = line && runningTotals(line.profile);
  return listEnds(view).map((ends, index): LegResult => {
    const { source, span, facts, missing } = measure(ends, totals);
    const { times, warnings } = facts
      ? timeLeg(facts, settings)
      : { times: { naismith: null, langmuir: null, tobler: null, din: null, tranter: null }, warnings: [] };
    const usedRule = chooseRule(times, settings.rule);
    const walkingH = usedRule && times[usedRule];
    const totalH = walkingH === null ? null : withBreaksH(walkingH, settings.breakMinPerHour ?? 0);
    const setOffMin = ends.typed?.setOffMinute ?? settings.setOffMinute;
    const isRuleShort = facts !== null && facts.ascentM !== null && usedRule === null;
    return {
      key: ends.key,
      fromName: ends.fromName,
      toName: ends.toName,
      day: ends.day,
      source,
      span,
      distanceM: facts && facts.distanceM,
      ascentM: facts && facts.ascentM,
      descentM: facts && facts.descentM,
      times,
      usedRule,
      walkingH,
      totalH,
      setOffMin,
      arriveMin: totalH === null || setOffMin === null ? null : setOffMin + totalH * 60,
      evening: view.evenings[index] ?? null,
      missing: [
        ...missing,
        ...(isRuleShort ? ["the slopes or the descent that this rule needs"] : []),
        ...(setOffMin === null ? ["when you set off"] : []),
      ],
      warnings,
      ...estimateEnergy(line, span, walkingH, settings),
    };
  });
}
