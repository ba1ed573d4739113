import type { Metadata } from "next";
import { StakingBoard } from "@/components/board/staking-board";
import { startBoardView } from "@/components/board/start-board-view";
import { LinkButton } from "@/components/ui/button";
import { EmptyState, PageHeading } from "@/components/ui/layout";
import { requireContext } from "@/lib/auth/session";
import { orNotFound } from "@/lib/http/or-not-found";
import { getCamp } from "@/lib/services/camps/get-camp";
import { getCampPlan } from "@/lib/services/plan/get-camp-plan";
import { getPreferences } from "@/lib/services/preferences/get-preferences";

interface CampPageProps {
  readonly params: Promise<{ tripId: string; campId: string }>;
}

export async function generateMetadata({ params }: CampPageProps): Promise<Metadata> {
  const input = await params;
  const camp = await orNotFound(getCamp({ ctx: await requireContext(), input }));
  return { title: camp.details.name };
}

/** The staking plan of a camp. */
export default async function CampPage({ params }: CampPageProps) {
  const { tripId, campId } = await params;
  const ctx = await requireContext();
  const view = await orNotFound(getCampPlan({ ctx, input: { tripId, campId } }));
  if (view.pitches.length === 0) {
    const base = `/trips/${tripId}/camps/${campId}`;
    return (
      <div className="px-4 py-6 sm:px-7">
        <PageHeading title={view.camp.details.name} lead="No shelter is pitched here yet." />
        <EmptyState title="A staking plan starts with a shelter">
          <p>
            Say which shelters stand at this camp and who sleeps in them. Their tie-outs then appear here, each with the
            pull that the wind puts on it.
          </p>
          <LinkButton look="primary" href={`${base}/shelters`}>
            Pitch a shelter here
          </LinkButton>
        </EmptyState>
      </div>
    );
  }
  const preferences = await getPreferences({ ctx });
  return (
    <StakingBoard
      key={campId}
      view={view}
      start={startBoardView(view)}
      preferences={preferences}
      userId={ctx.actor.userId}
    />
  );
}
