import { z } from "zod";
import { withTransaction } from "@/db/client";
import { invitationTokenSchema } from "@/lib/domain/person/schema";
import { AppError } from "@/lib/errors";
import type { Context } from "../context/context";
import { parseInput } from "../trips/parse-input";
import { loadOpenInvitation, spendInvitation } from "./internal";

const acceptInvitationInput = z.object({ token: invitationTokenSchema });

/** For somebody who is signed in: the link is for the address it was sent to, nobody else. */
export async function acceptInvitation({
  ctx,
  input,
}: {
  ctx: Context;
  input: z.input<typeof acceptInvitationInput>;
}): Promise<{ tripId: string }> {
  const { token } = parseInput(acceptInvitationInput, input);
  return withTransaction(async (tx) => {
    const row = await loadOpenInvitation(tx, token);
    if (row.person.email !== ctx.actor.email.toLowerCase()) {
      throw new AppError(
        "forbidden",
        "This invitation was sent to another address than the one you are signed in with. Sign out, then open the link again.",
      );
    }
    await spendInvitation(tx, row, ctx);
    return { tripId: row.person.tripId };
  });
}
