import { notFound } from "next/navigation";
import { libraryShelter, ShelterLibrary } from "@/components/shelters/library";
import { ShelterCard, ShelterGrid } from "@/components/shelters/shelter-card";
import { ShelterForm } from "@/components/shelters/shelter-form";
import { PageBody } from "@/components/trip/page-body";
import { LinkButton } from "@/components/ui/button";
import { PageHeading, Section } from "@/components/ui/layout";
import { listGear } from "@/lib/services/gear/list-gear";
import { loadTrip } from "../../_lib/load-trip";
import { createShelterAction } from "../actions";

interface NewShelterPageProps {
  readonly params: Promise<{ tripId: string }>;
  readonly searchParams: Promise<{ kind?: string; gear?: string }>;
}

export const metadata = { title: "Add a shelter" };

export default async function NewShelterPage({ params, searchParams }: NewShelterPageProps) {
  const { ctx, trip, preferences } = await loadTrip(params, "shelter.edit");
  const { kind, gear } = await searchParams;
  const own = (await listGear({ ctx })).flatMap(({ id, details }) =>
    details.type === "shelter" ? [{ id, details: details.shelter }] : [],
  );
  const here = `/trips/${trip.id}/shelters/new`;
  if (kind === undefined && gear === undefined) {
    return (
      <PageBody>
        <PageHeading title="Add a shelter" lead="Choose one; its numbers come next and stay yours." />
        {own.length > 0 && (
          <Section title="Your own gear">
            <ShelterGrid>
              {own.map((one) => (
                <li key={one.id}>
                  <ShelterCard details={one.details}>
                    <LinkButton href={`${here}?gear=${one.id}`}>
                      Take <span className="sr-only">{one.details.name}</span>
                    </LinkButton>
                  </ShelterCard>
                </li>
              ))}
            </ShelterGrid>
          </Section>
        )}
        <Section title="Library" lead="Ten generic kinds with typical dimensions.">
          <ShelterLibrary hrefOf={(kindId) => `${here}?kind=${kindId}`} />
        </Section>
      </PageBody>
    );
  }
  const details =
    gear === undefined ? libraryShelter(kind ?? "") : (own.find((one) => one.id === gear)?.details ?? null);
  if (!details) notFound();
  return (
    <PageBody>
      <PageHeading title={`Add: ${details.name}`} lead="Give it the numbers of yours. The drawing follows.">
        <LinkButton href={here} look="quiet">
          Another kind
        </LinkButton>
      </PageHeading>
      <ShelterForm
        action={createShelterAction}
        details={details}
        values={{ tripId: trip.id }}
        lengthUnit={preferences.lengthUnit}
        saveLabel="Add the shelter"
      />
    </PageBody>
  );
}
