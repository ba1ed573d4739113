"use client";

import { useDroppable } from "@dnd-kit/core";
import { memo } from "react";
import type { ReactNode } from "react";
import { StateMark, stateWord } from "@/components/drawing/state-mark";
import { ForceBars, forceScale } from "@/components/results/force-bars";
import { VERDICT_TONES } from "@/components/results/verdict-words";
import type { TieOutResult } from "@/lib/calc/types";
import type { Preferences } from "@/lib/domain/preferences";
import { formatForce } from "@/lib/format/forces";
import { formatMargin } from "@/lib/format/numbers";
import { useBoard } from "./board-context";
import { spotTargetId } from "./drag-ids";
import { isSameSpot } from "./plan-change";

/** The tie-outs of a shelter, the most deserving first; the selected one opens. */
export function RankedList({ detail }: { readonly detail: ReactNode }) {
  const { shelter, selected, touchSpot, preferences, board, pitch } = useBoard();
  const { scaleN, tickN } = forceScale(shelter.tieOuts.map((one) => one.demandN));
  return (
    <section aria-labelledby="ranked-heading">
      <h2 id="ranked-heading" className="sr-only">
        Tie-outs by priority
      </h2>
      <p className="flex justify-between gap-3 px-5 pb-2 text-13 text-pencil" aria-hidden="true">
        <span className="pl-[3.25rem]">
          by priority · <span className="font-semibold text-ember">pull</span> and capacity, {preferences.forceUnit}
        </span>
        <span>margin</span>
      </p>
      <ol className="border-t border-hair">
        {shelter.tieOuts.map((one) => {
          const isSelected = isSameSpot(selected, one);
          return (
            <TieOutRow
              key={one.tieOutId}
              result={one}
              scaleN={scaleN}
              tickN={tickN}
              forceUnit={preferences.forceUnit}
              isSelected={isSelected}
              isWaiting={board.waiting.has(pitch.id)}
              onTouch={touchSpot}
            >
              {isSelected ? detail : null}
            </TieOutRow>
          );
        })}
      </ol>
    </section>
  );
}

/** Nearly no pull: the margin is cut off where more says nothing. */
function marginWords(margin: number): string {
  return margin >= 99 ? "99+" : formatMargin(margin);
}

interface TieOutRowProps {
  readonly result: TieOutResult;
  readonly scaleN: number;
  readonly tickN: number;
  readonly forceUnit: Preferences["forceUnit"];
  readonly isSelected: boolean;
  readonly isWaiting: boolean;
  readonly onTouch: (spot: { pitchId: string; tieOutId: string }) => void;
  readonly children: ReactNode;
}

const TieOutRow = memo(function TieOutRow(props: TieOutRowProps) {
  const { result, scaleN, tickN, forceUnit, isSelected, isWaiting, onTouch } = props;
  const spot = { pitchId: result.pitchId, tieOutId: result.tieOutId };
  const { setNodeRef, isOver } = useDroppable({ id: spotTargetId("list", spot) });
  const capacityN = result.capacity?.status === "ok" ? result.capacity.dependableN : null;
  const isWeak = result.verdict === "gives-way" || result.verdict === "thin";
  const wash = isSelected ? (isWeak ? "bg-ember-wash" : "bg-spruce-wash") : "";
  return (
    <li ref={setNodeRef} className={`border-b border-hair ${wash} ${isOver ? "outline-2 outline-spruce" : ""}`}>
      <button
        type="button"
        aria-expanded={isSelected}
        onClick={() => onTouch(spot)}
        className="flex min-h-16 w-full items-start gap-3 px-5 py-3 text-left"
      >
        <StateMark verdict={isWaiting ? "unknown" : result.verdict} isDecorative className="mt-0.5" />
        <span className="w-6 shrink-0 text-18 font-bold">
          <span className="sr-only">Tie-out </span>
          {result.number}
        </span>
        <span className="min-w-0 flex-1">
          <span className="block truncate text-15 font-semibold">{result.name}</span>
          {isWaiting ? (
            <span className="block text-13 text-pencil">working out…</span>
          ) : (
            <>
              <ForceBars
                pullN={result.demandN}
                capacityN={capacityN}
                scaleN={scaleN}
                tickN={tickN}
                tone={VERDICT_TONES[result.verdict]}
              />
              <span className="sr-only">
                {`${stateWord(result.verdict)}. ${result.demandN === null ? "" : `Pull ${formatForce(result.demandN, forceUnit)}. `}${capacityN === null ? "" : `Holds ${formatForce(capacityN, forceUnit)}.`}`}
              </span>
            </>
          )}
        </span>
        <span className="w-14 shrink-0 text-right">
          <span className={`block text-18 font-bold ${isWaiting ? "text-pencil" : VERDICT_TONES[result.verdict]}`}>
            <span className="sr-only">margin </span>
            {isWaiting || result.margin === null ? "–" : marginWords(result.margin)}
          </span>
          <span className="block text-13 text-pencil">
            {isWaiting || result.priority === null ? "" : `P ${Math.round(result.priority)}`}
          </span>
        </span>
      </button>
      {props.children}
    </li>
  );
});
