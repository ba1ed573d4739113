"use client";

import Link from "next/link";
import { Button } from "@/components/ui/button";
import type { TieOutResult } from "@/lib/calc/types";
import { formatAngle, formatLean } from "@/lib/format/angles";
import { formatForce } from "@/lib/format/forces";
import { formatChance, formatMargin } from "@/lib/format/numbers";
import { isDriven } from "./anchor-kind";
import { useBoard } from "./board-context";
import { MendList } from "./mend-list";
import { RiggingForm } from "./rigging-form";

/** One tie-out opened: what is there, what would mend it, how it is rigged, where else it could go. */
export function TieOutDetail({ result }: { readonly result: TieOutResult }) {
  const { view, board, anchors, preferences, shelter } = useBoard();
  const { placement, capacity } = result;
  const spot = { pitchId: result.pitchId, tieOutId: result.tieOutId };
  const anchor = placement ? anchors.get(placement.anchorId) : null;
  const isWaiting = board.waiting.has(result.pitchId);
  const working = `/trips/${view.trip.id}/camps/${view.camp.id}/working/${result.pitchId}/${result.tieOutId}`;
  return (
    <div className="flex flex-col gap-4 px-5 pb-5 lg:pl-[4.5rem]">
      <div className="text-15">
        {anchor && placement ? (
          <p>
            {isDriven(anchor.spec) ? `${anchor.name}, ${formatLean(placement.leanDeg)}. ` : `${anchor.name}. `}
            {capacity?.status === "ok" && !isWaiting && capacity.sentence}
            {capacity?.status === "unusable" && capacity.reason}
          </p>
        ) : (
          <p>No anchor yet. Drag one here, or take one from the tray.</p>
        )}
        {!isWaiting && result.demandN !== null && (
          <p className="text-13 text-pencil">
            {`Pull ${formatForce(result.demandN, preferences.forceUnit)}`}
            {result.lineAngleDeg !== null && ` at ${formatAngle(result.lineAngleDeg)}`}
            {capacity?.status === "ok" &&
              ` · holds ${formatForce(capacity.dependableN, preferences.forceUnit)} dependably, ${formatForce(capacity.medianN, preferences.forceUnit)} usually`}
            {result.chanceHolds !== null && ` · chance ${formatChance(result.chanceHolds)}`}
            {result.morningMargin !== null && ` · margin in the morning ${formatMargin(result.morningMargin)}`}
          </p>
        )}
        {!isWaiting && result.consequence && <p className="text-13 text-pencil">{result.consequence.sentence}</p>}
        {result.gaps
          .filter((gap) => gap.field !== "tieOut.anchor")
          .map((gap) => (
            <p key={gap.field} className="text-13 font-semibold text-ochre">
              {gap.message}
            </p>
          ))}
        {capacity?.status === "unusable" && capacity.instead.length > 0 && (
          <p className="text-13">Use instead: {capacity.instead.join(", ")}.</p>
        )}
      </div>
      <MendList result={result} />
      {placement && anchor && (
        <>
          <div className="flex flex-wrap items-center gap-x-3 gap-y-2">
            <label className="flex min-h-11 items-center gap-2 text-15">
              <input
                type="checkbox"
                className="size-5 accent-spruce"
                checked={placement.pinned}
                onChange={(event) =>
                  board.apply({ type: "place", placement: { ...placement, pinned: event.target.checked } })
                }
              />
              Pinned
            </label>
            <select
              aria-label={`Move ${anchor.name} to`}
              value=""
              onChange={(event) => move(event.target.value)}
              className="min-h-11 min-w-0 flex-1 basis-40 rounded-field border border-spruce bg-transparent px-3 text-15 font-semibold text-spruce"
            >
              <option value="">Move to…</option>
              {shelter.tieOuts
                .filter((one) => one.tieOutId !== result.tieOutId)
                .toSorted((a, b) => a.number - b.number)
                .map((one) => (
                  <option key={one.tieOutId} value={one.tieOutId}>
                    {one.number}, {one.name}
                    {one.placement ? " (swap)" : ""}
                  </option>
                ))}
            </select>
            <Button onClick={() => board.apply({ type: "lift", ...spot }, `${anchor.name} is back in the tray.`)}>
              To the tray
            </Button>
          </div>
          <RiggingForm key={`${result.tieOutId} ${placement.anchorId}`} placement={placement} anchor={anchor} />
        </>
      )}
      {result.demandN !== null && (
        <Link href={working} className="min-h-6 text-15 font-semibold text-spruce">
          How this was calculated
        </Link>
      )}
    </div>
  );

  function move(tieOutId: string) {
    const target = shelter.tieOuts.find((one) => one.tieOutId === tieOutId);
    if (!target || !anchor) return;
    board.apply(
      { type: "swap", from: spot, to: { pitchId: result.pitchId, tieOutId } },
      `${anchor.name} is at tie-out ${target.number} now.`,
    );
  }
}
