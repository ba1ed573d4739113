"use client";

import type { Mend, TieOutResult } from "@/lib/calc/types";
import { gustWords } from "@/components/results/verdict-words";
import { useBoard } from "./board-context";
import { changeBetween, isSameSpot } from "./plan-change";
import { useMends } from "./use-mends";

const MOST_SHOWN = 5;
const MOST_OF_A_KIND = 2;

/** Exchanges with every other tie-out would crowd out the rest. */
function withoutCrowding(mends: readonly Mend[]): readonly Mend[] {
  const shown = mends.filter(
    (mend, index) => mends.slice(0, index).filter((one) => one.kind === mend.kind).length < MOST_OF_A_KIND,
  );
  return shown.slice(0, MOST_SHOWN);
}

/** What would mend a tie-out, each with its gain; a touch does it. */
export function MendList({ result }: { readonly result: TieOutResult }) {
  const { board, preferences } = useBoard();
  const isWanted = result.verdict === "gives-way" || result.verdict === "thin";
  const { mends, isSearching } = useMends({ pitchId: result.pitchId, tieOutId: result.tieOutId }, isWanted);
  if (!isWanted) return null;
  if (mends.length === 0) {
    return (
      <p className="text-15 text-pencil">
        {isSearching ? "Looking for what would mend it…" : "Nothing in the tray or the pitch would mend it."}
      </p>
    );
  }
  return (
    <div>
      <h3 className="text-15 font-semibold">What would mend it</h3>
      <ul>
        {withoutCrowding(mends).map((mend) => (
          <li key={`${mend.kind} ${mend.title}`} className="border-b border-hair last:border-0">
            <button
              type="button"
              onClick={() => doMend(mend)}
              className="flex min-h-12 w-full items-baseline justify-between gap-4 py-1.5 text-left"
            >
              <span className="min-w-0">
                <span className="block text-15 font-semibold text-spruce">{mend.title}</span>
                <span className="block text-13 text-pencil">{mend.detail}</span>
              </span>
              <span className="shrink-0 text-15 font-bold whitespace-nowrap">
                <span className="sr-only">then holds to </span>
                <span aria-hidden="true">→ </span>
                {gustWords(mend.holdsToGustMs, preferences.speedUnit)}
              </span>
            </button>
          </li>
        ))}
      </ul>
      {isSearching && <p className="pt-1 text-13 text-pencil">Trying the pitch too…</p>}
    </div>
  );

  function doMend(mend: Mend) {
    if (mend.placements.length > 0) {
      const others = board.state.placements.filter((one) => !mend.placements.some((put) => isSameSpot(put, one)));
      const change = changeBetween(board.state.placements, [...others, ...mend.placements]);
      if (change) board.apply(change, `${mend.title}: done.`);
    }
    if (mend.pitchChange) {
      const pitch = board.pitches.find((one) => one.id === result.pitchId);
      if (!pitch) return;
      const { headingDeg, dimensions, lineLengthsM, patch } = mend.pitchChange;
      board.repitch(pitch.id, {
        headingDeg: headingDeg ?? pitch.details.headingDeg,
        patch: patch ?? pitch.details.patch,
        dimensions: { ...pitch.details.dimensions, ...dimensions },
        lineLengthsM: { ...pitch.details.lineLengthsM, ...lineLengthsM },
      });
    }
  }
}
