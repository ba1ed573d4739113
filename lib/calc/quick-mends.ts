import { marginOf } from "./camp";
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
import { prepareCamp, type PreparedTieOut } from "./prepare-camp";
import { isDriven, rigAtBestLean, type Rigged } from "./rig-anchor";
import { evaluateTieOut } from "./camp";
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
  if (!one || one.present?.pinned) return one ? rankMends(patchMends(one)) : [];
  const left = countFree(camp);
  return rankMends([
    ...leanMends(one),
    ...trayMends(one, left),
    ...exchangeMends(one),
    ...cordMends(one),
    ...rockMends(one),
    ...tandemMends(one, left),
    ...patchMends(one),
  ]);
}

function countFree(camp: CampInput): ReadonlyMap<string, number> {
  const left = new Map(camp.tray.map((anchor) => [anchor.id, anchor.count]));
  for (const { anchorId, tandem } of camp.placements) {
    for (const id of tandem ? [anchorId, tandem.anchorId] : [anchorId]) left.set(id, (left.get(id) ?? 0) - 1);
  }
  return left;
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

function leanMends(one: MendCase): Mend[] {
  const { present, prepared } = one;
  const anchor = present && prepared.anchors.get(present.anchorId);
  if (!present || !anchor || !isDriven(anchor.spec)) return [];
  const rigged = rigAtBestLean(prepared, one.shelter, one.tieOut, anchor, present);
  if (!rigged) return [];
  const placement = { ...present, leanDeg: rigged.placement.leanDeg, depthOutM: 0 };
  const title = present.depthOutM > 0 ? "Drive it home" : "Drive it";
  const was =
    present.depthOutM > 0
      ? `${Math.round(present.depthOutM * 1000)}\u2009mm stand out now`
      : `now ${describeLean(present.leanDeg)}`;
  return nonNull(
    measureMend(one, draftOf("best-lean", `${title} ${describeLean(placement.leanDeg)}`, was, [placement]), placement),
  );
}

/** The best of `anchors` by what they hold here, at most MOST_OF_A_KIND. */
function bestAnchors(one: MendCase, anchors: readonly TrayAnchor[]): { anchor: TrayAnchor; rigged: Rigged }[] {
  return anchors
    .flatMap((anchor) =>
      nonNull(rigAtBestLean(one.prepared, one.shelter, one.tieOut, anchor, one.present)).map((rigged) => ({
        anchor,
        rigged,
      })),
    )
    .sort(
      (a, b) => b.rigged.strength.dependableN - a.rigged.strength.dependableN || (a.anchor.id < b.anchor.id ? -1 : 1),
    )
    .slice(0, MOST_OF_A_KIND);
}

function trayMends(one: MendCase, left: ReadonlyMap<string, number>): Mend[] {
  const { prepared, present } = one;
  const free = prepared.input.tray.filter(
    (anchor) => anchor.id !== present?.anchorId && (left.get(anchor.id) ?? 0) > 0,
  );
  const mends = (kind: Mend["kind"], anchors: readonly TrayAnchor[], title: (name: string) => string) =>
    bestAnchors(one, anchors).flatMap(({ anchor, rigged }) => {
      const detail = countLeft(anchor, left.get(anchor.id) ?? 0);
      return nonNull(
        measureMend(one, draftOf(kind, title(inSentence(anchor.name)), detail, [rigged.placement]), rigged.placement),
      );
    });
  return [
    ...mends(
      "swap",
      free.filter((anchor) => !isWeightOrDeadman(anchor)),
      (name) => (present ? `Swap with the ${name}` : `Put the ${name} here`),
    ),
    ...mends("weight-or-deadman", free.filter(isWeightOrDeadman), (name) => `Hold it with the ${name}`),
  ];
}

/** Anchors of other tie-outs that can spare them: theirs then still holds, or at least more than this one did. */
function exchangeMends(one: MendCase): Mend[] {
  const { prepared, present } = one;
  const mine = present && prepared.anchors.get(present.anchorId);
  if (!present || !mine || present.tandem || one.now.margin === null) return [];
  const found: { mend: Mend; worse: number }[] = [];
  const here = new Map<string, Rigged | null>();
  for (const shelter of prepared.shelters) {
    for (const tieOut of shelter.tieOuts) {
      const other = prepared.input.placements.find(
        (placement) => placement.pitchId === shelter.pitch.pitchId && placement.tieOutId === tieOut.tieOut.id,
      );
      const theirs = other && prepared.anchors.get(other.anchorId);
      if (!other || !theirs || other.pinned || other.tandem || theirs.id === mine.id || tieOut.demandN === null)
        continue;
      let hereWith = here.get(theirs.id);
      if (hereWith === undefined) {
        hereWith = rigAtBestLean(prepared, one.shelter, one.tieOut, theirs, present);
        here.set(theirs.id, hereWith);
      }
      const thereWith = rigAtBestLean(prepared, shelter, tieOut, mine, other);
      if (!hereWith || !thereWith) continue;
      const gained = marginOf(hereWith.strength.dependableN, one.tieOut.demandN ?? 0);
      const spared = marginOf(thereWith.strength.dependableN, tieOut.demandN);
      if (Math.min(gained, spared) <= one.now.margin || spared < Math.min(1, gained)) continue;
      const mend = asMend(
        one.now,
        draftOf(
          "swap",
          `Exchange with ${nameOther(one, shelter.pitch.name, tieOut)}: ${inSentence(theirs.name)}`,
          `its margin is then ${twoDigits(spared)}`,
          [hereWith.placement, thereWith.placement],
        ),
        // The gust is looked for only for those that are offered.
        { ...one.now, margin: gained, holdsToGustMs: 0 },
      );
      if (mend) found.push({ mend, worse: Math.min(gained, spared) });
    }
  }
  found.sort((a, b) => b.worse - a.worse || (a.mend.title < b.mend.title ? -1 : 1));
  return found.slice(0, MOST_OF_A_KIND).map(({ mend }) => {
    const [placement] = mend.placements;
    const result = placement ? evaluateTieOut(prepared, one.shelter, one.tieOut, placement) : one.now;
    return { ...mend, holdsToGustMs: result.holdsToGustMs ?? 0 };
  });
}

function nameOther(one: MendCase, shelterName: string, tieOut: PreparedTieOut): string {
  const name = `tie-out ${tieOut.tieOut.number}`;
  return shelterName === one.shelter.pitch.name ? name : `${name} of ${shelterName}`;
}

function cordMends(one: MendCase): Mend[] {
  const { present, prepared, now } = one;
  if (!present || present.shockCord || now.morningMargin === null) return [];
  const placement = { ...present, shockCord: true };
  const then = evaluateTieOut(prepared, one.shelter, one.tieOut, placement);
  const detail = `by morning ${twoDigits(then.morningMargin ?? 0)} instead of ${twoDigits(now.morningMargin)}`;
  return nonNull(asMend(now, draftOf("shock-cord", "Put shock cord in the line", detail, [placement]), then));
}

function rockMends(one: MendCase): Mend[] {
  const { present, prepared } = one;
  const anchor = present && prepared.anchors.get(present.anchorId);
  if (!prepared.input.rocksAvailable || !present || !anchor || !isDriven(anchor.spec)) return [];
  if (present.rockKg >= USUAL_ROCK_KG) return [];
  const placement = { ...present, rockKg: USUAL_ROCK_KG };
  const title = `Put a rock of ${USUAL_ROCK_KG}\u2009kg on its lip`;
  return nonNull(measureMend(one, draftOf("rock", title, "on the side of the shelter", [placement]), placement));
}

function tandemMends(one: MendCase, left: ReadonlyMap<string, number>): Mend[] {
  const { present, prepared } = one;
  if (!present) return [];
  const pairs = prepared.input.tray
    .filter((anchor) => (left.get(anchor.id) ?? 0) > 0)
    .flatMap((second) =>
      nonNull(rigInLine(prepared, one.shelter, one.tieOut, present, second)).map((rigged) => ({ second, rigged })),
    )
    .sort(
      (a, b) => b.rigged.strength.dependableN - a.rigged.strength.dependableN || (a.second.id < b.second.id ? -1 : 1),
    );
  return pairs.slice(0, 1).flatMap(({ second, rigged }) => {
    const { placement } = rigged;
    const metres = `${(placement.tandem?.spacingM ?? 0).toFixed(2)}\u2009m`;
    const isBehind = placement.tandem?.anchorId === second.id;
    const detail = isBehind
      ? `${inSentence(second.name)}, ${metres} behind`
      : `${inSentence(second.name)} in front, the one there now ${metres} behind`;
    return nonNull(measureMend(one, draftOf("tandem", "Second stake in line", detail, [placement]), placement));
  });
}

function patchMends(one: MendCase): Mend[] {
  const { input } = one.prepared;
  const { pitch } = one.shelter;
  const patch = pitch.patch === "main" ? "second" : "main";
  const ground = patch === "main" ? input.ground : input.secondGround;
  if (!ground || !one.present) return [];
  const title = patch === "main" ? "Move the shelter to the main ground" : "Move the shelter to the second patch";
  return nonNull(
    measurePitchChange(
      one,
      { ...pitch, patch },
      {
        ...draftOf("other-patch", title, inSentence(groundRow(ground.kind).name), []),
        pitchChange: { patch },
      },
    ),
  );
}
