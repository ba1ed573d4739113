"use client";

import { Button } from "@/components/ui/button";
import { useBoard } from "./board-context";
import type { Proposal } from "./use-proposal";

export type OpenPanel = "pitch" | "proposal" | null;

interface BoardToolbarProps {
  readonly isWindUp: boolean;
  readonly onWindUp: (isWindUp: boolean) => void;
  readonly open: OpenPanel;
  readonly onOpen: (panel: OpenPanel) => void;
  readonly proposal: Proposal;
}

/** Undo, redo, how the shelter stands, and the proposal. */
export function BoardToolbar({ isWindUp, onWindUp, open, onOpen, proposal }: BoardToolbarProps) {
  const { board, view } = useBoard();
  const { past, future } = board.state;
  const isWindKnown = view.camp.details.windFromDeg !== null;
  return (
    <div role="group" aria-label="Change the plan" className="flex flex-wrap gap-2 lg:justify-end">
      <Button onClick={board.undo} disabled={past.length === 0}>
        Undo
      </Button>
      <Button onClick={board.redo} disabled={future.length === 0}>
        Redo
      </Button>
      {isWindKnown && <Button onClick={() => onWindUp(!isWindUp)}>{isWindUp ? "North up" : "Wind up"}</Button>}
      <Button aria-expanded={open === "pitch"} onClick={() => onOpen(open === "pitch" ? null : "pitch")}>
        Turn shelter
      </Button>
      <Button
        look="primary"
        disabled={proposal.isRunning}
        onClick={() => {
          onOpen("proposal");
          void proposal.run();
        }}
      >
        {proposal.isRunning ? "Working out…" : "Propose plan"}
      </Button>
    </div>
  );
}
