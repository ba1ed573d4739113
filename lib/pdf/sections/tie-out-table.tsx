import { View } from "@react-pdf/renderer";
import type { TieOut, TieOutResult, TrayAnchor } from "@/lib/calc/types";
import type { Preferences } from "@/lib/domain/preferences";
import { formatLean } from "@/lib/format/angles";
import { formatForceNumber } from "@/lib/format/forces";
import { formatLength } from "@/lib/format/lengths";
import { textWidth } from "../measure";
import { GREY, HAIR, LEADING, TYPE } from "../theme";
import { knotName, riggingRemarks, stateWord } from "../words";
import { textBlock, type Block, type TextStyle } from "./block";
import { AnchorIcon, StateIcon } from "./marks";

export interface TieOutRow {
  readonly result: TieOutResult;
  /** From the shelter's geometry; null if the spec no longer has it. */
  readonly tieOut: TieOut | null;
  readonly anchor: TrayAnchor | null;
  readonly isWeakest: boolean;
}

export interface TieOutTableInput {
  readonly rows: readonly TieOutRow[];
  readonly tray: readonly TrayAnchor[];
  readonly width: number;
  readonly preferences: Preferences;
  /** Tight rows where many have to fit. */
  readonly isTight?: boolean;
}

const WIDTHS = { number: 22, mark: 21, drive: 58, knot: 90, line: 62, pull: 40, holds: 58 } as const;
const GAP = 6;
const MARK = 15;
const STATE = 10;
/** Brings large figures onto the line of the words beside them. */
const LIFT = 1.7;

export interface TieOutTable {
  readonly head: Block;
  readonly rows: readonly Block[];
}

function anchorWidth(width: number): number {
  const taken = Object.values(WIDTHS).reduce((sum, one) => sum + one, 0);
  return width - taken - GAP * 5;
}

/** Cells of one line, each hung at a distance from the top of the row. */
function Cells({
  cells,
  height,
}: {
  cells: readonly { left: number; width: number; block: Block; lift?: number }[];
  height: number;
}) {
  return (
    <View style={{ height }}>
      {cells.map((cell, index) => (
        <View
          key={index}
          style={{
            position: "absolute",
            left: cell.left,
            width: cell.width,
            top: (height - cell.block.height) / 2 - (cell.lift ?? 0),
          }}
        >
          {cell.block.node}
        </View>
      ))}
    </View>
  );
}

function lefts(width: number) {
  const number = 0;
  const mark = number + WIDTHS.number;
  const anchor = mark + WIDTHS.mark;
  const drive = anchor + anchorWidth(width) + GAP;
  const knot = drive + WIDTHS.drive + GAP;
  const line = knot + WIDTHS.knot + GAP;
  const pull = line + WIDTHS.line + GAP;
  const holds = pull + WIDTHS.pull + GAP;
  return { number, mark, anchor, drive, knot, line, pull, holds };
}

export function tieOutTable(input: TieOutTableInput): TieOutTable {
  return { head: tableHead(input), rows: input.rows.map((row) => tableRow(row, input)) };
}

function tableHead({ width, preferences }: TieOutTableInput): Block {
  const at = lefts(width);
  const cell = (left: number, cellWidth: number, text: string, align: TextStyle["align"] = "left") => ({
    left,
    width: cellWidth,
    block: textBlock(text, cellWidth, { size: TYPE.small, color: GREY, align }),
  });
  const height = TYPE.small * LEADING + 4;
  return {
    height: height + 0.8,
    node: (
      <View style={{ borderBottomWidth: 0.8, borderBottomColor: HAIR }}>
        <Cells
          height={height}
          cells={[
            cell(at.anchor, anchorWidth(width), "anchor"),
            cell(at.drive, WIDTHS.drive, "drive"),
            cell(at.knot, WIDTHS.knot, "knot"),
            cell(at.line, WIDTHS.line, "line"),
            cell(at.pull, WIDTHS.pull, `pull, ${preferences.forceUnit}`, "right"),
            cell(at.holds, WIDTHS.holds, `holds, ${preferences.forceUnit}`, "right"),
          ]}
        />
      </View>
    ),
  };
}

const DRIVEN = new Set(["stake", "screw-in"]);

function driveWords({ result, anchor }: TieOutRow): string {
  if (!result.placement || !anchor) return "–";
  return DRIVEN.has(anchor.spec.class) ? formatLean(result.placement.leanDeg) : "–";
}

function lineWords(row: TieOutRow, preferences: Preferences): string {
  if (!row.tieOut) return "–";
  if (row.tieOut.lineLengthM < 0.15) return "hem loop";
  return `${formatLength(row.tieOut.lineLengthM, preferences.lengthUnit)}, ${Math.round(row.tieOut.lineAngleDeg)}°`;
}

/** Below the anchor: what else is done there, and why there is no number. */
function remarksOf({ result }: TieOutRow, { tray, preferences }: TieOutTableInput): string {
  const remarks = result.placement ? riggingRemarks(result.placement, tray, preferences.lengthUnit) : [];
  if (result.capacity?.status === "unusable") remarks.push(result.capacity.reason);
  for (const gap of result.gaps) remarks.push(gap.message);
  return remarks.join("; ");
}

function tableRow(row: TieOutRow, input: TieOutTableInput): Block {
  const { width, preferences, isTight = false } = input;
  const { result, anchor } = row;
  const at = lefts(width);
  const name = anchor?.name ?? (result.placement ? "anchor no longer in the kit" : "no anchor yet");
  const nameBlock = textBlock(name, anchorWidth(width), { size: TYPE.strong, weight: 800 });
  const plain = (left: number, cellWidth: number, text: string) => ({
    left,
    width: cellWidth,
    block: textBlock(text, cellWidth, { size: TYPE.body }),
  });
  const capacity =
    result.capacity?.status === "ok" ? formatForceNumber(result.capacity.dependableN, preferences.forceUnit) : "–";
  const pull = result.demandN === null ? "–" : formatForceNumber(result.demandN, preferences.forceUnit);
  const holdsWidth = textWidth(capacity, TYPE.number, 800) + 3;
  const cells = [
    {
      left: at.number,
      width: WIDTHS.number,
      block: textBlock(String(result.number), WIDTHS.number, { size: TYPE.number, weight: 800, leading: 1.1 }),
      lift: LIFT,
    },
    ...(anchor
      ? [{ left: at.mark, width: MARK, block: { height: MARK, node: <AnchorIcon spec={anchor.spec} size={MARK} /> } }]
      : []),
    { left: at.anchor, width: anchorWidth(width), block: nameBlock },
    plain(at.drive, WIDTHS.drive, driveWords(row)),
    plain(at.knot, WIDTHS.knot, result.placement ? knotName(result.placement.knot) : "–"),
    plain(at.line, WIDTHS.line, lineWords(row, preferences)),
    { left: at.pull, width: WIDTHS.pull, block: textBlock(pull, WIDTHS.pull, { size: TYPE.body, align: "right" }) },
    {
      left: at.holds,
      width: WIDTHS.holds,
      block: textBlock(capacity, WIDTHS.holds, { size: TYPE.number, weight: 800, leading: 1.1, align: "right" }),
      lift: LIFT,
    },
    {
      left: at.holds + WIDTHS.holds - holdsWidth - STATE - 4,
      width: STATE,
      block: { height: STATE, node: <StateIcon verdict={result.verdict} size={STATE} /> },
    },
  ];
  const mainHeight = Math.max(...cells.map((cell) => cell.block.height)) + (isTight ? 2.6 : 6.5);
  const remarks = remarksOf(row, input);
  const remarkWidth = width - at.anchor - (result.verdict === "gives-way" ? 60 : 0);
  const remarkBlock = remarks === "" ? null : textBlock(remarks, remarkWidth, { size: TYPE.small });
  const height = mainHeight + (remarkBlock ? remarkBlock.height + 2 : 0);
  return {
    height: height + 0.5,
    node: (
      <View style={{ borderBottomWidth: 0.5, borderBottomColor: HAIR, height: height + 0.5 }}>
        <Cells cells={cells} height={mainHeight} />
        {remarkBlock ? (
          <View style={{ marginLeft: at.anchor, width: remarkWidth, marginTop: -1 }}>{remarkBlock.node}</View>
        ) : null}
      </View>
    ),
  };
}

/** Which mark means what, in one line under a table or drawing. */
export function stateLegend(): Block {
  const verdicts = ["holds", "thin", "gives-way", "unknown"] as const;
  return {
    height: TYPE.small * LEADING + 4,
    node: (
      <View style={{ flexDirection: "row", marginTop: 4 }}>
        {verdicts.map((verdict) => (
          <View key={verdict} style={{ flexDirection: "row", alignItems: "center", marginRight: 14 }}>
            <StateIcon verdict={verdict} size={9} />
            <View style={{ marginLeft: 4 }}>{textBlock(stateWord(verdict), 60, { size: TYPE.small }).node}</View>
          </View>
        ))}
      </View>
    ),
  };
}
