import { beforeAll, describe, expect, it } from "vitest";
import { writeFileSync } from "node:fs";
import { makeCast } from "../../helpers/actors";
import { makeCampKit } from "../../helpers/camp-kit";
import { clearLimits } from "../../helpers/outbox";
import { practicePullOf } from "../../helpers/pulls";
import { codeOf, refusalOf } from "../../helpers/refusals";
import { readPdf } from "../pdf/read-pdf";
import { newId } from "@/lib/domain/ids";
import { createPracticePullTest } from "@/lib/services/pull-tests/create-pull-test";
import { makeCampSheet, makePracticeSheet } from "@/lib/services/pull-tests/make-practice-sheet";

let cast: Awaited<ReturnType<typeof makeCast>>;
let at: { tripId: string; campId: string };

beforeAll(async () => {
  cast = await makeCast();
  await clearLimits();
  const kit = await makeCampKit(cast.leader.ctx, cast.tripId);
  at = { tripId: cast.tripId, campId: kit.campId };
});

describe("the practice sheet", () => {
  it("prints the kit's anchors in the camp's ground on one page, with what to expect", async () => {
    const input = { ...at, scale: "50", unit: "kgf" as const, count: "12" };
    const { fileName, content } = await makeCampSheet({ ctx: cast.coLeader.ctx, input });
    expect(fileName).toBe("Otter Flat, practice sheet.pdf");
    const { text, pages } = await readPdf(content);
    if (process.env.KEEP_PDF) writeFileSync(process.env.KEEP_PDF, content);
    expect(pages).toHaveLength(1);
    expect(text).toMatch(/Otter Flat: firm moist loam/);
    expect(text).toMatch(/scale to 50/);
    expect(text).toMatch(/Three-blade, 200 mm/);
    expect(text).toMatch(/Wide sand stake/);
    expect(text).toMatch(/\b12\b/);
  });

  it("is made for a practice field too, and changes with what is known", async () => {
    const { ctx } = cast.participant;
    const input = { ground: "firm-moist-loam" as const };
    const before = await readPdf((await makePracticeSheet({ ctx, input })).content);
    for (let i = 0; i < 6; i++) {
      await createPracticePullTest({ ctx, input: practicePullOf(newId(), { force: 330, forceUnit: "N" }) });
    }
    const after = await readPdf((await makePracticeSheet({ ctx, input })).content);
    expect(before.text).toMatch(/Practice field: firm moist loam/);
    expect(after.text).not.toBe(before.text);
  });

  it("is refused to who may not see the camp, and for numbers that are none", async () => {
    expect(await codeOf(makeCampSheet({ ctx: cast.participant.ctx, input: at }))).toBe("forbidden");
    expect(await codeOf(makeCampSheet({ ctx: cast.otherLeader.ctx, input: at }))).toBe("not-found");
    const { ctx } = cast.leader;
    for (const [over, field] of [
      [{ scale: "0" }, "scale"],
      [{ scale: "many" }, "scale"],
      [{ count: "3" }, "count"],
      [{ count: "1e9" }, "count"],
      [{ patch: "second" as const }, "reading.patch"],
    ] as const) {
      const refusal = await refusalOf(makeCampSheet({ ctx, input: { ...at, ...over } }));
      expect(Object.keys(refusal.fieldErrors), JSON.stringify(over)).toEqual([field]);
    }
    const rock = { ground: "rock-slab" as const };
    expect(await codeOf(makePracticeSheet({ ctx, input: rock }))).toBe("bad-input");
  });
});
