import { DeleteButton } from "@/components/forms/delete-button";
import { CordTable } from "@/components/kit/cord-table";
import { CountStepper } from "@/components/kit/count-stepper";
import { KitTable } from "@/components/kit/kit-table";
import { PageBody } from "@/components/trip/page-body";
import { LinkButton } from "@/components/ui/button";
import { EmptyState, PageHeading, Section } from "@/components/ui/layout";
import type { KitItemView } from "@/lib/domain/views";
import { formatMass } from "@/lib/format/masses";
import { plural } from "@/lib/format/words";
import { getCordNeed } from "@/lib/services/kit/get-cord-need";
import { listKit } from "@/lib/services/kit/list-kit";
import { loadTrip } from "../_lib/load-trip";
import { countKitItemAction, deleteKitItemAction } from "./actions";

export const metadata = { title: "Kit" };

const massOf = (items: readonly KitItemView[]) =>
  items.reduce((sum, { details }) => sum + details.massKg * details.count, 0);

export default async function KitPage({ params }: { readonly params: Promise<{ tripId: string }> }) {
  const { ctx, trip, can } = await loadTrip(params, "camp.read");
  const input = { tripId: trip.id };
  const [kit, cord] = await Promise.all([listKit({ ctx, input }), getCordNeed({ ctx, input })]);
  const base = `/trips/${trip.id}/kit`;
  const mayEdit = can("kit.edit");
  const addButton = mayEdit && (
    <div className="flex flex-wrap gap-3">
      <LinkButton href={`${base}/new`} look="primary">
        Add to the kit
      </LinkButton>
      <LinkButton href={`${base}/find`}>Find a kit for the whole trip</LinkButton>
    </div>
  );
  if (kit.length === 0) {
    return (
      <PageBody>
        <PageHeading title="Kit" />
        <EmptyState title="The kit is empty">
          <p>Put in the anchors and cord that the group carries. The plans of all camps draw on these counts.</p>
          {addButton}
        </EmptyState>
      </PageBody>
    );
  }
  const anchors = kit.filter((item) => item.details.type === "anchor");
  const cords = kit.filter((item) => item.details.type !== "anchor");
  const anchorCount = anchors.reduce((sum, item) => sum + item.details.count, 0);
  const table = (caption: string, items: readonly KitItemView[]) => (
    <KitTable
      caption={caption}
      items={items}
      hrefOf={mayEdit ? (item) => `${base}/${item.id}` : null}
      renderCount={
        mayEdit
          ? (item) => (
              <CountStepper
                name={item.details.name}
                count={item.details.count}
                version={item.version}
                ids={{ tripId: trip.id, kitItemId: item.id }}
                action={countKitItemAction}
              />
            )
          : null
      }
      renderActions={
        mayEdit
          ? (item) => (
              <DeleteButton
                name={item.details.name}
                action={deleteKitItemAction}
                values={{ tripId: trip.id, kitItemId: item.id }}
              >
                It leaves the kit with its count of {item.details.count}.
              </DeleteButton>
            )
          : null
      }
    />
  );
  return (
    <PageBody>
      <PageHeading
        title={`${formatMass(massOf(kit))}, ${plural(anchorCount, "anchor")}`}
        lead="Carried by the group on the whole trip; every camp's plan draws on it."
      >
        {addButton}
      </PageHeading>
      <Section title="Anchors" actions={<p className="text-15 text-pencil">{formatMass(massOf(anchors))}</p>}>
        {anchors.length === 0 ? <p className="text-15 text-pencil">No anchors yet.</p> : table("Anchors", anchors)}
      </Section>
      {cords.length > 0 && (
        <Section
          title="Cord and shock cord"
          actions={<p className="text-15 text-pencil">{formatMass(massOf(cords))}</p>}
        >
          {table("Cord and shock cord", cords)}
        </Section>
      )}
      {cord.lineCount > 0 && (
        <Section
          title="Lines the shelters need"
          lead="As they are pitched: each line as long as at its farthest camp, with its knots."
        >
          <CordTable cord={cord} />
        </Section>
      )}
    </PageBody>
  );
}
