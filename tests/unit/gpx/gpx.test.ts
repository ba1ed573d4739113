import { gpxOf, READABLE, REFUSED } from "../../fixtures/gpx-oddities";
import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { itemAt } from "@/lib/calc/indexed";
import { normaliseLongitude } from "@/lib/calc/places/utm";
import { nearestOnLine, placeOnLine } from "@/lib/gpx/line-places";
import { measureFile, MAX_SIMPLIFIED, measureSegments } from "@/lib/gpx/measure-line";
import { readGpx } from "@/lib/gpx/read-gpx";
import { GpxFault } from "@/lib/gpx/types";
import { writeGpx } from "@/lib/gpx/write-gpx";
import { measureGpx } from "@/lib/workers/gpx-task";
import { distanceM } from "@/lib/places/geodesic";

const bytesOf = (text: string) => new TextEncoder().encode(text);

describe("GPX files as they come", () => {
  it("are at least thirty oddities", () => {
    expect(READABLE.length + REFUSED.length).toBeGreaterThanOrEqual(30);
  });

  it.each(READABLE)("are read: $what", (file) => {
    const answer = measureGpx(file.bytes);
    if (answer.refused !== null) throw new Error(answer.refused);
    const { route } = answer;
    expect(Math.abs(route.lengthM - file.lengthM)).toBeLessThan(0.5);
    if (file.name !== undefined) expect(answer.name).toBe(file.name);
    if (file.breaks !== undefined) expect(route.breaks).toHaveLength(file.breaks);
    if (file.points !== undefined) expect(route.line.atM).toHaveLength(file.points);
    if (file.places) expect(answer.waypoints.map((place) => place.name)).toEqual(file.places);
    if (file.remark) expect(answer.remarks.join(" ")).toMatch(file.remark);
    else expect(answer.remarks).toEqual([]);
    if (file.hasHeights !== undefined) {
      expect(route.profile.heightsM.some((height) => height !== null)).toBe(file.hasHeights);
    }
    expect(JSON.stringify([route.profile, route.simplified, route.breaks])).not.toMatch(/NaN|Infinity/);
  });

  it.each(REFUSED)("are refused: $what", ({ bytes, reason }) => {
    const before = performance.now();
    const answer = measureGpx(bytes);
    expect(answer.refused).toMatch(reason);
    expect(answer.refused?.length).toBeLessThan(250);
    expect(answer.refused).not.toMatch(/root:/);
    // Generous: it is against hours, not milliseconds.
    expect(performance.now() - before).toBeLessThan(10_000);
  });

  it("never end in another way, however a good file is cut or spoilt", () => {
    const whole = bytesOf(
      gpxOf(
        '<wpt lat="1" lon="1"/><trk><trkseg><trkpt lat="60" lon="8"><ele>1</ele></trkpt><trkpt lat="61" lon="8"/></trkseg></trk>',
      ),
    );
    fc.assert(
      fc.property(fc.nat(whole.length - 1), fc.nat(255), fc.nat(whole.length), (at, byte, end) => {
        const spoilt = whole.slice(0, Math.max(end, at + 1));
        spoilt[at] = byte;
        const answer = measureGpx(spoilt);
        if (answer.refused === null) expect(Number.isFinite(answer.route.lengthM)).toBe(true);
      }),
      { numRuns: 500 },
    );
  });

  it("throws a fault of its own kind, which is all that the worker answers with", () => {
    expect(() => readGpx(bytesOf("<x/>"))).toThrow(GpxFault);
  });
});

/** A way of up to sixty points, a few hundred metres each, anywhere but at the very poles, in up to three pieces. */
const ways = fc
  .record({
    latitude: fc.double({ min: -84, max: 84, noNaN: true }),
    longitude: fc.double({ min: -180, max: 179.9999, noNaN: true }),
    steps: fc.array(
      fc.record({
        north: fc.double({ min: -0.005, max: 0.005, noNaN: true }),
        east: fc.double({ min: -0.005, max: 0.005, noNaN: true }),
        height: fc.option(fc.double({ min: -300, max: 5000, noNaN: true }), { nil: Number.NaN }),
      }),
      { minLength: 6, maxLength: 60 },
    ),
    cuts: fc.array(fc.double({ min: 0.1, max: 0.9, noNaN: true }), { maxLength: 2 }),
  })
  .map(({ latitude, longitude, steps, cuts }) => {
    let north = latitude;
    let east = longitude;
    const points = steps.map((step) => {
      north += step.north;
      east += step.east + 0.0001;
      return { latitude: north, longitude: normaliseLongitude(east), heightM: step.height };
    });
    const ends = [0, ...cuts.map((cut) => Math.round(cut * points.length)).sort((a, b) => a - b), points.length];
    return ends
      .slice(1)
      .map((end, index) => {
        const part = points.slice(ends[index], end);
        return {
          latitudes: part.map((point) => point.latitude),
          longitudes: part.map((point) => point.longitude),
          heightsM: part.map((point) => point.heightM),
        };
      })
      .filter((segment) => segment.latitudes.length > 1);
  })
  .filter((segments) => segments.length > 0);

const cutsOf = fc.array(fc.double({ min: 0, max: 1, noNaN: true }), { maxLength: 5 });

/** Days of a way, ended where the shares say. */
function daysOf(lengthM: number, shares: readonly number[]) {
  const ends = [...shares.map((share) => share * lengthM).sort((a, b) => a - b), lengthM];
  return ends
    .map((toM, index) => ({ name: `Day ${index + 1} <&"> \u00F8`, fromM: ends[index - 1] ?? 0, toM }))
    .filter((piece) => piece.toM > piece.fromM);
}

describe("what is written", () => {
  const waypoints = [
    {
      name: 'A & B <"x"> \u0142',
      note: "Night of Sun 14",
      latitude: 60.1234567,
      longitude: -0.0000001,
      heightM: 12.34,
    },
  ];

  it("comes back as it was: places, length, pieces and every point, wherever days are cut", () => {
    fc.assert(
      fc.property(ways, cutsOf, (segments, shares) => {
        const before = measureSegments(segments);
        const text = writeGpx({ name: "Way", waypoints, line: before.line, pieces: daysOf(before.lengthM, shares) });
        const file = readGpx(bytesOf(text));
        expect(file.waypoints.map((one) => one.name)).toEqual(waypoints.map((one) => one.name));
        expect(file.waypoints[0]?.latitude).toBeCloseTo(60.1234567, 7);
        const after = measureFile(file);
        // Seven decimals are a centimetre for each point.
        expect(Math.abs(after.lengthM - before.lengthM)).toBeLessThan(
          0.03 * before.line.atM.length + 0.03 * shares.length,
        );
        for (let index = 0; index < before.line.atM.length; index += 1) {
          const place = {
            latitude: itemAt(before.line.latitudes, index),
            longitude: itemAt(before.line.longitudes, index),
          };
          expect(nearestOnLine(after.line, place)?.offM ?? 99).toBeLessThan(0.03);
        }
      }),
      { numRuns: 40 },
    );
  });

  it("written, read and written again is the same to the last letter", () => {
    fc.assert(
      fc.property(ways, (segments) => {
        const write = (route: ReturnType<typeof measureSegments>) =>
          writeGpx({
            name: "Way",
            waypoints,
            line: route.line,
            pieces: [{ name: "All", fromM: 0, toM: route.lengthM }],
          });
        const once = write(measureSegments(segments));
        expect(write(measureFile(readGpx(bytesOf(once))))).toBe(once);
      }),
      { numRuns: 40 },
    );
  });

  it("keeps breaks as breaks and never joins across them", () => {
    const two = measureSegments([
      { latitudes: [60, 60.01], longitudes: [8, 8], heightsM: [1, 2] },
      { latitudes: [60.05, 60.06], longitudes: [8, 8], heightsM: [3, 4] },
    ]);
    const text = writeGpx({ name: "W", waypoints: [], line: two.line, pieces: daysOf(two.lengthM, [0.25, 0.75]) });
    const again = measureFile(readGpx(bytesOf(text)));
    expect(again.breaks).toHaveLength(1);
    expect(again.lengthM).toBeCloseTo(two.lengthM, 1);
  });

  it("has no characters that XML forbids, whatever a camp is called", () => {
    fc.assert(
      fc.property(fc.string({ unit: "binary" }), (name) => {
        const text = writeGpx({ name, waypoints: [{ ...itemAt(waypoints, 0), name }], line: null, pieces: [] });
        expect(readGpx(bytesOf(text)).waypoints).toHaveLength(1);
      }),
    );
  });
});

describe("places along a line", () => {
  it("a place on the line is found again where it was", () => {
    fc.assert(
      fc.property(ways, fc.double({ min: 0, max: 1, noNaN: true }), (segments, share) => {
        const { line, lengthM } = measureSegments(segments);
        const place = placeOnLine(line, share * lengthM);
        const found = nearestOnLine(line, place);
        expect(found?.offM ?? 99).toBeLessThan(1);
        expect(distanceM(placeOnLine(line, found?.atM ?? 0), place)).toBeLessThan(1);
      }),
      { numRuns: 40 },
    );
  });

  it("of a way there and back, the later place is found when asked for", () => {
    const there = measureSegments([{ latitudes: [60, 60.02, 60], longitudes: [8, 8, 8], heightsM: [1, 1, 1] }]);
    const place = { latitude: 60.01, longitude: 8 };
    expect(nearestOnLine(there.line, place)?.atM).toBeCloseTo(there.lengthM / 4, 0);
    expect(nearestOnLine(there.line, place, there.lengthM / 2)?.atM).toBeCloseTo((there.lengthM * 3) / 4, 0);
  });

  it("a long wild line is simplified to what a page can draw, a dozen pieces or hundreds", () => {
    const count = 50_000;
    const wild = {
      latitudes: Array.from({ length: count }, (_, i) => 60 + i * 1e-5 + (i % 7) * 1e-4),
      longitudes: Array.from({ length: count }, (_, i) => 8 + (i % 13) * 1e-4),
      heightsM: Array.from({ length: count }, () => Number.NaN),
    };
    expect(measureSegments([wild]).simplified.flat().length).toBeLessThanOrEqual(MAX_SIMPLIFIED);
    const short = Array.from({ length: 800 }, (_, i) => ({
      latitudes: [60 + i * 0.01, 60.001 + i * 0.01, 60.002 + i * 0.01],
      longitudes: [8, 8.001, 8],
      heightsM: [1, 2, 3],
    })).filter((segment) => (segment.latitudes[2] ?? 0) < 68);
    expect(measureSegments(short).simplified.flat().length).toBeLessThanOrEqual(MAX_SIMPLIFIED);
  });
});
