"use client";

import { useState } from "react";
import { ActionForm, SubmitButton, useFieldErrors, type FormAction } from "@/components/ui/action-form";
import { Chevron } from "@/components/forms/chevron";
import { FieldError } from "@/components/ui/fields";
import type { CarryPlanView } from "@/lib/domain/views";
import { formatMass } from "@/lib/format/masses";

/** Carrier of each shelter, and pieces of each kit item by person. */
interface Loads {
  readonly shelters: Readonly<Record<string, string>>;
  readonly pieces: Readonly<Record<string, Readonly<Record<string, number>>>>;
}

function toLoads(plan: CarryPlanView): Loads {
  return {
    shelters: Object.fromEntries(plan.shelters.map((one) => [one.id, one.carrierId ?? ""])),
    pieces: Object.fromEntries(
      plan.kitItems.map((item) => [item.id, Object.fromEntries(item.carriers.map((one) => [one.personId, one.count]))]),
    ),
  };
}

function toCarries(loads: Loads) {
  return [
    ...Object.entries(loads.shelters).flatMap(([shelterId, personId]) =>
      personId === "" ? [] : [{ type: "shelter", personId, shelterId }],
    ),
    ...Object.entries(loads.pieces).flatMap(([kitItemId, byPerson]) =>
      Object.entries(byPerson).flatMap(([personId, count]) =>
        count > 0 ? [{ type: "kit", personId, kitItemId, count }] : [],
      ),
    ),
  ];
}

const SELECT = "min-h-11 w-full min-w-0 rounded-field border border-pencil bg-sheet px-2 text-15";

/** Who carries what of the group's gear; each load adds up as you choose. */
export function CarryForm({
  action,
  tripId,
  plan,
}: {
  readonly action: FormAction<null>;
  readonly tripId: string;
  readonly plan: CarryPlanView;
}) {
  const [loads, setLoads] = useState(() => toLoads(plan));
  const saved = JSON.stringify(toCarries(toLoads(plan)));
  const [shownSaved, setShownSaved] = useState(saved);
  if (saved !== shownSaved) {
    setShownSaved(saved);
    setLoads(toLoads(plan));
  }
  const massOf = (personId: string) =>
    plan.shelters.reduce((sum, one) => sum + (loads.shelters[one.id] === personId ? (one.massKg ?? 0) : 0), 0) +
    plan.kitItems.reduce((sum, item) => sum + (loads.pieces[item.id]?.[personId] ?? 0) * item.massKgEach, 0);
  const setPieces = (itemId: string, personId: string, count: number) =>
    setLoads({ ...loads, pieces: { ...loads.pieces, [itemId]: { ...loads.pieces[itemId], [personId]: count } } });
  const heaviest = Math.max(0.001, ...plan.people.map((person) => massOf(person.id)));

  return (
    <ActionForm action={action}>
      <input type="hidden" name="tripId" value={tripId} />
      <input type="hidden" name="carries:json" value={JSON.stringify(toCarries(loads))} />
      <CarryErrors />
      <ul aria-label="Loads" className="mb-6 grid gap-x-10 gap-y-3 sm:grid-cols-2">
        {plan.people.map((person) => {
          const massKg = massOf(person.id);
          return (
            <li key={person.id} className="grid grid-cols-[minmax(0,1fr)_auto] items-baseline gap-x-3 text-15">
              <span className="truncate">{person.name}</span>
              <span className="font-semibold">{formatMass(massKg)}</span>
              <span aria-hidden="true" className="col-span-2 mt-1 h-1 bg-hair">
                <span className="block h-full bg-ink" style={{ width: `${(massKg / heaviest) * 100}%` }} />
              </span>
            </li>
          );
        })}
      </ul>
      <ul>
        {plan.shelters.map((shelter) => (
          <li
            key={shelter.id}
            className="grid items-center gap-x-6 gap-y-1 border-t border-hair py-2 sm:grid-cols-[minmax(0,1fr)_16rem]"
          >
            <label htmlFor={`carry-${shelter.id}`} className="text-15 font-semibold">
              {shelter.name}
              {shelter.massKg !== null && (
                <span className="font-normal text-pencil"> {formatMass(shelter.massKg)}</span>
              )}
            </label>
            <select
              id={`carry-${shelter.id}`}
              value={loads.shelters[shelter.id] ?? ""}
              onChange={(event) =>
                setLoads({ ...loads, shelters: { ...loads.shelters, [shelter.id]: event.target.value } })
              }
              className={SELECT}
            >
              <option value="">nobody yet</option>
              {plan.people.map((person) => (
                <option key={person.id} value={person.id}>
                  {person.name}
                </option>
              ))}
            </select>
          </li>
        ))}
        {plan.kitItems.map((item) => {
          const byPerson = loads.pieces[item.id] ?? {};
          const left = item.count - Object.values(byPerson).reduce((sum, count) => sum + count, 0);
          return (
            <li key={item.id} className="border-t border-hair">
              <details className="group">
                <summary className="flex min-h-12 list-none flex-wrap items-center gap-x-3 py-1.5 text-15 [&::-webkit-details-marker]:hidden">
                  <span className="text-spruce">
                    <Chevron />
                  </span>
                  <span className="font-semibold">
                    {item.count} × {item.name}
                  </span>
                  <span className="text-pencil">{formatMass(item.massKgEach)} each</span>
                  <span className={left === 0 ? "text-pencil" : "font-semibold text-ember"}>
                    {left === 0 ? "all carried" : left > 0 ? `${left} not carried yet` : `${-left} too many`}
                  </span>
                </summary>
                <div className="grid grid-cols-[repeat(auto-fill,minmax(8.5rem,1fr))] gap-3 pt-1 pb-4">
                  {plan.people.map((person) => (
                    <label key={person.id} className="flex min-w-0 flex-col gap-1 text-13">
                      <span className="truncate">{person.name}</span>
                      <input
                        type="number"
                        min={0}
                        max={item.count}
                        aria-label={`${item.name}: how many ${person.name} carries`}
                        value={byPerson[person.id] ?? 0}
                        onChange={(event) =>
                          setPieces(item.id, person.id, Math.max(0, event.target.valueAsNumber || 0))
                        }
                        className={SELECT}
                      />
                    </label>
                  ))}
                </div>
              </details>
            </li>
          );
        })}
      </ul>
      <div className="mt-4">
        <SubmitButton>Save the loads</SubmitButton>
      </div>
    </ActionForm>
  );
}

function CarryErrors() {
  return <FieldError errors={useFieldErrors("carries")} />;
}
