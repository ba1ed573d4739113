import { PlaceForm } from "@/components/forms/place/place-form";
import { PlaceFacts } from "@/components/trip/place-facts";
import { PageBody } from "@/components/trip/page-body";
import { LinkButton } from "@/components/ui/button";
import { PageHeading } from "@/components/ui/layout";
import { HAZARDS } from "@/lib/domain/camp/schema";
import { formatDay } from "@/lib/format/days";
import { orNotFound } from "@/lib/http/or-not-found";
import { getCamp } from "@/lib/services/camps/get-camp";
import { getCampPlace } from "@/lib/services/places/get-camp-place";
import { loadTrip } from "../../../_lib/load-trip";
import { updateCampAction } from "../../actions";

interface PlacePageProps {
  readonly params: Promise<{ tripId: string; campId: string }>;
}

export const metadata = { title: "Ground and wind" };

export default async function PlacePage({ params }: PlacePageProps) {
  const { campId } = await params;
  const { ctx, trip, preferences } = await loadTrip(params, "camp.edit");
  const camp = await orNotFound(getCamp({ ctx, input: { tripId: trip.id, campId } }));
  const { details, days } = camp;
  const missing = [
    details.ground === null ? "the ground" : null,
    details.wind === null ? "the wind" : null,
    details.exposure === null ? "how open it lies" : null,
  ].filter((part) => part !== null);
  return (
    <PageBody>
      <PageHeading
        title={`${details.name}: ground and wind`}
        lead={
          <>
            {days.map(formatDay).join(", ")}.{" "}
            {missing.length === 0 ? (
              "All that a verdict needs is here."
            ) : (
              <span className="font-semibold text-ember">Still missing: {missing.join(", ")}.</span>
            )}
          </>
        }
      >
        <LinkButton href={`/trips/${trip.id}/camps/${campId}`}>To the staking plan</LinkButton>
      </PageHeading>
      <PlaceForm
        key={campId}
        action={updateCampAction}
        tripId={trip.id}
        campId={campId}
        version={camp.version}
        details={details}
        standsByFor={camp.alternativeTo?.name ?? null}
        hazards={HAZARDS}
        preferences={preferences}
      />
      <div className="mt-10">
        <PlaceFacts place={await getCampPlace({ ctx, input: { tripId: trip.id, campId } })} />
      </div>
    </PageBody>
  );
}
