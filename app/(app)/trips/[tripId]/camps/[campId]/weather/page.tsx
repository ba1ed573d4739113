import { Suspense } from "react";
import { Alternatives, NewAlternativeForm } from "@/components/forecast/alternatives";
import { ForecastPanel } from "@/components/forecast/forecast-panel";
import { HazardList } from "@/components/trip/hazard-list";
import { PageBody, PageSkeleton } from "@/components/trip/page-body";
import { Cautions, PageHeading, Section } from "@/components/ui/layout";
import { formatDay } from "@/lib/format/days";
import { orNotFound } from "@/lib/http/or-not-found";
import { getCamp } from "@/lib/services/camps/get-camp";
import { listAlternatives } from "@/lib/services/camps/list-alternatives";
import { getCampForecast } from "@/lib/services/forecast/get-camp-forecast";
import { loadTrip } from "../../../_lib/load-trip";
import { deleteCampAction } from "../../actions";
import {
  acceptForecastAction,
  createAlternativeAction,
  fetchForecastAction,
  switchToAlternativeAction,
} from "./actions";

interface WeatherPageProps {
  readonly params: Promise<{ tripId: string; campId: string }>;
}

export const metadata = { title: "Weather" };

/** The forecast beside a camp's plan, what its place can do, and where else the group can go. */
export default async function WeatherPage({ params }: WeatherPageProps) {
  const { campId } = await params;
  const given = await loadTrip(params, "camp.edit");
  const camp = await orNotFound(getCamp({ ctx: given.ctx, input: { tripId: given.trip.id, campId } }));
  return (
    <PageBody>
      <PageHeading title={`${camp.details.name}: weather`} lead={`${camp.days.map(formatDay).join(", ")}.`} />
      <Suspense fallback={<PageSkeleton rows={3} />}>
        <Weather given={given} camp={camp} />
      </Suspense>
      <Cautions />
    </PageBody>
  );
}

async function Weather({
  given: { ctx, trip, preferences, can },
  camp,
}: {
  given: Awaited<ReturnType<typeof loadTrip>>;
  camp: Awaited<ReturnType<typeof getCamp>>;
}) {
  const { id: tripId, timeZone } = trip;
  const forecast = await getCampForecast({ ctx, input: { tripId, campId: camp.id } });
  const all = await listAlternatives({ ctx, input: { tripId } });
  const own = all.filter((one) => one.alternativeTo.id === camp.id);
  const placeHref = `/trips/${tripId}/camps/${camp.id}/place`;
  return (
    <>
      <Section title="Forecast">
        <ForecastPanel
          forecast={forecast}
          tripId={tripId}
          timeZone={timeZone}
          preferences={preferences}
          placeHref={placeHref}
          fetchAction={fetchForecastAction}
          acceptAction={acceptForecastAction}
        />
      </Section>
      <Section title="This place">
        <HazardList details={camp.details} placeHref={placeHref} lengthUnit={preferences.lengthUnit} />
      </Section>
      {camp.alternativeTo === null && (
        <Section
          title="In bad weather"
          lead="Another place for these nights, with ground, wind and plan of its own. It stays beside until you use it."
        >
          <Alternatives
            tripId={tripId}
            alternatives={own}
            unit={preferences.speedUnit}
            switchAction={switchToAlternativeAction}
            {...(can("camp.arrange") ? { deleteAction: deleteCampAction } : {})}
          />
          {can("camp.arrange") && own.length < 3 && (
            <div className="mt-4 border-t border-hair pt-4">
              <NewAlternativeForm action={createAlternativeAction} tripId={tripId} campId={camp.id} />
            </div>
          )}
          {own.length === 0 && !can("camp.arrange") && <p className="text-15 text-pencil">None yet.</p>}
        </Section>
      )}
    </>
  );
}
