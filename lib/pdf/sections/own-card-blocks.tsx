import type { OwnCard, OwnStep } from "@/lib/domain/own-pages/views";
import { formatDayShort } from "@/lib/format/days";
import { joinWords, startSentence } from "@/lib/format/words";
import { GREY } from "../theme";
import { knotName } from "../words";
import { columns, hairline, spacer, stack, textBlock, type Block } from "./block";
import { AnchorIcon, StateIcon } from "./marks";
import { shelterDrawing } from "./shelter-drawing";

export type FlowBlock = Block & { readonly keepsWithNext?: boolean };

/** How much of a shelter is shown; papers try the richest first. */
export interface CardDetail {
  readonly drawing: number;
  readonly isGrouped: boolean;
  readonly hasFallbacks: boolean;
}

export interface CardSpace {
  readonly width: number;
  readonly size: number;
  /** Drawing and list side by side; else one under the other. */
  readonly isWide: boolean;
}

const MARK = 13;

function stepDetails(step: OwnStep): string {
  const knot = step.knot ? knotName(step.knot) : "";
  return [step.line, knot, ...step.remarks].filter(Boolean).join("; ");
}

function anchorWords(step: OwnStep): string {
  return [step.anchor?.name ?? "no anchor yet", step.lean].filter(Boolean).join(", ");
}

interface MarkedRow {
  readonly numbers: string;
  readonly numberWidth: number;
  readonly step: OwnStep;
  readonly lines: readonly Block[];
  readonly textWidth: number;
  readonly size: number;
}

function markedRow({ numbers, numberWidth, step, lines, textWidth, size }: MarkedRow): Block {
  const text = stack(lines);
  const icon = step.anchor ? { height: MARK, node: <AnchorIcon spec={step.anchor.spec} size={MARK} /> } : spacer(MARK);
  return stack([
    spacer(2),
    columns([
      {
        width: numberWidth,
        block: textBlock(numbers, numberWidth - 3, { size: size + 1.5, weight: 800, leading: 1.15 }),
      },
      { width: MARK + 5, block: icon },
      { width: textWidth, block: text },
    ]),
    spacer(2),
    hairline(),
  ]);
}

function stepRow(step: OwnStep, { width, size }: CardSpace): Block {
  const text = width - 20 - MARK - 5;
  const lines = [
    textBlock(anchorWords(step), text, { size: size + 0.5, weight: 800 }),
    textBlock(stepDetails(step), text, { size }),
  ];
  return markedRow({ numbers: String(step.number), numberWidth: 20, step, lines, textWidth: text, size });
}

/** Tie-outs that are rigged alike, in one line; the order of pegging is said above them. */
function groupRows(steps: readonly OwnStep[], { width, size }: CardSpace): Block[] {
  const groups = new Map<string, OwnStep[]>();
  for (const step of steps) {
    const key = [anchorWords(step), step.knot, ...step.remarks].join("|");
    groups.set(key, [...(groups.get(key) ?? []), step]);
  }
  const numberWidth = Math.min(80, width * 0.22);
  const text = width - numberWidth - MARK - 5;
  return [...groups.values()].flatMap((group) => {
    const [first] = group;
    if (!first) return [];
    const numbers = group
      .map((step) => step.number)
      .sort((a, b) => a - b)
      .join(", ");
    const rest = [first.knot ? knotName(first.knot) : "", ...first.remarks].filter(Boolean).join("; ");
    const lines = [
      textBlock(anchorWords(first), text, { size: size + 0.5, weight: 800 }),
      ...(rest ? [textBlock(rest, text, { size })] : []),
    ];
    return [markedRow({ numbers, numberWidth, step: first, lines, textWidth: text, size })];
  });
}

function cardHead(card: OwnCard, { width, size }: CardSpace, isGrouped: boolean): FlowBlock {
  const days = card.days.map(formatDayShort).join(", ");
  const order = card.steps.map((step) => step.number).join(", ");
  const facts = [
    startSentence(`${card.facing}, front at ${Math.round(card.headingDeg)}°; ${card.windWords}`),
    `Ground: ${card.ground}`,
    card.sleeperNames.length > 0 ? `Sleep here: ${joinWords(card.sleeperNames)}` : "",
    isGrouped ? `Numbers run clockwise from the front. Peg in this order: ${order}` : "Peg from the top of the list",
  ].filter(Boolean);
  const head = stack([
    spacer(9),
    textBlock(`${card.campName}: ${card.shelterName}`, width, { size: size + 4, weight: 800 }),
    columns(
      [
        { width: 12, block: { height: size * 1.3, node: <StateIcon verdict={card.verdict} size={10} /> } },
        {
          width: width - 16,
          block: textBlock(`${days}. Holds to ${card.holdsTo}, ${card.holdsToRemark}`, width - 16, {
            size,
            weight: 600,
          }),
        },
      ],
      4,
    ),
    textBlock(`${facts.join(". ")}.`, width, { size }),
    spacer(3),
    hairline(),
  ]);
  return { ...head, keepsWithNext: true };
}

function drawingOfCard(card: OwnCard, width: number, height: number): Block {
  return shelterDrawing({
    pitch: { spec: card.spec, details: { headingDeg: card.headingDeg } },
    tieOuts: new Map(
      card.steps.map((step) => [step.tieOutId, { anchor: step.anchor?.spec ?? null, verdict: step.verdict }]),
    ),
    wind: card.wind,
    sleeperNames: card.sleeperNames,
    width,
    height,
    detail: "small",
  });
}

function fallbackBlocks(card: OwnCard, { width, size }: CardSpace): Block[] {
  if (card.fallbacks.length === 0) return [];
  return [
    stack([
      spacer(3),
      textBlock("Softer ground or stronger wind", width, { size: size + 0.5, weight: 800 }),
      ...card.fallbacks.map((line, index) => textBlock(`${index + 1}. ${line}`, width, { size, color: GREY })),
    ]),
  ];
}

/** One shelter at one camp, as blocks that fill pages. */
export function ownCardBlocks(card: OwnCard, space: CardSpace, detail: CardDetail): FlowBlock[] {
  const head = cardHead(card, space, detail.isGrouped);
  const rowsIn = (inner: CardSpace) =>
    detail.isGrouped ? groupRows(card.steps, inner) : card.steps.map((step) => stepRow(step, inner));
  const after = detail.hasFallbacks ? fallbackBlocks(card, space) : [];
  if (detail.drawing === 0) return [head, ...rowsIn(space), ...after];
  if (!space.isWide) {
    const drawing = { ...drawingOfCard(card, space.width, detail.drawing), keepsWithNext: true };
    return [head, drawing, ...rowsIn(space), ...after];
  }
  const left = space.width * 0.42;
  const right = space.width - left - 14;
  const rows = stack(rowsIn({ ...space, width: right }));
  const height = Math.max(detail.drawing, Math.min(rows.height, detail.drawing * 1.25));
  const both = columns(
    [
      { width: left, block: drawingOfCard(card, left, height) },
      { width: right, block: rows },
    ],
    14,
  );
  return [head, { ...both, keepsWithNext: after.length > 0 }, ...after];
}
