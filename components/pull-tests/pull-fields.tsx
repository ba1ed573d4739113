"use client";

import { ChoiceField, NumberField, SelectField, TextArea, type Option } from "@/components/ui/fields";
import { OUTCOME_NAMES, PULL_OUTCOMES, type PullOutcome } from "@/lib/domain/pull-test/schema";
import type { AnchorChoice } from "@/lib/domain/pull-test/views";
import { FORCE_UNITS, type Preferences } from "@/lib/domain/preferences";
import { formatAngle, formatLean } from "@/lib/format/angles";
import { WETNESS_OPTIONS } from "../forms/options";

/** What the fields begin with: the last pull's set-up, or the reading that is corrected. */
export interface PullStart {
  readonly anchorId: string;
  readonly leanDeg: number | null;
  readonly lineAngleDeg: number | null;
  readonly depthOutM: number;
  readonly force: number | null;
  readonly forceUnit: Preferences["forceUnit"];
  readonly outcome: PullOutcome | null;
  readonly wetness: string;
  readonly note: string;
}

const LEANS_DEG = [-10, -5, 0, 5, 10, 15, 20, 25, 30, 35, 40, 45, 50, 55, 60];
const LINES_DEG = Array.from({ length: 19 }, (_, index) => index * 5);
const OUTCOMES = PULL_OUTCOMES.map((value) => ({ value, label: OUTCOME_NAMES[value] }));
const UNITS = FORCE_UNITS.map((unit) => ({ value: unit, label: unit }));

/** Steps of five, and what was logged if it lies between them. */
function angleOptions(steps: readonly number[], own: number | null, name: (deg: number) => string): Option[] {
  const all = own === null || steps.includes(own) ? steps : [...steps, own].sort((a, b) => a - b);
  return all.map((deg) => ({ value: String(deg), label: name(deg) }));
}

/** The fields of one pull, in the order in which one has the numbers at hand. */
export function PullFields({
  anchors,
  start,
  isNew,
}: {
  readonly anchors: readonly AnchorChoice[];
  readonly start: PullStart;
  readonly isNew: boolean;
}) {
  const text = (value: number | null) => (value === null ? "" : String(value));
  return (
    <>
      <SelectField
        name="anchorId"
        label="Anchor"
        options={anchors.map(({ id, name }) => ({ value: id, label: name }))}
        placeholder="Choose"
        defaultValue={start.anchorId}
      />
      <div className="grid grid-cols-[minmax(0,1fr)_6.5rem] gap-3">
        <NumberField name="reading.force" label="Highest reading" defaultValue={text(start.force)} />
        <SelectField name="reading.forceUnit" label="Unit" options={UNITS} defaultValue={start.forceUnit} />
      </div>
      <ChoiceField
        legend="What happened"
        name="reading.outcome"
        options={OUTCOMES}
        defaultValue={start.outcome ?? undefined}
      />
      <div className="grid grid-cols-2 gap-3">
        <SelectField
          name="reading.leanDeg:number"
          label="Lean"
          options={angleOptions(LEANS_DEG, start.leanDeg, formatLean)}
          placeholder="Choose"
          defaultValue={text(start.leanDeg)}
        />
        <SelectField
          name="reading.lineAngleDeg:number"
          label="Line above ground"
          options={angleOptions(LINES_DEG, start.lineAngleDeg, formatAngle)}
          placeholder="Choose"
          defaultValue={text(start.lineAngleDeg)}
        />
        <NumberField
          name="reading.depthOutM"
          label="Left out"
          unit="cm"
          defaultValue={String(Math.round(start.depthOutM * 1000) / 10)}
          hint="0 is driven home."
        />
        <SelectField
          name="reading.wetness"
          label="How wet"
          options={WETNESS_OPTIONS}
          placeholder="Choose"
          defaultValue={start.wetness}
        />
      </div>
      {isNew ? (
        <details>
          <summary className="min-h-11 content-center text-15 font-semibold text-spruce">Add a note</summary>
          <TextArea name="reading.note" label="Note" rows={2} maxLength={500} defaultValue={start.note} />
        </details>
      ) : (
        <TextArea name="reading.note" label="Note" rows={3} maxLength={500} defaultValue={start.note} />
      )}
    </>
  );
}
