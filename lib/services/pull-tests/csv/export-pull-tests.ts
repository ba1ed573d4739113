import type { z } from "zod";
import { getDb } from "@/db/client";
import { campRefInput } from "@/lib/domain/camp/schema";
import { requirePermission } from "@/lib/auth/permission";
import type { Context } from "@/lib/services/context/context";
import { loadCampRow } from "../../camps/internal";
import { parseInput } from "../../trips/parse-input";
import { listPullRows } from "../internal";
import { writeCsv } from "./write-csv";

interface CsvFile {
  readonly fileName: string;
  readonly text: string;
}

export async function exportCampPullTests({
  ctx,
  input,
}: {
  ctx: Context;
  input: z.input<typeof campRefInput>;
}): Promise<CsvFile> {
  const { tripId, campId } = parseInput(campRefInput, input);
  await requirePermission(ctx, tripId, "pull-test.read");
  const db = getDb();
  const camp = await loadCampRow(db, tripId, campId);
  const rows = await listPullRows(db, { kind: "camp", tripId, campId });
  return { fileName: `${camp.name}, pull tests.csv`, text: writeCsv(rows.toReversed()) };
}

export async function exportPracticePullTests({ ctx }: { ctx: Context }): Promise<CsvFile> {
  const rows = await listPullRows(getDb(), { kind: "practice", ownerId: ctx.actor.userId });
  return { fileName: "Practice field, pull tests.csv", text: writeCsv(rows.toReversed()) };
}
