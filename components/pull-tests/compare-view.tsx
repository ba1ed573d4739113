import { Cautions, EmptyState, Section } from "@/components/ui/layout";
import type { ComparedGroup, ComparedPull, Comparison } from "@/lib/domain/pull-test/compare";
import { OUTCOME_NAMES } from "@/lib/domain/pull-test/schema";
import type { Preferences } from "@/lib/domain/preferences";
import { formatAngle, formatLean } from "@/lib/format/angles";
import { formatForce } from "@/lib/format/forces";
import { formatFactor } from "@/lib/format/pull-tests";
import { plural } from "@/lib/format/words";
import { ComparePlot, ComparePlotKey } from "./compare-plot";

const MAX_LISTED = 200;
/** So many rows fit on the printed page beside the rest. */
const MAX_PRINTED = 16;

interface CompareViewProps {
  readonly comparison: Comparison;
  readonly forceUnit: Preferences["forceUnit"];
}

/** How far to trust the model: every reading beside what it predicts. Prints on one page. */
export function CompareView({ comparison, forceUnit }: CompareViewProps) {
  const { pulls, groups, leftOut } = comparison;
  if (pulls.length === 0) {
    return (
      <EmptyState title="Nothing to compare yet">
        <p>Log a pull test. Each one then stands here beside what the model predicts for its anchor and ground.</p>
      </EmptyState>
    );
  }
  return (
    <>
      <div className="mb-8 grid gap-x-10 gap-y-6 lg:grid-cols-[minmax(0,30rem)_minmax(0,1fr)] print:mb-3 print:grid-cols-[19rem_minmax(0,1fr)] print:gap-x-6">
        <div>
          <ComparePlot pulls={pulls} forceUnit={forceUnit} />
          <ComparePlotKey />
        </div>
        <div className="flex flex-col gap-5 print:gap-2">
          {groups.map(({ title, rows }) => (
            <GroupTable key={title} title={title} rows={rows} />
          ))}
        </div>
      </div>
      <Section title="Each reading">
        <PullTable pulls={pulls} forceUnit={forceUnit} />
        {leftOut > 0 && (
          <p className="mt-3 text-13 text-pencil">
            {plural(leftOut, "reading is", "readings are")} left out: the model has no number for the anchor there.
          </p>
        )}
      </Section>
      <Cautions />
    </>
  );
}

function GroupTable({ title, rows }: { readonly title: string; readonly rows: readonly ComparedGroup[] }) {
  return (
    <table className="w-full border-collapse text-left text-13">
      <thead>
        <tr className="text-pencil">
          <th scope="col" className="py-1 pr-2 font-normal">
            {title}
          </th>
          <th scope="col" className="py-1 pr-2 text-right font-normal">
            pulls
          </th>
          <th scope="col" className="py-1 pr-2 text-right font-normal">
            measured ÷ predicted
          </th>
          <th scope="col" className="py-1 text-right font-normal">
            scatter
          </th>
        </tr>
      </thead>
      <tbody>
        {rows.slice(0, 8).map((row) => (
          <tr key={row.name} className="border-t border-hair">
            <th scope="row" className="py-1 pr-2 font-semibold">
              {row.name}
            </th>
            <td className="py-1 pr-2 text-right whitespace-nowrap">
              {row.count}, {row.gaveWayCount} gave way
            </td>
            <td className="py-1 pr-2 text-right font-semibold whitespace-nowrap">
              {row.ratio ? formatFactor(row.ratio.median) : "too few"}
            </td>
            <td className="py-1 text-right whitespace-nowrap">{row.ratio ? scatterWords(row.ratio.scatter) : ""}</td>
          </tr>
        ))}
      </tbody>
    </table>
  );
}

/** σ of the logarithm as the factor between which two of three lie: "×÷ 1.3". */
export function scatterWords(scatter: number): string {
  return `×÷ ${Math.exp(scatter).toFixed(1)}`;
}

function PullTable({
  pulls,
  forceUnit,
}: {
  readonly pulls: readonly ComparedPull[];
  readonly forceUnit: Preferences["forceUnit"];
}) {
  const shown = pulls.slice(0, MAX_LISTED);
  return (
    <>
      <div className="overflow-x-auto" tabIndex={0} role="region" aria-label="Each reading: table">
        <table className="w-full border-collapse text-left text-13">
          <thead>
            <tr className="text-pencil">
              {["Anchor", "Ground", "Lean", "Line", "What happened", "Measured", "Predicted", "Ratio"].map(
                (name, index) => (
                  <th key={name} scope="col" className={`py-1 pr-3 font-normal ${index > 4 ? "text-right" : ""}`}>
                    {name}
                  </th>
                ),
              )}
            </tr>
          </thead>
          <tbody>
            {shown.map((pull, index) => (
              <tr key={pull.id} className={`border-t border-hair ${index >= MAX_PRINTED ? "print:hidden" : ""}`}>
                <th scope="row" className="py-1 pr-3 font-semibold whitespace-nowrap">
                  {pull.anchorName}
                </th>
                <td className="py-1 pr-3 whitespace-nowrap">{pull.groundName}</td>
                <td className="py-1 pr-3 whitespace-nowrap">{formatLean(pull.leanDeg)}</td>
                <td className="py-1 pr-3">{formatAngle(pull.lineAngleDeg)}</td>
                <td className="py-1 pr-3 whitespace-nowrap">{OUTCOME_NAMES[pull.outcome]}</td>
                <td className="py-1 pr-3 text-right whitespace-nowrap">
                  {pull.kind === "at-least" && "at least "}
                  {formatForce(pull.measuredN, forceUnit)}
                </td>
                <td className="py-1 pr-3 text-right whitespace-nowrap">{formatForce(pull.predictedN, forceUnit)}</td>
                <td className="py-1 pr-3 text-right whitespace-nowrap">
                  {formatFactor(pull.measuredN / pull.predictedN)}
                </td>
              </tr>
            ))}
          </tbody>
        </table>
      </div>
      {pulls.length > MAX_PRINTED && (
        <p className="mt-1 hidden text-13 text-pencil print:block">
          The newest {MAX_PRINTED} of {pulls.length}; the rest is on the live page.
        </p>
      )}
      {pulls.length > MAX_LISTED && (
        <p className="mt-2 text-13 text-pencil">
          The newest {MAX_LISTED} of {pulls.length}. All of them come out as CSV.
        </p>
      )}
    </>
  );
}
