import { Circle, G, Path } from "@react-pdf/renderer";
import type { ComposedPlan } from "@/lib/domain/drawing/compose-plan";
import { polar } from "@/lib/domain/drawing/path";
import { sleeperShape, type PlanView } from "@/lib/domain/drawing/plan-view";
import { printable } from "../glyphs";
import { GREY, HAIR } from "../theme";
import { Label } from "./drawing-furniture";

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

export function Sleepers({
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
export function Initials({ view, plan, names }: { view: PlanView; plan: ComposedPlan; names: readonly string[] }) {
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
