import { asc, eq, inArray } from "drizzle-orm";
import { getDb } from "@/db/client";
import {
  answer,
  camp,
  carry,
  changeLog,
  gear,
  outboxMessage,
  packTick,
  person,
  personalDetail,
  sleeper,
  trip,
  user,
} from "@/db/schema";
import type { Context } from "@/lib/services/context/context";
import { openDetails } from "../details/internal";
import { getPreferences } from "../preferences/get-preferences";
import { listSessions } from "./list-sessions";

const toText = (at: Date | null | undefined) => at?.toISOString() ?? null;

async function exportTrip(ctx: Context, own: typeof person.$inferSelect, trips: (typeof trip.$inferSelect)[]) {
  const db = getDb();
  const row = trips.find((one) => one.id === own.tripId);
  const [said] = await db.select().from(answer).where(eq(answer.personId, own.id));
  const [details] = await db.select().from(personalDetail).where(eq(personalDetail.personId, own.id));
  const nights = await db
    .select({ campName: camp.name, pitchId: sleeper.pitchId })
    .from(sleeper)
    .innerJoin(camp, eq(camp.id, sleeper.campId))
    .where(eq(sleeper.personId, own.id))
    .orderBy(asc(camp.position));
  const carried = await db.select().from(carry).where(eq(carry.personId, own.id));
  const ticks = await db.select().from(packTick).where(eq(packTick.personId, own.id));
  const messages = await db
    .select()
    .from(outboxMessage)
    .where(eq(outboxMessage.personId, own.id))
    .orderBy(asc(outboxMessage.createdAt));
  const changes = await db.select().from(changeLog).where(eq(changeLog.tripId, own.tripId));
  return {
    trip: { name: row?.name ?? "", startDate: row?.startDate ?? "", timeZone: row?.timeZone ?? "" },
    name: own.name,
    email: own.email,
    role: own.role,
    addedAt: toText(own.createdAt),
    answer: said
      ? { value: said.value, note: said.note, isWaiting: said.isWaiting, answeredAt: toText(said.answeredAt) }
      : null,
    details: details
      ? { ...openDetails(details), consent: { text: details.consentText, at: toText(details.consentAt) } }
      : null,
    nights: nights.map(({ campName, pitchId }) => ({ campName, isPlaced: pitchId !== null })),
    carries: carried.map(({ shelterId, kitItemId, count }) => ({ shelterId, kitItemId, count })),
    ticked: ticks.map(({ itemKey, tickedAt }) => ({ itemKey, tickedAt: toText(tickedAt) })),
    messages: messages.map(({ subject, text, state, createdAt, sentAt, readAt }) => ({
      subject,
      text,
      state,
      createdAt: toText(createdAt),
      sentAt: toText(sentAt),
      readAt: toText(readAt),
    })),
    changes: changes
      .filter((change) => change.userId === ctx.actor.userId)
      .map(({ action, entity, summary, createdAt }) => ({ action, entity, summary, at: toText(createdAt) })),
  };
}

/** Everything that is kept about somebody, for themselves, to be read by people and programs. */
export async function exportAccount({ ctx }: { ctx: Context }): Promise<object> {
  const db = getDb();
  const [account] = await db.select().from(user).where(eq(user.id, ctx.actor.userId));
  const people = await db.select().from(person).where(eq(person.userId, ctx.actor.userId));
  const ids = people.map((one) => one.tripId);
  const trips = ids.length === 0 ? [] : await db.select().from(trip).where(inArray(trip.id, ids));
  const ownGear = await db.select().from(gear).where(eq(gear.ownerId, ctx.actor.userId));
  const exported = [];
  for (const one of people) exported.push(await exportTrip(ctx, one, trips));
  return {
    format: "leestead-account-1",
    exportedAt: new Date().toISOString(),
    account: {
      name: account?.name ?? "",
      email: account?.email ?? "",
      createdAt: toText(account?.createdAt),
    },
    preferences: await getPreferences({ ctx }),
    signedIn: (await listSessions({ ctx })).map(({ device, signedInAt, usedAt }) => ({ device, signedInAt, usedAt })),
    gear: ownGear.map(({ details, updatedAt }) => ({ ...details, updatedAt: toText(updatedAt) })),
    trips: exported,
  };
}
