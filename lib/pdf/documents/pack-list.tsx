import type { ReactElement } from "react";
import { View } from "@react-pdf/renderer";
import type { PackLine, PackListView, PaperHeader } from "@/lib/domain/views";
import { formatDay } from "@/lib/format/days";
import { formatMass } from "@/lib/format/masses";
import { joinWords, plural } from "@/lib/format/words";
import { columns, fillPages, hairline, spacer, stack, textBlock, type Block } from "../sections/block";
import { factRow } from "../sections/facts";
import {
  bodyHeight,
  continuedHeader,
  PageFrame,
  pageHeader,
  type Heading,
  type PageFrameProps,
} from "../sections/page-frame";
import { TICK_BOX, TickBox } from "../sections/tick-box";
import { GREY, TYPE, type Sheet } from "../theme";

const BOX = TICK_BOX;

/** One person's list: what they bring, what they carry for the group, where and with whom they sleep. */
export function packListPages(header: PaperHeader, list: PackListView, sheet: Sheet): ReactElement<PageFrameProps>[] {
  const heading: Heading = { kicker: `${header.tripName} · pack list`, title: list.person.name };
  const top = pageHeader(header, heading, sheet);
  const nextTop = continuedHeader(header, heading, sheet);
  const blocks: (Block & { keepsWithNext?: boolean })[] = [
    packFacts(list, sheet.inner),
    ...section(
      "Carry for the group",
      tickRows(list.group, sheet.inner, 1),
      "Nothing of the group's gear is yours to carry.",
      sheet,
    ),
    ...section("Bring yourself", tickRows(list.own, sheet.inner, 2), "Nothing is listed yet.", sheet),
    ...section("Where you sleep", nightRows(list, sheet.inner), "No nights are planned yet.", sheet),
  ];
  const pages = fillPages(blocks, (index) => bodyHeight(header, sheet, index === 0 ? top : nextTop));
  return pages.map((page, index) => (
    <PageFrame
      key={`${list.person.id}-${index}`}
      sheet={sheet}
      header={header}
      top={index === 0 ? top : nextTop}
      bookmark={index === 0 ? `Pack list: ${list.person.name}` : undefined}
    >
      {stack(page).node}
    </PageFrame>
  ));
}

function packFacts(list: PackListView, width: number): Block {
  const first = list.nights.find((night) => night.shelterName !== null);
  const ticked = list.own.filter((line) => line.isTicked).length;
  return factRow(
    [
      { label: "Carry for the group", value: formatMass(list.groupMassKg), remark: plural(list.group.length, "piece") },
      {
        label: "Bring yourself",
        value: plural(list.own.length, "thing"),
        remark: ticked === 0 ? "nothing ticked off yet" : `${ticked} ticked off`,
      },
      {
        label: "First night in",
        value: first?.shelterName ?? "not placed yet",
        remark: first ? `${first.campName}, ${formatDay(first.day)}` : "ask your leader",
      },
    ],
    width,
  );
}

function section(
  title: string,
  rows: readonly Block[],
  empty: string,
  sheet: Sheet,
): (Block & { keepsWithNext?: boolean })[] {
  const head = stack([
    spacer(12),
    textBlock(title, sheet.inner, { size: TYPE.number, weight: 800 }),
    spacer(3),
    hairline(),
  ]);
  const body =
    rows.length > 0 ? rows : [stack([spacer(4), textBlock(empty, sheet.inner, { size: TYPE.body, color: GREY })])];
  return [{ ...head, keepsWithNext: true }, ...body];
}

function tickLine(line: PackLine, width: number): Block {
  const massWidth = 46;
  const textWidth = width - BOX - 8 - massWidth;
  const text = stack([
    textBlock(line.name, textWidth, { size: TYPE.strong, weight: 600 }),
    ...(line.detail ? [textBlock(line.detail, textWidth, { size: TYPE.small, color: GREY })] : []),
  ]);
  const mass = line.massKg === null ? "" : formatMass(line.massKg);
  const height = text.height + 7;
  return {
    height,
    node: (
      <View style={{ flexDirection: "row", height, paddingTop: 3.5 }}>
        <View style={{ width: BOX, marginRight: 8, marginTop: 1.5 }}>
          <TickBox isTicked={line.isTicked} />
        </View>
        <View style={{ width: textWidth }}>{text.node}</View>
        <View style={{ width: massWidth }}>
          {textBlock(mass, massWidth, { size: TYPE.strong, align: "right" }).node}
        </View>
      </View>
    ),
  };
}

function tickRows(lines: readonly PackLine[], width: number, columnCount: 1 | 2): Block[] {
  if (columnCount === 1) return lines.map((line) => stack([tickLine(line, width), hairline()]));
  const gap = 24;
  const each = (width - gap) / 2;
  const half = Math.ceil(lines.length / 2);
  return Array.from({ length: half }, (_, index) => {
    const left = lines[index];
    const right = lines[half + index];
    return columns(
      [
        { width: each, block: left ? stack([tickLine(left, each), hairline()]) : null },
        { width: each, block: right ? stack([tickLine(right, each), hairline()]) : null },
      ],
      gap,
    );
  });
}

function nightRows(list: PackListView, width: number): Block[] {
  const day = 104;
  const camp = 168;
  const rest = width - day - camp - 20;
  return list.nights.map((night) => {
    const place = night.shelterName ?? "not placed yet";
    const company = night.withNames.length > 0 ? `with ${joinWords(night.withNames)}` : "";
    return stack([
      spacer(4),
      columns(
        [
          { width: day, block: textBlock(formatDay(night.day), day, { size: TYPE.body }) },
          { width: camp, block: textBlock(night.campName, camp, { size: TYPE.strong, weight: 800 }) },
          {
            width: rest,
            block: stack([
              textBlock(place, rest, { size: TYPE.strong, weight: 600 }),
              ...(company ? [textBlock(company, rest, { size: TYPE.small })] : []),
            ]),
          },
        ],
        10,
      ),
      spacer(4),
      hairline(),
    ]);
  });
}
