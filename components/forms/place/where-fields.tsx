"use client";

import { useState } from "react";
import { CheckField, FieldError, NumberField, TextArea, TextField } from "@/components/ui/fields";
import { useFieldErrors } from "@/components/ui/action-form";
import type { LatLon } from "@/lib/calc/places/utm";
import type { CampDetails } from "@/lib/domain/camp/schema";
import type { Preferences } from "@/lib/domain/preferences";
import { lengthInUnit } from "./lengths";
import { PositionEntry } from "./position-entry";

const shown = (value: number | null) => (value === null ? "" : String(value));

export function NameFields({
  details,
  standsByFor,
}: {
  readonly details: CampDetails;
  readonly standsByFor: string | null;
}) {
  if (standsByFor !== null) {
    return (
      <>
        <TextField name="details.name" label="Name of the camp" defaultValue={details.name} maxLength={80} />
        <input type="hidden" name="details.nights:number" value={details.nights} />
        <p className="mt-2 text-13 text-pencil">It has the nights of {standsByFor}.</p>
      </>
    );
  }
  return (
    <div className="grid items-start gap-4 sm:grid-cols-[minmax(0,1fr)_8rem]">
      <TextField name="details.name" label="Name of the camp" defaultValue={details.name} maxLength={80} />
      <NumberField name="details.nights" label="Nights" defaultValue={String(details.nights)} inputMode="numeric" />
    </div>
  );
}

/** Where on the globe, how high, how cold. */
export function PositionFields({
  details,
  unit,
  onChanged,
}: {
  readonly details: CampDetails;
  readonly unit: Preferences["lengthUnit"];
  readonly onChanged: () => void;
}) {
  const [read, setRead] = useState<LatLon | null>(null);
  const { latitude, longitude } = read ?? details;
  const key = read ? `${read.latitude} ${read.longitude}` : "saved";
  return (
    <>
      <PositionEntry
        onFound={(place) => {
          setRead(place);
          onChanged();
        }}
      />
      <div className="grid items-start gap-4 sm:grid-cols-2 lg:grid-cols-4">
        <NumberField
          key={`north ${key}`}
          name="details.latitude"
          label="Latitude"
          unit="°"
          defaultValue={shown(latitude)}
          hint="WGS 84, decimal degrees; south is negative."
        />
        <NumberField
          key={`east ${key}`}
          name="details.longitude"
          label="Longitude"
          unit="°"
          defaultValue={shown(longitude)}
          hint="West is negative."
        />
        <NumberField
          name="details.altitudeM"
          label="Altitude"
          unit={unit}
          defaultValue={lengthInUnit(details.altitudeM, unit, 0)}
          hint="Thinner air pushes less."
        />
        <NumberField
          name="details.temperatureC"
          label="Air at night"
          unit="°C"
          defaultValue={shown(details.temperatureC)}
          hint="Empty: the usual for the altitude."
        />
      </div>
    </>
  );
}

export function FoundFields({ details }: { readonly details: CampDetails }) {
  return (
    <div className="grid gap-x-8 sm:grid-cols-3">
      <CheckField
        name="details.hasRocks"
        label="Rocks to lift"
        defaultChecked={details.hasRocks}
        hint="As weights, and on the lip of a stake."
      />
      <CheckField
        name="details.hasTrees"
        label="Living trees"
        defaultChecked={details.hasTrees}
        hint="Alive, rooted firmly, at least 15 cm thick, no dead limbs above."
      />
      <CheckField
        name="details.hasSticks"
        label="Sticks or logs"
        defaultChecked={details.hasSticks}
        hint="To bury crosswise."
      />
    </div>
  );
}

export interface HazardOption {
  readonly key: string;
  readonly name: string;
  readonly caution: string;
}

/** Several at once; sent as one list. */
export function HazardFields({
  chosen,
  hazards,
}: {
  readonly chosen: CampDetails["hazards"];
  readonly hazards: readonly HazardOption[];
}) {
  const [keys, setKeys] = useState<readonly string[]>(chosen);
  const errors = useFieldErrors("details.hazards");
  return (
    <fieldset>
      <legend className="sr-only">Hazards at this camp</legend>
      <input type="hidden" name="details.hazards:json" value={JSON.stringify(keys)} />
      <div className="grid gap-x-8 gap-y-1 sm:grid-cols-2">
        {hazards.map((hazard) => (
          <label key={hazard.key} className="flex min-h-11 items-start gap-3 py-2">
            <input
              type="checkbox"
              aria-label={hazard.name}
              checked={keys.includes(hazard.key)}
              onChange={(event) =>
                setKeys(event.target.checked ? [...keys, hazard.key] : keys.filter((key) => key !== hazard.key))
              }
              className="mt-0.5 size-5 shrink-0 accent-spruce"
            />
            <span>
              {hazard.name}
              <span className="block text-13 text-pencil">{hazard.caution}</span>
            </span>
          </label>
        ))}
      </div>
      <FieldError errors={errors} />
    </fieldset>
  );
}

export function NoteFields({
  details,
  unit,
}: {
  readonly details: CampDetails;
  readonly unit: Preferences["lengthUnit"];
}) {
  return (
    <div className="grid gap-5 lg:grid-cols-2">
      <div className="max-w-[12rem] lg:col-span-2">
        <NumberField
          name="details.waterDistanceM"
          label="Water, distance"
          unit={unit}
          defaultValue={lengthInUnit(details.waterDistanceM, unit, 0)}
          hint="One way, on foot."
        />
      </div>
      <TextArea
        name="details.water"
        label="Water"
        rows={3}
        maxLength={500}
        defaultValue={details.water}
        hint="Where, and to be boiled or not."
      />
      <TextArea
        name="details.wayOut"
        label="Way out"
        rows={3}
        maxLength={500}
        defaultValue={details.wayOut}
        hint="By which way down, how long, to which road or phone."
      />
      <TextArea
        name="details.meetingPoint"
        label="Meeting point"
        rows={3}
        maxLength={500}
        defaultValue={details.meetingPoint}
        hint="Where everybody goes when a shelter fails in the night."
      />
      <TextArea
        name="details.notes"
        label="Notes"
        rows={3}
        maxLength={4000}
        defaultValue={details.notes}
        hint="Printed on the field card."
      />
    </div>
  );
}
