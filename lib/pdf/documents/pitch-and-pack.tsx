import type { ReactElement } from "react";
import { KNOT_GUIDE } from "@/lib/domain/knots/knots";
import type { PackLine, PaperDocument } from "@/lib/domain/views";
import { formatDayShort } from "@/lib/format/days";
import { formatMass } from "@/lib/format/masses";
import { joinWords } from "@/lib/format/words";
import { columns, fillPages, hairline, spacer, stack, textBlock, type Block } from "../sections/block";
import { FoldedSheet, panelSheet, panelTop, type PanelPage } from "../sections/folded-sheet";
import { knotFigure } from "../sections/knot-figure";
import { contactsNote } from "../sections/notes";
import { ownCardBlocks, type CardDetail, type CardSpace, type FlowBlock } from "../sections/own-card-blocks";
import { bodyHeight, continuedHeader, PageFrame, pageHeader, type Heading } from "../sections/page-frame";
import { TickBox } from "../sections/tick-box";
import { CAUTIONS, type Sheet } from "../theme";
import { shortAddress } from "../words";

export type PitchAndPack = Extract<PaperDocument, { kind: "pitch-and-pack" }>;
export type NumberedPage = ReactElement<{ readonly page?: number; readonly pageCount?: number }>;

/** Two sheets of paper printed on both sides, or one folded twice. */
const MOST_PAGES = 4;

interface Level extends CardDetail {
  readonly knots: "steps" | "short" | "none";
  /** A shelter is drawn at its first camp only: its numbers stay the same. */
  readonly isDrawnOnce?: boolean;
}

/** From the richest to the barest; the first that goes on four pages is taken. Heights of drawings on a full page, points. */
const LEVELS: readonly Level[] = [
  { drawing: 200, isGrouped: false, hasFallbacks: true, knots: "steps" },
  { drawing: 150, isGrouped: false, hasFallbacks: true, knots: "steps" },
  { drawing: 150, isGrouped: true, hasFallbacks: true, knots: "steps" },
  { drawing: 120, isGrouped: true, hasFallbacks: false, knots: "steps" },
  { drawing: 120, isGrouped: true, hasFallbacks: false, knots: "short" },
  { drawing: 120, isGrouped: true, hasFallbacks: false, knots: "short", isDrawnOnce: true },
  { drawing: 100, isGrouped: true, hasFallbacks: false, knots: "none", isDrawnOnce: true },
  { drawing: 0, isGrouped: true, hasFallbacks: false, knots: "none" },
];
const POCKET_DRAWING = 0.8;

function section(title: string, { width, size }: CardSpace, rows: readonly Block[]): FlowBlock[] {
  const head = stack([spacer(7), textBlock(title, width, { size: size + 2.5, weight: 800 }), spacer(2), hairline()]);
  return [{ ...head, keepsWithNext: true }, ...rows];
}

function nightRows({ list }: PitchAndPack, { width, size }: CardSpace): Block[] {
  const day = size * 5.2;
  const rest = width - day - 6;
  return list.nights.map((night) => {
    const place = night.shelterName ?? "not placed yet";
    const company = night.withNames.length > 0 ? ` with ${joinWords(night.withNames)}` : "";
    return stack([
      spacer(2),
      columns(
        [
          { width: day, block: textBlock(formatDayShort(night.day), day, { size }) },
          {
            width: rest,
            block: stack([
              textBlock(night.campName, rest, { size: size + 0.5, weight: 800 }),
              textBlock(`${place}${company}`, rest, { size }),
            ]),
          },
        ],
        6,
      ),
      spacer(2),
      hairline(),
    ]);
  });
}

function tickRow(line: PackLine, width: number, size: number): Block {
  const box = 11;
  const mass = line.massKg === null ? "" : `, ${formatMass(line.massKg)}`;
  const text = textBlock(`${line.name}${mass}`, width - box - 6, { size });
  return stack([
    spacer(2),
    columns(
      [
        { width: box, block: { height: box, node: <TickBox isTicked={line.isTicked} /> } },
        { width: width - box - 6, block: text },
      ],
      6,
    ),
    spacer(2),
  ]);
}

function tickRows(lines: readonly PackLine[], { width, size }: CardSpace, count: number): Block[] {
  const gap = 12;
  const each = (width - gap * (count - 1)) / count;
  const height = Math.ceil(lines.length / count);
  return Array.from({ length: height }, (_, row) =>
    columns(
      Array.from({ length: count }, (_unused, column) => {
        const line = lines[column * height + row];
        return { width: each, block: line ? tickRow(line, each, size) : null };
      }),
      gap,
    ),
  );
}

/** Everything in order: where and with whom, what to carry and bring, each shelter, the knots, whom to call. */
function layBlocks(paper: PitchAndPack, space: CardSpace, level: Level, leftOut: readonly string[]): FlowBlock[] {
  const { list, contacts } = paper;
  const { width, size } = space;
  const cards = paper.cards.filter((card) => !leftOut.includes(card.pitchId));
  const knots = KNOT_GUIDE.filter(({ key }) => cards.some((card) => card.steps.some((step) => step.knot === key)));
  const missing = paper.cards.filter((card) => leftOut.includes(card.pitchId)).map((card) => card.campName);
  const call = contactsNote(contacts, width);
  const empty = (text: string) => [textBlock(text, width, { size })];
  return [
    ...section("Where I sleep", space, list.nights.length > 0 ? nightRows(paper, space) : empty("No nights yet.")),
    ...section(
      `I carry for the group, ${formatMass(list.groupMassKg)}`,
      space,
      list.group.length > 0 ? tickRows(list.group, space, space.isWide ? 2 : 1) : empty("Nothing."),
    ),
    ...section(
      "I bring",
      space,
      list.own.length > 0 ? tickRows(list.own, space, space.isWide ? 3 : 2) : empty("Nothing is listed yet."),
    ),
    ...(call ? [stack([spacer(8), call])] : []),
    ...cards.flatMap((card, index) => {
      const isDrawn = cards.slice(0, index).some((other) => other.shelterName === card.shelterName);
      return ownCardBlocks(card, space, level.isDrawnOnce && isDrawn ? { ...level, drawing: 0 } : level);
    }),
    ...(missing.length > 0
      ? [
          stack([
            spacer(8),
            textBlock(`No room here for ${joinWords(missing)}. Open the live page or ask for the pitch cards.`, width, {
              size,
              weight: 800,
            }),
          ]),
        ]
      : []),
    ...(level.knots === "none" || knots.length === 0
      ? []
      : [
          ...section("Knots", space, []),
          ...knots.map((knot) => knotFigure(knot, width, size, level.knots === "steps")),
        ]),
  ];
}

/** The richest pages that fit; shelters of the last camps are left out, and named, only when nothing else helps. */
function fitPages(
  paper: PitchAndPack,
  space: CardSpace,
  heightOfPage: (index: number) => number,
  ending: readonly Block[],
): Block[][] {
  const isPocket = !space.isWide;
  const lay = (level: Level, leftOut: readonly string[]) => {
    const drawing = isPocket ? level.drawing * POCKET_DRAWING : level.drawing;
    return fillPages([...layBlocks(paper, space, { ...level, drawing }, leftOut), ...ending], heightOfPage);
  };
  for (const level of LEVELS) {
    const pages = lay(level, []);
    if (pages.length <= MOST_PAGES) return pages;
  }
  const barest = LEVELS.at(-1) ?? { drawing: 0, isGrouped: true, hasFallbacks: false, knots: "none" };
  const ids = paper.cards.map((card) => card.pitchId);
  for (let count = 1; count <= ids.length; count += 1) {
    const pages = lay(barest, ids.slice(ids.length - count));
    if (pages.length <= MOST_PAGES) return pages;
  }
  return lay(barest, ids).slice(0, MOST_PAGES);
}

function flatPages(paper: PitchAndPack, sheet: Sheet, heading: Heading): NumberedPage[] {
  const { header } = paper;
  const top = pageHeader(header, heading, sheet);
  const nextTop = continuedHeader(header, heading, sheet);
  const space: CardSpace = { width: sheet.inner, size: 10, isWide: true };
  const pages = fitPages(paper, space, (index) => bodyHeight(header, sheet, index === 0 ? top : nextTop), []);
  return pages.map((page, index) => (
    <PageFrame
      key={index}
      sheet={sheet}
      header={header}
      top={index === 0 ? top : nextTop}
      bookmark={index === 0 ? heading.title : undefined}
    >
      {stack(page).node}
    </PageFrame>
  ));
}

function pocketPages(paper: PitchAndPack, sheet: Sheet, heading: Heading): NumberedPage[] {
  const { header } = paper;
  const panel = panelSheet(sheet);
  const space: CardSpace = { width: panel.inner, size: 9, isWide: false };
  const topOf = (index: number) => panelTop(header, heading, panel, index);
  const ending = [
    stack([
      spacer(6),
      hairline(),
      spacer(3),
      textBlock(CAUTIONS, panel.inner, { size: 9 }),
      textBlock(`Live page: ${shortAddress(header.address)}`, panel.inner, { size: 9 }),
    ]),
  ];
  const room = (index: number) => panel.height - 2 * panel.margin - topOf(index).height;
  const pages = fitPages(paper, space, room, ending);
  const panels = pages.map((page, index): PanelPage => ({ top: topOf(index), body: stack(page) }));
  return [<FoldedSheet key="folded" sheet={sheet} panels={panels} title={heading.title} />];
}

/** One person's pages in one file: at most four, full size or folded for the pocket. */
export function pitchAndPackPages(paper: PitchAndPack, sheet: Sheet): NumberedPage[] {
  const heading: Heading = { kicker: `${paper.header.tripName} · pitch and pack`, title: paper.list.person.name };
  return paper.fold === "pocket" ? pocketPages(paper, sheet, heading) : flatPages(paper, sheet, heading);
}
