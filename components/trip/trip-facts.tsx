import Link from "next/link";
import { LinkButton } from "@/components/ui/button";
import { isAllowed } from "@/lib/domain/permissions/permissions";
import type { TripOverview } from "@/lib/domain/views";
import { formatMass } from "@/lib/format/masses";
import { plural } from "@/lib/format/words";

/** Cards, kit and people in a line or two each. */
export function TripFacts({ overview }: { readonly overview: TripOverview }) {
  const { trip, kit, papers, peopleCount } = overview;
  const base = `/trips/${trip.id}`;
  return (
    <>
      <section aria-labelledby="facts-cards" className="mb-10">
        <h2 id="facts-cards" className="mb-2 text-18 font-bold">
          Cards
        </h2>
        <p className="text-15">{describePapers(papers)}</p>
        <div className="mt-3">
          <LinkButton href={`${base}/papers`} look="primary">
            {isAllowed(trip.role, "post.send") ? "Preview and send" : "Look at the cards"}
          </LinkButton>
        </div>
      </section>
      <section aria-labelledby="facts-kit" className="mb-10">
        <h2 id="facts-kit" className="mb-2 text-18 font-bold">
          Kit
        </h2>
        <p className="text-15">
          <b>{formatMass(kit.massKg)}</b>, {plural(kit.anchorCount, "anchor")}.{" "}
          <Link href={`${base}/kit`} className="font-semibold text-spruce hover:underline">
            Look at the kit
          </Link>
        </p>
      </section>
      <section aria-labelledby="facts-people">
        <h2 id="facts-people" className="mb-2 text-18 font-bold">
          People
        </h2>
        <p className="text-15">
          <b>{peopleCount}</b> on the trip.{" "}
          <Link href={`${base}/people/packing`} className="font-semibold text-spruce hover:underline">
            What they bring and carry
          </Link>
        </p>
      </section>
    </>
  );
}

function describePapers({ version, current, outdated, never }: TripOverview["papers"]): string {
  if (current === 0 && outdated === 0) return `Version ${version}, not sent to anybody yet.`;
  const parts = [
    current > 0 ? `${plural(current, "person has", "people have")} it` : null,
    outdated > 0 ? `${plural(outdated, "person has", "people have")} an older one` : null,
    never > 0 ? `${never} ${never === 1 ? "has" : "have"} none` : null,
  ].filter((part) => part !== null);
  return `Version ${version}: ${parts.join(", ")}.`;
}
