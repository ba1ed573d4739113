"use client";

import { useMemo } from "react";
import { CapacityPlot, type PlotLine } from "@/components/results/capacity-plot";
import { Section } from "@/components/ui/layout";
import type { Preferences } from "@/lib/domain/preferences";
import { formatAngle, formatLean } from "@/lib/format/angles";
import { formatForce, formatForceNumber } from "@/lib/format/forces";
import { LEANS_DEG, LINE_ANGLES_DEG, runCheck, sweepLean, sweepLineAngle, type CheckState } from "./check-state";

const COMPARED_LINES_DEG = [15, 30, 45, 60];
const COMPARED_LEANS_DEG = [0, 20, 45];

interface CheckPlotsProps {
  readonly check: CheckState;
  readonly forceUnit: Preferences["forceUnit"];
  readonly canLean: boolean;
}

/** Dependable value against lean and against line angle; the same numbers as tables below. */
export function CheckPlots({ check, forceUnit, canLean }: CheckPlotsProps) {
  const byLean: readonly PlotLine[] = useMemo(
    () =>
      withOwn(COMPARED_LINES_DEG, check.lineAngleDeg).map((deg) => ({
        label: formatAngle(deg),
        isMain: deg === check.lineAngleDeg,
        points: sweepLean(check, deg),
      })),
    [check],
  );
  const byLine: readonly PlotLine[] = useMemo(
    () =>
      (canLean ? withOwn(COMPARED_LEANS_DEG, check.leanDeg) : [check.leanDeg]).map((deg) => ({
        label: canLean ? `${deg}°`.replace("-", "−") : "",
        isMain: deg === check.leanDeg,
        points: sweepLineAngle(check, deg),
      })),
    [check, canLean],
  );
  const capacity = runCheck(check);
  const at = (x: number) => (capacity.status === "ok" ? { x, newtons: capacity.dependableN } : null);
  const inUnit = (newtons: number) => formatForceNumber(newtons, forceUnit);
  return (
    <div className="grid gap-x-10 lg:grid-cols-2">
      {canLean && (
        <Section title={`Against lean, ${forceUnit}`} lead="A line for each line angle. Upright is 0°.">
          <CapacityPlot
            title="What it holds dependably against its lean, for several line angles"
            xLabel="lean back from upright"
            lines={byLean}
            at={at(check.leanDeg)}
            formatForce={inUnit}
          />
          <PlotTable head="Lean" xs={LEANS_DEG} lines={byLean} name={formatLean} over="line" forceUnit={forceUnit} />
        </Section>
      )}
      <Section
        title={`Against line angle, ${forceUnit}`}
        lead={canLean ? "A line for each lean." : "From flat along the ground to straight up."}
      >
        <CapacityPlot
          title="What it holds dependably against the angle of its line"
          xLabel="line above the ground"
          lines={byLine}
          at={at(check.lineAngleDeg)}
          formatForce={inUnit}
        />
        <PlotTable
          head="Line"
          xs={LINE_ANGLES_DEG}
          lines={byLine}
          name={formatAngle}
          over={canLean ? "lean" : ""}
          forceUnit={forceUnit}
        />
      </Section>
    </div>
  );
}

function withOwn(compared: readonly number[], own: number): readonly number[] {
  return [...new Set([...compared, own])].sort((a, b) => a - b);
}

function PlotTable(props: {
  readonly head: string;
  readonly xs: readonly number[];
  readonly lines: readonly PlotLine[];
  readonly name: (deg: number) => string;
  readonly over: string;
  readonly forceUnit: Preferences["forceUnit"];
}) {
  return (
    <details className="mt-3">
      <summary className="min-h-11 content-center text-15 font-semibold text-spruce">The same as a table</summary>
      <div className="overflow-x-auto" tabIndex={0} role="region" aria-label={`${props.head}: table`}>
        <table className="w-full border-collapse text-13">
          <thead>
            <tr className="border-b border-hair text-right text-pencil">
              <th scope="col" className="py-1.5 pr-3 text-left font-normal">
                {props.head}
              </th>
              {props.lines.map((line) => (
                <th key={line.label} scope="col" className="px-2 py-1.5 font-normal whitespace-nowrap">
                  {props.over} {line.label || "holds"}
                </th>
              ))}
            </tr>
          </thead>
          <tbody>
            {props.xs.map((x, row) => (
              <tr key={x} className="border-b border-hair text-right">
                <th scope="row" className="py-1.5 pr-3 text-left font-normal whitespace-nowrap">
                  {props.name(x)}
                </th>
                {props.lines.map((line) => {
                  const newtons = line.points[row]?.newtons ?? null;
                  return (
                    <td key={line.label} className="px-2 py-1.5 whitespace-nowrap">
                      {newtons === null ? "–" : formatForce(newtons, props.forceUnit)}
                    </td>
                  );
                })}
              </tr>
            ))}
          </tbody>
        </table>
      </div>
    </details>
  );
}
