import { and, eq } from "drizzle-orm";
import type { Transaction } from "@/db/client";
import { camp, pitch, placement, sleeper } from "@/db/schema";
import type { Placement } from "@/lib/calc/types";
import type { CampDetails } from "@/lib/domain/camp/schema";
import { newId } from "@/lib/domain/ids";
import type { Context } from "@/lib/services/context/context";
import { savePlanRow, toPlacement, writeIntent, writePlacements } from "../plan/internal";
import type { CampRow } from "./internal";

interface Target {
  readonly tripId: string;
  readonly name: string;
  readonly position: number;
  /** The camp of the target trip for which it stands by; null puts it in the line of nights. */
  readonly alternativeToId: string | null;
  /** Laid over what the source says. */
  readonly details?: Partial<CampDetails>;
  readonly mapShelterId: (id: string) => string | null;
  readonly mapAnchorId: (id: string) => string | null;
  /** Null leaves that person's sleeping place out. */
  readonly mapPersonId: (id: string) => string | null;
}

function movePlacement(one: Placement, pitchId: string, target: Target): Placement | null {
  const anchorId = target.mapAnchorId(one.anchorId);
  if (!anchorId) return null;
  const secondId = one.tandem && target.mapAnchorId(one.tandem.anchorId);
  return { ...one, pitchId, anchorId, tandem: one.tandem && secondId ? { ...one.tandem, anchorId: secondId } : null };
}

/** A camp with its pitches, plan and sleepers, under new ids, in this trip or another. Returns the new camp's id. */
export async function cloneCamp(tx: Transaction, ctx: Context, source: CampRow, target: Target): Promise<string> {
  const now = new Date();
  const { tripId, name, position, alternativeToId, details } = target;
  const campId = newId();
  await tx.insert(camp).values({
    ...source,
    ...details,
    id: campId,
    tripId,
    name,
    position,
    alternativeToId,
    version: 1,
    createdAt: now,
    updatedAt: now,
  });

  const pitches = await tx
    .select()
    .from(pitch)
    .where(and(eq(pitch.campId, source.id), eq(pitch.tripId, source.tripId)));
  const pitchIds = new Map<string, string>();
  for (const row of pitches) {
    const shelterId = target.mapShelterId(row.shelterId);
    if (!shelterId) continue;
    const id = newId();
    pitchIds.set(row.id, id);
    await tx.insert(pitch).values({ ...row, id, tripId, campId, shelterId, version: 1, updatedAt: now });
  }

  const placed = await tx
    .select()
    .from(placement)
    .where(and(eq(placement.campId, source.id), eq(placement.tripId, source.tripId)));
  const placements = placed.flatMap((row) => {
    const pitchId = pitchIds.get(row.pitchId);
    const moved = pitchId && movePlacement(toPlacement(row), pitchId, target);
    return moved ? [moved] : [];
  });
  if (placements.length > 0) {
    const scope = { tripId, campId };
    await writePlacements(tx, scope, [], placements);
    const change = { type: "replace" as const, placements };
    await writeIntent(tx, ctx, { ...scope, id: newId(), baseVersion: 0, resultVersion: 1, change });
    await savePlanRow(tx, ctx, scope, 1);
  }

  const sleepers = await tx
    .select()
    .from(sleeper)
    .where(and(eq(sleeper.campId, source.id), eq(sleeper.tripId, source.tripId)));
  for (const row of sleepers) {
    const personId = target.mapPersonId(row.personId);
    const pitchId = row.pitchId === null ? null : pitchIds.get(row.pitchId);
    if (personId && pitchId !== undefined) {
      await tx.insert(sleeper).values({ id: newId(), tripId, campId, personId, pitchId });
    }
  }
  return campId;
}
