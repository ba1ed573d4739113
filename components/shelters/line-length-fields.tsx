"use client";

import { Chevron } from "@/components/forms/chevron";
import { NumberField } from "@/components/ui/fields";
import { lengthInUnit } from "@/components/forms/place/lengths";
import type { ShelterModel } from "@/lib/calc/types";
import type { Preferences } from "@/lib/domain/preferences";
import { formatAngle } from "@/lib/format/angles";

/** A line's length at each tie-out; empty takes the usual one, which stands beside it with the angle it gives. */
export function LineLengthFields({
  path,
  model,
  unit,
  typed,
  onChange,
  problems,
}: {
  readonly path: string;
  readonly model: ShelterModel;
  readonly unit: Preferences["lengthUnit"];
  readonly typed: Readonly<Record<string, string>>;
  readonly onChange: (typed: Readonly<Record<string, string>>) => void;
  readonly problems: Readonly<Record<string, readonly string[]>>;
}) {
  const withLine = model.tieOuts.filter((tie) => tie.lineLengthM > 0);
  if (withLine.length === 0) return null;
  return (
    <details className="group mt-5">
      <summary className="flex min-h-11 list-none items-center gap-2 font-semibold text-spruce [&::-webkit-details-marker]:hidden">
        <Chevron />
        Length of each line ({withLine.length})
      </summary>
      <p className="mb-4 text-13 text-pencil">
        Empty takes the usual length. A longer line lies flatter and pulls less upwards.
      </p>
      <div className="grid items-start gap-4 sm:grid-cols-2">
        {withLine.map((tie) => (
          <NumberField
            key={tie.id}
            name={`${path}.${tie.id}`}
            label={`${tie.number} ${tie.name}`}
            unit={unit}
            value={typed[tie.id] ?? ""}
            onChange={(event) => onChange({ ...typed, [tie.id]: event.target.value })}
            errors={problems[`lineLengthsM.${tie.id}`]}
            hint={`now ${lengthInUnit(tie.lineLengthM, unit, 2)} ${unit} at ${formatAngle(tie.lineAngleDeg)}`}
          />
        ))}
      </div>
    </details>
  );
}
