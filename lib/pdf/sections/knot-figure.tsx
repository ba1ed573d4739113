import { Path, Svg } from "@react-pdf/renderer";
import { composeKnot, type KnotPath } from "@/lib/domain/knots/compose-knot";
import type { Knot } from "@/lib/domain/knots/knots";
import { INK } from "../theme";
import { columns, spacer, stack, textBlock, type Block } from "./block";

const PAPER = "#ffffff";
const SHADE = "#d4d4d4";
const COLOURS: Readonly<Record<KnotPath["look"], string>> = {
  edge: INK,
  rope: PAPER,
  second: SHADE,
  tip: INK,
  object: SHADE,
  arrow: INK,
};

/** A knot as high as given, in the middle of a width. */
function knotDrawing({ shape }: Knot, width: number, height: number): Block {
  return {
    height,
    node: (
      <Svg width={width} height={height} viewBox={`0 0 ${shape.width} ${shape.height}`}>
        {composeKnot(shape).map(({ d, look, width: stroke }, index) => (
          <Path
            key={index}
            d={d}
            fill={stroke === 0 ? COLOURS[look] : "none"}
            stroke={stroke === 0 ? "none" : COLOURS[look]}
            strokeWidth={stroke}
            strokeLinejoin="round"
          />
        ))}
      </Svg>
    ),
  };
}

/** Drawing on the left, name and steps on the right; or the name alone where there is little room. */
export function knotFigure(knot: Knot, width: number, size: number, hasSteps: boolean): Block {
  const picture = Math.min(110, width * 0.36);
  const text = width - picture - 10;
  const name = textBlock(knot.name, text, { size: size + 0.5, weight: 800 });
  const steps = hasSteps
    ? knot.steps.map((step, index) => textBlock(`${index + 1}. ${step}`, text, { size }))
    : [textBlock(knot.check, text, { size })];
  const words = stack([name, ...steps]);
  const height = Math.min(Math.max(words.height, hasSteps ? 112 : 78), 132);
  return stack([
    spacer(5),
    columns(
      [
        { width: picture, block: knotDrawing(knot, picture, height) },
        { width: text, block: words },
      ],
      10,
    ),
  ]);
}
