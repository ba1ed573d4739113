"use client";

import { Button } from "@/components/ui/button";
import { Dialog } from "@/components/ui/dialog";
import { newId } from "@/lib/domain/new-id";
import { useBoard } from "./board-context";

/** Somebody else saved the same plan: who, what, and which of the two stays. Nothing is lost before the choice. */
export function ConflictDialog() {
  const { board, view } = useBoard();
  const { conflict } = board.state;
  const keepMine = () => board.dispatch({ type: "keep-mine", intentId: newId() });
  if (!conflict) return null;
  const time = new Intl.DateTimeFormat("en-GB", {
    hour: "2-digit",
    minute: "2-digit",
    timeZone: view.trip.timeZone,
  }).format(new Date(conflict.at));
  return (
    <Dialog isOpen onClose={keepMine} title={`${conflict.by} changed this plan too`}>
      <p className="mb-2 text-15">Saved at {time}, while you were working. What changed there:</p>
      <ul className="mb-4 list-disc pl-5 text-15">
        {conflict.changes.map((change) => (
          <li key={change}>{change}</li>
        ))}
      </ul>
      <p className="mb-4 text-15 text-pencil">Yours is still here. Whichever you choose, you can undo it.</p>
      <div className="flex flex-wrap gap-3">
        <Button look="primary" onClick={keepMine}>
          Keep mine
        </Button>
        <Button onClick={() => board.dispatch({ type: "take-theirs" })}>Take theirs</Button>
      </div>
    </Dialog>
  );
}
