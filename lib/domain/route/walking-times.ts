import type { LegFacts } from "@/lib/calc/route/types";
import { din33466H, langmuirH, naismithH, TOBLER_OFF_PATH, tranterH } from "@/lib/calc/route/walking-time";
import { lowerFitness, TRANTER_FITNESS } from "@/lib/calc/tables/tranter";
import type { RouteSettings } from "./schema";
import type { RuleTimes, TimedRule } from "./views";

const NO_TIMES: RuleTimes = { naismith: null, langmuir: null, tobler: null, din: null, tranter: null };

interface Timed {
  readonly times: RuleTimes;
  readonly warnings: readonly string[];
}

function correctByTranter(hours: number, settings: RouteSettings): { hours: number | null; warnings: string[] } {
  const fitness = TRANTER_FITNESS.find((one) => one === settings.fitness);
  if (fitness === undefined) return { hours: null, warnings: [] };
  const row = lowerFitness(fitness, settings.linesLower);
  const corrected = row && tranterH(hours, row);
  if (corrected !== null) return { hours: corrected, warnings: [] };
  return { hours: null, warnings: ["Tranter\u2019s table calls this day too much for that fitness and load."] };
}

/** Hours by each rule. The pace stretches the rules; Tranter's table has its own measure of fitness. */
export function timeLeg(facts: LegFacts, settings: RouteSettings): Timed {
  const { distanceM, ascentM, descentM, gentleDescentM, steepDescentM, toblerH } = facts;
  if (ascentM === null) return { times: NO_TIMES, warnings: [] };
  const pace = settings.paceRatio ?? 1;
  const byNaismith = naismithH(distanceM, ascentM);
  const tranter = correctByTranter(byNaismith, settings);
  const times: RuleTimes = {
    naismith: byNaismith / pace,
    langmuir:
      gentleDescentM === null || steepDescentM === null
        ? null
        : langmuirH(distanceM, ascentM, gentleDescentM, steepDescentM) / pace,
    tobler: toblerH === null ? null : toblerH / pace / (settings.isOffPath ? TOBLER_OFF_PATH : 1),
    din: descentM === null ? null : din33466H(distanceM, ascentM, descentM) / pace,
    tranter: tranter.hours,
  };
  return { times, warnings: tranter.warnings };
}

/** The rule that is used: the one chosen, or the slowest of those that give a time. */
export function chooseRule(times: RuleTimes, rule: RouteSettings["rule"]): TimedRule | null {
  if (rule === "naismith" && times.tranter !== null) return "tranter";
  if (rule !== "slowest") return times[rule] === null ? null : rule;
  const known = (Object.keys(times) as TimedRule[]).filter((name) => times[name] !== null);
  return known.sort((a, b) => (times[b] ?? 0) - (times[a] ?? 0))[0] ?? null;
}
