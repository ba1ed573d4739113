"use client";

import { useState } from "react";
import { NumberField, SelectField } from "@/components/ui/fields";
import { MATERIALS } from "@/lib/calc/tables/materials";
import type { AnchorSpec } from "@/lib/calc/types";
import {
  CLASS_FIELDS,
  CLASSES,
  CLASSES_WITH_MATERIAL,
  inMillimetres,
  partM,
  SECTION_FIELDS,
  SECTIONS,
} from "./anchor-parts";

/** Class, section and sizes of an anchor; only what this class has is asked for. */
export function AnchorSpecFields({ path, spec }: { readonly path: string; readonly spec: AnchorSpec | null }) {
  const [kind, setKind] = useState<AnchorSpec["class"]>(spec?.class ?? "stake");
  const section = spec?.class === "stake" ? spec.section : null;
  const [shape, setShape] = useState(section?.shape ?? "three-blade");
  const same = spec?.class === kind ? spec : undefined;
  const material = same && "material" in same ? same.material : "aluminium-7075";
  return (
    <>
      <div className="grid items-start gap-4 sm:grid-cols-3">
        <SelectField
          name={`${path}.class`}
          label="Class"
          options={CLASSES}
          value={kind}
          onChange={(event) => setKind(CLASSES.find((one) => one.value === event.target.value)?.value ?? "stake")}
        />
        {kind === "stake" && (
          <SelectField
            name={`${path}.section.shape`}
            label="Section"
            options={SECTIONS}
            value={shape}
            onChange={(event) =>
              setShape(SECTIONS.find((one) => one.value === event.target.value)?.value ?? "three-blade")
            }
          />
        )}
        {CLASSES_WITH_MATERIAL.includes(kind) && (
          <SelectField
            name={`${path}.material`}
            label="Material"
            options={MATERIALS.map((row) => ({ value: row.id, label: row.name }))}
            defaultValue={material}
          />
        )}
      </div>
      <div className="grid items-start gap-4 sm:grid-cols-3">
        {CLASS_FIELDS[kind].map((field) => (
          <NumberField
            key={`${kind} ${field.key}`}
            name={`${path}.${field.key}`}
            label={field.label}
            unit="mm"
            defaultValue={inMillimetres(partM(same, field.key))}
          />
        ))}
        {kind === "stake" &&
          SECTION_FIELDS[shape].map((field) => (
            <NumberField
              key={`${shape} ${field.key}`}
              name={`${path}.section.${field.key}`}
              label={field.label}
              unit="mm"
              defaultValue={inMillimetres(section?.shape === shape ? partM(section, field.key) : null)}
            />
          ))}
        {kind === "stake" && (
          <NumberField
            name={`${path}.headRatingN`}
            label="Rating of the head"
            unit="N"
            defaultValue={spec?.class === "stake" && spec.headRatingN !== null ? String(spec.headRatingN) : ""}
            hint="As printed on it. May stay empty."
          />
        )}
        {kind === "surface-weight" && (
          <NumberField
            name={`${path}.massKg`}
            label="Mass when filled"
            unit="kg"
            defaultValue={spec?.class === "surface-weight" ? String(spec.massKg) : ""}
          />
        )}
        {kind === "fixed" && (
          <NumberField
            name={`${path}.ratingN`}
            label="Rating"
            unit="N"
            defaultValue={spec?.class === "fixed" && spec.ratingN !== null ? String(spec.ratingN) : ""}
            hint="Without a rating it needs a pull test."
          />
        )}
      </div>
    </>
  );
}
