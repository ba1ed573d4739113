import type { z } from "zod";
import { getDb } from "@/db/client";
import { requirePermission } from "@/lib/auth/permission";
import type { RosterView } from "@/lib/domain/people-views";
import { tripRefInput } from "@/lib/domain/trip/schema";
import type { Context } from "@/lib/services/context/context";
import { parseInput } from "../trips/parse-input";
import { countRoster, listGuests, loadRosterSettings } from "./internal";

export async function getRoster({
  ctx,
  input,
}: {
  ctx: Context;
  input: z.input<typeof tripRefInput>;
}): Promise<RosterView> {
  const { tripId } = parseInput(tripRefInput, input);
  await requirePermission(ctx, tripId, "people.read");
  return {
    ...(await loadRosterSettings(getDb(), tripId)),
    counts: countRoster(await listGuests(getDb(), tripId)),
  };
}
