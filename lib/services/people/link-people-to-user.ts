import { and, eq, exists, inArray, isNull, not } from "drizzle-orm";
import { alias } from "drizzle-orm/sqlite-core";
import type { Transaction } from "@/db/client";
import { invitation, person } from "@/db/schema";

/** Somebody has shown that an address is theirs: they are now on every trip to which it was added. */
export async function linkPeopleToUser(
  tx: Transaction,
  { userId, email }: { readonly userId: string; readonly email: string },
): Promise<void> {
  const other = alias(person, "other");
  const isThereAlready = exists(
    tx
      .select({ id: other.id })
      .from(other)
      .where(and(eq(other.tripId, person.tripId), eq(other.userId, userId))),
  );
  const linked = await tx
    .update(person)
    .set({ userId })
    .where(and(eq(person.email, email.toLowerCase()), isNull(person.userId), not(isThereAlready)))
    .returning({ id: person.id });
  if (linked.length === 0) return;
  await tx
    .update(invitation)
    .set({ usedAt: new Date() })
    .where(
      and(
        inArray(
          invitation.personId,
          linked.map((one) => one.id),
        ),
        isNull(invitation.usedAt),
      ),
    );
}
