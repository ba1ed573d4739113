import { requireInRange } from "./constants";
import { groundRow } from "./ground";
import type { GroundKind } from "./types";

/**
 * Pulls near the size of the design gust in one hour of strong wind: one in five minutes.
 * Load peaks come at 0.05–0.1 Hz (180–360 an hour, from memory); about one in twenty is near the largest, and only those
 * are counted, since the law below was found for equal pulls (judgement).
 */
export const STRONG_PULLS_PER_HOUR = 12;

/** Exponent of Long & Vanneste for a driven pile in medium ground with one-way loading. */
const BASE_EXPONENT = 0.17;

/** How an anchor came into the ground: F_I of Long & Vanneste. */
const INSTALLATION_FACTORS = { driven: 1, backfilled: 1.4, drilled: 1.3 } as const;
export type Installation = keyof typeof INSTALLATION_FACTORS;

/**
 * Load character F_L: 1 for pulls that fall back to nothing; falls to 0 for a steady pull (R = min/max = 1).
 * With elastic cord the line never goes slack: R ≈ 0.75, half-way between the published 1.0 at +0.5 and 0 at 1 (judgement).
 */
const SHOCK_CORD_LOAD_FACTOR = 0.5;

/**
 * Pulls that count in a windy night.
 * @param hours hours of strong wind, 0…24
 */
export function pullCyclesInNight(hours: number): number {
  requireInRange("strongWindHours", hours, 0, 24);
  return hours * STRONG_PULLS_PER_HOUR;
}

export interface LooseningInput {
  /** Pulls of design size, 0…10⁶. */
  readonly cycles: number;
  readonly ground: GroundKind;
  readonly hasShockCord: boolean;
  readonly installation: Installation;
}

/** Exponent t = 0.17·F_L·F_I·F_D (Long & Vanneste 1994, factors from memory). */
export function looseningExponent(input: Omit<LooseningInput, "cycles">): number {
  const loadFactor = input.hasShockCord ? SHOCK_CORD_LOAD_FACTOR : 1;
  return (
    BASE_EXPONENT * loadFactor * INSTALLATION_FACTORS[input.installation] * groundRow(input.ground).looseningFactor
  );
}

/**
 * Share of the ground's resistance left after N repeated pulls, N^−t, 0…1; 1 for at most one pull.
 * The law was published for the stiffness of the ground around piles in sand; using it for what a stake holds, and in
 * other grounds, is judgement on the safe side.
 * @throws RangeError for cycles outside 0…10⁶
 * Source: Long & Vanneste (1994), J. Geotech. Eng. 120(1) (factors from memory).
 */
export function looseningFactor(input: LooseningInput): number {
  requireInRange("pullCycles", input.cycles, 0, 1e6);
  return input.cycles <= 1 ? 1 : input.cycles ** -looseningExponent(input);
}
