import { and, eq, inArray } from "drizzle-orm";
import type { Transaction } from "@/db/client";
import { notice, person } from "@/db/schema";
import { newId } from "@/lib/domain/ids";
import type { Role } from "@/lib/domain/permissions/permissions";

interface Recipients {
  readonly toRoles?: readonly Role[];
  readonly toPersonIds?: readonly string[];
  /** Whoever did it needs no word of it. */
  readonly exceptPersonId?: string;
}

/** Notes something for people's next digest, in the transaction of what happened. One mail a day, not one each. */
export async function addNotice(
  tx: Transaction,
  tripId: string,
  { toRoles = [], toPersonIds = [], exceptPersonId }: Recipients,
  sentence: string,
): Promise<void> {
  const rows = await tx
    .select({ id: person.id, role: person.role, userId: person.userId })
    .from(person)
    .where(
      and(
        eq(person.tripId, tripId),
        toPersonIds.length > 0 ? inArray(person.id, [...toPersonIds]) : inArray(person.role, [...toRoles]),
      ),
    );
  const createdAt = new Date();
  for (const row of rows) {
    if (row.id === exceptPersonId || row.userId === null) continue;
    await tx.insert(notice).values({ id: newId(), tripId, personId: row.id, sentence, createdAt });
  }
}
