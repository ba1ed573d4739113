import { describe, expect, it } from "vitest";
import {
  addDays,
  countDaysBetween,
  dayOf,
  formatDay,
  formatDayRange,
  formatDayShort,
  formatInstant,
  formatTime,
} from "@/lib/format/days";

describe("calendar days", () => {
  it("adds days over months, leap days and clock changes", () => {
    expect(addDays("2028-02-28", 1)).toBe("2028-02-29");
    expect(addDays("2026-12-31", 1)).toBe("2027-01-01");
    // Europe's clocks change on 29 March 2026.
    expect(addDays("2026-03-28", 2)).toBe("2026-03-30");
    expect(countDaysBetween("2026-03-28", "2026-03-30")).toBe(2);
  });
  it("names days", () => {
    // 14 June 2026 is a Sunday.
    expect(formatDay("2026-06-14")).toBe("Sun 14 June");
    expect(formatDayShort("2026-06-14")).toBe("Sun 14");
  });
  it.each([
    ["2026-06-12", "2026-06-18", "12–18 June"],
    ["2026-06-28", "2026-07-03", "28 June – 3 July"],
    ["2026-12-30", "2027-01-02", "30 December 2026 – 2 January 2027"],
    ["2026-06-12", "2026-06-12", "12 June"],
  ])("%s to %s is %s", (from, to, text) => expect(formatDayRange(from, to)).toBe(text));
});

describe("instants in the trip's zone", () => {
  const instant = "2026-06-09T17:20:00Z";
  // London is at UTC+1 in June, St John's at −2:30, Kiritimati at +14 all year.
  it.each([
    ["Europe/London", "9 June 18:20", "2026-06-09"],
    ["America/St_Johns", "9 June 14:50", "2026-06-09"],
    ["Pacific/Kiritimati", "10 June 07:20", "2026-06-10"],
  ])("in %s it is %s", (zone, text, day) => {
    expect(formatInstant(instant, zone)).toBe(text);
    expect(formatTime(instant, zone)).toBe(text.slice(-5));
    expect(dayOf(instant, zone)).toBe(day);
  });
});
