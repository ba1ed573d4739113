import Link from "next/link";
import { AnchorMark } from "@/components/drawing/anchor-mark";
import { DeleteButton } from "@/components/forms/delete-button";
import { ShelterCard, ShelterGrid } from "@/components/shelters/shelter-card";
import { LinkButton } from "@/components/ui/button";
import { EmptyState, PageHeading, Section } from "@/components/ui/layout";
import { requireContext } from "@/lib/auth/session";
import type { KitItemDetails } from "@/lib/domain/kit/schema";
import { formatAnchorSpec } from "@/lib/format/anchors";
import { formatMass } from "@/lib/format/masses";
import { plural, startSentence } from "@/lib/format/words";
import { listGear } from "@/lib/services/gear/list-gear";
import { deleteGearAction } from "./actions";

export const metadata = { title: "Own gear" };

export default async function GearPage() {
  const ctx = await requireContext();
  const gear = await listGear({ ctx });
  const shelters = gear.flatMap(({ id, details }) =>
    details.type === "shelter" ? [{ id, shelter: details.shelter }] : [],
  );
  const anchors = gear.flatMap(({ id, details }) =>
    details.type === "anchor" ? [{ id, anchor: details.anchor }] : [],
  );
  const addButtons = (
    <>
      <LinkButton href="/gear/new?type=shelter" look="primary">
        Add a shelter
      </LinkButton>
      <LinkButton href="/gear/new?type=anchor">Add an anchor or cord</LinkButton>
    </>
  );
  if (gear.length === 0) {
    return (
      <>
        <PageHeading title="Own gear" />
        <EmptyState title="Nothing here yet">
          <p>Write down your own shelters and anchors once, with their real measurements, and take them on any trip.</p>
          <div className="flex flex-wrap gap-3">{addButtons}</div>
        </EmptyState>
      </>
    );
  }
  return (
    <>
      <PageHeading
        title="Own gear"
        lead={`${plural(shelters.length, "shelter")}, ${plural(anchors.length, "kind")} of anchor and cord. Only you see it.`}
      >
        {addButtons}
      </PageHeading>
      {shelters.length > 0 && (
        <Section title="Shelters">
          <ShelterGrid>
            {shelters.map(({ id, shelter }) => (
              <li key={id}>
                <ShelterCard
                  details={shelter}
                  title={
                    <Link href={`/gear/${id}`} className="text-spruce hover:underline">
                      {shelter.name}
                    </Link>
                  }
                >
                  <DeleteGear id={id} name={shelter.name} />
                </ShelterCard>
              </li>
            ))}
          </ShelterGrid>
        </Section>
      )}
      {anchors.length > 0 && (
        <Section title="Anchors and cord">
          <ul>
            {anchors.map(({ id, anchor }) => (
              <li
                key={id}
                className="grid grid-cols-[2.75rem_minmax(0,1fr)_auto] items-center gap-x-3 border-t border-hair py-3 first:border-t-0"
              >
                <span>{anchor.type === "anchor" && <AnchorMark spec={anchor.spec} size={38} />}</span>
                <div className="min-w-0">
                  <h3 className="text-15 font-bold">
                    <Link href={`/gear/${id}`} className="hover:text-spruce hover:underline">
                      {anchor.name}
                    </Link>
                  </h3>
                  <p className="text-13 text-pencil">{describeThing(anchor)}</p>
                </div>
                <DeleteGear id={id} name={anchor.name} />
              </li>
            ))}
          </ul>
        </Section>
      )}
    </>
  );
}

function DeleteGear({ id, name }: { readonly id: string; readonly name: string }) {
  return (
    <DeleteButton name={name} action={deleteGearAction} values={{ gearId: id }}>
      Trips that have taken it keep their copy.
    </DeleteButton>
  );
}

function describeThing(anchor: KitItemDetails): string {
  const mass = formatMass(anchor.massKg);
  if (anchor.type === "anchor") return `${startSentence(formatAnchorSpec(anchor.spec))} · ${mass}`;
  return `${anchor.type === "cord" ? "Cord" : "Shock cord"}, pieces of ${anchor.lengthM}\u2009m · ${mass}`;
}
