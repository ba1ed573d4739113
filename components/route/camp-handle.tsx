"use client";

import { useRef, type KeyboardEvent, type PointerEvent } from "react";
import type { RouteStop } from "@/lib/domain/route/views";
import type { CampMoves } from "./elevation-profile";
import type { ProfileScale } from "./profile-scale";

interface CampHandleProps {
  readonly stop: RouteStop & { readonly atM: number };
  readonly number: number;
  readonly label: string;
  readonly isUpper: boolean;
  readonly heightM: number | null;
  readonly scale: ProfileScale;
  /** A camp stays between its neighbours. */
  readonly limits: { readonly least: number; readonly most: number };
  readonly valueText: string;
  readonly moves: CampMoves | null;
  readonly atOf: (event: PointerEvent) => number;
}

/** Metres for one press of an arrow key; with Shift, ten times as far. */
const KEY_STEP_M = 100;
const TARGET = 44;
/** A pointer that moves less than this, px, selects and does not drag. */
const TAP_PX = 4;

function stepOf(event: KeyboardEvent, limits: CampHandleProps["limits"], atM: number): number | null {
  const far = event.shiftKey ? 10 * KEY_STEP_M : KEY_STEP_M;
  switch (event.key) {
    case "ArrowRight":
    case "ArrowUp":
      return atM + far;
    case "ArrowLeft":
    case "ArrowDown":
      return atM - far;
    case "PageUp":
      return atM + 10 * KEY_STEP_M;
    case "PageDown":
      return atM - 10 * KEY_STEP_M;
    case "Home":
      return limits.least;
    case "End":
      return limits.most;
    default:
      return null;
  }
}

/** A camp on the profile: a numbered disc on a line down to the axis, and a slider for those who may move it. */
export function CampHandle(props: CampHandleProps) {
  const { stop, number, label, isUpper, heightM, scale, limits, valueText, moves, atOf } = props;
  const startX = useRef(0);
  const x = scale.xOf(stop.atM);
  const y = heightM === null ? scale.floor - 24 : scale.yOf(heightM);
  const labelY = isUpper ? 14 : 34;
  const isSelected = moves?.selectedId === stop.campId;
  const clamp = (atM: number) => Math.min(limits.most, Math.max(limits.least, atM));
  const isTap = (event: PointerEvent) => Math.abs(event.clientX - startX.current) < TAP_PX;
  const anchor = x < scale.left + 50 ? "start" : x > scale.right - 50 ? "end" : "middle";
  const slider = moves && {
    role: "slider" as const,
    tabIndex: 0,
    "aria-label": `${stop.name}, place along the way`,
    "aria-valuemin": Math.round(limits.least),
    "aria-valuemax": Math.round(limits.most),
    "aria-valuenow": Math.round(stop.atM),
    "aria-valuetext": valueText,
    onFocus: () => moves.onSelect(stop.campId),
    onKeyDown: (event: KeyboardEvent) => {
      if (event.key === "Escape") return moves.onCancel(stop.campId);
      if (event.key === "Enter" || event.key === " ") {
        event.preventDefault();
        return moves.onDrop(stop.campId);
      }
      const to = stepOf(event, limits, stop.atM);
      if (to === null) return;
      event.preventDefault();
      moves.onMove(stop.campId, clamp(to));
    },
    onBlur: () => moves.onDrop(stop.campId),
    onPointerDown: (event: PointerEvent<SVGGElement>) => {
      startX.current = event.clientX;
      moves.onSelect(stop.campId);
      event.currentTarget.setPointerCapture(event.pointerId);
    },
    onPointerMove: (event: PointerEvent<SVGGElement>) => {
      if (!event.currentTarget.hasPointerCapture(event.pointerId) || isTap(event)) return;
      moves.onMove(stop.campId, clamp(atOf(event)));
    },
    onPointerUp: (event: PointerEvent<SVGGElement>) => {
      if (!isTap(event)) moves.onDrop(stop.campId, clamp(atOf(event)));
    },
    onPointerCancel: () => moves.onCancel(stop.campId),
  };
  return (
    <g
      data-camp-handle
      {...slider}
      className={moves ? "cursor-ew-resize touch-none outline-none [&:focus-visible_.ring]:opacity-100" : undefined}
    >
      <path d={`M${x} ${labelY + 6}V${scale.floor}`} className="stroke-pencil" strokeWidth={1} />
      <rect x={x - TARGET / 2} y={0} width={TARGET} height={scale.floor} className="fill-transparent" />
      <circle cx={x} cy={y} r={15} className="ring fill-none stroke-spruce opacity-0" strokeWidth={2.5} />
      <circle
        cx={x}
        cy={y}
        r={11}
        className={isSelected ? "fill-spruce stroke-spruce" : "fill-sheet stroke-ink"}
        strokeWidth={1.6}
      />
      <text
        x={x}
        y={y + 4.5}
        textAnchor="middle"
        className={`text-13 font-bold ${isSelected ? "fill-on-spruce" : "fill-ink"}`}
        aria-hidden="true"
      >
        {number}
      </text>
      <text x={x} y={labelY} textAnchor={anchor} className="fill-ink text-13 font-semibold" aria-hidden="true">
        {label}
      </text>
    </g>
  );
}
