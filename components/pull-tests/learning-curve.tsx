import { useId } from "react";
import { linePath } from "@/lib/domain/drawing/path";
import type { GroundLearningView, PullTestView } from "@/lib/domain/pull-test/views";
import { formatFactor } from "@/lib/format/pull-tests";

const WIDTH = 460;
const HEIGHT = 262;
const LEFT = 14;
const RIGHT = 14;
const TOP = 20;
const AXIS = 176;
/** Readings stand below the axis in so many rows, so that neighbours do not cover each other. */
const ROWS = 4;
const ROW_HEIGHT = 11;
const TICKS = [0.1, 0.2, 0.3, 0.5, 0.7, 1, 1.4, 2, 3, 5, 10];
const MAX_MARKS = 60;

interface LearningCurveProps {
  readonly view: GroundLearningView;
  readonly readings: readonly PullTestView[];
}

/** The estimate of a ground as a curve that narrows: dashed by the table, full with the readings, each drawn below. */
export function LearningCurve({ view, readings }: LearningCurveProps) {
  const titleId = useId();
  const { curve } = view;
  const first = curve[0]?.logFactor ?? -1;
  const last = curve[curve.length - 1]?.logFactor ?? 1;
  const placeX = (log: number) => LEFT + ((log - first) / (last - first)) * (WIDTH - LEFT - RIGHT);
  const top = Math.max(...curve.map((point) => Math.max(point.before, point.after)));
  const placeY = (density: number) => AXIS - (density / top) * (AXIS - TOP);
  const before = curve.map((point): [number, number] => [placeX(point.logFactor), placeY(point.before)]);
  const after = curve.map((point): [number, number] => [placeX(point.logFactor), placeY(point.after)]);
  const middle = placeX(Math.log(view.factor));
  const isLearned = view.from !== "table";
  const title = `Strength of the ground as a multiple of the table: ${formatFactor(view.factor)}, nine of ten chances between ${formatFactor(view.lowFactor)} and ${formatFactor(view.highFactor)}.`;
  return (
    <svg viewBox={`0 0 ${WIDTH} ${HEIGHT}`} role="img" aria-labelledby={titleId} className="block h-auto w-full">
      <title id={titleId}>{title}</title>
      {isLearned && (
        <path d={`${linePath(after)}L${placeX(last)} ${AXIS}L${placeX(first)} ${AXIS}Z`} className="fill-spruce-wash" />
      )}
      <path d={linePath(before)} fill="none" className="stroke-pencil" strokeWidth={1.4} strokeDasharray="6 4" />
      {isLearned && <path d={linePath(after)} fill="none" className="stroke-ink" strokeWidth={2.2} />}
      <path d={`M${LEFT} ${AXIS}H${WIDTH - RIGHT}`} className="stroke-ink" strokeWidth={1} />
      {TICKS.filter((tick) => Math.log(tick) > first && Math.log(tick) < last).map((tick) => (
        <g key={tick}>
          <path d={`M${placeX(Math.log(tick))} ${AXIS}v5`} className="stroke-ink" strokeWidth={1} />
          <text x={placeX(Math.log(tick))} y={AXIS + 18} textAnchor="middle" className="fill-pencil text-13">
            {tick}
          </text>
        </g>
      ))}
      {isLearned && (
        <g className="text-spruce">
          <path d={`M${middle} ${TOP - 4}V${AXIS}`} stroke="currentColor" strokeWidth={1.6} />
          <path
            d={`M${placeX(Math.log(view.lowFactor))} ${AXIS}H${placeX(Math.log(view.highFactor))}`}
            stroke="currentColor"
            strokeWidth={5}
          />
          <text
            x={Math.min(WIDTH - 40, Math.max(40, middle))}
            y={TOP - 8}
            textAnchor="middle"
            className="fill-current text-13 font-bold"
          >
            {formatFactor(view.factor)}
          </text>
        </g>
      )}
      {readings.slice(0, MAX_MARKS).map((reading, index) => (
        <ReadingMark
          key={reading.id}
          reading={reading}
          placeX={(log) => placeX(Math.min(last, Math.max(first, log)))}
          y={AXIS + 31 + (index % ROWS) * ROW_HEIGHT}
        />
      ))}
    </svg>
  );
}

/** A disc where the ground gave way; an arrow to the right where it held more than was pulled. */
function ReadingMark(props: {
  readonly reading: PullTestView;
  readonly placeX: (log: number) => number;
  readonly y: number;
}) {
  const { fit } = props.reading;
  if (fit.status !== "counts" && fit.status !== "off") return null;
  if (fit.ratio === null) return null;
  const x = props.placeX(Math.log(fit.ratio));
  const isOff = fit.status === "off";
  const tone = isOff ? "text-pencil" : fit.isOutlier ? "text-ember" : "text-ink";
  return (
    <g className={tone}>
      {fit.kind === "exact" ? (
        <circle
          cx={x}
          cy={props.y}
          r={4}
          fill={isOff ? "none" : "currentColor"}
          stroke="currentColor"
          strokeWidth={1.4}
        />
      ) : (
        <path
          d={`M${x} ${props.y - 4}v8M${x} ${props.y}h14m-4 -4l4 4l-4 4`}
          fill="none"
          stroke="currentColor"
          strokeWidth={1.6}
          strokeDasharray={isOff ? "2 2" : undefined}
        />
      )}
      {fit.status === "counts" && fit.isOutlier && (
        <circle cx={x} cy={props.y} r={7.5} fill="none" stroke="currentColor" strokeWidth={1.4} />
      )}
    </g>
  );
}

/** What the marks mean, in words; once a page. */
export function CurveKey() {
  return (
    <ul className="flex flex-wrap gap-x-5 gap-y-1 text-13 text-pencil">
      <li className="flex items-center gap-2">
        <svg width="26" height="12" aria-hidden="true">
          <path d="M1 6H25" className="stroke-pencil" strokeWidth={1.4} strokeDasharray="6 4" />
        </svg>
        by the table
      </li>
      <li className="flex items-center gap-2">
        <svg width="26" height="12" aria-hidden="true">
          <path d="M1 6H25" className="stroke-ink" strokeWidth={2.2} />
        </svg>
        with the readings
      </li>
      <li className="flex items-center gap-2">
        <svg width="12" height="12" aria-hidden="true">
          <circle cx={6} cy={6} r={4} className="fill-ink" />
        </svg>
        the ground gave way
      </li>
      <li className="flex items-center gap-2">
        <svg width="18" height="12" aria-hidden="true">
          <path d="M2 2v8M2 6h14m-4 -4l4 4l-4 4" fill="none" className="stroke-ink" strokeWidth={1.6} />
        </svg>
        held that much or more
      </li>
      <li className="flex items-center gap-2">
        <svg width="18" height="18" aria-hidden="true">
          <circle cx={9} cy={9} r={4} className="fill-ember" />
          <circle cx={9} cy={9} r={7.5} fill="none" className="stroke-ember" strokeWidth={1.4} />
        </svg>
        does not fit the others
      </li>
    </ul>
  );
}
