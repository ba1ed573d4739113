"use server";

import { revalidatePath } from "next/cache";
import { ownLoadSaveInput, packTickInput } from "@/lib/domain/pack/schema";
import { action } from "@/lib/http/action";
import { markOwnPagesRead, markOwnPagesReadInput } from "@/lib/services/own-pages/mark-own-pages-read";
import { saveOwnLoad } from "@/lib/services/pack/save-person-load";
import { tickPackItem } from "@/lib/services/pack/tick-pack-item";

export const tickPackItemAction = action(async ({ ctx, input }) => {
  await tickPackItem({ ctx, input: packTickInput.parse(input) });
  revalidatePath(`/trips/${String(input.tripId)}/mine`);
});

export const markOwnPagesReadAction = action(async ({ ctx, input }) => {
  await markOwnPagesRead({ ctx, input: markOwnPagesReadInput.parse(input) });
  revalidatePath(`/trips/${String(input.tripId)}`, "layout");
  return { message: "Noted. What changes from here on is shown on this page." };
});

/** The share is typed in per cent. */
export const saveOwnLoadAction = action(async ({ ctx, input }) => {
  const { limitPercent, ...rest } = input;
  const limitShare = typeof limitPercent === "number" ? limitPercent / 100 : (limitPercent ?? null);
  await saveOwnLoad({ ctx, input: ownLoadSaveInput.parse({ ...rest, limitShare }) });
  revalidatePath(`/trips/${String(input.tripId)}/mine`);
});
