import { useId } from "react";
import type { AnchorSpec, ShelterModel, Verdict } from "@/lib/calc/types";
import { anchorMark } from "@/lib/domain/drawing/anchor-marks";
import { linePath } from "@/lib/domain/drawing/path";
import { sleeperShape } from "@/lib/domain/drawing/plan-view";
import { STATE_MARKS } from "@/lib/domain/drawing/state-marks";
import { PlacedMark } from "./mark-paths";
import { PaperLines } from "./paper-lines";
import { PlanFabric } from "./plan-fabric";
import { NorthArrow, ScaleBar, WindOnPlan } from "./plan-furniture";
import { layoutPlan, type PlanLayout } from "./plan-layout";
import { STATE_TONES } from "./state-mark";

/** What stands at a tie-out; leave a tie-out out of the record to draw its place only. */
export interface TieOutMarks {
  readonly verdict: Verdict;
  readonly anchor: AnchorSpec | null;
  readonly tandem?: AnchorSpec | null;
  readonly rockKg?: number;
  readonly shockCord?: boolean;
  readonly pinned?: boolean;
  /** "0.9 m · 44°", drawn at the selected one only. */
  readonly note?: string;
}

export interface ShelterPlanProps {
  readonly model: ShelterModel;
  readonly headingDeg: number;
  /** Compass bearing at the top; 0 = north up. */
  readonly upDeg?: number;
  /** False where the shelter is not pitched anywhere, so that north means nothing. */
  readonly hasNorth?: boolean;
  /** Leave out to draw no wind. */
  readonly wind?: { readonly fromDeg: number | null; readonly toDeg: number | null } | null;
  readonly marks?: Readonly<Record<string, TieOutMarks>>;
  readonly selectedTieOutId?: string | null;
  /** Names of those who sleep here, best place first; places beyond them are drawn dashed. */
  readonly sleeperNames?: readonly string[];
  readonly width?: number;
  readonly height?: number;
  /** What the drawing shows, for people who cannot see it. Empty where a list beside it says the same. */
  readonly label: string;
  /** A layout made by the caller, so that what it lays over the drawing agrees. */
  readonly layout?: PlanLayout;
  readonly className?: string;
}

const NOTHING: Readonly<Record<string, TieOutMarks>> = {};

/** The shelter in plan, to scale: fabric, ridges, poles, sleeping places, lines, anchors, wind, north and scale. */
export function ShelterPlan({
  model,
  headingDeg,
  upDeg = 0,
  hasNorth = true,
  wind = null,
  marks = NOTHING,
  selectedTieOutId = null,
  sleeperNames = [],
  width = 720,
  height = 520,
  label,
  layout: given,
  className = "block h-auto w-full",
}: ShelterPlanProps) {
  const titleId = useId();
  const layout = given ?? layoutPlan({ model, headingDeg, upDeg, width, height, wind, doubled: doubledOf(marks) });
  const { view, fit } = layout;
  return (
    <svg
      viewBox={`0 0 ${width} ${height}`}
      className={className}
      role={label ? "img" : undefined}
      aria-hidden={label ? undefined : true}
      aria-labelledby={label ? titleId : undefined}
    >
      {label && <title id={titleId}>{label}</title>}
      <PaperLines width={width} height={height} />
      <PlanFabric model={model} headingDeg={headingDeg} wind={wind} layout={layout} />
      {view.sleepers.map((sleeper, index) => {
        const { body, headCentre, headRadius } = sleeperShape(sleeper, fit);
        const isTaken = index < sleeperNames.length;
        return (
          <g key={body} className={isTaken ? "stroke-pencil" : "stroke-hair"} fill="none">
            <path d={body} strokeWidth={1.1} strokeDasharray={isTaken ? undefined : "4 4"} />
            <circle cx={headCentre[0]} cy={headCentre[1]} r={headRadius} strokeWidth={1.1} />
            {isTaken && <title>{sleeperNames[index]}</title>}
          </g>
        );
      })}
      {view.ridges.map(([from, to]) => (
        <path
          key={linePath([from, to])}
          d={linePath([fit.place(from), fit.place(to)])}
          className="stroke-ink"
          strokeWidth={2.4}
          strokeLinecap="round"
        />
      ))}
      {view.poleFeet.map((foot) => {
        const [x, y] = fit.place(foot);
        return <circle key={`${x} ${y}`} cx={x} cy={y} r={4} className="fill-ink stroke-sheet" strokeWidth={1.2} />;
      })}
      {wind && <WindOnPlan layout={layout} />}
      {withLast(layout.tieOuts, selectedTieOutId).map((spot) => (
        <TieOutDrawing
          key={spot.tieOutId}
          spot={spot}
          marks={marks[spot.tieOutId]}
          markSize={layout.markSize}
          isSelected={spot.tieOutId === selectedTieOutId}
        />
      ))}
      {hasNorth && <NorthArrow at={layout.north} upDeg={view.upDeg} />}
      <ScaleBar at={layout.scale.at} length={layout.scale.length} lengthM={layout.scale.lengthM} />
    </svg>
  );
}

/** The selected one is drawn over its neighbours. */
function withLast(spots: PlanLayout["tieOuts"], lastId: string | null): PlanLayout["tieOuts"] {
  const isLast = (spot: PlanLayout["tieOuts"][number]) => Number(spot.tieOutId === lastId);
  return spots.toSorted((a, b) => isLast(a) - isLast(b));
}

export function doubledOf(marks: Readonly<Record<string, TieOutMarks>>): ReadonlySet<string> {
  return new Set(Object.entries(marks).flatMap(([id, one]) => (one.tandem ? [id] : [])));
}

function TieOutDrawing({
  spot,
  marks,
  markSize,
  isSelected,
}: {
  readonly spot: PlanLayout["tieOuts"][number];
  readonly marks: TieOutMarks | undefined;
  readonly markSize: number;
  readonly isSelected: boolean;
}) {
  const [x, y] = spot.anchor;
  const mark = marks?.anchor ? anchorMark(marks.anchor) : null;
  const turn = mark?.turnsWithPull ? spot.pullDeg : 0;
  return (
    <g className={isSelected ? "text-ember" : "text-ink"}>
      <path
        d={linePath([spot.from, spot.lineEnd])}
        stroke="currentColor"
        strokeWidth={isSelected ? 2.2 : 1.5}
        strokeDasharray={marks?.shockCord ? "9 3 2 3" : undefined}
      />
      <circle cx={x} cy={y} r={markSize * 0.56} className="fill-sheet" />
      {isSelected && <circle cx={x} cy={y} r={markSize * 0.86} fill="none" stroke="currentColor" strokeWidth={2} />}
      {mark ? (
        <g className="text-ink">
          <PlacedMark paths={mark.paths} x={x} y={y} size={markSize} turnDeg={turn} />
          {marks?.tandem && <SecondInLine spec={marks.tandem} spot={spot} size={markSize} />}
          {marks?.rockKg !== undefined && marks.rockKg > 0 && <RockOnLip spot={spot} size={markSize} />}
        </g>
      ) : (
        <path
          d={`M${x - 5} ${y}H${x + 5}M${x} ${y - 5}V${y + 5}`}
          className={isSelected ? "stroke-ember" : "stroke-pencil"}
          strokeWidth={1.6}
          strokeLinecap="round"
        />
      )}
      {marks && (
        <g className={STATE_TONES[marks.verdict]}>
          <PlacedMark paths={STATE_MARKS[marks.verdict].paths} x={spot.state[0]} y={spot.state[1]} size={15} />
        </g>
      )}
      <text
        x={spot.numberAt[0]}
        y={spot.numberAt[1] + 4.5}
        textAnchor="middle"
        className={`text-13 font-bold ${isSelected ? "fill-ember" : "fill-ink"}`}
      >
        {spot.number}
      </text>
      {marks?.pinned && <Pin x={spot.state[0] + 13} y={spot.state[1] - 2} />}
      {isSelected && marks?.note && (
        <text
          x={spot.noteAt[0]}
          y={spot.noteAt[1] + 4}
          textAnchor="middle"
          className="fill-ember stroke-sheet text-13 font-semibold"
          strokeWidth={4}
          paintOrder="stroke"
        >
          {marks.note}
        </text>
      )}
    </g>
  );
}

/** The second stake in line stands behind the first, away from the pull. */
function SecondInLine({
  spec,
  spot,
  size,
}: {
  readonly spec: AnchorSpec;
  readonly spot: PlanLayout["tieOuts"][number];
  readonly size: number;
}) {
  const angle = ((spot.pullDeg + 180) * Math.PI) / 180;
  const x = spot.anchor[0] + Math.sin(angle) * size * 0.78;
  const y = spot.anchor[1] - Math.cos(angle) * size * 0.78;
  const mark = anchorMark(spec);
  return (
    <PlacedMark paths={mark.paths} x={x} y={y} size={size * 0.62} turnDeg={mark.turnsWithPull ? spot.pullDeg : 0} />
  );
}

/** A rock lies in front of the stake, towards the pull. */
function RockOnLip({ spot, size }: { readonly spot: PlanLayout["tieOuts"][number]; readonly size: number }) {
  const angle = (spot.pullDeg * Math.PI) / 180;
  const x = spot.anchor[0] + Math.sin(angle) * size * 0.66;
  const y = spot.anchor[1] - Math.cos(angle) * size * 0.66;
  const mark = anchorMark({ class: "surface-weight", massKg: 10 });
  return <PlacedMark paths={mark.paths} x={x} y={y} size={size * 0.5} />;
}

function Pin({ x, y }: { readonly x: number; readonly y: number }) {
  return (
    <g className="fill-spruce stroke-spruce">
      <circle cx={x} cy={y - 3} r={2.6} stroke="none" />
      <path d={`M${x} ${y - 1}V${y + 5}`} strokeWidth={1.3} strokeLinecap="round" />
    </g>
  );
}
