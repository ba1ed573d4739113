import { useId } from "react";
import type { CurvePoint } from "@/lib/calc/kit/search-kit";
import type { Preferences } from "@/lib/domain/preferences";
import { linePath } from "@/lib/domain/drawing/path";
import { formatSpeed } from "@/lib/format/speeds";
import { joinWords } from "@/lib/format/words";
import { massOfUnits } from "./kit-words";

const WIDTH = 460;
const HEIGHT = 220;
const LEFT = 64;
const RIGHT = 24;
const TOP = 20;
const BOTTOM = 42;

const signed = (extraMs: number, unit: Preferences["speedUnit"]): string =>
  extraMs === 0
    ? "as planned"
    : `${extraMs > 0 ? "+" : "−"}${formatSpeed(Math.abs(extraMs), unit === "Beaufort" ? "km/h" : unit)}`;

/** Mass of the lightest kit against the gust, as steps: a kit holds up to a gust, then another is needed. */
export function KitCurve({
  points,
  speedUnit,
}: {
  readonly points: readonly CurvePoint[];
  readonly speedUnit: Preferences["speedUnit"];
}) {
  const titleId = useId();
  const known = points.flatMap((point) => (point.massUnits === null ? [] : [{ ...point, massUnits: point.massUnits }]));
  const ends = points.find((point) => point.massUnits === null && point.extraMs > 0);
  const [least, most] = [Math.min(...points.map((one) => one.extraMs)), Math.max(...points.map((one) => one.extraMs))];
  const top = Math.max(1, ...known.map((one) => one.massUnits)) * 1.15;
  const placeX = (extraMs: number) => LEFT + ((extraMs - least) / Math.max(1, most - least)) * (WIDTH - LEFT - RIGHT);
  const placeY = (massUnits: number) => HEIGHT - BOTTOM - (massUnits / top) * (HEIGHT - TOP - BOTTOM);
  return (
    <div className="grid items-start gap-x-10 gap-y-4 lg:grid-cols-[minmax(0,30rem)_minmax(0,1fr)]">
      <svg viewBox={`0 0 ${WIDTH} ${HEIGHT}`} role="img" aria-labelledby={titleId} className="block h-auto w-full">
        <title id={titleId}>Mass of the lightest kit against the gust; the table has the same numbers.</title>
        <path d={`M${LEFT} ${HEIGHT - BOTTOM}H${WIDTH - RIGHT}`} className="stroke-hair" strokeWidth={1} />
        <path
          d={`M${placeX(0)} ${TOP}V${HEIGHT - BOTTOM}`}
          className="stroke-pencil"
          strokeWidth={1}
          strokeDasharray="2 4"
        />
        <path
          d={linePath(known.map((one) => [placeX(one.extraMs), placeY(one.massUnits)]))}
          className="stroke-ink"
          fill="none"
          strokeWidth={2}
          strokeLinejoin="round"
        />
        {known.map((one) => (
          <g key={one.extraMs}>
            <circle
              cx={placeX(one.extraMs)}
              cy={placeY(one.massUnits)}
              r={one.extraMs === 0 ? 5 : 3}
              className="fill-ink"
            />
            {(one.extraMs === 0 || one.extraMs === known.at(-1)?.extraMs || one.extraMs === known[0]?.extraMs) && (
              <text
                x={placeX(one.extraMs)}
                y={placeY(one.massUnits) - 10}
                textAnchor="middle"
                className="fill-ink text-13 font-semibold"
              >
                {massOfUnits(one.massUnits)}
              </text>
            )}
          </g>
        ))}
        {ends && (
          <path d={`M${placeX(ends.extraMs)} ${TOP}V${HEIGHT - BOTTOM}`} className="stroke-rowan" strokeWidth={2} />
        )}
        {points
          .filter((one) => one.extraMs % 2 === 0)
          .map((one) => (
            <text
              key={one.extraMs}
              x={placeX(one.extraMs)}
              y={HEIGHT - BOTTOM + 18}
              textAnchor="middle"
              className="fill-pencil text-13"
            >
              {one.extraMs === 0 ? "0" : `${one.extraMs > 0 ? "+" : "−"}${Math.abs(one.extraMs)}`}
            </text>
          ))}
        <text x={(LEFT + WIDTH - RIGHT) / 2} y={HEIGHT - 6} textAnchor="middle" className="fill-pencil text-13">
          gust at every camp, m/s more or less
        </text>
      </svg>
      <table className="w-full max-w-[26rem] border-collapse text-left text-15">
        <thead>
          <tr className="text-13 text-pencil [&>th]:pr-4 [&>th]:pb-1 [&>th]:font-normal">
            <th scope="col">Gust</th>
            <th scope="col">Lightest kit</th>
          </tr>
        </thead>
        <tbody>
          {points.map((point) => (
            <tr
              key={point.extraMs}
              className={`border-t border-hair [&>*]:py-1 [&>*]:pr-4 ${point.extraMs === 0 ? "font-bold" : ""}`}
            >
              <th scope="row" className="font-[inherit] whitespace-nowrap">
                {signed(point.extraMs, speedUnit)}
              </th>
              <td>
                {point.massUnits === null
                  ? `none holds${point.campNames.length > 0 ? ` at ${joinWords(point.campNames)}` : ""}`
                  : massOfUnits(point.massUnits)}
              </td>
            </tr>
          ))}
        </tbody>
      </table>
    </div>
  );
}
