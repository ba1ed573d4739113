import { cookies } from "next/headers";
import type { Metadata } from "next";
import type { ReactNode } from "react";
import { AccountMenu } from "@/components/shell/account-menu";
import { NightsRail, NightsStrip } from "@/components/shell/nights-rail";
import { SectionLinks, type SectionLink } from "@/components/shell/section-links";
import { TopBar } from "@/components/shell/top-bar";
import { toTheme } from "@/components/shell/themes";
import { orNotFound } from "@/lib/http/or-not-found";
import { requireContext } from "@/lib/auth/session";
import { isAllowed, type Permission } from "@/lib/domain/permissions/permissions";
import { formatDayRange } from "@/lib/format/days";
import { listCampSummaries } from "@/lib/services/camps/list-camp-summaries";
import { getPreferences } from "@/lib/services/preferences/get-preferences";
import { getTrip } from "@/lib/services/trips/get-trip";

interface TripLayoutProps {
  readonly params: Promise<{ tripId: string }>;
  readonly children: ReactNode;
}

const PARTS: readonly { path: string; label: string; permission: Permission }[] = [
  { path: "", label: "Overview", permission: "camp.read" },
  { path: "/route", label: "Route", permission: "route.read" },
  { path: "/shelters", label: "Shelters", permission: "camp.read" },
  { path: "/kit", label: "Kit", permission: "camp.read" },
  { path: "/people", label: "People", permission: "people.read" },
  { path: "/papers", label: "Cards", permission: "paper.all" },
  { path: "/post", label: "Post", permission: "post.read" },
  { path: "/history", label: "History", permission: "history.read" },
  { path: "/mine", label: "Mine", permission: "paper.own" },
  { path: "/details", label: "About me", permission: "details.own" },
  { path: "/messages", label: "Messages", permission: "answer.own" },
  { path: "/settings", label: "Settings", permission: "trip.edit" },
];

export async function generateMetadata({ params }: TripLayoutProps): Promise<Metadata> {
  const { tripId } = await params;
  const ctx = await requireContext();
  const trip = await orNotFound(getTrip({ ctx, input: { tripId } }));
  return { title: { default: trip.name, template: `%s · ${trip.name}` } };
}

export default async function TripLayout({ params, children }: TripLayoutProps) {
  const { tripId } = await params;
  const ctx = await requireContext();
  const trip = await orNotFound(getTrip({ ctx, input: { tripId } }));
  const preferences = await getPreferences({ ctx });
  const camps = isAllowed(trip.role, "camp.read") ? await listCampSummaries({ ctx, input: { tripId } }) : [];
  const links: SectionLink[] = PARTS.filter((part) => isAllowed(trip.role, part.permission)).map((part) => ({
    href: `/trips/${tripId}${part.path}`,
    label: part.label,
    isExact: part.path === "",
  }));
  const nights = { tripId, camps, speedUnit: preferences.speedUnit };
  const hasRail = isAllowed(trip.role, "camp.read");
  return (
    <>
      <TopBar account={<AccountMenu name={ctx.actor.name} theme={toTheme((await cookies()).get("theme")?.value)} />}>
        <p className="min-w-0 truncate text-15 font-semibold">{trip.name}</p>
        <p className="text-13 text-pencil">{formatDayRange(trip.startDate, trip.endDate)}</p>
      </TopBar>
      <div className="no-print border-b border-hair px-4 sm:px-6">
        <SectionLinks label="Trip" links={links} />
        {hasRail && (
          <nav aria-label="Nights" className="border-t border-hair py-1 lg:hidden">
            <NightsStrip {...nights} />
          </nav>
        )}
      </div>
      <div className={hasRail ? "lg:grid lg:grid-cols-[16rem_minmax(0,1fr)]" : ""}>
        {hasRail && (
          <aside className="no-print hidden border-r border-hair px-4 py-6 lg:block">
            <p className="mb-3 pl-2 text-13 text-pencil">Nights</p>
            <NightsRail {...nights} />
          </aside>
        )}
        <main id="main" className="min-w-0">
          {children}
        </main>
      </div>
    </>
  );
}
