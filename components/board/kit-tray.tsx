"use client";

import { useDraggable, useDroppable } from "@dnd-kit/core";
import Link from "next/link";
import { memo } from "react";
import { AnchorMark } from "@/components/drawing/anchor-mark";
import { EmptyState } from "@/components/ui/layout";
import type { TrayAnchor } from "@/lib/calc/types";
import { formatMass } from "@/lib/format/masses";
import { useBoard } from "./board-context";
import { trayPieceId, TRAY_TARGET } from "./drag-ids";

/** What the group carries and what is found at the camp, with how many are left. */
export function KitTray() {
  const { view, board, selectedResult, armedAnchorId, arm, putAnchor, isDragging } = useBoard();
  const { setNodeRef, isOver } = useDroppable({ id: TRAY_TARGET });
  const { left } = board.result;
  if (view.tray.length === 0) {
    return (
      <EmptyState title="The tray is empty">
        <p>The anchors that the group carries stand here, ready to be placed.</p>
        <Link href={`/trips/${view.trip.id}/kit`} className="font-semibold text-spruce">
          Put together the kit
        </Link>
      </EmptyState>
    );
  }
  const spot = selectedResult && { pitchId: selectedResult.pitchId, tieOutId: selectedResult.tieOutId };
  return (
    <section
      aria-labelledby="tray-heading"
      ref={setNodeRef}
      className={`rounded-sheet border border-dashed p-2 ${isOver ? "border-spruce bg-spruce-wash" : isDragging ? "border-pencil" : "border-transparent"}`}
    >
      <h2 id="tray-heading" className="sr-only">
        Kit tray
      </h2>
      <ul className="grid grid-cols-[repeat(auto-fill,minmax(min(100%,14.5rem),1fr))] gap-2">
        {view.tray.map((anchor) => (
          <TrayPiece
            key={anchor.id}
            anchor={anchor}
            left={left[anchor.id] ?? 0}
            isArmed={armedAnchorId === anchor.id}
            putAt={selectedResult?.number ?? null}
            onArm={() => arm(armedAnchorId === anchor.id ? null : anchor.id)}
            onPut={() => spot && putAnchor(anchor.id, spot)}
          />
        ))}
      </ul>
    </section>
  );
}

interface TrayPieceProps {
  readonly anchor: TrayAnchor;
  readonly left: number;
  readonly isArmed: boolean;
  readonly putAt: number | null;
  readonly onArm: () => void;
  readonly onPut: () => void;
}

const TrayPiece = memo(function TrayPiece({ anchor, left, isArmed, putAt, onArm, onPut }: TrayPieceProps) {
  const { attributes: all, listeners, setNodeRef } = useDraggable({ id: trayPieceId(anchor.id) });
  const { tabIndex: _tabIndex, role: _role, "aria-pressed": _pressed, ...attributes } = all;
  const look = isArmed ? "border-ink outline-1 outline-ink" : "border-hair";
  return (
    <li
      className={`flex min-w-0 items-stretch rounded-sheet border bg-sheet ${look} ${left === 0 ? "border-dashed" : ""}`}
    >
      <button
        type="button"
        {...attributes}
        {...listeners}
        ref={setNodeRef}
        aria-pressed={isArmed}
        onClick={onArm}
        className="flex min-h-14 min-w-0 flex-1 touch-manipulation items-center gap-3 rounded-sheet px-3 py-1.5 text-left"
      >
        <AnchorMark spec={anchor.spec} size={28} />
        <span className="min-w-0">
          <span className="block truncate text-15 font-semibold">{anchor.name}</span>
          <span className="block text-13 text-pencil">
            {anchor.found ? "found here" : formatMass(anchor.massKg)} · <strong className="text-ink">{left}</strong> of{" "}
            {anchor.count} left
          </span>
        </span>
      </button>
      {putAt !== null && (
        <button
          type="button"
          onClick={onPut}
          aria-label={`Put ${anchor.name} at tie-out ${putAt}`}
          className="flex w-12 shrink-0 items-center justify-center rounded-r-sheet border-l border-hair text-15 font-semibold text-spruce hover:bg-spruce-wash"
        >
          <span aria-hidden="true">
            →{"\u2009"}
            {putAt}
          </span>
        </button>
      )}
    </li>
  );
});
