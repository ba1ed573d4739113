import { and, desc, eq, gt } from "drizzle-orm";
import { getDb } from "@/db/client";
import { session } from "@/db/schema";
import type { Context } from "@/lib/services/context/context";

export interface SessionView {
  readonly id: string;
  /** "Firefox on Linux" */
  readonly device: string;
  readonly signedInAt: string;
  readonly usedAt: string;
}

/** In words; a header that says nothing known is "a device". */
export function describeDevice(userAgent: string | null): string {
  const text = userAgent ?? "";
  const browser = (
    [
      ["Firefox", /Firefox\//],
      ["Edge", /Edg\//],
      ["Chrome", /Chrom(e|ium)\//],
      ["Safari", /Safari\//],
    ] as const
  ).find(([, pattern]) => pattern.test(text))?.[0];
  const system = (
    [
      ["iPhone", /iPhone/],
      ["iPad", /iPad/],
      ["Android", /Android/],
      ["Windows", /Windows/],
      ["Mac", /Mac OS X/],
      ["Linux", /Linux/],
    ] as const
  ).find(([, pattern]) => pattern.test(text))?.[0];
  if (!browser && !system) return "A device";
  return [browser ?? "A browser", system].filter(Boolean).join(" on ");
}

export async function listSessions({ ctx }: { ctx: Context }): Promise<SessionView[]> {
  const rows = await getDb()
    .select()
    .from(session)
    .where(and(eq(session.userId, ctx.actor.userId), gt(session.expiresAt, new Date())))
    .orderBy(desc(session.updatedAt))
    .limit(100);
  return rows.map((row) => ({
    id: row.id,
    device: describeDevice(row.userAgent),
    signedInAt: row.createdAt.toISOString(),
    usedAt: row.updatedAt.toISOString(),
  }));
}
