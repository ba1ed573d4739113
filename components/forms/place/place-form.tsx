"use client";

import { useState, type ReactNode } from "react";
import { ActionForm, type FormAction } from "@/components/ui/action-form";
import { NumberField } from "@/components/ui/fields";
import { Section } from "@/components/ui/layout";
import type { CampDetails } from "@/lib/domain/camp/schema";
import type { Preferences } from "@/lib/domain/preferences";
import { ConflictChoice } from "../conflict-choice";
import { clockNow, SaveBar, type SaveState } from "../save-bar";
import { GroundFields, SecondGround } from "./ground-fields";
import { LeeFields } from "./lee-fields";
import { FoundFields, HazardFields, NameFields, NoteFields, PositionFields, type HazardOption } from "./where-fields";
import { WindFields } from "./wind-fields";

const PARTS = [
  ["ground", "Ground"],
  ["wind", "Wind"],
  ["lee", "Hill and shelter from wind"],
  ["where", "Place"],
  ["found", "Found here"],
  ["hazards", "Hazards, water, way out"],
] as const;

interface PlaceFormProps {
  readonly action: FormAction<null>;
  readonly tripId: string;
  readonly campId: string;
  readonly version: number;
  readonly details: CampDetails;
  /** Of an alternative: the camp whose nights it has. */
  readonly standsByFor?: string | null;
  readonly hazards: readonly HazardOption[];
  readonly preferences: Preferences;
}

/** Everything that is known of a camp's ground and wind, on one page with a table of contents. */
export function PlaceForm({
  action,
  tripId,
  campId,
  version,
  details,
  standsByFor = null,
  hazards,
  preferences,
}: PlaceFormProps) {
  const [state, setState] = useState<SaveState>({ kind: "clean" });
  const unit = preferences.lengthUnit;
  const touch = () => setState((now) => (now.kind === "dirty" ? now : { kind: "dirty" }));
  return (
    <ActionForm action={action} onDone={() => setState({ kind: "saved", at: clockNow() })} onChange={touch}>
      <input type="hidden" name="tripId" value={tripId} />
      <input type="hidden" name="campId" value={campId} />
      <input type="hidden" name="version:number" value={version} />
      <input type="hidden" name="lengthUnit" value={unit} />
      <ConflictChoice href={`/trips/${tripId}/camps/${campId}/place`} />
      <nav aria-label="Parts of this page" className="mb-8">
        <ul className="flex flex-wrap gap-x-5 text-15">
          {PARTS.map(([id, label]) => (
            <li key={id}>
              <a
                href={`#${id}`}
                className="inline-flex min-h-11 items-center font-semibold text-spruce hover:underline"
              >
                {label}
              </a>
            </li>
          ))}
        </ul>
      </nav>
      <div className="mb-10 max-w-[40rem]">
        <NameFields details={details} standsByFor={standsByFor} />
      </div>
      <Part id="ground">
        <GroundFields path="details.ground" patch={details.ground} isOptional={false} />
        <div className="mt-5 max-w-[12rem]">
          <NumberField
            name="details.slopeDeg"
            label="Slope"
            unit="°"
            defaultValue={String(details.slopeDeg)}
            hint="0 is level."
          />
        </div>
        <SecondGround patch={details.secondGround} onChanged={touch} />
      </Part>
      <Part id="wind">
        <WindFields details={details} preferences={preferences} onChanged={touch} />
      </Part>
      <Part id="lee">
        <LeeFields details={details} unit={unit} />
      </Part>
      <Part id="where">
        <PositionFields details={details} unit={unit} onChanged={touch} />
      </Part>
      <Part id="found">
        <FoundFields details={details} />
      </Part>
      <Part id="hazards">
        <HazardFields chosen={details.hazards} hazards={hazards} />
        <div className="mt-6">
          <NoteFields details={details} unit={unit} />
        </div>
      </Part>
      <SaveBar state={state} label="Save ground and wind" />
    </ActionForm>
  );
}

function Part({ id, children }: { readonly id: (typeof PARTS)[number][0]; readonly children: ReactNode }) {
  const title = PARTS.find(([key]) => key === id)?.[1] ?? "";
  return (
    <div id={id} className="scroll-mt-4">
      <Section title={title}>{children}</Section>
    </div>
  );
}
