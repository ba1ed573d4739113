import { GroundEstimate } from "@/components/pull-tests/ground-estimate";
import { CurveKey } from "@/components/pull-tests/learning-curve";
import { PracticeGroundFields } from "@/components/pull-tests/practice-ground-fields";
import { PullForm } from "@/components/pull-tests/pull-form";
import { PullTestList } from "@/components/pull-tests/pull-test-list";
import { startPull } from "@/components/pull-tests/start-pull";
import { SheetForm } from "@/components/pull-tests/sheet-form";
import { TableInOut } from "@/components/pull-tests/table-in-out";
import { LinkButton } from "@/components/ui/button";
import { Cautions, EmptyState, PageHeading, Section } from "@/components/ui/layout";
import { requireContext } from "@/lib/auth/session";
import { GROUNDS } from "@/lib/calc/tables/grounds";
import { newId } from "@/lib/domain/ids";
import type { PracticeView } from "@/lib/domain/pull-test/views";
import { plural } from "@/lib/format/words";
import { getPreferences } from "@/lib/services/preferences/get-preferences";
import { COLUMNS } from "@/lib/services/pull-tests/csv/columns";
import { getPracticeField } from "@/lib/services/pull-tests/get-practice-field";
import { logPracticePullAction, switchPullTestAction } from "./actions";

export const metadata = { title: "Practice field" };

function startGround({ readings }: PracticeView) {
  const [last] = readings;
  return {
    place: last?.place ?? "",
    kind: last?.ground.kind ?? "",
    looseTopM: last?.ground.looseTopM ?? null,
    stoneDepthM: last?.ground.stoneDepthM ?? null,
  };
}

/** Pull tests outside any trip: they teach the ground of every trip that one leads or co-leads. */
export default async function PracticeFieldPage() {
  const ctx = await requireContext();
  const view = await getPracticeField({ ctx });
  const preferences = await getPreferences({ ctx });
  const { fields } = startPull(view, preferences, undefined);
  return (
    <>
      <PageHeading
        title="Practice field"
        lead={`${plural(view.total, "pull test")} of your own. They count, more weakly, for the same kind of ground on every trip that you lead or co-lead.`}
      >
        <LinkButton href="/pull-tests/compare">Against the model</LinkButton>
      </PageHeading>
      <div className="grid gap-x-12 gap-y-8 lg:grid-cols-[minmax(0,22rem)_minmax(0,1fr)]">
        <Section title="Log a pull">
          <PullForm action={logPracticePullAction} values={{}} firstId={newId()} anchors={view.anchors} start={fields}>
            <PracticeGroundFields start={startGround(view)} />
          </PullForm>
        </Section>
        <Section title="What the readings say">
          {view.grounds.length === 0 ? (
            <EmptyState title="No pull yet">
              <p>Pull a stake with a hanging scale until it gives, or until the scale ends. Both teach something.</p>
            </EmptyState>
          ) : (
            <>
              <div className="flex flex-col gap-8">
                {view.grounds.map((ground) => (
                  <GroundEstimate
                    key={ground.key}
                    title={`${ground.place}: ${ground.groundName.toLowerCase()}`}
                    view={ground}
                    readings={view.readings.filter(
                      (one) =>
                        one.place.toLowerCase() === ground.place.toLowerCase() && one.ground.kind === ground.kind,
                    )}
                  />
                ))}
              </div>
              <div className="mt-4">
                <CurveKey />
              </div>
            </>
          )}
        </Section>
      </div>
      {view.readings.length > 0 && (
        <Section title="Readings">
          <PullTestList
            readings={view.readings}
            timeZone="UTC"
            base="/pull-tests"
            switchAction={switchPullTestAction}
            showsGround
          />
        </Section>
      )}
      <Section
        title="Practice sheet"
        lead="The pulls that teach most by what is known now, in order, with boxes to write in. Leave the scale empty when it shows more than you can pull."
      >
        <SheetForm
          action="/api/pull-tests/practice-sheet"
          forceUnit={fields.forceUnit}
          ground={{
            name: "ground",
            options: GROUNDS.filter((row) => row.model.kind !== "undriveable").map((row) => ({
              value: row.kind,
              label: row.name,
            })),
            value: view.readings[0]?.ground.kind ?? "firm-moist-loam",
          }}
        />
      </Section>
      <Section title="As a table">
        <TableInOut address="/api/pull-tests" columns={COLUMNS} />
      </Section>
      <Cautions />
    </>
  );
}
