import { makeCast } from "../../helpers/actors";
import { clearLimits, readOutbox } from "../../helpers/outbox";
import { codeOf, refusalOf } from "../../helpers/refusals";
import { windyCamp } from "../../helpers/camp-kit";
import { beforeEach, describe, expect, it } from "vitest";
import { newId } from "@/lib/domain/ids";
import { createCamp } from "@/lib/services/camps/create-camp";
import { saveOwnDetails } from "@/lib/services/details/save-own-details";
import { getEmergencyPlan } from "@/lib/services/emergency/get-emergency-plan";
import { saveEmergencyPlan } from "@/lib/services/emergency/save-emergency-plan";
import { sendEmergencyPlan, tellBackSafely } from "@/lib/services/emergency/send-emergency-plan";

beforeEach(clearLimits);

type Cast = Awaited<ReturnType<typeof makeCast>>;
let count = 0;

const planOf = (cast: Cast, over: object = {}) => ({
  tripId: cast.tripId,
  version: 0,
  meetingPoints: "The bridge, on the hour.",
  wayOut: "Down the east burn to the road, 3 h.",
  groupPhone: "+99 000 1",
  dueBackDay: "2027-06-10",
  dueBackTime: "18:30",
  outsideName: "Ines Marlow",
  outsideEmail: `ines-${(count += 1)}@example.test`,
  outsidePhone: "+99 000 2",
  steps: [
    { afterMinutes: 360, who: "Mountain rescue", phone: "112", action: "Call, read this plan to them." },
    { afterMinutes: 60, who: "The group", phone: "", action: "Ring twice." },
  ],
  ...over,
});
const save = (cast: Cast, input: object) =>
  saveEmergencyPlan({ ctx: cast.leader.ctx, input: input as ReturnType<typeof planOf> });
const get = (cast: Cast) => getEmergencyPlan({ ctx: cast.leader.ctx, input: { tripId: cast.tripId } });
const request = (cast: Cast) => ({ tripId: cast.tripId, requestId: newId() });

describe("the emergency plan", () => {
  it("puts its steps in order, each with its time on the trip's clock", async () => {
    const cast = await makeCast();
    await save(cast, planOf(cast));
    const plan = await get(cast);
    expect([plan.dueBackDay, plan.dueBackTime, plan.missing]).toEqual(["2027-06-10", "18:30", []]);
    // London is on summer time: due 18:30, an hour and six hours later.
    expect(plan.steps.map((step) => step.at)).toEqual(["Thu 10 June 19:30", "Fri 11 June 00:30"]);
  });

  it("counts over the night when the clocks change", async () => {
    const cast = await makeCast();
    // 31 October 2027, 01:00 UTC: clocks in London go back from 02:00 to 01:00.
    const step = { afterMinutes: 180, who: "Hut", phone: "", action: "Ask." };
    await save(cast, planOf(cast, { dueBackDay: "2027-10-31", dueBackTime: "00:30", steps: [step] }));
    expect((await get(cast)).steps[0]?.at).toBe("Sun 31 October 02:30");
  });

  it("goes to the contact outside, once a press, with names, nights and times, and nothing of anybody's health", async () => {
    const cast = await makeCast();
    await createCamp({ ctx: cast.leader.ctx, input: { tripId: cast.tripId, details: windyCamp() } });
    const details = { tripId: cast.tripId, version: 0, phone: "+99 777", health: "zyzzyva", hasConsent: true as const };
    await saveOwnDetails({ ctx: cast.participant.ctx, input: details });
    const plan = planOf(cast);
    await save(cast, plan);
    const once = request(cast);
    await sendEmergencyPlan({ ctx: cast.leader.ctx, input: once });
    await sendEmergencyPlan({ ctx: cast.leader.ctx, input: once });
    const mails = await readOutbox(plan.outsideEmail);
    expect(mails).toHaveLength(1);
    const [mail] = mails;
    expect(mail).toMatchObject({ kind: "emergency", toName: "Ines Marlow", replyToAddress: cast.leader.email });
    for (const words of [
      "due back Thu 10 June 18:30",
      "1. Thu 10 June 19:30: Ring twice. (The group)",
      "2. Fri 11 June 00:30: Call, read this plan to them. (Mountain rescue, 112)",
      "The bridge, on the hour.",
      "Down the east burn",
      cast.leader.name,
      "Mon 7 June: Otter Flat",
    ]) {
      expect(mail?.text).toContain(words);
    }
    expect(`${mail?.text}${mail?.html}${mail?.subject}`).not.toMatch(/zyzzyva|\+99 777/);
    expect(await get(cast)).toMatchObject({ version: 1, sentVersion: 1 });
    await save(cast, planOf(cast, { version: 1, outsideEmail: plan.outsideEmail }));
    expect(await get(cast)).toMatchObject({ version: 2, sentVersion: 1 });
  });

  it("says that all are back, to whom it was sent", async () => {
    const cast = await makeCast();
    const plan = planOf(cast);
    await save(cast, plan);
    expect(await codeOf(tellBackSafely({ ctx: cast.leader.ctx, input: request(cast) }))).toBe("conflict");
    await sendEmergencyPlan({ ctx: cast.leader.ctx, input: request(cast) });
    await tellBackSafely({ ctx: cast.leader.ctx, input: request(cast) });
    expect((await readOutbox(plan.outsideEmail)).map((one) => one.subject)).toEqual([
      "Emergency plan, version 1: Ridge and river",
      "Everybody is back: Ridge and river",
    ]);
    expect((await get(cast)).backAt).not.toBeNull();
  });

  it("is not sent while something is missing, and says what", async () => {
    const cast = await makeCast();
    await save(cast, planOf(cast, { dueBackDay: "", dueBackTime: "", steps: [], outsideEmail: "" }));
    const refusal = await refusalOf(sendEmergencyPlan({ ctx: cast.leader.ctx, input: request(cast) }));
    expect(refusal.userMessage).toBe(
      "Nothing was sent. The plan still lacks when the group is due back, the address of the contact outside and at least one step.",
    );
  });

  it.each([
    ["outsideEmail", { outsideEmail: "a@x.test\r\nRCPT TO:<evil@x.test>" }],
    ["outsideEmail", { outsideEmail: "a@x.test, evil@x.test" }],
    ["outsidePhone", { outsidePhone: "ring" }],
    ["dueBackDay", { dueBackDay: "2027-02-30" }],
    ["dueBackTime", { dueBackTime: "25:00" }],
    ["dueBackTime", { dueBackTime: "" }],
    ["steps.0.afterMinutes", { steps: [{ afterMinutes: -1, who: "A", phone: "", action: "B" }] }],
    ["steps.0.afterMinutes", { steps: [{ afterMinutes: 1e308, who: "A", phone: "", action: "B" }] }],
    ["steps.0.who", { steps: [{ afterMinutes: 1, who: "", phone: "", action: "B" }] }],
    ["steps", { steps: Array(13).fill({ afterMinutes: 1, who: "A", phone: "", action: "B" }) }],
    ["wayOut", { wayOut: "x".repeat(1e6) }],
  ])("names the field %s for bad input %#", async (field, bad) => {
    const cast = await makeCast();
    expect((await refusalOf(save(cast, planOf(cast, bad)))).fieldErrors).toHaveProperty(field);
    expect((await get(cast)).version).toBe(0);
  });

  it("is read by who leads, written and sent by the leader", async () => {
    const cast = await makeCast();
    await save(cast, planOf(cast));
    for (const [who, reads, writes] of [
      ["coLeader", "ok", "forbidden"],
      ["participant", "forbidden", "forbidden"],
      ["stranger", "not-found", "not-found"],
      ["otherLeader", "not-found", "not-found"],
    ] as const) {
      const { ctx } = cast[who];
      const reading = getEmergencyPlan({ ctx, input: { tripId: cast.tripId } });
      if (reads === "ok") await reading;
      else expect(await codeOf(reading)).toBe(reads);
      expect(await codeOf(saveEmergencyPlan({ ctx, input: planOf(cast, { version: 1 }) }))).toBe(writes);
      expect(await codeOf(sendEmergencyPlan({ ctx, input: request(cast) }))).toBe(writes);
      expect(await codeOf(tellBackSafely({ ctx, input: request(cast) }))).toBe(writes);
    }
  });
});
