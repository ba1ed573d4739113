import { buildShelter } from "@/lib/calc/shelter-kinds";
import { countUsed } from "@/lib/domain/plan/reduce";
import type { OwnPages, OwnPitch, OwnTieOut } from "@/lib/domain/own-pages/own-pages";
import type { PackListView } from "@/lib/domain/views";
import { formatLean } from "@/lib/format/angles";
import { knotName, riggingRemarks } from "@/lib/pdf/words";
import type { CampState, TripState, UnworkedPitch } from "../plan/load-trip-state";

function toTieOuts({ tray, placements }: CampState, pitch: UnworkedPitch): OwnTieOut[] {
  return buildShelter(pitch.spec).tieOuts.map(({ id, number }) => {
    const placement = placements.find((one) => one.pitchId === pitch.id && one.tieOutId === id);
    const anchor = tray.find((one) => one.id === placement?.anchorId);
    if (!placement || !anchor) return { tieOutId: id, number, anchor: null, rigging: "" };
    const rigging = [formatLean(placement.leanDeg), knotName(placement.knot), ...riggingRemarks(placement, tray, "m")];
    return { tieOutId: id, number, anchor: anchor.name, rigging: rigging.join(", ") };
  });
}

function listSpares({ tray, placements }: CampState): string {
  const used = countUsed(placements);
  return tray
    .filter((anchor) => !anchor.found)
    .flatMap(({ id, name, count }) => (count > (used.get(id) ?? 0) ? [`${count - (used.get(id) ?? 0)} × ${name}`] : []))
    .sort()
    .join(", ");
}

function toOwnPitch(own: CampState, pitch: UnworkedPitch): OwnPitch {
  const { ground, secondGround, slopeDeg, exposure, hill, windbreak, wind, windFromDeg, windToDeg, altitudeM } =
    own.camp.details;
  const patch = pitch.details.patch === "second" ? secondGround : ground;
  return {
    pitchId: pitch.id,
    campName: own.camp.details.name,
    name: pitch.name,
    headingDeg: pitch.details.headingDeg,
    shape: JSON.stringify([pitch.spec.kind, pitch.spec.dimensions, pitch.spec.lineLengthsM]),
    place: JSON.stringify([patch, slopeDeg, exposure, hill, windbreak, wind, windFromDeg, windToDeg, altitudeM]),
    spares: listSpares(own),
    tieOuts: toTieOuts(own, pitch),
  };
}

/** A person's pages as they stand, in the form that copies are compared in. */
export function buildOwnPages(state: TripState, list: PackListView): OwnPages {
  const own = new Set(list.nights.flatMap((night) => night.pitchId ?? []));
  return {
    nights: list.nights.map(({ campId, campName, day, shelterName, withNames }) => ({
      campId,
      campName,
      day,
      place: shelterName,
      withNames: [...withNames].sort(),
    })),
    bring: list.own.map(({ key, name }) => ({ key, name })),
    carry: list.group.map(({ key, name }) => ({ key, name })),
    pitches: state.camps.flatMap((camp) =>
      camp.pitches.filter((pitch) => own.has(pitch.id)).map((pitch) => toOwnPitch(camp, pitch)),
    ),
    contacts: state.trip.contacts.map(({ name, phone, note }) => [name, phone, note].filter(Boolean).join(", ")),
  };
}
