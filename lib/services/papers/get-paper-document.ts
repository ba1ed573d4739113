import { z } from "zod";
import { getDb } from "@/db/client";
import { idSchema } from "@/lib/domain/ids";
import { paperSchema, type Paper } from "@/lib/domain/paper/schema";
import { isAllowed } from "@/lib/domain/permissions/permissions";
import type { Preferences } from "@/lib/domain/preferences";
import type { PaperCamp, PaperDocument, PaperHeader } from "@/lib/domain/views";
import { env } from "@/lib/env";
import { AppError } from "@/lib/errors";
import { formatInstant } from "@/lib/format/days";
import { requirePermission, type Standing } from "@/lib/auth/permission";
import type { Context } from "@/lib/services/context/context";
import { workOutCamp } from "../analysis/work-out-camp";
import { countNights } from "../camps/internal";
import { buildPackList, loadPackSources } from "../pack/internal";
import { findCampState, loadTripState, type CampState, type TripState } from "../plan/load-trip-state";
import { getPreferences } from "../preferences/get-preferences";
import { toTripView } from "../trips/internal";
import { parseInput } from "../trips/parse-input";
import { listFallbacks } from "./fallbacks";
import { markHandedOut } from "./mark-handed-out";

const getPaperDocumentInput = z.object({ tripId: idSchema, paper: paperSchema });

interface Desk {
  readonly state: TripState;
  readonly standing: Standing;
  readonly speedUnit: Preferences["speedUnit"];
}

/** Own list and the cards of shelters one sleeps in; whatever else there may be reads as not there. */
function requireOwn(paper: Paper, state: TripState, standing: Standing): void {
  if (isAllowed(standing.role, "paper.all")) return;
  const isOwn =
    (paper.kind === "pack-list" && paper.personId === standing.personId) ||
    (paper.kind === "pitch-card" &&
      state.camps.some(
        ({ camp, sleepers }) =>
          camp.id === paper.campId &&
          sleepers.some((one) => one.personId === standing.personId && one.pitchId === paper.pitchId),
      ));
  if (!isOwn) throw new AppError("not-found", "There is no such paper.");
}

function requireThere(paper: Paper, state: TripState): void {
  if (paper.kind === "pack-list" && !state.people.some((one) => one.id === paper.personId)) {
    throw new AppError("not-found", "There is no such person on this trip.");
  }
  if (paper.kind !== "field-card" && paper.kind !== "pitch-card") return;
  const { pitches } = findCampState(state, paper.campId);
  if (paper.kind === "pitch-card" && !pitches.some((one) => one.id === paper.pitchId)) {
    throw new AppError("not-found", "That shelter is not pitched at this camp.");
  }
}

/** The trip as it is printed. Looked at twice: who may not print, or prints what isn't there, leaves no mark. */
async function loadPrinted(ctx: Context, paper: Paper, tripId: string, standing: Standing): Promise<TripState> {
  const seen = await loadTripState(getDb(), tripId);
  requireOwn(paper, seen, standing);
  requireThere(paper, seen);
  await markHandedOut(ctx, tripId);
  const state = await loadTripState(getDb(), tripId);
  requireOwn(paper, state, standing);
  requireThere(paper, state);
  return state;
}

/** "3 of 5", or "3–4 of 5" for two nights. */
function numberNights(state: TripState, { camp }: CampState): string {
  const days = state.camps.flatMap((one) => one.camp.days);
  const first = days.indexOf(camp.days[0] ?? "") + 1;
  const last = first + camp.days.length - 1;
  return `${first === last ? first : `${first}–${last}`} of ${days.length}`;
}

async function toPaperCamp({ state, speedUnit }: Desk, own: CampState, pitchId: string | null): Promise<PaperCamp> {
  const worked = await workOutCamp(own);
  const isWanted = (id: string) => pitchId === null || id === pitchId;
  const names = new Map(state.people.map((one) => [one.id, one.name]));
  const pitches = worked.pitches.filter((one) => isWanted(one.id));
  const fallbacks = await listFallbacks(worked, speedUnit);
  return {
    camp: own.camp,
    nightNumbers: numberNights(state, own),
    pitches,
    tray: own.tray,
    placements: own.placements.filter((one) => isWanted(one.pitchId)),
    result: { ...worked.result, shelters: worked.result.shelters.filter((one) => isWanted(one.pitchId)) },
    sleeperNames: Object.fromEntries(
      pitches.map((pitch) => [pitch.id, pitch.sleeperIds.flatMap((id) => names.get(id) ?? [])]),
    ),
    fallbacks: Object.fromEntries(Object.entries(fallbacks).filter(([id]) => isWanted(id))),
  };
}

function writeHeader({ state, standing }: Desk, paper: Paper): PaperHeader {
  const base = `${env.appUrl}/trips/${state.trip.id}`;
  const page = paper.kind === "field-card" || paper.kind === "pitch-card" ? `${base}/camps/${paper.campId}` : base;
  return {
    tripName: state.trip.name,
    version: state.trip.paperVersion,
    printedAt: formatInstant(new Date(), state.trip.timeZone),
    // Whoever may not open the plan is led to their own page.
    address: paper.kind === "pack-list" || standing.role === "participant" ? `${base}/mine` : page,
  };
}

/** A piece of paper as a typed document, everything on it already worked out. */
export async function getPaperDocument({
  ctx,
  input,
}: {
  ctx: Context;
  input: z.input<typeof getPaperDocumentInput>;
}): Promise<PaperDocument> {
  const { tripId, paper } = parseInput(getPaperDocumentInput, input);
  const standing = await requirePermission(ctx, tripId, "paper.own");
  const db = getDb();
  const state = await loadPrinted(ctx, paper, tripId, standing);
  const { speedUnit } = await getPreferences({ ctx });
  const desk: Desk = { state, standing, speedUnit };
  const header = writeHeader(desk, paper);
  const { contacts } = state.trip;
  switch (paper.kind) {
    case "field-card": {
      const own = findCampState(state, paper.campId);
      return { kind: "field-card", header, contacts, camp: await toPaperCamp(desk, own, null) };
    }
    case "pitch-card": {
      const own = findCampState(state, paper.campId);
      const camp = await toPaperCamp(desk, own, paper.pitchId);
      return { kind: "pitch-card", header, contacts, camp, pitchIds: [paper.pitchId] };
    }
    case "pack-list": {
      const person = state.people.find((one) => one.id === paper.personId);
      if (!person) throw new AppError("not-found", "There is no such person on this trip.");
      return { kind: "pack-list", header, list: buildPackList(await loadPackSources(db, state), person) };
    }
    case "booklet": {
      const sources = await loadPackSources(db, state);
      return {
        kind: "booklet",
        header,
        trip: toTripView(state.trip, standing.role, countNights(state.camps.map((one) => one.camp.details))),
        contacts,
        camps: await Promise.all(state.camps.map((own) => toPaperCamp(desk, own, null))),
        packLists: state.people.map((person) => buildPackList(sources, person)),
      };
    }
  }
}
