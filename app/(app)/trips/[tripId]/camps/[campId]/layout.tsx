import Link from "next/link";
import type { ReactNode } from "react";
import { SwitchButton } from "@/components/forecast/alternatives";
import { SectionLinks } from "@/components/shell/section-links";
import { requireContext } from "@/lib/auth/session";
import { HAZARDS } from "@/lib/domain/camp/schema";
import { formatDayShort } from "@/lib/format/days";
import { joinWords } from "@/lib/format/words";
import { orNotFound } from "@/lib/http/or-not-found";
import { getCamp } from "@/lib/services/camps/get-camp";
import { switchToAlternativeAction } from "./weather/actions";

const lowerFirst = (text: string) => text.charAt(0).toLowerCase() + text.slice(1);

interface CampLayoutProps {
  readonly params: Promise<{ tripId: string; campId: string }>;
  readonly children: ReactNode;
}

/** The parts of a camp. Whoever may not see it is turned away here, before anything is sent, so that the status is 404. */
export default async function CampLayout({ params, children }: CampLayoutProps) {
  const { tripId, campId } = await params;
  const ctx = await requireContext();
  const { details, alternativeTo, days } = await orNotFound(getCamp({ ctx, input: { tripId, campId } }));
  const mind = HAZARDS.filter((hazard) => details.hazards.includes(hazard.key));
  const base = `/trips/${tripId}/camps/${campId}`;
  return (
    <>
      <div className="no-print border-b border-hair px-4 sm:px-6">
        <SectionLinks
          label="Camp"
          links={[
            { href: base, label: "Staking plan" },
            { href: `${base}/place`, label: "Ground and wind" },
            { href: `${base}/shelters`, label: "Shelters and sleepers" },
            { href: `${base}/pull-tests`, label: "Pull tests" },
            { href: `${base}/weather`, label: "Weather" },
            { href: `${base}/comments`, label: "Comments" },
          ]}
        />
        {alternativeTo && (
          <div className="flex flex-wrap items-center gap-x-6 gap-y-2 border-t border-hair py-2 text-15">
            <p className="min-w-[14rem] flex-1">
              <b>Kept beside for bad weather.</b> In place of{" "}
              <Link
                href={`/trips/${tripId}/camps/${alternativeTo.id}`}
                className="font-semibold text-spruce hover:underline"
              >
                {alternativeTo.name}
              </Link>
              , {days.map(formatDayShort).join(", ")}. No list or card of the trip counts it.
            </p>
            <SwitchButton
              tripId={tripId}
              camp={{ id: campId, name: details.name, alternativeTo }}
              action={switchToAlternativeAction}
            />
          </div>
        )}
        {mind.length > 0 && (
          <p className="border-t border-hair py-2 text-15">
            <b className="text-ochre">Mind:</b> {joinWords(mind.map(({ name }) => lowerFirst(name)))}.{" "}
            <Link href={`${base}/weather`} className="font-semibold text-spruce hover:underline">
              What to do
            </Link>
          </p>
        )}
      </div>
      {children}
    </>
  );
}
