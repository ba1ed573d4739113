import { makeCast } from "../../helpers/actors";
import { clearLimits, readOutbox } from "../../helpers/outbox";
import { codeOf, refusalOf } from "../../helpers/refusals";
import { hashTables } from "../../helpers/table-hash";
import { eq } from "drizzle-orm";
import fc from "fast-check";
import Papa from "papaparse";
import { beforeEach, describe, expect, it } from "vitest";
import { getDb } from "@/db/client";
import { person } from "@/db/schema";
import { exportPeople } from "@/lib/services/people/export-people";
import { importPeople } from "@/lib/services/people/import-people";
import { readPeopleCsv } from "@/lib/services/people/read-people-csv";

beforeEach(clearLimits);

type Cast = Awaited<ReturnType<typeof makeCast>>;
const take = (cast: Cast, csv: string, isTrial = false) =>
  importPeople({ ctx: cast.leader.ctx, input: { tripId: cast.tripId, csv, isTrial } });

describe("people from a file", () => {
  it.each([
    ["commas", "name,email,role\nAda Moss,ADA@example.test,co-leader\nBo Byr,bo@example.test,\n"],
    [
      "semicolons and Windows lines",
      "Name;E-mail;Role\r\nAda Moss;ada@example.test;Co-leader\r\nBo Byr;bo@example.test;\r\n",
    ],
    [
      "tabs, a mark at the front, other columns",
      "\uFEFFphone\temail\tname\n1\tada@example.test\tAda Moss\n\n2\tbo@example.test\tBo Byr",
    ],
  ])("with %s", async (_, csv) => {
    const cast = await makeCast();
    const before = await hashTables();
    expect((await take(cast, csv, true)).people.map((one) => one.email)).toEqual([
      "ada@example.test",
      "bo@example.test",
    ]);
    expect(await hashTables()).toEqual(before);
    expect((await take(cast, csv)).isDone).toBe(true);
    const rows = await getDb().select().from(person).where(eq(person.tripId, cast.tripId));
    expect(rows.map((row) => row.name)).toEqual(expect.arrayContaining(["Ada Moss", "Bo Byr"]));
    expect(await readOutbox("bo@example.test")).not.toEqual([]);
    await expect(take(cast, csv)).rejects.toMatchObject({ code: "bad-input" });
  });

  it("says what is wrong in which row and column, and adds nobody", async () => {
    const cast = await makeCast();
    const csv = [
      "name,email,role",
      "Ada Moss,ada@example.test,participant",
      ",bo@example.test,",
      "Cy Dale,cy at home,boss",
      "Dee,ADA@example.test,",
      `Eve,${cast.participant.email},`,
      `${"x".repeat(5000)},f@example.test,`,
    ].join("\n");
    const before = await hashTables();
    const refusal = await refusalOf(take(cast, csv));
    expect(refusal.fieldErrors.csv).toEqual([
      "Row 3, name: Enter a name.",
      "Row 4, e-mail: That is not an e-mail address.",
      expect.stringMatching(/^Row 4, role: There is no such role/),
      "Row 5, e-mail: The same address as in row 2.",
      expect.stringMatching(/^Row 7, name: .*too long/),
    ]);
    expect(await hashTables()).toEqual(before);
    const taken = await refusalOf(take(cast, `name,email\nEve,${cast.participant.email}`));
    expect(taken.fieldErrors.csv).toEqual([`Row 2, e-mail: ${cast.participant.email} is on this trip already.`]);
  });

  it.each([
    ["no header", "Ada Moss,ada@example.test", /“name” is missing/],
    ["only a header", "name,email\n", /nobody in it/],
    ["an open quote", 'name,email\n"Ada,ada@example.test\n', /quote is not closed/],
    ["a column twice", "name,name,email\na,b,c@example.test", /there twice/],
    ["too many columns", `${"a,".repeat(10_000)}b\n`, /At most 40 columns/],
    ["a header of a prototype", "__proto__,constructor\n1,2", /is missing/],
    [
      "a thousand rows",
      `name,email\n${Array.from({ length: 1000 }, (_, i) => `P,p${i}@example.test`).join("\n")}`,
      /At most 60 people/,
    ],
  ])("with %s is refused", async (_, csv, words) => {
    const cast = await makeCast();
    const { fieldErrors } = await refusalOf(take(cast, csv));
    expect(fieldErrors.csv?.join(" ")).toMatch(words);
  });

  it("of a megabyte, or of nothing, is refused", async () => {
    const cast = await makeCast();
    expect(await codeOf(take(cast, "x".repeat(1e6)))).toBe("bad-input");
    expect(await codeOf(take(cast, " \n "))).toBe("bad-input");
  });

  it("is for the leader of this trip", async () => {
    const cast = await makeCast();
    const input = { tripId: cast.tripId, csv: "name,email\nAda,ada@example.test", isTrial: true };
    for (const [who, code] of [
      [cast.stranger, "not-found"],
      [cast.otherLeader, "not-found"],
      [cast.participant, "forbidden"],
      [cast.coLeader, "forbidden"],
    ] as const) {
      expect(await codeOf(importPeople({ ctx: who.ctx, input }))).toBe(code);
      expect(await codeOf(exportPeople({ ctx: who.ctx, input: { tripId: cast.tripId } }))).toBe(code);
    }
  });
});

describe("formulas in a file", () => {
  const FORMULAS = ["=1+1", "+1", "-1", "@SUM(A1)", "=HYPERLINK(0)", "＝1+1"];

  it("stay text when they come in, and are disarmed when they go out", async () => {
    const cast = await makeCast();
    const csv = `name,email\n${FORMULAS.map((name, i) => `"${name}",f${i}@example.test`).join("\n")}`;
    await take(cast, csv);
    const rows = await getDb().select().from(person).where(eq(person.tripId, cast.tripId));
    expect(rows.map((row) => row.name)).toEqual(expect.arrayContaining(FORMULAS));
    const { content } = await exportPeople({ ctx: cast.leader.ctx, input: { tripId: cast.tripId } });
    const cells = Papa.parse<string[]>(content).data.flat();
    for (const cell of cells) expect(cell).not.toMatch(/^[=+\-@\t\r＝]/);
    expect(cells).toContain("'=1+1");
  });

  it("and what was exported comes back the same", () => {
    const name = fc
      .string({
        unit: fc.constantFrom("=", "+", "-", "@", "a", "é", ",", ";", '"', " ", "7"),
        minLength: 1,
        maxLength: 12,
      })
      .map((text) => text.trim())
      .filter((text) => text !== "");
    fc.assert(
      fc.property(fc.array(name, { minLength: 1, maxLength: 5 }), (names) => {
        const rows = names.map((one, i) => [one, `p${i}@example.test`]);
        const csv = Papa.unparse({ fields: ["name", "email"], data: rows }, { escapeFormulae: /^[=+\-@\t\r＝].*$/s });
        const { people, faults } = readPeopleCsv(csv);
        expect(faults).toEqual([]);
        expect(people.map((one) => one.name)).toEqual(names);
      }),
      { seed: 5 },
    );
  });
});
