import { useId } from "react";
import { linePath, type Point } from "@/lib/domain/drawing/path";

export interface PlotLine {
  readonly label: string;
  /** Null breaks the line: nothing is known there, or the anchor can't be used. */
  readonly points: readonly { readonly x: number; readonly newtons: number | null }[];
  readonly isMain: boolean;
}

interface CapacityPlotProps {
  readonly title: string;
  readonly xLabel: string;
  readonly lines: readonly PlotLine[];
  /** Where the person's own choice stands. */
  readonly at: { readonly x: number; readonly newtons: number } | null;
  readonly formatForce: (newtons: number) => string;
}

const WIDTH = 460;
const HEIGHT = 280;
const LEFT = 58;
const RIGHT = 54;
const TOP = 16;
const BOTTOM = 44;
/** Lines differ by their dashes too, never by colour alone. */
const DASHES = [undefined, "7 4", "2 4", "10 3 2 3"];

/** What an anchor holds against an angle. The table beside it has the same numbers. */
export function CapacityPlot({ title, xLabel, lines, at, formatForce }: CapacityPlotProps) {
  const titleId = useId();
  const xs = lines.flatMap((line) => line.points.map((point) => point.x));
  const [minX, maxX] = [Math.min(...xs), Math.max(...xs)];
  const largest = Math.max(1, ...lines.flatMap((line) => line.points.map((point) => point.newtons ?? 0)));
  const step = niceStep(largest / 4);
  const maxN = Math.ceil(largest / step) * step;
  const placeX = (x: number) => LEFT + ((x - minX) / Math.max(1, maxX - minX)) * (WIDTH - LEFT - RIGHT);
  const placeY = (newtons: number) => HEIGHT - BOTTOM - (newtons / maxN) * (HEIGHT - TOP - BOTTOM);
  const ticksN = Array.from({ length: Math.round(maxN / step) + 1 }, (_, i) => i * step);
  const ticksX = Array.from(
    { length: Math.floor((maxX - minX) / 15) + 1 },
    (_, i) => Math.ceil(minX / 15) * 15 + i * 15,
  );
  const ends = spread(
    lines.map((line) => {
      const last = line.points.findLast((point) => point.newtons !== null);
      return last && last.newtons !== null ? placeY(last.newtons) : null;
    }),
  );
  return (
    <svg viewBox={`0 0 ${WIDTH} ${HEIGHT}`} role="img" aria-labelledby={titleId} className="block h-auto w-full">
      <title id={titleId}>{title}</title>
      {ticksN.map((newtons) => (
        <g key={newtons}>
          <path d={`M${LEFT} ${placeY(newtons)}H${WIDTH - RIGHT}`} className="stroke-hair" strokeWidth={1} />
          <text x={LEFT - 6} y={placeY(newtons) + 4.5} textAnchor="end" className="fill-pencil text-13">
            {newtons === 0 ? "0" : formatForce(newtons)}
          </text>
        </g>
      ))}
      {ticksX
        .filter((x) => x <= maxX)
        .map((x) => (
          <text key={x} x={placeX(x)} y={HEIGHT - BOTTOM + 18} textAnchor="middle" className="fill-pencil text-13">
            {`${x}°`.replace("-", "−")}
          </text>
        ))}
      <text x={(LEFT + WIDTH - RIGHT) / 2} y={HEIGHT - 6} textAnchor="middle" className="fill-pencil text-13">
        {xLabel}
      </text>
      {lines.map((line, index) => (
        <g key={line.label} className={line.isMain ? "text-ink" : "text-pencil"}>
          {runs(line.points.map(({ x, newtons }) => (newtons === null ? null : [placeX(x), placeY(newtons)]))).map(
            (run) => (
              <path
                key={linePath(run)}
                d={linePath(run)}
                fill="none"
                stroke="currentColor"
                strokeWidth={line.isMain ? 2.2 : 1.4}
                strokeDasharray={line.isMain ? undefined : DASHES[(index % 3) + 1]}
                strokeLinejoin="round"
              />
            ),
          )}
          {ends[index] != null && (
            <text x={WIDTH - RIGHT + 6} y={ends[index] + 4.5} className="fill-current text-13 font-semibold">
              {line.label}
            </text>
          )}
        </g>
      ))}
      {at && (
        <circle cx={placeX(at.x)} cy={placeY(at.newtons)} r={5.5} className="fill-ember stroke-sheet" strokeWidth={2} />
      )}
    </svg>
  );
}

function niceStep(rough: number): number {
  const power = 10 ** Math.floor(Math.log10(rough));
  return [1, 2, 5, 10].map((one) => one * power).find((one) => one >= rough) ?? rough;
}

/** Pieces of a line between its gaps. */
function runs(points: readonly (Point | null)[]): readonly Point[][] {
  const found: Point[][] = [[]];
  for (const point of points) {
    if (point) found.at(-1)?.push(point);
    else found.push([]);
  }
  return found.filter((run) => run.length > 1);
}

/** Moves labels apart that would stand on each other. */
function spread(heights: readonly (number | null)[]): readonly (number | null)[] {
  const moved = [...heights];
  const order = heights.map((_, index) => index).sort((a, b) => (heights[a] ?? 0) - (heights[b] ?? 0));
  let before = -Infinity;
  for (const index of order) {
    const height = moved[index];
    if (height === null || height === undefined) continue;
    before = Math.max(height, before + 14);
    moved[index] = before;
  }
  return moved;
}
