import { describe, expect, it } from "vitest";
import { predictPull, readPull, type PulledAnchor } from "@/lib/calc/pull-reading";
import { builtInAnchor } from "@/lib/calc/tables/anchors";

const blade: PulledAnchor = {
  anchor: builtInAnchor("three-blade-150").spec,
  ground: { kind: "firm-moist-loam", wetness: "usual", looseTopM: null, stoneDepthM: null, slopeDeg: 0 },
  leanDeg: 0,
  lineAngleDeg: 30,
  depthOutM: 0,
};

describe("what a pull says", () => {
  const median = predictPull(blade)?.groundMedianN ?? Number.NaN;

  it("gave way at the model's median: an exact reading of ln 1 = 0", () => {
    expect(readPull(blade, median, "came-out")).toMatchObject({
      status: "counts",
      reading: { logRatio: 0, kind: "exact" },
    });
  });

  it.each(["bent", "line-failed", "still-holding"] as const)(
    "%s at half of it: the ground held at least ln ½",
    (end) => {
      const read = readPull(blade, median / 2, end);
      if (read.status !== "counts") throw new Error(read.status);
      expect(read.reading.kind).toBe("at-least");
      expect(read.reading.logRatio).toBeCloseTo(Math.log(0.5), 12);
    },
  );

  it("more than twenty times off is held back; a light pull that held is not", () => {
    expect(readPull(blade, median * 21, "still-holding").status).toBe("implausible");
    expect(readPull(blade, median / 21, "came-out").status).toBe("implausible");
    expect(readPull(blade, median / 21, "still-holding").status).toBe("counts");
    // e^−9 = 0.00012: nothing is learned below it.
    expect(readPull(blade, median * 1e-6, "still-holding")).toMatchObject({ reading: { logRatio: -9 } });
  });

  it("says nothing of the ground where no ground is at work", () => {
    const rock = { ...blade, anchor: builtInAnchor("rock-40").spec };
    const tree = { ...blade, anchor: builtInAnchor("tree").spec };
    expect(readPull(tree, 300, "still-holding").status).toBe("says-nothing");
    expect(readPull(rock, 300, "came-out").status).toBe("says-nothing");
    expect(() => readPull(blade, 0, "came-out")).toThrow(RangeError);
  });
});
