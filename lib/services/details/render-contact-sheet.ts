import type { z } from "zod";
import { contactSheetPaperInput } from "@/lib/domain/details/schema";
import { env } from "@/lib/env";
import { formatInstant } from "@/lib/format/days";
import { getDb } from "@/db/client";
import type { Context } from "@/lib/services/context/context";
import { renderPdfInWorker } from "@/lib/workers/render-pdf-in-worker";
import { getPreferences } from "../preferences/get-preferences";
import { consumeQuota } from "../quota/consume-quota";
import { loadTripRow } from "../trips/internal";
import { parseInput } from "../trips/parse-input";
import { getContactSheet } from "./get-contact-sheet";

/** The contact sheet as a PDF: made for this one answer, kept nowhere, never a piece of the post. */
export async function renderContactSheet({
  ctx,
  input,
}: {
  ctx: Context;
  input: z.input<typeof contactSheetPaperInput>;
}): Promise<{ fileName: string; content: Uint8Array }> {
  const { tripId, size } = parseInput(contactSheetPaperInput, input);
  const sheet = await getContactSheet({ ctx, input: { tripId } });
  await consumeQuota("pdf", ctx.actor.userId);
  const trip = await loadTripRow(getDb(), tripId);
  const preferences = await getPreferences({ ctx });
  const content = await renderPdfInWorker({
    papers: [
      {
        kind: "contact-sheet",
        header: {
          tripName: trip.name,
          version: trip.paperVersion,
          printedAt: formatInstant(new Date(), trip.timeZone),
          address: `${env.appUrl}/trips/${tripId}/people/contacts`,
        },
        sheet,
      },
    ],
    options: { size: size ?? preferences.paperSize, preferences },
  });
  return { fileName: `${trip.name}, contact sheet.pdf`, content };
}
