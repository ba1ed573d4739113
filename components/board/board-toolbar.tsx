"use client";

import { useState } from "react";
import { Button } from "@/components/ui/button";
import { useBoard } from "./board-context";
import { PitchPanel } from "./pitch-panel";
import { ProposalPanel, useProposal } from "./proposal-panel";

interface BoardToolbarProps {
  readonly isWindUp: boolean;
  readonly onWindUp: (isWindUp: boolean) => void;
}

/** Undo, redo, how the shelter stands, and the proposal. */
export function BoardToolbar({ isWindUp, onWindUp }: BoardToolbarProps) {
  const { board, view } = useBoard();
  const [open, setOpen] = useState<"pitch" | "proposal" | null>(null);
  const proposal = useProposal();
  const { past, future } = board.state;
  const isWindKnown = view.camp.details.windFromDeg !== null;
  return (
    <div className="flex flex-col gap-3">
      <div role="toolbar" aria-label="Staking plan" className="flex flex-wrap gap-2">
        <Button onClick={board.undo} disabled={past.length === 0}>
          Undo
        </Button>
        <Button onClick={board.redo} disabled={future.length === 0}>
          Redo
        </Button>
        {isWindKnown && (
          <Button aria-pressed={isWindUp} onClick={() => onWindUp(!isWindUp)}>
            {isWindUp ? "North up" : "Wind up"}
          </Button>
        )}
        <Button aria-expanded={open === "pitch"} onClick={() => setOpen(open === "pitch" ? null : "pitch")}>
          Turn shelter
        </Button>
        <Button
          look="primary"
          disabled={proposal.isRunning}
          onClick={() => {
            setOpen("proposal");
            void proposal.run();
          }}
        >
          {proposal.isRunning ? "Working out…" : "Propose plan"}
        </Button>
      </div>
      {open === "pitch" && <PitchPanel />}
      {open === "proposal" && (
        <ProposalPanel proposal={{ ...proposal, close: () => (proposal.close(), setOpen(null)) }} />
      )}
    </div>
  );
}
