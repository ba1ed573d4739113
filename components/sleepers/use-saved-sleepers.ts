"use client";

import { useRef, useState } from "react";
import { clockNow } from "@/components/forms/save-bar";
import { IDLE, type ActionState } from "@/lib/domain/action-state";
import { toSleeperRows, type Sleeping } from "./places";

export type SleepersSave =
  | { readonly kind: "clean" }
  | { readonly kind: "saving" }
  | { readonly kind: "saved"; readonly at: string }
  | { readonly kind: "failed"; readonly reason: string };

export type SaveSleepers = (state: ActionState, input: object) => Promise<ActionState>;

/** Sends each new arrangement whole; while one is on its way only the latest waits, so that the last one wins. */
export function useSavedSleepers(action: SaveSleepers, camp: { readonly tripId: string; readonly campId: string }) {
  const [state, setState] = useState<SleepersSave>({ kind: "clean" });
  const isBusy = useRef(false);
  const waiting = useRef<Sleeping | null>(null);

  const send = async (sleeping: Sleeping): Promise<void> => {
    waiting.current = sleeping;
    setState({ kind: "saving" });
    if (isBusy.current) return;
    isBusy.current = true;
    try {
      while (waiting.current) {
        const next = waiting.current;
        waiting.current = null;
        const answer = await action(IDLE, { ...camp, sleepers: toSleeperRows(next) });
        if (answer.status === "refused") setState({ kind: "failed", reason: answer.formError });
        else setState({ kind: "saved", at: clockNow() });
      }
    } catch {
      setState({ kind: "failed", reason: "No connection. The arrangement is still on this page." });
    } finally {
      isBusy.current = false;
    }
  };
  return { state, send };
}
