"use client";

import { useState } from "react";
import { ActionForm, SubmitButton, useFieldErrors, type FormAction } from "@/components/ui/action-form";
import { Button } from "@/components/ui/button";
import { FieldError } from "@/components/ui/fields";
import { readDecimal } from "@/lib/domain/form-data";
import type { PackItemView } from "@/lib/domain/views";

interface Row {
  readonly key: string;
  readonly id: string | null;
  readonly name: string;
  readonly grams: string;
  readonly isGroupThing: boolean;
}

const GRAMS_PER_KILOGRAM = 1000;

function toRow(item: PackItemView): Row {
  const grams = item.massKg === null ? "" : String(Math.round(item.massKg * GRAMS_PER_KILOGRAM));
  return { key: item.id, id: item.id, name: item.name, grams, isGroupThing: item.isGroupThing };
}

function toItem({ id, name, grams, isGroupThing }: Row) {
  const typed = readDecimal(grams);
  return { id, name, isGroupThing, massKg: typeof typed === "number" ? typed / GRAMS_PER_KILOGRAM : typed };
}

/** The lines of one list, saved as a whole: names, and grams where somebody has weighed it. */
export function PackListEditor({
  action,
  tripId,
  personId,
  items,
}: {
  readonly action: FormAction<null>;
  readonly tripId: string;
  /** Null: what everybody brings. */
  readonly personId: string | null;
  readonly items: readonly PackItemView[];
}) {
  const [rows, setRows] = useState<readonly Row[]>(() => items.map(toRow));
  const [added, setAdded] = useState(0);
  const saved = JSON.stringify(items);
  const [shownSaved, setShownSaved] = useState(saved);
  if (saved !== shownSaved) {
    setShownSaved(saved);
    setRows(items.map(toRow));
  }
  const change = (key: string, part: Partial<Row>) =>
    setRows(rows.map((row) => (row.key === key ? { ...row, ...part } : row)));
  return (
    <ActionForm action={action}>
      <input type="hidden" name="tripId" value={tripId} />
      <input type="hidden" name="personId:nullable" value={personId ?? ""} />
      <input type="hidden" name="items:json" value={JSON.stringify(rows.map(toItem))} />
      {rows.length === 0 && <p className="mb-3 text-15 text-pencil">No lines yet.</p>}
      <ul>
        {rows.map((row, index) => (
          <PackRow
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
            setRows([...rows, { key: `new ${added}`, id: null, name: "", grams: "", isGroupThing: false }]);
            setAdded(added + 1);
          }}
        >
          Add a line
        </Button>
        <SubmitButton>Save the list</SubmitButton>
      </div>
    </ActionForm>
  );
}

const FIELD = "min-h-11 min-w-0 rounded-field border border-pencil bg-sheet px-3 text-15 aria-[invalid]:border-rowan";

function PackRow({
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
  const errors = [...useFieldErrors(`items.${index}.name`), ...useFieldErrors(`items.${index}.massKg`)];
  const place = `line ${index + 1}`;
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
            inputMode="decimal"
            value={row.grams}
            onChange={(event) => onChange({ grams: event.target.value })}
            className={`${FIELD} w-20 text-right`}
          />
          <span className="text-15 text-pencil">g</span>
        </span>
        <label className="flex min-h-11 items-center gap-2 text-15">
          <input
            type="checkbox"
            checked={row.isGroupThing}
            onChange={(event) => onChange({ isGroupThing: event.target.checked })}
            className="size-5 accent-spruce"
          />
          for the group<span className="sr-only">, {place}</span>
        </label>
        <Button look="quiet" onClick={onRemove}>
          Remove <span className="sr-only">{row.name || place}</span>
        </Button>
      </div>
      <FieldError errors={errors} />
    </li>
  );
}
