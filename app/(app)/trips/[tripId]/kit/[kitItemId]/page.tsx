import { notFound } from "next/navigation";
import { KitItemForm } from "@/components/kit/kit-item-form";
import { PageBody } from "@/components/trip/page-body";
import { LinkButton } from "@/components/ui/button";
import { PageHeading } from "@/components/ui/layout";
import { joinWords } from "@/lib/format/words";
import { listKit } from "@/lib/services/kit/list-kit";
import { loadTrip } from "../../_lib/load-trip";
import { updateKitItemAction } from "../actions";

interface KitItemPageProps {
  readonly params: Promise<{ tripId: string; kitItemId: string }>;
}

export const metadata = { title: "Kit item" };

export default async function KitItemPage({ params }: KitItemPageProps) {
  const { kitItemId } = await params;
  const { ctx, trip } = await loadTrip(params, "kit.edit");
  const item = (await listKit({ ctx, input: { tripId: trip.id } })).find((one) => one.id === kitItemId);
  if (!item) notFound();
  const here = `/trips/${trip.id}/kit`;
  return (
    <PageBody>
      <PageHeading
        title={item.details.name}
        lead={
          item.campNames.length === 0
            ? "Used by no plan yet."
            : `Used at ${joinWords(item.campNames)}: a change here changes the margins there.`
        }
      >
        <LinkButton href={here} look="quiet">
          Whole kit
        </LinkButton>
      </PageHeading>
      <KitItemForm
        key={item.id}
        action={updateKitItemAction}
        details={item.details}
        values={{ tripId: trip.id, kitItemId: item.id, "version:number": String(item.version) }}
        saveLabel="Save"
        conflictHref={`${here}/${item.id}`}
      />
    </PageBody>
  );
}
