"use client";

import { useDroppable } from "@dnd-kit/core";
import type { ReactNode } from "react";
import { Button } from "@/components/ui/button";
import type { Place } from "./places";

interface SleepingPlaceProps {
  readonly place: Place;
  readonly taken: number;
  /** Name of the person who was tapped and could come here; null when nobody is, or is here already. */
  readonly pickedName: string | null;
  readonly onPlaceHere: () => void;
  readonly drawing?: ReactNode;
  readonly emptyText: string;
  readonly children: ReactNode;
}

/** A shelter (or a list beside the shelters) that people can be dropped on or sent to. */
export function SleepingPlace({
  place,
  taken,
  pickedName,
  onPlaceHere,
  drawing,
  emptyText,
  children,
}: SleepingPlaceProps) {
  const { setNodeRef, isOver } = useDroppable({ id: place.id });
  const isFull = place.places !== null && taken >= place.places;
  const headingId = `place-${place.id}`;
  return (
    <section
      ref={setNodeRef}
      aria-labelledby={headingId}
      className={`min-w-0 border-t-2 pt-3 pb-4 ${place.places === null ? "col-span-full" : ""} ${isOver ? (isFull ? "border-rowan bg-rowan-wash" : "border-spruce bg-spruce-wash") : "border-hair"}`}
    >
      <div className="mb-3 flex flex-wrap items-baseline justify-between gap-x-3">
        <h3 id={headingId} className="text-15 font-bold">
          {place.name}
        </h3>
        <p className={`text-13 ${isFull ? "font-semibold text-ink" : "text-pencil"}`}>
          {place.places === null ? `${taken}` : `${taken} of ${place.places} places`}
          {isFull && ", full"}
          {isOver && isFull && ": no room"}
        </p>
      </div>
      {drawing}
      {pickedName && !isFull && (
        <Button className={place.places === null ? "mb-3" : "mb-3 w-full"} onClick={onPlaceHere}>
          Put {pickedName} here
        </Button>
      )}
      {taken === 0 && <p className="text-13 text-pencil">{emptyText}</p>}
      <ul
        className={
          place.places === null ? "grid gap-2 sm:grid-cols-2 sm:gap-x-8 xl:grid-cols-3" : "flex flex-col gap-2"
        }
      >
        {children}
      </ul>
    </section>
  );
}
