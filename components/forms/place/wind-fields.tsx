"use client";

import { useState } from "react";
import { WindDial } from "@/components/drawing/wind-dial";
import { ChoiceField, NumberField, SelectField } from "@/components/ui/fields";
import { BEAUFORT } from "@/lib/calc/tables/beaufort";
import { EXPOSURES } from "@/lib/calc/tables/exposure";
import type { CampDetails } from "@/lib/domain/camp/schema";
import type { Preferences } from "@/lib/domain/preferences";
import { speedInUnit } from "@/lib/format/speeds";

type SpeedUnit = Exclude<Preferences["speedUnit"], "Beaufort">;
const SPEED_OPTIONS = (["km/h", "m/s", "mph", "knots"] as const).map((unit) => ({ value: unit, label: unit }));

const STRENGTHS = [
  { value: "", label: "Not known yet" },
  { value: "gust", label: "Gust", detail: "3 s, as in a forecast" },
  { value: "mean", label: "Mean wind", detail: "over ten minutes" },
  { value: "beaufort", label: "Beaufort" },
];

const tenth = (value: number) => String(Math.round(value * 10) / 10);

/** How strong, from where, for how long, and how open the camp lies to it. */
export function WindFields({
  details,
  preferences,
  onChanged,
}: {
  readonly details: CampDetails;
  readonly preferences: Preferences;
  readonly onChanged: () => void;
}) {
  const [kind, setKind] = useState<string>(details.wind?.kind ?? "");
  const unit: SpeedUnit = preferences.speedUnit === "Beaufort" ? "km/h" : preferences.speedUnit;
  const speedMs = details.wind && details.wind.kind !== "beaufort" ? details.wind.speedMs : null;
  return (
    <div className="flex flex-col gap-8">
      <div className="flex flex-col gap-4">
        <ChoiceField
          legend="How strong"
          name="details.wind.kind"
          options={STRENGTHS}
          defaultValue={kind}
          onChange={setKind}
          hint="The strongest of the stay, at 10 m over open ground."
        />
        {(kind === "gust" || kind === "mean") && (
          <div className="grid max-w-[26rem] grid-cols-2 gap-4">
            <NumberField
              name="details.wind.speedMs"
              label={kind === "gust" ? "Gust" : "Mean wind"}
              defaultValue={speedMs === null ? "" : tenth(speedInUnit(speedMs, unit))}
            />
            <SelectField name="speedUnit" label="Unit" options={SPEED_OPTIONS} defaultValue={unit} />
          </div>
        )}
        {kind === "beaufort" && (
          <div className="max-w-[26rem]">
            <SelectField
              name="details.wind.number:number"
              label="Beaufort number"
              placeholder="Choose"
              options={BEAUFORT.map((row) => ({ value: String(row.number), label: `${row.number} · ${row.name}` }))}
              defaultValue={details.wind?.kind === "beaufort" ? String(details.wind.number) : ""}
            />
          </div>
        )}
      </div>
      <WindDial fromDeg={details.windFromDeg} toDeg={details.windToDeg} onChange={onChanged} />
      <div className="max-w-[16rem]">
        <NumberField
          name="details.strongWindHours"
          label="Strong wind lasts"
          unit="h"
          defaultValue={details.strongWindHours === null ? "" : String(details.strongWindHours)}
          hint="Hours of it in one night. Without them no morning margin."
        />
      </div>
      <ChoiceField
        legend="How open the camp lies"
        name="details.exposure:nullable"
        options={[
          { value: "", label: "Not known yet" },
          ...EXPOSURES.map((row) => ({ value: row.category, label: row.name, detail: row.campSign })),
        ]}
        defaultValue={details.exposure ?? ""}
      />
    </div>
  );
}
