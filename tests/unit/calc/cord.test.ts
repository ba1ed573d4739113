import { describe, expect, it } from "vitest";
import { listCord, listShelterCord } from "@/lib/calc/cord";
import { buildShelter, defaultShelterSpec } from "@/lib/calc/shelter-kinds";

describe("cord", () => {
  const tarp = defaultShelterSpec("ridge-tarp");
  const ids = buildShelter(tarp).tieOuts.map((tieOut) => tieOut.id);
  const withLines = (lengthM: number) => ({
    ...tarp,
    lineLengthsM: Object.fromEntries(ids.map((id) => [id, lengthM])),
  });

  it("takes the longest line of each tie-out, adds its knots and cuts to half metres", () => {
    // 1.6 m and 0.4 m for the knots are 2.0 m; neither a shorter pitch nor one that can't be built matters.
    const cord = listShelterCord({ name: "Tarp", pitches: [withLines(1.3), withLines(1.6), withLines(99)] });
    expect(cord.lines).toEqual([{ lengthM: 2, count: ids.length, tieOuts: ids.map((_, at) => at + 1) }]);
    expect(cord.totalM).toBe(2 * ids.length);
    expect(cord.diameterMm).toBe(tarp.line.diameterMm);
  });

  it("adds a tenth, and leaves out what is pegged at the fabric or never pitched", () => {
    const need = listCord([
      { name: "Tarp", pitches: [withLines(1.6)] },
      { name: "Spare", pitches: [] },
    ]);
    expect(need.lineCount).toBe(ids.length);
    expect(need.totalM).toBe(16);
    expect(need.spareM).toBe(2);
    const tent = buildShelter(defaultShelterSpec("pyramid")).tieOuts.filter((one) => one.lineLengthM < 0.15).length;
    const own = listCord([{ name: "Pyramid", pitches: [defaultShelterSpec("pyramid")] }]);
    expect(own.lineCount).toBe(buildShelter(defaultShelterSpec("pyramid")).tieOuts.length - tent);
    expect(listCord([])).toEqual({ shelters: [], lineCount: 0, totalM: 0, spareM: 0 });
  });
});
