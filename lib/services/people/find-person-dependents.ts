import type { z } from "zod";
import { getDb } from "@/db/client";
import { requirePermission } from "@/lib/auth/permission";
import { personRefInput } from "@/lib/domain/person/schema";
import type { Context } from "@/lib/services/context/context";
import { parseInput } from "../trips/parse-input";
import { listPersonDependents, loadPersonRow } from "./internal";

export async function findPersonDependents({
  ctx,
  input,
}: {
  ctx: Context;
  input: z.input<typeof personRefInput>;
}): Promise<string[]> {
  const { tripId, personId } = parseInput(personRefInput, input);
  await requirePermission(ctx, tripId, "people.edit");
  await loadPersonRow(getDb(), tripId, personId);
  return listPersonDependents(getDb(), tripId, personId);
}
