"use client";

import { useState } from "react";
import { ActionForm, SubmitButton, type FormAction } from "@/components/ui/action-form";
import { ChoiceField, NumberField, SelectField, TextField } from "@/components/ui/fields";
import { ConflictChoice } from "@/components/forms/conflict-choice";
import { LINE_MATERIAL_OPTIONS } from "@/components/forms/options";
import type { KitItemDetails } from "@/lib/domain/kit/schema";
import { AnchorSpecFields } from "./anchor-spec-fields";

const TYPES = [
  { value: "anchor", label: "Anchor" },
  { value: "cord", label: "Cord" },
  { value: "shock-cord", label: "Shock cord" },
] as const;

interface KitItemFormProps {
  readonly action: FormAction<null>;
  /** Null: a new entry. */
  readonly details: KitItemDetails | null;
  readonly values: Readonly<Record<string, string>>;
  readonly path?: string;
  readonly saveLabel: string;
  readonly conflictHref?: string;
}

/** An own anchor, cord or shock cord. Sizes in millimetres, mass in grams. */
export function KitItemForm({ action, details, values, path = "details", saveLabel, conflictHref }: KitItemFormProps) {
  const [type, setType] = useState<KitItemDetails["type"]>(details?.type ?? "anchor");
  const grams = details ? String(Math.round(details.massKg * 10_000) / 10) : "";
  return (
    <ActionForm action={action} className="flex max-w-[46rem] flex-col gap-5">
      {Object.entries(values).map(([key, value]) => (
        <input key={key} type="hidden" name={key} value={value} />
      ))}
      {conflictHref && <ConflictChoice href={conflictHref} />}
      {details ? (
        <input type="hidden" name={`${path}.type`} value={type} />
      ) : (
        <ChoiceField
          legend="What it is"
          name={`${path}.type`}
          options={TYPES}
          defaultValue={type}
          onChange={(value) => setType(TYPES.find((one) => one.value === value)?.value ?? "anchor")}
        />
      )}
      <TextField name={`${path}.name`} label="Name" maxLength={60} defaultValue={details?.name ?? ""} />
      {type === "anchor" && (
        <AnchorSpecFields path={`${path}.spec`} spec={details?.type === "anchor" ? details.spec : null} />
      )}
      {type === "cord" && (
        <div className="grid items-start gap-4 sm:grid-cols-3">
          <SelectField
            name={`${path}.material`}
            label="Material"
            options={LINE_MATERIAL_OPTIONS}
            defaultValue={details?.type === "cord" ? details.material : "polyester"}
          />
          <NumberField
            name={`${path}.diameterMm`}
            label="Diameter"
            unit="mm"
            defaultValue={details?.type === "cord" ? String(details.diameterMm) : ""}
          />
          <LengthField path={path} details={details} />
        </div>
      )}
      {type === "shock-cord" && (
        <div className="grid items-start gap-4 sm:grid-cols-3">
          <LengthField path={path} details={details} />
        </div>
      )}
      <div className="grid items-start gap-4 sm:grid-cols-3">
        <NumberField name={`${path}.massKg`} label="Mass of one" unit="g" defaultValue={grams} />
        <NumberField
          name={`${path}.count`}
          label="How many"
          inputMode="numeric"
          defaultValue={details ? String(details.count) : ""}
        />
      </div>
      <div>
        <SubmitButton>{saveLabel}</SubmitButton>
      </div>
    </ActionForm>
  );
}

function LengthField({ path, details }: { readonly path: string; readonly details: KitItemDetails | null }) {
  return (
    <NumberField
      name={`${path}.lengthM`}
      label="Length of one piece"
      unit="m"
      defaultValue={details && details.type !== "anchor" ? String(details.lengthM) : ""}
    />
  );
}
