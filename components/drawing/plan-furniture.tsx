import { NORTH_ARROW } from "@/lib/domain/drawing/wind-sector";
import { linePath, polar, pointText, type Point } from "@/lib/domain/drawing/path";
import { withUnit } from "@/lib/format/numbers";
import type { PlanLayout } from "./plan-layout";

export function NorthArrow({ at: [x, y], upDeg }: { readonly at: Point; readonly upDeg: number }) {
  const size = 34;
  return (
    <g className="text-ink" fill="none" stroke="currentColor">
      <text x={x} y={y - 18} textAnchor="middle" stroke="none" className="fill-ink text-13 font-bold">
        N
      </text>
      <g transform={`translate(${x} ${y + 8}) rotate(${-upDeg}) scale(${size / 24}) translate(-12 -12)`}>
        {NORTH_ARROW.map((part) => (
          <path key={part.d} d={part.d} strokeWidth={1} className={part.fill ? "fill-ink" : undefined} />
        ))}
      </g>
    </g>
  );
}

export function ScaleBar({
  at: [x, y],
  length,
  lengthM,
}: {
  readonly at: Point;
  readonly length: number;
  readonly lengthM: number;
}) {
  const left = x - length / 2;
  const right = x + length / 2;
  const top = y - 8;
  return (
    <g>
      <path
        d={`M${left} ${top - 4}V${top + 4}M${right} ${top - 4}V${top + 4}M${x} ${top - 2.5}V${top + 2.5}M${left} ${top}H${right}`}
        className="stroke-ink"
        strokeWidth={1.1}
        fill="none"
      />
      <text x={x} y={y + 13} textAnchor="middle" className="fill-pencil text-13">
        {withUnit(String(lengthM), "m")}
      </text>
    </g>
  );
}

/** The wind range: arrows blowing in along an arc; short ones all round when it may come from anywhere. */
export function WindOnPlan({ layout: { windArrows, windArc } }: { readonly layout: PlanLayout }) {
  const head = windArc ? 10 : 7;
  return (
    <g className="stroke-tarn" fill="none" strokeLinecap="round" strokeLinejoin="round">
      {windArc && (
        <path
          d={`M${pointText(windArc.from)}A${windArc.radius} ${windArc.radius} 0 ${windArc.isLarge ? 1 : 0} 1 ${pointText(windArc.to)}`}
          strokeWidth={1.6}
        />
      )}
      {windArrows.map(({ tail, head: tip }) => {
        const bearing = (Math.atan2(tail[0] - tip[0], tip[1] - tail[1]) * 180) / Math.PI;
        const barbs = linePath([polar(tip, head, bearing - 27), tip, polar(tip, head, bearing + 27)]);
        return <path key={linePath([tail, tip])} d={`${linePath([tail, tip])}${barbs}`} strokeWidth={1.8} />;
      })}
    </g>
  );
}
