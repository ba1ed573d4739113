import { and, eq } from "drizzle-orm";
import type { z } from "zod";
import { withTransaction } from "@/db/client";
import { session } from "@/db/schema";
import { sessionRefInput } from "@/lib/domain/account/schema";
import { AppError } from "@/lib/errors";
import type { Context } from "@/lib/services/context/context";
import { parseInput } from "../trips/parse-input";

/** Signs one of your own devices out, at once. */
export async function endSession({
  ctx,
  input,
}: {
  ctx: Context;
  input: z.input<typeof sessionRefInput>;
}): Promise<void> {
  const { sessionId } = parseInput(sessionRefInput, input);
  const ended = await withTransaction((tx) =>
    tx
      .delete(session)
      .where(and(eq(session.id, sessionId), eq(session.userId, ctx.actor.userId)))
      .returning({ id: session.id }),
  );
  if (ended.length === 0) throw new AppError("not-found", "That device is signed out already.");
}
