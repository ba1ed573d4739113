"use client";

import { useState } from "react";
import { ActionForm, SubmitButton, type FormAction } from "@/components/ui/action-form";
import { ChoiceField, NumberField } from "@/components/ui/fields";
import { ConflictChoice } from "@/components/forms/conflict-choice";
import { lengthInUnit } from "@/components/forms/place/lengths";
import { shelterKind } from "@/lib/calc/shelter-kinds";
import type { ShelterSpec } from "@/lib/calc/types";
import type { Preferences } from "@/lib/domain/preferences";
import { readDecimal } from "@/lib/domain/form-data";
import type { PitchDetails } from "@/lib/domain/shelter/schema";
import { formatCompass } from "@/lib/format/angles";
import { METRES } from "@/lib/format/factors";
import { LineLengthFields } from "./line-length-fields";
import { LiveDrawing } from "./live-drawing";
import { readLengths, useLiveModel } from "./use-live-model";

export interface PitchFormValue {
  readonly id: string;
  readonly name: string;
  readonly details: PitchDetails;
  readonly version: number;
  /** The shelter with this pitch laid over it. */
  readonly spec: ShelterSpec;
}

interface PitchFormProps {
  readonly action: FormAction<null>;
  readonly tripId: string;
  readonly campId: string;
  readonly pitch: PitchFormValue;
  readonly hasSecondPatch: boolean;
  readonly wind: { readonly fromDeg: number | null; readonly toDeg: number | null };
  readonly lengthUnit: Preferences["lengthUnit"];
}

/** How a shelter stands here: which way its front looks, on which patch, how high, on which lines. */
export function PitchForm({ action, tripId, campId, pitch, hasSecondPatch, wind, lengthUnit }: PitchFormProps) {
  const { details, spec } = pitch;
  const pitched = shelterKind(spec.kind).dimensions.filter((row) => row.pitched);
  const [heading, setHeading] = useState(String(details.headingDeg));
  const [heights, setHeights] = useState<Readonly<Record<string, string>>>(() =>
    Object.fromEntries(
      pitched.map((row) => [row.key, lengthInUnit(spec.dimensions[row.key] ?? row.typicalM, lengthUnit, 2)]),
    ),
  );
  const [lines, setLines] = useState<Readonly<Record<string, string>>>(() =>
    Object.fromEntries(
      Object.entries(details.lineLengthsM).map(([id, metres]) => [id, lengthInUnit(metres, lengthUnit, 2)]),
    ),
  );
  const { model, problems } = useLiveModel({
    ...spec,
    dimensions: { ...spec.dimensions, ...readLengths(heights, METRES[lengthUnit]) },
    lineLengthsM: { ...spec.lineLengthsM, ...readLengths(lines, METRES[lengthUnit]) },
  });
  const headingDeg = readDecimal(heading);
  const knownHeading = typeof headingDeg === "number" && headingDeg >= 0 && headingDeg <= 360 ? headingDeg : 0;
  return (
    <ActionForm action={action}>
      <input type="hidden" name="tripId" value={tripId} />
      <input type="hidden" name="campId" value={campId} />
      <input type="hidden" name="pitchId" value={pitch.id} />
      <input type="hidden" name="version:number" value={pitch.version} />
      <input type="hidden" name="lengthUnit" value={lengthUnit} />
      <ConflictChoice href={`/trips/${tripId}/camps/${campId}/shelters`} />
      <div className="grid gap-8 md:grid-cols-[minmax(0,1fr)_minmax(0,22rem)]">
        <div className="flex min-w-0 flex-col gap-5">
          <div className="grid items-start gap-4 sm:grid-cols-2">
            <NumberField
              name="details.headingDeg"
              label="Front looks to"
              unit="°"
              value={heading}
              onChange={(event) => setHeading(event.target.value)}
              hint={`${formatCompass(knownHeading)}; true bearing, clockwise from north.`}
            />
            {pitched.map((row) => (
              <NumberField
                key={row.key}
                name={`details.dimensions.${row.key}`}
                label={row.label}
                unit={lengthUnit}
                value={heights[row.key] ?? ""}
                onChange={(event) => setHeights({ ...heights, [row.key]: event.target.value })}
                errors={problems[`dimensions.${row.key}`]}
                hint={`${lengthInUnit(row.minM, lengthUnit, 2)} to ${lengthInUnit(row.maxM, lengthUnit, 2)} ${lengthUnit}`}
              />
            ))}
          </div>
          {hasSecondPatch ? (
            <ChoiceField
              legend="Pitched on"
              name="details.patch"
              options={[
                { value: "main", label: "the main ground" },
                { value: "second", label: "the second patch" },
              ]}
              defaultValue={details.patch}
            />
          ) : (
            <input type="hidden" name="details.patch" value="main" />
          )}
          <LineLengthFields
            path="details.lineLengthsM"
            model={model}
            unit={lengthUnit}
            typed={lines}
            onChange={setLines}
            problems={problems}
          />
          <div>
            <SubmitButton look="outline">Save how it stands</SubmitButton>
          </div>
        </div>
        <LiveDrawing
          model={model}
          name={pitch.name}
          headingDeg={knownHeading}
          isPitched
          wind={wind}
          problem={Object.values(problems)[0]?.[0] ?? null}
        />
      </div>
    </ActionForm>
  );
}
