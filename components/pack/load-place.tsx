"use client";

import { useDraggable, useDroppable } from "@dnd-kit/core";
import { Grip } from "@/components/sleepers/person-chip";
import { formatMass } from "@/lib/format/masses";
import { formatFixed, withUnit } from "@/lib/format/numbers";
import { NOBODY, type PersonTotal, type Stack } from "./load-state";

interface LoadPlaceProps {
  readonly placeId: string;
  /** Null: what nobody carries yet. */
  readonly total: PersonTotal | null;
  /** Share at the right end of the bars. */
  readonly scale: number;
  readonly stacks: readonly Stack[];
  readonly idOf: (stack: Stack) => string;
  readonly onOpen: (stack: Stack) => void;
}

/** One person with their load as a bar against their limit, and their pieces; or what nobody carries yet. */
export function LoadPlace({ placeId, total, scale, stacks, idOf, onOpen }: LoadPlaceProps) {
  const { setNodeRef, isOver } = useDroppable({ id: placeId });
  const headingId = `load-${placeId}`;
  const isNobody = placeId === NOBODY;
  return (
    <section
      ref={setNodeRef}
      aria-labelledby={headingId}
      className={`min-w-0 border-t-2 pt-3 pb-4 ${isNobody ? "col-span-full" : ""} ${isOver ? "border-spruce bg-spruce-wash" : "border-hair"}`}
    >
      <div className="flex flex-wrap items-baseline justify-between gap-x-3">
        <h3 id={headingId} className="text-15 font-bold">
          {total ? total.person.name : "Nobody yet"}
        </h3>
        {total && <p className="text-15 font-semibold">{formatMass(total.totalKg)}</p>}
      </div>
      {total && <LoadBar total={total} scale={scale} />}
      {isNobody && stacks.length === 0 && <p className="text-15 text-pencil">Everything is carried by somebody.</p>}
      <ul className={isNobody ? "grid gap-2 sm:grid-cols-2 xl:grid-cols-3" : "flex flex-col gap-2"}>
        {stacks.map((stack) => (
          <LoadChip key={idOf(stack)} id={idOf(stack)} stack={stack} onOpen={() => onOpen(stack)} />
        ))}
      </ul>
    </section>
  );
}

function LoadBar({ total, scale }: { readonly total: PersonTotal; readonly scale: number }) {
  const { person, groupKg, share } = total;
  const isOver = person.limitKg !== null && share > 1;
  return (
    <div className="mt-1 mb-3">
      <span aria-hidden="true" className="relative block h-2 bg-hair">
        <span
          className={`block h-full ${isOver ? "bg-rowan" : "bg-ink"}`}
          style={{ width: `${Math.min(100, (share / scale) * 100)}%` }}
        />
        {person.limitKg !== null && (
          <span className="absolute -top-1 h-4 w-0.5 bg-pencil" style={{ left: `calc(${100 / scale}% - 2px)` }} />
        )}
      </span>
      <p className="mt-1.5 text-13 text-pencil">
        {formatMass(groupKg)} of the group&apos;s
        {person.baseMassKg === null ? ", own things not said" : `, own things ${formatMass(person.baseMassKg)}`}
        {person.limitKg === null ? ", no limit said" : `, limit ${formatMass(person.limitKg)}`}
        {person.limitKg !== null && (
          <span className={isOver ? "font-semibold text-rowan" : ""}>
            : {withUnit(formatFixed(share * 100), "%")} of it{isOver && ", too much"}
          </span>
        )}
      </p>
    </div>
  );
}

function LoadChip({ id, stack, onOpen }: { readonly id: string; readonly stack: Stack; readonly onOpen: () => void }) {
  const { attributes, listeners, setNodeRef, setActivatorNodeRef, isDragging } = useDraggable({ id });
  const { piece, count, isFixed } = stack;
  return (
    <li
      ref={setNodeRef}
      className={`flex items-center rounded-field border border-hair bg-sheet ${isDragging ? "opacity-40" : ""}`}
    >
      <button
        type="button"
        ref={setActivatorNodeRef}
        {...attributes}
        {...listeners}
        aria-label={`Drag ${piece.name}`}
        className="flex size-11 shrink-0 cursor-grab touch-none items-center justify-center text-pencil"
      >
        <Grip />
      </button>
      <button
        type="button"
        onClick={onOpen}
        className="flex min-h-11 min-w-0 flex-1 flex-wrap items-baseline justify-between gap-x-3 py-2 pr-3 text-left text-15"
      >
        <span className="font-semibold">
          {count > 1 && `${count} × `}
          {piece.name}
          {isFixed && <span className="font-normal text-pencil">, fixed</span>}
        </span>
        <span className="whitespace-nowrap text-pencil">
          {piece.massKgEach === null ? "not weighed" : formatMass(piece.massKgEach * count)}
        </span>
      </button>
    </li>
  );
}
