import { withTransaction } from "@/db/client";
import { newId } from "@/lib/domain/ids";
import type { Context } from "@/lib/services/context/context";
import { listCampSummaries } from "@/lib/services/camps/list-camp-summaries";
import { createComment } from "@/lib/services/comments/create-comment";
import { recordCopy } from "@/lib/services/own-pages/copies";
import { getOwnHome } from "@/lib/services/own-pages/get-own-home";
import { markOwnPagesRead } from "@/lib/services/own-pages/mark-own-pages-read";
import { getPaperDocument } from "@/lib/services/papers/get-paper-document";
import { getCampPlan } from "@/lib/services/plan/get-camp-plan";
import { savePlanIntents } from "@/lib/services/plan/save-plan-intents";

interface Talkers {
  readonly leader: Context;
  readonly coLeader: Context;
  readonly participant: Context;
}

const CAMP_TALK = [
  ["coLeader", "The wall shelters the lower half only. The upper pitch stands in the gap."],
  ["leader", "Then the long tarp goes to the lower one. Pull two stakes there before you trust the loam."],
] as const;
const SHELTER_TALK = "One corner loop is stitched anew. Look at it after each windy night.";

/** Somebody has printed and read their pages; then the co-leader changed a line of their shelter. */
async function changeAfterReading({ coLeader, participant }: Talkers, tripId: string): Promise<void> {
  const { list, changedAt } = await getOwnHome({ ctx: participant, input: { tripId } });
  const paper = { kind: "pitch-and-pack" as const, personId: list.person.id, fold: "flat" as const };
  // As printed, but for the drawing of it: a seed has no renderer.
  const printed = await getPaperDocument({ ctx: participant, input: { tripId, paper } });
  if (printed.kind !== "pitch-and-pack") throw new Error("The demo printed something else.");
  const copy = { tripId, personId: list.person.id, version: printed.header.version, content: printed.content };
  await withTransaction((tx) => recordCopy(tx, participant, { ...copy, way: "printed" }));
  await markOwnPagesRead({ ctx: participant, input: { tripId, changedAt } });
  const night = list.nights.find((one) => one.pitchId !== null);
  if (!night) throw new Error("The demo's participant sleeps nowhere.");
  const { placements, planVersion } = await getCampPlan({ ctx: coLeader, input: { tripId, campId: night.campId } });
  const own = placements.find((one) => one.pitchId === night.pitchId);
  if (!own) throw new Error("The demo's participant has no anchors.");
  const change = { type: "place" as const, placement: { ...own, knot: "truckers-hitch" as const } };
  const intents = [{ intentId: newId(), baseVersion: planVersion, change }];
  await savePlanIntents({ ctx: coLeader, input: { tripId, campId: night.campId, intents } });
}

/** Comments between those who lead, and pages that are a little older than the plan. */
export async function seedTalk(who: Talkers, tripId: string): Promise<void> {
  const camps = await listCampSummaries({ ctx: who.leader, input: { tripId } });
  const camp = camps.find((one) => one.name === "Skarn Edge") ?? camps[0];
  if (!camp) throw new Error("The demo has no camp to talk about.");
  const subject = { about: "camp" as const, campId: camp.id };
  for (const [by, body] of CAMP_TALK) {
    await createComment({ ctx: who[by], input: { tripId, commentId: newId(), subject, body } });
  }
  const { pitches } = await getCampPlan({ ctx: who.leader, input: { tripId, campId: camp.id } });
  const shelterId = pitches[0]?.shelterId;
  if (shelterId) {
    const about = { about: "shelter" as const, shelterId };
    await createComment({
      ctx: who.coLeader,
      input: { tripId, commentId: newId(), subject: about, body: SHELTER_TALK },
    });
  }
  await changeAfterReading(who, tripId);
}
