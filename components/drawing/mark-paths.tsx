import type { MarkPath } from "@/lib/domain/drawing/path";

/** Strokes and fills of a mark in the current colour. */
export function MarkPaths({ paths }: { readonly paths: readonly MarkPath[] }) {
  return paths.map((path) => (
    <path
      key={path.d}
      d={path.d}
      fill={path.fill ? "currentColor" : "none"}
      stroke={path.fill && !path.stroke ? "none" : "currentColor"}
      strokeWidth={path.strokeWidth}
      strokeLinecap="round"
      strokeLinejoin="round"
    />
  ));
}

const BOX = 24;

/** A mark laid into a larger drawing: its box of 24 centred on a point, scaled and turned. */
export function PlacedMark({
  paths,
  x,
  y,
  size,
  turnDeg = 0,
}: {
  readonly paths: readonly MarkPath[];
  readonly x: number;
  readonly y: number;
  readonly size: number;
  readonly turnDeg?: number;
}) {
  const scale = size / BOX;
  const round = (value: number) => Math.round(value * 100) / 100;
  return (
    <g
      transform={`translate(${round(x)} ${round(y)}) rotate(${round(turnDeg)}) scale(${round(scale)}) translate(-12 -12)`}
    >
      <MarkPaths paths={paths} />
    </g>
  );
}
