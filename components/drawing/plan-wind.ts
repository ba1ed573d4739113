import { polar, type Point } from "@/lib/domain/drawing/path";
import type { Bounds, Fit, PlanView } from "@/lib/domain/drawing/plan-view";

interface WindSheet {
  readonly width: number;
  readonly height: number;
  readonly wind: { readonly fromDeg: number | null; readonly toDeg: number | null };
}

/** The bounds of the drawing, wider where the wind arrows go. */
export function withRoomForWind(
  view: PlanView,
  wind: { readonly fromDeg: number | null; readonly toDeg: number | null },
  roomM: number,
): Bounds {
  const { minX, minY, maxX, maxY } = view.bounds;
  if (wind.fromDeg === null || wind.toDeg === null) {
    const all = roomM * 0.45;
    return { minX: minX - all, minY: minY - all, maxX: maxX + all, maxY: maxY + all };
  }
  const span = (((wind.toDeg - wind.fromDeg) % 360) + 360) % 360;
  const bearing = ((view.toPaperDeg(wind.fromDeg) + span / 2) * Math.PI) / 180;
  const x = Math.sin(bearing) * roomM;
  const y = -Math.cos(bearing) * roomM;
  return {
    minX: minX + Math.min(0, x),
    minY: minY + Math.min(0, y),
    maxX: maxX + Math.max(0, x),
    maxY: maxY + Math.max(0, y),
  };
}

const MIN_SPAN_DEG = 14;

/** Arrows blowing in along an arc outside the lines; short ones all round for wind from anywhere. */
export function layoutWind(input: WindSheet, view: PlanView, fit: Fit, isSmall: boolean) {
  const { width, height, wind } = input;
  const length = isSmall ? 26 : 44;
  const centre = fit.place(view.middle);
  const edgeAt = (deg: number) => distanceToEdge(centre, deg, width, height, 12);
  if (wind.fromDeg === null || wind.toDeg === null) {
    const arrows = [0, 90, 180, 270].map((bearing) => {
      const edge = edgeAt(bearing);
      return { tail: polar(centre, edge, bearing), head: polar(centre, edge - length * 0.6, bearing) };
    });
    return { arrows, arc: null };
  }
  const span = (((wind.toDeg - wind.fromDeg) % 360) + 360) % 360;
  const drawn = Math.max(span, MIN_SPAN_DEG);
  const start = view.toPaperDeg(wind.fromDeg) + span / 2 - drawn / 2;
  const count = span < MIN_SPAN_DEG ? 1 : span <= 120 ? 3 : Math.round(span / 45) + 1;
  const bearings =
    count === 1 ? [start + drawn / 2] : Array.from({ length: count }, (_, i) => start + (drawn * i) / (count - 1));
  const inner = Math.min(...bearings.map((bearing) => edgeAt(bearing) - length));
  const reach = reachWithin(view, fit, centre, start, drawn) + (isSmall ? 44 : 62);
  const radius = Math.max(40, Math.min(inner, Math.max(reach, inner * 0.8)));
  return {
    arrows: bearings.map((bearing) => ({
      tail: polar(centre, radius + length, bearing),
      head: polar(centre, radius, bearing),
    })),
    arc: {
      radius,
      from: polar(centre, radius, start),
      to: polar(centre, radius, start + drawn),
      isLarge: drawn > 180,
    },
  };
}

/** How far out the shelter's own lines reach on the side of the wind, in pixels. */
function reachWithin(view: PlanView, fit: Fit, centre: Point, startDeg: number, spanDeg: number): number {
  const distances = view.tieOuts.map(({ to }) => {
    const [x, y] = fit.place(to);
    const bearing = (Math.atan2(x - centre[0], centre[1] - y) * 180) / Math.PI;
    const offset = (((bearing - startDeg + 25) % 360) + 360) % 360;
    return offset <= spanDeg + 50 ? Math.hypot(x - centre[0], y - centre[1]) : 0;
  });
  return Math.max(0, ...distances);
}

function distanceToEdge([x, y]: Point, bearingDeg: number, width: number, height: number, inset: number): number {
  const angle = (bearingDeg * Math.PI) / 180;
  const dx = Math.sin(angle);
  const dy = -Math.cos(angle);
  const alongX = dx > 1e-9 ? (width - inset - x) / dx : dx < -1e-9 ? (inset - x) / dx : Infinity;
  const alongY = dy > 1e-9 ? (height - inset - y) / dy : dy < -1e-9 ? (inset - y) / dy : Infinity;
  return Math.min(alongX, alongY);
}
