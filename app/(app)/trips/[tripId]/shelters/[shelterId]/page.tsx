import { notFound } from "next/navigation";
import { ShelterForm } from "@/components/shelters/shelter-form";
import { PageBody } from "@/components/trip/page-body";
import { LinkButton } from "@/components/ui/button";
import { PageHeading } from "@/components/ui/layout";
import { joinWords } from "@/lib/format/words";
import { listShelters } from "@/lib/services/shelters/list-shelters";
import { loadTrip } from "../../_lib/load-trip";
import { updateShelterAction } from "../actions";

interface ShelterPageProps {
  readonly params: Promise<{ tripId: string; shelterId: string }>;
}

export const metadata = { title: "Shelter" };

export default async function ShelterPage({ params }: ShelterPageProps) {
  const { shelterId } = await params;
  const { ctx, trip, preferences } = await loadTrip(params, "shelter.edit");
  const shelter = (await listShelters({ ctx, input: { tripId: trip.id } })).find((one) => one.id === shelterId);
  if (!shelter) notFound();
  const here = `/trips/${trip.id}/shelters`;
  return (
    <PageBody>
      <PageHeading
        title={shelter.details.name}
        lead={
          shelter.campNames.length === 0
            ? "Pitched nowhere yet."
            : `Pitched at ${joinWords(shelter.campNames)}: a change here changes the verdict there.`
        }
      >
        <LinkButton href={here} look="quiet">
          All shelters
        </LinkButton>
      </PageHeading>
      <ShelterForm
        key={shelter.id}
        action={updateShelterAction}
        details={shelter.details}
        values={{ tripId: trip.id, shelterId: shelter.id, "version:number": String(shelter.version) }}
        lengthUnit={preferences.lengthUnit}
        saveLabel="Save the shelter"
        conflictHref={`${here}/${shelter.id}`}
      />
    </PageBody>
  );
}
