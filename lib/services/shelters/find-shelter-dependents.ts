import { and, count, eq } from "drizzle-orm";
import type { z } from "zod";
import { getDb } from "@/db/client";
import { camp, carry, person, pitch, placement, sleeper } from "@/db/schema";
import { shelterRefInput } from "@/lib/domain/shelter/schema";
import { plural } from "@/lib/format/words";
import { requirePermission } from "@/lib/auth/permission";
import type { Context } from "@/lib/services/context/context";
import type { Reader } from "../trips/internal";
import { parseInput } from "../trips/parse-input";
import { loadShelterRow } from "./internal";

async function describePitch(reader: Reader, tripId: string, pitchId: string, campName: string): Promise<string> {
  const [placed] = await reader
    .select({ count: count() })
    .from(placement)
    .where(and(eq(placement.tripId, tripId), eq(placement.pitchId, pitchId)));
  const [sleeping] = await reader
    .select({ count: count() })
    .from(sleeper)
    .where(and(eq(sleeper.tripId, tripId), eq(sleeper.pitchId, pitchId)));
  const parts = [
    placed && placed.count > 0 ? `${plural(placed.count, "anchor")} set` : null,
    sleeping && sleeping.count > 0 ? `${plural(sleeping.count, "sleeper")}` : null,
  ].filter((part) => part !== null);
  return `It is pitched at ${campName}${parts.length > 0 ? `, with ${parts.join(" and ")}` : ""}.`;
}

/** What goes with a shelter, one sentence each. */
export async function listShelterDependents(reader: Reader, tripId: string, shelterId: string): Promise<string[]> {
  await loadShelterRow(reader, tripId, shelterId);
  const pitches = await reader
    .select({ id: pitch.id, campName: camp.name })
    .from(pitch)
    .innerJoin(camp, eq(camp.id, pitch.campId))
    .where(and(eq(pitch.tripId, tripId), eq(pitch.shelterId, shelterId)))
    .orderBy(camp.position);
  const carriers = await reader
    .select({ name: person.name })
    .from(carry)
    .innerJoin(person, eq(person.id, carry.personId))
    .where(and(eq(carry.tripId, tripId), eq(carry.shelterId, shelterId)));
  const sentences: string[] = [];
  for (const one of pitches) sentences.push(await describePitch(reader, tripId, one.id, one.campName));
  for (const one of carriers) sentences.push(`${one.name} carries it.`);
  return sentences;
}

export async function findShelterDependents({
  ctx,
  input,
}: {
  ctx: Context;
  input: z.input<typeof shelterRefInput>;
}): Promise<string[]> {
  const { tripId, shelterId } = parseInput(shelterRefInput, input);
  await requirePermission(ctx, tripId, "shelter.edit");
  return listShelterDependents(getDb(), tripId, shelterId);
}
