import type { ReactElement } from "react";
import type { ShelterResult } from "@/lib/calc/types";
import type { Preferences } from "@/lib/domain/preferences";
import type { Contact } from "@/lib/domain/trip/schema";
import type { PaperCamp, PaperHeader, PitchView } from "@/lib/domain/views";
import { startSentence } from "@/lib/format/words";
import { columns, fillPages, spacer, stack, type Block } from "../sections/block";
import { factRow } from "../sections/facts";
import { contactsNote, note, numberedNote, stackNotes } from "../sections/notes";
import {
  bodyHeight,
  continuedHeader,
  PageFrame,
  pageHeader,
  type Heading,
  type PageFrameProps,
} from "../sections/page-frame";
import { findModel, shelterDrawing } from "../sections/shelter-drawing";
import { anchorsUsed } from "../sections/anchors-used";
import { stateLegend, tieOutTable, type TieOutRow, type TieOutTable } from "../sections/tie-out-table";
import type { Sheet } from "../theme";
import {
  facingWords,
  groundName,
  groundRemarks,
  hazardNames,
  holdsToWords,
  lowerFirst,
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

/** The drawing is never smaller than this, points; before that the table goes overleaf, whole. */
const SMALLEST_DRAWING = 185;
const LARGEST_DRAWING = 430;

/** One shelter at one camp: one page, two where it has many tie-outs. */
export function pitchCardPages(context: CardContext, pitch: PitchView): ReactElement<PageFrameProps>[] {
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
  const rows = shelter ? rowsOf(camp, pitch, shelter) : [];
  const layTable = (isTight: boolean) =>
    tieOutTable({ rows, tray: camp.tray, width: sheet.inner, preferences: context.preferences, isTight });
  const roomy = layTable(false);
  const tight = layTable(true);
  const legend = stateLegend();
  const draw = (height: number) => drawingOf(context, pitch, shelter, sheet.inner, Math.min(height, LARGEST_DRAWING));
  for (const table of [roomy, tight]) {
    const rowsHeight = table.rows.reduce((sum, row) => sum + row.height, 0);
    const left = room - facts.height - table.head.height - rowsHeight - legend.height - notes.height;
    if (left < SMALLEST_DRAWING) continue;
    return [
      <PageFrame key={pitch.id} sheet={sheet} header={header} top={top} bookmark={heading.title}>
        {stack([facts, draw(left), table.head, ...table.rows, legend, notes]).node}
      </PageFrame>,
    ];
  }

  const used = anchorsUsed(rows, sheet.inner);
  const drawing = draw(room - facts.height - legend.height - used.height - notes.height);
  const nextTop = continuedHeader(header, heading, sheet);
  const layOverleaf = (table: TieOutTable) =>
    fillPages([stack([spacer(6), table.head]), ...table.rows], () => bodyHeight(header, sheet, nextTop));
  const [roomyPages, tightPages] = [layOverleaf(roomy), layOverleaf(tight)];
  const overleaf = tightPages.length < roomyPages.length ? tightPages : roomyPages;
  return [
    <PageFrame key={`${pitch.id}-1`} sheet={sheet} header={header} top={top} bookmark={heading.title}>
      {stack([facts, drawing, legend, used, notes]).node}
    </PageFrame>,
    ...overleaf.map((page, index) => (
      <PageFrame key={`${pitch.id}-${index + 2}`} sheet={sheet} header={header} top={nextTop}>
        {stack(page).node}
      </PageFrame>
    )),
  ];
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
  const model = findModel(pitch.spec);
  return tieOutsByNumber(shelter).map((result) => ({
    result,
    tieOut: model?.tieOuts.find((one) => one.id === result.tieOutId) ?? null,
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

const COLUMN_GAP = 16;

/** Names only: what to do about each stands on the field card. */
function mindNote({ camp }: PaperCamp, width: number): Block | null {
  const { hazards, meetingPoint } = camp.details;
  const lines = [
    hazards.length > 0 ? `${startSentence(hazardNames(hazards).map(lowerFirst).join(", "))}.` : "",
    meetingPoint ? `Meet at: ${meetingPoint}` : "",
  ].filter(Boolean);
  return lines.length === 0 ? null : note("Mind", lines.join("\n"), width);
}

function notesOf({ contacts, camp, sheet }: CardContext, pitch: PitchView): Block {
  const text = sheet.inner - (contacts.length > 0 ? 2 : 1) * COLUMN_GAP;
  const [left, middle] = contacts.length > 0 ? [text * 0.38, text * 0.38] : [text * 0.55, text * 0.45];
  const right = text - left - middle;
  const names = camp.sleeperNames[pitch.id] ?? [];
  const fallbacks = camp.fallbacks[pitch.id] ?? [];
  const title = "Softer ground or stronger wind";
  return columns(
    [
      {
        width: left,
        block: fallbacks.length
          ? numberedNote(title, fallbacks, left)
          : note(
              title,
              "No next-best anchor is on the list. Pitch lower, turn the shelter or move to firmer ground.",
              left,
            ),
      },
      {
        width: middle,
        block: stackNotes([
          note("Sleep here", names.length ? names.join(", ") : "Nobody placed yet.", middle),
          camp.result.retension === null ? null : note("Check again", camp.result.retension, middle),
          contacts.length > 0 ? null : mindNote(camp, middle),
        ]),
      },
      ...(contacts.length > 0
        ? [{ width: right, block: stackNotes([contactsNote(contacts, right), mindNote(camp, right)]) }]
        : []),
    ],
    COLUMN_GAP,
  );
}
