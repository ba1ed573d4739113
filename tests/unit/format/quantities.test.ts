import { describe, expect, it } from "vitest";
import { formatAnchorSpec } from "@/lib/format/anchors";
import { formatAngle, formatCompass, formatLean, formatWindRange } from "@/lib/format/angles";
import { formatForce, formatForceNumber } from "@/lib/format/forces";
import { formatAltitude, formatLength } from "@/lib/format/lengths";
import { formatMass } from "@/lib/format/masses";
import { floorSignificant, formatChance, formatFixed, formatMargin, formatSignificant } from "@/lib/format/numbers";
import { formatPosition } from "@/lib/format/positions";
import { beaufortOf, formatHoldsTo, formatSpeed, formatSpeedWithBeaufort } from "@/lib/format/speeds";
import { joinWords, numberWord, plural } from "@/lib/format/words";

const thin = "\u2009";

describe("significant figures", () => {
  it.each([
    [0.648, "0.65"],
    [1, "1.0"],
    [9.96, "10"],
    [238, "240"],
    [1249, "1200"],
    [-238, "−240"],
    [Number.NaN, "–"],
    [Number.POSITIVE_INFINITY, "–"],
  ])("%d is shown as %s", (value, text) => expect(formatSignificant(value)).toBe(text));

  it.each([
    [0.996, "0.99"],
    [0.65, "0.65"],
    [1, "1.0"],
    [1.29, "1.2"],
    [0, "0.0"],
    [12.9, "12"],
  ])("a margin of %d is cut to %s, never rounded up", (value, text) => expect(formatMargin(value)).toBe(text));

  it("cuts towards zero on both sides", () => {
    expect(floorSignificant(-0.996)).toBeCloseTo(-0.99, 9);
    expect(formatFixed(-0.2)).toBe("0");
  });

  it("keeps a chance off certainty", () => {
    expect(formatChance(0.997)).toBe(`> 99${thin}%`);
    expect(formatChance(0.004)).toBe(`< 1${thin}%`);
    expect(formatChance(0.5)).toBe(`50${thin}%`);
  });
});

describe("speeds", () => {
  // 75 km/h = 20.8333… m/s by definition; 20 m/s = 38.877 knots, 44.739 mph.
  it("shows the unit behind one thin space", () => expect(formatSpeed(75 / 3.6)).toBe(`75${thin}km/h`));
  it("converts by the exact factors", () => {
    expect(formatSpeed(20, "knots")).toBe(`39${thin}knots`);
    expect(formatSpeed(20, "mph")).toBe(`45${thin}mph`);
    expect(formatSpeed(20, "m/s")).toBe(`20${thin}m/s`);
  });
  it("cuts what a plan holds to", () => {
    expect(formatHoldsTo(74.99 / 3.6)).toBe(`74${thin}km/h`);
    expect(formatHoldsTo(75 / 3.6)).toBe(`75${thin}km/h`);
  });
  // Limits of WMO code table 1100: Beaufort 9 begins at 20.8 m/s, 8 at 17.2, 12 at 32.7.
  it.each([
    [0.2, 0],
    [0.3, 1],
    [17.1, 7],
    [17.2, 8],
    [20.8, 9],
    [32.7, 12],
    [90, 12],
  ])("%d m/s is Beaufort %d", (speed, number) => expect(beaufortOf(speed)).toBe(number));
  it("sets Beaufort beside the speed", () => {
    expect(formatSpeedWithBeaufort(75 / 3.6)).toBe(`75${thin}km/h, Beaufort 9`);
    expect(formatSpeed(75 / 3.6, "Beaufort")).toBe(`Beaufort 9, 75${thin}km/h`);
  });
});

describe("forces, lengths, masses", () => {
  it("gives forces with two figures in each unit", () => {
    expect(formatForce(238)).toBe(`240${thin}N`);
    // 238 N / 9.80665 = 24.27 kgf; / 4.44822 = 53.5 lbf.
    expect(formatForce(238, "kgf")).toBe(`24${thin}kgf`);
    expect(formatForce(238, "lbf")).toBe(`54${thin}lbf`);
    expect(formatForceNumber(1234)).toBe("1200");
  });
  it("gives lengths and altitudes", () => {
    expect(formatLength(1.6)).toBe(`1.6${thin}m`);
    expect(formatLength(0.25)).toBe(`0.25${thin}m`);
    expect(formatLength(1.6, "ft")).toBe(`5.2${thin}ft`);
    expect(formatAltitude(742, "ft")).toBe(`2434${thin}ft`);
  });
  it("changes from grams to kilograms at a kilogram", () => {
    expect(formatMass(0.412)).toBe(`412${thin}g`);
    expect(formatMass(0.9996)).toBe(`1.0${thin}kg`);
    expect(formatMass(1.94)).toBe(`1.9${thin}kg`);
  });
});

describe("angles and places", () => {
  it.each([
    [0, "N"],
    [359, "N"],
    [250, "WSW"],
    [-90, "W"],
    [348.8, "N"],
  ])("%d° is %s", (bearing, point) => expect(formatCompass(bearing)).toBe(point));
  it("names ranges and leans", () => {
    expect(formatWindRange(270, 315)).toBe("W to NW");
    expect(formatWindRange(null, null)).toBe("any direction");
    expect(formatWindRange(0, 360)).toBe("any direction");
    expect(formatLean(10)).toBe("10° back");
    expect(formatLean(-5)).toBe("5° forward");
    expect(formatLean(0.2)).toBe("upright");
    expect(formatAngle(28.6)).toBe("29°");
  });
  it("names positions by hemisphere", () => {
    expect(formatPosition(57.2134, -9.2011)).toBe("57.21340° N, 9.20110° W");
  });
});

describe("words", () => {
  it("counts and joins", () => {
    expect(numberWord(3)).toBe("three");
    expect(numberWord(14)).toBe("14");
    expect(plural(1, "night")).toBe("1 night");
    expect(plural(2, "person", "people")).toBe("2 people");
    expect(joinWords(["A"])).toBe("A");
    expect(joinWords(["A", "B", "C"])).toBe("A, B and C");
  });
  it("describes an anchor in one line", () => {
    expect(
      formatAnchorSpec({
        class: "stake",
        section: { shape: "three-blade", bladeM: 0.01, thicknessM: 0.002 },
        lengthM: 0.2,
        material: "aluminium-7075",
        headRatingN: null,
      }),
    ).toBe(`three-blade, 200${thin}mm, aluminium 7075`);
  });
});
