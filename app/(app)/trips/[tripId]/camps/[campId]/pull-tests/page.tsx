import { GroundEstimate } from "@/components/pull-tests/ground-estimate";
import { CurveKey } from "@/components/pull-tests/learning-curve";
import { LearnedChanges } from "@/components/pull-tests/learned-changes";
import { LearningChoices } from "@/components/pull-tests/learning-choices";
import { PatchField } from "@/components/pull-tests/patch-field";
import { PullForm } from "@/components/pull-tests/pull-form";
import { PullTestList } from "@/components/pull-tests/pull-test-list";
import { startPull } from "@/components/pull-tests/start-pull";
import { SheetForm } from "@/components/pull-tests/sheet-form";
import { TableInOut } from "@/components/pull-tests/table-in-out";
import { PageBody } from "@/components/trip/page-body";
import { LinkButton } from "@/components/ui/button";
import { Cautions, EmptyState, PageHeading, Section } from "@/components/ui/layout";
import { newId } from "@/lib/domain/ids";
import type { CampPullTestsView } from "@/lib/domain/pull-test/views";
import { describeFactor } from "@/lib/format/pull-tests";
import { plural } from "@/lib/format/words";
import { orNotFound } from "@/lib/http/or-not-found";
import { getCamp } from "@/lib/services/camps/get-camp";
import { COLUMNS } from "@/lib/services/pull-tests/csv/columns";
import { getCampPullTests } from "@/lib/services/pull-tests/get-camp-pull-tests";
import { switchPullTestAction } from "../../../../../pull-tests/actions";
import { loadTrip } from "../../../_lib/load-trip";
import { chooseElsewhereAction, logPullTestAction, startAgainAction } from "./actions";

interface PullTestsPageProps {
  readonly params: Promise<{ tripId: string; campId: string }>;
}

export const metadata = { title: "Pull tests" };

/** The headline says what the readings make of the main ground. */
function headlineOf({ patches }: CampPullTestsView): string {
  const [first] = patches;
  if (!first) return "No ground to test yet";
  if (first.from === "table") return `${first.groundName}: not tested yet`;
  return `${first.groundName} holds ${describeFactor(first.factor)}`;
}

const oddCount = ({ readings }: CampPullTestsView) =>
  readings.filter(({ fit }) => fit.status === "implausible" || (fit.status === "counts" && fit.isOutlier)).length;

export default async function PullTestsPage({ params }: PullTestsPageProps) {
  const { campId } = await params;
  const { ctx, trip, preferences } = await loadTrip(params, "pull-test.read");
  const input = { tripId: trip.id, campId };
  const camp = await orNotFound(getCamp({ ctx, input }));
  const view = await orNotFound(getCampPullTests({ ctx, input }));
  const base = `/trips/${trip.id}/camps/${campId}`;
  if (view.patches.length === 0) {
    return (
      <PageBody>
        <PageHeading title={headlineOf(view)} lead={camp.details.name} />
        <EmptyState title="A pull test needs a ground">
          <p>Say what the ground of this camp is. Then pull an anchor with a scale and write down what it showed.</p>
          <LinkButton look="primary" href={`${base}/place`}>
            Choose the ground
          </LinkButton>
        </EmptyState>
      </PageBody>
    );
  }
  const odd = oddCount(view);
  const start = startPull(view, preferences, camp.details.ground?.wetness);
  return (
    <PageBody>
      <PageHeading
        title={headlineOf(view)}
        lead={
          <>
            {camp.details.name}: {plural(view.total, "pull test")}.{" "}
            {odd > 0 && (
              <span className="font-semibold text-ember">
                {plural(odd, "reading does", "readings do")} not fit the others.
              </span>
            )}
          </>
        }
      >
        <LinkButton href={base}>To the staking plan</LinkButton>
        <LinkButton href={`/trips/${trip.id}/pull-tests`}>Against the model</LinkButton>
      </PageHeading>
      <div className="grid gap-x-12 gap-y-8 lg:grid-cols-[minmax(0,22rem)_minmax(0,1fr)]">
        <Section title="Log a pull">
          <PullForm
            action={logPullTestAction}
            values={input}
            firstId={newId()}
            anchors={view.anchors}
            start={start.fields}
          >
            <PatchField patches={view.patches} defaultPatch={start.patch} />
          </PullForm>
        </Section>
        <Section title="What the readings say">
          <div className={view.patches.length > 1 ? "grid gap-8 xl:grid-cols-2" : ""}>
            {view.patches.map((patch) => (
              <GroundEstimate
                key={patch.patch}
                title={`${patch.groundName}${patch.patch === "second" ? ", second patch" : ""}`}
                view={patch}
                readings={view.readings.filter((reading) => reading.patch === patch.patch)}
              >
                <LearningChoices
                  values={{ ...input, patch: patch.patch }}
                  view={patch}
                  elsewhereAction={chooseElsewhereAction}
                  startAgainAction={startAgainAction}
                />
              </GroundEstimate>
            ))}
          </div>
          <div className="mt-4">
            <CurveKey />
          </div>
        </Section>
      </div>
      {view.changes.length > 0 && (
        <Section title="What that does to the plan">
          <LearnedChanges changes={view.changes} speedUnit={preferences.speedUnit} />
        </Section>
      )}
      <Section title="Readings">
        {view.readings.length === 0 ? (
          <p className="text-15 text-pencil">None yet. The first one is worth most.</p>
        ) : (
          <PullTestList
            readings={view.readings}
            timeZone={view.timeZone}
            base={`${base}/pull-tests`}
            switchAction={switchPullTestAction}
            showsGround={false}
          />
        )}
      </Section>
      <Section
        title="Practice sheet"
        lead="The pulls that teach most by what is known now, in order, with boxes to write in. Leave the scale empty when it shows more than you can pull."
      >
        <SheetForm
          action={`/api/trips/${trip.id}/camps/${campId}/practice-sheet`}
          forceUnit={start.fields.forceUnit}
          ground={
            view.patches.length > 1
              ? {
                  name: "patch",
                  options: view.patches.map(({ patch, groundName }) => ({ value: patch, label: groundName })),
                  value: "main",
                }
              : null
          }
        />
      </Section>
      <Section title="As a table">
        <TableInOut address={`/api/trips/${trip.id}/camps/${campId}/pull-tests`} columns={COLUMNS} />
      </Section>
      <Cautions />
    </PageBody>
  );
}
