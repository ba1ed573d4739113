"use client";

import { useSyncExternalStore } from "react";

const QUERY = "(min-width: 64rem)";

function subscribe(onChange: () => void): () => void {
  const media = window.matchMedia?.(QUERY);
  media?.addEventListener("change", onChange);
  return () => media?.removeEventListener("change", onChange);
}

/** Room for the explanation beside the drawing; on a phone it comes up as a sheet. */
export function useIsWide(): boolean {
  return useSyncExternalStore(
    subscribe,
    () => window.matchMedia?.(QUERY).matches ?? true,
    () => true,
  );
}
