"use client";

import { useOptimistic, useState, useTransition } from "react";
import { IDLE, type ActionState } from "@/lib/domain/action-state";
import type { PackLine } from "@/lib/domain/views";
import { formatMass } from "@/lib/format/masses";

/** Lines to tick off; a tick shows at once and goes back when it could not be saved. */
export function TickList({
  legend,
  lines,
  tripId,
  action,
  emptyText,
}: {
  readonly legend: string;
  readonly lines: readonly PackLine[];
  readonly tripId: string;
  readonly action: (state: ActionState, tick: object) => Promise<ActionState>;
  readonly emptyText: string;
}) {
  const [shown, setShown] = useOptimistic(lines, (now, tick: { key: string; isTicked: boolean }) =>
    now.map((line) => (line.key === tick.key ? { ...line, isTicked: tick.isTicked } : line)),
  );
  const [, startTransition] = useTransition();
  const [problem, setProblem] = useState("");
  const left = shown.filter((line) => !line.isTicked).length;
  const tick = (key: string, isTicked: boolean) => {
    startTransition(async () => {
      setShown({ key, isTicked });
      try {
        const answer = await action(IDLE, { tripId, key, isTicked });
        setProblem(answer.status === "refused" ? answer.formError : "");
      } catch {
        setProblem("No connection: the tick was not saved. Try again with signal.");
      }
    });
  };
  if (lines.length === 0) return <p className="text-15 text-pencil">{emptyText}</p>;
  return (
    <fieldset>
      <legend className="sr-only">{legend}</legend>
      <p role="status" className="mb-2 text-15 text-pencil">
        {problem ? (
          <span className="font-semibold text-rowan">{problem}</span>
        ) : left === 0 ? (
          "All of it is packed."
        ) : (
          `${left} of ${shown.length} still to pack.`
        )}
      </p>
      {shown.map((line) => (
        <label key={line.key} className="flex min-h-12 items-center gap-3 border-t border-hair py-1.5">
          <input
            type="checkbox"
            checked={line.isTicked}
            onChange={(event) => tick(line.key, event.target.checked)}
            className="size-6 shrink-0 accent-spruce"
          />
          <span className="min-w-0 flex-1">
            <span className={line.isTicked ? "text-pencil line-through" : "font-semibold"}>{line.name}</span>
            {line.detail && <span className="block text-13 text-pencil">{line.detail}</span>}
          </span>
          {line.massKg !== null && (
            <span className="text-15 whitespace-nowrap text-pencil">{formatMass(line.massKg)}</span>
          )}
        </label>
      ))}
    </fieldset>
  );
}
