import { eq } from "drizzle-orm";
import type { z } from "zod";
import { withTransaction } from "@/db/client";
import { trip } from "@/db/schema";
import { tripDeleteInput } from "@/lib/domain/trip/schema";
import { AppError } from "@/lib/errors";
import { requirePermission } from "@/lib/auth/permission";
import type { Context } from "@/lib/services/context/context";
import { loadTripRow } from "./internal";
import { parseInput } from "./parse-input";

/** The whole trip with everything in it, after its name has been typed again. There is no way back. */
export async function deleteTrip({
  ctx,
  input,
}: {
  ctx: Context;
  input: z.input<typeof tripDeleteInput>;
}): Promise<void> {
  const { tripId, confirmName } = parseInput(tripDeleteInput, input);
  await withTransaction(async (tx) => {
    await requirePermission(ctx, tripId, "trip.delete", tx);
    const row = await loadTripRow(tx, tripId);
    if (confirmName.normalize("NFC").trim() !== row.name) {
      const message = `Type the name of the trip as it stands: ${row.name}`;
      throw new AppError("bad-input", message, { fieldErrors: { confirmName: [message] } });
    }
    await tx.delete(trip).where(eq(trip.id, tripId));
  });
}
