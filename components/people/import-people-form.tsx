"use client";

import { useState } from "react";
import { ActionForm, SubmitButton, useFieldErrors, type FormAction } from "@/components/ui/action-form";
import { TextArea } from "@/components/ui/fields";
import type { Role } from "@/lib/domain/permissions/permissions";

export interface ImportResult {
  readonly isDone: boolean;
  readonly people: readonly { readonly name: string; readonly email: string; readonly role: Role }[];
}

async function readText(file: File): Promise<string> {
  const bytes = await file.arrayBuffer();
  try {
    return new TextDecoder("utf-8", { fatal: true }).decode(bytes);
  } catch {
    // What spreadsheets on older machines write.
    return new TextDecoder("windows-1252").decode(bytes);
  }
}

/** Many at once from a CSV file: looked at first, then everybody or nobody. */
export function ImportPeopleForm({
  action,
  tripId,
}: {
  readonly action: FormAction<ImportResult>;
  readonly tripId: string;
}) {
  const [csv, setCsv] = useState("");
  const [checked, setChecked] = useState<ImportResult | null>(null);
  return (
    <ActionForm
      action={action}
      className="flex max-w-[46rem] flex-col gap-4"
      onDone={(result) => {
        setChecked(result.isDone ? null : result);
        if (result.isDone) setCsv("");
      }}
    >
      <input type="hidden" name="tripId" value={tripId} />
      <label className="flex flex-col gap-1 text-15 font-semibold">
        CSV file
        <input
          type="file"
          accept=".csv,text/csv,text/plain"
          className="min-h-11 text-15 font-normal file:mr-4 file:min-h-11 file:rounded-field file:border file:border-spruce file:bg-transparent file:px-4 file:font-semibold file:text-spruce"
          onChange={(event) => {
            const file = event.target.files?.[0];
            setChecked(null);
            if (file) void readText(file).then(setCsv);
          }}
        />
      </label>
      <TextArea
        name="csv"
        label="Its lines"
        rows={5}
        value={csv}
        onChange={(event) => {
          setCsv(event.target.value);
          setChecked(null);
        }}
        placeholder={"name,email,role\nAda Moss,ada@example.org,participant"}
        errors={[]}
        hint="The first line names the columns: name, email and, if you like, role. At most 60 people."
      />
      <Faults />
      {checked && (
        <div>
          <p className="text-15 font-semibold">
            {checked.people.length === 1 ? "1 person" : `${checked.people.length} people`}
          </p>
          <ul className="mt-1 text-15">
            {checked.people.map((one) => (
              <li key={one.email} className="border-t border-hair py-1.5 break-words">
                {one.name}, <span className="text-pencil">{one.email}</span>, {one.role}
              </li>
            ))}
          </ul>
        </div>
      )}
      <div>
        {checked ? (
          <SubmitButton>Add and invite them all</SubmitButton>
        ) : (
          <SubmitButton look="outline" name="isTrial:boolean" value="true">
            Look who is in it
          </SubmitButton>
        )}
      </div>
    </ActionForm>
  );
}

function Faults() {
  const lines = useFieldErrors("csv");
  if (lines.length === 0) return null;
  return (
    <ul className="border-l-4 border-rowan pl-4 text-15 text-rowan">
      {lines.map((line) => (
        <li key={line}>{line}</li>
      ))}
    </ul>
  );
}
