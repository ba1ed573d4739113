import { describe, expect, it } from "vitest";
import { analyseShelter } from "@/lib/calc/analyse-shelter";
import { designAnalysisRequest } from "@/lib/calc/camp";
import { compareKits, enumerateKits, type KitChoice } from "@/lib/calc/kit-compare";
import { defaultShelterSpec } from "@/lib/calc/shelter-kinds";
import { BUILT_IN_ANCHORS } from "@/lib/calc/tables/anchors";
import type { CampInput, GroundKind, PitchedShelter } from "@/lib/calc/types";
import { campOf, LOAM, pitchOf, ringOf, tieOutIds, WIND } from "./camp-fixtures";

describe("kits of a few anchors", () => {
  it("are all listed, each once: n pieces of k kinds make C(n+k−1, k−1) kits", () => {
    const kits = enumerateKits(3, 8);
    expect(kits).toHaveLength(45);
    expect(new Set(kits.map((kit) => kit.join())).size).toBe(45);
    expect(kits.every((kit) => kit.reduce((sum, count) => sum + count, 0) === 8)).toBe(true);
    expect(enumerateKits(1, 4)).toEqual([[4]]);
  });

  it("count an empty tie-out as nothing and what is not known as unknown", () => {
    const choices: KitChoice[] = [{ id: "ring", name: "Ring", spec: ringOf(200), massKg: 0.02 }];
    const ids = tieOutIds("diamond");
    const camp = campOf({ shelters: [pitchOf("a", "diamond", [20])] });
    const [full, short] = compareKits([camp], choices, [[ids.length], [ids.length - 1]]);
    expect(full?.weakest).toBeGreaterThan(1);
    expect(full?.massKg).toBeCloseTo(0.02 * ids.length, 10);
    expect(short?.weakest).toBe(0);
    const [unknown] = compareKits([camp, campOf({ ...camp, wind: { ...WIND, strength: null } })], choices, [[9]]);
    expect(unknown?.weakest).toBeNull();
    expect(unknown?.weakestByCamp[1]).toBeNull();
  });
});

/**
 * From practice (common, no source): eight stakes carried as four of one kind, two longer and two wide ones serve varied
 * ground better than eight alike. A ridge tarp with the wind on its side, one camp on hard-trodden loam, one on a moist
 * sandy flat; built-in stakes. Nothing of the fact is put in: shelter, grounds and stakes are the tables'.
 */
describe("eight stakes for a tarp on hard loam and on sand", () => {
  const choices = ["three-blade-150", "three-blade-200", "wide-sand-300"].map((id): KitChoice => {
    const anchor = BUILT_IN_ANCHORS.find((one) => one.id === id);
    if (!anchor) throw new Error(`no built-in anchor ${id}`);
    return anchor;
  });
  const campOn = (kind: GroundKind, gustMs: number): CampInput => {
    const pitch: PitchedShelter = {
      pitchId: "tarp",
      name: "Ridge tarp",
      spec: { ...defaultShelterSpec("ridge-tarp"), line: { material: "polyester", diameterMm: 3 } },
      headingDeg: 0,
      patch: "main",
      analysis: null,
    };
    const wind = { ...WIND, fromDeg: 255, toDeg: 285, strength: { kind: "gust" as const, speedMs: gustMs } };
    const camp = campOf({ wind, ground: { ...LOAM, kind }, shelters: [pitch] });
    const request = designAnalysisRequest(camp, pitch);
    if ("gaps" in request) throw new Error("the wind is complete");
    return { ...camp, shelters: [{ ...pitch, analysis: analyseShelter(request) }] };
  };
  const kits = enumerateKits(3, 8);
  const compared = compareKits([campOn("hard-trodden-loam", 16), campOn("moist-sandy-flat", 9)], choices, kits);
  const kit = (...counts: number[]) => {
    const found = compared.find((one) => one.counts.join() === counts.join());
    if (!found || found.weakest === null) throw new Error("kit not compared");
    return { ...found, weakest: found.weakest };
  };
  const mixed = kit(4, 2, 2);

  it("four, two longer and two wide hold more than eight of the one kind or eight longer, at both camps", () => {
    for (const alike of [kit(8, 0, 0), kit(0, 8, 0)]) {
      expect(mixed.weakest).toBeGreaterThan(1.2 * alike.weakest);
      mixed.weakestByCamp.forEach((margin, camp) =>
        expect(margin ?? 0).toBeGreaterThan(alike.weakestByCamp[camp] ?? NaN),
      );
    }
  });

  it("no eight alike that weigh as much or less come near; eight wide ones do, at more than one and a half times the mass", () => {
    for (const alike of [kit(8, 0, 0), kit(0, 8, 0), kit(0, 0, 8)]) {
      if (alike.massKg <= mixed.massKg) expect(alike.weakest).toBeLessThan(mixed.weakest);
    }
    expect(kit(0, 0, 8).massKg).toBeGreaterThan(1.5 * mixed.massKg);
  });
});
