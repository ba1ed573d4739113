import { describe, expect, it } from "vitest";
import { evaluateCamp } from "@/lib/calc/camp";
import type { CampInput } from "@/lib/calc/types";
import { explainTieOut, KNOWN_WEAK_SPOTS } from "@/lib/calc/workings";
import { BLADE, campOf, pitchOf, placementOf, ringOf, tieOutIds, trayOf, WIND } from "./camp-fixtures";

const IDS = tieOutIds("pyramid");
const FIRST = IDS[0] ?? "";
const camp = campOf({
  shelters: [pitchOf("a", "pyramid", [80])],
  strongWindHours: 5,
  tray: [trayOf("blade", BLADE, 30)],
  placements: IDS.map((id) => placementOf("a", id, "blade")),
});

const sectionOf = (of: CampInput, heading: string) =>
  explainTieOut(of, "a", FIRST).sections.find((section) => section.heading === heading)?.workings ?? [];

describe("how a margin comes about", () => {
  it("goes from the forecast to the verdict, each step with a meaning and a source", () => {
    const { title, sections, weakSpots } = explainTieOut(camp, "a", FIRST);
    expect(title).toMatch(/^Tie-out \d+ of Shelter a: /);
    expect(sections.map((section) => section.heading)).toEqual([
      "Wind at the shelter",
      "Pull in the line",
      "What its loss costs",
      "What the anchor holds",
      "After the windy night",
      "Margin",
    ]);
    for (const working of sections.flatMap((section) => section.workings)) {
      expect(working.meaning).not.toBe("");
      expect(working.source).not.toBe("");
      if (typeof working.value === "number") expect(Number.isFinite(working.value)).toBe(true);
    }
    expect(weakSpots).toBe(KNOWN_WEAK_SPOTS);
    expect(weakSpots.length).toBeGreaterThan(5);
  });

  it("shows the numbers that the camp shows", () => {
    const result = evaluateCamp(camp).shelters[0]?.tieOuts.find((one) => one.tieOutId === FIRST);
    const value = (heading: string, symbol: string) =>
      sectionOf(camp, heading).find((working) => working.symbol === symbol)?.value;
    expect(value("Margin", "m")).toBe(result?.margin);
    expect(value("Margin", "T")).toBe(result?.demandN);
    expect(value("Margin", "V")).toBe(result?.holdsToGustMs);
    expect(value("Margin", "p")).toBe(result?.chanceHolds);
    expect(value("After the windy night", "m_m")).toBe(result?.morningMargin);
    expect(value("Pull in the line", "θ")).toBe(result?.lineAngleDeg);
    expect(value("What its loss costs", "P")).toBe(result?.priority);
  });

  it("puts what is missing in its place", () => {
    const noGust = { ...camp, wind: { ...WIND, strength: null } };
    expect(sectionOf(noGust, "Wind at the shelter")[0]?.meaning).toMatch(/Enter a gust/);
    expect(sectionOf({ ...camp, ground: null }, "What the anchor holds")[0]?.meaning).toMatch(/Choose the ground/);
    expect(sectionOf({ ...camp, strongWindHours: null }, "After the windy night")[0]?.meaning).toMatch(
      /hours of strong wind/,
    );
    expect(sectionOf({ ...camp, placements: [] }, "What the anchor holds")[0]?.meaning).toMatch(/has no anchor/);
    const unrated = { ...camp, tray: [trayOf("blade", { class: "fixed", ratingN: null }, 30)] };
    expect(sectionOf(unrated, "What the anchor holds").at(-1)?.value).toBe("not known");
    const notAnalysed = { ...camp, shelters: [{ ...pitchOf("a", "pyramid", [80]), analysis: null }] };
    expect(sectionOf(notAnalysed, "Pull in the line")[0]?.meaning).toMatch(/not worked out yet/);
  });

  it("says why an anchor can't be used and what can, names a second in line, and reads 120 m/s as or more", () => {
    const rock = { ...camp, ground: { ...(camp.ground ?? never()), kind: "rock-slab" as const } };
    expect(sectionOf(rock, "What the anchor holds").at(-1)?.value).toBe("can't be used");
    const pair = {
      ...camp,
      placements: [placementOf("a", FIRST, "blade", { tandem: { anchorId: "blade", spacingM: 0.15 } })],
    };
    expect(sectionOf(pair, "What the anchor holds")[1]?.meaning).toMatch(/^Second in line/);
    const calm = { ...camp, shelters: [pitchOf("a", "pyramid", [0.5])], tray: [trayOf("blade", ringOf(300), 30)] };
    expect(sectionOf(calm, "Margin").find((working) => working.symbol === "V")?.meaning).toMatch(/or more$/);
  });

  it("refuses a tie-out that is not there", () => {
    expect(() => explainTieOut(camp, "a", "none")).toThrow(RangeError);
    expect(() => explainTieOut(camp, "none", FIRST)).toThrow(RangeError);
  });
});

function never(): never {
  throw new Error("the fixture has a ground");
}
