import { describeCase } from "./analyse-shelter";
import { evaluatePlacements, LARGEST_GUST_MS } from "./camp";
import { prepareCamp, type PreparedCamp, type PreparedShelter, type PreparedTieOut } from "./prepare-camp";
import { setAnchor } from "./tie-out-strength";
import type { CampInput, Gap, TieOutResult, Working } from "./types";
import { inSentence } from "./wording";

/** Where the calculation is weakest, in plain words, for the page that explains it. */
export const KNOWN_WEAK_SPOTS: readonly string[] = [
  "Ground is the largest unknown. The same loam can hold half or twice as much ten steps away. Pull an anchor with a scale where it matters.",
  "The gust is a forecast over open ground. Gusts at a camp in hills can be a third stronger or weaker than the number that was entered.",
  "Pressure on tarps and tents is taken from tables for canopies and roofs of buildings. Small soft shelters were not measured for them.",
  "A tent on bent poles is calculated on a coarse mesh: a peg in the middle of a hem comes out up to a quarter too high, and its guys carry a factor of 1.4 because a finer mesh sways more.",
  "The wind is taken as steady in each case. Flapping, snatching lines and a shelter that swings are not calculated.",
  "What a leaning stake holds rests on a simple wedge of soil; published pull tests of leaning stakes disagree with each other.",
  "Loosening in a long windy night is taken from tests of piles under repeated load, not of tent stakes.",
  "A rock on the lip, two stakes in line closer than they should be and anchors under stones are estimates of ours.",
  "Seams, eyelets, zips and worn cloth are not checked. They can give before an anchor does.",
  "Trees, boulders, rings and cleats are only as good as the look you take at them.",
];

export interface WorkingSection {
  readonly heading: string;
  readonly workings: readonly Working[];
}

export interface TieOutExplanation {
  readonly title: string;
  readonly sections: readonly WorkingSection[];
  readonly weakSpots: readonly string[];
}

const step = (symbol: string, meaning: string, value: number | string, unit: string, source: string): Working => ({
  symbol,
  meaning,
  value,
  unit,
  source,
});

const missing = (gaps: readonly Gap[]): Working[] =>
  gaps.map((gap) => step("?", gap.message, "not known", "", "input"));

/**
 * How the margin of one tie-out comes about, from the forecast to the verdict, every step with unit and source. What is
 * missing stands in its place. Throws RangeError when there is no such tie-out at the camp.
 */
export function explainTieOut(camp: CampInput, pitchId: string, tieOutId: string): TieOutExplanation {
  const prepared = prepareCamp(camp);
  const shelter = prepared.shelters.find((one) => one.pitch.pitchId === pitchId);
  const tieOut = shelter?.tieOuts.find((one) => one.tieOut.id === tieOutId);
  const result = evaluatePlacements(prepared, camp.placements)
    .shelters.find((one) => one.pitchId === pitchId)
    ?.tieOuts.find((one) => one.tieOutId === tieOutId);
  if (!shelter || !tieOut || !result) throw new RangeError("There is no such tie-out at this camp.");
  const sections: WorkingSection[] = [
    { heading: "Wind at the shelter", workings: shelter.wind?.workings ?? missing(prepared.gaps.filter(isAboutWind)) },
    { heading: "Pull in the line", workings: pullWorkings(shelter, tieOut) },
    { heading: "What its loss costs", workings: lossWorkings(result, tieOut) },
    { heading: "What the anchor holds", workings: anchorWorkings(prepared, shelter, result) },
    { heading: "After the windy night", workings: nightWorkings(prepared, shelter, result) },
    { heading: "Margin", workings: marginWorkings(result) },
  ];
  return {
    title: `Tie-out ${result.number} of ${shelter.pitch.name}: ${inSentence(result.name)}`,
    sections: sections.filter((section) => section.workings.length > 0),
    weakSpots: KNOWN_WEAK_SPOTS,
  };
}

const isAboutWind = (gap: Gap): boolean => ["camp.gust", "camp.exposure", "camp.altitude"].includes(gap.field);

function pullWorkings(shelter: PreparedShelter, tieOut: PreparedTieOut): Working[] {
  const { analysis } = shelter.pitch;
  const governing = analysis?.design.tieOuts[tieOut.demandIndex];
  if (!analysis || !governing || tieOut.demandN === null || tieOut.lineAngleDeg === null) {
    return missing(shelter.gaps.filter((gap) => gap.field.startsWith("shelter.")));
  }
  const source = "envelope over all wind directions of the range, pressing and lifting";
  return [
    ...analysis.workings,
    step("case", "Case in which this line pulls hardest", describeCase(governing), "", source),
    step("T", "Pull in this line in the design gust", tieOut.demandN, "N", source),
    step("θ", "Its angle above the ground under that load", tieOut.lineAngleDeg, "°", source),
    step(
      "",
      "Standing shape in this wind",
      shelter.standing === true ? "yes" : "no",
      "",
      "judgement: two thirds of the head-room",
    ),
  ];
}

function lossWorkings(result: TieOutResult, tieOut: PreparedTieOut): Working[] {
  if (!result.consequence || tieOut.weightN === null || result.priority === null) return [];
  return [
    step(
      "C",
      result.consequence.sentence || "Consequence of losing it",
      result.consequence.consequence,
      "",
      "knock-out of this tie-out in its governing wind; judgement: 1 to 2",
    ),
    step("T·C", "Pull times consequence", tieOut.weightN, "N", "T × C"),
    step("P", "Priority, 100 for the largest of the camp", result.priority, "", "100 · T·C ÷ largest T·C; judgement"),
  ];
}

function anchorWorkings(prepared: PreparedCamp, shelter: PreparedShelter, result: TieOutResult): Working[] {
  const { placement, capacity } = result;
  const anchor = placement && prepared.anchors.get(placement.anchorId);
  if (!placement || !anchor || !capacity) {
    return missing(result.gaps.filter((gap) => !isAboutWind(gap) && !gap.field.startsWith("shelter.")));
  }
  const rigging = [step("", "Anchor", anchor.name, "", "input")];
  const second = placement.tandem && prepared.anchors.get(placement.tandem.anchorId);
  if (placement.tandem && second) {
    rigging.push(
      step("s", `Second in line, ${inSentence(second.name)}: distance`, placement.tandem.spacingM, "m", "input"),
    );
  }
  if (capacity.status === "unknown") return [...rigging, ...missing(capacity.gaps)];
  if (capacity.status === "unusable") {
    const instead = capacity.instead.length > 0 ? ` Instead: ${capacity.instead.join(", ")}.` : "";
    return [...rigging, step("", `${capacity.reason}${instead}`, "can't be used", "", shelter.ground?.kind ?? "")];
  }
  return [
    ...rigging,
    ...capacity.workings,
    step("", "What gives first", capacity.sentence, "", "smallest of the above"),
  ];
}

function nightWorkings(prepared: PreparedCamp, shelter: PreparedShelter, result: TieOutResult): Working[] {
  const { strongWindHours } = prepared.input;
  if (strongWindHours === null || prepared.nightCycles === null) {
    return missing(prepared.gaps.filter((gap) => gap.field === "camp.strongWindHours"));
  }
  const { placement, lineAngleDeg, morningMargin } = result;
  const anchor =
    placement && shelter.ground
      ? setAnchor(placement, prepared.anchors, shelter.ground, shelter.pitch.spec.line)
      : null;
  const morning = anchor && lineAngleDeg !== null ? anchor.strengthAt(lineAngleDeg, prepared.nightCycles) : null;
  if (!morning || morningMargin === null) return [];
  const law = "Long & Vanneste (1994), N^−t, from memory";
  return [
    step("h", "Hours of strong wind", strongWindHours, "h", "input"),
    step("N", "Strong pulls in the night", prepared.nightCycles, "", "hours × pulls an hour; judgement"),
    step("", "Shock cord in the line", placement?.shockCord === true ? "yes" : "no", "", "input"),
    step("R_m", "Dependable value in the morning", morning.dependableN, "N", law),
    step("m_m", "Margin in the morning", morningMargin, "", "R_m ÷ T"),
  ];
}

function marginWorkings(result: TieOutResult): Working[] {
  const { capacity, demandN, margin, chanceHolds, holdsToGustMs } = result;
  if (!capacity || demandN === null || margin === null) return [];
  const isOk = capacity.status === "ok";
  const verdicts = { holds: "holds", thin: "thin", "gives-way": "gives way", unknown: "unknown" } as const;
  const gust = "gust at which the dependable value equals the pull, found by bisection to 0.2 %";
  const open = holdsToGustMs !== null && holdsToGustMs >= LARGEST_GUST_MS ? ", or more" : "";
  return [
    ...(isOk
      ? [
          step("R₅₀", "Median of what it holds", capacity.medianN, "N", "what the anchor holds"),
          step("σ", "Scatter of its logarithm", capacity.scatter, "", "what the anchor holds"),
          step(
            "R₅",
            "Dependable value, exceeded in 95 of 100 cases: R₅₀·e^(−1.645σ)",
            capacity.dependableN,
            "N",
            "EN 1990:2002 Annex D.7",
          ),
        ]
      : []),
    step("T", "Pull in this line in the design gust", demandN, "N", "pull in the line"),
    step("m", "Margin, R₅ ÷ T", margin, "", "engineering ratio; judgement: 1 is enough"),
    ...(chanceHolds === null
      ? []
      : [
          step(
            "p",
            "Chance that it holds the design gust, Φ(ln(R₅₀/T)/σ)",
            chanceHolds,
            "",
            "lognormal distribution function",
          ),
        ]),
    ...(holdsToGustMs === null
      ? []
      : [step("V", `Holds to this 3-second gust at 10 m over open ground${open}`, holdsToGustMs, "m/s", gust)]),
    step("", "Verdict", verdicts[result.verdict], "", "holds: R₅ ≥ T; thin: R₅₀ ≥ T; else gives way"),
  ];
}
