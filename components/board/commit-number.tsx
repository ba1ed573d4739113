"use client";

import { useId, useState } from "react";

interface CommitNumberProps {
  readonly label: string;
  readonly value: number;
  readonly min: number;
  readonly max: number;
  readonly onCommit: (value: number) => void;
}

/** A number that counts when it is finished: on enter or when it is left. Outside its range it says so and waits. */
export function CommitNumber({ label, value, min, max, onCommit }: CommitNumberProps) {
  const id = useId();
  const [draft, setDraft] = useState<string | null>(null);
  const typed = draft === null ? value : Number(draft.trim().replace(",", "."));
  const isWrong = draft !== null && (draft.trim() === "" || !(typed >= min && typed <= max));
  const commit = () => {
    if (draft === null || isWrong) return;
    setDraft(null);
    if (typed !== value) onCommit(typed);
  };
  return (
    <div className="flex min-w-0 flex-col gap-1">
      <label htmlFor={id} className="text-13 text-pencil">
        {label}
      </label>
      <input
        id={id}
        inputMode="decimal"
        autoComplete="off"
        value={draft ?? String(value)}
        aria-invalid={isWrong || undefined}
        aria-describedby={isWrong ? `${id}-error` : undefined}
        onChange={(event) => setDraft(event.target.value)}
        onBlur={commit}
        onKeyDown={(event) => {
          if (event.key === "Enter") commit();
          if (event.key === "Escape") setDraft(null);
        }}
        className="min-h-11 w-full min-w-0 rounded-field border border-pencil bg-sheet px-2 text-15 aria-invalid:border-rowan"
      />
      {isWrong && (
        <p id={`${id}-error`} className="text-13 font-semibold text-rowan">
          Between {Math.round(min)} and {Math.round(max)}.
        </p>
      )}
    </div>
  );
}
