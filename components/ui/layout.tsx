import type { ReactNode } from "react";

/** The top of a page: what is this, is it all right, what is to do next. */
export function PageHeading({
  title,
  lead,
  children,
}: {
  readonly title: ReactNode;
  readonly lead?: ReactNode;
  /** Actions. */
  readonly children?: ReactNode;
}) {
  return (
    <header className="mb-8 flex flex-wrap items-start justify-between gap-x-6 gap-y-4">
      <div className="max-w-[46rem] min-w-0">
        <h1 className="text-24 font-bold sm:text-34">{title}</h1>
        {lead && <div className="mt-1 text-15 text-pencil">{lead}</div>}
      </div>
      {children && <div className="flex flex-wrap gap-3">{children}</div>}
    </header>
  );
}

export function Section({
  title,
  lead,
  children,
  actions,
}: {
  readonly title: string;
  readonly lead?: ReactNode;
  readonly children: ReactNode;
  readonly actions?: ReactNode;
}) {
  return (
    <section className="mb-10">
      <div className="mb-3 flex flex-wrap items-baseline justify-between gap-3 border-b border-hair pb-2">
        <h2 className="text-18 font-bold">{title}</h2>
        {actions}
      </div>
      {lead && <p className="mb-4 max-w-[46rem] text-15 text-pencil">{lead}</p>}
      {children}
    </section>
  );
}

/** What belongs here, and the one action that starts it. */
export function EmptyState({ title, children }: { readonly title: string; readonly children: ReactNode }) {
  return (
    <div className="max-w-[40rem] border-l-4 border-hair py-2 pl-5">
      <p className="text-18 font-bold">{title}</p>
      <div className="mt-2 flex flex-col items-start gap-4 text-15 text-pencil">{children}</div>
    </div>
  );
}

/** A number with its unit in pencil, one thin space between. */
export function Quantity({ value, unit }: { readonly value: string; readonly unit: string }) {
  return (
    <span className="whitespace-nowrap">
      {value}
      {"\u2009"}
      <span className="text-pencil">{unit}</span>
    </span>
  );
}

/** The usual cautions, on every page with results. */
export function Cautions() {
  return (
    <p className="max-w-[60rem] border-t border-hair pt-3 text-13 text-pencil">
      Estimates from typical ground: test on site. Do not rely on a shelter in a storm; leave in time. Look up for dead
      limbs, keep clear of flood plains, lightning and avalanche ground, no flames or stoves inside. Local rules, land
      managers and qualified guides come first.
    </p>
  );
}
