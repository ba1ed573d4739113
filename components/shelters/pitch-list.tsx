"use client";

import { useState } from "react";
import { ActionForm, SubmitButton, type FormAction } from "@/components/ui/action-form";
import { Button } from "@/components/ui/button";
import { DeleteButton } from "@/components/forms/delete-button";
import { shelterKind } from "@/lib/calc/shelter-kinds";
import type { Preferences } from "@/lib/domain/preferences";
import { formatCompass } from "@/lib/format/angles";
import { formatLength } from "@/lib/format/lengths";
import { plural } from "@/lib/format/words";
import { PitchForm, type PitchFormValue } from "./pitch-form";

interface PitchListProps {
  readonly tripId: string;
  readonly campId: string;
  readonly pitches: readonly (PitchFormValue & { readonly sleeps: number })[];
  /** The trip's shelters that do not stand here. */
  readonly free: readonly { readonly id: string; readonly name: string; readonly sleeps: number }[];
  readonly hasSecondPatch: boolean;
  readonly wind: { readonly fromDeg: number | null; readonly toDeg: number | null };
  readonly lengthUnit: Preferences["lengthUnit"];
  readonly actions: {
    readonly create: FormAction<null>;
    readonly update: FormAction<null>;
    readonly remove: FormAction<null>;
  };
}

/** What stands at this camp and how; each opens to its numbers and drawing. */
export function PitchList({ tripId, campId, pitches, free, actions, ...shared }: PitchListProps) {
  const [openId, setOpenId] = useState<string | null>(null);
  return (
    <>
      <ul>
        {pitches.map((pitch) => {
          const isOpen = openId === pitch.id;
          return (
            <li key={pitch.id} className="border-t border-hair py-3 first:border-t-0">
              <div className="flex flex-wrap items-center justify-between gap-x-6 gap-y-2">
                <div className="min-w-0">
                  <h3 className="text-15 font-bold">{pitch.name}</h3>
                  <p className="text-13 text-pencil">
                    {describePitch(pitch, shared.hasSecondPatch, shared.lengthUnit)}
                  </p>
                </div>
                <div className="flex flex-wrap gap-1">
                  <Button look="quiet" aria-expanded={isOpen} onClick={() => setOpenId(isOpen ? null : pitch.id)}>
                    {isOpen ? "Close" : "Change"} <span className="sr-only">{pitch.name}</span>
                  </Button>
                  <DeleteButton
                    name={pitch.name}
                    label="Take down"
                    confirmLabel="Take down"
                    action={actions.remove}
                    values={{ tripId, campId, pitchId: pitch.id }}
                  >
                    It is no longer pitched at this camp. The shelter itself stays on the trip.
                  </DeleteButton>
                </div>
              </div>
              {isOpen && (
                <div className="mt-4">
                  <PitchForm action={actions.update} tripId={tripId} campId={campId} pitch={pitch} {...shared} />
                </div>
              )}
            </li>
          );
        })}
      </ul>
      {free.length > 0 && (
        <div className="mt-4 border-t border-hair pt-4">
          <p className="mb-2 text-15 text-pencil">Not pitched here:</p>
          <ul className="flex flex-wrap gap-3">
            {free.map((shelter) => (
              <li key={shelter.id}>
                <ActionForm action={actions.create} doneText={null}>
                  <input type="hidden" name="tripId" value={tripId} />
                  <input type="hidden" name="campId" value={campId} />
                  <input type="hidden" name="shelterId" value={shelter.id} />
                  <SubmitButton look="outline">
                    Pitch {shelter.name}, sleeps {shelter.sleeps}
                  </SubmitButton>
                </ActionForm>
              </li>
            ))}
          </ul>
        </div>
      )}
    </>
  );
}

function describePitch(
  pitch: PitchListProps["pitches"][number],
  hasSecondPatch: boolean,
  unit: Preferences["lengthUnit"],
): string {
  const kind = shelterKind(pitch.spec.kind);
  const height = kind.dimensions.find((row) => row.pitched);
  const heightM = height && (pitch.spec.dimensions[height.key] ?? height.typicalM);
  return [
    kind.name,
    `front to ${formatCompass(pitch.details.headingDeg)}`,
    height && heightM !== undefined ? `${height.label.toLowerCase()} ${formatLength(heightM, unit)}` : null,
    hasSecondPatch ? (pitch.details.patch === "main" ? "main ground" : "second patch") : null,
    plural(pitch.sleeps, "place"),
  ]
    .filter(Boolean)
    .join(" · ");
}
