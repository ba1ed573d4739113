import type { z } from "zod";
import { withTransaction } from "@/db/client";
import { requirePermission } from "@/lib/auth/permission";
import { personRefInput } from "@/lib/domain/person/schema";
import { AppError } from "@/lib/errors";
import type { Context } from "@/lib/services/context/context";
import { issueInvitation } from "../invitations/issue-invitation";
import { consumeQuota } from "../quota/consume-quota";
import { loadTripRow } from "../trips/internal";
import { parseInput } from "../trips/parse-input";
import { loadPersonRow } from "./internal";

/** A new link; the old one stops working. */
export async function invitePerson({
  ctx,
  input,
}: {
  ctx: Context;
  input: z.input<typeof personRefInput>;
}): Promise<void> {
  const { tripId, personId } = parseInput(personRefInput, input);
  await requirePermission(ctx, tripId, "people.edit");
  await consumeQuota("invitation", ctx.actor.userId);
  await withTransaction(async (tx) => {
    await requirePermission(ctx, tripId, "people.edit", tx);
    const row = await loadPersonRow(tx, tripId, personId);
    if (row.userId) throw new AppError("conflict", `${row.name} has joined the trip already.`);
    await issueInvitation(tx, ctx, await loadTripRow(tx, tripId), row);
  });
}
