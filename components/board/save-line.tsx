"use client";

import { useBoard } from "./board-context";

/** Whether what is on the screen is safe: "saved 10:42", "saving…", "not saved: no connection, kept on this device". */
export function SaveLine() {
  const { board, view } = useBoard();
  const { saving, state, retry } = board;
  return (
    <p className="flex min-h-6 flex-wrap items-center gap-x-2 text-13 text-pencil">
      <span role="status">{words()}</span>
      {saving.kind === "failed" && (
        <button type="button" onClick={retry} className="min-h-8 px-1 font-semibold text-spruce underline">
          Try again
        </button>
      )}
    </p>
  );

  function words(): string {
    if (saving.kind === "saving") return "saving…";
    if (saving.kind === "failed") {
      const count = state.pending.length;
      const changes = count === 1 ? "1 change" : `${count} changes`;
      return `not saved: ${saving.reason.replace(/\.$/, "")}, ${changes} kept on this device`;
    }
    if (!state.savedAt) return "nothing to save yet";
    const time = new Intl.DateTimeFormat("en-GB", {
      hour: "2-digit",
      minute: "2-digit",
      timeZone: view.trip.timeZone,
    }).format(new Date(state.savedAt));
    return `saved ${time}`;
  }
}
