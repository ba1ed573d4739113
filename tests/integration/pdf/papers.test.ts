import { beforeAll, describe, expect, test } from "vitest";
import { SHELTER_KINDS } from "@/lib/calc/shelter-kinds";
import { blankCamp } from "@/lib/domain/camp/schema";
import { METRIC } from "@/lib/domain/preferences";
import type { PaperCamp, PaperDocument } from "@/lib/domain/views";
import { renderPaper } from "@/lib/pdf/render";
import { booklet, CAMP, CONTACTS, fieldCard, HEADER, packList, paperCamp, PEOPLE, pitchCard } from "./fixture";
import { embeddedFonts, overlapsOf, readPdf, type ReadPdf } from "./read-pdf";

const SIZES = { A4: [595.28, 841.89], LETTER: [612, 792] } as const;
/** Printers leave about 5 mm blank. */
const UNPRINTED = 14;

function expectSound({ pages }: ReadPdf): void {
  for (const page of pages) {
    for (const item of page.items) {
      expect.soft(item.size, `size of "${item.text}"`).toBeGreaterThanOrEqual(8.99);
      expect.soft(item.x, `left of "${item.text}"`).toBeGreaterThanOrEqual(UNPRINTED);
      expect.soft(item.x + item.width, `right of "${item.text}"`).toBeLessThanOrEqual(page.width - UNPRINTED);
      expect.soft(item.baseline - item.size, `top of "${item.text}"`).toBeGreaterThanOrEqual(UNPRINTED);
      expect.soft(item.baseline, `foot of "${item.text}"`).toBeLessThanOrEqual(page.height - UNPRINTED);
    }
    expect.soft(overlapsOf(page)).toEqual([]);
  }
}

describe("pitch card", () => {
  for (const { kind } of SHELTER_KINDS) {
    test(`${kind}: every tie-out, on both sizes of paper, nothing cut or covered`, async () => {
      const paper = pitchCard(kind);
      if (paper.kind !== "pitch-card") throw new Error("A pitch card was asked for.");
      const [shelter] = paper.camp.result.shelters;
      for (const size of ["A4", "LETTER"] as const) {
        const pdf = await renderPaper(paper, { size });
        expect(Buffer.from(pdf.subarray(0, 5)).toString()).toBe("%PDF-");
        const read = await readPdf(pdf);
        expectSound(read);
        expect(read.pages.length).toBeLessThanOrEqual((shelter?.tieOuts.length ?? 0) > 16 ? 3 : 2);
        for (const page of read.pages) {
          expect(page.width).toBeCloseTo(SIZES[size][0], 1);
          expect(page.height).toBeCloseTo(SIZES[size][1], 1);
          expect(page.text).toContain("test on site");
          expect(page.text).toContain("version 5");
          expect(page.text).toContain("printed 9 June 18:20");
        }
        const large = read.pages.flatMap((page) =>
          page.items.filter((item) => item.size > 13.9).map((item) => item.text),
        );
        const drawn = read.pages[0]?.items
          .filter((item) => item.size > 10.9 && item.size < 11.1)
          .map((item) => item.text);
        for (const tieOut of shelter?.tieOuts ?? []) {
          expect(large, `row of tie-out ${tieOut.number}`).toContain(String(tieOut.number));
          expect(drawn, `tie-out ${tieOut.number} in the drawing`).toContain(String(tieOut.number));
        }
        expect(read.text).toContain("112");
        expect(read.text).toContain("+44 1632 960 117");
      }
    });
  }

  test("few tie-outs and short remarks stay on one page, large shelters take more", async () => {
    const count = async (paper: PaperDocument) =>
      (await readPdf(await renderPaper(paper, { size: "A4" }))).pages.length;
    const camp = paperCamp([{ kind: "pyramid", sleepers: PEOPLE.slice(0, 3) }]);
    const plain = camp.result.shelters.map((shelter) => ({
      ...shelter,
      tieOuts: shelter.tieOuts.map((one) => ({
        ...one,
        placement: one.placement && { ...one.placement, tandem: null, rockKg: 0, shockCord: false, depthOutM: 0 },
      })),
    }));
    expect(camp.result.shelters[0]?.tieOuts.length).toBe(12);
    expect(await count(pitchCard("pyramid", { ...camp, result: { ...camp.result, shelters: plain } }))).toBe(1);
    expect(await count(pitchCard("bell"))).toBeGreaterThan(1);
  });

  test("what is not known is named and has no number", async () => {
    const camp = paperCamp([{ kind: "ridge-tarp" }], blankCamp("Nowhere yet"));
    const read = await readPdf(await renderPaper(pitchCard("ridge-tarp", camp), { size: "A4" }));
    expectSound(read);
    expect(read.text).toContain("unknown");
    expect(read.text).toContain("Nobody placed yet.");
    expect(read.text).not.toMatch(/NaN|undefined|null|Infinity/);
  });

  test("shows forces, lengths and speeds in the reader's units", async () => {
    const read = await readPdf(
      await renderPaper(pitchCard("ridge-tarp"), {
        size: "LETTER",
        preferences: { ...METRIC, speedUnit: "mph", forceUnit: "lbf", lengthUnit: "ft" },
      }),
    );
    expectSound(read);
    expect(read.text).toMatch(/\d\s?mph/);
    expect(read.text).toContain("holds, lbf");
    expect(read.text).not.toContain("km/h gust");
  });
});

describe("field card", () => {
  let camp: PaperCamp;
  beforeAll(() => {
    camp = paperCamp([
      { kind: "ridge-tarp", sleepers: PEOPLE.slice(0, 3) },
      { kind: "half-pyramid", headingDeg: 90, sleepers: PEOPLE.slice(3, 5) },
      { kind: "dome", headingDeg: 45, sleepers: PEOPLE.slice(5, 7) },
      { kind: "tunnel", headingDeg: 280, sleepers: PEOPLE.slice(7) },
    ]);
  });

  test.each(["A4", "LETTER"] as const)("camp, all shelters and every tie-out on %s", async (size) => {
    const read = await readPdf(await renderPaper(fieldCard(camp), { size }));
    expectSound(read);
    const [first] = read.pages;
    for (const pitch of camp.pitches) expect(first?.text).toContain(pitch.name);
    expect(first?.text).toContain("54.21348° N, 3.10112° W");
    expect(first?.text).toContain("Spring 120 m east");
    expect(first?.text).toContain("ridge or summit in thunder");
    expect(read.text).toContain("Look at these first");
    read.pages.forEach((page, index) => expect(page.text).toContain(`page ${index + 1} of ${read.pages.length}`));
  });

  test.each([0, 1, 2, 6, 12])("with %i shelters", async (count) => {
    const [one] = camp.pitches;
    if (!one) throw new Error("The camp has shelters.");
    const pitches = Array.from({ length: count }, (_, index) => ({ ...one, name: `Tarp ${index + 1}` }));
    const read = await readPdf(await renderPaper(fieldCard({ ...camp, pitches }), { size: "A4" }));
    expectSound(read);
    for (const pitch of pitches) expect(read.text).toContain(pitch.name);
  });
});

describe("pack list", () => {
  test.each(["A4", "LETTER"] as const)("own things, group's share and nights on %s", async (size) => {
    const read = await readPdf(
      await renderPaper({ kind: "pack-list", header: HEADER, list: packList("Tobi Oduya") }, { size }),
    );
    expectSound(read);
    expect(read.pages).toHaveLength(1);
    for (const line of packList("Tobi Oduya").own) expect(read.text).toContain(line.name);
    expect(read.text).toContain("Quarry Flat");
    expect(read.text).toContain("not placed yet");
  });

  test("two hundred things go on over several pages, none lost", async () => {
    const list = packList("Runa Amsel");
    const own = Array.from({ length: 200 }, (_, i) => ({
      key: `item:${i}`,
      name: `Thing ${i + 1}`,
      detail: "",
      massKg: null,
      isTicked: false,
    }));
    const read = await readPdf(
      await renderPaper({ kind: "pack-list", header: HEADER, list: { ...list, own } }, { size: "A4" }),
    );
    expectSound(read);
    const texts = new Set(read.pages.flatMap((page) => page.items.map((item) => item.text)));
    for (const line of own) expect(texts).toContain(line.name);
  });

  test("with nothing on it", async () => {
    const list = { ...packList("Runa Amsel"), own: [], group: [], groupMassKg: 0, nights: [] };
    const read = await readPdf(await renderPaper({ kind: "pack-list", header: HEADER, list }, { size: "A4" }));
    expectSound(read);
    expect(read.text).toContain("Nothing is listed yet.");
  });
});

describe("booklet and several papers at once", () => {
  test("cover, cards and lists in order, pages counted through", async () => {
    const camp = paperCamp([{ kind: "ridge-tarp", sleepers: PEOPLE.slice(0, 3) }]);
    const paper = booklet([camp], PEOPLE.slice(0, 2).map(packList));
    const pdf = await renderPaper(paper, { size: "A4" });
    const read = await readPdf(pdf);
    expectSound(read);
    expect(read.info.Title).toBe("Harrow Fell traverse: booklet");
    expect(Buffer.from(pdf).toString("latin1")).toContain("/Lang (en-GB)");
    const all = read.pages.map((page) => page.text);
    expect(all[0]).toContain("Booklet");
    expect(all.findIndex((text) => text.includes("Look at these first"))).toBeGreaterThan(0);
    expect(all[all.length - 1]).toContain(`page ${all.length} of ${all.length}`);
  });

  test("a person's papers come as one document", async () => {
    const card = pitchCard("ridge-tarp");
    const list: PaperDocument = { kind: "pack-list", header: HEADER, list: packList("Runa Amsel") };
    const read = await readPdf(await renderPaper([list, card], { size: "A4" }));
    expect(read.pages[0]?.text).toContain("Bring yourself");
    expect(read.text).toContain("Sleep here");
  });

  test("the same paper gives the same text and pages", async () => {
    const card = pitchCard("dome");
    const [one, two] = await Promise.all([1, 2].map(async () => readPdf(await renderPaper(card, { size: "A4" }))));
    expect(one?.text).toBe(two?.text);
  });
});

describe("letters", () => {
  const render = async (names: readonly string[]) => {
    const list = {
      ...packList("Runa Amsel"),
      own: names.map((name, i) => ({ key: `item:${i}`, name, detail: "", massKg: null, isTicked: false })),
    };
    const pdf = await renderPaper({ kind: "pack-list", header: HEADER, list }, { size: "A4" });
    return { pdf, read: await readPdf(pdf) };
  };

  test("names in Latin, Cyrillic and Vietnamese letters come out as they went in", async () => {
    const names = [
      "Łucja Żółtowska",
      "Jörn Åkesson",
      "Maëlle Ó Ciardha",
      "Ngô Thị Ánh Nguyệt",
      "Никита Щеглов",
      "Їжакевич Ґалаґан",
      "Şebnem Çağlar İnönü",
      "Ţepeş Brâncuşi",
      "Jiří Dvořák",
      "Őry Ödön",
      "Þórdís Æsa",
      "Ljubiša Đokić",
      "Қайрат Өмірұлы",
      "Ñuño Iglesias",
      "Straße 4 – „Süd“",
      "Zoë O’Malley",
      "Gržinić Šćepan",
      "Ēriks Ķirsis",
      "Żaneta ĄĘĆŃ",
      "Ĝoja Ŝipo",
    ];
    const { pdf, read } = await render(names);
    expectSound(read);
    for (const name of names)
      expect(read.text.normalize("NFC").replace(/\s+/g, "")).toContain(name.replace(/\s+/g, ""));
    const fonts = embeddedFonts(pdf);
    expect(fonts.length).toBeGreaterThanOrEqual(4);
    expect(fonts.length, "each file of the family once").toBeLessThanOrEqual(15);
    for (const font of fonts) expect(font.glyphBytes).toBeGreaterThan(100);
  });

  test("other scripts are spelled in Latin letters or clearly marked, never drawn as something else", async () => {
    const { read } = await render(["Γιώργος Αυγουλάς", "山田 太郎", "محمد", "Ann 🏕️ Fox", "4 → 5"]);
    expectSound(read);
    for (const line of ["Giorgos Avgoulas", "[?] [?]", "[?]", "Ann [?] Fox", "4 -> 5"])
      expect(read.text).toContain(line);
  });

  test("hostile text stays inside the page and does nothing", async () => {
    const long = "x".repeat(5000);
    const camp = paperCamp([{ kind: "ridge-tarp", name: "T".repeat(60), sleepers: ["W".repeat(80)] }], {
      ...CAMP,
      name: "Ǆ\u202Egnp.exe".repeat(6),
      water: "</Text><script>alert(1)</script>",
      notes: long.slice(0, 900),
    });
    const header = { ...HEADER, tripName: `A\u0000${"M".repeat(99)}`, address: "javascript:alert(1)" };
    const pdf = await renderPaper(
      [
        { kind: "pitch-card", header, contacts: CONTACTS, camp, pitchIds: camp.pitches.map((p) => p.id) },
        { kind: "field-card", header, contacts: CONTACTS, camp },
      ],
      { size: "A4" },
    );
    const read = await readPdf(pdf);
    expectSound(read);
    expect(read.text.replace(/\s+/g, "")).toContain("</Text><script>alert(1)</script>");
    expect(read.text).not.toMatch(/[\u0000\u202E]/);
    expect(Buffer.from(pdf).toString("latin1")).not.toMatch(/\/URI|\/JavaScript|\/JS\b|\/Launch/);
  });

  test("a mail address, a telephone number and a position are never hyphenated", async () => {
    const { read } = await render([
      "runa.amsel@hillwalkers.example",
      "+44 1632 960 117 960 117 960 117 960 117 960 117 960",
    ]);
    expectSound(read);
    expect(read.text).toContain("runa.amsel@hillwalkers.example");
    expect(read.text).not.toMatch(/\d-|@[a-z]*-/);
  });
});
