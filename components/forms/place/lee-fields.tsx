"use client";

import { useState, type ReactNode } from "react";
import { NumberField, SelectField } from "@/components/ui/fields";
import { WINDBREAKS } from "@/lib/calc/tables/windbreaks";
import type { CampDetails } from "@/lib/domain/camp/schema";
import type { Preferences } from "@/lib/domain/preferences";
import { lengthInUnit } from "./lengths";

type LengthUnit = Preferences["lengthUnit"];

/** What changes the wind between the forecast and the shelter: a hill, a windbreak, trees overhead. */
export function LeeFields({ details, unit }: { readonly details: CampDetails; readonly unit: LengthUnit }) {
  const { hill, windbreak } = details;
  const typed = (metres: number | undefined) => lengthInUnit(metres ?? null, unit);
  return (
    <div className="flex flex-col gap-6">
      <Revealed name="hasHill" label="A hill, ridge or cliff speeds the wind up here" isOpen={hill !== null}>
        <SelectField
          name="details.hill.shape"
          label="Shape"
          options={[
            { value: "hill", label: "Hill or ridge" },
            { value: "cliff", label: "Cliff or scarp" },
          ]}
          defaultValue={hill?.shape ?? "hill"}
        />
        <NumberField name="details.hill.heightM" label="Its height" unit={unit} defaultValue={typed(hill?.heightM)} />
        <NumberField
          name="details.hill.upwindLengthM"
          label="Windward slope, length on the map"
          unit={unit}
          defaultValue={typed(hill?.upwindLengthM)}
        />
        <NumberField
          name="details.hill.downwindLengthM"
          label="Lee slope, length on the map"
          unit={unit}
          defaultValue={typed(hill?.downwindLengthM)}
        />
        <NumberField
          name="details.hill.fromCrestM"
          label="Camp to crest"
          unit={unit}
          hint="Negative on the windward side."
          defaultValue={typed(hill?.fromCrestM)}
        />
      </Revealed>
      <Revealed name="hasWindbreak" label="A windbreak stands upwind" isOpen={windbreak !== null}>
        <SelectField
          name="details.windbreak.kind"
          label="What it is"
          options={WINDBREAKS.map((row) => ({ value: row.kind, label: row.name }))}
          defaultValue={windbreak?.kind ?? "deciduous-row"}
        />
        <NumberField
          name="details.windbreak.heightM"
          label="Its height"
          unit={unit}
          defaultValue={typed(windbreak?.heightM)}
        />
        <NumberField
          name="details.windbreak.distanceM"
          label="Distance to the shelters"
          unit={unit}
          defaultValue={typed(windbreak?.distanceM)}
        />
      </Revealed>
      <div className="max-w-[26rem]">
        <NumberField
          name="details.underTreesSpeedRatio"
          label="Wind left under the trees"
          unit="%"
          defaultValue={
            details.underTreesSpeedRatio === null ? "" : String(Math.round(details.underTreesSpeedRatio * 100))
          }
          hint="Your judgement, 30 to 100. Empty: no trees over the camp."
        />
      </div>
    </div>
  );
}

function Revealed({
  name,
  label,
  isOpen,
  children,
}: {
  readonly name: string;
  readonly label: string;
  readonly isOpen: boolean;
  readonly children: ReactNode;
}) {
  const [isShown, setIsShown] = useState(isOpen);
  return (
    <div>
      <label className="flex min-h-11 items-center gap-3">
        <input
          type="checkbox"
          name={`${name}:boolean`}
          value="true"
          checked={isShown}
          onChange={(event) => setIsShown(event.target.checked)}
          className="size-5 shrink-0 accent-spruce"
        />
        <span className="font-semibold">{label}</span>
      </label>
      {isShown && (
        <div className="mt-2 grid items-start gap-4 border-l-2 border-hair pl-5 sm:grid-cols-2 lg:grid-cols-3">
          {children}
        </div>
      )}
    </div>
  );
}
