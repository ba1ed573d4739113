"use client";

import { useState } from "react";
import { ActionForm, type FormAction } from "@/components/ui/action-form";
import { NumberField, SelectField, TextField } from "@/components/ui/fields";
import { Section } from "@/components/ui/layout";
import { FABRICS } from "@/lib/calc/tables/fabrics";
import { shelterKind } from "@/lib/calc/shelter-kinds";
import type { ShelterDetails } from "@/lib/domain/shelter/schema";
import type { Preferences } from "@/lib/domain/preferences";
import { readDecimal } from "@/lib/domain/form-data";
import { METRES } from "@/lib/format/factors";
import { ConflictChoice } from "@/components/forms/conflict-choice";
import { LINE_MATERIAL_OPTIONS } from "@/components/forms/options";
import { clockNow, SaveBar, type SaveState } from "@/components/forms/save-bar";
import { lengthInUnit } from "@/components/forms/place/lengths";
import { LineLengthFields } from "./line-length-fields";
import { LiveDrawing } from "./live-drawing";
import { readLengths, useLiveModel } from "./use-live-model";

interface ShelterFormProps {
  readonly action: FormAction<null>;
  readonly details: ShelterDetails;
  /** Ids and version that go along. */
  readonly values: Readonly<Record<string, string>>;
  /** Where the fields stand in the input: "details" or "details.shelter". */
  readonly path?: string;
  readonly lengthUnit: Preferences["lengthUnit"];
  readonly saveLabel: string;
  readonly conflictHref?: string;
}

/** A shelter by its numbers, drawn to scale while they are typed. */
export function ShelterForm({
  action,
  details,
  values,
  path = "details",
  lengthUnit,
  saveLabel,
  conflictHref,
}: ShelterFormProps) {
  const [state, setState] = useState<SaveState>({ kind: "clean" });
  const [name, setName] = useState(details.name);
  const kind = shelterKind(details.spec.kind);
  const [dimensions, setDimensions] = useState<Readonly<Record<string, string>>>(() =>
    Object.fromEntries(
      kind.dimensions.map((row) => [
        row.key,
        lengthInUnit(details.spec.dimensions[row.key] ?? row.typicalM, lengthUnit, 2),
      ]),
    ),
  );
  const [lines, setLines] = useState<Readonly<Record<string, string>>>(() =>
    Object.fromEntries(
      Object.entries(details.spec.lineLengthsM).map(([id, metres]) => [id, lengthInUnit(metres, lengthUnit, 2)]),
    ),
  );
  const [diameter, setDiameter] = useState(String(details.spec.line.diameterMm));
  const typedDiameter = readDecimal(diameter);
  const { model, problems } = useLiveModel({
    ...details.spec,
    dimensions: readLengths(dimensions, METRES[lengthUnit]),
    lineLengthsM: readLengths(lines, METRES[lengthUnit]),
    line: { ...details.spec.line, diameterMm: typeof typedDiameter === "number" ? typedDiameter : 0 },
  });
  const firstProblem = Object.values(problems)[0]?.[0] ?? null;
  const range = (min: number, max: number) =>
    `${lengthInUnit(min, lengthUnit, 2)} to ${lengthInUnit(max, lengthUnit, 2)} ${lengthUnit}`;

  return (
    <ActionForm
      action={action}
      doneText={null}
      onDone={() => setState({ kind: "saved", at: clockNow() })}
      onChange={() => setState({ kind: "dirty" })}
    >
      {Object.entries(values).map(([key, value]) => (
        <input key={key} type="hidden" name={key} value={value} />
      ))}
      <input type="hidden" name="lengthUnit" value={lengthUnit} />
      <input type="hidden" name={`${path}.spec.kind`} value={details.spec.kind} />
      {conflictHref && <ConflictChoice href={conflictHref} />}
      <div className="grid gap-x-10 gap-y-6 lg:grid-cols-[minmax(0,1fr)_minmax(0,26rem)]">
        <div className="order-2 min-w-0 lg:order-1">
          <Section title={kind.name} lead={kind.description}>
            <div className="grid items-start gap-4 sm:grid-cols-3">
              <div className="sm:col-span-3">
                <TextField
                  name={`${path}.name`}
                  label="Name"
                  maxLength={60}
                  value={name}
                  onChange={(event) => setName(event.target.value)}
                />
              </div>
              <NumberField
                name={`${path}.sleeps`}
                label="Sleeps"
                defaultValue={String(details.sleeps)}
                inputMode="numeric"
              />
              <NumberField
                name={`${path}.massKg`}
                label="Mass, all told"
                unit="kg"
                defaultValue={details.massKg === null ? "" : String(details.massKg)}
                hint="May stay empty."
              />
            </div>
          </Section>
          <Section title="Dimensions" lead="Heights can be changed again at each pitch.">
            <div className="grid items-start gap-4 sm:grid-cols-2">
              {kind.dimensions.map((row) => (
                <NumberField
                  key={row.key}
                  name={`${path}.spec.dimensions.${row.key}`}
                  label={row.label}
                  unit={lengthUnit}
                  value={dimensions[row.key] ?? ""}
                  onChange={(event) => setDimensions({ ...dimensions, [row.key]: event.target.value })}
                  errors={problems[`dimensions.${row.key}`]}
                  hint={range(row.minM, row.maxM)}
                />
              ))}
            </div>
          </Section>
          <Section title="Cloth and lines">
            <div className="grid items-start gap-4 sm:grid-cols-3">
              <SelectField
                name={`${path}.spec.fabric`}
                label="Cloth"
                options={FABRICS.map((row) => ({ value: row.id, label: row.name }))}
                defaultValue={details.spec.fabric}
              />
              <SelectField
                name={`${path}.spec.line.material`}
                label="Line"
                options={LINE_MATERIAL_OPTIONS}
                defaultValue={details.spec.line.material}
              />
              <NumberField
                name={`${path}.spec.line.diameterMm`}
                label="Line diameter"
                unit="mm"
                value={diameter}
                onChange={(event) => setDiameter(event.target.value)}
                errors={problems["line.diameterMm"]}
              />
            </div>
            <LineLengthFields
              path={`${path}.spec.lineLengthsM`}
              model={model}
              unit={lengthUnit}
              typed={lines}
              onChange={setLines}
              problems={problems}
            />
          </Section>
        </div>
        <div className="order-1 min-w-0 lg:order-2">
          <div className="lg:sticky lg:top-6">
            <LiveDrawing model={model} name={name || kind.name} problem={firstProblem} />
          </div>
        </div>
      </div>
      <SaveBar state={state} label={saveLabel} />
    </ActionForm>
  );
}
