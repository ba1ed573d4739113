import type { ReactNode } from "react";
import type { GroundLearningView, PullTestView } from "@/lib/domain/pull-test/views";
import { describeFactor, describeSource, formatFactor } from "@/lib/format/pull-tests";
import { LearningCurve } from "./learning-curve";

/** One ground: its curve, the estimate in words, and where it comes from. */
export function GroundEstimate({
  title,
  view,
  readings,
  children,
}: {
  readonly title: string;
  readonly view: GroundLearningView;
  readonly readings: readonly PullTestView[];
  readonly children?: ReactNode;
}) {
  return (
    <section aria-label={title} className="min-w-0">
      <h3 className="text-15 font-bold">{title}</h3>
      <p className="text-18 font-semibold">
        {view.from === "table" ? "As the table says" : `Holds ${describeFactor(view.factor)}`}
      </p>
      <p className="mb-2 text-13 text-pencil">
        {view.from !== "table" &&
          `Nine of ten chances between ${formatFactor(view.lowFactor)} and ${formatFactor(view.highFactor)} the table; what can be relied on is ${formatFactor(view.dependableFactor)} the table's. `}
        {describeSource(view)}
      </p>
      <LearningCurve view={view} readings={readings} />
      <p className="text-center text-13 text-pencil">strength as a multiple of the table</p>
      {children}
    </section>
  );
}
