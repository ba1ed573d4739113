"use client";

import Link from "next/link";
import { usePathname } from "next/navigation";
import { StateMark } from "@/components/drawing/state-mark";
import type { CampSummary } from "@/lib/domain/views";
import { formatDayShort } from "@/lib/format/days";
import { formatHoldsTo } from "@/lib/format/speeds";
import type { Preferences } from "@/lib/domain/preferences";

interface NightsProps {
  readonly tripId: string;
  readonly camps: readonly CampSummary[];
  readonly speedUnit: Preferences["speedUnit"];
}

interface Night {
  readonly camp: CampSummary;
  readonly day: string;
  /** 0 for the first night at the camp. */
  readonly index: number;
}

const ORDINALS = ["", "second night", "third night", "fourth night", "fifth night"];

function toNights(camps: readonly CampSummary[]): readonly Night[] {
  return camps.flatMap((camp) => camp.days.map((day, index) => ({ camp, day, index })));
}

function describe({ camp, index }: Night, speedUnit: Preferences["speedUnit"]): string {
  if (index > 0) return ORDINALS[index] ?? `night ${index + 1}`;
  const holdsTo = camp.holdsToGustMs === null ? null : formatHoldsTo(camp.holdsToGustMs, speedUnit);
  switch (camp.verdict) {
    case "holds":
      return holdsTo ? `holds to ${holdsTo}` : "holds";
    case "thin":
      return holdsTo ? `thin, holds to ${holdsTo}` : "thin";
    case "gives-way":
      return holdsTo ? `gives way at ${holdsTo}` : "gives way";
    case "unknown":
      return camp.gaps.length > 0 ? "something is missing" : "not planned yet";
  }
}

const TONES = { holds: "text-pencil", thin: "text-ochre", "gives-way": "text-rowan", unknown: "text-pencil" } as const;

/** The trip's nights as one drawn line: walking legs between camps, dots where people stay. */
export function NightsRail({ tripId, camps, speedUnit }: NightsProps) {
  const path = usePathname();
  const nights = toNights(camps);
  if (nights.length === 0) return <p className="text-15 text-pencil">No camps yet.</p>;
  return (
    <ol aria-label="Nights" className="flex flex-col">
      {nights.map((night, at) => {
        const isHere = path.startsWith(`/trips/${tripId}/camps/${night.camp.id}`);
        const next = nights[at + 1];
        return (
          <li key={`${night.camp.id}-${night.day}`} className="relative">
            <Link
              href={`/trips/${tripId}/camps/${night.camp.id}`}
              aria-current={isHere ? "page" : undefined}
              className="relative flex min-h-14 items-start gap-3 rounded-field border border-transparent py-2 pr-2 pl-2 hover:bg-spruce-wash aria-[current]:border-ink aria-[current]:bg-sheet"
            >
              <span className="mt-0.5 shrink-0">
                <StateMark verdict={night.camp.verdict} isDecorative />
              </span>
              <span className="min-w-0">
                <span className={`block truncate text-15 ${isHere ? "font-bold" : "font-semibold"}`}>
                  {night.camp.name}
                </span>
                <span className={`block text-13 ${TONES[night.camp.verdict]}`}>
                  {formatDayShort(night.day)} · {describe(night, speedUnit)}
                </span>
              </span>
            </Link>
            {next && <Leg isStay={next.camp.id === night.camp.id} />}
          </li>
        );
      })}
    </ol>
  );
}

/** A walked leg is a winding line; a rest day is dotted. */
function Leg({ isStay }: { readonly isStay: boolean }) {
  return (
    <svg width="26" height="34" viewBox="0 0 26 34" aria-hidden="true" className="ml-1.5 text-pencil" fill="none">
      {isStay ? (
        <path d="M13 2v30" stroke="currentColor" strokeWidth="1.5" strokeDasharray="1.5 5" strokeLinecap="round" />
      ) : (
        <path d="M13 0c0 9-7 8-5 17s7 6 5 17" stroke="currentColor" strokeWidth="1.5" strokeLinecap="round" />
      )}
    </svg>
  );
}

/** The same nights as a strip on a phone. */
export function NightsStrip({ tripId, camps, speedUnit }: NightsProps) {
  const path = usePathname();
  const nights = toNights(camps);
  if (nights.length === 0) return null;
  return (
    <ol aria-label="Nights" className="flex flex-wrap gap-1">
      {nights.map((night) => {
        const isHere = path.startsWith(`/trips/${tripId}/camps/${night.camp.id}`);
        return (
          <li key={`${night.camp.id}-${night.day}`}>
            <Link
              href={`/trips/${tripId}/camps/${night.camp.id}`}
              aria-current={isHere ? "page" : undefined}
              aria-label={`${night.camp.name}, ${formatDayShort(night.day)}: ${describe(night, speedUnit)}`}
              className="flex min-h-12 min-w-11 flex-col items-center gap-1 rounded-field border border-transparent px-2 py-1 text-13 aria-[current]:border-ink aria-[current]:font-bold"
            >
              <span>{formatDayShort(night.day)}</span>
              <StateMark verdict={night.camp.verdict} isDecorative />
            </Link>
          </li>
        );
      })}
    </ol>
  );
}
