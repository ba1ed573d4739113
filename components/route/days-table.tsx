import type { ReactNode } from "react";
import type { LegResult, TimedRule } from "@/lib/domain/route/views";
import type { RouteSettings } from "@/lib/domain/route/schema";
import type { Preferences } from "@/lib/domain/preferences";
import { describeDaylight, describeEvening, type DaylightTone } from "@/lib/format/daylight";
import { formatDay } from "@/lib/format/days";
import { formatClimb, formatClock, formatDistance, formatHours } from "@/lib/format/distances";
import { describeEnergy, describeWater } from "@/lib/format/energy";
import { startSentence } from "@/lib/format/words";

export const RULE_NAMES: Readonly<Record<TimedRule, string>> = {
  naismith: "Naismith",
  langmuir: "Langmuir",
  tobler: "Tobler",
  din: "DIN 33466",
  tranter: "Naismith with Tranter",
};

export const DAYLIGHT_TONES: Readonly<Record<DaylightTone, string>> = {
  light: "text-ink",
  thin: "text-ochre",
  dark: "font-semibold text-rowan",
  unknown: "text-pencil",
};

const RULES = ["naismith", "langmuir", "tobler", "din", "tranter"] as const satisfies readonly TimedRule[];

/** A day's walk in a few lines: what it asks, when it ends, and how much light is left then. */
export function DaysTable({
  legs,
  settings,
  unit,
}: {
  readonly legs: readonly LegResult[];
  readonly settings: RouteSettings;
  readonly unit: Preferences["lengthUnit"];
}) {
  return (
    <ol className="border-b border-hair">
      {legs.map((leg) => {
        const light = describeDaylight(leg, settings.pitchingMin);
        return (
          <li
            key={leg.key}
            className="grid gap-x-6 gap-y-1 border-t border-hair py-4 md:grid-cols-[11rem_14rem_minmax(0,1fr)]"
          >
            <div className="min-w-0">
              <p className="text-13 text-pencil">{formatDay(leg.day)}</p>
              <p className="font-bold">{leg.key === "home" ? `${leg.fromName} to the end` : `To ${leg.toName}`}</p>
            </div>
            <LegFigures leg={leg} unit={unit} />
            <div className="min-w-0">
              <p className="text-15">
                {leg.arriveMin !== null && leg.setOffMin !== null && (
                  <>
                    {`${formatClock(leg.setOffMin)} to `}
                    <b>{formatClock(leg.arriveMin)}</b>.{" "}
                  </>
                )}
                <span className={DAYLIGHT_TONES[light.tone]}>{light.text}</span>
              </p>
              <p className="text-13 text-pencil">{describeEvening(leg.evening)}</p>
              {leg.warnings.map((warning) => (
                <p key={warning} className="text-15 font-semibold text-rowan">
                  {warning}
                </p>
              ))}
              <LegDetails leg={leg} />
            </div>
          </li>
        );
      })}
    </ol>
  );
}

function LegFigures({ leg, unit }: { readonly leg: LegResult; readonly unit: Preferences["lengthUnit"] }) {
  if (leg.distanceM === null) {
    return <p className="text-15 text-ember">{startSentence(`${leg.missing[0] ?? "its length"} is missing.`)}</p>;
  }
  return (
    <p className="text-15">
      <b>{formatDistance(leg.distanceM, unit)}</b>
      {leg.ascentM !== null && `, ${formatClimb(leg.ascentM, unit)} up`}
      {leg.descentM !== null && `, ${formatClimb(leg.descentM, unit)} down`}
      <span className="block text-13 text-pencil">
        {leg.totalH === null
          ? `${startSentence(leg.missing[0] ?? "the ascent")} missing: no time.`
          : `${formatHours(leg.totalH)}${leg.usedRule ? `, ${RULE_NAMES[leg.usedRule]}` : ""}`}
        {leg.source === "typed" && ", typed"}
      </span>
    </p>
  );
}

function LegDetails({ leg }: { readonly leg: LegResult }) {
  const known = RULES.filter((rule) => leg.times[rule] !== null);
  if (known.length === 0) return null;
  const energy = leg.energyJ && describeEnergy(leg.energyJ);
  const water = leg.waterL && describeWater(leg.waterL);
  return (
    <details className="mt-1">
      <summary className="min-h-11 cursor-pointer py-2 text-15 font-semibold text-spruce">Every rule</summary>
      <dl className="grid grid-cols-[minmax(0,1fr)_auto] gap-x-6 gap-y-1 text-15 sm:max-w-[26rem]">
        {known.map((rule) => (
          <Line key={rule} term={RULE_NAMES[rule]} isUsed={rule === leg.usedRule}>
            {formatHours(leg.times[rule] ?? 0)}
          </Line>
        ))}
        {energy && <Line term="Energy of walking, each">{energy}</Line>}
        {water && <Line term="Water while walking, each">{water}</Line>}
      </dl>
      <p className="mt-1 text-13 text-pencil">Walking without breaks, at the group&rsquo;s pace.</p>
    </details>
  );
}

function Line({
  term,
  isUsed = false,
  children,
}: {
  readonly term: string;
  readonly isUsed?: boolean;
  readonly children: ReactNode;
}) {
  return (
    <>
      <dt className={isUsed ? "font-semibold" : "text-pencil"}>{isUsed ? `${term} (used)` : term}</dt>
      <dd className="text-right tabular-nums">{children}</dd>
    </>
  );
}
