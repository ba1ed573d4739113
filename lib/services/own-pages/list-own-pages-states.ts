import { z } from "zod";
import { getDb } from "@/db/client";
import { requirePermission } from "@/lib/auth/permission";
import { idSchema } from "@/lib/domain/ids";
import { compareOwnPages } from "@/lib/domain/own-pages/compare";
import type { OwnPagesState } from "@/lib/domain/own-pages/views";
import type { Context } from "@/lib/services/context/context";
import { buildPackList, loadPackSources } from "../pack/internal";
import { loadTripState } from "../plan/load-trip-state";
import { parseInput } from "../trips/parse-input";
import { buildOwnPages } from "./build-own-pages";
import { latestCopies, listCopies, listLooks } from "./copies";

const listOwnPagesStatesInput = z.object({ tripId: idSchema });

/** Who has which version of their pages, who has read it, and for whom it is old by now. */
export async function listOwnPagesStates({
  ctx,
  input,
}: {
  ctx: Context;
  input: z.input<typeof listOwnPagesStatesInput>;
}): Promise<OwnPagesState[]> {
  const { tripId } = parseInput(listOwnPagesStatesInput, input);
  await requirePermission(ctx, tripId, "paper.all");
  const db = getDb();
  const state = await loadTripState(db, tripId);
  const sources = await loadPackSources(db, state);
  const copies = await listCopies(db, tripId);
  const looks = await listLooks(db, tripId);
  return state.people.map(({ id, name }) => {
    const now = buildOwnPages(state, buildPackList(sources, { id, name }));
    const look = looks.find((row) => row.personId === id);
    return {
      personId: id,
      name,
      copies: latestCopies(copies, id, now),
      readVersion: look?.version ?? null,
      readAt: look?.seenAt.toISOString() ?? null,
      unread: look ? compareOwnPages(look.content, now) : [],
    };
  });
}
