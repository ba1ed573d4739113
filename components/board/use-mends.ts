"use client";

import { useQuery, type UseQueryResult } from "@tanstack/react-query";
import type { Mend } from "@/lib/calc/types";
import { useBoard } from "./board-context";
import type { Spot } from "./plan-change";

/** What would mend a tie-out: first what needs no new working out, then what pitches the shelter otherwise. */
export function useMends(
  spot: Spot,
  isWanted: boolean,
): { readonly mends: readonly Mend[]; readonly isSearching: boolean } {
  const { board } = useBoard();
  const { calc, campInput, state, pitches } = board;
  // The plan and the pitches are what a mend hangs on; wind, ground and tray stay while the page is open.
  const key = [spot, state.placements, pitches.map((pitch) => [pitch.id, pitch.details])];
  const options = { enabled: isWanted && board.waiting.size === 0, staleTime: Infinity, gcTime: 60_000, retry: false };
  const quick: UseQueryResult<readonly Mend[]> = useQuery({
    ...options,
    queryKey: ["quick-mends", ...key],
    queryFn: () => calc.run("quick-mends", { camp: campInput, spot }),
    networkMode: "always",
  });
  const pitched: UseQueryResult<readonly Mend[]> = useQuery({
    ...options,
    enabled: options.enabled && quick.isSuccess,
    queryKey: ["pitch-mends", ...key],
    queryFn: () => calc.run("pitch-mends", { camp: campInput, spot }),
    networkMode: "always",
  });
  const mends = [...(quick.data ?? []), ...(pitched.data ?? [])].toSorted((a, b) => b.holdsToGustMs - a.holdsToGustMs);
  return { mends, isSearching: quick.isFetching || pitched.isFetching };
}
