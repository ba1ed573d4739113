import type { z } from "zod";
import { getDb } from "@/db/client";
import { requirePermission } from "@/lib/auth/permission";
import { writeConsent } from "@/lib/domain/details/schema";
import type { OwnDetailsView } from "@/lib/domain/people-views";
import { tripRefInput } from "@/lib/domain/trip/schema";
import type { Context } from "@/lib/services/context/context";
import { loadRosterSettings } from "../roster/internal";
import { parseInput } from "../trips/parse-input";
import { findDetailRow, NO_DETAILS, openDetails } from "./internal";

/** What somebody has written about themselves, for themselves. */
export async function getOwnDetails({
  ctx,
  input,
}: {
  ctx: Context;
  input: z.input<typeof tripRefInput>;
}): Promise<OwnDetailsView> {
  const { tripId } = parseInput(tripRefInput, input);
  const { personId } = await requirePermission(ctx, tripId, "details.own");
  const { keepDetailsDays } = await loadRosterSettings(getDb(), tripId);
  const row = await findDetailRow(getDb(), personId);
  return {
    details: row ? openDetails(row) : NO_DETAILS,
    version: row?.version ?? 0,
    consentText: writeConsent(keepDetailsDays),
    consent: row && { text: row.consentText, at: row.consentAt.toISOString() },
  };
}
