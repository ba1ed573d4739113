"use client";

import { useState } from "react";
import { ChoiceField } from "@/components/ui/fields";
import type { PaperSize } from "@/lib/domain/paper/schema";
import { paperHref } from "./paper-links";

export interface CampPapers {
  readonly id: string;
  readonly name: string;
  readonly days: string;
  readonly pitches: readonly { readonly id: string; readonly name: string }[];
}

/** Every card and list, each opening as a PDF of its own. */
export function PaperList({
  tripId,
  camps,
  people,
  initialSize,
}: {
  readonly tripId: string;
  readonly camps: readonly CampPapers[];
  readonly people: readonly { readonly id: string; readonly name: string }[];
  readonly initialSize: PaperSize;
}) {
  const [size, setSize] = useState<PaperSize>(initialSize);
  return (
    <div className="flex flex-col gap-8">
      <div className="flex flex-wrap items-end justify-between gap-4">
        <ChoiceField
          legend="Paper"
          name="size"
          options={[
            { value: "A4", label: "A4" },
            { value: "LETTER", label: "US Letter" },
          ]}
          defaultValue={size}
          onChange={(value) => setSize(value === "LETTER" ? "LETTER" : "A4")}
        />
        <PaperLink href={paperHref(tripId, { paper: "booklet" }, size)} label="Whole booklet" />
      </div>
      <div>
        <h3 className="mb-1 text-15 font-bold">Camps</h3>
        {camps.length === 0 && <p className="text-15 text-pencil">No camps yet, so no cards.</p>}
        <ul>
          {camps.map((camp) => (
            <li
              key={camp.id}
              className="grid gap-x-6 gap-y-1 border-t border-hair py-2 sm:grid-cols-[12rem_minmax(0,1fr)]"
            >
              <p className="py-2.5">
                <span className="font-semibold">{camp.name}</span>
                <span className="block text-13 text-pencil">{camp.days}</span>
              </p>
              <div className="flex flex-wrap gap-x-5">
                <PaperLink
                  href={paperHref(tripId, { paper: "field-card", campId: camp.id }, size)}
                  label="Field card"
                  of={camp.name}
                />
                {camp.pitches.length > 0 && <span className="py-2.5 text-pencil">Pitch cards</span>}
                {camp.pitches.map((pitch) => (
                  <PaperLink
                    key={pitch.id}
                    href={paperHref(tripId, { paper: "pitch-card", campId: camp.id, pitchId: pitch.id }, size)}
                    label={pitch.name}
                    of={`pitch card, ${camp.name}`}
                  />
                ))}
              </div>
            </li>
          ))}
        </ul>
      </div>
      <div>
        <h3 className="mb-1 text-15 font-bold">Each person’s pages</h3>
        <ul>
          {people.map((person) => (
            <li
              key={person.id}
              className="grid gap-x-6 gap-y-1 border-t border-hair py-2 sm:grid-cols-[12rem_minmax(0,1fr)]"
            >
              <p className="py-2.5 font-semibold">{person.name}</p>
              <div className="flex flex-wrap gap-x-5">
                <PaperLink
                  href={paperHref(tripId, { paper: "pitch-and-pack", personId: person.id, fold: "flat" }, size)}
                  label="Pitch and pack"
                  of={person.name}
                />
                <PaperLink
                  href={paperHref(tripId, { paper: "pitch-and-pack", personId: person.id, fold: "pocket" }, size)}
                  label="To fold"
                  of={`pitch and pack, ${person.name}`}
                />
                <PaperLink
                  href={paperHref(tripId, { paper: "pack-list", personId: person.id }, size)}
                  label="Pack list"
                  of={person.name}
                />
              </div>
            </li>
          ))}
        </ul>
      </div>
    </div>
  );
}

export function PaperLink({
  href,
  label,
  of,
}: {
  readonly href: string;
  readonly label: string;
  readonly of?: string;
}) {
  return (
    <a
      href={href}
      target="_blank"
      rel="noreferrer"
      className="inline-flex min-h-11 items-center gap-2 font-semibold text-spruce hover:underline"
    >
      <svg
        width="14"
        height="16"
        viewBox="0 0 14 16"
        aria-hidden="true"
        fill="none"
        stroke="currentColor"
        strokeWidth="1.4"
      >
        <path d="M2 1.5h6.5L12 5v9.5H2zM8.5 1.5V5H12M4.5 8.5h5M4.5 11h5" strokeLinejoin="round" strokeLinecap="round" />
      </svg>
      {label}
      <span className="sr-only">{of ? `, ${of}` : ""} (PDF, opens in a new tab)</span>
    </a>
  );
}
