import { CompareView, scatterWords } from "@/components/pull-tests/compare-view";
import { PrintButton } from "@/components/results/print-button";
import { LinkButton } from "@/components/ui/button";
import { PageHeading } from "@/components/ui/layout";
import { requireContext } from "@/lib/auth/session";
import { describeComparison } from "@/lib/format/pull-tests";
import { plural } from "@/lib/format/words";
import { getPreferences } from "@/lib/services/preferences/get-preferences";
import { comparePracticePulls } from "@/lib/services/pull-tests/compare-pull-tests";

export const metadata = { title: "Practice against the model" };

export default async function ComparePracticePage() {
  const ctx = await requireContext();
  const comparison = await comparePracticePulls({ ctx });
  const { forceUnit } = await getPreferences({ ctx });
  const { overall } = comparison;
  return (
    <>
      <PageHeading
        title={describeComparison(overall)}
        lead={
          <>
            Practice field: {plural(overall.count, "pull test")} against the model as it stands in the table.
            {overall.ratio && ` Two of three lie within ${scatterWords(overall.ratio.scatter)} of their middle.`}
          </>
        }
      >
        <LinkButton href="/pull-tests" look="quiet" className="no-print">
          Practice field
        </LinkButton>
        <PrintButton />
      </PageHeading>
      <CompareView comparison={comparison} forceUnit={forceUnit} />
    </>
  );
}
