import { DeleteButton } from "@/components/forms/delete-button";
import { CampOrder } from "@/components/trip/camp-order";
import { CopyCampForm } from "@/components/trip/camp-forms";
import { PageBody } from "@/components/trip/page-body";
import { LinkButton } from "@/components/ui/button";
import { EmptyState, PageHeading } from "@/components/ui/layout";
import { formatDay } from "@/lib/format/days";
import { plural } from "@/lib/format/words";
import { listCampSummaries } from "@/lib/services/camps/list-camp-summaries";
import { loadTrip } from "../_lib/load-trip";
import { copyCampAction, deleteCampAction, reorderCampsAction } from "./actions";

export const metadata = { title: "Camps" };

export default async function CampsPage({ params }: { readonly params: Promise<{ tripId: string }> }) {
  const { ctx, trip } = await loadTrip(params, "camp.arrange");
  const camps = await listCampSummaries({ ctx, input: { tripId: trip.id } });
  return (
    <PageBody>
      <PageHeading title="Camps in order" lead="Days follow from the order and the nights of each camp.">
        <LinkButton href={`/trips/${trip.id}/camps/new`} look="primary">
          Add a camp
        </LinkButton>
      </PageHeading>
      {camps.length === 0 ? (
        <EmptyState title="No camps yet">
          <p>Add the first one with its name and how many nights you stay.</p>
        </EmptyState>
      ) : (
        <div className="max-w-[56rem]">
          <CampOrder
            tripId={trip.id}
            action={reorderCampsAction}
            camps={camps.map((camp) => {
              const { name } = camp;
              const ids = { tripId: trip.id, campId: camp.id };
              return {
                id: camp.id,
                name,
                detail: `${plural(camp.days.length, "night")}, from ${formatDay(camp.days[0] ?? trip.startDate)}`,
                actions: (
                  <>
                    <CopyCampForm action={copyCampAction} values={ids} name={name} />
                    <DeleteButton name={name} action={deleteCampAction} values={ids}>
                      Its ground, wind, staking plan and sleeping places go with it. There is no way back.
                    </DeleteButton>
                  </>
                ),
              };
            })}
          />
        </div>
      )}
    </PageBody>
  );
}
