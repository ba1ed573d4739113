import { Circle, G, Line, Path, Polygon, Svg, Text } from "@react-pdf/renderer";
import { buildShelter } from "@/lib/calc/shelter-kinds";
import type { AnchorSpec, ShelterModel, ShelterSpec, Verdict } from "@/lib/calc/types";
import { anchorMark } from "@/lib/domain/drawing/anchor-marks";
import { composePlan, type ComposedPlan } from "@/lib/domain/drawing/compose-plan";
import type { LabelSizes, PlacedTieOut } from "@/lib/domain/drawing/label-layout";
import { bearingBetween, polar, type Point } from "@/lib/domain/drawing/path";
import { planView, sleeperShape, type PlanView } from "@/lib/domain/drawing/plan-view";
import { STATE_MARKS } from "@/lib/domain/drawing/state-marks";
import type { PitchView } from "@/lib/domain/views";
import { FONT_STACK, type FontWeight } from "../fonts";
import { printable } from "../glyphs";
import { GREY, HAIR, INK, PALE } from "../theme";
import { spacer, type Block } from "./block";
import { PlacedMark, turnOfMark } from "./marks";

export interface DrawnTieOut {
  readonly anchor: AnchorSpec | null;
  readonly verdict: Verdict;
}

export interface ShelterDrawingInput {
  readonly pitch: PitchView;
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

function Label({
  at,
  size,
  weight = 400,
  children,
}: {
  at: Point;
  size: number;
  weight?: FontWeight;
  children: string;
}) {
  return (
    <Text
      x={at[0]}
      y={at[1] + size * 0.35}
      textAnchor="middle"
      style={{ fontFamily: FONT_STACK, fontSize: size, fontWeight: weight }}
    >
      {children}
    </Text>
  );
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

function Segment({ from, to, width, color }: { from: Point; to: Point; width: number; color: string }) {
  return <Line x1={from[0]} y1={from[1]} x2={to[0]} y2={to[1]} stroke={color} strokeWidth={width} />;
}

/** "Rosa Amsel" → "RA"; a single name gives its first letter. */
export function initialsOf(name: string): string {
  const words = printable(name)
    .split(/[\s-]+/)
    .filter((word) => /\p{L}/u.test(word));
  const first = words[0]?.match(/\p{L}/u)?.[0] ?? "";
  const last = words.length > 1 ? (words[words.length - 1]?.match(/\p{L}/u)?.[0] ?? "") : "";
  return (first + last).toUpperCase();
}

const INITIALS_SIZE = 9;
const ROOM_FOR_INITIALS = 14;

function Sleepers({
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
  const drawn = names.length > 0 ? view.sleepers.slice(0, names.length) : view.sleepers;
  return drawn.map((sleeper, index) => {
    const name = names[index];
    const shape = sleeperShape(sleeper, plan.fit);
    const stroke = name === undefined ? HAIR : GREY;
    return (
      <G key={index}>
        <Path d={shape.body} fill="#ffffff" stroke={stroke} strokeWidth={isFull ? 0.9 : 0.6} />
        <Circle
          cx={shape.headCentre[0]}
          cy={shape.headCentre[1]}
          r={shape.headRadius}
          fill="none"
          stroke={stroke}
          strokeWidth={isFull ? 0.9 : 0.6}
        />
      </G>
    );
  });
}

/** Over the ridge, on white, so that they can be read. */
function Initials({ view, plan, names }: { view: PlanView; plan: ComposedPlan; names: readonly string[] }) {
  return view.sleepers.map((sleeper, index) => {
    const name = names[index];
    if (name === undefined || sleeper.widthM * plan.fit.scale < ROOM_FOR_INITIALS) return null;
    const toFeet = sleeper.lengthM * plan.fit.scale * 0.12;
    const at = polar(plan.fit.place(sleeper.centre), toFeet, sleeper.bearingDeg + 180);
    return (
      <G key={index}>
        <Circle cx={at[0]} cy={at[1]} r={INITIALS_SIZE * 0.72} fill="#ffffff" stroke="none" />
        <Label at={at} size={INITIALS_SIZE} weight={600}>
          {initialsOf(name)}
        </Label>
      </G>
    );
  });
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

function Wind({ plan, isFull }: { plan: ComposedPlan; isFull: boolean }) {
  if (plan.wind === null) return null;
  return (
    <G>
      <Path d={plan.wind.arc} fill="none" stroke={INK} strokeWidth={isFull ? 1.2 : 0.8} />
      {plan.wind.arrows.map((arrow, index) => (
        <Path key={index} d={arrow.d} fill="none" stroke={INK} strokeWidth={isFull ? 1.5 : 1} />
      ))}
    </G>
  );
}

function North({ at, radius, upDeg }: { at: Point; radius: number; upDeg: number }) {
  const disc = radius * 0.66;
  const centre: Point = [at[0], at[1] + radius * 0.34];
  const tip = polar(centre, disc * 0.72, -upDeg);
  const tail = polar(centre, disc * 0.72, 180 - upDeg);
  const left = polar(tip, disc * 0.45, 180 - upDeg - 35);
  const right = polar(tip, disc * 0.45, 180 - upDeg + 35);
  return (
    <G>
      <Circle cx={centre[0]} cy={centre[1]} r={disc} fill="#ffffff" stroke={INK} strokeWidth={0.8} />
      <Path
        d={`M${tail.join(" ")}L${tip.join(" ")}M${left.join(" ")}L${tip.join(" ")}L${right.join(" ")}`}
        fill="none"
        stroke={INK}
        strokeWidth={1.2}
      />
      <Label at={[at[0], centre[1] - disc - 6]} size={9} weight={800}>
        N
      </Label>
    </G>
  );
}

function ScaleBarMark({ plan }: { plan: ComposedPlan }) {
  if (plan.scaleBar === null) return null;
  const { left, y, length, lengthM } = plan.scaleBar;
  const right = left + length;
  const middle = left + length / 2;
  return (
    <G>
      <Path
        d={`M${left} ${y - 4}V${y + 4}M${left} ${y}H${right}M${right} ${y - 4}V${y + 4}M${middle} ${y - 2}V${y + 2}`}
        fill="none"
        stroke={INK}
        strokeWidth={0.8}
      />
      <Label at={[middle, y - 8]} size={9}>
        {`${lengthM}\u2009m`}
      </Label>
    </G>
  );
}
