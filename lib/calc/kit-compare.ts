import { marginOf } from "./camp";
import { itemAt } from "./indexed";
import { proposePreparedPlan, type PlanOptions } from "./plan";
import { prepareCamp } from "./prepare-camp";
import { readPlan } from "./rig-anchor";
import type { AnchorSpec, CampInput } from "./types";

/** A kind of anchor that a kit can be made of. */
export interface KitChoice {
  readonly id: string;
  readonly name: string;
  readonly spec: AnchorSpec;
  /** Mass of one, kg. */
  readonly massKg: number;
}

export interface KitComparison {
  /** How many of each choice, in the order of the choices. */
  readonly counts: readonly number[];
  readonly massKg: number;
  /** Weakest margin at each camp with its best plan; 0 where a tie-out stays empty; null where it is not known. */
  readonly weakestByCamp: readonly (number | null)[];
  /** The smallest of those: what the kit is worth over the route; null when one is not known. */
  readonly weakest: number | null;
}

/** Every way to put `total` (0…12) pieces together from `kinds` (1…6) kinds, as counts per kind. */
export function enumerateKits(kinds: number, total: number): number[][] {
  if (kinds <= 1) return [[total]];
  return Array.from({ length: total + 1 }, (_, first) =>
    enumerateKits(kinds - 1, total - first).map((rest) => [first, ...rest]),
  ).flat();
}

/**
 * What each kit is worth over a route: the best staking plan at every camp with it, and the weakest margin of all.
 * `camps` need their analyses; their trays are replaced by the kit. Best first; among equals the lighter.
 */
export function compareKits(
  camps: readonly CampInput[],
  choices: readonly KitChoice[],
  kits: readonly (readonly number[])[],
  options: PlanOptions = { allowFound: false, allowDoubling: false },
): KitComparison[] {
  const prepared = camps.map((camp) =>
    prepareCamp({
      ...camp,
      placements: [],
      tray: choices.map((choice) => ({ ...choice, count: 0, found: false })),
    }),
  );
  const compared = kits.map((counts): KitComparison => {
    const weakestByCamp = prepared.map((camp) => {
      if (!camp.isComplete) return null;
      const tray = choices.map((choice, index) => ({ ...choice, count: itemAt(counts, index), found: false }));
      // Only the counts differ between kits, so everything that was computed for the camp stays good.
      const { placements } = proposePreparedPlan({ ...camp, input: { ...camp.input, tray } }, options, []);
      const margins = readPlan(camp, placements).map(({ tieOut, strength }) =>
        strength ? marginOf(strength.dependableN, tieOut.demandN) : 0,
      );
      return Math.min(...margins);
    });
    const known = weakestByCamp.filter((margin) => margin !== null);
    return {
      counts,
      massKg: choices.reduce((sum, choice, index) => sum + choice.massKg * itemAt(counts, index), 0),
      weakestByCamp,
      weakest: known.length === camps.length && camps.length > 0 ? Math.min(...known) : null,
    };
  });
  return compared.sort((a, b) => (b.weakest ?? -1) - (a.weakest ?? -1) || a.massKg - b.massKg);
}
