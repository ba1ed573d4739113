import { eq } from "drizzle-orm";
import type { z } from "zod";
import { withTransaction } from "@/db/client";
import { personalDetail } from "@/db/schema";
import { requirePermission } from "@/lib/auth/permission";
import { ownDetailsInput, writeConsent } from "@/lib/domain/details/schema";
import { newId } from "@/lib/domain/ids";
import { AppError } from "@/lib/errors";
import type { Context } from "@/lib/services/context/context";
import { loadRosterSettings } from "../roster/internal";
import { parseInput } from "../trips/parse-input";
import { findDetailRow } from "./internal";
import { seal } from "./seal";

/** Somebody writes their own contact, emergency contacts, health and diet; nobody can for somebody else. */
export async function saveOwnDetails({
  ctx,
  input,
}: {
  ctx: Context;
  input: z.input<typeof ownDetailsInput>;
}): Promise<void> {
  const { tripId, version, hasConsent: _, ...details } = parseInput(ownDetailsInput, input);
  await withTransaction(async (tx) => {
    const { personId } = await requirePermission(ctx, tripId, "details.own", tx);
    const known = await findDetailRow(tx, personId);
    if ((known?.version ?? 0) !== version) {
      throw new AppError("conflict", "You changed this in another place since. Load the page again, then change it.", {
        details: { current: { version: known?.version ?? 0 } },
      });
    }
    const { keepDetailsDays } = await loadRosterSettings(tx, tripId);
    const consentText = writeConsent(keepDetailsDays);
    const now = new Date();
    const id = known?.id ?? newId();
    const row = {
      sealed: seal(JSON.stringify(details), { rowId: id, personId, tripId }),
      consentText,
      consentAt: known?.consentText === consentText ? known.consentAt : now,
      version: version + 1,
      updatedAt: now,
    };
    if (known) await tx.update(personalDetail).set(row).where(eq(personalDetail.id, id));
    else await tx.insert(personalDetail).values({ id, tripId, personId, ...row });
  });
}
