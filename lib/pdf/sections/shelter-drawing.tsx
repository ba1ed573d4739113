import { Circle, G, Polygon, Svg } from "@react-pdf/renderer";
import { buildShelter } from "@/lib/calc/shelter-kinds";
import type { AnchorSpec, ShelterModel, ShelterSpec, Verdict } from "@/lib/calc/types";
import { anchorMark } from "@/lib/domain/drawing/anchor-marks";
import { composePlan, type ComposedPlan } from "@/lib/domain/drawing/compose-plan";
import type { LabelSizes, PlacedTieOut } from "@/lib/domain/drawing/label-layout";
import { bearingBetween, type Point } from "@/lib/domain/drawing/path";
import { planView, type PlanView } from "@/lib/domain/drawing/plan-view";
import { STATE_MARKS } from "@/lib/domain/drawing/state-marks";
import type { PitchView } from "@/lib/domain/views";
import { INK, PALE } from "../theme";
import { spacer, type Block } from "./block";
import { Label, North, ScaleBarMark, Segment, Wind } from "./drawing-furniture";
import { PlacedMark, turnOfMark } from "./marks";
import { Initials, Sleepers } from "./sleepers-drawing";

export interface DrawnTieOut {
  readonly anchor: AnchorSpec | null;
  readonly verdict: Verdict;
}

export interface ShelterDrawingInput {
  readonly pitch: Pick<PitchView, "spec"> & { readonly details: Pick<PitchView["details"], "headingDeg"> };
  /** By tie-out id. */
  readonly tieOuts: ReadonlyMap<string, DrawnTieOut>;
  readonly wind: { readonly fromDeg: number | null; readonly toDeg: number | null };
  readonly sleeperNames: readonly string[];
  readonly width: number;
  readonly height: number;
  readonly detail: "full" | "small";
}

interface Sizes extends LabelSizes {
  readonly numberSize: number;
  readonly windArrow: number;
  readonly northRadius: number;
  readonly scaleBarMax: number;
  readonly maxScale: number;
}

const FULL: Sizes = {
  anchorRadius: 8,
  stateRadius: 4.8,
  numberRadius: 7.5,
  gap: 2.5,
  numberSize: 11,
  windArrow: 26,
  northRadius: 19,
  scaleBarMax: 90,
  maxScale: 80,
};
const SMALL: Sizes = {
  anchorRadius: 5,
  stateRadius: 3,
  numberRadius: 6,
  gap: 1.2,
  numberSize: 9,
  windArrow: 15,
  northRadius: 15,
  scaleBarMax: 46,
  maxScale: 40,
};

/** Null where the dimensions do not go together; the gaps beside the drawing say so in words. */
export function findModel(spec: ShelterSpec): ShelterModel | null {
  try {
    return buildShelter(spec);
  } catch (error) {
    if (error instanceof RangeError) return null;
    throw error;
  }
}

export function shelterDrawing(input: ShelterDrawingInput): Block {
  const sizes = input.detail === "full" ? FULL : SMALL;
  const model = findModel(input.pitch.spec);
  if (!model) return spacer(input.height);
  const view = planView(model, input.pitch.details.headingDeg);
  const plan = composePlan(view, { ...sizes, sizes, width: input.width, height: input.height, wind: input.wind });
  return {
    height: input.height,
    node: (
      <Svg width={input.width} height={input.height} viewBox={`0 0 ${input.width} ${input.height}`}>
        <Fabric view={view} plan={plan} isFull={input.detail === "full"} names={input.sleeperNames} />
        {plan.tieOuts.map((placed) => (
          <TieOutLine key={placed.tie.tieOut.id} placed={placed} />
        ))}
        {plan.tieOuts.map((placed) => (
          <TieOutMarks
            key={placed.tie.tieOut.id}
            placed={placed}
            drawn={input.tieOuts.get(placed.tie.tieOut.id) ?? { anchor: null, verdict: "unknown" }}
            sizes={sizes}
          />
        ))}
        <Wind plan={plan} isFull={input.detail === "full"} />
        <North at={plan.north} radius={sizes.northRadius} upDeg={view.upDeg} />
        <ScaleBarMark plan={plan} />
      </Svg>
    ),
  };
}

const pointsOf = (points: readonly Point[]) => points.map(([x, y]) => `${x},${y}`).join(" ");

function Fabric({
  view,
  plan,
  isFull,
  names,
}: {
  view: PlanView;
  plan: ComposedPlan;
  isFull: boolean;
  names: readonly string[];
}) {
  const { place } = plan.fit;
  const outline = view.outline.map(place);
  return (
    <G>
      <Polygon points={pointsOf(outline)} fill="#ffffff" stroke="none" />
      {view.seams.map(([a, b], index) => (
        <Segment key={index} from={place(a)} to={place(b)} width={0.5} color={PALE} />
      ))}
      <Sleepers view={view} plan={plan} isFull={isFull} names={names} />
      <Polygon points={pointsOf(outline)} fill="none" stroke={INK} strokeWidth={isFull ? 1.3 : 0.9} />
      {view.ridges.map(([a, b], index) => (
        <Segment key={index} from={place(a)} to={place(b)} width={isFull ? 2 : 1.3} color={INK} />
      ))}
      {view.poleFeet.map((foot, index) => {
        const [x, y] = place(foot);
        return <Circle key={index} cx={x} cy={y} r={isFull ? 3.1 : 2} fill={INK} />;
      })}
      {isFull ? <Initials view={view} plan={plan} names={names} /> : null}
    </G>
  );
}

function TieOutLine({ placed }: { placed: PlacedTieOut }) {
  return <Segment from={placed.from} to={placed.anchor} width={0.9} color={INK} />;
}

function TieOutMarks({ placed, drawn, sizes }: { placed: PlacedTieOut; drawn: DrawnTieOut; sizes: Sizes }) {
  const { anchor, from, state, number } = placed;
  const mark = drawn.anchor && anchorMark(drawn.anchor);
  return (
    <G>
      <Circle cx={anchor[0]} cy={anchor[1]} r={sizes.anchorRadius} fill="#ffffff" stroke="none" />
      {mark ? (
        <PlacedMark
          paths={mark.paths}
          centre={anchor}
          size={sizes.anchorRadius * 2}
          turnDeg={turnOfMark(mark, bearingBetween(anchor, from))}
        />
      ) : (
        <Circle
          cx={anchor[0]}
          cy={anchor[1]}
          r={sizes.anchorRadius * 0.5}
          fill="#ffffff"
          stroke={INK}
          strokeWidth={0.8}
          strokeDasharray="2 1.6"
        />
      )}
      <PlacedMark paths={STATE_MARKS[drawn.verdict].paths} centre={state} size={sizes.stateRadius * 2.35} />
      <Label at={number} size={sizes.numberSize} weight={800}>
        {String(placed.tie.tieOut.number)}
      </Label>
    </G>
  );
}
