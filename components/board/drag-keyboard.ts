import type { KeyboardCoordinateGetter } from "@dnd-kit/core";
import { readTarget, TRAY_TARGET } from "./drag-ids";

const STEPS: Readonly<Record<string, number>> = { ArrowRight: 1, ArrowDown: 1, ArrowLeft: -1, ArrowUp: -1 };

/** One press of an arrow key moves to the next tie-out of the drawing, in the order of their numbers, then the tray. */
export function makeCoordinateGetter(orderOf: () => readonly string[]): KeyboardCoordinateGetter {
  return (event, { context }) => {
    const step = STEPS[event.code];
    if (step === undefined) return undefined;
    event.preventDefault();
    const { droppableRects, collisionRect, over } = context;
    if (!collisionRect) return undefined;
    const stops = [...orderOf(), TRAY_TARGET].filter((id) => droppableRects.has(id));
    if (stops.length === 0) return undefined;
    const at = over && readTarget(over.id) ? stops.indexOf(String(over.id)) : -1;
    const next = at < 0 ? (step > 0 ? 0 : stops.length - 1) : (at + step + stops.length) % stops.length;
    const rect = droppableRects.get(stops[next] ?? "");
    if (!rect) return undefined;
    return {
      x: rect.left + rect.width / 2 - collisionRect.width / 2,
      y: rect.top + rect.height / 2 - collisionRect.height / 2,
    };
  };
}
