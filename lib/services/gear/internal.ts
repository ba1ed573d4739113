import { and, eq } from "drizzle-orm";
import { gear } from "@/db/schema";
import type { GearDetails } from "@/lib/domain/gear/schema";
import { AppError } from "@/lib/errors";
import { requireBuildable } from "../shelters/internal";
import type { Reader } from "../trips/internal";

export async function loadGearRow(reader: Reader, ownerId: string, gearId: string) {
  const [row] = await reader
    .select()
    .from(gear)
    .where(and(eq(gear.id, gearId), eq(gear.ownerId, ownerId)))
    .limit(1);
  if (!row) throw new AppError("not-found", "There is no such thing among your gear.");
  return row;
}

export function requireBuildableGear(details: GearDetails): void {
  if (details.type === "shelter") requireBuildable(details.shelter.spec, (field) => `details.shelter.spec.${field}`);
}
