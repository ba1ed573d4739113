import { G, Path, Svg } from "@react-pdf/renderer";
import type { AnchorSpec, Verdict } from "@/lib/calc/types";
import { anchorMark, type AnchorMark } from "@/lib/domain/drawing/anchor-marks";
import type { MarkPath, Point } from "@/lib/domain/drawing/path";
import { STATE_MARKS } from "@/lib/domain/drawing/state-marks";
import { INK } from "../theme";

const BOX = 24;

function MarkPaths({ paths }: { paths: readonly MarkPath[] }) {
  return paths.map((path, index) => (
    <Path
      key={index}
      d={path.d}
      fill={path.fill ? INK : "none"}
      stroke={path.fill ? "none" : INK}
      strokeWidth={path.fill ? 0 : (path.strokeWidth ?? 1.5)}
      strokeLinejoin="round"
    />
  ));
}

/** A mark of 24 × 24 inside a larger drawing, its middle at a point. */
export function PlacedMark({
  paths,
  centre,
  size,
  turnDeg = 0,
}: {
  paths: readonly MarkPath[];
  centre: Point;
  size: number;
  turnDeg?: number;
}) {
  const scale = size / BOX;
  const move = `translate(${centre[0] - size / 2}, ${centre[1] - size / 2}) scale(${scale})`;
  return (
    <G transform={turnDeg === 0 ? move : `${move} rotate(${turnDeg}, ${BOX / 2}, ${BOX / 2})`}>
      <MarkPaths paths={paths} />
    </G>
  );
}

function LooseMark({ paths, size }: { paths: readonly MarkPath[]; size: number }) {
  return (
    <Svg width={size} height={size} viewBox={`0 0 ${BOX} ${BOX}`}>
      <MarkPaths paths={paths} />
    </Svg>
  );
}

export function AnchorIcon({ spec, size }: { spec: AnchorSpec; size: number }) {
  return <LooseMark paths={anchorMark(spec).paths} size={size} />;
}

export function StateIcon({ verdict, size }: { verdict: Verdict; size: number }) {
  return <LooseMark paths={STATE_MARKS[verdict].paths} size={size} />;
}

export function turnOfMark(mark: AnchorMark, lineBearingDeg: number): number {
  return mark.turnsWithPull ? lineBearingDeg : 0;
}
