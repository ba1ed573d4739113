import type { z } from "zod";
import { withTransaction } from "@/db/client";
import type { paperSizeSchema } from "@/lib/domain/paper/schema";
import { type Paper } from "@/lib/domain/paper/schema";
import type { PaperDocument } from "@/lib/domain/views";
import type { Context } from "@/lib/services/context/context";
import { renderPdfInWorker } from "@/lib/workers/render-pdf-in-worker";
import { recordCopy } from "../own-pages/copies";
import { getPreferences } from "../preferences/get-preferences";
import { consumeQuota } from "../quota/consume-quota";
import { getPaperDocument } from "./get-paper-document";

/** "Sill Ridge, ridge tarp.pdf": for people; the header that carries it is encoded elsewhere. */
export function namePaperFile(paper: PaperDocument): string {
  const trip = paper.header.tripName;
  switch (paper.kind) {
    case "field-card":
      return `${trip}, ${paper.camp.camp.details.name}, field card.pdf`;
    case "pitch-card": {
      const names = paper.camp.pitches.filter((pitch) => paper.pitchIds.includes(pitch.id)).map((pitch) => pitch.name);
      return `${trip}, ${paper.camp.camp.details.name}, ${names.join(", ")}.pdf`;
    }
    case "contact-sheet":
      return `${trip}, contact sheet.pdf`;
    case "pack-list":
      return `${trip}, pack list, ${paper.list.person.name}.pdf`;
    case "pitch-and-pack":
      return `${trip}, pitch and pack, ${paper.list.person.name}.pdf`;
    case "booklet":
      return `${trip}, booklet.pdf`;
  }
}

/** A paper as a PDF with its file name. Counted against the person's quota once it is known to be theirs to print. */
export async function renderPaperFile({
  ctx,
  input,
}: {
  ctx: Context;
  input: { readonly tripId: string; readonly paper: Paper; readonly size?: z.input<typeof paperSizeSchema> };
}): Promise<{ fileName: string; content: Uint8Array }> {
  const paper = await getPaperDocument({ ctx, input });
  await consumeQuota("pdf", ctx.actor.userId);
  const preferences = await getPreferences({ ctx });
  const size = input.size ?? preferences.paperSize;
  const content = await renderPdfInWorker({ papers: [paper], options: { size, preferences } });
  if (paper.kind === "pitch-and-pack") {
    const { list, header } = paper;
    const copy = { personId: list.person.id, version: header.version, content: paper.content };
    await withTransaction((tx) => recordCopy(tx, ctx, { tripId: input.tripId, way: "printed", ...copy }));
  }
  return { fileName: namePaperFile(paper), content };
}
