import type { ReactElement } from "react";
import type { Preferences } from "@/lib/domain/preferences";
import type { PaperCamp, PaperDocument } from "@/lib/domain/views";
import { formatDayRange, formatDayShort } from "@/lib/format/days";
import { formatHoldsTo, formatSpeed } from "@/lib/format/speeds";
import { joinWords, plural } from "@/lib/format/words";
import { columns, fillPages, hairline, spacer, stack, textBlock, type Block, type TextStyle } from "../sections/block";
import { StateIcon } from "../sections/marks";
import { contactsNote, note, stackNotes } from "../sections/notes";
import {
  bodyHeight,
  continuedHeader,
  PageFrame,
  pageHeader,
  type Heading,
  type PageFrameProps,
} from "../sections/page-frame";
import { GREY, TYPE, type Sheet } from "../theme";
import { groundName, stateWord } from "../words";
import { fieldCardPages } from "./field-card";
import { packListPages } from "./pack-list";
import { pitchCardPages, type CardContext } from "./pitch-card";

type Booklet = Extract<PaperDocument, { kind: "booklet" }>;

/** The whole trip: its nights, then each camp's field card and pitch cards, then everybody's pack list. */
export function bookletPages(booklet: Booklet, sheet: Sheet, preferences: Preferences): ReactElement<PageFrameProps>[] {
  const { header, contacts } = booklet;
  return [
    ...coverPages(booklet, sheet, preferences),
    ...booklet.camps.flatMap((camp) => {
      const context: CardContext = { header, contacts, camp, sheet, preferences };
      return [...fieldCardPages(context), ...camp.pitches.flatMap((pitch) => pitchCardPages(context, pitch))];
    }),
    ...booklet.packLists.flatMap((list) => packListPages(header, list, sheet)),
  ];
}

const GAP = 16;

function coverPages(booklet: Booklet, sheet: Sheet, preferences: Preferences): ReactElement<PageFrameProps>[] {
  const { header, trip } = booklet;
  const heading: Heading = { kicker: `Booklet · ${formatDayRange(trip.startDate, trip.endDate)}`, title: trip.name };
  const top = pageHeader(header, heading, sheet);
  const nextTop = continuedHeader(header, heading, sheet);
  const blocks = [
    coverNotes(booklet, sheet),
    nightsHead(sheet.inner),
    ...booklet.camps.map((camp) => nightRow(camp, sheet.inner, preferences)),
  ];
  return fillPages(blocks, (index) => bodyHeight(header, sheet, index === 0 ? top : nextTop)).map((page, index) => (
    <PageFrame
      key={`cover-${index}`}
      sheet={sheet}
      header={header}
      top={index === 0 ? top : nextTop}
      bookmark={index === 0 ? trip.name : undefined}
    >
      {stack(page).node}
    </PageFrame>
  ));
}

function coverNotes({ trip, contacts, camps, packLists }: Booklet, sheet: Sheet): Block {
  const text = sheet.inner - GAP;
  const left = text * 0.66;
  const right = text - left;
  const shelters = new Set(camps.flatMap((camp) => camp.pitches.map((pitch) => pitch.shelterId))).size;
  const nights = camps.reduce((sum, camp) => sum + camp.camp.details.nights, 0);
  const inside = `${plural(nights, "night")} at ${plural(camps.length, "camp")}, ${plural(shelters, "shelter")}, ${plural(packLists.length, "person", "people")}.`;
  const names = packLists.map((list) => list.person.name);
  return stack([
    spacer(12),
    columns(
      [
        {
          width: left,
          block: stackNotes([
            textBlock(inside, left, { size: TYPE.number, weight: 800 }),
            names.length ? note("With", `${joinWords(names)}.`, left) : null,
            trip.notes ? note("Notes", trip.notes, left) : null,
          ]),
        },
        { width: right, block: contactsNote(contacts, right) },
      ],
      GAP,
    ),
    spacer(18),
  ]);
}

const WIDTHS = { night: 66, ground: 106, gust: 54, holdsTo: 60, state: 64 } as const;
const CELL_GAP = 8;

function nightLine(cells: readonly (readonly [number, Block])[], pad: number): Block {
  return stack([
    spacer(pad),
    columns(
      cells.map(([width, block]) => ({ width, block })),
      CELL_GAP,
    ),
    spacer(pad),
    hairline(),
  ]);
}

const campWidth = (width: number) => width - Object.values(WIDTHS).reduce((sum, one) => sum + one, 0) - CELL_GAP * 5;

const cell = (value: string, width: number, style: Partial<TextStyle> = {}) =>
  [width, textBlock(value, width, { size: TYPE.body, ...style })] as const;

function nightsHead(width: number): Block & { keepsWithNext: boolean } {
  const grey = { size: TYPE.small, color: GREY } as const;
  const head = nightLine(
    [
      cell("night", WIDTHS.night, grey),
      cell("camp", campWidth(width), grey),
      cell("ground", WIDTHS.ground, grey),
      cell("gust", WIDTHS.gust, { ...grey, align: "right" }),
      cell("holds to", WIDTHS.holdsTo, { ...grey, align: "right" }),
      cell("", WIDTHS.state, grey),
    ],
    2.5,
  );
  return { ...head, keepsWithNext: true };
}

function nightRow({ camp, result, pitches }: PaperCamp, width: number, preferences: Preferences): Block {
  const days = camp.days.map(formatDayShort);
  const first = days[0] ?? "";
  const last = days[days.length - 1] ?? "";
  const gust = result.designGustMs === null ? "unknown" : formatSpeed(result.designGustMs, preferences.speedUnit);
  const holdsTo = result.holdsToGustMs === null ? "–" : formatHoldsTo(result.holdsToGustMs, preferences.speedUnit);
  const names = pitches.map((pitch) => pitch.name).join(", ");
  const campColumn = campWidth(width);
  return nightLine(
    [
      cell(first === last ? first : `${first} to ${last}`, WIDTHS.night),
      [
        campColumn,
        stack([
          textBlock(camp.details.name, campColumn, { size: TYPE.strong + 1, weight: 800 }),
          textBlock(names || "no shelter pitched yet", campColumn, { size: TYPE.small, color: GREY }),
        ]),
      ] as const,
      cell(groundName(camp.details.ground)?.toLowerCase() ?? "unknown", WIDTHS.ground),
      cell(gust, WIDTHS.gust, { align: "right" }),
      cell(holdsTo, WIDTHS.holdsTo, { align: "right", weight: 800 }),
      [
        WIDTHS.state,
        columns([
          {
            width: 14,
            block: stack([spacer(1.5), { height: 10, node: <StateIcon verdict={result.verdict} size={10} /> }]),
          },
          {
            width: WIDTHS.state - 14,
            block: textBlock(stateWord(result.verdict), WIDTHS.state - 14, { size: TYPE.body }),
          },
        ]),
      ] as const,
    ],
    5,
  );
}
