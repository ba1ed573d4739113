import { eq } from "drizzle-orm";
import { z } from "zod";
import { withTransaction } from "@/db/client";
import { pullPhoto } from "@/db/schema";
import { newId } from "@/lib/domain/ids";
import { pullTestRefInput } from "@/lib/domain/pull-test/schema";
import type { Context } from "@/lib/services/context/context";
import { parseInput } from "../../trips/parse-input";
import { loadPullTestFor } from "../internal";
import { cleanPhoto } from "./clean-photo";

const savePhotoInput = pullTestRefInput.extend({
  keepsPosition: z.boolean(),
  content: z.custom<Uint8Array>((value) => value instanceof Uint8Array),
});

/** The one photo of a reading; an earlier one is replaced. */
export async function savePhoto({
  ctx,
  input,
}: {
  ctx: Context;
  input: z.input<typeof savePhotoInput>;
}): Promise<{ byteCount: number }> {
  const { pullTestId, keepsPosition, content } = parseInput(savePhotoInput, input);
  return withTransaction(async (tx) => {
    await loadPullTestFor(tx, ctx, pullTestId, "pull-test.edit");
    const photo = cleanPhoto(content, keepsPosition);
    const row = {
      contentType: photo.contentType,
      content: Buffer.from(photo.content),
      byteCount: photo.content.byteLength,
      createdAt: new Date(),
    };
    await tx.delete(pullPhoto).where(eq(pullPhoto.pullTestId, pullTestId));
    await tx.insert(pullPhoto).values({ id: newId(), pullTestId, ...row });
    return { byteCount: row.byteCount };
  });
}

export async function deletePhoto({
  ctx,
  input,
}: {
  ctx: Context;
  input: z.input<typeof pullTestRefInput>;
}): Promise<void> {
  const { pullTestId } = parseInput(pullTestRefInput, input);
  await withTransaction(async (tx) => {
    await loadPullTestFor(tx, ctx, pullTestId, "pull-test.edit");
    await tx.delete(pullPhoto).where(eq(pullPhoto.pullTestId, pullTestId));
  });
}
