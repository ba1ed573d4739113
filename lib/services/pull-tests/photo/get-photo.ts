import { eq } from "drizzle-orm";
import type { z } from "zod";
import { getDb } from "@/db/client";
import { pullPhoto } from "@/db/schema";
import { pullTestRefInput } from "@/lib/domain/pull-test/schema";
import { AppError } from "@/lib/errors";
import type { Context } from "@/lib/services/context/context";
import { parseInput } from "../../trips/parse-input";
import { loadPullTestFor } from "../internal";

/** The photo of a reading, for those who may see the reading. */
export async function getPhoto({ ctx, input }: { ctx: Context; input: z.input<typeof pullTestRefInput> }) {
  const { pullTestId } = parseInput(pullTestRefInput, input);
  const db = getDb();
  await loadPullTestFor(db, ctx, pullTestId, "pull-test.read");
  const [photo] = await db
    .select({ id: pullPhoto.id, contentType: pullPhoto.contentType, content: pullPhoto.content })
    .from(pullPhoto)
    .where(eq(pullPhoto.pullTestId, pullTestId))
    .limit(1);
  if (!photo) throw new AppError("not-found", "This reading has no photo.");
  return photo;
}
