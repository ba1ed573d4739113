import { evaluateTieOut, marginOf } from "./camp";
import { groundRow } from "./ground";
import {
  asMend,
  measureMend,
  measurePitchChange,
  openCase,
  rankMends,
  type MendCase,
  type TieOutSpot,
} from "./mend-measure";
import { rigInLine, USUAL_ROCK_KG } from "./plan-reinforce";
import { prepareCamp } from "./prepare-camp";
import { isDriven, readPlan, rigAtBestLean, type PlannedTieOut, type Rigged } from "./rig-anchor";
import { Stock } from "./stock";
import type { CampInput, Mend, Placement, TrayAnchor } from "./types";
import { inSentence, twoDigits } from "./wording";

/** At most so many of one sort are offered: more is a list, not advice. */
const MOST_OF_A_KIND = 3;

/** Anchors that are heavy or dug in rather than driven or tied. */
const isWeightOrDeadman = (anchor: TrayAnchor): boolean =>
  anchor.spec.class === "surface-weight" || anchor.spec.class === "deadman";

/**
 * What would mend a tie-out without working out the shelter anew: a better lean, another anchor, shock cord, a rock, a
 * second stake in line, a weight, the other patch of ground. Each with its margin in the design gust and the gust it
 * then holds to; those that reach margin 1 first, in order of work. Empty when its pull is not known.
 *
 * `placements` of a mend are to be put; `pitchChange` is to be laid over the pitch.
 */
export function quickMends(camp: CampInput, spot: TieOutSpot): Mend[] {
  const one = openCase(prepareCamp(camp), spot);
  if (!one) return [];
  const stock = new Stock(camp.tray, camp.placements);
  const free = camp.tray.filter((anchor) => stock.left(anchor.id) > 0);
  const atThePin = one.present?.pinned
    ? []
    : [
        ...trayMends(one, free, stock),
        ...(one.present && one.anchor ? anchorMends(one, one.present, one.anchor, free) : []),
      ];
  return rankMends([...atThePin, ...patchMends(one)]);
}

/** What can be done with the anchor that is there. */
function anchorMends(one: MendCase, present: Placement, anchor: TrayAnchor, free: readonly TrayAnchor[]): Mend[] {
  return [
    ...exchangeMends(one, present, anchor),
    ...cordMends(one, present),
    ...(isDriven(anchor.spec)
      ? [...leanMends(one, present, anchor), ...rockMends(one, present), ...tandemMends(one, present, anchor, free)]
      : []),
  ];
}

const countLeft = (anchor: TrayAnchor, left: number): string =>
  anchor.found ? "found at the camp" : left === 1 ? "one left in the tray" : `${left} left in the tray`;

const draftOf = (kind: Mend["kind"], title: string, detail: string, placements: readonly Placement[]) => ({
  kind,
  title,
  detail,
  placements,
  pitchChange: null,
});

const nonNull = <T>(value: T | null): T[] => (value === null ? [] : [value]);

function describeLean(leanDeg: number): string {
  if (leanDeg === 0) return "upright";
  return leanDeg > 0 ? `leaning ${leanDeg}° away from the pull` : `leaning ${-leanDeg}° towards the pull`;
}

function leanMends(one: MendCase, present: Placement, anchor: TrayAnchor): Mend[] {
  const rigged = rigAtBestLean(one.prepared, one.shelter, one.tieOut, anchor, present);
  if (!rigged) return [];
  const placement = { ...present, leanDeg: rigged.placement.leanDeg, depthOutM: 0 };
  const isOut = present.depthOutM > 0;
  const title = `${isOut ? "Drive it home" : "Drive it"} ${describeLean(placement.leanDeg)}`;
  const outMm = Math.round(present.depthOutM * 1000);
  const was = isOut ? `${outMm}\u2009mm stand out now` : `now ${describeLean(present.leanDeg)}`;
  return nonNull(measureMend(one, draftOf("best-lean", title, was, [placement]), placement));
}

/** The strongest first; the order of the tray among equals. */
const strongestFirst = <T extends { readonly rigged: Rigged }>(offers: readonly T[]): T[] =>
  [...offers].sort((a, b) => b.rigged.strength.dependableN - a.rigged.strength.dependableN);

function trayMends(one: MendCase, free: readonly TrayAnchor[], stock: Stock): Mend[] {
  const others = free.filter((anchor) => anchor.id !== one.present?.anchorId);
  const offer = (kind: Mend["kind"], verb: string, anchors: readonly TrayAnchor[]) =>
    strongestFirst(
      anchors.flatMap((anchor) =>
        nonNull(rigAtBestLean(one.prepared, one.shelter, one.tieOut, anchor, one.present)).map((rigged) => ({
          rigged,
        })),
      ),
    )
      .slice(0, MOST_OF_A_KIND)
      .flatMap(({ rigged: { anchor, placement } }) => {
        const title = `${verb} the ${inSentence(anchor.name)}`;
        const detail = countLeft(anchor, stock.left(anchor.id));
        return nonNull(measureMend(one, draftOf(kind, title, detail, [placement]), placement));
      });
  return [
    ...offer(
      "swap",
      one.present ? "Swap with" : "Put in",
      others.filter((anchor) => !isWeightOrDeadman(anchor)),
    ),
    ...offer("weight-or-deadman", "Hold it with", others.filter(isWeightOrDeadman)),
  ];
}

/** Anchors of other tie-outs that can spare them: theirs then still holds, or at least more than this one will. */
function exchangeMends(one: MendCase, present: Placement, mine: TrayAnchor): Mend[] {
  const { prepared, now } = one;
  const least = now.margin;
  if (present.tandem || least === null) return [];
  const offers = readPlan(prepared, prepared.input.placements).flatMap((other) => {
    const { placement } = other;
    const theirs = placement && prepared.anchors.get(placement.anchorId);
    if (!theirs || theirs.id === mine.id || placement.pinned || placement.tandem) return [];
    const here = rigAtBestLean(prepared, one.shelter, one.tieOut, theirs, present);
    const there = rigAtBestLean(prepared, other.shelter, other.tieOut, mine, placement);
    if (!here || !there) return [];
    const gained = marginOf(here.strength.dependableN, one.tieOut.demandN);
    const spared = marginOf(there.strength.dependableN, other.tieOut.demandN);
    if (gained <= least || spared < Math.min(1, gained)) return [];
    return [{ other, here, there, spared, worse: Math.min(gained, spared) }];
  });
  return offers
    .sort((a, b) => b.worse - a.worse)
    .slice(0, MOST_OF_A_KIND)
    .flatMap(({ other, here, there, spared }) => {
      const title = `Exchange with ${nameOther(one, other)}: ${inSentence(here.anchor.name)}`;
      const detail = `its margin is then ${twoDigits(spared)}`;
      const draft = draftOf("swap", title, detail, [here.placement, there.placement]);
      return nonNull(measureMend(one, draft, here.placement));
    });
}

function nameOther(one: MendCase, { shelter, tieOut }: PlannedTieOut): string {
  const name = `tie-out ${tieOut.tieOut.number}`;
  return shelter === one.shelter ? name : `${name} of ${shelter.pitch.name}`;
}

function cordMends(one: MendCase, present: Placement): Mend[] {
  const { prepared, now } = one;
  if (present.shockCord || now.morningMargin === null) return [];
  const placement = { ...present, shockCord: true };
  const then = evaluateTieOut(prepared, one.shelter, one.tieOut, placement);
  const detail = `by morning ${twoDigits(then.morningMargin ?? 0)} instead of ${twoDigits(now.morningMargin)}`;
  return nonNull(asMend(now, draftOf("shock-cord", "Put shock cord in the line", detail, [placement]), then));
}

function rockMends(one: MendCase, present: Placement): Mend[] {
  if (!one.prepared.input.rocksAvailable || present.rockKg >= USUAL_ROCK_KG) return [];
  const placement = { ...present, rockKg: USUAL_ROCK_KG };
  const title = `Put a rock of ${USUAL_ROCK_KG}\u2009kg on its lip`;
  return nonNull(measureMend(one, draftOf("rock", title, "on the side of the shelter", [placement]), placement));
}

function tandemMends(one: MendCase, present: Placement, anchor: TrayAnchor, free: readonly TrayAnchor[]): Mend[] {
  const pairs = free.flatMap((second) =>
    nonNull(rigInLine(one.prepared, one.shelter, one.tieOut, { anchor, placement: present }, second)).map((rigged) => ({
      second,
      rigged,
    })),
  );
  return strongestFirst(pairs)
    .slice(0, 1)
    .flatMap(({ second, rigged: { placement } }) => {
      const metres = `${(placement.tandem?.spacingM ?? 0).toFixed(2)}\u2009m`;
      const detail =
        placement.tandem?.anchorId === second.id
          ? `${inSentence(second.name)}, ${metres} behind`
          : `${inSentence(second.name)} in front, the one there now ${metres} behind`;
      return nonNull(measureMend(one, draftOf("tandem", "Second stake in line", detail, [placement]), placement));
    });
}

function patchMends(one: MendCase): Mend[] {
  const { input } = one.prepared;
  const { pitch } = one.shelter;
  const isMain = pitch.patch === "main";
  const ground = isMain ? input.secondGround : input.ground;
  if (!ground || !one.present) return [];
  const patch = isMain ? "second" : "main";
  const title = isMain ? "Move the shelter to the second patch" : "Move the shelter to the main ground";
  const draft = draftOf("other-patch", title, inSentence(groundRow(ground.kind).name), []);
  return nonNull(measurePitchChange(one, { ...pitch, patch }, { ...draft, pitchChange: { patch } }));
}
