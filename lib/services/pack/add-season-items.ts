import type { z } from "zod";
import { withTransaction } from "@/db/client";
import { packItem } from "@/db/schema";
import { newId } from "@/lib/domain/ids";
import { MAX_PACK_ITEMS } from "@/lib/domain/pack/schema";
import { SEASON_NAMES, SEASON_PACK_ITEMS, seasonAddInput } from "@/lib/domain/pack/seasons";
import { AppError } from "@/lib/errors";
import { requirePermission } from "@/lib/auth/permission";
import type { Context } from "@/lib/services/context/context";
import { recordChange } from "../trips/internal";
import { parseInput } from "../trips/parse-input";
import { listPackItemRows } from "./internal";

/** Puts what a season needs at the end of everybody's list; what is on it already stays as it is. */
export async function addSeasonItems({
  ctx,
  input,
}: {
  ctx: Context;
  input: z.input<typeof seasonAddInput>;
}): Promise<{ added: number }> {
  const { tripId, season } = parseInput(seasonAddInput, input);
  return withTransaction(async (tx) => {
    await requirePermission(ctx, tripId, "pack.edit", tx);
    const before = (await listPackItemRows(tx, tripId)).filter((row) => row.personId === null);
    const known = new Set(before.map((row) => row.name.toLowerCase()));
    const names = SEASON_PACK_ITEMS[season].filter((name) => !known.has(name.toLowerCase()));
    if (before.length + names.length > MAX_PACK_ITEMS) {
      throw new AppError("bad-input", `A list can have at most ${MAX_PACK_ITEMS} lines.`);
    }
    const last = Math.max(-1, ...before.map((row) => row.position));
    if (names.length > 0) {
      await tx
        .insert(packItem)
        .values(names.map((name, at) => ({ id: newId(), tripId, personId: null, position: last + 1 + at, name })));
    }
    await recordChange(tx, ctx, {
      tripId,
      action: "update",
      entity: "pack",
      entityId: tripId,
      summary: `Pack list for ${SEASON_NAMES[season]}`,
      isPrinted: names.length > 0,
    });
    return { added: names.length };
  });
}
