"use client";

import { useState } from "react";
import type { KeyboardEvent, PointerEvent } from "react";
import { FieldError } from "@/components/ui/fields";
import { useFieldErrors } from "@/components/ui/action-form";
import { formatCompass, formatWindRange } from "@/lib/format/angles";
import { DIAL_RADIUS, DIAL_SIZE, WindDialFace } from "./wind-dial-face";

interface WindDialProps {
  readonly fromDeg: number | null;
  readonly toDeg: number | null;
  /** Path of the two hidden inputs without the reading suffix. */
  readonly fromName?: string;
  readonly toName?: string;
  readonly legend?: string;
  readonly onChange?: (fromDeg: number | null, toDeg: number | null) => void;
}

type Hand = "from" | "to";

const NUDGES: Readonly<Record<string, number>> = {
  ArrowRight: 5,
  ArrowUp: 5,
  ArrowLeft: -5,
  ArrowDown: -5,
  PageUp: 45,
  PageDown: -45,
};

const wrap = (deg: number) => ((Math.round(deg) % 360) + 360) % 360;

/** Compass bearing of a pointer from the middle of the dial, in steps of 5°. */
function bearingOf(event: PointerEvent): number {
  const box = event.currentTarget.parentElement?.getBoundingClientRect();
  if (!box) return 0;
  const x = event.clientX - (box.left + box.width / 2);
  const y = event.clientY - (box.top + box.height / 2);
  return Math.round(((Math.atan2(x, -y) * 180) / Math.PI + 360) / 5) * 5;
}

/** The wind range: two hands to drag or nudge, or two numbers to type; clockwise from the first to the second. */
export function WindDial({
  fromDeg,
  toDeg,
  fromName = "details.windFromDeg",
  toName = "details.windToDeg",
  legend = "Where the wind comes from",
  onChange,
}: WindDialProps) {
  const [range, setRange] = useState({ from: fromDeg, to: toDeg });
  const errors = [...useFieldErrors(fromName), ...useFieldErrors(toName)];
  const isKnown = range.from !== null && range.to !== null;

  const change = (next: { from: number | null; to: number | null }) => {
    setRange(next);
    onChange?.(next.from, next.to);
  };
  const move = (hand: Hand, deg: number) => {
    const from = range.from ?? 270;
    const to = range.to ?? 315;
    change(hand === "from" ? { from: wrap(deg), to } : { from, to: wrap(deg) });
  };
  const nudge = (hand: Hand) => (event: KeyboardEvent) => {
    const step = NUDGES[event.key];
    if (step === undefined) return;
    event.preventDefault();
    move(hand, (range[hand] ?? 0) + (event.shiftKey ? step * 3 : step));
  };

  return (
    <fieldset className="flex min-w-0 flex-col gap-3">
      <legend className="text-15 font-semibold">{legend}</legend>
      <input type="hidden" name={`${fromName}:number`} value={range.from ?? ""} />
      <input type="hidden" name={`${toName}:number`} value={range.to ?? ""} />
      <div className="flex flex-wrap items-center gap-x-8 gap-y-4">
        <div className="relative w-60 max-w-full shrink-0">
          <WindDialFace fromDeg={range.from} toDeg={range.to} />
          {isKnown &&
            (["from", "to"] as const).map((hand) => (
              <DialHand
                key={hand}
                hand={hand}
                deg={range[hand] ?? 0}
                onKeyDown={nudge(hand)}
                onDrag={(event) => move(hand, bearingOf(event))}
              />
            ))}
        </div>
        <div className="flex min-w-0 flex-1 basis-44 flex-col gap-3">
          <p aria-live="polite" className="text-18 font-bold">
            {formatWindRange(range.from, range.to)}
          </p>
          {isKnown && (
            <div className="flex flex-wrap gap-3">
              <DegreeInput label="From, °" value={range.from} onChange={(deg) => move("from", deg)} />
              <DegreeInput label="Clockwise to, °" value={range.to} onChange={(deg) => move("to", deg)} />
            </div>
          )}
          <label className="flex min-h-11 items-center gap-3 text-15">
            <input
              type="checkbox"
              className="size-5 accent-spruce"
              checked={!isKnown}
              onChange={(event) => change(event.target.checked ? { from: null, to: null } : { from: 270, to: 315 })}
            />
            It may come from anywhere
          </label>
          <p className="text-13 text-pencil">Drag the two marks on the dial, or type the degrees.</p>
        </div>
      </div>
      <FieldError errors={errors} />
    </fieldset>
  );
}

function DialHand({
  hand,
  deg,
  onKeyDown,
  onDrag,
}: {
  readonly hand: Hand;
  readonly deg: number;
  readonly onKeyDown: (event: KeyboardEvent) => void;
  readonly onDrag: (event: PointerEvent) => void;
}) {
  const angle = (deg * Math.PI) / 180;
  const reach = (DIAL_RADIUS / DIAL_SIZE) * 100;
  return (
    <div
      role="slider"
      tabIndex={0}
      aria-label={hand === "from" ? "Wind from" : "Clockwise to"}
      aria-valuemin={0}
      aria-valuemax={359}
      aria-valuenow={deg}
      aria-valuetext={`${deg}°, ${formatCompass(deg)}`}
      onKeyDown={onKeyDown}
      onPointerDown={(event) => {
        event.preventDefault();
        event.currentTarget.focus();
        event.currentTarget.setPointerCapture(event.pointerId);
      }}
      onPointerMove={(event) => {
        if (event.currentTarget.hasPointerCapture(event.pointerId)) onDrag(event);
      }}
      style={{ left: `${50 + reach * Math.sin(angle)}%`, top: `${50 - reach * Math.cos(angle)}%` }}
      className="absolute flex size-11 -translate-x-1/2 -translate-y-1/2 cursor-grab touch-none items-center justify-center rounded-full"
    >
      <span className="flex size-7 items-center justify-center rounded-full border-2 border-tarn bg-sheet text-13 font-bold text-tarn">
        {hand === "from" ? "1" : "2"}
      </span>
    </div>
  );
}

function DegreeInput({
  label,
  value,
  onChange,
}: {
  readonly label: string;
  readonly value: number | null;
  readonly onChange: (deg: number) => void;
}) {
  // What is being typed is not a bearing yet: an empty field, or the 2 of 270.
  const [draft, setDraft] = useState<string | null>(null);
  return (
    <label className="flex w-28 flex-col gap-1 text-15 font-semibold">
      {label}
      <input
        type="number"
        min={0}
        max={360}
        step={1}
        value={draft ?? value ?? ""}
        onBlur={() => setDraft(null)}
        onChange={(event) => {
          setDraft(event.target.value);
          const deg = event.target.valueAsNumber;
          if (Number.isFinite(deg) && deg >= 0 && deg <= 360) onChange(deg);
        }}
        className="min-h-11 rounded-field border border-pencil bg-sheet px-3 font-normal"
      />
    </label>
  );
}

/** The same dial to look at only. */
export function WindDialView({ fromDeg, toDeg }: { readonly fromDeg: number | null; readonly toDeg: number | null }) {
  return (
    <figure className="w-52 max-w-full">
      <WindDialFace fromDeg={fromDeg} toDeg={toDeg} />
      <figcaption className="text-center text-13 text-pencil">Wind from {formatWindRange(fromDeg, toDeg)}</figcaption>
    </figure>
  );
}
