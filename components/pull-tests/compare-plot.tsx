import { useId } from "react";
import type { ComparedPull } from "@/lib/domain/pull-test/compare";
import type { Preferences } from "@/lib/domain/preferences";
import { formatForceNumber } from "@/lib/format/forces";

const SIDE = 420;
const LEFT = 52;
const RIGHT = 12;
const TOP = 12;
const BOTTOM = 44;
const TICKS_N = [1, 2, 5, 10, 20, 50, 100, 200, 500, 1000, 2000, 5000, 10_000, 20_000, 50_000];

/** Measured against predicted force on logarithmic axes; what only held is an arrow upwards. */
export function ComparePlot({
  pulls,
  forceUnit,
}: {
  readonly pulls: readonly ComparedPull[];
  readonly forceUnit: Preferences["forceUnit"];
}) {
  const titleId = useId();
  const forces = pulls.flatMap((pull) => [pull.measuredN, pull.predictedN]);
  const lowN = Math.min(...forces) / 1.5;
  const highN = Math.max(...forces) * 1.7;
  const place = (newtons: number) => (Math.log(newtons) - Math.log(lowN)) / (Math.log(highN) - Math.log(lowN));
  const x = (newtons: number) => LEFT + place(newtons) * (SIDE - LEFT - RIGHT);
  const y = (newtons: number) => SIDE - BOTTOM - place(newtons) * (SIDE - TOP - BOTTOM);
  const ticks = TICKS_N.filter((tick) => tick > lowN && tick < highN);
  const ray = (factor: number) => {
    const from = factor >= 1 ? lowN : lowN / factor;
    const to = factor >= 1 ? highN / factor : highN;
    return `M${x(from)} ${y(from * factor)}L${x(to)} ${y(to * factor)}`;
  };
  return (
    <svg
      viewBox={`0 0 ${SIDE} ${SIDE}`}
      role="img"
      aria-labelledby={titleId}
      className="block h-auto w-full max-w-[30rem]"
    >
      <title id={titleId}>
        Measured against predicted force, both on logarithmic scales. The table below has the same.
      </title>
      {ticks.map((tick) => (
        <g key={tick}>
          <path
            d={`M${x(tick)} ${TOP}V${SIDE - BOTTOM}M${LEFT} ${y(tick)}H${SIDE - RIGHT}`}
            className="stroke-hair"
            strokeWidth={1}
          />
          <text x={x(tick)} y={SIDE - BOTTOM + 17} textAnchor="middle" className="fill-pencil text-13">
            {formatForceNumber(tick, forceUnit)}
          </text>
          <text x={LEFT - 6} y={y(tick) + 4.5} textAnchor="end" className="fill-pencil text-13">
            {formatForceNumber(tick, forceUnit)}
          </text>
        </g>
      ))}
      <path d={ray(1)} className="stroke-ink" strokeWidth={1.4} />
      <path d={`${ray(2)}${ray(0.5)}`} className="stroke-pencil" strokeWidth={1} strokeDasharray="5 4" fill="none" />
      <text x={(LEFT + SIDE - RIGHT) / 2} y={SIDE - 6} textAnchor="middle" className="fill-pencil text-13">
        predicted, {forceUnit}
      </text>
      <text
        x={12}
        y={(TOP + SIDE - BOTTOM) / 2}
        textAnchor="middle"
        transform={`rotate(-90 12 ${(TOP + SIDE - BOTTOM) / 2})`}
        className="fill-pencil text-13"
      >
        measured, {forceUnit}
      </text>
      {pulls.map((pull) => (
        <PullMark key={pull.id} pull={pull} x={x(pull.predictedN)} y={y(pull.measuredN)} />
      ))}
    </svg>
  );
}

function PullMark({ pull, x, y }: { readonly pull: ComparedPull; readonly x: number; readonly y: number }) {
  if (pull.kind === "at-least") {
    return (
      <path d={`M${x - 4} ${y}h8M${x} ${y}v-15m-4 4l4 -4l4 4`} fill="none" className="stroke-ink" strokeWidth={1.6} />
    );
  }
  if (pull.outcome === "bent") {
    return <rect x={x - 4} y={y - 4} width={8} height={8} className="fill-sheet stroke-ink" strokeWidth={1.6} />;
  }
  return <circle cx={x} cy={y} r={4.2} className="fill-ink stroke-sheet" strokeWidth={1} />;
}

/** What the marks and lines mean. */
export function ComparePlotKey() {
  return (
    <ul className="mt-2 flex flex-wrap gap-x-5 gap-y-1 text-13 text-pencil">
      <li className="flex items-center gap-2">
        <svg width="12" height="12" aria-hidden="true">
          <circle cx={6} cy={6} r={4.2} className="fill-ink" />
        </svg>
        came out
      </li>
      <li className="flex items-center gap-2">
        <svg width="12" height="12" aria-hidden="true">
          <rect x={2} y={2} width={8} height={8} fill="none" className="stroke-ink" strokeWidth={1.6} />
        </svg>
        bent
      </li>
      <li className="flex items-center gap-2">
        <svg width="12" height="18" aria-hidden="true">
          <path d="M2 17h8M6 17v-15m-4 4l4 -4l4 4" fill="none" className="stroke-ink" strokeWidth={1.6} />
        </svg>
        held that much or more
      </li>
      <li className="flex items-center gap-2">
        <svg width="26" height="12" aria-hidden="true">
          <path d="M1 6H25" className="stroke-pencil" strokeWidth={1.2} strokeDasharray="5 4" />
        </svg>
        twice and half the prediction
      </li>
    </ul>
  );
}
