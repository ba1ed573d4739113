import type { z } from "zod";
import { getDb } from "@/db/client";
import { requirePermission } from "@/lib/auth/permission";
import type { EmergencyPlanView } from "@/lib/domain/people-views";
import { tripRefInput } from "@/lib/domain/trip/schema";
import type { Context } from "@/lib/services/context/context";
import { loadTripRow } from "../trips/internal";
import { parseInput } from "../trips/parse-input";
import { loadEmergencyPlan, toEmergencyView } from "./internal";

export async function getEmergencyPlan({
  ctx,
  input,
}: {
  ctx: Context;
  input: z.input<typeof tripRefInput>;
}): Promise<EmergencyPlanView> {
  const { tripId } = parseInput(tripRefInput, input);
  await requirePermission(ctx, tripId, "contacts.read");
  return toEmergencyView(await loadEmergencyPlan(getDb(), tripId), await loadTripRow(getDb(), tripId));
}
