"use client";

import { useDraggable, useDroppable } from "@dnd-kit/core";
import { memo, useMemo } from "react";
import type { AnchorSpec, ShelterModel, TieOutResult } from "@/lib/calc/types";
import { layoutPlan } from "@/components/drawing/plan-layout";
import { ShelterPlan, doubledOf, type TieOutMarks } from "@/components/drawing/shelter-plan";
import { stateWord } from "@/components/drawing/state-mark";
import { formatAngle } from "@/lib/format/angles";
import { formatLength } from "@/lib/format/lengths";
import { formatMargin } from "@/lib/format/numbers";
import { useBoard } from "./board-context";
import { spotPieceId, spotTargetId } from "./drag-ids";
import { isSameSpot } from "./plan-change";
import { useSize } from "./use-size";

const MARK_TARGET_PX = 44;

/** The drawing is the interface: each tie-out on it can be touched, dragged from and dropped on. */
export function PlanDrawing({ model, isWindUp }: { readonly model: ShelterModel; readonly isWindUp: boolean }) {
  const { view, preferences, pitch, shelter, anchors, selected, board, touchSpot, armedAnchorId } = useBoard();
  const { ref, width, height } = useSize({ width: 760, height: 540 });
  const { windFromDeg: fromDeg, windToDeg: toDeg } = view.camp.details;
  const wind = useMemo(() => ({ fromDeg, toDeg }), [fromDeg, toDeg]);
  const upDeg = isWindUp && fromDeg !== null && toDeg !== null ? middleOf(fromDeg, toDeg) : 0;
  const { headingDeg } = pitch.details;

  const marks = useMemo(() => {
    const specOf = (id: string | undefined): AnchorSpec | null => (id ? (anchors.get(id)?.spec ?? null) : null);
    return Object.fromEntries(
      shelter.tieOuts.map((one): [string, TieOutMarks] => {
        const tieOut = model.tieOuts.find((each) => each.id === one.tieOutId);
        const angleDeg = one.lineAngleDeg ?? tieOut?.lineAngleDeg ?? 0;
        return [
          one.tieOutId,
          {
            verdict: one.verdict,
            anchor: specOf(one.placement?.anchorId),
            tandem: specOf(one.placement?.tandem?.anchorId),
            rockKg: one.placement?.rockKg ?? 0,
            shockCord: one.placement?.shockCord ?? false,
            pinned: one.placement?.pinned ?? false,
            note: `${formatLength(tieOut?.lineLengthM ?? 0, preferences.lengthUnit)} · ${formatAngle(angleDeg)}`,
          },
        ];
      }),
    );
  }, [shelter.tieOuts, model, anchors, preferences.lengthUnit]);
  const doubled = useMemo(() => doubledOf(marks), [marks]);
  const layout = useMemo(
    () => layoutPlan({ model, headingDeg, upDeg, width, height, wind, doubled }),
    [model, headingDeg, upDeg, width, height, wind, doubled],
  );
  const targetPx = useMemo(() => targetSize(layout.tieOuts.map((one) => one.anchor)), [layout]);
  const names = new Map(view.people.map((person) => [person.id, person.name]));
  const results = new Map(shelter.tieOuts.map((one) => [one.tieOutId, one]));
  const spots = layout.tieOuts.toSorted((a, b) => a.number - b.number);

  return (
    <div
      ref={ref}
      role="group"
      aria-label={`${pitch.name} from above, ${upDeg === 0 ? "north up" : "wind up"}`}
      className="relative aspect-square overflow-hidden rounded-sheet border border-hair bg-sheet sm:aspect-[76/54]"
    >
      <ShelterPlan
        model={model}
        headingDeg={headingDeg}
        upDeg={upDeg}
        wind={wind}
        marks={marks}
        selectedTieOutId={selected?.pitchId === pitch.id ? selected.tieOutId : null}
        sleeperNames={pitch.sleeperIds.map((id) => names.get(id) ?? "")}
        width={width}
        height={height}
        layout={layout}
        label=""
        className="absolute inset-0 size-full"
      />
      {spots.map((spot) => {
        const result = results.get(spot.tieOutId);
        if (!result) return null;
        const at = { pitchId: pitch.id, tieOutId: spot.tieOutId };
        return (
          <SpotButton
            key={spot.tieOutId}
            result={result}
            anchorName={result.placement ? (anchors.get(result.placement.anchorId)?.name ?? null) : null}
            left={(spot.anchor[0] / width) * 100}
            top={(spot.anchor[1] / height) * 100}
            sizePx={targetPx}
            isSelected={isSameSpot(selected, at)}
            isWaiting={board.waiting.has(pitch.id)}
            isArmed={armedAnchorId !== null}
            onTouch={touchSpot}
          />
        );
      })}
    </div>
  );
}

interface SpotButtonProps {
  readonly result: TieOutResult;
  readonly anchorName: string | null;
  readonly left: number;
  readonly top: number;
  readonly sizePx: number;
  readonly isSelected: boolean;
  readonly isWaiting: boolean;
  readonly isArmed: boolean;
  readonly onTouch: (spot: { pitchId: string; tieOutId: string }) => void;
}

const SpotButton = memo(function SpotButton(props: SpotButtonProps) {
  const { result, anchorName, sizePx, isArmed, onTouch } = props;
  const spot = { pitchId: result.pitchId, tieOutId: result.tieOutId };
  const drag = useDraggable({ id: spotPieceId(spot), disabled: anchorName === null });
  const drop = useDroppable({ id: spotTargetId("plan", spot) });
  const state = props.isWaiting ? "working out" : stateWord(result.verdict);
  const margin = result.margin === null ? "" : `, margin ${formatMargin(result.margin)}`;
  const { tabIndex: _tabIndex, role: _role, "aria-pressed": _pressed, ...attributes } = drag.attributes;
  const look = drop.isOver
    ? "border-2 border-spruce bg-spruce-wash/60"
    : isArmed
      ? "border border-dashed border-spruce"
      : "border border-transparent hover:border-hair";
  return (
    <button
      type="button"
      {...(anchorName === null ? {} : attributes)}
      {...drag.listeners}
      ref={(element) => {
        drag.setNodeRef(element);
        drop.setNodeRef(element);
      }}
      aria-disabled={undefined}
      aria-pressed={props.isSelected}
      aria-label={`Tie-out ${result.number}, ${result.name}: ${anchorName ?? "no anchor"}, ${state}${margin}`}
      onClick={() => onTouch(spot)}
      style={{ left: `${props.left}%`, top: `${props.top}%`, width: sizePx, height: sizePx }}
      className={`absolute -translate-x-1/2 -translate-y-1/2 touch-manipulation rounded-full ${look}`}
    />
  );
});

function middleOf(fromDeg: number, toDeg: number): number {
  return (fromDeg + ((((toDeg - fromDeg) % 360) + 360) % 360) / 2) % 360;
}

/** As large as a fingertip where there is room, never so large that neighbours cover each other. */
function targetSize(points: readonly (readonly [number, number])[]): number {
  let nearest = MARK_TARGET_PX;
  points.forEach(([x, y], index) => {
    for (const [otherX, otherY] of points.slice(index + 1)) {
      nearest = Math.min(nearest, Math.max(Math.abs(x - otherX), Math.abs(y - otherY)));
    }
  });
  return Math.max(26, Math.floor(nearest));
}
