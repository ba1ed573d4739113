import { Body, Observer, SearchAltitude, SearchRiseSet, Illumination } from "astronomy-engine";
import fc from "fast-check";
import { forward, inverse } from "mgrs";
import proj4 from "proj4";
import { describe, expect, it } from "vitest";
import { parseMgrs, toMgrs } from "@/lib/calc/places/mgrs";
import { parsePosition } from "@/lib/calc/places/parse-position";
import { fromUtm, normaliseLongitude, toUtm, zoneOf } from "@/lib/calc/places/utm";
import { declinationDeg } from "@/lib/places/declination";
import { distanceM, placeBetween } from "@/lib/places/geodesic";
import { moonOn, sunOn } from "@/lib/places/sun-moon";

const latitudes = fc.double({ min: -79.9, max: 83.9, noNaN: true });
const longitudes = fc.double({ min: -180, max: 179.999999, noNaN: true });
const places = fc.record({ latitude: latitudes, longitude: longitudes });

describe("UTM", () => {
  it("agrees with an independent library everywhere in its reach, to a centimetre", () => {
    fc.assert(
      fc.property(places, (place) => {
        const utm = toUtm(place);
        if (!utm) throw new Error("UTM reaches here.");
        const south = utm.isNorth ? "" : " +south";
        const target = `+proj=utm +zone=${utm.zone}${south} +datum=WGS84 +units=m`;
        const [east = 0, north = 0] = proj4("WGS84", target, [place.longitude, place.latitude]);
        expect(Math.abs(utm.eastingM - east)).toBeLessThan(0.01);
        expect(Math.abs(utm.northingM - north)).toBeLessThan(0.01);
      }),
      { numRuns: 300 },
    );
  });

  it("comes back to where it was", () => {
    fc.assert(
      fc.property(places, (place) => {
        const utm = toUtm(place);
        if (!utm) throw new Error("UTM reaches here.");
        expect(distanceM(fromUtm(utm), place)).toBeLessThan(1e-5);
      }),
    );
  });

  it("has Norway's and Svalbard's own zones", () => {
    expect(zoneOf(60.39, 5.32)).toBe(32);
    expect(zoneOf(55, 5.32)).toBe(31);
    expect(zoneOf(78.22, 15.65)).toBe(33);
    expect(zoneOf(78, 8)).toBe(31);
    expect(zoneOf(78, 21)).toBe(35);
    expect(zoneOf(78, 34)).toBe(37);
  });

  it("does not reach the poles, and says so", () => {
    expect(toUtm({ latitude: 84.1, longitude: 0 })).toBeNull();
    expect(toUtm({ latitude: -80.1, longitude: 0 })).toBeNull();
    expect(toMgrs({ latitude: 90, longitude: 0 })).toBeNull();
    expect(() => toUtm({ latitude: 91, longitude: 0 })).toThrow(RangeError);
  });

  it("takes 180° east and west for the same", () => {
    expect(toUtm({ latitude: 10, longitude: 180 })).toEqual(toUtm({ latitude: 10, longitude: -180 }));
    expect(normaliseLongitude(180)).toBe(-180);
    expect(normaliseLongitude(539)).toBe(179);
  });
});

describe("grid references", () => {
  it.each([
    [-33.9249, 18.4241, "34H BH 61881 43182"],
    [45.8326, 6.8652, "32T LR 34200 77664"],
    [33.3, 44.4, "38S MB 44140 84706"],
  ])("of %f %f is %s (published)", (latitude, longitude, expected) => {
    expect(toMgrs({ latitude, longitude })).toBe(expected);
  });

  it("the middle of 38SMB4488 is 33.33424 44.40363 (published)", () => {
    const found = parseMgrs("38SMB4488");
    if (typeof found === "string") throw new Error(found);
    expect(found.place.latitude).toBeCloseTo(33.33424, 5);
    expect(found.place.longitude).toBeCloseTo(44.40363, 5);
    expect(found.sideM).toBe(1000);
  });

  it("has the letters of an independent library, which is good to a metre", () => {
    fc.assert(
      fc.property(places, (place) => {
        const ours = parseMgrs(toMgrs(place) ?? "");
        if (typeof ours === "string") throw new Error(ours);
        const [west, south] = inverse(forward([place.longitude, place.latitude], 5));
        expect(distanceM(ours.place, { latitude: south, longitude: west })).toBeLessThan(6);
      }),
      { numRuns: 300 },
    );
  });

  it("never lies more than its square away from the place", () => {
    fc.assert(
      fc.property(places, fc.integer({ min: 1, max: 5 }), (place, digits) => {
        const found = parseMgrs(toMgrs(place, digits) ?? "");
        if (typeof found === "string") throw new Error(found);
        expect(distanceM(found.place, place)).toBeLessThanOrEqual(found.sideM * 1.5);
      }),
    );
  });
});

describe("positions as people write them", () => {
  it.each([
    ["61.93, 8.72", 61.93, 8.72],
    ["61,93 8,72", 61.93, 8.72],
    ["61.93; 8.72", 61.93, 8.72],
    ["61.93N 8.72E", 61.93, 8.72],
    ["N 61.93 W 8.72", 61.93, -8.72],
    ["-33.9249 18.4241", -33.9249, 18.4241],
    ["\u221233.9249, 18.4241", -33.9249, 18.4241],
    ["33.9249 S, 18.4241 E", -33.9249, 18.4241],
    ["61° 55' 48\" N, 8° 43' 12\" E", 61.93, 8.72],
    ["61°55.8'N 8°43.2'E", 61.93, 8.72],
    ["8.72 E, 61.93 N", 61.93, 8.72],
    ["43S 476778.63 3706747.18", 33.5, 74.75],
    ["43s 476778.63E 3706747.18N", 33.5, 74.75],
    ["32TLR3420077664", 45.8326, 6.8652],
    ["32t lr 34200 77664", 45.8326, 6.8652],
    ["0, 180", 0, -180],
  ])("%s", (text, latitude, longitude) => {
    const parsed = parsePosition(text);
    if ("problem" in parsed) throw new Error(parsed.problem);
    expect(distanceM(parsed.place, { latitude, longitude })).toBeLessThan(1.5);
  });

  it.each([
    "",
    "here",
    "91, 0",
    "0, 181",
    "61.93",
    "61 75 0, 8",
    "61.93N 8.72N",
    "-61.93S 8.72E",
    "61N 500000 5000000",
    "33S 500000 6250000",
    "33O 500000 6250000",
    "33V 5 6250000",
    "32T II 12345 12345",
    "32T LR 123 1234",
    "32V AA 12345 12345",
    "1e3, 5",
    "0x1F, 5",
    "9".repeat(200),
  ])("refuses %s with a sentence", (text) => {
    const parsed = parsePosition(text);
    expect("problem" in parsed && parsed.problem).toMatch(/\.$/);
  });

  it("never throws, whatever is typed", () => {
    fc.assert(
      fc.property(fc.oneof(fc.string(), fc.stringMatching(/^[0-9NSEWA-Z .,°'"-]{0,40}$/)), (text) => {
        const parsed = parsePosition(text);
        if (!("problem" in parsed)) expect(Math.abs(parsed.place.latitude)).toBeLessThanOrEqual(90.1);
      }),
      { numRuns: 500 },
    );
  });
});

describe("distances", () => {
  it("across the antimeridian take the short way", () => {
    const metres = distanceM({ latitude: 0, longitude: 179.9 }, { latitude: 0, longitude: -179.9 });
    // 0.2° of the equator of 6378137 m.
    expect(metres).toBeCloseTo((0.2 * Math.PI * 6378137) / 180, 3);
  });

  it("over the pole go over the pole", () => {
    const metres = distanceM({ latitude: 89.9, longitude: 0 }, { latitude: 89.9, longitude: 180 });
    expect(metres).toBeGreaterThan(22_300);
    expect(metres).toBeLessThan(22_400);
  });

  it("a place between lies between", () => {
    const from = { latitude: 60, longitude: 179.9 };
    const to = { latitude: 60.1, longitude: -179.9 };
    const middle = placeBetween(from, to, 0.25);
    expect(distanceM(from, middle)).toBeCloseTo(distanceM(from, to) * 0.25, 4);
    expect(middle.longitude).toBeGreaterThanOrEqual(-180);
    expect(middle.longitude).toBeLessThan(180);
  });
});

describe("declination", () => {
  it("is not said for days that the model does not cover", () => {
    const place = { latitude: 60, longitude: 8 };
    expect(declinationDeg(place, 0, "2024-12-31")).toBeNull();
    expect(declinationDeg(place, 0, "2029-11-12")).not.toBeNull();
    expect(declinationDeg(place, 0, "2029-11-13")).toBeNull();
    expect(declinationDeg(place, 0, "2199-12-31")).toBeNull();
  });
});

describe("sun and moon", () => {
  const days = fc
    .integer({ min: 0, max: 364 })
    .map((day) => new Date(Date.UTC(2027, 0, 1 + day)).toISOString().slice(0, 10));
  const mild = fc.record({
    latitude: fc.double({ min: -58, max: 58, noNaN: true }),
    longitude: fc.double({ min: -180, max: 179, noNaN: true }),
  });

  it("sets and gets dark when an independent library says so, to a minute and a half", () => {
    fc.assert(
      fc.property(mild, days, (place, day) => {
        const { sunset, dusk, light } = sunOn(place, day, "UTC");
        expect(light).toBe("usual");
        const observer = new Observer(place.latitude, place.longitude, 0);
        const from = new Date(Date.parse(sunset ?? "") - 6 * 3_600_000);
        const set = SearchRiseSet(Body.Sun, observer, -1, from, 1);
        const dark = SearchAltitude(Body.Sun, observer, -1, from, 1, -6);
        expect(Math.abs(Date.parse(sunset ?? "") - (set?.date.getTime() ?? 0))).toBeLessThan(90_000);
        expect(Math.abs(Date.parse(dusk ?? "") - (dark?.date.getTime() ?? 0))).toBeLessThan(90_000);
      }),
      { numRuns: 60 },
    );
  });

  it("the sunset of a local day is in its evening, not in that of the day before (a well-known slip)", () => {
    const { sunset } = sunOn({ latitude: 39.742476, longitude: -105.1786 }, "2003-10-17", "America/Denver");
    expect(sunset?.startsWith("2003-10-18T00:18")).toBe(true);
  });

  it.each([
    [69.6492, 18.9553, "2026-06-21", "Europe/Oslo", "sun-all-day"],
    [69.6492, 18.9553, "2026-12-21", "Europe/Oslo", "no-sun"],
    [61.9, 8.7, "2026-06-21", "Europe/Oslo", "light-all-night"],
    [89.9, 0, "2026-12-21", "UTC", "dark-all-day"],
    [90, 0, "2026-06-21", "UTC", "sun-all-day"],
    [-90, 0, "2026-06-21", "UTC", "dark-all-day"],
    [46, 7.7, "2026-06-21", "Europe/Zurich", "usual"],
  ] as const)("at %f %f on %s in %s: %s", (latitude, longitude, day, zone, light) => {
    expect(sunOn({ latitude, longitude }, day, zone).light).toBe(light);
  });

  it("the moon is lit and rises as an independent library says", () => {
    fc.assert(
      fc.property(mild, days, (place, day) => {
        const moon = moonOn(place, day, "UTC");
        const midnight = new Date(Date.parse(`${day}T00:00:00Z`) + 86_400_000);
        expect(moon.lit).toBeCloseTo(Illumination(Body.Moon, midnight).phase_fraction, 1);
        if (!moon.rise) return;
        const observer = new Observer(place.latitude, place.longitude, 0);
        const rise = SearchRiseSet(Body.Moon, observer, 1, new Date(Date.parse(moon.rise) - 3_600_000 * 3), 1);
        expect(Math.abs(Date.parse(moon.rise) - (rise?.date.getTime() ?? 0))).toBeLessThan(5 * 60_000);
      }),
      { numRuns: 40 },
    );
  });

  it("first quarter, full, last quarter and new moon of June 2025 (computed by another library)", () => {
    const lit = (day: string) => moonOn({ latitude: 50, longitude: 0 }, day, "UTC").lit;
    expect(lit("2025-06-02")).toBeCloseTo(0.5, 1);
    expect(lit("2025-06-10")).toBeGreaterThan(0.98);
    expect(lit("2025-06-18")).toBeCloseTo(0.5, 1);
    expect(lit("2025-06-24")).toBeLessThan(0.02);
  });
});
