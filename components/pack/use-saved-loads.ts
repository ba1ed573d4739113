"use client";

import { useRef, useState } from "react";
import { clockNow } from "@/components/forms/save-bar";
import { IDLE, type ActionState } from "@/lib/domain/action-state";
import { toCarries } from "@/lib/domain/pack/to-carries";
import type { Shares } from "./load-state";

export type LoadsSave =
  | { readonly kind: "clean" }
  | { readonly kind: "saving" }
  | { readonly kind: "saved"; readonly at: string }
  | { readonly kind: "failed"; readonly reason: string };

export type SaveLoads = (state: ActionState, input: object) => Promise<ActionState>;

/** Sends each new share whole; while one is on its way only the latest waits, so that the last one wins. */
export function useSavedLoads(action: SaveLoads, tripId: string) {
  const [state, setState] = useState<LoadsSave>({ kind: "clean" });
  const isBusy = useRef(false);
  const waiting = useRef<Shares | null>(null);

  const send = async (shares: Shares): Promise<void> => {
    waiting.current = shares;
    setState({ kind: "saving" });
    if (isBusy.current) return;
    isBusy.current = true;
    try {
      while (waiting.current) {
        const next = waiting.current;
        waiting.current = null;
        const answer = await action(IDLE, { tripId, carries: toCarries(next) });
        if (answer.status === "refused") setState({ kind: "failed", reason: answer.formError });
        else setState({ kind: "saved", at: clockNow() });
      }
    } catch {
      setState({ kind: "failed", reason: "No connection. The loads are still on this page." });
    } finally {
      isBusy.current = false;
    }
  };
  return { state, send };
}
