import { RestorePlan } from "@/components/history/restore-plan";
import { PageBody } from "@/components/trip/page-body";
import { LinkButton } from "@/components/ui/button";
import { PageHeading, Section } from "@/components/ui/layout";
import { newId } from "@/lib/domain/new-id";
import { formatInstant } from "@/lib/format/days";
import { plural } from "@/lib/format/words";
import { orNotFound } from "@/lib/http/or-not-found";
import { previewPlanVersion } from "@/lib/services/plan/preview-plan-version";
import { loadTrip } from "../../../_lib/load-trip";
import { restorePlanVersionAction } from "../../actions";

interface PreviewPageProps {
  readonly params: Promise<{ tripId: string; campId: string; version: string }>;
}

export const metadata = { title: "An earlier plan" };

export default async function EarlierPlanPage({ params }: PreviewPageProps) {
  const { ctx, trip, can } = await loadTrip(params, "history.read");
  const { campId, version } = await params;
  const preview = await orNotFound(previewPlanVersion({ ctx, input: { tripId: trip.id, campId, version } }));
  return (
    <PageBody>
      <PageHeading
        title={`${preview.campName}: the plan of version ${preview.version}`}
        lead={`As ${preview.byName} left it on ${formatInstant(preview.at, trip.timeZone)}. The plan is at version ${preview.currentVersion} now.`}
      >
        <LinkButton href={`/trips/${trip.id}/history?camp=${campId}`} look="quiet">
          All versions
        </LinkButton>
      </PageHeading>
      <Section
        title={
          preview.rows.length === 0
            ? "The plan is the same now"
            : `${plural(preview.rows.length, "tie-out")} would change`
        }
      >
        {preview.leftOut.length > 0 && (
          <div className="mb-4 border-l-4 border-ochre pl-4 text-15">
            <p className="font-semibold">Not all of it can come back</p>
            <ul>
              {preview.leftOut.map((line) => (
                <li key={line}>{line}</li>
              ))}
            </ul>
          </div>
        )}
        <ul>
          {preview.rows.map((row) => (
            <li key={row.key} className="border-t border-hair py-3">
              <p className="text-15 font-bold">{row.where}</p>
              <dl className="grid grid-cols-[4rem_minmax(0,1fr)] gap-x-3 text-15">
                <dt className="text-pencil">Now</dt>
                <dd>{row.now}</dd>
                <dt className="text-pencil">Then</dt>
                <dd className="font-semibold">{row.then}</dd>
              </dl>
            </li>
          ))}
        </ul>
      </Section>
      {preview.rows.length > 0 && can("plan.edit") && (
        <RestorePlan action={restorePlanVersionAction} tripId={trip.id} preview={preview} intentId={newId()} />
      )}
    </PageBody>
  );
}
