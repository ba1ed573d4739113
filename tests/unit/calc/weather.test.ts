import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { joinArcs, smallestArc, widenArc, windChillC } from "@/lib/calc/weather";
import chart from "../../fixtures/wind-chill-chart.json";
import { chillF, PUBLISHED_WEATHER_CASES } from "../../fixtures/published-cases-weather";

describe("wind chill", () => {
  it(`is every cell of the chart (${chart.source})`, () => {
    let cells = 0;
    for (const [temperatureF = NaN, ...published] of chart.rows) {
      published.forEach((value, index) => {
        const windMph = chart.windMph[index] ?? NaN;
        expect(Math.abs(chillF(temperatureF, windMph) - value), `${temperatureF} °F, ${windMph} mph`).toBeLessThan(0.7);
        cells += 1;
      });
    }
    expect(cells).toBe(192);
  });

  it.each(PUBLISHED_WEATHER_CASES)("$what is $published $unit", (row) => {
    expect(Math.abs(row.ours() - row.published)).toBeLessThanOrEqual(row.tolerance);
  });

  // Arithmetic of the metric formula, by hand with V^0.16 of a pocket calculator: 20^0.16 = 1.61498, 30^0.16 = 1.72322.
  it.each([
    [-10, 20, 13.12 - 6.215 - 11.37 * 1.61498 - 3.965 * 1.61498],
    [-10, 30, 13.12 - 6.215 - 11.37 * 1.72322 - 3.965 * 1.72322],
    [0, 20, 13.12 - 11.37 * 1.61498],
  ])("at %f °C and %f km/h is %f °C", (temperatureC, windKmh, expected) => {
    expect(windChillC(temperatureC, windKmh / 3.6)).toBeCloseTo(expected, 2);
  });

  it("is unknown outside the formula's range, not clamped", () => {
    expect(windChillC(10.1, 10)).toBeNull();
    expect(windChillC(0, 4.9 / 3.6)).toBeNull();
    expect(windChillC(NaN, 10)).toBeNull();
    expect(windChillC(0, Infinity)).toBeNull();
    expect(windChillC(10, 5 / 3.6)).not.toBeNull();
  });

  it("falls with more wind and with colder air", () => {
    const temperature = fc.double({ min: -50, max: 9, noNaN: true });
    const wind = fc.double({ min: 1.5, max: 40, noNaN: true });
    fc.assert(
      fc.property(temperature, wind, (temperatureC, meanMs) => {
        const here = windChillC(temperatureC, meanMs) ?? NaN;
        expect(windChillC(temperatureC, meanMs + 1) ?? NaN).toBeLessThan(here);
        expect(windChillC(temperatureC - 1, meanMs) ?? NaN).toBeLessThan(here);
      }),
    );
  });
});

const isIn = (arc: { fromDeg: number; spanDeg: number }, degrees: number) =>
  (((degrees - arc.fromDeg) % 360) + 720) % 360 <= arc.spanDeg + 1e-6 ||
  (((degrees - arc.fromDeg) % 360) + 720) % 360 >= 360 - 1e-6;

describe("the smallest arc", () => {
  it.each([
    [[270], { fromDeg: 270, toDeg: 270, spanDeg: 0 }],
    [[270, 315], { fromDeg: 270, toDeg: 315, spanDeg: 45 }],
    [[350, 10, 0], { fromDeg: 350, toDeg: 10, spanDeg: 20 }],
    [[0, 120, 240], { spanDeg: 240 }],
    [[-10, 370], { fromDeg: 350, toDeg: 10, spanDeg: 20 }],
  ])("of %j is %j", (directions, arc) => {
    expect(smallestArc(directions)).toMatchObject(arc);
  });

  it("of nothing, or of something that is no number, is unknown", () => {
    expect(smallestArc([])).toBeNull();
    expect(smallestArc([10, NaN])).toBeNull();
  });

  it("holds every direction, whatever way round they come", () => {
    const directions = fc.array(fc.double({ min: -720, max: 720, noNaN: true }), { minLength: 1, maxLength: 20 });
    fc.assert(
      fc.property(directions, (degrees) => {
        const arc = smallestArc(degrees);
        if (!arc) throw new Error("no arc");
        expect(degrees.every((one) => isIn(arc, one))).toBe(true);
        expect(arc.spanDeg).toBeLessThanOrEqual(360);
      }),
    );
  });

  it("joins arcs and widens them; all round is null", () => {
    expect(
      joinArcs([
        { fromDeg: 340, toDeg: 10 },
        { fromDeg: 0, toDeg: 30 },
      ]),
    ).toMatchObject({ fromDeg: 340, toDeg: 30 });
    expect(joinArcs([])).toBeNull();
    const arc = { fromDeg: 340, toDeg: 30, spanDeg: 50 };
    expect(widenArc(arc, 30)).toEqual({ fromDeg: 310, toDeg: 60, spanDeg: 110 });
    expect(widenArc(arc, 155)).toBeNull();
  });
});
