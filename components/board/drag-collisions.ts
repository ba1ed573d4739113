import { pointerWithin, type Collision, type CollisionDetection } from "@dnd-kit/core";
import { TRAY_TARGET } from "./drag-ids";

/** Under the pointer, a tie-out goes before the tray; with the keyboard, the place that the piece was moved onto. */
export const findTarget: CollisionDetection = (args) => {
  if (args.pointerCoordinates) {
    const hits = pointerWithin(args);
    const spots = hits.filter((hit) => hit.id !== TRAY_TARGET);
    return spots.length > 0 ? spots : hits;
  }
  const { collisionRect, droppableRects, droppableContainers } = args;
  const x = collisionRect.left + collisionRect.width / 2;
  const y = collisionRect.top + collisionRect.height / 2;
  const hits = droppableContainers.flatMap((container): (Collision & { distance: number })[] => {
    const rect = droppableRects.get(container.id);
    if (!rect || String(container.id).startsWith("drop-list")) return [];
    const distance = Math.hypot(rect.left + rect.width / 2 - x, rect.top + rect.height / 2 - y);
    return distance <= 12
      ? [{ id: container.id, data: { droppableContainer: container, value: distance }, distance }]
      : [];
  });
  return hits.sort((a, b) => a.distance - b.distance);
};
