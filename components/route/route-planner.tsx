"use client";

import { useMemo } from "react";
import { Button } from "@/components/ui/button";
import { Section } from "@/components/ui/layout";
import type { RouteView } from "@/lib/domain/route/views";
import { workOutLegs } from "@/lib/domain/route/work-out-legs";
import type { Preferences } from "@/lib/domain/preferences";
import { DaysTable } from "./days-table";
import { ElevationProfile } from "./elevation-profile";
import { PlanSketch } from "./plan-sketch";
import { usePlacedCamps, type PlaceAction } from "./use-placed-camps";

/** The way in profile, day by day and from above. While a camp is dragged, all three follow. */
export function RoutePlanner({
  route,
  unit,
  placeAction,
}: {
  readonly route: RouteView;
  readonly unit: Preferences["lengthUnit"];
  readonly placeAction: PlaceAction;
}) {
  const { view, moves, message, place, undoName, takeBack } = usePlacedCamps(route, placeAction);
  const legs = useMemo(() => workOutLegs(view), [view]);
  const unplaced = view.line ? view.stops.filter((stop) => stop.atM === null) : [];

  /** Half-way between the neighbours that are on the line. */
  const placeBetween = (campId: string) => {
    const index = view.stops.findIndex((stop) => stop.campId === campId);
    const before = view.stops.slice(0, index).findLast((stop) => stop.atM !== null)?.atM ?? 0;
    const after = view.stops.slice(index + 1).find((stop) => stop.atM !== null)?.atM ?? view.line?.lengthM ?? 0;
    void place(campId, (before + after) / 2);
  };

  return (
    <>
      {view.line && (
        <Section title="Profile">
          <ElevationProfile view={view} unit={unit} moves={moves} />
          <div className="flex min-h-11 flex-wrap items-center gap-3">
            <p role="status" className="text-15 text-pencil">
              {message}
            </p>
            {undoName && (
              <Button look="quiet" onClick={() => void takeBack()}>
                {`Put ${undoName} back`}
              </Button>
            )}
          </div>
          {unplaced.length > 0 && (
            <div className="mt-2 flex flex-wrap items-center gap-3">
              <p className="text-15">Not on the line yet:</p>
              {unplaced.map((stop) => (
                <Button key={stop.campId} onClick={() => placeBetween(stop.campId)}>
                  {`Place ${stop.name}`}
                </Button>
              ))}
            </div>
          )}
        </Section>
      )}
      {legs.length > 0 && (
        <Section title="Days">
          <DaysTable legs={legs} settings={view.settings} unit={unit} />
          <p className="mt-3 max-w-[46rem] text-13 text-pencil">
            Distances on the WGS 84 ellipsoid. Heights are averaged over 150 m of the way, and rises under 5 m are not
            counted. Sunset and dark are for a level horizon: hills bring them earlier. Rules of time are for fair
            weather and good ground.
          </p>
        </Section>
      )}
      {(view.line !== null || view.stops.some((stop) => stop.latitude !== null)) && (
        <Section title="From above">
          <PlanSketch view={view} unit={unit} />
        </Section>
      )}
    </>
  );
}
