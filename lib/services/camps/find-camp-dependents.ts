import { and, count, eq, isNotNull } from "drizzle-orm";
import type { z } from "zod";
import { getDb } from "@/db/client";
import { camp, pitch, placement, pullTest, sleeper } from "@/db/schema";
import { campRefInput } from "@/lib/domain/camp/schema";
import { plural } from "@/lib/format/words";
import { requirePermission } from "@/lib/auth/permission";
import type { Context } from "@/lib/services/context/context";
import type { Reader } from "../trips/internal";
import { parseInput } from "../trips/parse-input";
import { loadCampRow } from "./internal";

/** What goes with a camp, one sentence each. */
export async function listCampDependents(reader: Reader, tripId: string, campId: string): Promise<string[]> {
  await loadCampRow(reader, tripId, campId);
  const [pitches] = await reader
    .select({ count: count() })
    .from(pitch)
    .where(and(eq(pitch.tripId, tripId), eq(pitch.campId, campId)));
  const [placements] = await reader
    .select({ count: count() })
    .from(placement)
    .where(and(eq(placement.tripId, tripId), eq(placement.campId, campId)));
  const [sleepers] = await reader
    .select({ count: count() })
    .from(sleeper)
    .where(and(eq(sleeper.tripId, tripId), eq(sleeper.campId, campId), isNotNull(sleeper.pitchId)));
  const [alternatives] = await reader
    .select({ count: count() })
    .from(camp)
    .where(and(eq(camp.tripId, tripId), eq(camp.alternativeToId, campId)));
  const [pulls] = await reader
    .select({ count: count() })
    .from(pullTest)
    .where(and(eq(pullTest.tripId, tripId), eq(pullTest.campId, campId)));
  const sentences: string[] = [];
  const standingBy = alternatives?.count ?? 0;
  const pitched = pitches?.count ?? 0;
  const placed = placements?.count ?? 0;
  const sleeping = sleepers?.count ?? 0;
  if (pitched > 0) sentences.push(`${plural(pitched, "shelter is", "shelters are")} pitched there.`);
  if (placed > 0) sentences.push(`Its staking plan has ${plural(placed, "anchor")} set.`);
  if (sleeping > 0) sentences.push(`${plural(sleeping, "person has", "people have")} a sleeping place there.`);
  if (standingBy > 0) sentences.push(`${plural(standingBy, "alternative stands", "alternatives stand")} by for it.`);
  if (pulls && pulls.count > 0)
    sentences.push(`${plural(pulls.count, "pull test was", "pull tests were")} logged there.`);
  return sentences;
}

export async function findCampDependents({
  ctx,
  input,
}: {
  ctx: Context;
  input: z.input<typeof campRefInput>;
}): Promise<string[]> {
  const { tripId, campId } = parseInput(campRefInput, input);
  await requirePermission(ctx, tripId, "camp.arrange");
  return listCampDependents(getDb(), tripId, campId);
}
