import type { ReactElement } from "react";
import { View } from "@react-pdf/renderer";
import type { PitchView } from "@/lib/domain/views";
import { formatWindRange } from "@/lib/format/angles";
import { formatAltitude } from "@/lib/format/lengths";
import { withUnit } from "@/lib/format/numbers";
import { formatPosition } from "@/lib/format/positions";
import { formatBeaufort, formatSpeed } from "@/lib/format/speeds";
import { startSentence } from "@/lib/format/words";
import { fillPages, hairline, rule, spacer, stack, textBlock, type Block } from "../sections/block";
import { factRow } from "../sections/facts";
import { contactsNote, note, noteColumns } from "../sections/notes";
import {
  bodyHeight,
  continuedHeader,
  PageFrame,
  pageHeader,
  type Heading,
  type PageFrameProps,
} from "../sections/page-frame";
import { StateIcon } from "../sections/marks";
import { tieOutTable } from "../sections/tie-out-table";
import { weakestTable } from "../sections/weakest-table";
import { TYPE } from "../theme";
import {
  campHeadline,
  facingWords,
  groundName,
  groundRemarks,
  forecastLines,
  forecastSource,
  hazardCautions,
  hazardNames,
  holdsToWords,
  lowerFirst,
  nightWords,
  waterWords,
} from "../words";
import { planGrid, resultOf } from "./camp-plans";
import { rowsOf, type CardContext } from "./pitch-card";

type Keeping = Block & { readonly keepsWithNext?: boolean };

/** A camp: what to know and all shelters on the first page, then every tie-out, shelter by shelter. */
export function fieldCardPages(context: CardContext): ReactElement<PageFrameProps>[] {
  const { header, camp, sheet } = context;
  const heading: Heading = {
    kicker: `${header.tripName} · ${nightWords(camp.nightNumbers, camp.camp)}`,
    title: camp.camp.details.name,
  };
  const top = pageHeader(header, heading, sheet);
  const nextTop = continuedHeader(header, heading, sheet);
  const first = [
    headline(context),
    factRow(campFacts(context), sheet.inner),
    ...forecastNote(context),
    campNotes(context),
  ];
  const weakest = weakestTable(camp, sheet.inner, context.preferences);
  const room = bodyHeight(header, sheet, top) - heightOf(first);
  const blocks: Keeping[] = [
    ...first,
    ...planGrid(context, room, heightOf(weakest)),
    ...weakest,
    ...camp.pitches.flatMap((pitch) => shelterSection(context, pitch)),
    ...cautionsNote(context),
  ];
  return fillPages(blocks, (index) => bodyHeight(header, sheet, index === 0 ? top : nextTop)).map((page, index) => (
    <PageFrame
      key={`${camp.camp.id}-${index}`}
      sheet={sheet}
      header={header}
      top={index === 0 ? top : nextTop}
      bookmark={index === 0 ? heading.title : undefined}
    >
      {stack(page).node}
    </PageFrame>
  ));
}

const heightOf = (blocks: readonly Block[]) => blocks.reduce((sum, block) => sum + block.height, 0);

function headline({ camp, sheet, preferences }: CardContext): Block {
  const width = sheet.inner - 22;
  const text = textBlock(campHeadline(camp.result, preferences.speedUnit), width, { size: TYPE.number, weight: 800 });
  return stack([
    spacer(8),
    {
      height: text.height,
      node: (
        <View style={{ flexDirection: "row" }}>
          <View style={{ width: 22, marginTop: 2.5 }}>
            <StateIcon verdict={camp.result.verdict} size={13} />
          </View>
          <View style={{ width }}>{text.node}</View>
        </View>
      ),
    },
  ]);
}

function campFacts({ camp, preferences }: CardContext) {
  const { details } = camp.camp;
  const gust = camp.result.designGustMs;
  const holdsTo = holdsToWords({ ...camp.result }, null, preferences.speedUnit);
  const hours =
    details.strongWindHours === null
      ? "hours of strong wind not said"
      : `${withUnit(String(details.strongWindHours), "h")} of strong wind`;
  return [
    {
      label: "Gust planned",
      value: gust === null ? "unknown" : formatSpeed(gust, preferences.speedUnit),
      remark: gust === null || preferences.speedUnit === "Beaufort" ? hours : `${formatBeaufort(gust)} · ${hours}`,
    },
    {
      label: "Wind from",
      value: formatWindRange(details.windFromDeg, details.windToDeg),
      remark: windDegrees(details),
    },
    { label: "All holds to", ...holdsTo },
    {
      label: "Ground",
      value: groundName(details.ground)?.toLowerCase() ?? "unknown",
      remark: groundWords(details),
    },
  ];
}

function windDegrees({ windFromDeg, windToDeg }: CardContext["camp"]["camp"]["details"]): string {
  if (windFromDeg === null || windToDeg === null) return "range not said";
  return `${Math.round(windFromDeg)}° to ${Math.round(windToDeg)}°`;
}

function groundWords(details: CardContext["camp"]["camp"]["details"]): string {
  const main = details.ground
    ? groundRemarks(details.ground, details.slopeDeg) || "in its usual state"
    : "Choose the ground at the camp.";
  const second = groundName(details.secondGround);
  return second === null ? main : `${main}\nSecond patch: ${second.toLowerCase()}`;
}

/** A line a night, and where it is from. */
function forecastNote({ camp: { forecast }, preferences, sheet }: CardContext): Block[] {
  if (!forecast) return [];
  const [first = "", ...others] = forecastLines(forecast.nights, preferences);
  const lines = [`Forecast: ${first}`, ...others].join("\n");
  return [spacer(4), textBlock(`${lines}. ${forecastSource(forecast)}`, sheet.inner, { size: TYPE.body })];
}

/** What to do about each hazard: behind the tables, so that the first page keeps its drawings. */
function cautionsNote({ camp, sheet }: CardContext): Block[] {
  const cautions = hazardCautions(camp.camp.details.hazards);
  if (cautions.length === 0) return [];
  return [stack([spacer(12), rule(1.2), spacer(4), note("This place", cautions.join("\n"), sheet.inner)])];
}

const GAP = 14;

function campNotes({ camp, contacts, sheet, preferences }: CardContext): Block {
  const { details } = camp.camp;
  const width = (sheet.inner - 2 * GAP) / 3;
  const position =
    details.latitude === null || details.longitude === null
      ? null
      : formatPosition(details.latitude, details.longitude);
  const altitude = details.altitudeM === null ? null : formatAltitude(details.altitudeM, preferences.lengthUnit);
  const hazards = hazardNames(details.hazards);
  const water = waterWords(details, preferences.lengthUnit);
  return stack([
    spacer(8),
    noteColumns(
      [
        note("Place", [position ?? "position not said", altitude].filter(Boolean).join("\n"), width),
        camp.way.length ? note("Way here", camp.way.join(" "), width) : null,
        water ? note("Water", water, width) : null,
        hazards.length ? note("Mind", `${startSentence(hazards.map(lowerFirst).join(", "))}.`, width) : null,
        camp.result.retension === null ? null : note("Check again", camp.result.retension, width),
        contactsNote(contacts, width),
        details.wayOut ? note("Way out", details.wayOut, width) : null,
        details.meetingPoint ? note("Meet at", details.meetingPoint, width) : null,
        details.notes ? note("Notes", details.notes, width) : null,
      ],
      width,
      3,
      GAP,
    ),
    spacer(8),
    hairline(),
  ]);
}

function shelterSection(context: CardContext, pitch: PitchView): Keeping[] {
  const { camp, sheet, preferences } = context;
  const shelter = resultOf(context, pitch);
  if (!shelter) return [];
  const table = tieOutTable({
    rows: rowsOf(camp, pitch, shelter),
    tray: camp.tray,
    width: sheet.inner,
    preferences,
    isTight: true,
  });
  const holdsTo = holdsToWords(shelter, camp.result.designGustMs, preferences.speedUnit);
  const names = camp.sleeperNames[pitch.id] ?? [];
  const about = [
    facingWords(pitch),
    holdsTo.value === "unknown" ? holdsTo.remark : `holds to ${holdsTo.value}`,
    names.length ? `sleep here: ${names.join(", ")}` : "nobody placed yet",
  ].join(" · ");
  const fallbacks = camp.fallbacks[pitch.id] ?? [];
  const head = stack([
    spacer(14),
    rule(1.2),
    spacer(4),
    textBlock(pitch.name, sheet.inner, { size: TYPE.number, weight: 800 }),
    textBlock(about, sheet.inner, { size: TYPE.body }),
    spacer(3),
    table.head,
  ]);
  const next = fallbacks.length
    ? [
        stack([
          spacer(5),
          note(
            "Softer ground or stronger wind",
            fallbacks.map((step, i) => `${i + 1}. ${step}`).join("  "),
            sheet.inner,
          ),
        ]),
      ]
    : [];
  return [
    { ...head, keepsWithNext: true },
    ...table.rows.map((row, index) => ({
      ...row,
      keepsWithNext: index === 0 || (index === table.rows.length - 1 && next.length > 0),
    })),
    ...next,
  ];
}
