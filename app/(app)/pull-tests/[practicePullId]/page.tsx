import { DeleteButton } from "@/components/forms/delete-button";
import { PracticeGroundFields } from "@/components/pull-tests/practice-ground-fields";
import { PullEditForm } from "@/components/pull-tests/pull-edit-form";
import { ReadingPhoto } from "@/components/pull-tests/reading-photo";
import { startFrom } from "@/components/pull-tests/start-pull";
import { LinkButton } from "@/components/ui/button";
import { PageHeading, Section } from "@/components/ui/layout";
import { requireContext } from "@/lib/auth/session";
import { formatInstant } from "@/lib/format/days";
import { describeFit, describeOutcome } from "@/lib/format/pull-tests";
import { orNotFound } from "@/lib/http/or-not-found";
import { getPracticePullTest } from "@/lib/services/pull-tests/get-pull-test";
import { deletePullTestAction, updatePracticePullAction } from "../actions";

interface PracticePullPageProps {
  readonly params: Promise<{ practicePullId: string }>;
}

export const metadata = { title: "Pull test" };

export default async function PracticePullPage({ params }: PracticePullPageProps) {
  const { practicePullId: pullTestId } = await params;
  const ctx = await requireContext();
  const { view, reading } = await orNotFound(getPracticePullTest({ ctx, input: { pullTestId } }));
  return (
    <>
      <PageHeading
        title={`${reading.anchorName}: ${describeOutcome(reading)}`}
        lead={`${reading.place}, ${formatInstant(reading.pulledAt, "UTC")} UTC. In ${reading.groundName.toLowerCase()}: ${describeFit(reading.fit)}.`}
      >
        <LinkButton href="/pull-tests" look="quiet">
          Practice field
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
          action={updatePracticePullAction}
          values={{ pullTestId, "version:number": String(reading.version) }}
          anchors={[{ id: "as-logged", name: `${reading.anchorName}, as logged` }, ...view.anchors]}
          start={startFrom(reading)}
          conflictHref={`/pull-tests/${pullTestId}`}
        >
          <PracticeGroundFields
            start={{
              place: reading.place,
              kind: reading.ground.kind,
              looseTopM: reading.ground.looseTopM,
              stoneDepthM: reading.ground.stoneDepthM,
            }}
          />
        </PullEditForm>
      </Section>
    </>
  );
}
