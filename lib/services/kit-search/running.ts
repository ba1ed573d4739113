import type { KitProgress } from "@/lib/workers/kit-task";
import type { KitJob } from "@/lib/workers/start-kit-job";

export interface RunningSearch {
  readonly job: KitJob;
  progress: KitProgress;
}

interface SearchState {
  readonly running: Map<string, RunningSearch>;
  /** Why the last search of a trip gave nothing, until the next one starts. */
  readonly failures: Map<string, string>;
}

// On globalThis: bundles of routes and pages are separate, a search is started in one and asked after in another.
const store = globalThis as typeof globalThis & { leesteadKitSearches?: SearchState };

export function getSearchState(): SearchState {
  return (store.leesteadKitSearches ??= { running: new Map(), failures: new Map() });
}

/** Searches at once on this server; each takes a core while it runs. */
export const MOST_SEARCHES = 2;
