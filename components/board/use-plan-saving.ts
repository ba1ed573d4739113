"use client";

import { useMutation } from "@tanstack/react-query";
import { useEffect, useRef, useState } from "react";
import type { Dispatch } from "react";
import type { PlanIntent } from "@/lib/domain/plan/schema";
import { postIntents, RefusedError, type CampScope } from "./board-requests";
import type { BoardAction, BoardState } from "./board-state";
import { keepUnsaved, readUnsaved } from "./unsaved-store";

export type Saving =
  | { readonly kind: "saved" | "saving" }
  | { readonly kind: "failed"; readonly reason: string; readonly isOffline: boolean };

const MOST_AT_ONCE = 100;
/** A few quick changes travel together. */
const GATHER_MS = 250;
const FIRST_RETRY_MS = 4_000;
const LONGEST_RETRY_MS = 60_000;

/** Sends the changes in order, one batch at a time; what can't be sent stays on this device and is tried again. */
export function usePlanSaving(
  state: BoardState,
  dispatch: Dispatch<BoardAction>,
  scope: CampScope,
  userId: string,
  onSaved: () => void,
): { readonly saving: Saving; readonly retry: () => void } {
  const [isRestored, setIsRestored] = useState(false);
  const [failure, setFailure] = useState<{ reason: string; isOffline: boolean; count: number } | null>(null);
  const told = useRef(onSaved);
  useEffect(() => {
    told.current = onSaved;
  });

  const { mutate, isPending } = useMutation({
    mutationFn: (intents: readonly PlanIntent[]) => postIntents(scope, intents),
    // The browser's own idea of being online is often wrong at a camp: always try.
    networkMode: "always",
    retry: false,
    onSuccess: (result) => {
      setFailure(null);
      dispatch({ type: "saved", result });
      told.current();
    },
    onError: (error) => {
      const isOffline = !(error instanceof RefusedError);
      const reason = isOffline ? "no connection" : error.message;
      setFailure((before) => ({ reason, isOffline, count: (before?.count ?? 0) + 1 }));
    },
  });

  useEffect(() => {
    const kept = readUnsaved(scope.campId, userId);
    if (kept.length > 0) dispatch({ type: "restore", pending: kept });
    queueMicrotask(() => setIsRestored(true));
  }, [dispatch, scope.campId, userId]);

  useEffect(() => {
    if (isRestored) keepUnsaved(scope.campId, userId, state.pending);
  }, [isRestored, scope.campId, userId, state.pending]);

  const isReady = isRestored && state.pending.length > 0 && !isPending && !failure && !state.conflict;
  useEffect(() => {
    if (!isReady) return;
    const timer = setTimeout(() => mutate(state.pending.slice(0, MOST_AT_ONCE)), GATHER_MS);
    return () => clearTimeout(timer);
  }, [isReady, mutate, state.pending]);

  useEffect(() => {
    if (!failure) return;
    const retry = () => setFailure(null);
    const wait = Math.min(LONGEST_RETRY_MS, FIRST_RETRY_MS * 2 ** (failure.count - 1));
    const timer = failure.isOffline ? setTimeout(retry, wait) : undefined;
    window.addEventListener("online", retry);
    return () => {
      clearTimeout(timer);
      window.removeEventListener("online", retry);
    };
  }, [failure]);

  const saving: Saving = failure
    ? { kind: "failed", reason: failure.reason, isOffline: failure.isOffline }
    : state.pending.length > 0 || isPending
      ? { kind: "saving" }
      : { kind: "saved" };
  return { saving, retry: () => setFailure(null) };
}
