import { makeCast } from "../../helpers/actors";
import { startMailServer, type MailServer } from "../../helpers/mail-server";
import { clearLimits } from "../../helpers/outbox";
import { codeOf, refusalOf } from "../../helpers/refusals";
import { and, eq } from "drizzle-orm";
import ICAL from "ical.js";
import { afterAll, beforeAll, beforeEach, describe, expect, it } from "vitest";
import { getDb } from "@/db/client";
import { notice, outboxMessage, person, plannedSend, trip, user } from "@/db/schema";
import { fillTemplate } from "@/lib/domain/post/fill-template";
import { newId } from "@/lib/domain/ids";
import { createTransport, type MailTransport } from "@/lib/email/transport";
import { addDays, dayOf } from "@/lib/format/days";
import { remindNow } from "@/lib/services/answers/remind";
import { saveAnswer } from "@/lib/services/answers/save-answer";
import { sendDigests } from "@/lib/services/notices/send-digests";
import { cancelPlannedSend } from "@/lib/services/planned-sends/cancel-planned-send";
import { listPlannedSends } from "@/lib/services/planned-sends/list-planned-sends";
import { planSend } from "@/lib/services/planned-sends/plan-send";
import { runPlannedSends } from "@/lib/services/planned-sends/run-planned-sends";
import { getCalendarFile } from "@/lib/services/post/calendar";
import { callOffTrip } from "@/lib/services/post/call-off-trip";
import { listMessages } from "@/lib/services/post/list-messages";
import { listOwnMessages, markMessageRead } from "@/lib/services/post/own-messages";
import { runOutboxOnce } from "@/lib/services/post/run-outbox";
import { sendPapers } from "@/lib/services/post/send-papers";
import { deleteTemplate } from "@/lib/services/templates/delete-template";
import { listTemplates } from "@/lib/services/templates/list-templates";
import { saveTemplate } from "@/lib/services/templates/save-template";

let server: MailServer;
let transport: MailTransport;
beforeAll(async () => {
  server = await startMailServer();
  transport = createTransport(server.url);
});
afterAll(async () => {
  transport.close();
  await server.close();
});
beforeEach(async () => {
  server.received.length = 0;
  await getDb().delete(outboxMessage);
  await clearLimits();
});

type Cast = Awaited<ReturnType<typeof makeCast>>;
type Pieces = Parameters<typeof sendPapers>[0]["input"]["pieces"];
const today = () => dayOf(new Date(), "Europe/London");

/** Begins in forty days. */
async function makeComing() {
  const cast = await makeCast();
  await getDb()
    .update(trip)
    .set({ startDate: addDays(today(), 40) })
    .where(eq(trip.id, cast.tripId));
  return cast;
}

const words = (cast: Cast, over: object = {}) => ({
  tripId: cast.tripId,
  requestId: newId(),
  personIds: [cast.personIds.coLeader, cast.personIds.participant],
  pieces: [] as Pieces,
  subject: "{trip} for {name}",
  message: "See {link}. {leader}",
  paperSize: "A4" as const,
  ...over,
});
const send = (cast: Cast, over: object = {}, isTest = false) =>
  sendPapers({ ctx: cast.leader.ctx, input: words(cast, over), isTest });

interface Event {
  readonly method: string;
  readonly uid: string;
  readonly sequence: number;
  readonly status: string;
  readonly summary: string;
  readonly start: string;
  readonly end: string;
  readonly isDate: boolean;
  readonly stamp: string;
}

/** Read by a library that had no part in writing it. */
function readIcs(text: string): Event {
  const calendar = new ICAL.Component(ICAL.parse(text) as [string, unknown[], unknown[]]);
  const parts = calendar.getAllSubcomponents("vevent");
  expect(parts).toHaveLength(1);
  const [part] = parts;
  if (!part) throw new Error("no event");
  const event = new ICAL.Event(part);
  return {
    method: String(calendar.getFirstPropertyValue("method")),
    uid: event.uid,
    sequence: event.sequence,
    status: String(part.getFirstPropertyValue("status")),
    summary: event.summary,
    start: event.startDate.toString(),
    end: event.endDate.toString(),
    isDate: event.startDate.isDate && event.endDate.isDate,
    stamp: String(part.getFirstPropertyValue("dtstamp")),
  };
}

describe("a message", () => {
  it("goes without paper, each with its own words, as text and HTML, answers to the leader", async () => {
    const cast = await makeComing();
    await send(cast);
    await runOutboxOnce(transport);
    expect(server.received).toHaveLength(2);
    const mine = server.received.find((one) => one.recipients[0] === cast.participant.email);
    expect(mine?.mail.subject).toBe(`Ridge and river for ${cast.participant.name}`);
    expect(mine?.mail.text).toContain(`See http://leestead.test/trips/${cast.tripId}. ${cast.leader.name}`);
    expect(mine?.mail.replyTo?.value).toEqual([{ name: cast.leader.name, address: cast.leader.email }]);
    expect(mine?.mail.attachments).toEqual([]);
    expect(mine?.raw).not.toContain(cast.coLeader.name);
    expect(mine?.raw).not.toMatch(/<img|tracking|pixel/i);
  });

  it("says nothing, or goes to nobody: refused, and nothing is sent", async () => {
    const cast = await makeComing();
    expect((await refusalOf(send(cast, { message: "" }))).fieldErrors).toHaveProperty("pieces");
    expect((await refusalOf(send(cast, { personIds: [] }))).fieldErrors).toHaveProperty("personIds");
    expect(await getDb().select().from(outboxMessage)).toEqual([]);
  });

  it("pressed twice at once goes once", async () => {
    const cast = await makeComing();
    const once = words(cast);
    const press = () => sendPapers({ ctx: cast.leader.ctx, input: once });
    await Promise.all([press(), press(), press()]);
    expect(await getDb().select().from(outboxMessage)).toHaveLength(2);
  });

  it("as a test goes to the sender alone, marked, and does not count", async () => {
    const cast = await makeComing();
    await send(cast, {}, true);
    await runOutboxOnce(transport);
    expect(server.received.map((one) => one.recipients)).toEqual([[cast.leader.email]]);
    expect(server.received[0]?.mail.subject).toBe(`Test: Ridge and river for ${cast.leader.name}`);
    const [listed] = await listMessages({ ctx: cast.leader.ctx, input: { tripId: cast.tripId } });
    expect(listed?.isTest).toBe(true);
    expect(await listOwnMessages({ ctx: cast.leader.ctx, input: { tripId: cast.tripId } })).toEqual([]);
  });

  it("fills words once: what is filled in is not filled again, and other braces stay", () => {
    const values = { name: "{leader}", trip: "T", dates: "D", leader: "L", link: "http://x" };
    expect(fillTemplate("{name} {trip} {dates} {link} {what} {constructor} {{name}}", values)).toBe(
      "{leader} T D http://x {what} {constructor} {{leader}}",
    );
  });
});

describe("opened", () => {
  it("only when the recipient says so themselves, once, and the leader sees it", async () => {
    const cast = await makeComing();
    await send(cast);
    await runOutboxOnce(transport);
    const input = { tripId: cast.tripId };
    const [own] = await listOwnMessages({ ctx: cast.participant.ctx, input });
    expect(own).toMatchObject({ readAt: null, subject: `Ridge and river for ${cast.participant.name}` });
    const ref = { ...input, messageId: own?.id ?? "" };
    for (const who of [cast.coLeader, cast.stranger, cast.otherLeader, cast.leader]) {
      expect(await codeOf(markMessageRead({ ctx: who.ctx, input: ref }))).toBe("not-found");
    }
    await markMessageRead({ ctx: cast.participant.ctx, input: ref });
    const [first] = await listOwnMessages({ ctx: cast.participant.ctx, input });
    await markMessageRead({ ctx: cast.participant.ctx, input: ref });
    const listed = await listMessages({ ctx: cast.leader.ctx, input });
    expect(listed.filter((one) => one.readAt).map((one) => [one.toAddress, one.readAt])).toEqual([
      [cast.participant.email, first?.readAt],
    ]);
  });
});

describe("a calendar file", () => {
  it("comes as text/calendar in the mail's tree, all-day, and a second program reads it", async () => {
    const cast = await makeComing();
    await getDb()
      .update(trip)
      .set({ name: "Ridge, river; lee \\ Żółć 🏕 and a name so long that its line has to be folded somewhere" })
      .where(eq(trip.id, cast.tripId));
    await send(cast, { pieces: ["calendar"], personIds: [cast.personIds.participant] });
    await runOutboxOnce(transport);
    const [got] = server.received;
    const parts = got?.mail.attachments ?? [];
    expect(got?.raw).toMatch(/Content-Type: text\/calendar; charset=utf-8; method=PUBLISH/);
    const ics = parts.find((part) => part.filename === "Trip.ics")?.content.toString("utf8") ?? "";
    for (const line of ics.split("\r\n")) expect(Buffer.byteLength(line)).toBeLessThanOrEqual(75);
    expect(ics.replaceAll("\r\n", "")).not.toMatch(/[\r\n]/);
    const start = addDays(today(), 40);
    expect(readIcs(ics)).toMatchObject({
      method: "PUBLISH",
      uid: `${cast.tripId}@leestead.test`,
      sequence: 0,
      status: "CONFIRMED",
      summary: "Ridge, river; lee \\ Żółć 🏕 and a name so long that its line has to be folded somewhere",
      isDate: true,
      start,
      // Exclusive.
      end: addDays(start, 1),
      stamp: expect.stringMatching(/Z$/),
    });
  });

  it("keeps its UID, counts up when it says something else, and is cancelled when the trip is", async () => {
    const cast = await makeComing();
    const sent = async () => {
      await runOutboxOnce(transport);
      const ics = server.received.at(-1)?.mail.attachments.find((part) => part.filename === "Trip.ics");
      return readIcs(ics?.content.toString("utf8") ?? "");
    };
    const publish = async () => {
      await send(cast, { pieces: ["calendar"], personIds: [cast.personIds.participant] });
      return sent();
    };
    const first = await publish();
    expect(await publish()).toMatchObject({ uid: first.uid, sequence: 0 });
    await getDb()
      .update(trip)
      .set({ startDate: addDays(today(), 41) })
      .where(eq(trip.id, cast.tripId));
    expect(await publish()).toMatchObject({ uid: first.uid, sequence: 1, start: addDays(today(), 41) });

    const off = { tripId: cast.tripId, requestId: newId(), isOff: true, message: "Too much wind." };
    expect(await callOffTrip({ ctx: cast.leader.ctx, input: off })).toEqual({ count: 3 });
    expect(await callOffTrip({ ctx: cast.leader.ctx, input: off })).toEqual({ count: 3 });
    expect(await sent()).toMatchObject({ uid: first.uid, sequence: 2, method: "CANCEL", status: "CANCELLED" });
    expect(server.received.filter((one) => one.mail.subject?.startsWith("Called off"))).toHaveLength(3);
    expect(server.received.at(-1)?.mail.text).toContain("Too much wind.");
    expect(await codeOf(send(cast, { pieces: ["calendar"] }))).toBe("conflict");
    expect(await codeOf(callOffTrip({ ctx: cast.leader.ctx, input: { ...off, requestId: newId() } }))).toBe("conflict");

    const on = { tripId: cast.tripId, requestId: newId(), isOff: false };
    await callOffTrip({ ctx: cast.leader.ctx, input: on });
    expect(await sent()).toMatchObject({ uid: first.uid, sequence: 3, method: "PUBLISH", status: "CONFIRMED" });
  });

  it("while called off nobody is reminded and nobody answers", async () => {
    const cast = await makeComing();
    await callOffTrip({ ctx: cast.leader.ctx, input: { tripId: cast.tripId, requestId: newId(), isOff: true } });
    const ref = { tripId: cast.tripId, requestId: newId() };
    expect(await codeOf(remindNow({ ctx: cast.leader.ctx, input: ref }))).toBe("conflict");
    const yes = { tripId: cast.tripId, value: "yes" as const };
    expect(await codeOf(saveAnswer({ ctx: cast.participant.ctx, input: yes }))).toBe("conflict");
  });

  it("is there for whoever is on the trip; asking changes nothing", async () => {
    const cast = await makeComing();
    const input = { tripId: cast.tripId };
    const one = await getCalendarFile({ ctx: cast.participant.ctx, input });
    expect(readIcs(one.content)).toMatchObject({ method: "PUBLISH", sequence: 0 });
    expect((await getCalendarFile({ ctx: cast.leader.ctx, input })).content).toBe(one.content);
    expect(await codeOf(getCalendarFile({ ctx: cast.stranger.ctx, input }))).toBe("not-found");
  });

  it.each(["stranger", "otherLeader", "participant", "coLeader"] as const)("is not cancelled by %s", async (who) => {
    const cast = await makeComing();
    const input = { tripId: cast.tripId, requestId: newId(), isOff: true };
    const code = who === "stranger" || who === "otherLeader" ? "not-found" : "forbidden";
    expect(await codeOf(callOffTrip({ ctx: cast[who].ctx, input }))).toBe(code);
    expect(await getDb().select().from(outboxMessage)).toEqual([]);
  });
});

describe("a message for later", () => {
  const later = { sendDay: addDays(today(), 10), sendTime: "08:30" };
  const plan = (cast: Cast, over: object = {}) =>
    planSend({ ctx: cast.leader.ctx, input: { ...words(cast), ...later, ...over } });
  const list = (cast: Cast) => listPlannedSends({ ctx: cast.leader.ctx, input: { tripId: cast.tripId } });
  const after = () => new Date(Date.now() + 11 * 86_400_000);

  it("waits for its time on the trip's clock, then goes once, however often it is looked for", async () => {
    const cast = await makeComing();
    await getDb().update(trip).set({ timeZone: "Pacific/Kiritimati" }).where(eq(trip.id, cast.tripId));
    const once = { ...words(cast), ...later };
    const { sendAt } = await planSend({ ctx: cast.leader.ctx, input: once });
    await planSend({ ctx: cast.leader.ctx, input: once });
    // Kiritimati is 14 hours ahead: 08:30 there is 18:30 UTC of the day before.
    expect(sendAt.toISOString()).toBe(`${addDays(later.sendDay, -1)}T18:30:00.000Z`);
    expect(await list(cast)).toHaveLength(1);
    await runPlannedSends(new Date(sendAt.getTime() - 1000));
    expect(await getDb().select().from(outboxMessage)).toEqual([]);
    await Promise.all([runPlannedSends(sendAt), runPlannedSends(sendAt)]);
    await runPlannedSends(after());
    expect(await getDb().select().from(outboxMessage)).toHaveLength(2);
    expect(await list(cast)).toEqual([]);
  });

  it("leaves out who has gone, and says why when nobody is left or the planner may not send any more", async () => {
    const cast = await makeComing();
    await plan(cast);
    await getDb().delete(person).where(eq(person.id, cast.personIds.participant));
    await runPlannedSends(after());
    expect((await getDb().select().from(outboxMessage)).map((one) => one.toAddress)).toEqual([cast.coLeader.email]);
    await plan(cast, { personIds: [cast.personIds.coLeader] });
    await getDb().update(person).set({ role: "participant" }).where(eq(person.id, cast.personIds.leader));
    await runPlannedSends(after());
    await getDb().update(person).set({ role: "leader" }).where(eq(person.id, cast.personIds.leader));
    expect(await list(cast)).toMatchObject([{ state: "failed", reason: expect.stringMatching(/role on this trip/) }]);
  });

  it("does not go when it is taken back, when the trip is off, or when the account is gone", async () => {
    const cast = await makeComing();
    const first = words(cast);
    await planSend({ ctx: cast.leader.ctx, input: { ...first, ...later } });
    await cancelPlannedSend({ ctx: cast.leader.ctx, input: { tripId: cast.tripId, plannedSendId: first.requestId } });
    await plan(cast);
    await callOffTrip({ ctx: cast.leader.ctx, input: { tripId: cast.tripId, requestId: newId(), isOff: true } });
    await getDb().delete(outboxMessage);
    await runPlannedSends(after());
    expect(await getDb().select().from(outboxMessage)).toEqual([]);
    expect(await list(cast)).toMatchObject([{ state: "failed", reason: "The trip has been called off." }]);
    await getDb().delete(user).where(eq(user.id, cast.leader.id));
    expect(await getDb().select().from(plannedSend).where(eq(plannedSend.tripId, cast.tripId))).toEqual([]);
  });

  it.each([
    ["sendDay", { sendDay: addDays(today(), -1) }],
    ["sendDay", { sendDay: "2027-02-30" }],
    ["sendDay", { sendDay: "2199-12-31" }],
    ["sendTime", { sendTime: "7 o'clock" }],
    ["personIds", { personIds: [] }],
    ["pieces", { message: "" }],
    ["subject", { subject: "x".repeat(5000) }],
  ])("names the field %s for bad input %#", async (field, bad) => {
    const cast = await makeComing();
    expect((await refusalOf(plan(cast, bad))).fieldErrors).toHaveProperty(field);
    expect(await list(cast)).toEqual([]);
  });

  it("is the leader's of this trip", async () => {
    const cast = await makeComing();
    const first = words(cast);
    await planSend({ ctx: cast.leader.ctx, input: { ...first, ...later } });
    const ref = { tripId: cast.tripId, plannedSendId: first.requestId };
    for (const [who, code] of [
      [cast.coLeader, "forbidden"],
      [cast.participant, "forbidden"],
      [cast.stranger, "not-found"],
      [cast.otherLeader, "not-found"],
    ] as const) {
      expect(await codeOf(planSend({ ctx: who.ctx, input: { ...words(cast), ...later } }))).toBe(code);
      expect(await codeOf(cancelPlannedSend({ ctx: who.ctx, input: ref }))).toBe(code);
      expect(await codeOf(listPlannedSends({ ctx: who.ctx, input: ref }))).toBe(code);
    }
    const foreign = { tripId: cast.otherTripId, plannedSendId: first.requestId };
    expect(await codeOf(cancelPlannedSend({ ctx: cast.otherLeader.ctx, input: foreign }))).toBe("not-found");
  });
});

describe("templates", () => {
  it("are kept for the trip, replaced by name, deleted, and only the leader's", async () => {
    const cast = await makeComing();
    const { ctx } = cast.leader;
    const input = { tripId: cast.tripId };
    const mine = { ...input, name: "Mine", subject: "Hello", body: "Words for {name}." };
    await saveTemplate({ ctx, input: mine });
    await saveTemplate({ ctx, input: { ...mine, name: "MINE", body: "Other words." } });
    const [first, ...ours] = await listTemplates({ ctx, input });
    expect(first).toMatchObject({ name: "MINE", body: "Other words." });
    expect(ours.every((one) => one.id === null)).toBe(true);
    expect(await codeOf(saveTemplate({ ctx: cast.coLeader.ctx, input: mine }))).toBe("forbidden");
    expect(await codeOf(listTemplates({ ctx: cast.otherLeader.ctx, input }))).toBe("not-found");
    const ref = { ...input, templateId: first?.id ?? "" };
    expect(
      await codeOf(deleteTemplate({ ctx: cast.otherLeader.ctx, input: { ...ref, tripId: cast.otherTripId } })),
    ).toBe("not-found");
    await deleteTemplate({ ctx, input: ref });
    expect(await listTemplates({ ctx, input })).toEqual(ours);
    expect((await refusalOf(saveTemplate({ ctx, input: { ...mine, body: "" } }))).fieldErrors).toHaveProperty("body");
  });
});

describe("the digest", () => {
  const hoursLater = (hours: number) => new Date(Date.now() + hours * 3_600_000);
  const digests = (tripId: string) =>
    getDb()
      .select()
      .from(outboxMessage)
      .where(and(eq(outboxMessage.tripId, tripId), eq(outboxMessage.kind, "digest")));

  it("tells many things in one mail, after an hour's rest, at most once in twenty hours", async () => {
    const cast = await makeComing();
    const say = (value: "yes" | "maybe" | "no") =>
      saveAnswer({ ctx: cast.participant.ctx, input: { tripId: cast.tripId, value } });
    await say("yes");
    await say("maybe");
    await sendDigests(hoursLater(0.5));
    expect(await digests(cast.tripId)).toEqual([]);
    await Promise.all([sendDigests(hoursLater(2)), sendDigests(hoursLater(2))]);
    const [mail, ...more] = await digests(cast.tripId);
    expect(more).toEqual([]);
    expect(mail?.toAddress).toBe(cast.leader.email);
    expect(mail?.text).toMatch(/yes, i come[\s\S]*maybe/);
    await say("no");
    await sendDigests(hoursLater(4));
    expect(await digests(cast.tripId)).toHaveLength(1);
    await sendDigests(hoursLater(30));
    expect(await digests(cast.tripId)).toHaveLength(2);
  });

  it("stops after the trip", async () => {
    const cast = await makeComing();
    await saveAnswer({ ctx: cast.participant.ctx, input: { tripId: cast.tripId, value: "yes" } });
    await sendDigests(hoursLater(24 * 60));
    expect(await digests(cast.tripId)).toEqual([]);
    expect(await getDb().select().from(notice).where(eq(notice.tripId, cast.tripId))).toMatchObject([
      { sentAt: expect.any(Date) },
    ]);
  });
});
