import { makeCast } from "../../helpers/actors";
import { windyCamp } from "../../helpers/camp-kit";
import { hashTables } from "../../helpers/table-hash";
import { SHORT_WAY } from "../../helpers/two-trips";
import { REFUSED } from "../../fixtures/gpx-oddities";
import { writeDemoRoute } from "@/db/demo/skarn-edge-route";
import { beforeEach, describe, expect, it } from "vitest";
import { BLANK_LEG, BLANK_SETTINGS } from "@/lib/domain/route/schema";
import { workOutLegs } from "@/lib/domain/route/work-out-legs";
import { AppError } from "@/lib/errors";
import { createCamp } from "@/lib/services/camps/create-camp";
import { getCamp } from "@/lib/services/camps/get-camp";
import { createCampsFromPlaces } from "@/lib/services/route/create-camps-from-places";
import { deleteRoute } from "@/lib/services/route/delete-route";
import { drawRoute } from "@/lib/services/route/draw-route";
import { exportGpx } from "@/lib/services/route/export-gpx";
import { getRoute } from "@/lib/services/route/get-route";
import { importGpx } from "@/lib/services/route/import-gpx";
import { placeCamp } from "@/lib/services/route/place-camp";
import { saveRouteSettings } from "@/lib/services/route/save-route-settings";
import { copyTrip } from "@/lib/services/trips/copy-trip";

const bytesOf = (text: string) => new TextEncoder().encode(text);
let cast: Awaited<ReturnType<typeof makeCast>>;
beforeEach(async () => {
  cast = await makeCast();
});

const take = (text = SHORT_WAY) =>
  importGpx({ ctx: cast.leader.ctx, input: { tripId: cast.tripId, fileName: "way.gpx" }, bytes: bytesOf(text) });
const read = (tripId = cast.tripId) => getRoute({ ctx: cast.leader.ctx, input: { tripId } });
const addCamp = (name: string, latitude: number | null, longitude: number | null) =>
  createCamp({
    ctx: cast.leader.ctx,
    input: { tripId: cast.tripId, details: windyCamp({ name, latitude, longitude }) },
  });

async function codeOf(work: Promise<unknown>): Promise<string> {
  try {
    await work;
  } catch (error) {
    if (error instanceof AppError) return error.code;
    throw error;
  }
  return "done";
}

describe("a way from a file", () => {
  it("puts camps that lie near on the line, in order, and leaves the others off it", async () => {
    await addCamp("Far", 10, 10);
    await addCamp("Cairn camp", 60.0101, 8.0101);
    await addCamp("Nowhere", null, null);
    const answer = await take();
    expect(answer).toMatchObject({ snapped: 1, pointCount: 5, placeCount: 1 });
    const { stops, line } = await read();
    expect(stops.map((stop) => stop.atM === null)).toEqual([true, false, true]);
    expect(line).toMatchObject({ source: "file", pointCount: 5 });
    expect(line?.places[0]).toMatchObject({ name: "Cairn" });
  });

  it("is kept in the place of the one before", async () => {
    await take();
    await take(writeDemoRoute());
    const { line } = await read();
    expect(line?.pointCount).toBeGreaterThan(900);
    await deleteRoute({ ctx: cast.leader.ctx, input: { tripId: cast.tripId } });
    expect((await read()).line).toBeNull();
  });

  it("goes out and comes back equal, days as tracks and camps as places", async () => {
    await addCamp("Low", 60.003, 8.003);
    await addCamp("High", 60.0101, 8.01);
    await take();
    const first = await exportGpx({ ctx: cast.leader.ctx, input: { tripId: cast.tripId } });
    expect(first.content.match(/<trk>/g)).toHaveLength(3);
    expect(first.content.match(/<wpt /g)).toHaveLength(2);
    const before = await read();
    await take(first.content);
    const after = await read();
    expect(after.line?.lengthM).toBeCloseTo(before.line?.lengthM ?? 0, 1);
    expect(after.line?.breaks).toEqual([]);
    after.stops.forEach((stop, index) => expect(stop.atM).toBeCloseTo(before.stops[index]?.atM ?? -1, 0));
    expect((await exportGpx({ ctx: cast.leader.ctx, input: { tripId: cast.tripId } })).content).toBe(first.content);
  });

  it("is refused without a mark, whatever is wrong with it", async () => {
    await take();
    const before = await hashTables();
    for (const { what, bytes } of REFUSED.slice(0, 30)) {
      const work = importGpx({ ctx: cast.leader.ctx, input: { tripId: cast.tripId, fileName: "x.gpx" }, bytes });
      expect(await codeOf(work), what).toBe("bad-input");
    }
    expect(await hashTables()).toEqual(before);
  });

  it("is not for co-leaders to change, nor for strangers to see", async () => {
    const bytes = bytesOf(SHORT_WAY);
    const input = { tripId: cast.tripId, fileName: "way.gpx" };
    expect(await codeOf(importGpx({ ctx: cast.coLeader.ctx, input, bytes }))).toBe("forbidden");
    expect(await codeOf(importGpx({ ctx: cast.stranger.ctx, input, bytes }))).toBe("not-found");
    expect(await codeOf(getRoute({ ctx: cast.stranger.ctx, input }))).toBe("not-found");
    expect(await codeOf(getRoute({ ctx: cast.participant.ctx, input }))).toBe("forbidden");
    expect(await codeOf(exportGpx({ ctx: cast.otherLeader.ctx, input }))).toBe("not-found");
    await take();
    expect((await getRoute({ ctx: cast.coLeader.ctx, input })).line).not.toBeNull();
  });

  it("comes along when a trip is copied", async () => {
    const { campId } = await addCamp("Low", 60.003, 8.003);
    await take();
    const { tripId } = await copyTrip({
      ctx: cast.leader.ctx,
      input: { tripId: cast.tripId, name: "Again", startDate: "2027-09-01" },
    });
    const copy = await read(tripId);
    const own = await read();
    expect(copy.line).toEqual(own.line);
    expect(copy.stops[0]?.atM).toBe(own.stops[0]?.atM);
    expect(copy.stops[0]?.campId).not.toBe(campId);
  });
});

describe("camps on the way", () => {
  it("moved along it, take its position and height, and can be put back", async () => {
    const { campId } = await addCamp("Low", 60.003, 8.003);
    await take();
    const input = { tripId: cast.tripId, campId };
    const moved = await placeCamp({
      ctx: cast.coLeader.ctx,
      input: { ...input, version: 1, atM: 0, position: "line" },
    });
    expect((await getCamp({ ctx: cast.leader.ctx, input })).details).toMatchObject({
      latitude: 60,
      longitude: 8,
      altitudeM: 300,
    });
    const before = { latitude: 60.003, longitude: 8.003, altitudeM: 300 };
    await placeCamp({ ctx: cast.leader.ctx, input: { ...input, version: moved.version, atM: null, position: before } });
    expect((await getCamp({ ctx: cast.leader.ctx, input })).details).toMatchObject(before);
    expect((await read()).stops[0]?.atM).toBeNull();
  });

  it("are not moved beyond the end, nor over somebody else's change", async () => {
    const { campId } = await addCamp("Low", 60.003, 8.003);
    await take();
    const place = (version: number, atM: number) =>
      placeCamp({ ctx: cast.leader.ctx, input: { tripId: cast.tripId, campId, version, atM, position: "line" } });
    expect(await codeOf(place(1, 9e6))).toBe("bad-input");
    expect(await codeOf(place(9, 10))).toBe("conflict");
    const other = { tripId: cast.otherTripId, campId, version: 1, atM: 0, position: "keep" as const };
    expect(await codeOf(placeCamp({ ctx: cast.otherLeader.ctx, input: other }))).toBe("not-found");
  });

  it("are made of places of the file, once each, and of no others", async () => {
    await take();
    const make = (places: number[]) =>
      createCampsFromPlaces({ ctx: cast.leader.ctx, input: { tripId: cast.tripId, places } });
    expect(await codeOf(make([5]))).toBe("bad-input");
    const { campIds } = await make([0, 0]);
    expect(campIds).toHaveLength(1);
    const { stops } = await read();
    expect(stops[0]).toMatchObject({ name: "Cairn", latitude: 60.011 });
    expect(stops[0]?.atM).not.toBeNull();
  });
});

describe("days", () => {
  const walking = { ...BLANK_SETTINGS, setOffMinute: 9 * 60 };

  it("without a line are as they were typed, and say what is missing", async () => {
    const { campId } = await addCamp("Otter Flat", 57, -5);
    const leg = { ...BLANK_LEG, distanceM: 12_000, ascentM: 900, descentM: 900 };
    const input = {
      tripId: cast.tripId,
      version: 0,
      settings: { ...walking, rule: "din" as const },
      legs: [{ campId, leg }],
      homeLeg: BLANK_LEG,
    };
    expect(await saveRouteSettings({ ctx: cast.leader.ctx, input })).toEqual({ version: 1 });
    const [first, home] = workOutLegs(await read());
    // DIN 33466: 4.8 + 3.0/2 = 6.3 h.
    expect(first).toMatchObject({ source: "typed", usedRule: "din", walkingH: 6.3, arriveMin: 9 * 60 + 378 });
    expect(first?.times.tobler).toBeNull();
    expect(first?.evening).toMatchObject({ light: "usual" });
    expect(first?.evening?.duskMin).toBeGreaterThan(22 * 60);
    expect(home).toMatchObject({ source: null, distanceM: null, arriveMin: null });
    expect(home?.missing).toContain("its length");
  });

  it("make up the whole way: the legs between camps add up to its length", async () => {
    await addCamp("Low", 60.003, 8.003);
    await addCamp("High", 60.0101, 8.01);
    await take();
    const route = await read();
    const sum = workOutLegs(route).reduce((total, leg) => total + (leg.distanceM ?? Number.NaN), 0);
    expect(sum).toBeCloseTo(route.line?.lengthM ?? 0, 6);
  });

  it("do not run backwards: such a leg has no figures and says why", async () => {
    await addCamp("High", 60.0101, 8.01);
    const { campId } = await addCamp("Low", 60.003, 8.003);
    await take();
    await placeCamp({
      ctx: cast.leader.ctx,
      input: { tripId: cast.tripId, campId, version: 1, atM: 0, position: "keep" },
    });
    const legs = workOutLegs(await read());
    expect(legs[1]).toMatchObject({ source: null, distanceM: null });
    expect(legs[1]?.missing[0]).toMatch(/Low after High/);
  });

  it("saved on an older version are refused with who was first; legs of another trip's camps are not there", async () => {
    const { campId } = await addCamp("Low", 60.003, 8.003);
    const input = { tripId: cast.tripId, version: 0, settings: walking, legs: [], homeLeg: BLANK_LEG };
    await saveRouteSettings({ ctx: cast.leader.ctx, input });
    expect(await codeOf(saveRouteSettings({ ctx: cast.leader.ctx, input }))).toBe("conflict");
    const foreign = { ...input, tripId: cast.otherTripId, legs: [{ campId, leg: BLANK_LEG }] };
    expect(await codeOf(saveRouteSettings({ ctx: cast.otherLeader.ctx, input: foreign }))).toBe("not-found");
  });
});

describe("a way drawn by hand", () => {
  const draw = (points: { latitude: number; longitude: number }[]) =>
    drawRoute({ ctx: cast.leader.ctx, input: { tripId: cast.tripId, points } });

  it("has a length and no heights, also across the antimeridian", async () => {
    const { lengthM } = await draw([
      { latitude: 0, longitude: 179.9 },
      { latitude: 0, longitude: -179.9 },
    ]);
    expect(lengthM).toBeCloseTo(22263.9, 1);
    const { line } = await read();
    expect(line?.source).toBe("drawn");
    expect(line?.profile.heightsM.every((height) => height === null)).toBe(true);
  });

  it.each([
    ["one point", [{ latitude: 1, longitude: 1 }]],
    ["no length", Array(2).fill({ latitude: 1, longitude: 1 })],
    [
      "a point off the globe",
      [
        { latitude: 1, longitude: 1 },
        { latitude: 91, longitude: 1 },
      ],
    ],
    ["too many points", Array.from({ length: 501 }, (_, i) => ({ latitude: i / 100, longitude: 1 }))],
    [
      "no number",
      [
        { latitude: Number.NaN, longitude: 1 },
        { latitude: 2, longitude: 1 },
      ],
    ],
  ])("is refused with %s", async (_, points) => {
    expect(await codeOf(draw(points as { latitude: number; longitude: number }[]))).toBe("bad-input");
    expect((await read()).line).toBeNull();
  });
});
