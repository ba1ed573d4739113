import type { Announcements, ScreenReaderInstructions } from "@dnd-kit/core";
import { readPiece, readTarget } from "./drag-ids";
import type { Spot } from "./plan-change";

export interface Names {
  readonly anchor: (anchorId: string) => string;
  /** The anchor that stands at a tie-out, by name; null when none does. */
  readonly anchorAt: (spot: Spot) => string | null;
  readonly spot: (spot: Spot) => string;
}

export const DRAG_INSTRUCTIONS: ScreenReaderInstructions = {
  draggable:
    "Press space to pick it up, the arrow keys to go from tie-out to tie-out and to the tray, space to put it down, escape to leave it where it was. Or press enter to choose it and then enter on a tie-out.",
};

/** Says names, never ids; each step once. */
export function makeAnnouncements(names: Names): Announcements {
  const piece = (id: unknown) => {
    const one = readPiece(id);
    if (!one) return "The piece";
    return one.kind === "tray" ? names.anchor(one.anchorId) : (names.anchorAt(one.spot) ?? "The anchor");
  };
  const target = (id: unknown) => {
    const one = readTarget(id);
    if (!one) return null;
    return one.kind === "tray" ? "the tray" : names.spot(one.spot);
  };
  return {
    onDragStart: ({ active }) => `Picked up ${piece(active.id)}.`,
    onDragOver: ({ active, over }) => {
      const place = over && target(over.id);
      return place ? `${piece(active.id)} is over ${place}.` : `${piece(active.id)} is over no tie-out.`;
    },
    onDragEnd: ({ active, over }) => {
      const place = over && target(over.id);
      return place ? `${piece(active.id)} was put down at ${place}.` : `${piece(active.id)} went back.`;
    },
    onDragCancel: ({ active }) => `${piece(active.id)} stays where it was.`,
  };
}
