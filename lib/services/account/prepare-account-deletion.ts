import { and, eq, inArray, ne } from "drizzle-orm";
import { withTransaction } from "@/db/client";
import { person, personalDetail, trip } from "@/db/schema";
import { AppError } from "@/lib/errors";

/**
 * Before an account goes: trips on which nobody else is go with it; a trip with others keeps a leader, so its only
 * leader has to hand it over first. Elsewhere the name stays on the list of people that the leader keeps.
 */
export async function prepareAccountDeletion(userId: string): Promise<void> {
  await withTransaction(async (tx) => {
    const own = tx.select({ id: person.id }).from(person).where(eq(person.userId, userId));
    await tx.delete(personalDetail).where(inArray(personalDetail.personId, own));
    const led = await tx
      .select({ tripId: person.tripId, name: trip.name })
      .from(person)
      .innerJoin(trip, eq(trip.id, person.tripId))
      .where(and(eq(person.userId, userId), eq(person.role, "leader")));
    if (led.length === 0) return;
    const others = await tx
      .select({ tripId: person.tripId, role: person.role, userId: person.userId })
      .from(person)
      .where(
        and(
          inArray(
            person.tripId,
            led.map((one) => one.tripId),
          ),
          ne(person.userId, userId),
        ),
      );
    const stuck = led.filter(({ tripId }) => {
      const here = others.filter((one) => one.tripId === tripId);
      return here.length > 0 && !here.some((one) => one.role === "leader");
    });
    if (stuck.length > 0) {
      const names = stuck.map((one) => one.name).join(", ");
      throw new AppError(
        "in-use",
        `You are the only leader of ${names}. Make somebody else leader or delete the trip first.`,
      );
    }
    const alone = led.filter(({ tripId }) => !others.some((one) => one.tripId === tripId)).map((one) => one.tripId);
    if (alone.length > 0) await tx.delete(trip).where(inArray(trip.id, alone));
  });
}
