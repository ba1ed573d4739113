import { describe, expect, it } from "vitest";
import { parseMgrs, toMgrs } from "@/lib/calc/places/mgrs";
import { parsePosition } from "@/lib/calc/places/parse-position";

const problemOf = (typed: string) => {
  const parsed = parsePosition(typed);
  if (!("problem" in parsed)) throw new Error(`${typed} was read as ${JSON.stringify(parsed)}`);
  return parsed.problem;
};

describe("positions that can't be", () => {
  it.each([
    ["95 N 10 E", /latitude lies between/],
    ["61 N, 200 E", /longitude lies between/],
    ["10 N, 20 N", /one latitude and one longitude/],
    ["10 E, 20 E", /one latitude and one longitude/],
    ["61 V 500000 6800000", /zone/i],
    ["32 I 500000 6800000", /letter after the zone/],
    ["32 V 050000 6800000", /easting lies between/],
    ["32 V 500000 10000001", /northing lies between/],
    ["32 C 500000 6800000", /not in band C/],
  ])("%s: says why", (typed, sentence) => expect(problemOf(typed)).toMatch(sentence));

  it.each(["61° 70' N 8° E", "-61 S 8 E", "N 61 N, 8 E", "here", "1 2 3"])("%s is no position", (typed) => {
    expect(problemOf(typed)).not.toBe("");
  });

  it("reads a longitude before a latitude, and decimal commas", () => {
    expect(parsePosition("8.5 E, 61.25 N")).toMatchObject({ place: { latitude: 61.25, longitude: 8.5 } });
    expect(parsePosition("61,25 8,5")).toMatchObject({ place: { latitude: 61.25, longitude: 8.5 } });
  });

  it.each([
    ["32VNM123", "form"],
    ["32VNM", "form"],
    ["32VNM123456123456", "form"],
    ["61VNM1212", "zone"],
    ["00VNM1212", "zone"],
    // Zone 32 takes its columns from J to R.
    ["32VAM1212", "square"],
    ["hello", "form"],
  ])("grid reference %s: %s", (text, fault) => expect(parseMgrs(text)).toBe(fault));

  it("has no grid reference where UTM does not reach", () => {
    expect(toMgrs({ latitude: 89, longitude: 0 })).toBeNull();
    expect(toMgrs({ latitude: -85, longitude: 0 })).toBeNull();
  });
});
