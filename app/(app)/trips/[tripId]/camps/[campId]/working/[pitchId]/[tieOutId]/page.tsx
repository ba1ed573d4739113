import type { Metadata } from "next";
import Link from "next/link";
import { StateMark, stateWord } from "@/components/drawing/state-mark";
import { WorkingTable } from "@/components/results/working-table";
import { PrintButton } from "@/components/results/print-button";
import { Cautions, PageHeading, Section } from "@/components/ui/layout";
import { requireContext } from "@/lib/auth/session";
import { formatForce } from "@/lib/format/forces";
import { formatMargin } from "@/lib/format/numbers";
import { orNotFound } from "@/lib/http/or-not-found";
import { explainTieOutFor } from "@/lib/services/plan/explain-tie-out-for";
import { getPreferences } from "@/lib/services/preferences/get-preferences";

interface WorkingPageProps {
  readonly params: Promise<{ tripId: string; campId: string; pitchId: string; tieOutId: string }>;
}

export const metadata: Metadata = { title: "How this was calculated" };

/** From forecast to margin for one tie-out: each step with its number, unit and source. */
export default async function WorkingPage({ params }: WorkingPageProps) {
  const input = await params;
  const ctx = await requireContext();
  const { campName, result, explanation } = await orNotFound(explainTieOutFor({ ctx, input }));
  const { forceUnit } = await getPreferences({ ctx });
  const capacityN = result.capacity?.status === "ok" ? result.capacity.dependableN : null;
  return (
    <div className="max-w-[68rem] px-4 py-6 sm:px-7">
      <p className="no-print mb-3">
        <Link
          href={`/trips/${input.tripId}/camps/${input.campId}`}
          className="inline-flex min-h-11 items-center font-semibold text-spruce"
        >
          Back to the staking plan of {campName}
        </Link>
      </p>
      <PageHeading
        title="How this was calculated"
        lead={
          <>
            <span className="block">
              {explanation.title}, {campName}
            </span>
            <span className="mt-1 flex flex-wrap items-center gap-x-2 text-18 font-semibold text-ink">
              <StateMark verdict={result.verdict} isDecorative />
              {stateWord(result.verdict)}
              {result.margin !== null && `, margin ${formatMargin(result.margin)}`}
              {result.demandN !== null && ` · pull ${formatForce(result.demandN, forceUnit)}`}
              {capacityN !== null && ` · holds ${formatForce(capacityN, forceUnit)} dependably`}
            </span>
          </>
        }
      >
        <PrintButton />
      </PageHeading>
      {explanation.sections.map((section) => (
        <Section key={section.heading} title={section.heading}>
          <WorkingTable caption={section.heading} workings={section.workings} />
        </Section>
      ))}
      <Section title="Where this is weak">
        <ul className="max-w-[46rem] list-disc pl-5 text-15">
          {explanation.weakSpots.map((spot) => (
            <li key={spot} className="mb-1">
              {spot}
            </li>
          ))}
        </ul>
      </Section>
      <Cautions />
    </div>
  );
}
