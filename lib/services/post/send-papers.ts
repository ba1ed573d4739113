import { and, eq, inArray } from "drizzle-orm";
import type { z } from "zod";
import { getDb, withTransaction, type Transaction } from "@/db/client";
import { outboxMessage, person } from "@/db/schema";
import { requirePermission } from "@/lib/auth/permission";
import type { Paper, PaperSize } from "@/lib/domain/paper/schema";
import { fillTemplate } from "@/lib/domain/post/fill-template";
import { sendInput, type PaperPiece, type PieceKey } from "@/lib/domain/post/schema";
import type { PaperDocument } from "@/lib/domain/views";
import { renderPapersMail } from "@/lib/email/templates/trip-mails";
import { env } from "@/lib/env";
import { AppError } from "@/lib/errors";
import { formatDayRange } from "@/lib/format/days";
import type { Context } from "@/lib/services/context/context";
import { recordCopy, type NewCopy } from "../own-pages/copies";
import { consumeQuota } from "../quota/consume-quota";
import { findLastDay } from "../answers/internal";
import { isCalledOff } from "../roster/internal";
import { loadTripRow, recordChange, type Reader, type TripRow } from "../trips/internal";
import { parseInput } from "../trips/parse-input";
import { makeCalendarFile } from "./calendar";
import { composeBundles, loadTripPlaces, type PaperBundle } from "./compose-papers";
import { enqueueMessage, type MailFile } from "./enqueue-message";

/** Where the papers come from; tests put their own here. */
export interface PaperSource {
  getDocument(given: { ctx: Context; input: { tripId: string; paper: Paper } }): Promise<PaperDocument>;
  render(documents: readonly PaperDocument[], options: { size: PaperSize }): Promise<Uint8Array>;
}

async function loadPaperSource(ctx: Context): Promise<PaperSource> {
  const [{ getPaperDocument }, { renderPdfInWorker }, { getPreferences }] = await Promise.all([
    import("@/lib/services/papers/get-paper-document"),
    import("@/lib/workers/render-pdf-in-worker"),
    import("@/lib/services/preferences/get-preferences"),
  ]);
  const preferences = await getPreferences({ ctx });
  return {
    getDocument: getPaperDocument,
    render: (papers, { size }) => renderPdfInWorker({ papers, options: { size, preferences } }),
  };
}

async function countSent(reader: Reader, tripId: string, requestId: string): Promise<number> {
  const rows = await reader
    .select({ tripId: outboxMessage.tripId })
    .from(outboxMessage)
    .where(eq(outboxMessage.requestId, requestId));
  if (rows.some((row) => row.tripId !== tripId)) throw new AppError("conflict", "That was sent for another trip.");
  return rows.length;
}

interface SendOptions {
  readonly ctx: Context;
  readonly input: z.input<typeof sendInput>;
  readonly source?: PaperSource;
  /** To the sender alone, and marked as a test: nobody else gets anything, nothing counts as sent. */
  readonly isTest?: boolean;
}

const isPaper = (piece: PieceKey): piece is PaperPiece => piece !== "calendar";

async function loadRecipients(reader: Reader, tripId: string, personIds: readonly string[]) {
  const rows = await reader
    .select({ id: person.id, name: person.name, email: person.email })
    .from(person)
    .where(and(eq(person.tripId, tripId), inArray(person.id, personIds)));
  if (rows.length !== personIds.length) {
    throw new AppError("not-found", "Somebody you chose is not on this trip any more. Nothing was sent.");
  }
  return personIds.flatMap((id) => rows.filter((row) => row.id === id));
}

async function makeTripCalendar(tx: Transaction, trip: TripRow): Promise<MailFile> {
  if (await isCalledOff(tx, trip.id)) {
    throw new AppError("conflict", "The trip has been called off: there is no calendar file to send.");
  }
  return makeCalendarFile(tx, trip, false);
}

/**
 * Mails papers to people: rendered first, then written to the outbox all together. The same request again has no
 * second effect. Returns how many messages there are.
 */
export async function sendPapers({
  ctx,
  input,
  source,
  isTest = false,
}: SendOptions): Promise<{ messageCount: number }> {
  const { tripId, requestId, pieces, subject, message, paperSize, ...given } = parseInput(sendInput, input);
  const { personId } = await requirePermission(ctx, tripId, "post.send");
  const personIds = isTest ? [personId] : given.personIds;
  const paperPieces = pieces.filter(isPaper);
  const already = await countSent(getDb(), tripId, requestId);
  if (already > 0) return { messageCount: already };
  await consumeQuota("mail", ctx.actor.userId, personIds.length);

  const createdAt = new Date();
  const recipients = await loadRecipients(getDb(), tripId, personIds);
  const places = await loadTripPlaces(tripId);
  const { getDocument, render } = source ?? (await loadPaperSource(ctx));
  const rendered = new Map<string, MailFile>();
  const copies: Omit<NewCopy, "tripId" | "way">[] = [];
  async function renderOnce(bundle: PaperBundle): Promise<MailFile> {
    const known = rendered.get(bundle.key);
    if (known) return known;
    const documents: PaperDocument[] = [];
    for (const paper of bundle.papers) documents.push(await getDocument({ ctx, input: { tripId, paper } }));
    for (const one of documents) {
      if (one.kind !== "pitch-and-pack") continue;
      copies.push({ personId: one.list.person.id, version: one.header.version, content: one.content });
    }
    const content = await render(documents, { size: paperSize });
    const file = { fileName: bundle.fileName, contentType: "application/pdf", content };
    rendered.set(bundle.key, file);
    return file;
  }
  const filesOf = new Map<string, MailFile[]>();
  for (const one of recipients) {
    const files: MailFile[] = [];
    for (const bundle of composeBundles(one, paperPieces, places)) files.push(await renderOnce(bundle));
    if (files.length === 0 && paperPieces.length > 0) {
      throw new AppError("bad-input", `There is nothing to send to ${one.name} yet: no camps or no place to sleep.`, {
        fieldErrors: { pieces: ["Choose a piece that everybody you chose has."] },
      });
    }
    filesOf.set(one.id, files);
  }

  return withTransaction(async (tx) => {
    await requirePermission(ctx, tripId, "post.send", tx);
    const sentMeanwhile = await countSent(tx, tripId, requestId);
    if (sentMeanwhile > 0) return { messageCount: sentMeanwhile };
    const trip = await loadTripRow(tx, tripId);
    const calendar = pieces.includes("calendar") ? [await makeTripCalendar(tx, trip)] : [];
    const dates = formatDayRange(trip.startDate, await findLastDay(tx, trip));
    for (const one of await loadRecipients(tx, tripId, personIds)) {
      const files = [...(filesOf.get(one.id) ?? []), ...calendar];
      const link = `${env.appUrl}/trips/${tripId}`;
      const fill = (text: string) =>
        fillTemplate(text, { name: one.name, trip: trip.name, dates, leader: ctx.actor.name, link });
      await enqueueMessage(tx, {
        kind: isTest ? "test" : "papers",
        requestId,
        tripId,
        personId: one.id,
        createdAt,
        to: { name: one.name, address: one.email },
        replyTo: { name: ctx.actor.name, address: ctx.actor.email },
        mail: renderPapersMail({
          name: one.name,
          leaderName: ctx.actor.name,
          tripName: trip.name,
          subject: isTest ? `Test: ${fill(subject)}` : fill(subject),
          message: fill(message),
          fileNames: files.map((file) => file.fileName),
          url: link,
        }),
        files,
      });
    }
    if (isTest) return { messageCount: recipients.length };
    for (const copy of copies) await recordCopy(tx, ctx, { ...copy, tripId, way: "sent" });
    await recordChange(tx, ctx, {
      tripId,
      action: "create",
      entity: "post",
      entityId: requestId,
      summary: `Sent to ${recipients.length}: ${subject}`,
      isPrinted: false,
    });
    return { messageCount: recipients.length };
  });
}
