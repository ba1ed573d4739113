import { tz, TZDate } from "@date-fns/tz";
import { addDays as addCalendarDays, differenceInCalendarDays, format } from "date-fns";

/** A calendar day has no zone: it is counted in UTC, where every day has 24 hours. */
const UTC = { in: tz("UTC") };

function toDate(day: string): Date {
  return new TZDate(`${day}T00:00:00Z`, "UTC");
}

/** yyyy-mm-dd, so many days later. */
export function addDays(day: string, count: number): string {
  return format(addCalendarDays(toDate(day), count, UTC), "yyyy-MM-dd", UTC);
}

export function countDaysBetween(from: string, to: string): number {
  return differenceInCalendarDays(toDate(to), toDate(from), UTC);
}

/** "Sun 14 June". */
export function formatDay(day: string): string {
  return format(toDate(day), "EEE d MMMM", UTC);
}

/** "Sun 14". */
export function formatDayShort(day: string): string {
  return format(toDate(day), "EEE d", UTC);
}

/** "14 June 2026". */
export function formatDayLong(day: string): string {
  return format(toDate(day), "d MMMM yyyy", UTC);
}

/** "12–18 June", "28 June – 3 July", "30 December 2026 – 2 January 2027". */
export function formatDayRange(from: string, to: string): string {
  if (from === to) return format(toDate(from), "d MMMM", UTC);
  if (from.slice(0, 4) !== to.slice(0, 4)) return `${formatDayLong(from)} – ${formatDayLong(to)}`;
  if (from.slice(0, 7) !== to.slice(0, 7)) {
    return `${format(toDate(from), "d MMMM", UTC)} – ${format(toDate(to), "d MMMM", UTC)}`;
  }
  return `${format(toDate(from), "d", UTC)}–${format(toDate(to), "d MMMM", UTC)}`;
}

/** An instant on the clock of a zone: "9 June 18:20". */
export function formatInstant(instant: Date | string, timeZone: string): string {
  return format(new Date(instant), "d MMMM HH:mm", { in: tz(timeZone) });
}

/** "18:20". */
export function formatTime(instant: Date | string, timeZone: string): string {
  return format(new Date(instant), "HH:mm", { in: tz(timeZone) });
}

/** The calendar day that an instant falls on in a zone, yyyy-mm-dd. */
export function dayOf(instant: Date | string, timeZone: string): string {
  return format(new Date(instant), "yyyy-MM-dd", { in: tz(timeZone) });
}

/** The instant at which a clock of the zone shows so many minutes after midnight of a day. */
export function instantOf(day: string, minuteOfDay: number, timeZone: string): Date {
  const [year = 1970, month = 1, date = 1] = day.split("-").map(Number);
  const local = new TZDate(year, month - 1, date, Math.floor(minuteOfDay / 60), minuteOfDay % 60, timeZone);
  return new Date(local.getTime());
}

/** "18:30" as minutes after midnight. */
export function minuteOfDay(time: string): number {
  const [hour = 0, minute = 0] = time.split(":").map(Number);
  return hour * 60 + minute;
}

/** Minutes after midnight of a day that a clock of the zone shows at an instant; 1440 and more on the days after. */
export function minuteOn(day: string, instant: Date | string, timeZone: string): number {
  const [hours = 0, minutes = 0, seconds = 0] = format(new Date(instant), "HH:mm:ss", { in: tz(timeZone) })
    .split(":")
    .map(Number);
  return countDaysBetween(day, dayOf(instant, timeZone)) * 1440 + hours * 60 + minutes + seconds / 60;
}
