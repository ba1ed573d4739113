import { composeKnot, type KnotPath } from "@/lib/domain/knots/compose-knot";
import type { Knot } from "@/lib/domain/knots/knots";

const LOOKS: Readonly<Record<KnotPath["look"], string>> = {
  edge: "text-ink",
  rope: "text-sheet",
  second: "text-hair",
  tip: "text-ink",
  object: "text-hair",
  arrow: "text-ink",
};

/** A knot as it looks laid open. The dark tip is the end one ties with, the arrow the part that takes the load. */
export function KnotDrawing({ knot, className = "" }: { readonly knot: Knot; readonly className?: string }) {
  const { shape, name } = knot;
  return (
    <svg
      role="img"
      aria-label={`${name}, drawn open`}
      viewBox={`0 0 ${shape.width} ${shape.height}`}
      className={className}
    >
      {composeKnot(shape).map(({ d, look, width }, index) => (
        <path
          key={index}
          d={d}
          className={LOOKS[look]}
          fill={width === 0 ? "currentColor" : "none"}
          stroke={width === 0 ? "none" : "currentColor"}
          strokeWidth={width}
          strokeLinejoin="round"
        />
      ))}
    </svg>
  );
}

/** Drawing, steps and what to look for. */
export function KnotCard({ knot }: { readonly knot: Knot }) {
  return (
    <div className="grid gap-x-8 gap-y-4 sm:grid-cols-[minmax(0,16rem)_minmax(0,1fr)]">
      <div className="flex items-start justify-center rounded-sheet border border-hair bg-sheet p-4">
        <KnotDrawing knot={knot} className="h-72 w-full" />
      </div>
      <div>
        <p className="mb-3 text-15 text-pencil">{knot.use}</p>
        <ol className="flex flex-col gap-2">
          {knot.steps.map((step, index) => (
            <li key={step} className="flex gap-3 text-15">
              <span className="w-5 shrink-0 font-bold">{index + 1}</span>
              <span>{step}</span>
            </li>
          ))}
        </ol>
        <p className="mt-3 border-l-4 border-hair pl-3 text-15 text-pencil">{knot.check}</p>
      </div>
    </div>
  );
}
