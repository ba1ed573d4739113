import { and, eq, isNull } from "drizzle-orm";
import type { z } from "zod";
import { withTransaction, type Transaction } from "@/db/client";
import { carry, groupThing, kitItem, packItem, person, shelter, shelterSplit, trip } from "@/db/schema";
import { newId } from "@/lib/domain/ids";
import { tripCopyInput } from "@/lib/domain/trip/schema";
import { requirePermission } from "@/lib/auth/permission";
import type { Context } from "@/lib/services/context/context";
import { cloneCamp } from "../camps/clone-camp";
import { listAlternativeRows, listCampRows } from "../camps/internal";
import { listKitRows } from "../kit/internal";
import { loadLoadSources } from "../pack/load-pieces";
import { copyRoute } from "../route/copy-route";
import { listShelterRows } from "../shelters/internal";
import { loadTripRow, recordChange, requireRoomForTrip } from "./internal";
import { parseInput } from "./parse-input";

type IdMap = ReadonlyMap<string, string>;

/** The copier leads the copy; others come along by name and address only, without account, when they are wanted. */
async function copyPeople(tx: Transaction, ctx: Context, tripId: string, copyId: string, isWanted: boolean) {
  const ids = new Map<string, string>();
  const rows = await tx.select().from(person).where(eq(person.tripId, tripId));
  for (const row of rows) {
    const isSelf = row.userId === ctx.actor.userId;
    if (!isSelf && !isWanted) continue;
    const id = newId();
    ids.set(row.id, id);
    await tx.insert(person).values({
      ...row,
      id,
      tripId: copyId,
      userId: isSelf ? row.userId : null,
      role: isSelf ? "leader" : row.role,
      version: 1,
      createdAt: new Date(),
    });
  }
  return ids;
}

async function copyGear(tx: Transaction, tripId: string, copyId: string) {
  const now = new Date();
  const stamp = { tripId: copyId, version: 1, createdAt: now, updatedAt: now };
  const shelters = new Map<string, string>();
  for (const row of await listShelterRows(tx, tripId)) {
    const id = newId();
    shelters.set(row.id, id);
    await tx.insert(shelter).values({ ...row, ...stamp, id });
  }
  const kit = new Map<string, string>();
  for (const row of await listKitRows(tx, tripId)) {
    const id = newId();
    kit.set(row.id, id);
    await tx.insert(kitItem).values({ ...row, ...stamp, id });
  }
  return { shelters, kit };
}

async function copyPacking(
  tx: Transaction,
  tripId: string,
  copyId: string,
  people: IdMap,
  gear: { shelters: IdMap; kit: IdMap },
) {
  for (const row of await tx
    .select()
    .from(packItem)
    .where(and(eq(packItem.tripId, tripId), isNull(packItem.personId)))) {
    await tx.insert(packItem).values({ ...row, id: newId(), tripId: copyId });
  }
  const things = new Map<string, string>();
  const { things: thingRows, splits } = await loadLoadSources(tx, tripId);
  for (const row of thingRows) {
    const id = newId();
    things.set(row.id, id);
    await tx.insert(groupThing).values({ ...row, id, tripId: copyId });
  }
  for (const row of splits.values()) {
    const shelterId = gear.shelters.get(row.shelterId);
    if (shelterId) await tx.insert(shelterSplit).values({ ...row, shelterId, tripId: copyId });
  }
  for (const row of await tx.select().from(carry).where(eq(carry.tripId, tripId))) {
    const personId = people.get(row.personId);
    if (!personId) continue;
    const shelterId = row.shelterId && gear.shelters.get(row.shelterId);
    const kitItemId = row.kitItemId && gear.kit.get(row.kitItemId);
    const groupThingId = row.groupThingId && things.get(row.groupThingId);
    if (!shelterId && !kitItemId && !groupThingId) continue;
    const ids = { id: newId(), tripId: copyId, personId, shelterId, kitItemId, groupThingId };
    await tx.insert(carry).values({ ...row, ...ids });
  }
}

/** A trip of one's own with the same camps, shelters, kit and plans, beginning on another day. */
export async function copyTrip({
  ctx,
  input,
}: {
  ctx: Context;
  input: z.input<typeof tripCopyInput>;
}): Promise<{ tripId: string }> {
  const { tripId, name, startDate, withPeople } = parseInput(tripCopyInput, input);
  const copyId = newId();
  await withTransaction(async (tx) => {
    await requirePermission(ctx, tripId, "trip.edit", tx);
    await requireRoomForTrip(tx, ctx);
    const source = await loadTripRow(tx, tripId);
    const now = new Date();
    await tx.insert(trip).values({
      id: copyId,
      name,
      startDate,
      timeZone: source.timeZone,
      notes: source.notes,
      contacts: source.contacts,
      createdBy: ctx.actor.userId,
      createdAt: now,
      updatedAt: now,
    });
    const people = await copyPeople(tx, ctx, tripId, copyId, withPeople);
    const gear = await copyGear(tx, tripId, copyId);
    await copyPacking(tx, tripId, copyId, people, gear);
    const camps = new Map<string, string>();
    for (const camp of [...(await listCampRows(tx, tripId)), ...(await listAlternativeRows(tx, tripId))]) {
      const campId = await cloneCamp(tx, ctx, camp, {
        tripId: copyId,
        name: camp.name,
        position: camp.position,
        alternativeToId: (camp.alternativeToId && camps.get(camp.alternativeToId)) ?? null,
        mapShelterId: (id) => gear.shelters.get(id) ?? null,
        // What is found at a camp has the same id everywhere.
        mapAnchorId: (id) => gear.kit.get(id) ?? id,
        mapPersonId: (id) => people.get(id) ?? null,
      });
      camps.set(camp.id, campId);
    }
    await copyRoute(tx, tripId, copyId, camps);
    await recordChange(tx, ctx, {
      tripId: copyId,
      action: "copy",
      entity: "trip",
      entityId: copyId,
      summary: `${source.name} as ${name}`,
      isPrinted: false,
    });
  });
  return { tripId: copyId };
}
