import { AnchorLibrary, type LibraryAnchor } from "@/components/kit/anchor-library";
import { KitItemForm } from "@/components/kit/kit-item-form";
import { PageBody } from "@/components/trip/page-body";
import { LinkButton } from "@/components/ui/button";
import { PageHeading, Section } from "@/components/ui/layout";
import { BUILT_IN_ANCHORS } from "@/lib/calc/tables/anchors";
import { listGear } from "@/lib/services/gear/list-gear";
import { listKit } from "@/lib/services/kit/list-kit";
import { loadTrip } from "../../_lib/load-trip";
import { addKitItemAction, createKitItemAction } from "../actions";

export const metadata = { title: "Add to the kit" };

export default async function NewKitItemPage({ params }: { readonly params: Promise<{ tripId: string }> }) {
  const { ctx, trip } = await loadTrip(params, "kit.edit");
  const [kit, gear] = await Promise.all([listKit({ ctx, input: { tripId: trip.id } }), listGear({ ctx })]);
  const countInKit = (name: string) =>
    kit.reduce((sum, { details }) => sum + (details.name === name ? details.count : 0), 0);
  const own = gear.flatMap(({ id, details }): LibraryAnchor[] =>
    details.type === "anchor" && details.anchor.type === "anchor"
      ? [{ id, details: details.anchor, note: "Yours.", inKit: countInKit(details.anchor.name) }]
      : [],
  );
  const library = BUILT_IN_ANCHORS.filter((anchor) => !anchor.found).map(
    ({ id, name, spec, massKg, note }): LibraryAnchor => ({
      id,
      details: { type: "anchor", name, spec, massKg, count: 0 },
      note,
      inKit: countInKit(name),
    }),
  );
  return (
    <PageBody>
      <PageHeading title="Add to the kit" lead="What is found at a camp (rocks, trees, sticks) is said at the camp.">
        <LinkButton href={`/trips/${trip.id}/kit`}>Back to the kit</LinkButton>
      </PageHeading>
      {own.length > 0 && (
        <Section title="Your own gear">
          <AnchorLibrary tripId={trip.id} anchors={own} action={addKitItemAction} />
        </Section>
      )}
      <Section title="Library" lead="Generic anchors with typical sizes.">
        <AnchorLibrary tripId={trip.id} anchors={library} action={addKitItemAction} />
      </Section>
      <Section title="Own entry" lead="An anchor with its own measurements, cord, or shock cord.">
        <KitItemForm
          action={createKitItemAction}
          details={null}
          values={{ tripId: trip.id }}
          saveLabel="Add to the kit"
        />
      </Section>
    </PageBody>
  );
}
