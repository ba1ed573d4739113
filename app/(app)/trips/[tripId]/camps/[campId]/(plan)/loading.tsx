/** Holds the places of heading, drawing and list, so that nothing jumps when they come. */
export default function CampLoading() {
  return (
    <div role="status" className="lg:grid lg:grid-cols-[minmax(0,1fr)_25rem]">
      <span className="sr-only">The camp is loading.</span>
      <div className="flex flex-col gap-4 px-4 py-6 sm:px-7" aria-hidden="true">
        <div className="h-8 w-56 rounded-field bg-hair" />
        <div className="h-4 w-80 max-w-full rounded-field bg-hair" />
        <div className="aspect-square rounded-sheet border border-hair bg-sheet sm:aspect-[76/54]" />
      </div>
      <div className="hidden flex-col gap-3 border-l border-hair bg-sheet px-5 py-6 lg:flex" aria-hidden="true">
        <div className="h-9 w-64 rounded-field bg-hair" />
        {[0, 1, 2, 3, 4, 5].map((row) => (
          <div key={row} className="h-14 border-b border-hair" />
        ))}
      </div>
    </div>
  );
}
