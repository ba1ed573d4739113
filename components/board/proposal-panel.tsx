"use client";

import { useState } from "react";
import { Button } from "@/components/ui/button";
import type { PlanProposal } from "@/lib/calc/plan";
import { useBoard } from "./board-context";
import { changeBetween } from "./plan-change";

/** Asks the machine for the best plan, and says what it did. */
export function useProposal() {
  const { board } = useBoard();
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

export function ProposalPanel({ proposal }: { readonly proposal: Proposal }) {
  const { answer, options, setOptions, close } = proposal;
  return (
    <div className="flex flex-col gap-2 rounded-sheet border border-hair bg-sheet p-4">
      {answer && (
        <div role="status" className="text-15">
          <ul>
            {answer.steps.map((step) => (
              <li key={step.text}>{step.text}</li>
            ))}
            {answer.problems.map((problem) => (
              <li
                key={`${problem.pitchId} ${problem.tieOutId} ${problem.message}`}
                className="font-semibold text-ochre"
              >
                {problem.message}
              </li>
            ))}
          </ul>
        </div>
      )}
      <div className="flex flex-wrap items-center gap-x-6 gap-y-1">
        <label className="flex min-h-11 items-center gap-2 text-15">
          <input
            type="checkbox"
            className="size-5 accent-spruce"
            checked={options.allowFound}
            onChange={(event) => setOptions({ ...options, allowFound: event.target.checked })}
          />
          Use what is found here
        </label>
        <label className="flex min-h-11 items-center gap-2 text-15">
          <input
            type="checkbox"
            className="size-5 accent-spruce"
            checked={options.allowDoubling}
            onChange={(event) => setOptions({ ...options, allowDoubling: event.target.checked })}
          />
          Double up where it is weak
        </label>
        {answer && (
          <Button look="quiet" onClick={close}>
            Close
          </Button>
        )}
      </div>
    </div>
  );
}
