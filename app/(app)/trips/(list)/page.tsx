import Link from "next/link";
import { LinkButton } from "@/components/ui/button";
import { EmptyState, PageHeading } from "@/components/ui/layout";
import { requireContext } from "@/lib/auth/session";
import { ROLE_NAMES } from "@/lib/domain/permissions/permissions";
import type { TripListItem } from "@/lib/domain/views";
import { dayOf, formatDayRange } from "@/lib/format/days";
import { plural } from "@/lib/format/words";
import { listTrips } from "@/lib/services/trips/list-trips";

export const metadata = { title: "Trips" };

export default async function TripsPage() {
  const ctx = await requireContext();
  const trips = await listTrips({ ctx });
  const today = dayOf(new Date(), "UTC");
  const next = trips
    .filter((trip) => trip.endDate >= today)
    .toSorted((a, b) => a.startDate.localeCompare(b.startDate))[0];
  return (
    <>
      <PageHeading title="Trips" lead={trips.length > 0 ? "The ones you lead and the ones you join." : undefined}>
        {trips.length > 0 && (
          <LinkButton href="/trips/new" look="primary">
            New trip
          </LinkButton>
        )}
      </PageHeading>
      {trips.length === 0 ? (
        <EmptyState title="No trips yet">
          <p>
            A trip holds its camps, the shelters pitched at them, the kit, and who comes along. Start with a name and
            the day of the first night. If somebody leads you, open the link in their mail.
          </p>
          <LinkButton href="/trips/new" look="primary">
            Start a trip
          </LinkButton>
        </EmptyState>
      ) : (
        <>
          {next && <NextTrip trip={next} />}
          <ul className="border-b border-hair">
            {trips.map((trip) => (
              <TripRow key={trip.id} trip={trip} />
            ))}
          </ul>
        </>
      )}
    </>
  );
}

/** What lies ahead first, with the way to one's own pages of it. */
function NextTrip({ trip }: { readonly trip: TripListItem }) {
  return (
    <div className="mb-8 flex flex-wrap items-center justify-between gap-x-6 gap-y-3 border-l-4 border-spruce pl-4">
      <p className="text-15">
        <span className="block text-13 text-pencil">Next</span>
        <span className="block text-18 font-bold">{trip.name}</span>
        {formatDayRange(trip.startDate, trip.endDate)}
      </p>
      <LinkButton href={`/trips/${trip.id}/mine`}>Your pages</LinkButton>
    </div>
  );
}

function TripRow({ trip }: { readonly trip: TripListItem }) {
  return (
    <li className="border-t border-hair">
      <Link
        href={`/trips/${trip.id}`}
        className="group grid gap-x-6 gap-y-1 py-4 sm:grid-cols-[10rem_minmax(0,1fr)_8rem] sm:items-baseline"
      >
        <span className="text-15 text-pencil">
          {formatDayRange(trip.startDate, trip.endDate)}
          <span className="block text-13">{trip.startDate.slice(0, 4)}</span>
        </span>
        <span className="min-w-0">
          <span className="block text-18 font-bold group-hover:text-spruce group-hover:underline">{trip.name}</span>
          <span className="block text-15 text-pencil">
            {[
              plural(trip.nights, "night"),
              plural(trip.campCount, "camp"),
              plural(trip.peopleCount, "person", "people"),
            ].join(" · ")}
          </span>
        </span>
        <span className="text-15 sm:text-right">{ROLE_NAMES[trip.role]}</span>
      </Link>
    </li>
  );
}
