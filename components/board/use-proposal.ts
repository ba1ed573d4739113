"use client";

import { useState } from "react";
import type { PlanProposal } from "@/lib/calc/plan";
import { changeBetween } from "./plan-change";
import type { StakingBoardModel } from "./use-staking-board";

/** Asks the machine for the best plan, and says what it did. */
export function useProposal(board: StakingBoardModel) {
  const [options, setOptions] = useState({ allowFound: true, allowDoubling: true });
  const [isRunning, setIsRunning] = useState(false);
  const [answer, setAnswer] = useState<PlanProposal | null>(null);
  const run = async () => {
    setIsRunning(true);
    try {
      const proposal = await board.calc.run("propose", { camp: board.campInput, options });
      const change = changeBetween(board.state.placements, proposal.placements);
      if (change)
        board.apply({ type: "replace", placements: [...proposal.placements] }, "The proposal is on the board.");
      setAnswer(proposal);
    } catch {
      board.dispatch({
        type: "say",
        tone: "refused",
        text: "The proposal could not be worked out. Your plan is as it was.",
      });
    } finally {
      setIsRunning(false);
    }
  };
  return { options, setOptions, isRunning, run, answer, close: () => setAnswer(null) };
}

export type Proposal = ReturnType<typeof useProposal>;
