import { and, eq } from "drizzle-orm";
import type { z } from "zod";
import { withTransaction } from "@/db/client";
import { person } from "@/db/schema";
import { requirePermission } from "@/lib/auth/permission";
import { personCreateInput } from "@/lib/domain/person/schema";
import { AppError } from "@/lib/errors";
import type { Context } from "@/lib/services/context/context";
import { consumeQuota } from "../quota/consume-quota";
import { loadTripRow } from "../trips/internal";
import { parseInput } from "../trips/parse-input";
import { addPerson } from "./internal-add";

/** Puts somebody on the trip. Who has an account with that address is on it at once; everybody else gets a link. */
export async function createPerson({
  ctx,
  input,
}: {
  ctx: Context;
  input: z.input<typeof personCreateInput>;
}): Promise<{ personId: string; state: "joined" | "invited" }> {
  const { tripId, name, email, role } = parseInput(personCreateInput, input);
  await requirePermission(ctx, tripId, "people.edit");
  await consumeQuota("invitation", ctx.actor.userId);
  return withTransaction(async (tx) => {
    await requirePermission(ctx, tripId, "people.edit", tx);
    const trip = await loadTripRow(tx, tripId);
    const [present] = await tx
      .select({ name: person.name })
      .from(person)
      .where(and(eq(person.tripId, tripId), eq(person.email, email)));
    if (present) {
      const sentence = `${present.name} is on this trip with that address already.`;
      throw new AppError("conflict", sentence, { fieldErrors: { email: [sentence] } });
    }
    return addPerson(tx, ctx, trip, { name, email, role });
  });
}
