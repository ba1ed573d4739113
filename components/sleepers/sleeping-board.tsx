"use client";

import {
  DndContext,
  DragOverlay,
  KeyboardSensor,
  PointerSensor,
  useSensor,
  useSensors,
  type Announcements,
  type DragEndEvent,
  type KeyboardCoordinateGetter,
} from "@dnd-kit/core";
import { useState } from "react";
import { Button } from "@/components/ui/button";
import { ShelterPlan } from "@/components/drawing/shelter-plan";
import { buildShelter } from "@/lib/calc/shelter-kinds";
import type { SleepingPlanView } from "@/lib/domain/views";
import { Grip, PersonChip } from "./person-chip";
import {
  movePerson,
  OUTSIDE,
  placeEverybody,
  sleepersIn,
  toPlaces,
  toSleeping,
  UNPLACED,
  type PlaceId,
  type Sleeping,
} from "./places";
import { SleepingPlace } from "./sleeping-place";
import { useSavedSleepers, type SaveSleepers } from "./use-saved-sleepers";

const INSTRUCTIONS = {
  draggable:
    "Press space to pick the person up, the arrow keys to go from place to place, space to put down, escape to leave everything as it was. Or choose the place from the list beside the name.",
};

/** One arrow key: to the next place, wherever it lies on the screen. */
const toNextPlace: KeyboardCoordinateGetter = (event, { context }) => {
  const step = { ArrowDown: 1, ArrowRight: 1, ArrowUp: -1, ArrowLeft: -1 }[event.code];
  if (step === undefined) return undefined;
  event.preventDefault();
  const places = context.droppableContainers.getEnabled();
  const start = context.over?.id ?? places[0]?.id;
  const at = places.findIndex((place) => place.id === start);
  const next = places[(at + step + places.length) % places.length];
  const target = next && context.droppableRects.get(next.id);
  return target ? { x: target.left + 12, y: target.top + 12 } : undefined;
};

/** Everybody on the trip and where they sleep at this camp; by drag, by tap, by list or by keyboard. */
export function SleepingBoard({
  plan,
  tripId,
  action,
}: {
  readonly plan: SleepingPlanView;
  readonly tripId: string;
  readonly action: SaveSleepers;
}) {
  const places = toPlaces(plan);
  const [sleeping, setSleeping] = useState(() => toSleeping(plan));
  const [past, setPast] = useState<readonly Sleeping[]>([]);
  const [pickedId, setPickedId] = useState<string | null>(null);
  const [draggedId, setDraggedId] = useState<string | null>(null);
  const [said, setSaid] = useState("");
  const { state, send } = useSavedSleepers(action, { tripId, campId: plan.campId });
  const sensors = useSensors(
    useSensor(PointerSensor, { activationConstraint: { distance: 6 } }),
    useSensor(KeyboardSensor, { coordinateGetter: toNextPlace }),
  );
  const nameOf = (id: string | number | null) => plan.people.find((one) => one.id === id)?.name ?? "";
  const placeOf = (id: string | number | undefined) => places.find((one) => one.id === id);

  const change = (next: Sleeping) => {
    setPast([...past.slice(-49), sleeping]);
    setSleeping(next);
    void send(next);
  };
  const move = (personId: string, placeId: PlaceId) => {
    const place = placeOf(placeId);
    if (!place || sleeping[personId] === placeId) return;
    const moved = movePerson(sleeping, personId, place);
    if ("refusal" in moved) {
      setSaid(moved.refusal);
      return;
    }
    change(moved.sleeping);
    setPickedId(null);
    setSaid(`${nameOf(personId)}: ${place.name}.`);
  };
  const announcements: Announcements = {
    onDragStart: ({ active }) => `${nameOf(active.id)} picked up.`,
    onDragOver: ({ active, over }) => `${nameOf(active.id)} over ${placeOf(over?.id)?.name ?? "no place"}.`,
    onDragEnd: ({ active, over }) => `${nameOf(active.id)} put down at ${placeOf(over?.id)?.name ?? "no place"}.`,
    onDragCancel: ({ active }) => `${nameOf(active.id)} stays where they were.`,
  };
  const unplaced = sleepersIn(sleeping, UNPLACED).length;
  const withRoom = placeEverybody(sleeping, places);

  return (
    <DndContext
      id="sleepers"
      sensors={sensors}
      accessibility={{ announcements, screenReaderInstructions: INSTRUCTIONS }}
      onDragStart={({ active }) => setDraggedId(String(active.id))}
      onDragCancel={() => setDraggedId(null)}
      onDragEnd={({ active, over }: DragEndEvent) => {
        setDraggedId(null);
        if (over) move(String(active.id), String(over.id));
      }}
    >
      <div className="mb-4 flex flex-wrap items-center gap-3">
        <Button
          disabled={past.length === 0}
          onClick={() => {
            const last = past.at(-1);
            if (!last) return;
            setPast(past.slice(0, -1));
            setSleeping(last);
            void send(last);
            setSaid("Undone.");
          }}
        >
          Undo
        </Button>
        {unplaced > 0 && withRoom !== sleeping && (
          <Button
            onClick={() => {
              change(withRoom);
              setSaid("Free places filled in order.");
            }}
          >
            Fill free places
          </Button>
        )}
        <p role="status" className="text-15 text-pencil">
          {state.kind === "clean" && "Changes are saved as you make them."}
          {state.kind === "saving" && "Saving…"}
          {state.kind === "saved" && `Saved ${state.at}.`}
          {state.kind === "failed" && <span className="font-semibold text-rowan">Not saved. {state.reason}</span>}
        </p>
        {state.kind === "failed" && <Button onClick={() => void send(sleeping)}>Try again</Button>}
      </div>
      <p role="status" className="mb-2 min-h-6 text-15 font-semibold">
        {said}
      </p>
      <div className="grid items-start gap-x-8 gap-y-6 sm:grid-cols-2 xl:grid-cols-3">
        {places.map((place) => {
          const ids = sleepersIn(sleeping, place.id);
          const pitch = plan.pitches.find((one) => one.id === place.id);
          return (
            <SleepingPlace
              key={place.id}
              place={place}
              taken={ids.length}
              pickedName={pickedId && sleeping[pickedId] !== place.id ? nameOf(pickedId) : null}
              onPlaceHere={() => pickedId && move(pickedId, place.id)}
              emptyText={
                place.id === UNPLACED
                  ? "Everybody has a place."
                  : place.id === OUTSIDE
                    ? "Nobody."
                    : "Nobody sleeps here yet."
              }
              drawing={
                pitch && (
                  <div className="mb-3 rounded-sheet border border-hair bg-sheet">
                    <ShelterPlan
                      model={buildShelter(pitch.spec)}
                      headingDeg={pitch.headingDeg}
                      sleeperNames={ids.map(nameOf)}
                      width={360}
                      height={230}
                      label=""
                    />
                  </div>
                )
              }
            >
              {ids.map((id) => (
                <PersonChip
                  key={id}
                  personId={id}
                  name={nameOf(id)}
                  placeId={place.id}
                  places={places}
                  isPicked={pickedId === id}
                  onPick={(personId) => setPickedId(pickedId === personId ? null : personId)}
                  onMove={move}
                />
              ))}
            </SleepingPlace>
          );
        })}
      </div>
      <DragOverlay dropAnimation={null}>
        {draggedId && (
          <div className="flex min-h-11 items-center gap-3 rounded-field border border-ember bg-sheet px-3 font-semibold shadow-float">
            <Grip />
            {nameOf(draggedId)}
          </div>
        )}
      </DragOverlay>
    </DndContext>
  );
}
