import { beforeEach, describe, expect, it } from "vitest";
import fc from "fast-check";
import Papa from "papaparse";
import { makeCast } from "../../helpers/actors";
import { makeCampKit } from "../../helpers/camp-kit";
import { SEED } from "../../helpers/hostile-values";
import { clearLimits } from "../../helpers/outbox";
import { practicePullOf, pullOf } from "../../helpers/pulls";
import { codeOf, refusalOf } from "../../helpers/refusals";
import { hashTables } from "../../helpers/table-hash";
import { newId } from "@/lib/domain/ids";
import { createCampPullTest, createPracticePullTest } from "@/lib/services/pull-tests/create-pull-test";
import { COLUMNS, guardText, unguardText } from "@/lib/services/pull-tests/csv/columns";
import { exportCampPullTests, exportPracticePullTests } from "@/lib/services/pull-tests/csv/export-pull-tests";
import { importCampPullTests, importPracticePullTests } from "@/lib/services/pull-tests/csv/import-pull-tests";
import { getCampPullTests } from "@/lib/services/pull-tests/get-camp-pull-tests";
import { switchPullTest } from "@/lib/services/pull-tests/switch-pull-test";

let cast: Awaited<ReturnType<typeof makeCast>>;
let at: { tripId: string; campId: string };

beforeEach(async () => {
  cast = await makeCast();
  await clearLimits();
  const kit = await makeCampKit(cast.leader.ctx, cast.tripId);
  at = { tripId: cast.tripId, campId: kit.campId };
});

const utf8 = (text: string) => new TextEncoder().encode(text);
const bring = (content: string | Uint8Array, ctx = cast.leader.ctx) =>
  importCampPullTests({ ctx, input: at, content: typeof content === "string" ? utf8(content) : content });
const takeOut = async () => (await exportCampPullTests({ ctx: cast.leader.ctx, input: at })).text;

const HEAD = "pulled_at,wetness,anchor,lean_deg,line_angle_deg,force,unit,outcome";
const ROW = "2027-06-12,usual,three-blade-200,0,45,18,kgf,came-out";
const table = (...rows: string[]) => `${[HEAD, ...rows].join("\n")}\n`;

describe("a table of readings", () => {
  it("comes out with every column and goes in again without a change", async () => {
    const { ctx } = cast.leader;
    const notes = ["plain", "=1+1", "-5 °C, wind", "'quoted'", "'=twice", 'two\nlines, "quoted"', "＝wide", ""];
    for (const [index, note] of notes.entries()) {
      const input = { ...at, ...pullOf(newId(), { note, force: 10.25 + index, outcome: "still-holding" }) };
      await createCampPullTest({ ctx, input });
    }
    const { readings } = await getCampPullTests({ ctx, input: at });
    await switchPullTest({ ctx, input: { pullTestId: readings[0]?.id ?? "", isOff: true } });
    const before = await hashTables();
    const text = await takeOut();
    expect(text.split("\r\n")[0]).toBe(COLUMNS.join(","));
    expect(text).not.toMatch(/(^|,|\n)"?[=＝]/m);
    expect(await bring(text)).toEqual({ added: 0, known: notes.length });
    expect(await bring(`\uFEFF${text}`)).toEqual({ added: 0, known: notes.length });
    expect(await hashTables()).toEqual(before);
  });

  it("keeps numbers numbers: a lean of −5° comes out as -5", async () => {
    const input = { ...at, ...pullOf(newId(), { leanDeg: -5, note: "-5" }) };
    await createCampPullTest({ ctx: cast.leader.ctx, input });
    const [, cells = []] = Papa.parse<string[]>(await takeOut()).data;
    expect(cells[COLUMNS.indexOf("lean_deg")]).toBe("-5");
    expect(cells[COLUMNS.indexOf("note")]).toBe("'-5");
  });

  it("guards every text and gives it back as it was", () => {
    fc.assert(
      fc.property(
        fc.oneof(
          fc.string(),
          fc.string().map((text) => `=${text}`),
          fc.string().map((text) => `'${text}`),
        ),
        (text) => {
          expect(unguardText(guardText(text))).toBe(text);
          expect(guardText(text)).not.toMatch(/^[=+\-@\t\r＝＋－＠]/);
        },
      ),
      { seed: SEED, numRuns: 500 },
    );
  });

  it("adds what is new and leaves alone what is known, row by row", async () => {
    expect(await bring(table(ROW, ROW))).toEqual({ added: 2, known: 0 });
    expect(await bring(table(ROW, ROW.replace("18", "19"), ROW, ROW))).toEqual({ added: 2, known: 2 });
    const { patches, total, readings } = await getCampPullTests({ ctx: cast.leader.ctx, input: at });
    expect(total).toBe(4);
    expect(patches[0]?.ownCount).toBe(4);
    expect(readings[0]).toMatchObject({ pulledAt: "2027-06-12T12:00:00.000Z", anchorName: "Three-blade, 200 mm" });
  });

  it("goes into the practice field with its place and ground", async () => {
    const { ctx } = cast.participant;
    await createPracticePullTest({ ctx, input: practicePullOf(newId(), { place: "@home" }) });
    const before = await hashTables();
    const { text } = await exportPracticePullTests({ ctx });
    expect(await importPracticePullTests({ ctx, content: utf8(text) })).toEqual({ added: 0, known: 1 });
    expect(await hashTables()).toEqual(before);
    const content = utf8(`${HEAD},place,ground\n${ROW},Meadow,peat\n`);
    expect(await importPracticePullTests({ ctx, content })).toEqual({ added: 1, known: 0 });
  });
});

const utf16 = (text: string) => Buffer.concat([Buffer.from([0xff, 0xfe]), Buffer.from(text, "utf16le")]);

describe("a table that is not right", () => {
  const cell = (column: string, value: string) => {
    const cells = ROW.split(",");
    cells[HEAD.split(",").indexOf(column)] = value;
    return table(ROW, cells.join(","));
  };

  it.each<[string, () => string | Uint8Array, RegExp]>([
    ["semicolons", () => table(ROW).replaceAll(",", ";"), /not separated by commas/],
    ["tabs", () => table(ROW).replaceAll(",", "\t"), /not separated by commas/],
    ["UTF-16", () => utf16(table(ROW)), /UTF-16.*Save it as CSV in UTF-8/],
    ["bytes that are no text", () => Uint8Array.from([0x61, 0xff, 0x62]), /not UTF-8/],
    ["nothing", () => "", /empty/],
    ["a heading alone", () => `${HEAD}\n`, /no reading below the heading/],
    ["a column that is not known", () => table(ROW).replace("wetness", "moisture"), /no column “moisture”/],
    ["a column twice", () => table(ROW).replace("wetness", "unit"), /unit is there twice/],
    ["a column missing", () => "pulled_at,anchor\n2027-06-12,three-blade-200\n", /wetness.*missing/],
    ["a quotation mark that never closes", () => table(`"${ROW}`), /not closed/],
    ["a row with a cell too many", () => table(`${ROW},9`), /Row 2 has 9 cells/],
    ["a million columns", () => `${"a,".repeat(100_000)}a\n`, /no column “a”/],
  ])("%s: says what, and stores nothing", async (_, content, sentence) => {
    const before = await hashTables();
    const refusal = await refusalOf(bring(content()));
    expect(refusal.status).toBe(400);
    expect(refusal.userMessage).toMatch(sentence);
    await clearLimits();
    expect(await hashTables()).toEqual(before);
  });

  it.each([
    ["force", '"12,5"', /Use a decimal point: 12.5/],
    ["force", "0", /above 0/],
    ["force", "-3", /above 0/],
    ["force", "9999", /20 kN/],
    ["force", "0x10", /not a number/],
    ["force", "1e999", /.+/],
    ["force", "", /Enter the force/],
    ["unit", "stone", /N, kgf or lbf/],
    ["outcome", "vanished", /what happened/],
    ["anchor", "harpoon", /no anchor “harpoon”/],
    ["anchor", "rock-20", /no anchor/],
    ["pulled_at", "yesterday", /2027-06-12T18:20:00Z/],
    ["lean_deg", "99", /between -10 and 60/],
    ["wetness", "damp", /how wet/],
  ])("%s = %s is refused by row and column, and the good row stays out too", async (column, value, sentence) => {
    const before = await hashTables();
    const refusal = await refusalOf(bring(cell(column, value)));
    expect(Object.keys(refusal.fieldErrors)).toEqual([`row 3, ${column}`]);
    expect(Object.values(refusal.fieldErrors).flat().join(" ")).toMatch(sentence);
    await clearLimits();
    expect(await hashTables()).toEqual(before);
  });

  it("of more rows than are allowed is refused before they are read", async () => {
    const rows = `${HEAD}\n${`${ROW}\n`.repeat(20_001)}`;
    expect((await refusalOf(bring(rows))).userMessage).toMatch(/more than 20000 readings/);
    expect((await getCampPullTests({ ctx: cast.leader.ctx, input: at })).total).toBe(0);
  });

  it("lists the first fifty of very many faults", async () => {
    const refusal = await refusalOf(bring(table(...Array.from({ length: 500 }, () => ROW.replace("18", "x")))));
    expect(refusal.userMessage).toMatch(/^500 cells are not right/);
    expect(Object.keys(refusal.fieldErrors)).toHaveLength(50);
  });

  it("is refused to participants and strangers, and out of another trip's camp nothing comes", async () => {
    for (const [who, code] of [
      [cast.participant, "forbidden"],
      [cast.stranger, "not-found"],
      [cast.otherLeader, "not-found"],
    ] as const) {
      expect(await codeOf(bring(table(ROW), who.ctx))).toBe(code);
      expect(await codeOf(exportCampPullTests({ ctx: who.ctx, input: at }))).toBe(code);
    }
  });
});
