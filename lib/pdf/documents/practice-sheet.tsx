import { Document, Page, Path, Svg, View } from "@react-pdf/renderer";
import type { PracticeSheetView } from "@/lib/domain/pull-test/practice-sheet";
import { formatAngle, formatLean } from "@/lib/format/angles";
import { formatForce, formatForceNumber } from "@/lib/format/forces";
import { formatChance } from "@/lib/format/numbers";
import { FONT_STACK } from "../fonts";
import { printable } from "../glyphs";
import { columns, hairline, rule, spacer, stack, textBlock, type Block } from "../sections/block";
import { CAUTIONS, GREY, INK, LEADING, TYPE, type Sheet } from "../theme";

const ROW_HEIGHT = 36;
const BOX_HEIGHT = 22;
const OUTCOMES = ["out", "bent", "line", "held"];

/** An empty box to write in. */
function writeBox(width: number, height = BOX_HEIGHT): Block {
  return {
    height,
    node: <View style={{ width, height, borderWidth: 0.9, borderColor: INK, borderRadius: 2 }} />,
  };
}

function tickBoxes(width: number): Block {
  const each = width / OUTCOMES.length;
  return columns(
    OUTCOMES.map((name) => ({
      width: each,
      block: stack([
        {
          height: 12,
          node: (
            <Svg width={11} height={11} viewBox="0 0 11 11">
              <Path d="M0.6 0.6H10.4V10.4H0.6Z" fill="none" stroke={INK} strokeWidth={1} />
            </Svg>
          ),
        },
        textBlock(name, each, { size: TYPE.small }),
      ]),
    })),
  );
}

interface Widths {
  readonly number: number;
  readonly setUp: number;
  readonly expected: number;
  readonly reading: number;
  readonly outcome: number;
  readonly note: number;
}
const GAP = 8;

function widthsOf(sheet: Sheet): Widths {
  const fixed = { number: 16, expected: 92, reading: 62, outcome: 112 };
  const rest = sheet.inner - 5 * GAP - fixed.number - fixed.expected - fixed.reading - fixed.outcome;
  return { ...fixed, setUp: rest * 0.62, note: rest * 0.38 };
}

function headRow(view: PracticeSheetView, widths: Widths): Block {
  const head = (text: string, width: number) => textBlock(text, width, { size: TYPE.small, color: GREY });
  return columns(
    [
      { width: widths.number, block: head("", widths.number) },
      { width: widths.setUp, block: head("Anchor, lean, line", widths.setUp) },
      { width: widths.expected, block: head(`The model expects, ${view.forceUnit}`, widths.expected) },
      { width: widths.reading, block: head(`Read, ${view.forceUnit}`, widths.reading) },
      { width: widths.outcome, block: head("What happened", widths.outcome) },
      { width: widths.note, block: head("Wet? Left out? Note", widths.note) },
    ],
    GAP,
  );
}

function pullRow(view: PracticeSheetView, row: PracticeSheetView["rows"][number], at: number, widths: Widths): Block {
  const inUnit = (newtons: number) => formatForceNumber(newtons, view.forceUnit);
  const lean = row.leanDeg === null ? "" : `${formatLean(row.leanDeg)}, `;
  const line = columns(
    [
      { width: widths.number, block: textBlock(String(at + 1), widths.number, { size: TYPE.strong, weight: 800 }) },
      {
        width: widths.setUp,
        block: stack([
          textBlock(row.anchorName, widths.setUp, { size: TYPE.strong, weight: 800 }),
          textBlock(`${lean}line ${formatAngle(row.lineAngleDeg)}`, widths.setUp, { size: TYPE.body }),
        ]),
      },
      {
        width: widths.expected,
        block: stack([
          textBlock(`${inUnit(row.lowN)} to ${inUnit(row.highN)}`, widths.expected, { size: TYPE.strong, weight: 800 }),
          textBlock(`chance it gives: ${formatChance(row.chanceExact)}`, widths.expected, {
            size: TYPE.small,
            color: GREY,
          }),
        ]),
      },
      { width: widths.reading, block: writeBox(widths.reading) },
      { width: widths.outcome, block: tickBoxes(widths.outcome) },
      { width: widths.note, block: writeBox(widths.note) },
    ],
    GAP,
  );
  const pad = Math.max(2, (ROW_HEIGHT - line.height) / 2);
  return stack([spacer(pad), line, spacer(pad), hairline()]);
}

const HOW_TO =
  "In this order: each line is the pull that teaches most after the ones above it, so stop wherever the day ends. " +
  "Pull slowly until the anchor gives, or until the scale ends: write the highest reading. Still holding is worth " +
  "writing down too. A fresh spot for every pull, two stake lengths from the last hole.";

function sheetTop(view: PracticeSheetView, sheet: Sheet): Block {
  const right = 170;
  const left = sheet.inner - right - 12;
  const scale =
    view.scaleEndN === null ? "scale without an end" : `scale to ${formatForce(view.scaleEndN, view.forceUnit)}`;
  return stack([
    columns(
      [
        {
          width: left,
          block: stack([
            textBlock(view.kicker, left, { size: TYPE.body }),
            textBlock(`${view.title}: ${view.groundName.toLowerCase()}`, left, { size: 20, weight: 800, leading: 1.2 }),
          ]),
        },
        {
          width: right,
          block: stack([
            textBlock(scale, right, { size: TYPE.body, align: "right" }),
            textBlock(`printed ${view.printedAt}`, right, { size: TYPE.body, align: "right" }),
          ]),
        },
      ],
      12,
    ),
    spacer(5),
    rule(2),
    spacer(7),
    textBlock(HOW_TO, sheet.inner, { size: TYPE.body }),
    spacer(8),
    columns(
      ["Day", "Place", "Who", "Thumb, heel, rod"].map((name) => {
        const width = (sheet.inner - 3 * GAP) / 4;
        return { width, block: stack([textBlock(name, width, { size: TYPE.small, color: GREY }), writeBox(width)]) };
      }),
      GAP,
    ),
    spacer(9),
  ]);
}

/** A training day on paper: designed pulls in order, what to expect, and boxes to write in. */
export function practiceSheetDocument(view: PracticeSheetView, sheet: Sheet) {
  const widths = widthsOf(sheet);
  const top = sheetTop(view, sheet);
  const foot = stack([
    hairline(),
    spacer(4),
    textBlock(CAUTIONS, sheet.inner, { size: TYPE.small }),
    textBlock(`Type it in at ${view.address.replace(/^https?:\/\//, "")}`, sheet.inner, {
      size: TYPE.small,
      color: GREY,
    }),
  ]);
  const room = sheet.height - 2 * sheet.margin - foot.height - 10;
  const first = Math.max(1, Math.floor((room - top.height - 14) / (ROW_HEIGHT + 1)));
  const later = Math.max(1, Math.floor((room - 14) / (ROW_HEIGHT + 1)));
  const pages: number[][] = [];
  const all = view.rows.map((_, index) => index);
  for (let at = 0; at < all.length;) {
    const size = pages.length === 0 ? first : later;
    pages.push(all.slice(at, at + size));
    at += size;
  }
  return (
    <Document
      title={printable(`${view.title}: practice sheet`)}
      author="Leestead"
      creator="Leestead"
      producer="Leestead"
      language="en-GB"
    >
      {pages.map((indices, page) => (
        <Page
          key={page}
          size={sheet.size}
          style={{ padding: sheet.margin, fontFamily: FONT_STACK, fontSize: TYPE.body, lineHeight: LEADING }}
        >
          {page === 0 ? top.node : null}
          {headRow(view, widths).node}
          {rule(1).node}
          {indices.map((index) => {
            const row = view.rows[index];
            return row ? <View key={index}>{pullRow(view, row, index, widths).node}</View> : null;
          })}
          <View style={{ position: "absolute", left: sheet.margin, right: sheet.margin, bottom: sheet.margin }}>
            {foot.node}
          </View>
        </Page>
      ))}
    </Document>
  );
}
