"use client";

import { useRouter } from "next/navigation";
import { useId, useRef, useState } from "react";
import { Button, buttonClass } from "@/components/ui/button";
import { plural } from "@/lib/format/words";

interface Refusal {
  readonly message: string;
  readonly cells: readonly (readonly [place: string, reason: string])[];
}

type Outcome = { readonly added: number; readonly known: number } | Refusal;

async function sendTable(address: string, file: Blob): Promise<Outcome> {
  try {
    const response = await fetch(address, { method: "POST", headers: { "Content-Type": "text/csv" }, body: file });
    const answer = (await response.json()) as {
      added?: number;
      known?: number;
      error?: { message: string; fieldErrors: Record<string, string[]> };
    };
    if (response.ok) return { added: answer.added ?? 0, known: answer.known ?? 0 };
    const cells = Object.entries(answer.error?.fieldErrors ?? {}).map(
      ([at, reasons]) => [at, reasons.join(" ")] as const,
    );
    return { message: answer.error?.message ?? "The server did not take it. Nothing was saved.", cells };
  } catch {
    return { message: "No connection. Nothing was saved.", cells: [] };
  }
}

/** Readings out as a table and in again: all rows or none, with each cell that is not right. */
export function TableInOut({ address, columns }: { readonly address: string; readonly columns: readonly string[] }) {
  const id = useId();
  const router = useRouter();
  const input = useRef<HTMLInputElement>(null);
  const [isBusy, setIsBusy] = useState(false);
  const [outcome, setOutcome] = useState<Outcome | null>(null);

  const send = async () => {
    const file = input.current?.files?.[0];
    if (!file) return setOutcome({ message: "Choose a file first.", cells: [] });
    setIsBusy(true);
    const result = await sendTable(address, file);
    setIsBusy(false);
    setOutcome(result);
    if ("added" in result) router.refresh();
  };

  return (
    <div className="flex max-w-[46rem] flex-col gap-4">
      <p>
        <a href={address} download className={buttonClass("outline")}>
          Take the readings out as CSV
        </a>
      </p>
      <div className="flex flex-col items-start gap-2">
        <label htmlFor={id} className="text-15 font-semibold">
          Bring readings in from a CSV file
        </label>
        <input
          ref={input}
          id={id}
          type="file"
          accept=".csv,text/csv"
          aria-describedby={`${id}-hint`}
          className="min-h-11 w-full min-w-0 text-15 file:mr-3 file:min-h-11 file:rounded-field file:border file:border-spruce file:bg-transparent file:px-3 file:font-semibold file:text-spruce"
        />
        <p id={`${id}-hint`} className="text-13 text-pencil">
          UTF-8, commas between columns, points in numbers; metres and degrees; force in the unit that is named. All
          rows or none. What is there already is left alone. Columns: {columns.join(", ")}.
        </p>
        <Button disabled={isBusy} onClick={() => void send()}>
          {isBusy ? "Reading…" : "Bring them in"}
        </Button>
      </div>
      <div role="status" className="text-15">
        {outcome && "added" in outcome && (
          <p className="text-spruce">
            {plural(outcome.added, "reading")} added
            {outcome.known > 0 && `, ${outcome.known} there already`}.
          </p>
        )}
        {outcome && "message" in outcome && (
          <div className="border-l-4 border-rowan bg-rowan-wash px-4 py-3">
            <p>{outcome.message}</p>
            {outcome.cells.length > 1 && (
              <ul className="mt-2 list-disc pl-5 text-13">
                {outcome.cells.slice(0, 10).map(([at, reason]) => (
                  <li key={at}>
                    {at}: {reason}
                  </li>
                ))}
              </ul>
            )}
          </div>
        )}
      </div>
    </div>
  );
}
