"use client";

import {
  DndContext,
  DragOverlay,
  KeyboardSensor,
  PointerSensor,
  useSensor,
  useSensors,
  type Announcements,
  type KeyboardCoordinateGetter,
} from "@dnd-kit/core";
import { useState } from "react";
import { Grip } from "@/components/sleepers/person-chip";
import { Button } from "@/components/ui/button";
import type { LoadPlanView } from "@/lib/domain/pack/load-view";
import { LoadDialog } from "./load-dialog";
import { LoadPlace } from "./load-place";
import { moveStack, NOBODY, setFixed, stacksAt, totalsOf, type Shares, type Stack } from "./load-state";
import { useSavedLoads, type SaveLoads } from "./use-saved-loads";

const INSTRUCTIONS = {
  draggable:
    "Press space to pick it up, the arrow keys to go from person to person, space to put it down, escape to leave it. Or press its name to choose who carries how many.",
};

const toNextPlace: KeyboardCoordinateGetter = (event, { context }) => {
  const step = { ArrowDown: 1, ArrowRight: 1, ArrowUp: -1, ArrowLeft: -1 }[event.code];
  if (step === undefined) return undefined;
  event.preventDefault();
  const places = context.droppableContainers.getEnabled();
  const at = places.findIndex((place) => place.id === (context.over?.id ?? places[0]?.id));
  const next = places[(at + step + places.length) % places.length];
  const target = next && context.droppableRects.get(next.id);
  return target ? { x: target.left + 12, y: target.top + 12 } : undefined;
};

const stackId = ({ piece, placeId }: Stack) => `${piece.key} ${placeId}`;

/** Everybody with what they carry of the group's, and what nobody carries yet; by drag, by tap or by keyboard. */
export function LoadBoard({
  plan,
  tripId,
  action,
}: {
  readonly plan: LoadPlanView;
  readonly tripId: string;
  readonly action: SaveLoads;
}) {
  const [shares, setShares] = useState<Shares>(plan.shares);
  const savedText = JSON.stringify(plan.shares);
  const [shownText, setShownText] = useState(savedText);
  const [past, setPast] = useState<readonly Shares[]>([]);
  const [opened, setOpened] = useState<string | null>(null);
  const [dragged, setDragged] = useState<string | null>(null);
  const [said, setSaid] = useState("");
  const { state, send } = useSavedLoads(action, tripId);
  if (savedText !== shownText && state.kind !== "saving") {
    setShownText(savedText);
    setShares(plan.shares);
  }
  const sensors = useSensors(
    useSensor(PointerSensor, { activationConstraint: { distance: 6 } }),
    useSensor(KeyboardSensor, { coordinateGetter: toNextPlace }),
  );
  const placeIds = [NOBODY, ...plan.people.map((person) => person.id)];
  const stacks = placeIds.flatMap((placeId) => stacksAt(plan, shares, placeId));
  const stackOf = (id: string | number | null) => stacks.find((stack) => stackId(stack) === id) ?? null;
  const nameOf = (placeId: string | number | undefined) =>
    plan.people.find((person) => person.id === placeId)?.name ?? "nobody";

  const change = (next: Shares, sentence: string) => {
    if (next === shares) return;
    setPast([...past.slice(-49), shares]);
    setShares(next);
    setSaid(sentence);
    void send(next);
  };
  const move = (stack: Stack, toId: string, count: number) =>
    change(moveStack(shares, stack, toId, count), `${stack.piece.name}: ${nameOf(toId)}.`);
  const announcements: Announcements = {
    onDragStart: ({ active }) => `${stackOf(active.id)?.piece.name ?? "It"} picked up.`,
    onDragOver: ({ over }) => `Over ${nameOf(over?.id)}.`,
    onDragEnd: ({ over }) => `Put down with ${nameOf(over?.id)}.`,
    onDragCancel: () => "It stays where it was.",
  };
  const totals = totalsOf(plan, shares);
  const scale = Math.max(1, ...totals.map((total) => total.share));
  const draggedStack = stackOf(dragged);

  return (
    <DndContext
      id="loads"
      sensors={sensors}
      accessibility={{ announcements, screenReaderInstructions: INSTRUCTIONS }}
      onDragStart={({ active }) => setDragged(String(active.id))}
      onDragCancel={() => setDragged(null)}
      onDragEnd={({ active, over }) => {
        setDragged(null);
        const stack = stackOf(active.id);
        if (over && stack) move(stack, String(over.id), stack.count);
      }}
    >
      <div className="mb-3 flex flex-wrap items-center gap-3">
        <Button
          disabled={past.length === 0}
          onClick={() => {
            const last = past.at(-1);
            if (!last) return;
            setPast(past.slice(0, -1));
            setShares(last);
            void send(last);
            setSaid("Undone.");
          }}
        >
          Undo
        </Button>
        <p role="status" className="text-15 text-pencil">
          {state.kind === "clean" && "Changes are saved as you make them."}
          {state.kind === "saving" && "Saving…"}
          {state.kind === "saved" && `Saved ${state.at}.`}
          {state.kind === "failed" && <span className="font-semibold text-rowan">Not saved. {state.reason}</span>}
        </p>
        {state.kind === "failed" && <Button onClick={() => void send(shares)}>Try again</Button>}
      </div>
      <p role="status" className="mb-2 min-h-6 text-15 font-semibold">
        {said}
      </p>
      <div className="grid items-start gap-x-8 gap-y-6 sm:grid-cols-2 xl:grid-cols-3">
        {placeIds.map((placeId) => (
          <LoadPlace
            key={placeId}
            placeId={placeId}
            total={totals.find((total) => total.person.id === placeId) ?? null}
            scale={scale}
            stacks={stacksAt(plan, shares, placeId)}
            idOf={stackId}
            onOpen={(stack) => setOpened(stackId(stack))}
          />
        ))}
      </div>
      <LoadDialog
        stack={stackOf(opened)}
        people={plan.people}
        onClose={() => setOpened(null)}
        onMove={(stack, toId, count) => {
          setOpened(null);
          move(stack, toId, count);
        }}
        onFix={(stack, isFixed) => {
          setOpened(null);
          change(
            setFixed(shares, stack, isFixed),
            isFixed ? `${stack.piece.name} stays.` : `${stack.piece.name} is free.`,
          );
        }}
      />
      <DragOverlay dropAnimation={null}>
        {draggedStack && (
          <div className="flex min-h-11 items-center gap-3 rounded-field border border-ember bg-sheet px-3 font-semibold shadow-float">
            <Grip />
            {draggedStack.count > 1 && `${draggedStack.count} × `}
            {draggedStack.piece.name}
          </div>
        )}
      </DragOverlay>
    </DndContext>
  );
}
