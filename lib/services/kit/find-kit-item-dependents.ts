import { and, eq } from "drizzle-orm";
import type { z } from "zod";
import { getDb } from "@/db/client";
import { carry, person } from "@/db/schema";
import { kitItemRefInput } from "@/lib/domain/kit/schema";
import { plural } from "@/lib/format/words";
import { requirePermission } from "@/lib/auth/permission";
import type { Context } from "@/lib/services/context/context";
import { nameCamps } from "../camps/internal";
import { listPlacementRows } from "../plan/internal";
import type { Reader } from "../trips/internal";
import { parseInput } from "../trips/parse-input";
import { countShockCordUses, countUses } from "./count-uses";
import { listKitRows, loadKitRow } from "./internal";
import { countShockCords } from "./to-tray";

/** What uses a thing of the kit, one sentence each. */
export async function listKitItemDependents(reader: Reader, tripId: string, kitItemId: string): Promise<string[]> {
  const row = await loadKitRow(reader, tripId, kitItemId);
  const placements = await listPlacementRows(reader, tripId);
  const names = await nameCamps(reader, tripId);
  const sentences = countUses(placements, kitItemId).map(
    (use) =>
      `${plural(use.tieOuts, "tie-out")} at ${names.get(use.campId) ?? "a camp"} ${use.tieOuts === 1 ? "uses" : "use"} it.`,
  );
  if (row.details.type === "shock-cord") {
    const left = countShockCords((await listKitRows(reader, tripId)).filter((one) => one.id !== kitItemId));
    for (const [campId, used] of countShockCordUses(placements)) {
      if (used > left)
        sentences.push(
          `${plural(used, "shock cord is", "shock cords are")} in use at ${names.get(campId) ?? "a camp"}.`,
        );
    }
  }
  const carriers = await reader
    .select({ name: person.name, count: carry.count })
    .from(carry)
    .innerJoin(person, eq(person.id, carry.personId))
    .where(and(eq(carry.tripId, tripId), eq(carry.kitItemId, kitItemId)));
  return [...sentences, ...carriers.map((one) => `${one.name} carries ${one.count}.`)];
}

export async function findKitItemDependents({
  ctx,
  input,
}: {
  ctx: Context;
  input: z.input<typeof kitItemRefInput>;
}): Promise<string[]> {
  const { tripId, kitItemId } = parseInput(kitItemRefInput, input);
  await requirePermission(ctx, tripId, "kit.edit");
  return listKitItemDependents(getDb(), tripId, kitItemId);
}
