"use client";

import { useState } from "react";
import { AnchorMark } from "@/components/drawing/anchor-mark";
import { ActionForm, SubmitButton, useFieldErrors, type FormAction } from "@/components/ui/action-form";
import { FieldError } from "@/components/ui/fields";
import type { KitItemDetails } from "@/lib/domain/kit/schema";
import { formatAnchorSpec } from "@/lib/format/anchors";
import { formatMass } from "@/lib/format/masses";
import { startSentence } from "@/lib/format/words";

export interface LibraryAnchor {
  readonly id: string;
  readonly details: Extract<KitItemDetails, { type: "anchor" }>;
  readonly note: string;
  readonly inKit: number;
}

/** Anchors to choose from, each with its count field; adding one leaves you here for the next. */
export function AnchorLibrary({
  tripId,
  anchors,
  action,
}: {
  readonly tripId: string;
  readonly anchors: readonly LibraryAnchor[];
  readonly action: FormAction<null>;
}) {
  return (
    <ul className="grid gap-x-10 lg:grid-cols-2">
      {anchors.map((anchor) => (
        <li
          key={anchor.id}
          className="grid grid-cols-[2.75rem_minmax(0,1fr)] gap-x-3 border-t border-hair py-3 sm:grid-cols-[2.75rem_minmax(0,1fr)_auto]"
        >
          <AnchorMark spec={anchor.details.spec} size={38} />
          <div className="min-w-0">
            <h3 className="text-15 font-bold">{anchor.details.name}</h3>
            <p className="text-13 text-pencil">
              {startSentence(formatAnchorSpec(anchor.details.spec))} · {formatMass(anchor.details.massKg)}
            </p>
            <p className="text-13 text-pencil">{anchor.note}</p>
            {anchor.inKit > 0 && <p className="text-13 font-semibold">{anchor.inKit} in the kit</p>}
          </div>
          <AddForm tripId={tripId} anchor={anchor} action={action} />
        </li>
      ))}
    </ul>
  );
}

function AddForm({
  tripId,
  anchor,
  action,
}: {
  readonly tripId: string;
  readonly anchor: LibraryAnchor;
  readonly action: FormAction<null>;
}) {
  const [count, setCount] = useState("4");
  const whole = Number.parseInt(count, 10);
  const details = { ...anchor.details, count: Number.isFinite(whole) ? whole : count };
  return (
    <ActionForm action={action} className="col-start-2 sm:col-start-3">
      <input type="hidden" name="tripId" value={tripId} />
      <input type="hidden" name="details:json" value={JSON.stringify(details)} />
      <CountErrors />
      <div className="flex items-center gap-2">
        <input
          type="text"
          inputMode="numeric"
          aria-label={`How many ${anchor.details.name}`}
          value={count}
          onChange={(event) => setCount(event.target.value)}
          className="min-h-11 w-14 rounded-field border border-pencil bg-sheet px-2 text-center"
        />
        <SubmitButton look="outline">
          Add <span className="sr-only">{anchor.details.name}</span>
        </SubmitButton>
      </div>
    </ActionForm>
  );
}

function CountErrors() {
  return <FieldError errors={useFieldErrors("details.count")} />;
}
