import type { ComparedGroup } from "@/lib/domain/pull-test/compare";
import type { LearnedFrom } from "@/lib/domain/pull-test/learn";
import { OUTCOME_NAMES } from "@/lib/domain/pull-test/schema";
import type { GroundLearningView, PullFit, PullTestView } from "@/lib/domain/pull-test/views";
import type { Preferences } from "@/lib/domain/preferences";
import { formatAngle, formatLean } from "./angles";
import { formatFixed, formatSignificant, THIN_SPACE, withUnit } from "./numbers";
import { formatHoldsTo } from "./speeds";
import { plural, startSentence } from "./words";

/** As it was read, without rounding: "75 lbf", "34.5 kgf". */
export function formatReading({ force, forceUnit }: Pick<PullTestView, "force" | "forceUnit">): string {
  return withUnit(String(Number(force.toPrecision(6))), forceUnit);
}

/** A multiple of what the table says: "0.84 ×". */
export function formatFactor(factor: number): string {
  return `${formatSignificant(factor)}${THIN_SPACE}×`;
}

/** "about what the table says", "20 % more than the table says". */
export function describeFactor(factor: number): string {
  if (factor >= 1.995) return `${formatSignificant(factor)} times what the table says`;
  const percent = Math.round((factor - 1) * 100);
  if (Math.abs(percent) < 3) return "about what the table says";
  return `${withUnit(String(Math.abs(percent)), "%")} ${percent > 0 ? "more" : "less"} than the table says`;
}

/** "came out at 75 lbf", "still holding at 90 lbf". */
export function describeOutcome(test: Pick<PullTestView, "outcome" | "force" | "forceUnit">): string {
  return `${OUTCOME_NAMES[test.outcome].toLowerCase()} at ${formatReading(test)}`;
}

const WETNESS_WORDS = { dry: "dry", usual: "usual moisture", wet: "wet", saturated: "saturated" } as const;

/** "10° back, line 45°, 30 mm out, wet". */
export function describeSetUp(test: Pick<PullTestView, "leanDeg" | "lineAngleDeg" | "depthOutM" | "ground">): string {
  const out = test.depthOutM > 0 ? `${withUnit(formatFixed(test.depthOutM * 1000), "mm")} left out` : "driven home";
  return `${formatLean(test.leanDeg)}, line ${formatAngle(test.lineAngleDeg)}, ${out}, ${WETNESS_WORDS[test.ground.wetness]}`;
}

/** What a reading does to the estimate: "lifts it by 6 %", "hardly moves it". */
export function describePull(pull: number): string {
  const percent = Math.round(Math.abs(pull - 1) * 100);
  if (percent === 0) return "hardly moves the estimate";
  return `${pull > 1 ? "lifts" : "lowers"} the estimate by ${withUnit(String(percent), "%")}`;
}

/** How it fits: "fits the others", "1 in 250 would be as far out". */
export function describeFit(fit: PullFit): string {
  switch (fit.status) {
    case "counts":
      if (!fit.isOutlier) return "fits";
      return `does not fit: fewer than 1 in ${Math.max(80, Math.floor(1 / Math.max(fit.chance, 1e-4) / 10) * 10)} would be so far out. Look at it again.`;
    case "off":
      return "switched off, counts for nothing";
    case "implausible":
      return `not counted: ${formatSignificant(fit.ratio > 1 ? fit.ratio : 1 / fit.ratio)} times ${fit.ratio > 1 ? "above" : "below"} the model. Correct it, or leave it out.`;
    case "says-nothing":
      return "says nothing of the ground: the model has no number for this anchor here";
    case "other-ground":
      return `not counted here: logged in ${fit.groundName.toLowerCase()}`;
  }
}

const FROM_WORDS: Readonly<Record<LearnedFrom, (view: GroundLearningView) => string>> = {
  own: (view) => {
    const own = `From ${plural(view.ownCount, "reading")} here`;
    if (view.elsewhereCount === 0) return `${own}, on top of the table.`;
    return `${own}, with ${view.elsewhereCount} in the same kind of ground elsewhere, which count for less.`;
  },
  elsewhere: (view) =>
    `No reading here yet. From ${plural(view.elsewhereCount, "reading")} in the same kind of ground at ${plural(view.placeCount, "other place")}.`,
  table: () => "No reading counts yet: this is the table.",
};

/** Says which readings the estimate stands on. */
export function describeSource(view: GroundLearningView): string {
  return FROM_WORDS[view.from](view);
}

export interface CampMeasure {
  /** Of the patch that was pulled; null without readings that count. */
  readonly factor: number | null;
  readonly holdsToGustMs: number | null;
}

/** What one reading did: "Ground 1.0 → 1.2 × the table. The camp holds to 62 → 71 km/h." */
export function describeMove(before: CampMeasure, after: CampMeasure, unit: Preferences["speedUnit"]): string {
  const parts: string[] = [];
  if (after.factor !== null) {
    parts.push(`The ground: ${formatSignificant(before.factor ?? 1)} → ${formatFactor(after.factor)} the table.`);
  }
  if (before.holdsToGustMs !== null && after.holdsToGustMs !== null) {
    const was = formatHoldsTo(before.holdsToGustMs, unit);
    const is = formatHoldsTo(after.holdsToGustMs, unit);
    parts.push(was === is ? `The camp still holds to ${is}.` : `The camp holds to ${was} → ${is}.`);
  }
  return startSentence(parts.join(" "));
}

/** How far to trust the model, in one sentence. */
export function describeComparison({ count, gaveWayCount, ratio }: ComparedGroup): string {
  if (count === 0) return "Pull tests against the model";
  if (!ratio) return `${plural(count, "pull test")}, too few to judge the model by`;
  const percent = Math.round((ratio.median - 1) * 100);
  const middle =
    Math.abs(percent) < 5
      ? "Anchors held about what the model says"
      : ratio.median >= 1.995
        ? `Anchors held ${formatSignificant(ratio.median)} times what the model says`
        : `Anchors held ${withUnit(String(Math.abs(percent)), "%")} ${percent > 0 ? "more" : "less"} than the model says`;
  return gaveWayCount < 5 ? `${middle}, by only ${gaveWayCount} that gave way` : middle;
}
