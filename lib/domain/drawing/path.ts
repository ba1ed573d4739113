/** Small builders of SVG path strings, shared by the drawings on screen and on paper. */

export type Point = readonly [x: number, y: number];

/** One stroke or fill of a mark. Neither given means stroked. */
export interface MarkPath {
  readonly d: string;
  readonly stroke?: boolean;
  readonly fill?: boolean;
  /** In units of the mark's box. */
  readonly strokeWidth?: number;
}

export function formatCoordinate(value: number): string {
  const rounded = Math.round(value * 100) / 100;
  return String(Object.is(rounded, -0) ? 0 : rounded);
}

export function pointText([x, y]: Point): string {
  return `${formatCoordinate(x)} ${formatCoordinate(y)}`;
}

export function linePath(points: readonly Point[], isClosed = false): string {
  if (points.length === 0) return "";
  return `M${points.map(pointText).join("L")}${isClosed ? "Z" : ""}`;
}

/** Two half arcs: one full arc command has no defined way round. */
export function circlePath(centreX: number, centreY: number, radius: number): string {
  const r = formatCoordinate(radius);
  const left = pointText([centreX - radius, centreY]);
  const right = pointText([centreX + radius, centreY]);
  return `M${left}A${r} ${r} 0 1 1 ${right}A${r} ${r} 0 1 1 ${left}Z`;
}

/** Arc round a centre between two paper bearings (degrees clockwise from up), clockwise. */
export function arcPath(centre: Point, radius: number, fromDeg: number, toDeg: number): string {
  const sweepDeg = (((toDeg - fromDeg) % 360) + 360) % 360;
  const r = formatCoordinate(radius);
  const start = polar(centre, radius, fromDeg);
  const end = polar(centre, radius, toDeg);
  return `M${pointText(start)}A${r} ${r} 0 ${sweepDeg > 180 ? 1 : 0} 1 ${pointText(end)}`;
}

/** Point at a distance and a paper bearing (degrees clockwise from up; y runs down the paper). */
export function polar([x, y]: Point, radius: number, bearingDeg: number): Point {
  const angle = (bearingDeg * Math.PI) / 180;
  return [x + radius * Math.sin(angle), y - radius * Math.cos(angle)];
}

/** Paper bearing from one point to another, 0…360; 0 where the two are one. */
export function bearingBetween(from: Point, to: Point): number {
  const bearing = (Math.atan2(to[0] - from[0], from[1] - to[1]) * 180) / Math.PI;
  return (bearing + 360) % 360;
}

export function clamp(value: number, min: number, max: number): number {
  return Math.min(max, Math.max(min, value));
}
