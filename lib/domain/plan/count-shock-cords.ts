import type { Placement } from "@/lib/calc/types";

/** Says why the placements need more shock cords than the kit has; null = they don't. */
export function findShockCordFault(placements: readonly Placement[], shockCordCount: number): string | null {
  const used = placements.filter((placement) => placement.shockCord).length;
  if (used <= shockCordCount) return null;
  return shockCordCount === 0
    ? "The kit has no shock cord."
    : `All ${shockCordCount} shock cords are in use. Take one off first.`;
}
