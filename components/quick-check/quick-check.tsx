"use client";

import { useDeferredValue, useId, useMemo, useState } from "react";
import type { ReactNode } from "react";
import { AnchorMark } from "@/components/drawing/anchor-mark";
import { WorkingTable } from "@/components/results/working-table";
import { Cautions, Section } from "@/components/ui/layout";
import { isDriven } from "@/lib/calc/rig-anchor";
import { BUILT_IN_ANCHORS, builtInAnchor } from "@/lib/calc/tables/anchors";
import { GROUNDS } from "@/lib/calc/tables/grounds";
import type { Preferences } from "@/lib/domain/preferences";
import { formatAngle, formatLean } from "@/lib/format/angles";
import { formatForce } from "@/lib/format/forces";
import { formatMass } from "@/lib/format/masses";
import { CheckPlots } from "./check-plots";
import { runCheck, WETNESS_NAMES, writeCheck, type CheckState } from "./check-state";

const CONTROL = "min-h-11 w-full min-w-0 rounded-field border border-pencil bg-sheet px-3 text-15";

/** One anchor, one ground, one line: what it holds, how it gives, and what another angle would do. */
export function QuickCheck({
  initial,
  preferences,
}: {
  readonly initial: CheckState;
  readonly preferences: Preferences;
}) {
  const [check, setCheck] = useState(initial);
  const shown = useDeferredValue(check);
  const capacity = useMemo(() => runCheck(check), [check]);
  const anchor = builtInAnchor(check.anchorId);
  const inUnit = (newtons: number) => formatForce(newtons, preferences.forceUnit);
  const change = (part: Partial<CheckState>) => {
    const next = { ...check, ...part };
    setCheck(next);
    window.history.replaceState(null, "", `?${writeCheck(next)}`);
  };
  return (
    <>
      <div className="mb-10 grid gap-8 lg:grid-cols-[20rem_minmax(0,1fr)]">
        <form className="flex flex-col gap-4" onSubmit={(event) => event.preventDefault()}>
          <Choice label="Anchor">
            {(id) => (
              <select
                id={id}
                className={CONTROL}
                value={check.anchorId}
                onChange={(event) => change({ anchorId: event.target.value })}
              >
                {BUILT_IN_ANCHORS.map((one) => (
                  <option key={one.id} value={one.id}>
                    {one.name}
                  </option>
                ))}
              </select>
            )}
          </Choice>
          <Choice label="Ground">
            {(id) => (
              <select
                id={id}
                className={CONTROL}
                value={check.ground}
                onChange={(event) => {
                  const ground = GROUNDS.find((one) => one.kind === event.target.value);
                  if (ground) change({ ground: ground.kind });
                }}
              >
                {GROUNDS.map((one) => (
                  <option key={one.kind} value={one.kind}>
                    {one.name}
                  </option>
                ))}
              </select>
            )}
          </Choice>
          <Choice label="Wetness">
            {(id) => (
              <select
                id={id}
                className={CONTROL}
                value={check.wetness}
                onChange={(event) => {
                  const wetness = WETNESS_NAMES.find((one) => one.value === event.target.value);
                  if (wetness) change({ wetness: wetness.value });
                }}
              >
                {WETNESS_NAMES.map((one) => (
                  <option key={one.value} value={one.value}>
                    {one.label}
                  </option>
                ))}
              </select>
            )}
          </Choice>
          <Angle
            label="Line above the ground"
            words={formatAngle(check.lineAngleDeg)}
            min={0}
            max={90}
            value={check.lineAngleDeg}
            onChange={(lineAngleDeg) => change({ lineAngleDeg })}
          />
          {isDriven(anchor.spec) && (
            <Angle
              label="Lean"
              words={formatLean(check.leanDeg)}
              min={-10}
              max={60}
              value={check.leanDeg}
              onChange={(leanDeg) => change({ leanDeg })}
            />
          )}
        </form>
        <section aria-labelledby="answer-heading" aria-live="polite">
          <p className="flex items-center gap-3 text-15 text-pencil">
            <AnchorMark spec={anchor.spec} size={34} />
            {anchor.name}
            {anchor.massKg > 0 && `, ${formatMass(anchor.massKg)}`}
          </p>
          {capacity.status === "ok" ? (
            <>
              <h2 id="answer-heading" className="mt-1 text-34 font-extrabold">
                holds {inUnit(capacity.dependableN)}
              </h2>
              <p className="text-15">
                {`Dependably: nineteen of twenty like it hold this or more. Half of them hold ${inUnit(capacity.medianN)}. ${capacity.sentence}`}
              </p>
            </>
          ) : (
            <>
              <h2 id="answer-heading" className="mt-1 text-24 font-extrabold text-rowan">
                {capacity.status === "unusable" ? "can't be used here" : "not known"}
              </h2>
              <p className="text-15">
                {capacity.status === "unusable"
                  ? `${capacity.reason}${capacity.instead.length > 0 ? ` Use instead: ${capacity.instead.join(", ")}.` : ""}`
                  : capacity.gaps.map((gap) => gap.message).join(" ")}
              </p>
            </>
          )}
          <p className="mt-1 text-13 text-pencil">
            Single, driven home, 3{"\u2009"}mm polyester line with a bowline. {anchor.note}
          </p>
        </section>
      </div>
      {capacity.status === "ok" && (
        <>
          <CheckPlots check={shown} forceUnit={preferences.forceUnit} canLean={isDriven(anchor.spec)} />
          <Section title="How this was calculated">
            <WorkingTable caption="How this was calculated" workings={capacity.workings} />
          </Section>
        </>
      )}
      <Cautions />
    </>
  );
}

function Choice({ label, children }: { readonly label: string; readonly children: (id: string) => ReactNode }) {
  const id = useId();
  return (
    <div className="flex flex-col gap-1">
      <label htmlFor={id} className="text-15 font-semibold">
        {label}
      </label>
      {children(id)}
    </div>
  );
}

function Angle(props: {
  readonly label: string;
  readonly words: string;
  readonly min: number;
  readonly max: number;
  readonly value: number;
  readonly onChange: (value: number) => void;
}) {
  const id = useId();
  return (
    <div className="flex flex-col gap-1">
      <label htmlFor={id} className="text-15 font-semibold">
        {props.label}: <span className="font-normal">{props.words}</span>
      </label>
      <input
        id={id}
        type="range"
        min={props.min}
        max={props.max}
        step={5}
        value={props.value}
        aria-valuetext={props.words}
        onChange={(event) => props.onChange(event.target.valueAsNumber)}
        className="h-11 w-full accent-spruce"
      />
    </div>
  );
}
