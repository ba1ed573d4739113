import { mkdirSync, writeFileSync } from "node:fs";
import { describe, expect, test } from "vitest";
import { POCKET_FOLD } from "@/lib/domain/paper/impose";
import { METRIC } from "@/lib/domain/preferences";
import type { PackListView, PaperDocument } from "@/lib/domain/views";
import { renderPaper } from "@/lib/pdf/render";
import { toOwnCard } from "@/lib/services/own-pages/build-own-cards";
import { CAMP, CONTACTS, HEADER, packList, paperCamp, PEOPLE } from "./fixture";
import { overlapsOf, readPdf } from "./read-pdf";

type PitchAndPack = Extract<PaperDocument, { kind: "pitch-and-pack" }>;

const NAMES = [
  "Alder Bank",
  "Quarry Flat",
  "Sill Ridge",
  "Otter Holm",
  "Tarn Head",
  "Wether Lair",
  "Gull Spit",
  "Low Barn",
];

const PAPER = paperCamp([{ kind: "ridge-tarp", sleepers: PEOPLE.slice(0, 3) }], CAMP);
const CARDS = PAPER.pitches.map((pitch) => toOwnCard(PAPER, pitch, METRIC));

function ownPaper(
  nights: number,
  more: Partial<PitchAndPack> = {},
  list: PackListView = packList("Runa Amsel"),
): PitchAndPack {
  const names = NAMES.slice(0, nights);
  return {
    kind: "pitch-and-pack",
    header: HEADER,
    contacts: CONTACTS,
    fold: "flat",
    list: {
      ...list,
      nights: names.map((campName, index) => ({
        campId: `camp-${index}`,
        campName,
        day: `2026-06-${12 + index}`,
        shelterName: "Ridge tarp",
        pitchId: `pitch-${index}`,
        withNames: ["Tobi Oduya", "Łucja Żółtowska"],
      })),
    },
    cards: names.flatMap((campName, index) =>
      CARDS.map((card) => ({ ...card, campName, campId: `camp-${index}`, pitchId: `pitch-${index}` })),
    ),
    content: { nights: [], bring: [], carry: [], pitches: [], contacts: [] },
    ...more,
  };
}

/** Kept for looking at when a folder is named. */
async function render(name: string, paper: PitchAndPack, size: "A4" | "LETTER" = "A4") {
  const pdf = await renderPaper(paper, { size });
  const folder = process.env.PDF_OUT;
  if (folder) {
    mkdirSync(folder, { recursive: true });
    writeFileSync(`${folder}/${name}.pdf`, pdf);
  }
  return readPdf(pdf);
}

describe("pitch and pack", () => {
  test.each([
    ["A4", 1],
    ["A4", 5],
    ["LETTER", 5],
    ["A4", 8],
  ] as const)("%s, %i nights: at most four pages, nothing outside, nothing over another", async (size, nights) => {
    const read = await render(`flat-${size}-${nights}`, ownPaper(nights), size);
    expect(read.pages.length).toBeLessThanOrEqual(4);
    for (const page of read.pages) {
      expect(overlapsOf(page)).toEqual([]);
      for (const item of page.items) {
        expect(item.x).toBeGreaterThan(20);
        expect(item.x + item.width).toBeLessThan(page.width - 20);
        expect(item.baseline).toBeLessThan(page.height - 20);
        expect(item.size).toBeGreaterThanOrEqual(9);
      }
    }
    expect(read.pages[0]?.text).toContain("version 5");
    for (const name of NAMES.slice(0, nights)) expect(read.text).toContain(`${name}: Ridge tarp`);
    expect(read.text).toContain("Three-blade 200");
    expect(read.text).toContain("Mountain rescue");
  });

  test.each([1, 3, 5])("folded for the pocket, %i nights: one side of one sheet", async (nights) => {
    const read = await render(`pocket-${nights}`, ownPaper(nights, { fold: "pocket" }));
    expect(read.pages).toHaveLength(1);
    const [page] = read.pages;
    if (!page) throw new Error("There is no page.");
    const [middleX, middleY] = [page.width / 2, page.height / 2];
    for (const item of page.items) {
      const isTop = item.baseline < middleY;
      // Text on its head runs to the left from where it starts.
      const [left, right] = isTop ? [item.x - item.width, item.x] : [item.x, item.x + item.width];
      expect(left >= middleX + 10 || right <= middleX - 10).toBe(true);
      expect(left).toBeGreaterThan(8);
      expect(right).toBeLessThan(page.width - 8);
      expect(item.size).toBeGreaterThanOrEqual(8.9);
    }
    expect(page.text).toContain("version 5");
    for (const name of NAMES.slice(0, nights)) expect(page.text).toContain(name);
    expect(page.text).toContain("test on site");
  });

  test("more nights than four small pages hold are named, not lost", async () => {
    const own = Array.from({ length: 60 }, (_, index) => ({
      key: `item:${index}`,
      name: `Thing ${index + 1} with a long name`,
      detail: "",
      massKg: null,
      isTicked: false,
    }));
    const read = await render("pocket-full", ownPaper(8, { fold: "pocket" }, { ...packList("Runa Amsel"), own }));
    expect(read.pages).toHaveLength(1);
    expect(read.text).toContain("No room here for");
    expect(read.text).toContain("Low Barn");
  });

  test("with nothing on it yet", async () => {
    const list = { ...packList("Runa Amsel"), own: [], group: [], groupMassKg: 0, nights: [] };
    const read = await render("empty", { ...ownPaper(1), list, cards: [], contacts: [] });
    expect(read.pages).toHaveLength(1);
    expect(read.text).toContain("No nights yet.");
    expect(read.text).toContain("Nothing is listed yet.");
  });

  test("names in Latin and Cyrillic letters come out as they are, Greek ones in Latin letters", async () => {
    for (const [name, printed] of [
      ["Łucja Żółtowska", "Łucja Żółtowska"],
      ["Никита Щеглов", "Никита Щеглов"],
      // ISO 843: Γ G, ι i, ώ o, ρ r, γ g, ο o, ς s.
      ["Γιώργος Αυγουλάς", "Giorgos Avgoulas"],
    ] as const) {
      for (const fold of ["flat", "pocket"] as const) {
        const read = await render(`letters-${fold}`, ownPaper(1, { fold }, packList(name)));
        // Letters of one word may come from two files of the family, and are then read as two pieces.
        expect(read.text.replaceAll(" ", "")).toContain(printed.replaceAll(" ", ""));
      }
    }
  });
});

describe("the pocket fold", () => {
  /** Paper folded in thought: a point of a quarter goes where the two folds take it; above 0 faces the reader. */
  function fold({ column, row }: { column: 0 | 1; row: 0 | 1 }) {
    // First fold: the top half goes behind the lower one, its printed side to the back, upside down.
    const afterFirst = { column, layer: row === 1 ? 0 : 1, facesFront: row === 1, isTurned: row === 0 };
    // Second fold: the left half goes behind the right one; its front side then faces the back.
    return column === 1
      ? afterFirst
      : { ...afterFirst, layer: 3 - afterFirst.layer, facesFront: !afterFirst.facesFront };
  }

  test("reads 1, 2, 3, 4 as one turns the pages, each the right way up", () => {
    // Leaves from the front: layer 0 facing front is the cover, 1 its back; 2 faces it, 3 is the back.
    const order = POCKET_FOLD.map((place) => ({ ...place, ...fold(place) })).sort((a, b) => a.layer - b.layer);
    expect(order.map((place) => place.page)).toEqual([1, 2, 3, 4]);
    expect(order.map((place) => place.isUpsideDown)).toEqual(order.map((place) => place.isTurned));
    expect(order.map((place) => place.facesFront)).toEqual([true, false, true, false]);
  });
});
