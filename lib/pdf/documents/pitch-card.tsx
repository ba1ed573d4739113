import type { ReactElement } from "react";
import { buildShelter } from "@/lib/calc/shelter-kinds";
import type { ShelterResult } from "@/lib/calc/types";
import type { Preferences } from "@/lib/domain/preferences";
import type { Contact } from "@/lib/domain/trip/schema";
import type { PaperCamp, PaperHeader, PitchView } from "@/lib/domain/views";
import { columns, spacer, stack, type Block } from "../sections/block";
import { factRow } from "../sections/facts";
import { contactsNote, note, numberedNote, stackNotes } from "../sections/notes";
import { bodyHeight, PageFrame, pageHeader, type Heading } from "../sections/page-frame";
import { qrCode } from "../sections/qr-code";
import { shelterDrawing } from "../sections/shelter-drawing";
import { stateLegend, tieOutTable, type TieOutRow } from "../sections/tie-out-table";
import type { Sheet } from "../theme";
import {
  capitalised,
  facingWords,
  groundName,
  groundRemarks,
  holdsToWords,
  nightWords,
  patchOf,
  tieOutsByNumber,
  windWords,
} from "../words";

export interface CardContext {
  readonly header: PaperHeader;
  readonly contacts: readonly Contact[];
  readonly camp: PaperCamp;
  readonly sheet: Sheet;
  readonly preferences: Preferences;
}

/** The drawing is never smaller than this, points; the table goes on overleaf before that. */
const SMALLEST_DRAWING = 228;
const LARGEST_DRAWING = 400;
const FEWEST_ROWS = 3;

/** One shelter at one camp: one page, two where it has many tie-outs. */
export function pitchCardPages(context: CardContext, pitch: PitchView): ReactElement[] {
  const { header, camp, sheet } = context;
  const shelter = camp.result.shelters.find((one) => one.pitchId === pitch.id);
  const heading: Heading = {
    kicker: `${header.tripName} · ${nightWords(camp.nightNumbers, camp.camp)}`,
    title: `${camp.camp.details.name}: ${pitch.name}`,
  };
  const top = pageHeader(header, heading, sheet);
  const room = bodyHeight(header, sheet, top);
  const facts = factRow(pitchFacts(context, pitch, shelter), sheet.inner);
  const notes = stack([spacer(8), notesOf(context, pitch)]);
  const table = tieOutTable({
    rows: shelter ? rowsOf(camp, pitch, shelter) : [],
    tray: camp.tray,
    width: sheet.inner,
    preferences: context.preferences,
    isTight: (shelter?.tieOuts.length ?? 0) > 9,
  });
  const legend = stateLegend();
  const draw = (height: number) => drawingOf(context, pitch, shelter, sheet.inner, Math.min(height, LARGEST_DRAWING));
  const rowsHeight = table.rows.reduce((sum, row) => sum + row.height, 0);
  const leftOnOnePage = room - facts.height - table.head.height - rowsHeight - legend.height - notes.height;

  if (leftOnOnePage >= SMALLEST_DRAWING) {
    return [
      <PageFrame key={pitch.id} sheet={sheet} header={header} top={top} bookmark={heading.title}>
        {stack([facts, draw(leftOnOnePage), table.head, ...table.rows, legend, notes]).node}
      </PageFrame>,
    ];
  }

  const space = room - facts.height - table.head.height - legend.height - SMALLEST_DRAWING - 40;
  const first = countThatFit(table.rows, space, table.rows.length - FEWEST_ROWS);
  const firstHeight = table.rows.slice(0, first).reduce((sum, row) => sum + row.height, 0);
  const drawing = draw(room - facts.height - table.head.height - firstHeight - legend.height);
  const nextTop = pageHeader(header, heading, sheet, true);
  return [
    <PageFrame key={`${pitch.id}-1`} sheet={sheet} header={header} top={top} bookmark={heading.title}>
      {stack([facts, drawing, table.head, ...table.rows.slice(0, first), legend]).node}
    </PageFrame>,
    <PageFrame key={`${pitch.id}-2`} sheet={sheet} header={header} top={nextTop}>
      {stack([spacer(6), table.head, ...table.rows.slice(first), notes]).node}
    </PageFrame>,
  ];
}

function countThatFit(rows: readonly Block[], space: number, most: number): number {
  let count = 0;
  let left = space;
  for (const row of rows) {
    left -= row.height;
    if (left < 0 || count >= most) break;
    count += 1;
  }
  return count;
}

export function pitchFacts({ camp, preferences }: CardContext, pitch: PitchView, shelter: ShelterResult | undefined) {
  const { details } = camp.camp;
  const ground = patchOf(details, pitch.details.patch);
  const holdsTo = holdsToWords(
    shelter ?? { holdsToGustMs: null, gaps: [], verdict: "unknown" },
    camp.result.designGustMs,
    preferences.speedUnit,
  );
  const remarks = ground ? groundRemarks(ground, details.slopeDeg) : "Choose the ground at the camp.";
  return [
    { label: "Holds to", ...holdsTo },
    {
      label: "Face",
      value: facingWords(pitch),
      remark: `front at ${Math.round(pitch.details.headingDeg)}° · ${windWords(details)}`,
    },
    {
      label: pitch.details.patch === "second" ? "Ground: second patch" : "Ground",
      value: groundName(ground)?.toLowerCase() ?? "unknown",
      remark: remarks || "in its usual state",
    },
  ];
}

export function rowsOf(camp: PaperCamp, pitch: PitchView, shelter: ShelterResult): TieOutRow[] {
  const model = buildShelter(pitch.spec);
  return tieOutsByNumber(shelter).map((result) => ({
    result,
    tieOut: model.tieOuts.find((one) => one.id === result.tieOutId) ?? null,
    anchor: camp.tray.find((one) => one.id === result.placement?.anchorId) ?? null,
    isWeakest: shelter.weakestTieOutId === result.tieOutId,
  }));
}

export function drawingOf(
  { camp }: Pick<CardContext, "camp">,
  pitch: PitchView,
  shelter: ShelterResult | undefined,
  width: number,
  height: number,
  detail: "full" | "small" = "full",
): Block {
  const tieOuts = new Map(
    (shelter?.tieOuts ?? []).map((one) => [
      one.tieOutId,
      { anchor: camp.tray.find((item) => item.id === one.placement?.anchorId)?.spec ?? null, verdict: one.verdict },
    ]),
  );
  const { windFromDeg, windToDeg } = camp.camp.details;
  return shelterDrawing({
    pitch,
    tieOuts,
    wind: { fromDeg: windFromDeg, toDeg: windToDeg },
    sleeperNames: camp.sleeperNames[pitch.id] ?? [],
    width,
    height,
    detail,
  });
}

const QR_SIDE = 66;
const COLUMN_GAP = 14;

function notesOf({ header, contacts, camp, sheet }: CardContext, pitch: PitchView): Block {
  const text = sheet.inner - QR_SIDE - 2 * COLUMN_GAP;
  const left = text * 0.54;
  const right = text - left;
  const names = camp.sleeperNames[pitch.id] ?? [];
  const fallbacks = camp.fallbacks[pitch.id] ?? [];
  return columns(
    [
      {
        width: left,
        block: fallbacks.length
          ? numberedNote("If the ground is softer or the wind stronger", fallbacks, left)
          : note(
              "If the ground is softer or the wind stronger",
              "No next-best anchor is on the list. Pitch lower, turn the shelter or move to firmer ground.",
              left,
            ),
      },
      {
        width: right,
        block: stackNotes([
          note("Sleep here", names.length ? names.join(", ") : "Nobody placed yet.", right),
          camp.result.retension === null ? null : note("Check again", capitalised(camp.result.retension), right),
          contactsNote(contacts, right),
        ]),
      },
      { width: QR_SIDE, block: qrCode(header.address, QR_SIDE) },
    ],
    COLUMN_GAP,
  );
}
