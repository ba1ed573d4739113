import { describe, expect, test } from "vitest";
import { changeBetween } from "@/components/board/plan-change";
import { BEYOND_GUST_MS, verdictHeadline } from "@/components/results/verdict-words";
import { forceScale } from "@/components/results/force-bars";
import { LARGEST_GUST_MS } from "@/lib/calc/camp";
import type { Placement } from "@/lib/calc/types";
import { formatWorkingValue } from "@/components/results/working-table";

const at = (tieOutId: string, anchorId = "hook"): Placement => ({
  pitchId: "pitch",
  tieOutId,
  anchorId,
  leanDeg: 0,
  depthOutM: 0,
  tandem: null,
  rockKg: 0,
  shockCord: false,
  knot: "bowline",
  pinned: false,
});

describe("the smallest change between two plans", () => {
  test("one tie-out more is a placing, one less a lifting, several a whole plan", () => {
    expect(changeBetween([at("a")], [at("a"), at("b")])).toEqual({ type: "place", placement: at("b") });
    expect(changeBetween([at("a"), at("b")], [at("a")])).toEqual({ type: "lift", pitchId: "pitch", tieOutId: "b" });
    expect(changeBetween([at("a")], [at("b")])).toEqual({ type: "replace", placements: [at("b")] });
    expect(changeBetween([at("a"), at("b")], [at("b"), at("a")])).toBeNull();
  });
});

describe("words and scales", () => {
  const base = { gaps: [], standing: true, tieOuts: [] };
  test.each([
    ["gives-way", 62 / 3.6, "gives way at 62\u2009km/h"],
    ["thin", 71 / 3.6, "thin: holds to 71\u2009km/h"],
    ["holds", 96 / 3.6, "holds to 96\u2009km/h"],
    ["holds", LARGEST_GUST_MS, "holds to more than 432\u2009km/h"],
  ] as const)("%s at %f m/s", (verdict, holdsToGustMs, words) => {
    expect(verdictHeadline({ ...base, verdict, holdsToGustMs }, "km/h")).toBe(words);
  });

  test("the limit that is said is the limit of the calculation", () => {
    expect(BEYOND_GUST_MS).toBe(LARGEST_GUST_MS);
  });

  test("a gap is named in the headline", () => {
    const gaps = [{ field: "camp.ground", message: "Choose the ground of the camp." }];
    expect(verdictHeadline({ ...base, gaps, verdict: "unknown", holdsToGustMs: null }, "km/h")).toBe("No ground yet");
  });

  test("the newton scale holds the largest pull and ends on a tick", () => {
    const { scaleN, tickN } = forceScale([412, 180, null]);
    expect(scaleN).toBeGreaterThan(412);
    expect(scaleN % tickN).toBe(0);
  });

  test("workings show three figures and keep whole numbers", () => {
    expect(formatWorkingValue({ value: 1.2345, unit: "kg/m³" })).toBe("1.23\u2009kg/m³");
    expect(formatWorkingValue({ value: 30, unit: "°" })).toBe("30°");
    expect(formatWorkingValue({ value: "judged", unit: "" })).toBe("judged");
  });
});
