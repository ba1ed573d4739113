"use client";

import { useState } from "react";
import { ActionForm, SubmitButton, useFieldErrors, type FormAction } from "@/components/ui/action-form";
import { Button } from "@/components/ui/button";
import { FieldError } from "@/components/ui/fields";
import { readDecimal } from "@/lib/domain/form-data";
import type { LoadPlanView } from "@/lib/domain/pack/load-view";

interface Row {
  readonly key: string;
  readonly id: string | null;
  readonly name: string;
  readonly grams: string;
}

const GRAMS_PER_KILOGRAM = 1000;
const FIELD = "min-h-11 min-w-0 rounded-field border border-pencil bg-sheet px-3 text-15 aria-[invalid]:border-rowan";

const toRow = (thing: LoadPlanView["things"][number]): Row => ({
  key: thing.id,
  id: thing.id,
  name: thing.name,
  grams: String(Math.round(thing.massKg * GRAMS_PER_KILOGRAM)),
});

function toThing({ id, name, grams }: Row) {
  const typed = readDecimal(grams);
  return { id, name, massKg: typeof typed === "number" ? typed / GRAMS_PER_KILOGRAM : typed };
}

/** The group's things that are neither shelter nor kit: stove, first aid, pots. Saved as a whole. */
export function ThingsEditor({
  things,
  tripId,
  action,
}: {
  readonly things: LoadPlanView["things"];
  readonly tripId: string;
  readonly action: FormAction<null>;
}) {
  const [rows, setRows] = useState<readonly Row[]>(() => things.map(toRow));
  const [added, setAdded] = useState(0);
  const saved = JSON.stringify(things);
  const [shownSaved, setShownSaved] = useState(saved);
  if (saved !== shownSaved) {
    setShownSaved(saved);
    setRows(things.map(toRow));
  }
  const change = (key: string, part: Partial<Row>) =>
    setRows(rows.map((row) => (row.key === key ? { ...row, ...part } : row)));
  return (
    <ActionForm action={action}>
      <input type="hidden" name="tripId" value={tripId} />
      <input type="hidden" name="things:json" value={JSON.stringify(rows.map(toThing))} />
      {rows.length === 0 && <p className="mb-3 text-15 text-pencil">Nothing yet: stove, pots, first aid …</p>}
      <ul>
        {rows.map((row, index) => (
          <ThingRow
            key={row.key}
            row={row}
            index={index}
            onChange={(part) => change(row.key, part)}
            onRemove={() => setRows(rows.filter((one) => one.key !== row.key))}
          />
        ))}
      </ul>
      <div className="mt-3 flex flex-wrap gap-3">
        <Button
          onClick={() => {
            setRows([...rows, { key: `new ${added}`, id: null, name: "", grams: "" }]);
            setAdded(added + 1);
          }}
        >
          Add a thing
        </Button>
        <SubmitButton look="outline">Save the things</SubmitButton>
      </div>
    </ActionForm>
  );
}

function ThingRow({
  row,
  index,
  onChange,
  onRemove,
}: {
  readonly row: Row;
  readonly index: number;
  readonly onChange: (part: Partial<Row>) => void;
  readonly onRemove: () => void;
}) {
  const errors = [...useFieldErrors(`things.${index}.name`), ...useFieldErrors(`things.${index}.massKg`)];
  const place = `thing ${index + 1}`;
  return (
    <li className="border-t border-hair py-2">
      <div className="flex flex-wrap items-center gap-x-3 gap-y-1">
        <input
          aria-label={`Name, ${place}`}
          aria-invalid={errors.length > 0 || undefined}
          value={row.name}
          maxLength={80}
          onChange={(event) => onChange({ name: event.target.value })}
          className={`${FIELD} flex-1 basis-48`}
        />
        <span className="flex items-center gap-1">
          <input
            aria-label={`Mass in grams, ${place}`}
            aria-invalid={errors.length > 0 || undefined}
            inputMode="decimal"
            value={row.grams}
            onChange={(event) => onChange({ grams: event.target.value })}
            className={`${FIELD} w-24 text-right`}
          />
          <span className="text-15 text-pencil">g</span>
        </span>
        <Button look="quiet" onClick={onRemove}>
          Remove <span className="sr-only">{row.name || place}</span>
        </Button>
      </div>
      <FieldError errors={errors} />
    </li>
  );
}
