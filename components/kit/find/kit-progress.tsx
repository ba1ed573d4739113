import type { KitProgressView } from "@/lib/domain/kit/search-view";

/** How far the search is; it goes on when the page is left. */
export function KitProgress({ view }: { readonly view: KitProgressView }) {
  const { isRunning, progress, failure } = view;
  return (
    <div role="status" className="mt-4 max-w-[46rem] text-15">
      {isRunning && (
        <>
          <p>{progress ? `${progress.step}…` : "Starting…"}</p>
          <span aria-hidden="true" className="mt-2 block h-1.5 bg-hair">
            <span
              className="block h-full bg-spruce"
              style={{ width: `${progress ? (100 * (progress.done + 1)) / (progress.total + 1) : 4}%` }}
            />
          </span>
          <p className="mt-2 text-13 text-pencil">You can leave this page: the result will be here.</p>
        </>
      )}
      {!isRunning && failure && <p className="font-semibold">{failure}</p>}
    </div>
  );
}
