"use client";

import { useState } from "react";
import { Button } from "@/components/ui/button";
import { Dialog } from "@/components/ui/dialog";
import type { LoadPersonView } from "@/lib/domain/pack/load-view";
import { NOBODY, type Stack } from "./load-state";

interface LoadDialogProps {
  readonly stack: Stack | null;
  readonly people: readonly LoadPersonView[];
  readonly onClose: () => void;
  readonly onMove: (stack: Stack, toId: string, count: number) => void;
  readonly onFix: (stack: Stack, isFixed: boolean) => void;
}

/** The tap-only way: who takes how many, and whether it stays where it is. */
export function LoadDialog({ stack, ...rest }: LoadDialogProps) {
  return (
    <Dialog isOpen={stack !== null} onClose={rest.onClose} title={stack?.piece.name ?? ""}>
      {stack && <LoadChoices stack={stack} {...rest} />}
    </Dialog>
  );
}

function LoadChoices({ stack, people, onMove, onFix }: LoadDialogProps & { readonly stack: Stack }) {
  const [count, setCount] = useState(stack.count);
  const places = [...people.map(({ id, name }) => ({ id, name })), { id: NOBODY, name: "Nobody yet" }].filter(
    (place) => place.id !== stack.placeId,
  );
  return (
    <>
      {stack.count > 1 && (
        <label className="mb-4 flex items-center gap-3 text-15">
          How many go
          <select
            value={count}
            onChange={(event) => setCount(Number(event.target.value))}
            className="min-h-11 rounded-field border border-pencil bg-sheet px-3"
          >
            {Array.from({ length: stack.count }, (_, at) => (
              <option key={at} value={at + 1}>
                {at + 1}
              </option>
            ))}
          </select>
        </label>
      )}
      <ul className="flex flex-col gap-2">
        {places.map((place) => (
          <li key={place.id}>
            <Button className="w-full justify-start" onClick={() => onMove(stack, place.id, count)}>
              Give to {place.id === NOBODY ? "nobody yet" : place.name}
            </Button>
          </li>
        ))}
      </ul>
      {stack.placeId !== NOBODY && (
        <div className="mt-4 border-t border-hair pt-3">
          <Button look="quiet" onClick={() => onFix(stack, !stack.isFixed)}>
            {stack.isFixed ? "Let it be shared out again" : "Fix it here: sharing out leaves it"}
          </Button>
        </div>
      )}
    </>
  );
}
