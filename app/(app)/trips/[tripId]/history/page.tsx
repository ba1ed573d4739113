import { notFound } from "next/navigation";
import { ChangeFilter } from "@/components/history/change-filter";
import { ChangeLog, PlanVersions } from "@/components/history/change-log";
import { PageBody } from "@/components/trip/page-body";
import { LinkButton } from "@/components/ui/button";
import { PageHeading, Section } from "@/components/ui/layout";
import { orNotFound } from "@/lib/http/or-not-found";
import { listCampSummaries } from "@/lib/services/camps/list-camp-summaries";
import { listChanges, listChangesInput } from "@/lib/services/history/list-changes";
import { listPlanHistory } from "@/lib/services/plan/list-plan-history";
import { loadTrip } from "../_lib/load-trip";

interface HistoryPageProps {
  readonly params: Promise<{ tripId: string }>;
  readonly searchParams: Promise<Record<string, string | string[] | undefined>>;
}

export const metadata = { title: "History" };

export default async function HistoryPage({ params, searchParams }: HistoryPageProps) {
  const { ctx, trip } = await loadTrip(params, "history.read");
  const query = await searchParams;
  const wanted = listChangesInput.safeParse({
    tripId: trip.id,
    campId: query.camp || undefined,
    userId: query.by || undefined,
    before: query.before,
  });
  if (!wanted.success) notFound();
  const { campId, userId } = wanted.data;
  const camps = await listCampSummaries({ ctx, input: { tripId: trip.id } });
  const history = await orNotFound(listChanges({ ctx, input: wanted.data }));
  const camp = camps.find((one) => one.id === campId);
  const versions = camp ? await listPlanHistory({ ctx, input: { tripId: trip.id, campId: camp.id } }) : null;
  const older = new URLSearchParams({
    ...(campId ? { camp: campId } : {}),
    ...(userId ? { by: userId } : {}),
    before: history.olderThan ?? "",
  });
  return (
    <PageBody>
      <PageHeading
        title={camp ? `Who changed what at ${camp.name}` : "Who changed what"}
        lead="Choose a camp to see the versions of its staking plan; any of them can be brought back."
      />
      <ChangeFilter camps={camps} people={history.people} campId={campId} userId={userId} />
      {camp && versions && (
        <Section title="Versions of the staking plan">
          <PlanVersions entries={versions} tripId={trip.id} campId={camp.id} timeZone={trip.timeZone} />
        </Section>
      )}
      <Section title="Changes">
        <ChangeLog entries={history.entries} timeZone={trip.timeZone} />
        {history.olderThan && (
          <LinkButton href={`/trips/${trip.id}/history?${older.toString()}`} className="mt-4">
            Older changes
          </LinkButton>
        )}
      </Section>
    </PageBody>
  );
}
