import { z } from "zod";
import { getDb } from "@/db/client";
import { idSchema } from "@/lib/domain/ids";
import { isAllowed } from "@/lib/domain/permissions/permissions";
import type { PackListView } from "@/lib/domain/views";
import { AppError } from "@/lib/errors";
import { requirePermission } from "@/lib/auth/permission";
import type { Context } from "@/lib/services/context/context";
import { loadTripState } from "../plan/load-trip-state";
import { parseInput } from "../trips/parse-input";
import { buildPackList, loadPackSources, loadPerson } from "./internal";

const getPackListInput = z.object({ tripId: idSchema, personId: z.union([z.literal("self"), idSchema]) });

/** What somebody brings and carries, and where they sleep each night; of others only for who may print every list. */
export async function getPackList({
  ctx,
  input,
}: {
  ctx: Context;
  input: z.input<typeof getPackListInput>;
}): Promise<PackListView> {
  const { tripId, personId } = parseInput(getPackListInput, input);
  const own = await requirePermission(ctx, tripId, "paper.own");
  const wanted = personId === "self" ? own.personId : personId;
  if (wanted !== own.personId && !isAllowed(own.role, "paper.all")) {
    throw new AppError("not-found", "There is no such person on this trip.");
  }
  const db = getDb();
  const person = await loadPerson(db, tripId, wanted);
  return buildPackList(await loadPackSources(db, await loadTripState(db, tripId)), person);
}
