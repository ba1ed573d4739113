"use client";

import { Button } from "@/components/ui/button";
import { useBoard } from "./board-context";

/** What was just done or refused, and what is picked up; said aloud too. */
export function BoardNotice() {
  const { board, armedAnchorId, anchors, arm } = useBoard();
  const { notice } = board.state;
  const armed = armedAnchorId ? anchors.get(armedAnchorId) : null;
  const isRefused = notice?.tone === "refused";
  return (
    <>
      <div role="alert">
        {notice && isRefused && (
          <p
            key={notice.count}
            className="flex items-center justify-between gap-3 border-l-4 border-rowan bg-rowan-wash px-4 py-1 text-15"
          >
            {notice.text}
            <Button look="quiet" onClick={() => board.dispatch({ type: "hush" })}>
              Close
            </Button>
          </p>
        )}
      </div>
      <p role="status" className="sr-only">
        {notice && !isRefused ? notice.text : armed ? `${armed.name} is picked up. Choose a tie-out.` : ""}
      </p>
      {armed && (
        <p className="flex flex-wrap items-center justify-between gap-3 border-l-4 border-spruce bg-spruce-wash px-4 py-1 text-15">
          <span>
            <strong>{armed.name}</strong> is picked up. Tap a tie-out to put it there.
          </span>
          <Button look="quiet" onClick={() => arm(null)}>
            Put it back
          </Button>
        </p>
      )}
    </>
  );
}
