import type { z } from "zod";
import { getDb } from "@/db/client";
import { tripRefInput } from "@/lib/domain/trip/schema";
import type { PackItemView } from "@/lib/domain/views";
import { requirePermission } from "@/lib/auth/permission";
import type { Context } from "@/lib/services/context/context";
import { parseInput } from "../trips/parse-input";
import { listPackItemRows } from "./internal";

/** Everybody's lines and each person's own, for who edits them. */
export async function listPackItems({
  ctx,
  input,
}: {
  ctx: Context;
  input: z.input<typeof tripRefInput>;
}): Promise<PackItemView[]> {
  const { tripId } = parseInput(tripRefInput, input);
  await requirePermission(ctx, tripId, "pack.edit");
  return (await listPackItemRows(getDb(), tripId)).map(({ id, personId, name, isGroupThing, massKg }) => ({
    id,
    personId,
    name,
    isGroupThing,
    massKg,
  }));
}
