import { Suspense } from "react";
import { PitchList } from "@/components/shelters/pitch-list";
import { SleepingBoard } from "@/components/sleepers/sleeping-board";
import { PageBody, PageSkeleton } from "@/components/trip/page-body";
import { LinkButton } from "@/components/ui/button";
import { EmptyState, PageHeading, Section } from "@/components/ui/layout";
import type { Preferences } from "@/lib/domain/preferences";
import type { SleepingPlanView } from "@/lib/domain/views";
import { formatDay } from "@/lib/format/days";
import { plural } from "@/lib/format/words";
import type { Context } from "@/lib/services/context/context";
import { getCampPlan } from "@/lib/services/plan/get-camp-plan";
import { listShelters } from "@/lib/services/shelters/list-shelters";
import { getSleepingPlan } from "@/lib/services/sleepers/get-sleeping-plan";
import { loadTrip } from "../../../_lib/load-trip";
import { createPitchAction, deletePitchAction, saveSleepersAction, updatePitchAction } from "./actions";

interface CampSheltersPageProps {
  readonly params: Promise<{ tripId: string; campId: string }>;
}

export const metadata = { title: "Shelters and sleepers" };

export default async function CampSheltersPage({ params }: CampSheltersPageProps) {
  const { campId } = await params;
  const { ctx, trip, preferences } = await loadTrip(params, "shelter.pitch");
  return (
    <PageBody>
      <Suspense fallback={<PageSkeleton />}>
        <CampShelters ctx={ctx} tripId={trip.id} campId={campId} preferences={preferences} />
      </Suspense>
    </PageBody>
  );
}

async function CampShelters(props: { ctx: Context; tripId: string; campId: string; preferences: Preferences }) {
  const { ctx, tripId, campId, preferences } = props;
  const [sleeping, plan, shelters] = await Promise.all([
    getSleepingPlan({ ctx, input: { tripId, campId } }),
    getCampPlan({ ctx, input: { tripId, campId } }),
    listShelters({ ctx, input: { tripId } }),
  ]);
  const { details, days } = plan.camp;
  const pitched = new Set(plan.pitches.map((pitch) => pitch.shelterId));
  const free = shelters.filter((shelter) => !pitched.has(shelter.id));
  return (
    <>
      <PageHeading title={describeSleeping(sleeping)} lead={`${details.name}, ${days.map(formatDay).join(", ")}`} />
      <Section title="Who sleeps where">
        {plan.pitches.length === 0 ? (
          <p className="text-15 text-pencil">Pitch a shelter below; then everybody gets a place in it.</p>
        ) : (
          <SleepingBoard
            key={sleeping.pitches.map((pitch) => pitch.id).join(" ") + sleeping.people.length}
            plan={sleeping}
            tripId={tripId}
            action={saveSleepersAction}
          />
        )}
      </Section>
      <Section title="Pitched here">
        {shelters.length === 0 ? (
          <EmptyState title="The trip has no shelters yet">
            <p>Take one from the library or from your own gear, then pitch it here.</p>
            <LinkButton href={`/trips/${tripId}/shelters/new`} look="primary">
              Add a shelter
            </LinkButton>
          </EmptyState>
        ) : (
          <PitchList
            tripId={tripId}
            campId={campId}
            pitches={plan.pitches.map(({ id, name, details: how, version, spec, sleeps }) => ({
              id,
              name,
              details: how,
              version,
              spec,
              sleeps,
            }))}
            free={free.map((shelter) => ({
              id: shelter.id,
              name: shelter.details.name,
              sleeps: shelter.details.sleeps,
            }))}
            hasSecondPatch={details.secondGround !== null}
            wind={{ fromDeg: details.windFromDeg, toDeg: details.windToDeg }}
            lengthUnit={preferences.lengthUnit}
            actions={{ create: createPitchAction, update: updatePitchAction, remove: deletePitchAction }}
          />
        )}
      </Section>
    </>
  );
}

/** The headline says whether everybody has a place. */
function describeSleeping({ unplacedIds, people, pitches }: SleepingPlanView): string {
  const places = pitches.reduce((sum, pitch) => sum + pitch.sleeps, 0);
  if (pitches.length === 0) return "No shelter is pitched here yet";
  if (unplacedIds.length === 0) return "Everybody has a place";
  const short = people.length - places;
  const open = `${plural(unplacedIds.length, "person has", "people have")} no place yet`;
  return short > 0 ? `${open}, ${plural(short, "place")} short` : open;
}
