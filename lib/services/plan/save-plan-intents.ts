import { and, asc, eq, gt, inArray } from "drizzle-orm";
import type { z } from "zod";
import { withTransaction, type Transaction } from "@/db/client";
import { planIntent } from "@/db/schema";
import { idSchema } from "@/lib/domain/ids";
import { judgeIntent, type LaterChange } from "@/lib/domain/plan/judge-intent";
import { planIntentsBody, type PlanIntent } from "@/lib/domain/plan/schema";
import type { PlanSaveResult } from "@/lib/domain/views";
import { requirePermission } from "@/lib/auth/permission";
import type { Context } from "@/lib/services/context/context";
import { listTieOutIds } from "../pitches/internal";
import { parseInput } from "../trips/parse-input";
import { recordChange } from "../trips/internal";
import { describePlanChange } from "./describe-plan-change";
import { savePlanRow, sortPlacements, writeIntent, writePlacements } from "./internal";
import { findCampState, loadTripState, type CampState } from "./load-trip-state";

const savePlanIntentsInput = planIntentsBody.extend({ tripId: idSchema, campId: idSchema });

type Outcome = PlanSaveResult["outcomes"][number];
interface StoredIntent extends LaterChange {
  readonly id: string;
  readonly tripId: string;
  readonly campId: string;
  readonly userId: string | null;
  readonly resultVersion: number;
}

/** What is already known of these intents, and everything saved since the oldest version that one of them saw. */
async function loadStoredIntents(tx: Transaction, campId: string, intents: readonly PlanIntent[]) {
  const columns = {
    id: planIntent.id,
    tripId: planIntent.tripId,
    campId: planIntent.campId,
    userId: planIntent.userId,
    userName: planIntent.userName,
    resultVersion: planIntent.resultVersion,
    change: planIntent.change,
    createdAt: planIntent.createdAt,
  };
  const toStored = ({ userName, createdAt, ...row }: Awaited<ReturnType<typeof select>>[number]): StoredIntent => ({
    ...row,
    byName: userName,
    at: createdAt.toISOString(),
  });
  const select = (where: Parameters<ReturnType<ReturnType<typeof tx.select>["from"]>["where"]>[0]) =>
    tx.select(columns).from(planIntent).where(where).orderBy(asc(planIntent.resultVersion));
  const ids = intents.map((intent) => intent.intentId);
  const oldestBase = Math.min(...intents.map((intent) => intent.baseVersion));
  return {
    known: (await select(inArray(planIntent.id, ids))).map(toStored),
    later: (await select(and(eq(planIntent.campId, campId), gt(planIntent.resultVersion, oldestBase)))).map(toStored),
  };
}

function makeIsTieOut(camp: CampState): (pitchId: string, tieOutId: string) => boolean {
  const tieOuts = new Map(camp.pitches.map((pitch) => [pitch.id, listTieOutIds(pitch.spec)]));
  return (pitchId, tieOutId) => tieOuts.get(pitchId)?.has(tieOutId) ?? false;
}

/**
 * Saves changes of a staking plan in order, each with its own outcome (`judgeIntent` has the rule). An intent's base
 * version is the last one that the server told that screen; what the same person saved since doesn't count against it.
 * An intent whose id is known already is left alone, so that a batch can be sent again after a lost answer.
 */
export async function savePlanIntents({
  ctx,
  input,
}: {
  ctx: Context;
  input: z.input<typeof savePlanIntentsInput>;
}): Promise<PlanSaveResult> {
  const { tripId, campId, intents } = parseInput(savePlanIntentsInput, input);
  return withTransaction(async (tx) => {
    await requirePermission(ctx, tripId, "plan.edit", tx);
    const state = await loadTripState(tx, tripId);
    const camp = findCampState(state, campId);
    const isTieOut = makeIsTieOut(camp);
    const { known, later } = await loadStoredIntents(tx, campId, intents);
    const seen = new Map(known.map((intent) => [intent.id, intent]));
    const startVersion = camp.plan?.version ?? 0;

    let version = startVersion;
    let placements = camp.placements;
    const outcomes: Outcome[] = [];
    for (const { intentId, baseVersion, change } of intents) {
      const earlier = seen.get(intentId);
      if (earlier) {
        const isSame = earlier.campId === campId && earlier.tripId === tripId;
        outcomes.push(
          isSame
            ? { intentId, outcome: "repeated" }
            : { intentId, outcome: "refused", reason: "That change was made for another plan." },
        );
        continue;
      }
      const laterByOthers = later.filter((one) => one.resultVersion > baseVersion && one.userId !== ctx.actor.userId);
      const plan = { placements, tray: camp.tray, shockCordCount: state.shockCordCount, isTieOut };
      const judged = judgeIntent(plan, change, laterByOthers);
      if (judged.outcome === "refused") {
        outcomes.push({ intentId, outcome: "refused", reason: judged.reason });
      } else if (judged.outcome === "conflict") {
        const last = judged.against.at(-1);
        outcomes.push({
          intentId,
          outcome: "conflict",
          by: last?.byName ?? "Somebody",
          at: last?.at ?? new Date().toISOString(),
          changes: judged.against.map((one) => `${one.byName}: ${describePlanChange(one.change, camp)}`),
        });
      } else {
        const isChanged = judged.placements !== placements;
        const resultVersion = isChanged ? version + 1 : version;
        await writeIntent(tx, ctx, { id: intentId, tripId, campId, baseVersion, resultVersion, change });
        seen.set(intentId, { ...emptyIntent, id: intentId, tripId, campId, change, resultVersion });
        version = resultVersion;
        placements = judged.placements;
        outcomes.push({ intentId, outcome: "applied" });
      }
    }

    const savedAt = new Date();
    if (version !== startVersion) {
      await writePlacements(tx, { tripId, campId }, camp.placements, placements);
      await savePlanRow(tx, ctx, { tripId, campId }, version);
      await recordChange(tx, ctx, {
        tripId,
        action: "update",
        entity: "plan",
        entityId: campId,
        summary: `${camp.camp.details.name}: staking plan`,
        isPrinted: true,
      });
    }
    const isMine = version !== startVersion || !camp.plan;
    return {
      planVersion: version,
      placements: sortPlacements(placements),
      savedAt: (isMine || !camp.plan ? savedAt : camp.plan.updatedAt).toISOString(),
      savedByName: isMine || !camp.plan ? ctx.actor.name : camp.plan.updatedByName,
      outcomes,
    };
  });
}

const emptyIntent = { byName: "", at: "", userId: null } as const;
