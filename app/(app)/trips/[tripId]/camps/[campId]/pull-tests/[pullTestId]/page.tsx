import { DeleteButton } from "@/components/forms/delete-button";
import { PatchField } from "@/components/pull-tests/patch-field";
import { PullEditForm } from "@/components/pull-tests/pull-edit-form";
import { ReadingPhoto } from "@/components/pull-tests/reading-photo";
import { startFrom } from "@/components/pull-tests/start-pull";
import { PageBody } from "@/components/trip/page-body";
import { LinkButton } from "@/components/ui/button";
import { PageHeading, Section } from "@/components/ui/layout";
import { formatInstant } from "@/lib/format/days";
import { describeFit, describeOutcome } from "@/lib/format/pull-tests";
import { orNotFound } from "@/lib/http/or-not-found";
import { getCampPullTest } from "@/lib/services/pull-tests/get-pull-test";
import { deletePullTestAction } from "../../../../../../pull-tests/actions";
import { loadTrip } from "../../../../_lib/load-trip";
import { updatePullTestAction } from "../actions";

interface PullTestPageProps {
  readonly params: Promise<{ tripId: string; campId: string; pullTestId: string }>;
}

export const metadata = { title: "Pull test" };

export default async function PullTestPage({ params }: PullTestPageProps) {
  const { campId, pullTestId } = await params;
  const { ctx, trip } = await loadTrip(params, "pull-test.edit");
  const input = { tripId: trip.id, campId };
  const { view, reading } = await orNotFound(getCampPullTest({ ctx, input: { ...input, pullTestId } }));
  const base = `/trips/${trip.id}/camps/${campId}/pull-tests`;
  return (
    <PageBody>
      <PageHeading
        title={`${reading.anchorName}: ${describeOutcome(reading)}`}
        lead={`${view.campName}, ${formatInstant(reading.pulledAt, view.timeZone)}, ${reading.loggedByName}. In ${reading.groundName.toLowerCase()}: ${describeFit(reading.fit)}.`}
      >
        <LinkButton href={base} look="quiet">
          All pull tests here
        </LinkButton>
        <DeleteButton name="this reading" look="danger" action={deletePullTestAction} values={{ pullTestId }}>
          A reading that only looks odd is better switched off. Deleting is for what was never pulled.
        </DeleteButton>
      </PageHeading>
      <Section title="Photo">
        <ReadingPhoto
          pullTestId={reading.id}
          hasPhoto={reading.hasPhoto}
          alt={`Photo of the pull test: ${reading.anchorName}`}
        />
      </Section>
      <Section title="Correct it">
        <PullEditForm
          key={reading.version}
          action={updatePullTestAction}
          values={{ ...input, pullTestId, "version:number": String(reading.version) }}
          anchors={[{ id: "as-logged", name: `${reading.anchorName}, as logged` }, ...view.anchors]}
          start={startFrom(reading)}
          conflictHref={`${base}/${pullTestId}`}
        >
          <PatchField patches={view.patches} defaultPatch={reading.patch ?? "main"} />
        </PullEditForm>
      </Section>
    </PageBody>
  );
}
