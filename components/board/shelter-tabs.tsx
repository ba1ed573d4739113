"use client";

import { StateMark } from "@/components/drawing/state-mark";
import { useBoard } from "./board-context";

/** The shelters of the camp; the shown one is underlined. */
export function ShelterTabs() {
  const { board, pitch, selectPitch } = useBoard();
  return (
    <ul aria-label="Shelters" className="flex flex-wrap gap-x-5">
      {board.pitches.map((one) => {
        const verdict = board.result.shelters.find((each) => each.pitchId === one.id)?.verdict ?? "unknown";
        const isShown = one.id === pitch.id;
        const sleepers = one.sleeperIds.length;
        return (
          <li key={one.id}>
            <button
              type="button"
              aria-current={isShown ? "true" : undefined}
              onClick={() => selectPitch(one.id)}
              className={`flex min-h-11 items-center gap-2 border-b-2 text-15 ${isShown ? "border-ink font-semibold" : "border-transparent text-pencil hover:border-hair"}`}
            >
              <StateMark verdict={board.waiting.has(one.id) ? "unknown" : verdict} size={14} />
              {one.name}
              {sleepers > 0 && (isShown ? `, ${sleepers} sleep here` : `, ${sleepers}`)}
            </button>
          </li>
        );
      })}
    </ul>
  );
}
