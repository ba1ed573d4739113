import { and, asc, eq } from "drizzle-orm";
import { getDb } from "@/db/client";
import { camp, pitch, sleeper } from "@/db/schema";
import type { Paper } from "@/lib/domain/paper/schema";
import type { PaperPiece } from "@/lib/domain/post/schema";
import { isInLine } from "../camps/internal";

/** Papers that become one file, with a key under which an equal file is rendered once for everybody. */
export interface PaperBundle {
  readonly key: string;
  readonly fileName: string;
  readonly papers: readonly Paper[];
}

export interface TripPlaces {
  readonly campIds: readonly string[];
  /** Where each person sleeps, in the order of the camps. */
  readonly pitches: readonly { readonly personId: string; readonly campId: string; readonly pitchId: string }[];
}

export async function loadTripPlaces(tripId: string): Promise<TripPlaces> {
  const camps = await getDb()
    .select({ id: camp.id })
    .from(camp)
    .where(and(eq(camp.tripId, tripId), isInLine))
    .orderBy(asc(camp.position));
  const pitches = await getDb()
    .select({ personId: sleeper.personId, campId: sleeper.campId, pitchId: pitch.id })
    .from(sleeper)
    .innerJoin(pitch, eq(pitch.id, sleeper.pitchId))
    .innerJoin(camp, eq(camp.id, sleeper.campId))
    .where(and(eq(sleeper.tripId, tripId), eq(pitch.tripId, tripId), isInLine))
    .orderBy(asc(camp.position), asc(pitch.position));
  return { campIds: camps.map((one) => one.id), pitches };
}

/** What one person gets. A piece with nothing on it (no place to sleep yet, no camps) is left out. */
export function composeBundles(
  person: { readonly id: string; readonly name: string },
  pieces: readonly PaperPiece[],
  places: TripPlaces,
): PaperBundle[] {
  const own = places.pitches.filter((one) => one.personId === person.id);
  const bundles: Readonly<Record<PaperPiece, PaperBundle>> = {
    "pitch-and-pack": {
      key: `pitch-and-pack ${person.id}`,
      fileName: `Pitch and pack ${person.name}.pdf`,
      papers: [{ kind: "pitch-and-pack", personId: person.id, fold: "flat" }],
    },
    "pack-list": {
      key: `pack-list ${person.id}`,
      fileName: `Pack list ${person.name}.pdf`,
      papers: [{ kind: "pack-list", personId: person.id }],
    },
    "pitch-cards": {
      key: `pitch-cards ${own.map((one) => one.pitchId).join(" ")}`,
      fileName: "Pitch cards.pdf",
      papers: own.map(({ campId, pitchId }) => ({ kind: "pitch-card", campId, pitchId })),
    },
    "field-cards": {
      key: "field-cards",
      fileName: "Field cards.pdf",
      papers: places.campIds.map((campId) => ({ kind: "field-card", campId })),
    },
    booklet: { key: "booklet", fileName: "Booklet.pdf", papers: [{ kind: "booklet" }] },
  };
  return [...new Set(pieces)].map((piece) => bundles[piece]).filter((bundle) => bundle.papers.length > 0);
}
