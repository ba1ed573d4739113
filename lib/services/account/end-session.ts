import { and, eq } from "drizzle-orm";
import { z } from "zod";
import { withTransaction } from "@/db/client";
import { session } from "@/db/schema";
import { idSchema } from "@/lib/domain/ids";
import { AppError } from "@/lib/errors";
import type { Context } from "@/lib/services/context/context";
import { parseInput } from "../trips/parse-input";

const endSessionInput = z.object({ sessionId: idSchema });

/** Signs one of your own devices out, at once. */
export async function endSession({
  ctx,
  input,
}: {
  ctx: Context;
  input: z.input<typeof endSessionInput>;
}): Promise<void> {
  const { sessionId } = parseInput(endSessionInput, input);
  const ended = await withTransaction((tx) =>
    tx
      .delete(session)
      .where(and(eq(session.id, sessionId), eq(session.userId, ctx.actor.userId)))
      .returning({ id: session.id }),
  );
  if (ended.length === 0) throw new AppError("not-found", "That device is signed out already.");
}
