"use client";

import { Button } from "@/components/ui/button";
import type { Proposal } from "./use-proposal";

/** What the proposal did, and what it may do. */
export function ProposalPanel({ proposal, onClose }: { readonly proposal: Proposal; readonly onClose: () => void }) {
  const { answer, options, setOptions } = proposal;
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
        <Button look="quiet" onClick={onClose}>
          Close
        </Button>
      </div>
    </div>
  );
}
