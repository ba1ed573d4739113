"use client";

import type { ReactNode } from "react";
import { StateMark } from "@/components/drawing/state-mark";
import { VERDICT_TONES } from "@/components/results/verdict-words";
import type { TieOutResult } from "@/lib/calc/types";
import { formatForce } from "@/lib/format/forces";
import { formatMargin } from "@/lib/format/numbers";
import { useBoard } from "./board-context";

interface PhoneSheetProps {
  readonly result: TieOutResult;
  readonly isOpen: boolean;
  readonly onToggle: (isOpen: boolean) => void;
  readonly children: ReactNode;
}

/** On a phone the selected tie-out is explained on a sheet that stays at the bottom and folds away. */
export function PhoneSheet({ result, isOpen, onToggle, children }: PhoneSheetProps) {
  const { preferences, anchors, board } = useBoard();
  const isWaiting = board.waiting.has(result.pitchId);
  const anchor = result.placement ? anchors.get(result.placement.anchorId) : null;
  const pull =
    result.demandN === null || isWaiting ? null : `pull ${formatForce(result.demandN, preferences.forceUnit)}`;
  const holds =
    result.capacity?.status === "ok" && !isWaiting
      ? `holds ${formatForce(result.capacity.dependableN, preferences.forceUnit)}`
      : null;
  return (
    <details
      open={isOpen}
      onToggle={(event) => onToggle(event.currentTarget.open)}
      aria-label={`Tie-out ${result.number}`}
      className="fixed inset-x-0 bottom-0 z-30 rounded-t-sheet border-t border-hair bg-sheet shadow-float"
    >
      <summary className="flex min-h-16 list-none items-center gap-3 px-5 py-2 [&::-webkit-details-marker]:hidden">
        <span className="text-24 font-bold text-ember">{result.number}</span>
        <span className="min-w-0 flex-1">
          <span className="block truncate text-15 font-bold">{result.name}</span>
          <span className="block truncate text-13 text-pencil">
            {[anchor?.name ?? "no anchor", pull, holds].filter(Boolean).join(" · ")}
          </span>
        </span>
        <StateMark verdict={isWaiting ? "unknown" : result.verdict} />
        <span className={`text-24 font-bold ${VERDICT_TONES[result.verdict]}`}>
          <span className="sr-only">margin </span>
          {isWaiting || result.margin === null ? "–" : formatMargin(result.margin)}
        </span>
      </summary>
      <div className="max-h-[38dvh] overflow-y-auto border-t border-hair pt-3">{children}</div>
    </details>
  );
}
