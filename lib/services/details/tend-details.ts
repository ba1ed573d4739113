import { eq } from "drizzle-orm";
import { getDb, withTransaction } from "@/db/client";
import { personalDetail, tripCalendar } from "@/db/schema";
import { addDays, dayOf } from "@/lib/format/days";
import { findLastDay } from "../answers/internal";
import { loadRosterSettings } from "../roster/internal";
import { loadTripRow } from "../trips/internal";
import { isSealedWithCurrentKey, seal, unseal } from "./seal";

/** Deletes what people wrote about themselves when its time after the trip is over. */
export async function deleteOldDetails(now: Date): Promise<number> {
  const trips = await getDb().selectDistinct({ tripId: personalDetail.tripId }).from(personalDetail);
  let count = 0;
  for (const { tripId } of trips) {
    count += await withTransaction(async (tx) => {
      const trip = await loadTripRow(tx, tripId);
      const { keepDetailsDays } = await loadRosterSettings(tx, tripId);
      const [calendar] = await tx.select().from(tripCalendar).where(eq(tripCalendar.tripId, tripId));
      const end = calendar?.calledOffAt ? dayOf(calendar.calledOffAt, trip.timeZone) : await findLastDay(tx, trip);
      if (dayOf(now, trip.timeZone) <= addDays(end, keepDetailsDays)) return 0;
      const gone = await tx
        .delete(personalDetail)
        .where(eq(personalDetail.tripId, tripId))
        .returning({ id: personalDetail.id });
      return gone.length;
    });
  }
  return count;
}

/** Seals again under the newest key what still lies under an older one; then the older can leave the settings. */
export async function resealDetails(): Promise<number> {
  const rows = await getDb().select({ id: personalDetail.id, sealed: personalDetail.sealed }).from(personalDetail);
  const old = rows.filter((row) => !isSealedWithCurrentKey(row.sealed));
  for (const { id } of old) {
    await withTransaction(async (tx) => {
      const [row] = await tx.select().from(personalDetail).where(eq(personalDetail.id, id));
      if (!row || isSealedWithCurrentKey(row.sealed)) return;
      const place = { rowId: row.id, personId: row.personId, tripId: row.tripId };
      const sealed = seal(unseal(row.sealed, place), place);
      await tx.update(personalDetail).set({ sealed }).where(eq(personalDetail.id, id));
    });
  }
  return old.length;
}
