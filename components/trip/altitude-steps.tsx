import { STATE_TONES } from "@/components/drawing/state-mark";
import { STATE_MARKS } from "@/lib/domain/drawing/state-marks";
import { PlacedMark } from "@/components/drawing/mark-paths";
import type { Preferences } from "@/lib/domain/preferences";
import type { CampSummary } from "@/lib/domain/views";
import { METRES } from "@/lib/format/factors";
import { formatAltitude } from "@/lib/format/lengths";

const WIDTH = 760;
const HEIGHT = 220;
const LEFT = 52;
const TOP = 22;
const FLOOR = 168;

/** Round steps of an axis: 1, 2 or 5 times a power of ten, about four of them. */
function niceStep(span: number): number {
  const rough = Math.max(span, 1) / 3;
  const power = 10 ** Math.floor(Math.log10(rough));
  const factor = [1, 2, 5, 10].find((one) => one * power >= rough) ?? 10;
  return factor * power;
}

/** How high each camp lies, as steps; what lies between two camps is not known and not drawn. */
export function AltitudeSteps({
  camps,
  unit,
}: {
  readonly camps: readonly CampSummary[];
  readonly unit: Preferences["lengthUnit"];
}) {
  const known = camps.flatMap((camp) => (camp.altitudeM === null ? [] : [camp.altitudeM / METRES[unit]]));
  if (known.length < 2) return null;
  const step = niceStep(Math.max(...known) - Math.min(...known));
  const low = (Math.floor(Math.min(...known) / step) - 1) * step;
  const high = Math.ceil(Math.max(...known) / step + 0.25) * step;
  const y = (value: number) => FLOOR - ((value - low) / (high - low)) * (FLOOR - TOP);
  const nights = camps.reduce((sum, camp) => sum + camp.days.length, 0);
  const nightWidth = (WIDTH - LEFT - 8) / nights;
  const starts = camps.map((_, index) => camps.slice(0, index).reduce((sum, camp) => sum + camp.days.length, 0));
  const steps = camps.map((camp, index) => ({
    camp,
    x: LEFT + (starts[index] ?? 0) * nightWidth,
    width: camp.days.length * nightWidth,
    y: camp.altitudeM === null ? null : y(camp.altitudeM / METRES[unit]),
  }));
  const ticks = Array.from({ length: Math.round((high - low) / step) }, (_, index) => low + (index + 1) * step);
  const summary = camps
    .map((camp) => `${camp.name} ${camp.altitudeM === null ? "not known" : formatAltitude(camp.altitudeM, unit)}`)
    .join(", ");
  return (
    <figure className="mb-8 hidden sm:block">
      <svg viewBox={`0 0 ${WIDTH} ${HEIGHT}`} role="img" aria-label={`Camps' altitudes: ${summary}`} className="w-full">
        {ticks.map((tick) => (
          <g key={tick}>
            <path d={`M${LEFT} ${y(tick)}H${WIDTH}`} className="stroke-hair" strokeWidth={1} />
            <text x={LEFT - 10} y={y(tick) + 4} textAnchor="end" className="fill-pencil text-13">
              {tick}
            </text>
          </g>
        ))}
        {steps.map(({ camp, x, width, y: top }, index) => {
          const before = steps[index - 1];
          const middle = x + width / 2;
          return (
            <g key={camp.id}>
              {top !== null && (
                <>
                  <path d={`M${x} ${FLOOR}V${top}H${x + width}V${FLOOR}Z`} className="fill-hair" opacity={0.38} />
                  <path d={`M${x} ${top}H${x + width}`} className="stroke-ink" strokeWidth={2} strokeLinecap="round" />
                  {before && before.y !== null && (
                    <path
                      d={`M${x} ${before.y}V${top}`}
                      className="stroke-pencil"
                      strokeWidth={1.4}
                      strokeDasharray="1.5 4"
                      strokeLinecap="round"
                    />
                  )}
                </>
              )}
              <g className={STATE_TONES[camp.verdict]}>
                <circle cx={middle} cy={top ?? FLOOR - 12} r={11} className="fill-paper" />
                <PlacedMark paths={STATE_MARKS[camp.verdict].paths} x={middle} y={top ?? FLOOR - 12} size={19} />
              </g>
              <CampLabel name={camp.name} x={middle} width={width} isLower={index % 2 === 1 && camps.length > 5} />
            </g>
          );
        })}
        <path d={`M${LEFT} ${FLOOR}H${WIDTH}`} className="stroke-hair" strokeWidth={1} />
      </svg>
      <figcaption className="text-13 text-pencil">
        Camps&rsquo; altitudes, {unit}. The way between them is not drawn.
      </figcaption>
    </figure>
  );
}

function CampLabel({ name, x, width, isLower }: { name: string; x: number; width: number; isLower: boolean }) {
  const fits = Math.max(5, Math.floor((isLower ? width * 1.8 : width) / 7));
  const text = name.length > fits ? `${name.slice(0, fits - 1)}…` : name;
  return (
    <text x={x} y={FLOOR + (isLower ? 38 : 20)} textAnchor="middle" className="fill-ink text-13 font-semibold">
      {text}
    </text>
  );
}
