import type { z } from "zod";
import { getDb } from "@/db/client";
import { shelterRefInput } from "@/lib/domain/shelter/schema";
import { requirePermission } from "@/lib/auth/permission";
import type { Context } from "@/lib/services/context/context";
import { parseInput } from "../trips/parse-input";
import { createShelter } from "./create-shelter";
import { loadShelterRow, toShelterDetails } from "./internal";

export async function copyShelter({
  ctx,
  input,
}: {
  ctx: Context;
  input: z.input<typeof shelterRefInput>;
}): Promise<{ shelterId: string }> {
  const { tripId, shelterId } = parseInput(shelterRefInput, input);
  await requirePermission(ctx, tripId, "shelter.edit");
  const details = toShelterDetails(await loadShelterRow(getDb(), tripId, shelterId));
  return createShelter({
    ctx,
    input: { tripId, details: { ...details, name: `${details.name.slice(0, 53)} (copy)` } },
  });
}
