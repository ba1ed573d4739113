"use client";

import { useState } from "react";
import { ActionForm, SubmitButton, type FormAction } from "@/components/ui/action-form";
import { Section } from "@/components/ui/layout";
import type { RouteView } from "@/lib/domain/route/views";
import type { Preferences } from "@/lib/domain/preferences";
import { formatDistance } from "@/lib/format/distances";
import { formatAltitude } from "@/lib/format/lengths";

/** Places that the file names, to become camps; those that are camps already are left out. */
export function PlacesToCamps({
  view,
  unit,
  action,
}: {
  readonly view: RouteView;
  readonly unit: Preferences["lengthUnit"];
  readonly action: FormAction<null>;
}) {
  const [chosen, setChosen] = useState<readonly number[]>([]);
  const names = new Set(view.stops.map((stop) => stop.name));
  const places = (view.line?.places ?? [])
    .map((place, index) => ({ ...place, index }))
    .filter((place) => !names.has(place.name));
  if (places.length === 0) return null;
  return (
    <Section
      title="Places in the file"
      lead="Choose those where you camp: each becomes a camp of one night, in the order of the way."
    >
      <ActionForm action={action} onDone={() => setChosen([])}>
        <input type="hidden" name="tripId" value={view.tripId} />
        <input type="hidden" name="places:json" value={JSON.stringify(chosen)} />
        <ul className="mb-4 grid gap-x-8 sm:grid-cols-2">
          {places.map((place) => (
            <li key={place.index}>
              <label className="flex min-h-11 items-center gap-3">
                <input
                  type="checkbox"
                  className="size-5 shrink-0 accent-spruce"
                  checked={chosen.includes(place.index)}
                  onChange={(event) =>
                    setChosen((now) =>
                      event.target.checked ? [...now, place.index] : now.filter((one) => one !== place.index),
                    )
                  }
                />
                <span className="min-w-0">
                  {place.name}
                  <span className="block text-13 text-pencil">
                    {formatDistance(place.atM, unit)} along
                    {place.offM > 50 && `, ${formatDistance(place.offM, unit)} beside the line`}
                    {place.heightM !== null && `, ${formatAltitude(place.heightM, unit)}`}
                  </span>
                </span>
              </label>
            </li>
          ))}
        </ul>
        <SubmitButton>Make them camps</SubmitButton>
      </ActionForm>
    </Section>
  );
}
