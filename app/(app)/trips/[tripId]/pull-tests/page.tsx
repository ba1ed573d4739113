import { CompareView, scatterWords } from "@/components/pull-tests/compare-view";
import { PrintButton } from "@/components/results/print-button";
import { PageBody } from "@/components/trip/page-body";
import { PageHeading } from "@/components/ui/layout";
import { describeComparison } from "@/lib/format/pull-tests";
import { plural } from "@/lib/format/words";
import { compareTripPulls } from "@/lib/services/pull-tests/compare-pull-tests";
import { loadTrip } from "../_lib/load-trip";

interface ComparePageProps {
  readonly params: Promise<{ tripId: string }>;
}

export const metadata = { title: "Pull tests against the model" };

export default async function ComparePage({ params }: ComparePageProps) {
  const { ctx, trip, preferences } = await loadTrip(params, "pull-test.read");
  const comparison = await compareTripPulls({ ctx, input: { tripId: trip.id } });
  const { overall } = comparison;
  return (
    <PageBody>
      <PageHeading
        title={describeComparison(overall)}
        lead={
          <>
            {trip.name}: {plural(overall.count, "pull test")} against the model as it stands in the table.
            {overall.ratio && ` Two of three lie within ${scatterWords(overall.ratio.scatter)} of their middle.`}
          </>
        }
      >
        <PrintButton />
      </PageHeading>
      <CompareView comparison={comparison} forceUnit={preferences.forceUnit} />
    </PageBody>
  );
}
