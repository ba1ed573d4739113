"use client";

import {
  DndContext,
  DragOverlay,
  KeyboardSensor,
  MouseSensor,
  TouchSensor,
  useSensor,
  useSensors,
  type DragEndEvent,
  type DragOverEvent,
  type DragStartEvent,
  type Modifier,
} from "@dnd-kit/core";
import { getEventCoordinates } from "@dnd-kit/utilities";
import { useCallback, useMemo, useState } from "react";
import type { ReactNode } from "react";
import { AnchorMark } from "@/components/drawing/anchor-mark";
import type { ShelterResult, TrayAnchor } from "@/lib/calc/types";
import { DRAG_INSTRUCTIONS, makeAnnouncements } from "./drag-announcements";
import { changeOfDrop } from "./drag-change";
import { findTarget } from "./drag-collisions";
import { readPiece, readTarget, spotTargetId, type Piece } from "./drag-ids";
import { makeCoordinateGetter } from "./drag-keyboard";
import { placementAt } from "./plan-change";
import type { StakingBoardModel } from "./use-staking-board";

/** Only at the very edge: the page must not run away under the piece. */
const AUTO_SCROLL = { threshold: { x: 0, y: 0.06 } };
const OFFSET_PX = 14;

/** The piece hangs beside the pointer, so that the tie-out under it can be seen. */
const besidePointer: Modifier = ({ activatorEvent, draggingNodeRect, transform }) => {
  const start = activatorEvent && getEventCoordinates(activatorEvent);
  if (!start || !draggingNodeRect) return transform;
  return {
    ...transform,
    x: transform.x + start.x - draggingNodeRect.left + OFFSET_PX,
    y: transform.y + start.y - draggingNodeRect.top + OFFSET_PX,
  };
};
const BESIDE_POINTER = [besidePointer];

interface BoardDragProps {
  readonly board: StakingBoardModel;
  readonly shelter: ShelterResult;
  readonly anchors: ReadonlyMap<string, TrayAnchor>;
  readonly onDropped: (piece: Piece, target: NonNullable<ReturnType<typeof readTarget>>) => void;
  readonly onDragging: (isDragging: boolean) => void;
  readonly children: ReactNode;
}

/** Dragging by mouse, touch and keyboard; while a piece is over a tie-out every margin shows what it would be. */
export function BoardDrag({ board, shelter, anchors, onDropped, onDragging, children }: BoardDragProps) {
  const [piece, setPiece] = useState<Piece | null>(null);
  const { engine, prepared, state, showPreview, apply } = board;

  const order = useMemo(
    () => shelter.tieOuts.toSorted((a, b) => a.number - b.number).map((one) => spotTargetId("plan", one)),
    [shelter.tieOuts],
  );
  const coordinateGetter = useMemo(() => makeCoordinateGetter(() => order), [order]);
  const sensors = useSensors(
    useSensor(MouseSensor, { activationConstraint: { distance: 6 } }),
    useSensor(TouchSensor, { activationConstraint: { delay: 200, tolerance: 6 } }),
    useSensor(KeyboardSensor, {
      coordinateGetter,
      scrollBehavior: "auto",
      // Enter stays free for choosing.
      keyboardCodes: { start: ["Space"], cancel: ["Escape"], end: ["Space", "Enter"] },
    }),
  );
  const announcements = useMemo(() => {
    const nameOf = (id: string) => anchors.get(id)?.name ?? "The anchor";
    return makeAnnouncements({
      anchor: nameOf,
      anchorAt: (spot) => {
        const placement = placementAt(state.placements, spot);
        return placement ? nameOf(placement.anchorId) : null;
      },
      spot: (spot) => {
        const one = shelter.tieOuts.find((each) => each.tieOutId === spot.tieOutId);
        return one ? `tie-out ${one.number}, ${one.name}` : "a tie-out";
      },
    });
  }, [anchors, state.placements, shelter.tieOuts]);

  const changeOf = useCallback(
    (activeId: unknown, overId: unknown) => {
      const dragged = readPiece(activeId);
      const target = readTarget(overId);
      if (!dragged || !target || !engine || !prepared) return null;
      const change = changeOfDrop(engine, prepared, state.placements, dragged, target);
      return change && { change, dragged, target };
    },
    [engine, prepared, state.placements],
  );
  const stop = () => {
    setPiece(null);
    showPreview(null);
    onDragging(false);
  };
  const draggedAnchorId =
    piece?.kind === "tray" ? piece.anchorId : piece && placementAt(state.placements, piece.spot)?.anchorId;
  const dragged = draggedAnchorId ? anchors.get(draggedAnchorId) : null;
  return (
    <DndContext
      id="staking-plan"
      sensors={sensors}
      collisionDetection={findTarget}
      autoScroll={AUTO_SCROLL}
      accessibility={{ announcements, screenReaderInstructions: DRAG_INSTRUCTIONS }}
      onDragStart={({ active }: DragStartEvent) => {
        setPiece(readPiece(active.id));
        onDragging(true);
      }}
      onDragOver={({ active, over }: DragOverEvent) => {
        showPreview(over ? (changeOf(active.id, over.id)?.change ?? null) : null);
      }}
      onDragEnd={({ active, over }: DragEndEvent) => {
        stop();
        const drop = over && changeOf(active.id, over.id);
        if (!drop) return;
        apply(drop.change);
        onDropped(drop.dragged, drop.target);
      }}
      onDragCancel={stop}
    >
      {children}
      <DragOverlay dropAnimation={null} modifiers={BESIDE_POINTER}>
        {dragged && (
          <div className="flex min-h-11 w-max cursor-grabbing items-center gap-2 rounded-sheet border border-spruce bg-sheet px-3 shadow-float">
            <AnchorMark spec={dragged.spec} size={26} />
            <span className="text-15 font-semibold">{dragged.name}</span>
          </div>
        )}
      </DragOverlay>
    </DndContext>
  );
}
