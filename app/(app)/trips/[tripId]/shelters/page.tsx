import Link from "next/link";
import { DeleteButton } from "@/components/forms/delete-button";
import { OneButtonForm } from "@/components/forms/one-button-form";
import { ShelterCard, ShelterGrid } from "@/components/shelters/shelter-card";
import { PageBody } from "@/components/trip/page-body";
import { LinkButton } from "@/components/ui/button";
import { EmptyState, PageHeading } from "@/components/ui/layout";
import { joinWords, plural } from "@/lib/format/words";
import { listShelters } from "@/lib/services/shelters/list-shelters";
import { loadTrip } from "../_lib/load-trip";
import { copyShelterAction, deleteShelterAction } from "./actions";

export const metadata = { title: "Shelters" };

export default async function SheltersPage({ params }: { readonly params: Promise<{ tripId: string }> }) {
  const { ctx, trip, can } = await loadTrip(params, "camp.read");
  const shelters = await listShelters({ ctx, input: { tripId: trip.id } });
  const places = shelters.reduce((sum, shelter) => sum + shelter.details.sleeps, 0);
  const base = `/trips/${trip.id}/shelters`;
  const addButton = can("shelter.edit") && (
    <LinkButton href={`${base}/new`} look="primary">
      Add a shelter
    </LinkButton>
  );
  if (shelters.length === 0) {
    return (
      <PageBody>
        <PageHeading title="Shelters" />
        <EmptyState title="No shelters yet">
          <p>
            Take tarps and tents from the library of ten kinds, or from your own gear, and give them your own numbers.
            Then pitch them at the camps.
          </p>
          {addButton}
        </EmptyState>
      </PageBody>
    );
  }
  return (
    <PageBody>
      <PageHeading
        title={`${plural(shelters.length, "shelter")}, ${plural(places, "place")}`}
        lead="What the group carries to sleep under. Where each stands is set at the camps."
      >
        {addButton}
      </PageHeading>
      <h2 className="sr-only">Shelters of the trip</h2>
      <ShelterGrid>
        {shelters.map((shelter) => {
          const { name } = shelter.details;
          const ids = { tripId: trip.id, shelterId: shelter.id };
          return (
            <li key={shelter.id}>
              <ShelterCard
                details={shelter.details}
                title={
                  can("shelter.edit") ? (
                    <Link href={`${base}/${shelter.id}`} className="text-spruce hover:underline">
                      {name}
                    </Link>
                  ) : (
                    name
                  )
                }
                note={shelter.campNames.length === 0 ? "Pitched nowhere yet." : `At ${joinWords(shelter.campNames)}.`}
              >
                {can("shelter.edit") && (
                  <>
                    <OneButtonForm action={copyShelterAction} values={ids}>
                      Copy <span className="sr-only">{name}</span>
                    </OneButtonForm>
                    <DeleteButton name={name} action={deleteShelterAction} values={ids}>
                      The shelter leaves the trip. Your own gear stays as it is.
                    </DeleteButton>
                  </>
                )}
              </ShelterCard>
            </li>
          );
        })}
      </ShelterGrid>
    </PageBody>
  );
}
