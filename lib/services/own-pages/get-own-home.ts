import { z } from "zod";
import { getDb } from "@/db/client";
import { requirePermission } from "@/lib/auth/permission";
import { idSchema } from "@/lib/domain/ids";
import { compareOwnPages } from "@/lib/domain/own-pages/compare";
import type { OwnHome } from "@/lib/domain/own-pages/views";
import type { Context } from "@/lib/services/context/context";
import { buildPackList, loadPackSources, loadPerson } from "../pack/internal";
import { loadTripState } from "../plan/load-trip-state";
import { getPreferences } from "../preferences/get-preferences";
import { parseInput } from "../trips/parse-input";
import { buildOwnCards } from "./build-own-cards";
import { buildOwnPages } from "./build-own-pages";
import { findLook, latestCopies, listCopies } from "./copies";

const getOwnHomeInput = z.object({ tripId: idSchema });

/** Everything that concerns oneself on a trip, and nothing else. */
export async function getOwnHome({
  ctx,
  input,
}: {
  ctx: Context;
  input: z.input<typeof getOwnHomeInput>;
}): Promise<OwnHome> {
  const { tripId } = parseInput(getOwnHomeInput, input);
  const { personId } = await requirePermission(ctx, tripId, "paper.own");
  const db = getDb();
  const state = await loadTripState(db, tripId);
  const list = buildPackList(await loadPackSources(db, state), await loadPerson(db, tripId, personId));
  const { speedUnit, lengthUnit } = await getPreferences({ ctx });
  const now = buildOwnPages(state, list);
  const rows = (await listCopies(db, tripId)).filter((row) => row.personId === personId);
  const look = await findLook(db, tripId, personId);
  const known = look?.content ?? rows[0]?.content ?? null;
  return {
    version: state.trip.paperVersion,
    changedAt: state.trip.updatedAt.getTime(),
    list,
    cards: await buildOwnCards({ state, speedUnit, lengthUnit }, list),
    copies: latestCopies(rows, personId, now),
    look: look && { version: look.version, at: look.seenAt.toISOString() },
    changes: known && compareOwnPages(known, now),
  };
}
