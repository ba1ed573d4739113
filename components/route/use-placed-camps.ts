"use client";

import { useMemo, useState } from "react";
import type { ActionState } from "@/lib/domain/action-state";
import type { RouteView } from "@/lib/domain/route/views";
import type { CampMoves } from "./elevation-profile";

export type PlaceAction = (state: ActionState, placing: object) => Promise<ActionState>;

interface Undo {
  readonly campId: string;
  readonly name: string;
  readonly atM: number | null;
  readonly position: {
    readonly latitude: number | null;
    readonly longitude: number | null;
    readonly altitudeM: number | null;
  };
}

/**
 * Camps as they are dragged along the line. A drop saves the place, and the camp's position becomes that of the line; one
 * step can be taken back.
 */
export function usePlacedCamps(saved: RouteView, action: PlaceAction) {
  const [moved, setMoved] = useState<Readonly<Record<string, number>>>({});
  const [selectedId, setSelectedId] = useState<string | null>(null);
  const [message, setMessage] = useState("");
  const [undo, setUndo] = useState<Undo | null>(null);

  const view = useMemo(
    (): RouteView => ({
      ...saved,
      stops: saved.stops.map((stop) => ({ ...stop, atM: moved[stop.campId] ?? stop.atM })),
    }),
    [saved, moved],
  );

  const forget = (campId: string) =>
    setMoved((now) => Object.fromEntries(Object.entries(now).filter(([id]) => id !== campId)));

  const send = async (campId: string, atM: number | null, position: "line" | Undo["position"]) => {
    const stop = saved.stops.find((one) => one.campId === campId);
    if (!stop) return false;
    setMessage(`Saving ${stop.name}…`);
    const placing = { tripId: saved.tripId, campId, version: stop.version, atM, position };
    const answer = await action({ status: "idle" }, placing);
    forget(campId);
    setMessage(
      answer.status === "refused"
        ? answer.formError
        : `${stop.name} is moved; its position and altitude are those of the line.`,
    );
    return answer.status === "done";
  };

  const place = async (campId: string, atM: number) => {
    const stop = saved.stops.find((one) => one.campId === campId);
    if (!stop) return;
    const { name, latitude, longitude, altitudeM } = stop;
    const before = { campId, name, atM: stop.atM, position: { latitude, longitude, altitudeM } };
    setMoved((now) => ({ ...now, [campId]: atM }));
    if (await send(campId, atM, "line")) setUndo(before);
  };

  const moves: CampMoves = {
    selectedId,
    onSelect: setSelectedId,
    onMove: (campId, atM) => setMoved((now) => ({ ...now, [campId]: atM })),
    onDrop: (campId, dropped) => {
      const atM = dropped ?? moved[campId];
      const stop = saved.stops.find((one) => one.campId === campId);
      if (atM === undefined || !stop || Math.abs(atM - (stop.atM ?? -1)) < 1) return forget(campId);
      void place(campId, atM);
    },
    onCancel: forget,
  };

  const takeBack = async () => {
    if (!undo) return;
    setUndo(null);
    if (await send(undo.campId, undo.atM, undo.position)) setMessage(`${undo.name} is back where it was.`);
  };

  return { view, moves, message, place, undoName: undo?.name ?? null, takeBack };
}
