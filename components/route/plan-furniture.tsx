import type { Preferences } from "@/lib/domain/preferences";
import { LONG_UNITS } from "@/lib/format/distances";
import { niceStep } from "./profile-scale";

/** A bar of a round length, and north. */
export function PlanFurniture({
  metresPerPixel,
  unit,
  size,
}: {
  readonly metresPerPixel: number;
  readonly unit: Preferences["lengthUnit"];
  readonly size: { readonly width: number; readonly height: number };
}) {
  const long = LONG_UNITS[unit];
  const length = niceStep((90 * metresPerPixel) / long.metres, 1);
  const pixels = (length * long.metres) / metresPerPixel;
  const y = size.height - 18;
  return (
    <g aria-hidden="true">
      <path d={`M16 ${y - 5}v5h${pixels}v-5`} className="stroke-ink" strokeWidth={1.4} fill="none" />
      <text x={16 + pixels + 8} y={y + 1} className="fill-pencil text-13">
        {`${Number(length.toFixed(3))} ${long.name}`}
      </text>
      <path d={`M${size.width - 24} 46V16m-5 8 5-8 5 8`} className="stroke-ink" strokeWidth={1.4} fill="none" />
      <text x={size.width - 24} y={62} textAnchor="middle" className="fill-pencil text-13">
        N
      </text>
    </g>
  );
}
