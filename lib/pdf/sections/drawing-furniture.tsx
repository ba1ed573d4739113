import { Circle, G, Line, Path, Text } from "@react-pdf/renderer";
import type { ComposedPlan } from "@/lib/domain/drawing/compose-plan";
import { polar, type Point } from "@/lib/domain/drawing/path";
import { FONT_STACK, type FontWeight } from "../fonts";
import { INK } from "../theme";

export function Label({
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

export function Segment({ from, to, width, color }: { from: Point; to: Point; width: number; color: string }) {
  return <Line x1={from[0]} y1={from[1]} x2={to[0]} y2={to[1]} stroke={color} strokeWidth={width} />;
}

export function Wind({ plan, isFull }: { plan: ComposedPlan; isFull: boolean }) {
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

export function North({ at, radius, upDeg }: { at: Point; radius: number; upDeg: number }) {
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

export function ScaleBarMark({ plan }: { plan: ComposedPlan }) {
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
