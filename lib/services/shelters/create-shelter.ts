import type { z } from "zod";
import { withTransaction } from "@/db/client";
import { shelter } from "@/db/schema";
import { newId } from "@/lib/domain/ids";
import { MAX_SHELTERS, shelterCreateInput } from "@/lib/domain/shelter/schema";
import { AppError } from "@/lib/errors";
import { requirePermission } from "@/lib/auth/permission";
import type { Context } from "@/lib/services/context/context";
import { recordChange } from "../trips/internal";
import { parseInput } from "../trips/parse-input";
import { listShelterRows, requireBuildable } from "./internal";

/** From a built-in kind, from somebody's own gear or from scratch: the details say it all. */
export async function createShelter({
  ctx,
  input,
}: {
  ctx: Context;
  input: z.input<typeof shelterCreateInput>;
}): Promise<{ shelterId: string }> {
  const { tripId, details } = parseInput(shelterCreateInput, input);
  requireBuildable(details.spec, (field) => `details.spec.${field}`);
  const shelterId = newId();
  await withTransaction(async (tx) => {
    await requirePermission(ctx, tripId, "shelter.edit", tx);
    const shelters = await listShelterRows(tx, tripId);
    if (shelters.length >= MAX_SHELTERS) {
      throw new AppError("bad-input", `A trip can have at most ${MAX_SHELTERS} shelters.`);
    }
    const now = new Date();
    const position = Math.max(-1, ...shelters.map((one) => one.position)) + 1;
    await tx.insert(shelter).values({ id: shelterId, tripId, position, ...details, createdAt: now, updatedAt: now });
    await recordChange(tx, ctx, {
      tripId,
      action: "create",
      entity: "shelter",
      entityId: shelterId,
      summary: details.name,
      isPrinted: true,
    });
  });
  return { shelterId };
}
