import Link from "next/link";
import { redirect } from "next/navigation";
import { Suspense } from "react";
import { Alternatives } from "@/components/forecast/alternatives";
import { TripForecasts } from "@/components/forecast/trip-forecasts";
import { ElevationProfile } from "@/components/route/elevation-profile";
import { AltitudeSteps } from "@/components/trip/altitude-steps";
import { BeforeYouGo } from "@/components/trip/before-you-go";
import { NightsTable } from "@/components/trip/nights-table";
import { PageBody, PageSkeleton } from "@/components/trip/page-body";
import { TripFacts } from "@/components/trip/trip-facts";
import { LinkButton } from "@/components/ui/button";
import { Cautions, EmptyState, PageHeading, Section } from "@/components/ui/layout";
import { isAllowed } from "@/lib/domain/permissions/permissions";
import { workOutLegs } from "@/lib/domain/route/work-out-legs";
import type { Preferences } from "@/lib/domain/preferences";
import type { TripView } from "@/lib/domain/views";
import { listAlternatives } from "@/lib/services/camps/list-alternatives";
import { listTripForecasts } from "@/lib/services/forecast/list-trip-forecasts";
import { describeRoute } from "@/lib/format/route";
import type { Context } from "@/lib/services/context/context";
import { getRoute } from "@/lib/services/route/get-route";
import { getTripOverview } from "@/lib/services/trips/get-trip-overview";
import { loadTrip } from "../_lib/load-trip";
import { checkAllCampsAction, switchToAlternativeAction } from "../camps/[campId]/weather/actions";

interface TripPageProps {
  readonly params: Promise<{ tripId: string }>;
}

export default async function TripPage({ params }: TripPageProps) {
  const { ctx, trip, preferences, can } = await loadTrip(params, "trip.read");
  if (!can("camp.read")) redirect(`/trips/${trip.id}/mine`);
  return (
    <Suspense
      fallback={
        <PageBody>
          <PageSkeleton />
        </PageBody>
      }
    >
      <Overview ctx={ctx} tripId={trip.id} preferences={preferences} />
    </Suspense>
  );
}

async function Overview({ ctx, tripId, preferences }: { ctx: Context; tripId: string; preferences: Preferences }) {
  const overview = await getTripOverview({ ctx, input: { tripId } });
  const route = await getRoute({ ctx, input: { tripId } });
  const { trip, camps, headline, subline, todo } = overview;
  const mayArrange = isAllowed(trip.role, "camp.arrange");
  if (camps.length === 0) {
    return (
      <PageBody>
        <PageHeading title={trip.name} />
        <EmptyState title="No camps yet">
          <p>
            A trip is a line of nights. Add the first camp with its name; ground, wind and shelters follow, and each
            camp then says what it holds to.
          </p>
          {mayArrange && (
            <LinkButton href={`/trips/${trip.id}/camps/new`} look="primary">
              Add the first camp
            </LinkButton>
          )}
        </EmptyState>
      </PageBody>
    );
  }
  return (
    <PageBody
      aside={
        <>
          <BeforeYouGo items={todo} />
          <TripFacts overview={overview} />
        </>
      }
    >
      <PageHeading title={headline} lead={subline} />
      {route.line ? (
        <div className="mb-8 hidden sm:block">
          <ElevationProfile view={route} unit={preferences.lengthUnit} moves={null} />
          <p className="text-15">
            {describeRoute(workOutLegs(route), route, preferences.lengthUnit).title}.{" "}
            <Link href={`/trips/${trip.id}/route`} className="font-semibold text-spruce hover:underline">
              Look at the days
            </Link>
          </p>
        </div>
      ) : (
        <AltitudeSteps camps={camps} unit={preferences.lengthUnit} />
      )}
      <h2 className="sr-only">Nights</h2>
      <NightsTable tripId={trip.id} camps={camps} preferences={preferences} />
      {mayArrange && (
        <div className="mt-4 mb-10 flex flex-wrap gap-3 border-t border-hair pt-4">
          <LinkButton href={`/trips/${trip.id}/camps/new`}>Add a camp</LinkButton>
          <LinkButton href={`/trips/${trip.id}/camps`} look="quiet">
            Order, copy or delete camps
          </LinkButton>
        </div>
      )}
      <Suspense fallback={<PageSkeleton rows={2} />}>
        <Weather ctx={ctx} trip={trip} preferences={preferences} />
      </Suspense>
      <Cautions />
    </PageBody>
  );
}

async function Weather({ ctx, trip, preferences }: { ctx: Context; trip: TripView; preferences: Preferences }) {
  const input = { tripId: trip.id };
  const forecasts = await listTripForecasts({ ctx, input });
  const alternatives = await listAlternatives({ ctx, input });
  return (
    <>
      <Section title="Forecast">
        <TripForecasts
          forecasts={forecasts}
          tripId={trip.id}
          timeZone={trip.timeZone}
          preferences={preferences}
          checkAction={checkAllCampsAction}
        />
      </Section>
      {alternatives.length > 0 && (
        <Section title="In bad weather" lead="Kept beside the line of nights until you use them.">
          <Alternatives
            tripId={trip.id}
            alternatives={alternatives}
            unit={preferences.speedUnit}
            switchAction={switchToAlternativeAction}
          />
        </Section>
      )}
    </>
  );
}
