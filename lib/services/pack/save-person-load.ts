import { and, eq } from "drizzle-orm";
import type { z } from "zod";
import { getDb, withTransaction, type Transaction } from "@/db/client";
import { personLoad } from "@/db/schema";
import { limitSaveInput, ownLoadSaveInput } from "@/lib/domain/pack/schema";
import { tripRefInput } from "@/lib/domain/trip/schema";
import { requirePermission } from "@/lib/auth/permission";
import type { Context } from "@/lib/services/context/context";
import { recordChange } from "../trips/internal";
import { parseInput } from "../trips/parse-input";
import { loadPerson } from "./internal";

interface Scope {
  readonly tripId: string;
  readonly personId: string;
}
type Values = Omit<typeof personLoad.$inferSelect, keyof Scope>;

async function writeLoad(tx: Transaction, ctx: Context, { tripId, personId }: Scope, values: Partial<Values>) {
  const { name } = await loadPerson(tx, tripId, personId);
  await tx
    .insert(personLoad)
    .values({ tripId, personId, ...values })
    .onConflictDoUpdate({ target: personLoad.personId, set: values });
  await recordChange(tx, ctx, {
    tripId,
    action: "update",
    entity: "pack",
    entityId: personId,
    summary: `What ${name} can carry`,
    isPrinted: false,
  });
}

/** What somebody says of themselves. Their body mass is shown to nobody else. */
export async function saveOwnLoad({
  ctx,
  input,
}: {
  ctx: Context;
  input: z.input<typeof ownLoadSaveInput>;
}): Promise<void> {
  const { tripId, ...values } = parseInput(ownLoadSaveInput, input);
  await withTransaction(async (tx) => {
    const { personId } = await requirePermission(ctx, tripId, "load.own", tx);
    await writeLoad(tx, ctx, { tripId, personId }, values);
  });
}

/** What a leader enters for somebody. A plain limit goes before what the person said by body mass. */
export async function saveLimit({
  ctx,
  input,
}: {
  ctx: Context;
  input: z.input<typeof limitSaveInput>;
}): Promise<void> {
  const { tripId, personId, ...values } = parseInput(limitSaveInput, input);
  await withTransaction(async (tx) => {
    await requirePermission(ctx, tripId, "pack.edit", tx);
    await writeLoad(tx, ctx, { tripId, personId }, values);
  });
}

/** One's own, as it was said. */
export async function getOwnLoad({
  ctx,
  input,
}: {
  ctx: Context;
  input: z.input<typeof tripRefInput>;
}): Promise<Values> {
  const { tripId } = parseInput(tripRefInput, input);
  const { personId } = await requirePermission(ctx, tripId, "load.own");
  const [row] = await getDb()
    .select({
      baseMassKg: personLoad.baseMassKg,
      bodyMassKg: personLoad.bodyMassKg,
      limitShare: personLoad.limitShare,
      limitKg: personLoad.limitKg,
    })
    .from(personLoad)
    .where(and(eq(personLoad.tripId, tripId), eq(personLoad.personId, personId)))
    .limit(1);
  return row ?? { baseMassKg: null, bodyMassKg: null, limitShare: null, limitKg: null };
}
