import { z } from "zod";
import { getDb } from "@/db/client";
import { idSchema } from "@/lib/domain/ids";
import { paperSchema, type Paper } from "@/lib/domain/paper/schema";
import { isAllowed } from "@/lib/domain/permissions/permissions";
import type { Preferences } from "@/lib/domain/preferences";
import type { PaperDocument, PaperHeader } from "@/lib/domain/views";
import { env } from "@/lib/env";
import { AppError } from "@/lib/errors";
import { formatInstant } from "@/lib/format/days";
import { requirePermission, type Standing } from "@/lib/auth/permission";
import type { Context } from "@/lib/services/context/context";
import { countNights } from "../camps/internal";
import { buildOwnCards } from "../own-pages/build-own-cards";
import { buildOwnPages } from "../own-pages/build-own-pages";
import { buildPackList, loadPackSources } from "../pack/internal";
import { findCampState, loadTripState, type TripState } from "../plan/load-trip-state";
import { getPreferences } from "../preferences/get-preferences";
import { listWays } from "../route/list-ways";
import { toTripView } from "../trips/internal";
import { parseInput } from "../trips/parse-input";
import { markHandedOut } from "./mark-handed-out";
import { toPaperCamp, type PaperDesk } from "./paper-camp";

const getPaperDocumentInput = z.object({ tripId: idSchema, paper: paperSchema });

interface Desk extends PaperDesk {
  readonly standing: Standing;
  readonly lengthUnit: Preferences["lengthUnit"];
}

/** Own list and the cards of shelters one sleeps in; whatever else there may be reads as not there. */
function requireOwn(paper: Paper, state: TripState, standing: Standing): void {
  if (isAllowed(standing.role, "paper.all")) return;
  const isOwn =
    ((paper.kind === "pack-list" || paper.kind === "pitch-and-pack") && paper.personId === standing.personId) ||
    (paper.kind === "pitch-card" &&
      state.camps.some(
        ({ camp, sleepers }) =>
          camp.id === paper.campId &&
          sleepers.some((one) => one.personId === standing.personId && one.pitchId === paper.pitchId),
      ));
  if (!isOwn) throw new AppError("not-found", "There is no such paper.");
}

function findPerson(state: TripState, personId: string): TripState["people"][number] {
  const person = state.people.find((one) => one.id === personId);
  if (!person) throw new AppError("not-found", "There is no such person on this trip.");
  return person;
}

function requireThere(paper: Paper, state: TripState): void {
  if (paper.kind === "pack-list" || paper.kind === "pitch-and-pack") findPerson(state, paper.personId);
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

function writeHeader({ state, standing }: Desk, paper: Paper): PaperHeader {
  const base = `${env.appUrl}/trips/${state.trip.id}`;
  const page = paper.kind === "field-card" || paper.kind === "pitch-card" ? `${base}/camps/${paper.campId}` : base;
  return {
    tripName: state.trip.name,
    version: state.trip.paperVersion,
    printedAt: formatInstant(new Date(), state.trip.timeZone),
    // Whoever may not open the plan is led to their own page.
    address:
      paper.kind === "pack-list" || paper.kind === "pitch-and-pack" || standing.role === "participant"
        ? `${base}/mine`
        : page,
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
  const { speedUnit, lengthUnit } = await getPreferences({ ctx });
  const hasWays = paper.kind === "field-card" || paper.kind === "booklet";
  const ways = hasWays ? await listWays(db, tripId, lengthUnit) : undefined;
  const desk: Desk = { state, standing, speedUnit, lengthUnit, ...(ways ? { ways } : {}) };
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
      const person = findPerson(state, paper.personId);
      return { kind: "pack-list", header, list: buildPackList(await loadPackSources(db, state), person) };
    }
    case "pitch-and-pack": {
      const list = buildPackList(await loadPackSources(db, state), findPerson(state, paper.personId));
      const cards = await buildOwnCards(desk, list);
      const content = buildOwnPages(state, list);
      return { kind: "pitch-and-pack", header, contacts, fold: paper.fold, list, cards, content };
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
