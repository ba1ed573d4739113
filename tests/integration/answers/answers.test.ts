import { makeCast, makePerson, makeUser } from "../../helpers/actors";
import { clearLimits, readLinkToken, readOutbox } from "../../helpers/outbox";
import { codeOf, refusalOf } from "../../helpers/refusals";
import { and, eq } from "drizzle-orm";
import fc from "fast-check";
import { beforeEach, describe, expect, it } from "vitest";
import { getDb } from "@/db/client";
import { answer, notice, outboxMessage, trip } from "@/db/schema";
import type { AnswerValue } from "@/lib/domain/answer/schema";
import { newId } from "@/lib/domain/ids";
import { addDays, dayOf } from "@/lib/format/days";
import { answerInvitation } from "@/lib/services/answers/answer-invitation";
import { getOwnAnswer } from "@/lib/services/answers/get-own-answer";
import { remindDue, remindNow } from "@/lib/services/answers/remind";
import { saveAnswer } from "@/lib/services/answers/save-answer";
import { getInvitation } from "@/lib/services/invitations/get-invitation";
import { signUpWithInvitation } from "@/lib/services/invitations/sign-up-with-invitation";
import { createPerson } from "@/lib/services/people/create-person";
import { deletePerson } from "@/lib/services/people/delete-person";
import { listPeople } from "@/lib/services/people/list-people";
import { getRoster } from "@/lib/services/roster/get-roster";
import { updateRoster } from "@/lib/services/roster/update-roster";

beforeEach(clearLimits);

type Cast = Awaited<ReturnType<typeof makeCast>>;
const today = () => dayOf(new Date(), "Europe/London");

/** A trip that begins in forty days, with `count` more people on it, each with an account. */
async function makeGroup(count: number) {
  const cast = await makeCast();
  await getDb()
    .update(trip)
    .set({ startDate: addDays(today(), 40) })
    .where(eq(trip.id, cast.tripId));
  const guests = [];
  for (let i = 0; i < count; i += 1) {
    const who = await makeUser();
    guests.push({ ...who, personId: await makePerson(cast.tripId, "participant", who) });
  }
  return { ...cast, guests };
}

async function setRoster({ tripId, leader }: Cast, over: Partial<Parameters<typeof updateRoster>[0]["input"]> = {}) {
  const { version } = await getRoster({ ctx: leader.ctx, input: { tripId } });
  const usual = { capacity: null, answerBy: null, remindDaysBefore: 3, keepDetailsDays: 30 };
  await updateRoster({ ctx: leader.ctx, input: { tripId, version, ...usual, ...over } });
}

const say = (cast: Cast, who: { ctx: Cast["leader"]["ctx"] }, value: AnswerValue, note = "") =>
  saveAnswer({ ctx: who.ctx, input: { tripId: cast.tripId, value, note } });

describe("an answer", () => {
  it("is given by the link of the invitation before there is an account, and changed after", async () => {
    const cast = await makeGroup(0);
    const email = "wren@example.test";
    const input = { tripId: cast.tripId, name: "Wren Hale", email, role: "participant" as const };
    const { personId } = await createPerson({ ctx: cast.leader.ctx, input });
    const token = await readLinkToken(email);
    await answerInvitation({ input: { token, value: "maybe", note: "after work" } });
    expect((await getInvitation({ input: { token } })).own.answer).toMatchObject({
      value: "maybe",
      note: "after work",
    });
    await answerInvitation({ input: { token, value: "yes", note: "" } });
    const { tripId } = await signUpWithInvitation({ input: { token, name: "Wren", password: "" } });
    const people = await listPeople({ ctx: cast.leader.ctx, input: { tripId } });
    expect(people.find((one) => one.id === personId)).toMatchObject({ state: "joined", answer: { value: "yes" } });
    expect(await codeOf(answerInvitation({ input: { token, value: "no", note: "" } }))).toBe("conflict");
  });

  it.each(["", "x", "a".repeat(43)])("is nobody's by the link %j", async (token) => {
    expect(await codeOf(answerInvitation({ input: { token, value: "yes", note: "" } }))).toMatch(/bad-input|not-found/);
  });

  it("is only for who is on the trip, and refuses what is no answer", async () => {
    const cast = await makeGroup(0);
    for (const who of [cast.stranger, cast.otherLeader]) expect(await codeOf(say(cast, who, "yes"))).toBe("not-found");
    const bad = { tripId: cast.tripId, value: "perhaps" as "yes", note: "" };
    expect((await refusalOf(saveAnswer({ ctx: cast.leader.ctx, input: bad }))).fieldErrors).toHaveProperty("value");
    const long = { tripId: cast.tripId, value: "yes" as const, note: "x".repeat(5000) };
    expect((await refusalOf(saveAnswer({ ctx: cast.leader.ctx, input: long }))).fieldErrors).toHaveProperty("note");
  });

  it("after the last day can only be a no; after the trip there is none", async () => {
    const cast = await makeGroup(1);
    const [guest] = cast.guests;
    if (!guest) throw new Error("nobody");
    await setRoster(cast, { answerBy: addDays(today(), -1) });
    expect(await codeOf(say(cast, guest, "yes"))).toBe("conflict");
    expect(await codeOf(say(cast, guest, "maybe"))).toBe("conflict");
    expect((await say(cast, guest, "no")).answer?.value).toBe("no");
    await getDb()
      .update(trip)
      .set({ startDate: addDays(today(), -10) })
      .where(eq(trip.id, cast.tripId));
    expect((await refusalOf(say(cast, guest, "no", "late"))).userMessage).toBe("This trip is over.");
  });

  it("reaches the leader's next digest, not their own", async () => {
    const cast = await makeGroup(1);
    await say(cast, cast.guests[0] ?? cast.stranger, "yes");
    await say(cast, cast.leader, "yes");
    const rows = await getDb().select().from(notice).where(eq(notice.tripId, cast.tripId));
    expect(rows.map((row) => [row.personId, row.sentence])).toEqual([
      [cast.personIds.leader, expect.stringMatching(/: yes, i come\.$/)],
    ]);
  });
});

describe("places", () => {
  it("go to the first; the others wait in order, and move up with a mail when one gets free", async () => {
    const cast = await makeGroup(4);
    // Leader and co-leader count: two places are left.
    await setRoster(cast, { capacity: 4 });
    for (const guest of cast.guests) await say(cast, guest, "yes");
    const own = async (index: number) => {
      const ctx = cast.guests[index]?.ctx ?? cast.stranger.ctx;
      return getOwnAnswer({ ctx, input: { tripId: cast.tripId } });
    };
    expect([(await own(0)).waitingPlace, (await own(1)).waitingPlace]).toEqual([null, null]);
    expect([(await own(2)).waitingPlace, (await own(3)).waitingPlace]).toEqual([1, 2]);
    await say(cast, cast.guests[0] ?? cast.stranger, "no");
    expect([(await own(2)).waitingPlace, (await own(3)).waitingPlace]).toEqual([null, 1]);
    const mails = await readOutbox(cast.guests[2]?.email ?? "");
    expect(mails.map((one) => one.kind)).toEqual(["place"]);
    expect(mails[0]?.replyToAddress).toBe(cast.leader.email);

    await deletePerson({
      ctx: cast.leader.ctx,
      input: { tripId: cast.tripId, personId: cast.guests[1]?.personId ?? "", confirmed: true },
    });
    expect((await own(3)).waitingPlace).toBeNull();
    await say(cast, cast.guests[0] ?? cast.stranger, "yes");
    expect((await own(0)).waitingPlace).toBe(1);
    await setRoster(cast, { capacity: 5 });
    expect((await own(0)).waitingPlace).toBeNull();
    expect((await getRoster({ ctx: cast.leader.ctx, input: { tripId: cast.tripId } })).counts).toEqual({
      coming: 5,
      waiting: 0,
      maybe: 0,
      no: 0,
      open: 1,
    });
  });

  it("are never given twice, however many ask at once", async () => {
    const cast = await makeGroup(12);
    await setRoster(cast, { capacity: 3 });
    await Promise.all(cast.guests.map((guest) => say(cast, guest, "yes")));
    const rows = await getDb()
      .select()
      .from(answer)
      .where(and(eq(answer.tripId, cast.tripId), eq(answer.isWaiting, false)));
    expect(rows).toHaveLength(1);
  });

  it("any order of answers keeps to the number of places, and nobody waits while one is free", async () => {
    const cast = await makeGroup(5);
    await setRoster(cast, { capacity: 4 });
    const step = fc.tuple(fc.nat(4), fc.constantFrom("yes" as const, "maybe" as const, "no" as const));
    await fc.assert(
      fc.asyncProperty(fc.array(step, { minLength: 1, maxLength: 8 }), async (steps) => {
        for (const [index, value] of steps) await say(cast, cast.guests[index] ?? cast.stranger, value);
        const { counts } = await getRoster({ ctx: cast.leader.ctx, input: { tripId: cast.tripId } });
        expect(counts.coming).toBeLessThanOrEqual(4);
        if (counts.waiting > 0) expect(counts.coming).toBe(4);
      }),
      { numRuns: 25, seed: 7 },
    );
  });

  it.each([
    ["capacity", { capacity: 0 }],
    ["capacity", { capacity: 2.5 }],
    ["capacity", { capacity: "all" }],
    ["answerBy", { answerBy: "2027-02-30" }],
    ["answerBy", { answerBy: "2199-12-31" }],
    ["remindDaysBefore", { remindDaysBefore: 61 }],
    ["keepDetailsDays", { keepDetailsDays: 0 }],
    ["keepDetailsDays", { keepDetailsDays: null }],
  ])("names the field %s for %j", async (field, bad) => {
    const cast = await makeGroup(0);
    expect((await refusalOf(setRoster(cast, bad as object))).fieldErrors).toHaveProperty(field);
  });

  it("are set by the leader only, and not over somebody else's change", async () => {
    const cast = await makeGroup(0);
    const input = {
      tripId: cast.tripId,
      version: 0,
      capacity: 5,
      answerBy: "",
      remindDaysBefore: 3,
      keepDetailsDays: 30,
    };
    for (const [who, code] of [
      [cast.stranger, "not-found"],
      [cast.otherLeader, "not-found"],
      [cast.participant, "forbidden"],
      [cast.coLeader, "forbidden"],
    ] as const) {
      expect(await codeOf(updateRoster({ ctx: who.ctx, input }))).toBe(code);
    }
    await updateRoster({ ctx: cast.leader.ctx, input });
    expect(await codeOf(updateRoster({ ctx: cast.leader.ctx, input }))).toBe("conflict");
  });
});

describe("reminders", () => {
  const at = (day: string) => new Date(`${day}T12:00:00Z`);
  const mailsOf = async (tripId: string) =>
    getDb()
      .select()
      .from(outboxMessage)
      .where(and(eq(outboxMessage.tripId, tripId), eq(outboxMessage.kind, "reminder")));

  it("go once to who has not settled, some days before the last day, never after it", async () => {
    const cast = await makeGroup(3);
    const answerBy = addDays(today(), 20);
    await setRoster(cast, { answerBy, remindDaysBefore: 5 });
    await say(cast, cast.guests[0] ?? cast.stranger, "yes");
    await say(cast, cast.guests[1] ?? cast.stranger, "maybe");
    await say(cast, cast.participant, "no");
    await remindDue(at(addDays(answerBy, -6)));
    expect(await mailsOf(cast.tripId)).toEqual([]);
    await remindDue(at(addDays(answerBy, -5)));
    await Promise.all([remindDue(at(addDays(answerBy, -5))), remindDue(at(addDays(answerBy, -1)))]);
    const mails = await mailsOf(cast.tripId);
    expect(mails.map((one) => one.toAddress).sort()).toEqual([cast.guests[1]?.email, cast.guests[2]?.email].sort());
    expect(mails[0]?.text).toContain(`/trips/${cast.tripId}/details`);
    expect(mails[0]?.replyToAddress).toBe(cast.leader.email);
  });

  it("stop when the trip has begun, whatever the last day is", async () => {
    const cast = await makeGroup(1);
    const answerBy = addDays(today(), 30);
    await setRoster(cast, { answerBy, remindDaysBefore: 3 });
    await getDb()
      .update(trip)
      .set({ startDate: addDays(answerBy, -2) })
      .where(eq(trip.id, cast.tripId));
    await remindDue(at(addDays(answerBy, -2)));
    await remindDue(at(answerBy));
    await remindDue(at(addDays(answerBy, 400)));
    expect(await mailsOf(cast.tripId)).toEqual([]);
  });

  it("carry a link that works for who has no account", async () => {
    const cast = await makeGroup(0);
    const email = "hale@example.test";
    const input = { tripId: cast.tripId, name: "Wren Hale", email, role: "participant" as const };
    await createPerson({ ctx: cast.leader.ctx, input });
    const first = await readLinkToken(email);
    const requestId = newId();
    const ref = { tripId: cast.tripId, requestId };
    expect(await remindNow({ ctx: cast.leader.ctx, input: ref })).toEqual({ count: 2 });
    await remindNow({ ctx: cast.leader.ctx, input: ref });
    expect(await mailsOf(cast.tripId)).toHaveLength(2);
    const second = await readLinkToken(email);
    expect(second).not.toBe(first);
    await answerInvitation({ input: { token: second, value: "yes", note: "" } });
    expect(await codeOf(getInvitation({ input: { token: first } }))).toBe("not-found");
  });

  it("by hand are the leader's, and refused when everybody has answered", async () => {
    const cast = await makeGroup(0);
    const ref = () => ({ tripId: cast.tripId, requestId: newId() });
    expect(await codeOf(remindNow({ ctx: cast.coLeader.ctx, input: ref() }))).toBe("forbidden");
    expect(await codeOf(remindNow({ ctx: cast.stranger.ctx, input: ref() }))).toBe("not-found");
    await say(cast, cast.participant, "yes");
    expect(await codeOf(remindNow({ ctx: cast.leader.ctx, input: ref() }))).toBe("conflict");
    expect(await mailsOf(cast.tripId)).toEqual([]);
  });
});
