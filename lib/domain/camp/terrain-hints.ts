import { HAZARDS, type CampDetails } from "./schema";

type HazardKey = (typeof HAZARDS)[number]["key"];

export interface TerrainHint {
  readonly key: HazardKey;
  /** The hazard's name: "Dead limbs overhead". */
  readonly name: string;
  /** Why it is worth a look: "There are trees here." */
  readonly reason: string;
}

/** So near to the crest of a hill that it is on the ridge, as a share of the slope's length: judgement. */
const NEAR_CREST = 0.25;
/** So near to water that it is worth asking where the last flood stood, m: judgement. */
const NEAR_WATER_M = 60;

function isNearCrest({ hill }: CampDetails): boolean {
  if (!hill) return false;
  const slopeM = hill.fromCrestM < 0 ? hill.upwindLengthM : hill.downwindLengthM;
  return Math.abs(hill.fromCrestM) <= NEAR_CREST * slopeM;
}

const isSnow = ({ ground, secondGround }: CampDetails) =>
  [ground, secondGround].some((patch) => patch?.kind === "settled-snow" || patch?.kind === "wind-packed-snow");

const isFlat = ({ ground, secondGround }: CampDetails) =>
  [ground, secondGround].some((patch) => patch?.kind === "moist-sandy-flat" || patch?.kind === "shingle");

/** What the rest of a camp's facts suggest and when: prompts to look, never ticked by us. */
const RULES: readonly { key: HazardKey; reason: string; applies: (camp: CampDetails) => boolean }[] = [
  {
    key: "dead-limbs",
    reason: "There are trees here.",
    applies: (camp) => camp.hasTrees || camp.underTreesSpeedRatio !== null,
  },
  {
    key: "flood-plain",
    reason: "Flats of sand or shingle are where rivers and sea go.",
    applies: isFlat,
  },
  {
    key: "flood-plain",
    reason: "Water is near.",
    applies: (camp) => camp.waterDistanceM !== null && camp.waterDistanceM <= NEAR_WATER_M,
  },
  { key: "ridge", reason: "The camp lies near the crest of its hill.", applies: isNearCrest },
  {
    key: "lightning",
    reason: "The camp lies open to all sides.",
    applies: (camp) => camp.exposure === "0" || camp.exposure === "I",
  },
  { key: "avalanche", reason: "The ground is snow.", applies: isSnow },
  { key: "rockfall", reason: "A cliff is near.", applies: (camp) => camp.hill?.shape === "cliff" },
];

/** Hazards that nobody has ticked although something else that was said of the camp suggests a look. */
export function suggestHazards(camp: CampDetails): TerrainHint[] {
  const found = RULES.filter((rule) => !camp.hazards.includes(rule.key) && rule.applies(camp));
  return found
    .filter((rule, index) => found.findIndex((other) => other.key === rule.key) === index)
    .map(({ key, reason }) => ({ key, reason, name: HAZARDS.find((hazard) => hazard.key === key)?.name ?? key }));
}
