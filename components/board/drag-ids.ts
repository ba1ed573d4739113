import type { Spot } from "./plan-change";

/** What can be dragged, and where it can be dropped; the same data serves sensors, previews and announcements. */
export type Piece =
  { readonly kind: "tray"; readonly anchorId: string } | { readonly kind: "spot"; readonly spot: Spot };

export type Target = { readonly kind: "spot"; readonly spot: Spot } | { readonly kind: "tray" };

/** A tie-out stands on the drawing and in the list. */
export type Place = "plan" | "list";

export const TRAY_TARGET = "drop:tray";
export const trayPieceId = (anchorId: string) => `tray:${anchorId}`;
export const spotPieceId = ({ pitchId, tieOutId }: Spot) => `plan:${pitchId} ${tieOutId}`;
export const spotTargetId = (place: Place, { pitchId, tieOutId }: Spot) => `drop-${place}:${pitchId} ${tieOutId}`;

export function readPiece(id: unknown): Piece | null {
  const [kind = "", rest = ""] = String(id).split(/:(.*)/s);
  if (kind === "tray") return { kind: "tray", anchorId: rest };
  if (kind === "plan") return { kind: "spot", spot: readSpot(rest) };
  return null;
}

export function readTarget(id: unknown): Target | null {
  if (id === TRAY_TARGET) return { kind: "tray" };
  const [kind = "", rest = ""] = String(id).split(/:(.*)/s);
  return kind === "drop-plan" || kind === "drop-list" ? { kind: "spot", spot: readSpot(rest) } : null;
}

function readSpot(text: string): Spot {
  const [pitchId = "", tieOutId = ""] = text.split(" ");
  return { pitchId, tieOutId };
}
