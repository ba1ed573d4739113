import type { Preferences } from "@/lib/domain/preferences";
import type { PaperCamp } from "@/lib/domain/views";
import { formatForce } from "@/lib/format/forces";
import { formatMargin } from "@/lib/format/numbers";
import { formatHoldsTo } from "@/lib/format/speeds";
import { GREY, TYPE } from "../theme";
import { lowerFirst, stateWord } from "../words";
import { columns, hairline, spacer, stack, textBlock, type Block, type TextStyle } from "./block";
import { StateIcon } from "./marks";

const MOST = 6;
const WIDTHS = { state: 66, pull: 62, holds: 62, margin: 50, holdsTo: 74 } as const;
const GAP = 8;

/** The tie-outs to look at first: smallest margin first, those without a number on top. */
export function weakestTable(camp: PaperCamp, width: number, preferences: Preferences): Block[] {
  const rows = camp.result.shelters
    .flatMap((shelter) => shelter.tieOuts.map((tieOut) => ({ shelter: shelter.name, ...tieOut })))
    .sort((a, b) => (a.margin ?? -1) - (b.margin ?? -1) || (b.priority ?? 0) - (a.priority ?? 0))
    .slice(0, MOST);
  if (rows.length === 0) return [];
  const place = width - Object.values(WIDTHS).reduce((sum, one) => sum + one, 0) - 5 * GAP;
  const line = (cells: readonly (readonly [number, Block])[]) =>
    stack([
      spacer(2.5),
      columns(
        cells.map(([cellWidth, block]) => ({ width: cellWidth, block })),
        GAP,
      ),
      spacer(2.5),
      hairline(),
    ]);
  const text = (value: string, cellWidth: number, style: Partial<TextStyle> = {}) =>
    [cellWidth, textBlock(value, cellWidth, { size: TYPE.body, ...style })] as const;
  const grey = { size: TYPE.small, color: GREY } as const;
  const right = { align: "right" } as const;
  const head = line([
    text("tie-out", place, grey),
    text("state", WIDTHS.state, grey),
    text("pull", WIDTHS.pull, { ...grey, ...right }),
    text("holds", WIDTHS.holds, { ...grey, ...right }),
    text("margin", WIDTHS.margin, { ...grey, ...right }),
    text("holds to", WIDTHS.holdsTo, { ...grey, ...right }),
  ]);
  const body = rows.map((row) => {
    const capacity = row.capacity?.status === "ok" ? formatForce(row.capacity.dependableN, preferences.forceUnit) : "–";
    return line([
      text(`${row.shelter} ${row.number}: ${lowerFirst(row.name)}`, place, { weight: 600 }),
      [
        WIDTHS.state,
        columns([
          { width: 13, block: stack([spacer(2), { height: 9, node: <StateIcon verdict={row.verdict} size={9} /> }]) },
          {
            width: WIDTHS.state - 13,
            block: textBlock(stateWord(row.verdict), WIDTHS.state - 13, { size: TYPE.body }),
          },
        ]),
      ] as const,
      text(row.demandN === null ? "–" : formatForce(row.demandN, preferences.forceUnit), WIDTHS.pull, right),
      text(capacity, WIDTHS.holds, right),
      text(row.margin === null ? "–" : formatMargin(row.margin), WIDTHS.margin, { ...right, weight: 800 }),
      text(row.holdsToGustMs === null ? "–" : formatHoldsTo(row.holdsToGustMs, preferences.speedUnit), WIDTHS.holdsTo, {
        ...right,
        weight: 800,
      }),
    ]);
  });
  const title = stack([spacer(10), textBlock("Look at these first", width, { size: TYPE.strong + 0.5, weight: 800 })]);
  return [stack([title, head, ...body])];
}
