import { LineTools } from "@/components/route/line-tools";
import { PlacesToCamps } from "@/components/route/places-to-camps";
import { RoutePlanner } from "@/components/route/route-planner";
import { WalkingForm } from "@/components/route/walking-form";
import { PageBody } from "@/components/trip/page-body";
import { LinkButton } from "@/components/ui/button";
import { PageHeading } from "@/components/ui/layout";
import { workOutLegs } from "@/lib/domain/route/work-out-legs";
import { describeRoute } from "@/lib/format/route";
import { getRoute } from "@/lib/services/route/get-route";
import { loadTrip } from "../_lib/load-trip";
import {
  createCampsFromPlacesAction,
  deleteRouteAction,
  drawRouteAction,
  placeCampAction,
  saveRouteSettingsAction,
} from "./actions";

interface RoutePageProps {
  readonly params: Promise<{ tripId: string }>;
}

export const metadata = { title: "Route" };

export default async function RoutePage({ params }: RoutePageProps) {
  const { ctx, trip, preferences, can } = await loadTrip(params, "route.read");
  const route = await getRoute({ ctx, input: { tripId: trip.id } });
  const unit = preferences.lengthUnit;
  const { title, lead } = describeRoute(workOutLegs(route), route, unit);
  return (
    <PageBody>
      <PageHeading title={title} lead={lead}>
        {route.line && (
          <LinkButton href={`/api/gpx/${trip.id}`} prefetch={false}>
            Download GPX
          </LinkButton>
        )}
      </PageHeading>
      <RoutePlanner route={route} unit={unit} placeAction={placeCampAction} />
      {can("route.edit") && (
        <>
          <LineTools view={route} unit={unit} drawAction={drawRouteAction} deleteAction={deleteRouteAction} />
          <PlacesToCamps view={route} unit={unit} action={createCampsFromPlacesAction} />
          {route.stops.length > 0 && (
            <WalkingForm view={route} preferences={preferences} action={saveRouteSettingsAction} />
          )}
        </>
      )}
    </PageBody>
  );
}
