import type { ReactNode } from "react";
import { SectionLinks } from "@/components/shell/section-links";
import { requireContext } from "@/lib/auth/session";
import { orNotFound } from "@/lib/http/or-not-found";
import { getCamp } from "@/lib/services/camps/get-camp";

interface CampLayoutProps {
  readonly params: Promise<{ tripId: string; campId: string }>;
  readonly children: ReactNode;
}

/** The parts of a camp. Whoever may not see it is turned away here, before anything is sent, so that the status is 404. */
export default async function CampLayout({ params, children }: CampLayoutProps) {
  const { tripId, campId } = await params;
  const ctx = await requireContext();
  await orNotFound(getCamp({ ctx, input: { tripId, campId } }));
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
          ]}
        />
      </div>
      {children}
    </>
  );
}
