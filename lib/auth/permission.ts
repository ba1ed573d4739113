import { and, eq } from "drizzle-orm";
import { getDb, type Transaction } from "@/db/client";
import { person } from "@/db/schema";
import { isAllowed, PERMISSIONS, type Permission, type Role } from "@/lib/domain/permissions/permissions";
import { AppError } from "@/lib/errors";
import { log } from "@/lib/log";
import type { Context } from "@/lib/services/context/context";

export interface Standing {
  readonly role: Role;
  readonly personId: string;
}

/**
 * Lets through who may do this on the trip. No such trip and a trip of others read alike. Inside a transaction pass
 * its `tx`, so that a role taken away in between counts.
 */
export async function requirePermission(
  ctx: Context,
  tripId: string,
  permission: Permission,
  reader: Pick<Transaction, "select"> = getDb(),
): Promise<Standing> {
  const [row] = await reader
    .select({ role: person.role, personId: person.id })
    .from(person)
    .where(and(eq(person.tripId, tripId), eq(person.userId, ctx.actor.userId)))
    .limit(1);
  if (row && isAllowed(row.role, permission)) return row;
  log.warn("access refused", {
    userId: ctx.actor.userId,
    permission,
    role: row?.role ?? "stranger",
    requestId: ctx.requestId,
  });
  if (!row) throw new AppError("not-found", "There is no such trip.");
  throw new AppError("forbidden", `Your role on this trip does not let you ${PERMISSIONS[permission].sentence}.`);
}
