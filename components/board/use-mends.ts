"use client";

import { useEffect, useMemo, useState } from "react";
import type { Mend } from "@/lib/calc/types";
import { useBoard } from "./board-context";
import type { Spot } from "./plan-change";

interface Found {
  readonly key: string;
  readonly quick: readonly Mend[] | null;
  readonly pitch: readonly Mend[] | null;
}

const NOTHING: readonly Mend[] = [];

/** What would mend a tie-out: first what needs no new working out, then what pitches the shelter otherwise. */
export function useMends(spot: Spot, isWanted: boolean) {
  const { board } = useBoard();
  const { calc, campInput, state, pitches } = board;
  const { pitchId, tieOutId } = spot;
  // The plan and the pitches are what a mend hangs on; wind, ground and tray stay while the page is open.
  const key = useMemo(
    () => JSON.stringify([pitchId, tieOutId, state.placements, pitches.map((pitch) => pitch.details)]),
    [pitchId, tieOutId, state.placements, pitches],
  );
  const [found, setFound] = useState<Found | null>(null);
  const isOn = isWanted && board.waiting.size === 0;

  useEffect(() => {
    if (!isOn) return;
    let isHere = true;
    const ask = async () => {
      const input = { camp: campInput, spot: { pitchId, tieOutId } };
      const quick = await calc.run("quick-mends", input).catch(() => NOTHING);
      if (!isHere) return;
      setFound({ key, quick, pitch: null });
      const pitch = await calc.run("pitch-mends", input).catch(() => NOTHING);
      if (isHere) setFound({ key, quick, pitch });
    };
    void ask();
    return () => {
      isHere = false;
    };
  }, [isOn, key, campInput, calc, pitchId, tieOutId]);

  const current = found?.key === key ? found : null;
  const mends = [...(current?.quick ?? NOTHING), ...(current?.pitch ?? NOTHING)].toSorted(
    (a, b) => b.holdsToGustMs - a.holdsToGustMs,
  );
  return { mends, isSearching: isOn && !current?.pitch };
}
