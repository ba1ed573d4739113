"use client";

import { NumberField, SelectField, TextField } from "@/components/ui/fields";
import { GROUNDS } from "@/lib/calc/tables/grounds";

export interface PracticeGroundStart {
  readonly place: string;
  readonly kind: string;
  readonly looseTopM: number | null;
  readonly stoneDepthM: number | null;
}

const KINDS = GROUNDS.filter((row) => row.model.kind !== "undriveable").map((row) => ({
  value: row.kind,
  label: row.name,
}));
const centimetres = (metres: number | null) => (metres === null ? "" : String(Math.round(metres * 1000) / 10));

/** Where somebody practises, and in what. */
export function PracticeGroundFields({ start }: { readonly start: PracticeGroundStart }) {
  return (
    <>
      <TextField
        name="reading.place"
        label="Place"
        maxLength={60}
        defaultValue={start.place}
        hint="For you: field behind the barn"
      />
      <SelectField
        name="reading.kind"
        label="Kind of ground"
        options={KINDS}
        placeholder="Choose"
        defaultValue={start.kind}
      />
      <details open={start.looseTopM !== null || start.stoneDepthM !== null}>
        <summary className="min-h-11 content-center text-15 font-semibold text-spruce">Loose top or stones</summary>
        <div className="grid grid-cols-2 gap-3">
          <NumberField
            name="reading.looseTopM"
            label="Loose top layer"
            unit="cm"
            defaultValue={centimetres(start.looseTopM)}
            hint="Empty: as usual in this ground."
          />
          <NumberField
            name="reading.stoneDepthM"
            label="Stones at"
            unit="cm"
            defaultValue={centimetres(start.stoneDepthM)}
            hint="Empty: none met."
          />
        </div>
      </details>
    </>
  );
}
