import { capacityWorkings } from "./capacity-workings";
import { dependableFromMedian, FIVE_PERCENT_QUANTILE, requireInRange } from "./constants";
import { deadmanResistance, type DeadmanResistance } from "./deadman";
import { obliqueTensionN, type ShaftResistance } from "./axial";
import { type GroundNumbers, groundNumbers, groundRow } from "./ground";
import { LINE_SCATTER, lineStrengthN } from "./line";
import { looseningFactor, type Installation } from "./loosening";
import { helixUpliftN, SCREW_DISTURBANCE } from "./screw";
import { snowPlateTensionN } from "./snow";
import { type DrivableGround, drivenDetail, type DrivenDetail, groundLeanFactors } from "./stake-limits";
import { SURFACE_WEIGHT_SCATTER, surfaceWeightTensionN } from "./surface-weight";
import type { AnchorSpec, Capacity, CapacityMode, Gap, GroundState, Rigging } from "./types";

export interface CapacityInput {
  readonly anchor: AnchorSpec;
  readonly ground: GroundState;
  /** Line above the ground under load, degrees, 0…90. */
  readonly lineAngleDeg: number;
  readonly rigging: Rigging;
  /** Pulls near the design gust before this one (loosening), 0…10⁶; none when left out. */
  readonly pullCycles?: number;
}

/** One way in which it can give, and the tension at which it does. */
export interface Limit {
  readonly mode: CapacityMode;
  readonly medianN: number;
  readonly scatter: number;
}

/** What was found on the way, by class of anchor; the working is written from it. */
export type Detail =
  | { readonly kind: "stake"; readonly driven: DrivenDetail }
  | { readonly kind: "deadman"; readonly deadman: DeadmanResistance; readonly slopeFactor: number }
  | {
      readonly kind: "screw-in";
      readonly upliftN: number;
      readonly driven: DrivenDetail;
    }
  | { readonly kind: "surface-weight"; readonly frictionCoefficient: number }
  | { readonly kind: "snow-plate"; readonly bearingPa: number }
  | { readonly kind: "natural" }
  | { readonly kind: "fixed"; readonly ratingN: number };

interface Ok {
  readonly status: "ok";
  /** Fresh for each evaluation; the line's limit is added to it. */
  readonly limits: Limit[];
  readonly detail: Detail;
  readonly loosening: number;
  /** Length or depth in the ground by which a second anchor's distance is judged, m. */
  readonly depthM: number;
}
interface Unusable {
  readonly status: "unusable";
  readonly reason: string;
  readonly instead: readonly string[];
}
interface Unknown {
  readonly status: "unknown";
  readonly gaps: readonly Gap[];
}

export interface Evaluated extends Ok {
  readonly medianN: number;
  readonly scatter: number;
  readonly dependableN: number;
  readonly mode: CapacityMode;
  readonly tandem: { readonly share: number; readonly rearN: number } | null;
}

/** Scatter of a printed rating about what the part holds (judgement). */
const RATING_SCATTER = 0.1;
/** What a second anchor's distance is judged by where nothing is buried, m (judgement). */
const FALLBACK_DEPTH_M = 0.3;
/** A second anchor counts in full from half a buried length (practice; engine of the 1-1 picket holdfast at 2.0 ×). */
const FULL_SPACING_SHARE = 0.5;
const THIN_WALL_M = 0.0015;
const SCREW_LEAN_DEG = 0;
/** Above this share of its uplift a screw is said to pull out rather than tip (wording only). */
const SCREW_UPLIFT_SHARE = 0.9;

/**
 * What one anchor holds at one line angle: every way it can give, the smallest of them, and its dependable value.
 * @param input `lineAngleDeg` 0…90; `rigging.leanDeg` −10…60; `rigging.depthOutM` 0…3; `rigging.rockKg` 0…200;
 *   `rigging.tandem.spacingM` 0…5; `pullCycles` 0…10⁶; dimensions as in section.ts, deadman.ts, screw.ts, snow.ts
 * @returns "ok" with numbers and working; "unusable" with a reason and what can be used instead; "unknown" with gaps
 * @throws RangeError naming the parameter that is out of range
 * Source: each step's own (stake.ts, lean.ts, axial.ts, deadman.ts, …).
 */
export function anchorCapacity(input: CapacityInput): Capacity {
  const result = evaluate(input);
  if (result.status !== "ok") return result;
  const { medianN, scatter, dependableN, mode } = result;
  return {
    status: "ok",
    medianN,
    scatter,
    dependableN,
    mode,
    sentence: capacitySentence(mode, input.anchor),
    workings: capacityWorkings(input, result),
  };
}

/** The same numbers without sentence and working, for hot loops; null when unusable or unknown. */
export function capacityNumbers(input: CapacityInput): {
  readonly medianN: number;
  readonly scatter: number;
  readonly dependableN: number;
  readonly mode: CapacityMode;
} | null {
  const result = evaluate(input);
  if (result.status !== "ok") return null;
  return {
    medianN: result.medianN,
    scatter: result.scatter,
    dependableN: result.dependableN,
    mode: result.mode,
  };
}

/**
 * Median tension at which the ground gives, whatever the stake's bending, its head and the line would do: what a pull
 * test is held against. Null where no ground is tested (weights, trees, fixings) or the anchor can't be used here.
 * Input, @throws and sources as `anchorCapacity`.
 */
export function groundMedianN(input: CapacityInput): number | null {
  const isInGround = ["stake", "screw-in", "deadman", "snow-plate"].includes(input.anchor.class);
  const result = isInGround ? evaluate(input) : null;
  // Limits stand in the order in which they were found: the ground's own is always the first.
  return result?.status === "ok" ? (result.limits[0]?.medianN ?? null) : null;
}

/** How it gives, for people. */
export function capacitySentence(mode: CapacityMode, anchor: AnchorSpec): string {
  switch (mode) {
    case "pulls-out":
      return anchor.class === "deadman" || anchor.class === "snow-plate"
        ? "Comes up out of the ground."
        : "Pulls out of the ground.";
    case "tips-over":
      return anchor.class === "stake" || anchor.class === "screw-in"
        ? "The ground in front of it gives."
        : "Shears forward through the ground.";
    case "bends":
      return anchor.class === "stake" && anchor.material === "hardwood" ? "The stake breaks." : "The stake bends.";
    case "line-breaks":
      return "The line breaks at the knot.";
    case "head-gives":
      return "The head or hook gives.";
    case "slides":
      return "Slides towards the pull.";
    case "lifts":
      return "Lifts off the ground.";
    case "rated":
      return "Reaches the rating of the fixing.";
  }
}

const LEAN_FROM_DEG = -10;
const LEAN_TO_DEG = 45;
const COARSE_STEP_DEG = 5;
const FINE_STEP_DEG = 1;

/**
 * The lean at which an anchor is most dependable, −10…45°: a scan in steps of 5°, then of 1° about the best; among
 * equals (within 0.1 %) the lean nearest to upright. Anchors that are not driven answer 0.
 * @throws RangeError as `anchorCapacity`
 */
export function bestLean(
  input: Omit<CapacityInput, "rigging"> & {
    readonly rigging: Omit<Rigging, "leanDeg"> & { readonly leanDeg?: number };
  },
): { readonly leanDeg: number; readonly capacity: Capacity } {
  const at = (leanDeg: number): CapacityInput => ({ ...input, rigging: { ...input.rigging, leanDeg } });
  if (input.anchor.class !== "stake") return { leanDeg: 0, capacity: anchorCapacity(at(0)) };
  const value = (leanDeg: number): number => {
    const result = evaluate(at(leanDeg));
    return result.status === "ok" ? result.dependableN : 0;
  };
  let best = { leanDeg: 0, valueN: value(0) };
  const consider = (leanDeg: number): void => {
    const valueN = value(leanDeg);
    const isBetter = valueN > best.valueN * 1.001;
    const isAsGoodAndNearer = valueN >= best.valueN && Math.abs(leanDeg) < Math.abs(best.leanDeg);
    if (isBetter || isAsGoodAndNearer) best = { leanDeg, valueN };
  };
  for (let leanDeg = LEAN_FROM_DEG; leanDeg <= LEAN_TO_DEG; leanDeg += COARSE_STEP_DEG) consider(leanDeg);
  const centre = best.leanDeg;
  const from = Math.max(LEAN_FROM_DEG, centre - COARSE_STEP_DEG + FINE_STEP_DEG);
  const to = Math.min(LEAN_TO_DEG, centre + COARSE_STEP_DEG - FINE_STEP_DEG);
  for (let leanDeg = from; leanDeg <= to; leanDeg += FINE_STEP_DEG) consider(leanDeg);
  return { leanDeg: best.leanDeg, capacity: anchorCapacity(at(best.leanDeg)) };
}

function checkRanges(input: CapacityInput): void {
  const { rigging } = input;
  requireInRange("lineAngleDeg", input.lineAngleDeg, 0, 90);
  requireInRange("rigging.leanDeg", rigging.leanDeg, -10, 60);
  requireInRange("rigging.depthOutM", rigging.depthOutM, 0, 3);
  requireInRange("rigging.rockKg", rigging.rockKg, 0, 200);
  if (rigging.tandem !== null) requireInRange("rigging.tandem.spacingM", rigging.tandem.spacingM, 0, 5);
  if (input.pullCycles !== undefined) requireInRange("pullCycles", input.pullCycles, 0, 1e6);
}

/** The one code path behind `anchorCapacity` and `capacityNumbers`. */
function evaluate(input: CapacityInput): Evaluated | Unusable | Unknown {
  checkRanges(input);
  const ground = groundNumbers(input.ground);
  const front = evaluateOne(input, input.anchor, ground);
  if (front.status !== "ok") return front;
  const { limits, detail, loosening, depthM } = front;
  let tandem: Evaluated["tandem"] = null;
  if (input.rigging.tandem !== null) {
    const rear = evaluateOne(
      { ...input, rigging: { ...input.rigging, rockKg: 0, depthOutM: 0 } },
      input.rigging.tandem.anchor,
      ground,
    );
    if (rear.status !== "ok") return rear;
    const share = Math.min(1, input.rigging.tandem.spacingM / (FULL_SPACING_SHARE * depthM));
    const rearN = smallest(rear.limits);
    tandem = { share, rearN };
    limits.forEach((limit, i) => {
      // The line to the shelter and the front head carry the whole pull: a second anchor does not help them.
      if (limit.mode === "head-gives") return;
      limits[i] = { ...limit, medianN: limit.medianN + share * Math.min(rearN, limit.medianN) };
    });
  }
  const { line, knot } = input.rigging;
  limits.push({
    mode: "line-breaks",
    medianN: lineStrengthN(line.material, line.diameterMm, knot),
    scatter: LINE_SCATTER,
  });
  const { medianN, scatter, dependableN, mode } = governing(limits);
  return { status: "ok", limits, detail, loosening, depthM, tandem, medianN, scatter, dependableN, mode };
}

function smallest(limits: readonly Limit[]): number {
  let least = Infinity;
  for (const limit of limits) least = Math.min(least, limit.medianN);
  return least;
}

/** The smallest median names the mode; the smallest dependable value counts, and the scatter is the one that joins them. */
function governing(limits: readonly Limit[]): {
  medianN: number;
  scatter: number;
  dependableN: number;
  mode: CapacityMode;
} {
  let medianN = Infinity;
  let dependableN = Infinity;
  let mode: CapacityMode = "line-breaks";
  for (const limit of limits) {
    if (limit.medianN < medianN) {
      medianN = limit.medianN;
      mode = limit.mode;
    }
    dependableN = Math.min(dependableN, dependableFromMedian(limit.medianN, limit.scatter));
  }
  return { medianN, dependableN, mode, scatter: Math.log(medianN / dependableN) / FIVE_PERCENT_QUANTILE };
}

function looseningOf(input: CapacityInput, installation: Installation): number {
  return looseningFactor({
    cycles: input.pullCycles ?? 0,
    ground: input.ground.kind,
    hasShockCord: input.rigging.shockCord,
    installation,
  });
}

/** Limits of one anchor by itself, without the line. */
function evaluateOne(input: CapacityInput, anchor: AnchorSpec, ground: GroundNumbers): Ok | Unusable | Unknown {
  switch (anchor.class) {
    case "stake":
      return evaluateStake(input, anchor, ground);
    case "screw-in":
      return evaluateScrew(input, anchor, ground);
    case "deadman":
      return evaluateDeadman(input, anchor, ground);
    case "surface-weight":
      return evaluateSurfaceWeight(input, anchor, ground);
    case "snow-plate":
      return evaluateSnowPlate(input, anchor, ground);
    case "natural":
      return evaluateNatural(anchor);
    case "fixed":
      return evaluateFixed(anchor);
  }
}

/** Slope factor on a buried body: the smaller of the two parts, so that neither is overstated. */
function slopeFactorOf(ground: DrivableGround): number {
  const { weight, cohesion } = groundLeanFactors(ground, 0);
  return Math.min(weight, cohesion);
}

type SpecOf<Class extends AnchorSpec["class"]> = Extract<AnchorSpec, { readonly class: Class }>;

function evaluateStake(input: CapacityInput, anchor: SpecOf<"stake">, ground: GroundNumbers): Ok | Unusable {
  requireInRange("anchor.lengthM", anchor.lengthM, 0.03, 3);
  if (anchor.headRatingN !== null) requireInRange("anchor.headRatingN", anchor.headRatingN, 1, 1e6);
  if (ground.kind === "undriveable") return unusable(ground.reason, ground.instead);
  const row = groundRow(input.ground.kind);
  if (row.isHardToDrive && isFragile(anchor)) {
    return unusable(`A plastic or thin-walled stake breaks when it is driven into ${row.name.toLowerCase()}.`, [
      "long nail",
      "steel rod",
      "surface weight",
    ]);
  }
  const loosening = looseningOf(input, "driven");
  const driven = drivenDetail({
    section: anchor.section,
    material: anchor.material,
    lengthM: anchor.lengthM,
    depthOutM: Math.min(input.rigging.depthOutM, anchor.lengthM),
    leanDeg: input.rigging.leanDeg,
    lineAngleDeg: input.lineAngleDeg,
    rockKg: input.rigging.rockKg,
    ground,
    strengthFactor: ground.strengthFactor * loosening,
  });
  if (driven === null) {
    return unusable("Too little of it stands in ground that holds.", ["longer stake", "surface weight", "deadman"]);
  }
  const limits: Limit[] = stakeLimits(driven, ground.scatter);
  if (anchor.headRatingN !== null) {
    limits.push({ mode: "head-gives", medianN: anchor.headRatingN, scatter: RATING_SCATTER });
  }
  return { status: "ok", limits, detail: { kind: "stake", driven }, loosening, depthM: driven.embeddedM };
}

/** However well the ground is known, a stake in it is known no better than its own bending. */
function stakeLimits(driven: DrivenDetail, groundScatter: number): Limit[] {
  const scatter = Math.max(groundScatter, driven.bendingScatter);
  const groundMode: CapacityMode = driven.isDrawnOut ? "pulls-out" : "tips-over";
  const limits: Limit[] = [{ mode: groundMode, medianN: driven.groundTensionN, scatter }];
  if (driven.bendingTensionN !== null) {
    limits.push({
      mode: driven.isDrawnOut ? "pulls-out" : "bends",
      medianN: driven.bendingTensionN,
      scatter: driven.bendingScatter,
    });
  }
  return limits;
}

function isFragile(anchor: SpecOf<"stake">): boolean {
  const { section, material } = anchor;
  if (material === "plastic-abs" || material === "polycarbonate") return true;
  return section.shape === "tube" && section.wallM < THIN_WALL_M;
}

function evaluateScrew(input: CapacityInput, anchor: SpecOf<"screw-in">, ground: GroundNumbers): Ok | Unusable {
  requireInRange("anchor.depthM", anchor.depthM, 0.05, 3);
  requireInRange("anchor.shaftDiameterM", anchor.shaftDiameterM, 0.002, 0.2);
  requireInRange("anchor.helixDiameterM", anchor.helixDiameterM, anchor.shaftDiameterM, 0.6);
  if (ground.kind === "undriveable") return unusable(ground.reason, ground.instead);
  const row = groundRow(input.ground.kind);
  if (row.isHardToDrive) {
    return unusable(`A screw can't be turned into ${row.name.toLowerCase()}.`, [
      "long nail",
      "steel rod",
      "surface weight",
    ]);
  }
  const depthM = Math.min(anchor.depthM, ground.stopDepthM) - ground.looseTopM;
  const loosening = looseningOf(input, "drilled");
  const strengthFactor = ground.strengthFactor * loosening;
  const driven = drivenDetail({
    section: { shape: "round", diameterM: anchor.shaftDiameterM },
    material: anchor.material,
    lengthM: anchor.depthM,
    depthOutM: 0,
    leanDeg: SCREW_LEAN_DEG,
    lineAngleDeg: input.lineAngleDeg,
    rockKg: 0,
    ground,
    strengthFactor,
  });
  if (driven === null || depthM <= 0) {
    return unusable("Too little of it turns into ground that holds.", ["surface weight", "deadman", "tree or boulder"]);
  }
  const upliftN = helixUpliftN(anchor.helixDiameterM, depthM, ground) * SCREW_DISTURBANCE * strengthFactor;
  const shaft: ShaftResistance = { ...driven.shaft, axialN: upliftN, frictionCoefficient: 0 };
  const form = ground.kind === "frictional" ? "linear-square" : "quadratic";
  const tension = (normalN: number): number => obliqueTensionN(input.lineAngleDeg, normalN, shaft, form);
  const groundN = tension(driven.normalN);
  const limits: Limit[] = [
    {
      mode: groundN > SCREW_UPLIFT_SHARE * upliftN ? "pulls-out" : "tips-over",
      medianN: groundN,
      scatter: Math.max(ground.scatter, driven.bendingScatter),
    },
  ];
  if (driven.bendingNormalN !== null) {
    limits.push({ mode: "bends", medianN: tension(driven.bendingNormalN), scatter: driven.bendingScatter });
  }
  return { status: "ok", limits, detail: { kind: "screw-in", upliftN, driven }, loosening, depthM };
}

function evaluateDeadman(input: CapacityInput, anchor: SpecOf<"deadman">, ground: GroundNumbers): Ok | Unusable {
  if (ground.kind === "undriveable") return unusable(ground.reason, ground.instead);
  if (ground.stopDepthM < anchor.depthM) {
    return unusable("Stones stop the digging before the depth is reached.", ["surface weight", "shallower deadman"]);
  }
  const loosening = looseningOf(input, "backfilled");
  const slopeFactor = slopeFactorOf(ground);
  const deadman = deadmanResistance({
    widthM: anchor.widthM,
    heightM: anchor.heightM,
    depthM: anchor.depthM,
    lineAngleDeg: input.lineAngleDeg,
    ground,
    strengthFactor: slopeFactor * ground.strengthFactor * loosening,
  });
  const isDrawnUp =
    Math.sin((input.lineAngleDeg * Math.PI) / 180) / deadman.upliftN >
    Math.cos((input.lineAngleDeg * Math.PI) / 180) / deadman.horizontalN;
  return {
    status: "ok",
    limits: [{ mode: isDrawnUp ? "pulls-out" : "tips-over", medianN: deadman.tensionN, scatter: ground.scatter }],
    detail: { kind: "deadman", deadman, slopeFactor },
    loosening,
    depthM: anchor.depthM,
  };
}

/** Lines steeper than this lift a weight rather than slide it, degrees (for the wording only). */
const LIFTING_ANGLE_DEG = 75;

function evaluateSurfaceWeight(
  input: CapacityInput,
  anchor: SpecOf<"surface-weight">,
  ground: GroundNumbers,
): Ok | Unusable {
  const medianN = surfaceWeightTensionN(
    anchor.massKg,
    ground.surfaceFriction,
    input.lineAngleDeg,
    input.ground.slopeDeg,
  );
  if (medianN <= 0) return unusable("It slides down this slope by itself.", ["deadman", "stake", "tree or boulder"]);
  return {
    status: "ok",
    limits: [
      {
        mode: input.lineAngleDeg > LIFTING_ANGLE_DEG ? "lifts" : "slides",
        medianN,
        scatter: SURFACE_WEIGHT_SCATTER,
      },
    ],
    detail: { kind: "surface-weight", frictionCoefficient: ground.surfaceFriction },
    loosening: 1,
    depthM: FALLBACK_DEPTH_M,
  };
}

function evaluateSnowPlate(input: CapacityInput, anchor: SpecOf<"snow-plate">, ground: GroundNumbers): Ok | Unusable {
  if (ground.kind !== "snow") {
    return unusable("A snow plate holds in snow only.", ["stake", "deadman", "surface weight"]);
  }
  const loosening = looseningOf(input, "backfilled");
  const bearingPa = ground.bearingPa * ground.strengthFactor * loosening * slopeFactorOf(ground);
  const medianN = snowPlateTensionN(anchor.widthM, anchor.lengthM, bearingPa, input.lineAngleDeg);
  return {
    status: "ok",
    limits: [{ mode: input.lineAngleDeg > 60 ? "pulls-out" : "tips-over", medianN, scatter: ground.scatter }],
    detail: { kind: "snow-plate", bearingPa },
    loosening,
    depthM: FALLBACK_DEPTH_M,
  };
}

function evaluateNatural(anchor: SpecOf<"natural">): Ok | Unknown {
  if (!anchor.checked) {
    const message =
      anchor.kind === "tree"
        ? "Check the tree: alive, rooted firmly, at least 15 cm thick, no dead limbs above."
        : "Check the boulder: it does not rock, and weighs at least ten times the pull.";
    return { status: "unknown", gaps: [{ field: "anchor.checked", message }] };
  }
  return { status: "ok", limits: [], detail: { kind: "natural" }, loosening: 1, depthM: FALLBACK_DEPTH_M };
}

function evaluateFixed(anchor: SpecOf<"fixed">): Ok | Unknown {
  if (anchor.ratingN === null) {
    return {
      status: "unknown",
      gaps: [{ field: "anchor.ratingN", message: "Enter the rating of the fixing, or what it held in a pull test." }],
    };
  }
  requireInRange("anchor.ratingN", anchor.ratingN, 1, 1e6);
  return {
    status: "ok",
    limits: [{ mode: "rated", medianN: anchor.ratingN, scatter: RATING_SCATTER }],
    detail: { kind: "fixed", ratingN: anchor.ratingN },
    loosening: 1,
    depthM: FALLBACK_DEPTH_M,
  };
}

function unusable(reason: string, instead: readonly string[]): Unusable {
  return { status: "unusable", reason, instead };
}
