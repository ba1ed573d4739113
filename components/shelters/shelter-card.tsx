import type { ReactNode } from "react";
import { ShelterPlan } from "@/components/drawing/shelter-plan";
import { buildShelter, checkShelterSpec, shelterKind } from "@/lib/calc/shelter-kinds";
import type { ShelterDetails } from "@/lib/domain/shelter/schema";
import { formatMass } from "@/lib/format/masses";
import { plural } from "@/lib/format/words";

/** A shelter drawn small in plan, with what one needs to tell it from the others. */
export function ShelterCard({
  details,
  note,
  title,
  children,
}: {
  readonly details: ShelterDetails;
  readonly note?: string;
  /** The name as a link, where there is somewhere to go. */
  readonly title?: ReactNode;
  readonly children?: ReactNode;
}) {
  const kind = shelterKind(details.spec.kind);
  const canBeDrawn = checkShelterSpec(details.spec).length === 0;
  return (
    <div className="flex min-w-0 flex-col">
      {canBeDrawn && (
        <div className="rounded-sheet border border-hair bg-sheet">
          <ShelterPlan
            model={buildShelter(details.spec)}
            headingDeg={0}
            hasNorth={false}
            width={400}
            height={270}
            label=""
          />
        </div>
      )}
      <h3 className="mt-3 text-15 font-bold">{title ?? details.name}</h3>
      <p className="text-13 text-pencil">
        {[
          details.name === kind.name ? null : kind.name,
          `sleeps ${details.sleeps}`,
          details.massKg === null ? null : formatMass(details.massKg),
          canBeDrawn ? plural(buildShelter(details.spec).tieOuts.length, "tie-out") : null,
        ]
          .filter(Boolean)
          .join(" · ")}
      </p>
      {note && <p className="text-13 text-pencil">{note}</p>}
      {children && <div className="mt-1 -ml-4 flex flex-wrap gap-1">{children}</div>}
    </div>
  );
}

export function ShelterGrid({ children }: { readonly children: ReactNode }) {
  return <ul className="grid gap-x-8 gap-y-10 sm:grid-cols-2 xl:grid-cols-3">{children}</ul>;
}
