import { asc } from "drizzle-orm";
import type { z } from "zod";
import { getDb } from "@/db/client";
import { comment } from "@/db/schema";
import { requirePermission } from "@/lib/auth/permission";
import { listCommentsInput } from "@/lib/domain/comment/schema";
import type { CommentThread } from "@/lib/domain/comment/views";
import type { Context } from "@/lib/services/context/context";
import { parseInput } from "../trips/parse-input";
import { listReaders, loadSubject } from "./internal";

/** What was said about a camp or a shelter, oldest first. */
export async function listComments({
  ctx,
  input,
}: {
  ctx: Context;
  input: z.input<typeof listCommentsInput>;
}): Promise<CommentThread> {
  const { tripId, subject } = parseInput(listCommentsInput, input);
  const { role } = await requirePermission(ctx, tripId, "comment.read");
  const db = getDb();
  const { where } = await loadSubject(db, tripId, subject);
  const rows = await db.select().from(comment).where(where).orderBy(asc(comment.createdAt), asc(comment.id));
  const people = await listReaders(db, tripId);
  return {
    comments: rows.map((row) => ({
      id: row.id,
      byName: row.userName,
      at: row.createdAt.toISOString(),
      body: row.body,
      mentionNames: row.mentions.map((one) => one.name),
      isDeletable: role === "leader" || row.userId === ctx.actor.userId,
    })),
    people: people.filter((one) => one.userId !== ctx.actor.userId).map(({ id, name }) => ({ id, name })),
  };
}
