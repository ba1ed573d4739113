import type { ShelterResult } from "@/lib/calc/types";
import type { PitchView } from "@/lib/domain/views";
import { columns, spacer, stack, textBlock, type Block } from "../sections/block";
import { stateLegend } from "../sections/tie-out-table";
import { GREY, TYPE } from "../theme";
import { facingWords, holdsToWords } from "../words";
import { drawingOf, type CardContext } from "./pitch-card";

const GAP = 14;
const PLAN_HEADING = 37;
const LOWEST_PLAN = 118;
const HIGHEST_PLAN = 250;
const OTHER_PLAN = 170;

/** All shelters at a glance, as large as lets the first page hold them, and the weakest tie-outs with them if it can. */
export function planGrid(context: CardContext, room: number, weakestHeight: number): Block[] {
  const { camp, sheet } = context;
  const count = camp.pitches.length;
  if (count === 0) return [];
  const across = count === 1 ? 1 : count === 2 || count === 4 ? 2 : 3;
  const width = (sheet.inner - GAP * (across - 1)) / across;
  const legend = stack([spacer(2), stateLegend()]);
  const heights = [room - weakestHeight, room].map(
    (space) => (space - legend.height) / Math.ceil(count / across) - PLAN_HEADING,
  );
  const height = Math.min(HIGHEST_PLAN, heights.find((one) => one >= LOWEST_PLAN) ?? OTHER_PLAN);
  const rows: Block[] = [];
  for (let i = 0; i < count; i += across) {
    rows.push(
      stack([
        spacer(8),
        columns(
          camp.pitches
            .slice(i, i + across)
            .map((pitch) => ({ width, block: smallPlan(context, pitch, width, height) })),
          GAP,
        ),
      ]),
    );
  }
  return [...rows, legend];
}

export const resultOf = (context: CardContext, pitch: PitchView): ShelterResult | undefined =>
  context.camp.result.shelters.find((one) => one.pitchId === pitch.id);

function smallPlan(context: CardContext, pitch: PitchView, width: number, height: number): Block {
  const result = resultOf(context, pitch);
  const holdsTo = holdsToWords(
    result ?? { holdsToGustMs: null, gaps: [], verdict: "unknown" },
    null,
    context.preferences.speedUnit,
  );
  return stack([
    textBlock(pitch.name, width, { size: TYPE.strong, weight: 800 }),
    textBlock(
      [facingWords(pitch), holdsTo.value === "unknown" ? "not known yet" : `holds to ${holdsTo.value}`].join(" · "),
      width,
      { size: TYPE.small, color: GREY },
    ),
    spacer(3),
    drawingOf(context, pitch, result, width, height, "small"),
  ]);
}
