"use client";

import { formatWindRange } from "@/lib/format/angles";
import { formatAltitude } from "@/lib/format/lengths";
import { formatSpeed } from "@/lib/format/speeds";
import { useBoard } from "./board-context";
import { SaveLine } from "./save-line";

/** Where and when, and what the plan is made for. */
export function BoardHeading() {
  const { view, board, groundName, preferences } = useBoard();
  const { details, days } = view.camp;
  const { designGustMs } = board.result;
  const wetness = details.ground && details.ground.wetness !== "usual" ? `, ${details.ground.wetness}` : "";
  const facts = [
    days[0] && formatDay(days[0]),
    details.altitudeM !== null && formatAltitude(details.altitudeM, preferences.lengthUnit),
    groundName && `${groundName.toLowerCase()}${wetness}`,
    designGustMs !== null &&
      `gust ${formatSpeed(designGustMs, preferences.speedUnit)} from ${formatWindRange(details.windFromDeg, details.windToDeg)}`,
    details.strongWindHours !== null && `${details.strongWindHours}\u2009h of it`,
  ].filter(Boolean);
  return (
    <header>
      <div className="flex flex-wrap items-baseline justify-between gap-x-4">
        <h1 className="text-24 font-extrabold">{details.name}</h1>
        <SaveLine />
      </div>
      <p className="text-13 text-pencil">{facts.join(" · ")}</p>
    </header>
  );
}

/** "Sun 14 June", of a calendar day; the library that the server uses for days is too heavy to send along. */
function formatDay(day: string): string {
  const parts = new Intl.DateTimeFormat("en-GB", {
    weekday: "short",
    day: "numeric",
    month: "long",
    timeZone: "UTC",
  }).formatToParts(new Date(`${day}T00:00:00Z`));
  const part = (type: string) => parts.find((one) => one.type === type)?.value ?? "";
  return `${part("weekday")} ${part("day")} ${part("month")}`;
}
