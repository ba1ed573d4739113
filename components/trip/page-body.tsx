import type { ReactNode } from "react";

/** A page beside the nights: the work in the middle and, where there is something to explain, a sheet on the right. */
export function PageBody({ children, aside }: { readonly children: ReactNode; readonly aside?: ReactNode }) {
  if (!aside) return <div className="max-w-[76rem] px-4 py-8 sm:px-8">{children}</div>;
  return (
    <div className="xl:grid xl:min-h-[calc(100dvh-6.5rem)] xl:grid-cols-[minmax(0,1fr)_21rem]">
      <div className="min-w-0 px-4 py-8 sm:px-8">{children}</div>
      <div className="border-t border-hair bg-sheet px-4 py-8 sm:px-6 xl:border-t-0 xl:border-l">{aside}</div>
    </div>
  );
}

/** Grey lines where text will be: nothing jumps when it comes. */
export function PageSkeleton({ rows = 5 }: { readonly rows?: number }) {
  return (
    <div role="status" className="max-w-[60rem] motion-safe:animate-pulse">
      <span className="sr-only">Loading</span>
      <div aria-hidden="true">
        <div className="h-9 w-3/5 rounded-field bg-hair" />
        <div className="mt-3 mb-10 h-4 w-4/5 rounded-field bg-hair" />
        {Array.from({ length: rows }, (_, row) => (
          <div key={row} className="flex h-16 items-center gap-6 border-t border-hair">
            <div className="h-4 w-16 rounded-field bg-hair" />
            <div className="h-4 flex-1 rounded-field bg-hair" />
            <div className="h-4 w-28 rounded-field bg-hair" />
          </div>
        ))}
      </div>
    </div>
  );
}
