import { largestWeight, massUnits, weightedMargin } from "../plan-score";
import { WORK } from "../plan";
import { rigInLine } from "../plan-reinforce";
import { isKnownTieOut, prepareCamp, type KnownTieOut, type PreparedCamp, type PreparedShelter } from "../prepare-camp";
import { isDriven, rigAtBestLean, strengthOf, type Rigged } from "../rig-anchor";
import { setAnchor, spotKey } from "../tie-out-strength";
import type { AnchorSpec, CampInput, Gap, Placement, TrayAnchor } from "../types";
import type { CarriedKind, KindSet, KitCamp, KitNeed } from "./types";

/** A kind of anchor that the kit may take. */
export interface KitKindChoice {
  readonly id: string;
  readonly name: string;
  readonly spec: AnchorSpec;
  readonly massKg: number;
  /** How many there are to take; null = as many as are needed. */
  readonly most: number | null;
}

export interface KitCampChoice {
  readonly id: string;
  readonly name: string;
  /** With its plan as it is now; its tray is the things found there. */
  readonly input: CampInput;
  /** Whether things found there may be used. */
  readonly allowFound: boolean;
}

export interface KitSettings {
  readonly spares: number;
  /** Mass, kg, that the group would rather carry than do the work of setting one stake. */
  readonly workPriceKg: number;
  /** Two in line where no single anchor holds. */
  readonly allowDoubling: boolean;
}

/** What one kind is worth at one tie-out after the night; `rigged` is the single anchor, or the pair of its kind. */
export interface KindAtTieOut {
  readonly rigged: Rigged;
  /** What it still holds in the morning, N. */
  readonly morningN: number;
}

/** A tie-out with what can hold it. */
export interface TieOutChoice {
  readonly shelter: PreparedShelter;
  readonly tieOut: KnownTieOut;
  readonly label: string;
  readonly present: Placement | null;
  /** One, or two in line. */
  readonly pieces: 1 | 2;
  readonly isPinned: boolean;
  /** By kind, by its bit; null where it can't be used. */
  readonly byKind: readonly (KindAtTieOut | null)[];
  /** Kinds that hold. */
  readonly kinds: KindSet;
  /** Of a pinned tie-out: the kinds of its one or two pieces. */
  readonly pinnedKinds: readonly KindSet[];
}

export interface ReadCamp {
  readonly prepared: PreparedCamp;
  /** By bit: the carried kinds, then what is found here. */
  readonly anchors: readonly TrayAnchor[];
  readonly tieOuts: readonly TieOutChoice[];
  readonly camp: KitCamp;
  /** Shelters without a standing shape in the gust, whatever holds their lines. */
  readonly fallen: readonly string[];
}

/** What keeps a camp from being planned for; its hours of strong wind count, because it has to hold in the morning. */
export function findKitGaps(input: CampInput): readonly Gap[] {
  return prepareCamp(input).gaps;
}

/** What a rigging holds after the windy night, N; null when something is not known. */
export function morningOf(
  prepared: PreparedCamp,
  shelter: PreparedShelter,
  tieOut: KnownTieOut,
  placement: Placement,
): number | null {
  const cycles = prepared.nightCycles ?? 0;
  const strength =
    cycles > 0
      ? setAnchor(placement, prepared.anchors, tieOut.ground, shelter.pitch.spec.line)?.strengthAt(
          tieOut.lineAngleDeg,
          cycles,
        )
      : strengthOf(prepared, shelter, tieOut, placement);
  return strength ? strength.dependableN : null;
}

type Spot = Pick<TieOutChoice, "shelter" | "tieOut" | "present">;

/** One of each kind at its best lean, without rocks: they are not there to be counted on. */
function tryKinds(prepared: PreparedCamp, spot: Spot, anchors: readonly TrayAnchor[]): (KindAtTieOut | null)[] {
  const habit = spot.present && { ...spot.present, rockKg: 0 };
  return anchors.map((anchor) => {
    const rigged = rigAtBestLean(prepared, spot.shelter, spot.tieOut, anchor, habit);
    const morningN = rigged && morningOf(prepared, spot.shelter, spot.tieOut, rigged.placement);
    return rigged && morningN !== null ? { rigged, morningN } : null;
  });
}

function pairUp(prepared: PreparedCamp, spot: Spot, first: KindAtTieOut, second: KindAtTieOut): KindAtTieOut | null {
  const rigged = rigInLine(prepared, spot.shelter, spot.tieOut, first.rigged, second.rigged.anchor);
  const morningN = rigged && morningOf(prepared, spot.shelter, spot.tieOut, rigged.placement);
  return rigged && morningN !== null ? { rigged, morningN } : null;
}

const setOf = (kinds: readonly (KindAtTieOut | null)[], isIn: (kind: KindAtTieOut) => boolean): KindSet =>
  kinds.reduce((set, kind, at) => (kind && isIn(kind) ? set | (1 << at) : set), 0);

/**
 * Two of a kind in line where that holds, and only kinds any two of which hold together: of two that don't, the one
 * that is weaker with its like goes. So the two needs of a tie-out can be met by any two of them.
 */
function tryPairs(prepared: PreparedCamp, spot: Spot, singles: readonly (KindAtTieOut | null)[]) {
  const { demandN } = spot.tieOut;
  const pairs = singles.map((one) => {
    if (!one || !isDriven(one.rigged.anchor.spec)) return null;
    const pair = pairUp(prepared, spot, one, one);
    return pair && pair.morningN >= demandN ? pair : null;
  });
  const strongestFirst = pairs
    .flatMap((pair, at) => (pair ? [{ pair, at }] : []))
    .sort((a, b) => b.pair.morningN - a.pair.morningN);
  const kept: number[] = [];
  for (const { at } of strongestFirst) {
    const own = singles[at];
    const isFitting = kept.every((other) => {
      const rest = singles[other];
      const mixed = own && rest ? pairUp(prepared, spot, own, rest) : null;
      return mixed !== null && mixed.morningN >= demandN;
    });
    if (isFitting) kept.push(at);
  }
  return pairs.map((pair, at) => (kept.includes(at) ? pair : null));
}

function readPinned(
  prepared: PreparedCamp,
  spot: Spot & { readonly present: Placement },
  anchors: readonly TrayAnchor[],
) {
  const morningN = morningOf(prepared, spot.shelter, spot.tieOut, spot.present);
  const isHolding = morningN !== null && morningN >= spot.tieOut.demandN;
  const setFor = (id: string): KindSet => {
    const at = anchors.findIndex((anchor) => anchor.id === id);
    return isHolding && at >= 0 ? 1 << at : 0;
  };
  const { anchorId, tandem } = spot.present;
  return [setFor(anchorId), ...(tandem ? [setFor(tandem.anchorId)] : [])];
}

function readTieOut(
  prepared: PreparedCamp,
  spot: Spot,
  anchors: readonly TrayAnchor[],
  allowDoubling: boolean,
): TieOutChoice {
  const label = `tie-out ${spot.tieOut.tieOut.number} of ${spot.shelter.pitch.name}`;
  const { present } = spot;
  if (present?.pinned) {
    const pinnedKinds = readPinned(prepared, { ...spot, present }, anchors);
    const pieces = pinnedKinds.length === 2 ? 2 : 1;
    return { ...spot, label, pieces, isPinned: true, byKind: anchors.map(() => null), kinds: 0, pinnedKinds };
  }
  const singles = tryKinds(prepared, spot, anchors);
  const kinds = setOf(singles, (one) => one.morningN >= spot.tieOut.demandN);
  const base = { ...spot, label, isPinned: false, pinnedKinds: [] };
  if (kinds === 0 && allowDoubling) {
    const pairs = tryPairs(prepared, spot, singles);
    const doubled = setOf(pairs, () => true);
    if (doubled !== 0) return { ...base, pieces: 2, byKind: pairs, kinds: doubled };
  }
  return { ...base, pieces: 1, byKind: singles, kinds };
}

function toNeeds({ shelter, tieOut, pieces, isPinned, kinds, pinnedKinds }: TieOutChoice): KitNeed[] {
  const { id: tieOutId, number } = tieOut.tieOut;
  const { pitchId, name: shelterName } = shelter.pitch;
  const spot = { pitchId, tieOutId, number, shelterName, isPinned };
  if (isPinned) return pinnedKinds.map((set) => ({ ...spot, kinds: set }));
  return Array.from({ length: pieces }, () => ({ ...spot, kinds }));
}

/**
 * What each kind holds at each tie-out of a camp after its windy night, and so which kinds meet each need. Of what is
 * found there, only what is allowed or pinned counts. Call it for camps without gaps.
 */
export function readCampForKit(
  { id, name, input, allowFound }: KitCampChoice,
  choices: readonly KitKindChoice[],
  settings: Pick<KitSettings, "allowDoubling">,
): ReadCamp {
  const pinnedIds = new Set(input.placements.filter((one) => one.pinned).map((one) => one.anchorId));
  const found = input.tray.filter((anchor) => anchor.found && (allowFound || pinnedIds.has(anchor.id)));
  const carried = choices.map((choice): TrayAnchor => ({ ...choice, count: choice.most ?? 0, found: false }));
  const anchors = [...carried, ...found];
  const prepared = prepareCamp({ ...input, tray: anchors });
  const placementAt = new Map(input.placements.map((one) => [spotKey(one.pitchId, one.tieOutId), one]));
  const tieOuts = prepared.shelters.flatMap((shelter) =>
    shelter.tieOuts.filter(isKnownTieOut).map((tieOut) => {
      const present = placementAt.get(spotKey(shelter.pitch.pitchId, tieOut.tieOut.id)) ?? null;
      return readTieOut(prepared, { shelter, tieOut, present }, anchors, settings.allowDoubling);
    }),
  );
  return {
    prepared,
    anchors,
    tieOuts,
    camp: {
      id,
      name,
      found: found.map((one) => ({ id: one.id, name: one.name, most: one.count, work: WORK[one.spec.class] })),
      needs: tieOuts.flatMap(toNeeds),
    },
    fallen: prepared.shelters.filter((one) => one.standing === false).map((one) => one.pitch.name),
  };
}

/** The kinds with whole masses; one without a limit gets what all needs of the largest camp and the spares come to. */
export function toCarriedKinds(
  choices: readonly KitKindChoice[],
  camps: readonly KitCamp[],
  spares: number,
): CarriedKind[] {
  const enough = Math.max(0, ...camps.map((camp) => camp.needs.length)) + spares;
  return choices.map(({ id, name, spec, massKg, most }) => ({
    id,
    name,
    massUnits: massUnits(massKg),
    extraWork: WORK[spec.class] - WORK.stake,
    most: most ?? enough,
  }));
}

/** Weighted margin of a kind at a tie-out in the morning, as the best staking plan weighs them. */
export function morningValue(prepared: PreparedCamp, tieOut: KnownTieOut, morningN: number | null): number {
  return weightedMargin(morningN, tieOut.weightN, largestWeight(prepared));
}
