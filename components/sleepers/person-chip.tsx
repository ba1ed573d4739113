"use client";

import { useDraggable } from "@dnd-kit/core";
import type { Place, PlaceId } from "./places";

interface PersonChipProps {
  readonly personId: string;
  readonly name: string;
  readonly placeId: PlaceId;
  readonly places: readonly Place[];
  readonly isPicked: boolean;
  readonly onPick: (personId: string) => void;
  readonly onMove: (personId: string, placeId: PlaceId) => void;
}

/** One person: a handle to drag, the name to tap, and a list to choose the place from. */
export function PersonChip({ personId, name, placeId, places, isPicked, onPick, onMove }: PersonChipProps) {
  const { attributes, listeners, setNodeRef, setActivatorNodeRef, isDragging } = useDraggable({ id: personId });
  return (
    <li
      ref={setNodeRef}
      className={`flex flex-wrap items-center gap-x-1 rounded-field border bg-sheet ${isPicked ? "border-ember" : "border-hair"} ${isDragging ? "opacity-40" : ""}`}
    >
      <button
        type="button"
        ref={setActivatorNodeRef}
        {...attributes}
        {...listeners}
        aria-label={`Drag ${name}`}
        className="flex size-11 shrink-0 cursor-grab touch-none items-center justify-center text-pencil"
      >
        <Grip />
      </button>
      <button
        type="button"
        aria-pressed={isPicked}
        onClick={() => onPick(personId)}
        className="min-h-11 min-w-0 flex-1 basis-24 py-2 text-left text-15 font-semibold"
      >
        {name}
      </button>
      <select
        aria-label={`Where ${name} sleeps`}
        value={placeId}
        onChange={(event) => onMove(personId, event.target.value)}
        className="min-h-11 w-32 min-w-0 shrink-0 rounded-field bg-transparent px-2 text-13 text-pencil"
      >
        {places.map((place) => (
          <option key={place.id} value={place.id}>
            {place.name}
          </option>
        ))}
      </select>
    </li>
  );
}

export function Grip() {
  return (
    <svg width="12" height="18" viewBox="0 0 12 18" aria-hidden="true" fill="currentColor">
      {[3, 9, 15].map((y) => (
        <g key={y}>
          <circle cx="3" cy={y} r="1.5" />
          <circle cx="9" cy={y} r="1.5" />
        </g>
      ))}
    </svg>
  );
}
