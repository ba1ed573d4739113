import { makeCast, makePerson, makeUser } from "../../helpers/actors";
import { startMailServer, type MailServer } from "../../helpers/mail-server";
import { clearLimits, readOutbox } from "../../helpers/outbox";
import { eq } from "drizzle-orm";
import { afterAll, beforeAll, beforeEach, describe, expect, it } from "vitest";
import { getDb, withTransaction } from "@/db/client";
import { capturedMail, outboxAttachment, outboxFile, outboxMessage } from "@/db/schema";
import { newId } from "@/lib/domain/ids";
import { startFakeSmtpServer } from "@/lib/email/fake-smtp-server";
import { renderLetter } from "@/lib/email/letter";
import { createTransport, type MailTransport } from "@/lib/email/transport";
import { captureMail } from "@/lib/services/post/capture-mail";
import { enqueueMessage, type NewMessage } from "@/lib/services/post/enqueue-message";
import { listMessages } from "@/lib/services/post/list-messages";
import { retryMessage } from "@/lib/services/post/retry-message";
import { runOutboxOnce } from "@/lib/services/post/run-outbox";
import { nextTryInMs } from "@/lib/services/post/retry-times";
import { sendPapers, type PaperSource } from "@/lib/services/post/send-papers";

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

const mail = (subject = "Cards") =>
  renderLetter({ subject, greeting: "Hello,", paragraphs: ["Text."], footnotes: ["Small."] });

function enqueue(overrides: Partial<NewMessage> = {}): Promise<string> {
  const to = { name: "Ada Moss", address: "ada@example.test" };
  return withTransaction((tx) =>
    enqueueMessage(tx, { kind: "papers", requestId: newId(), to, mail: mail(), ...overrides }),
  );
}

const minutesLater = (minutes: number) => ({ now: () => new Date(Date.now() + minutes * 60_000) });
const load = async (id: string) => (await getDb().select().from(outboxMessage).where(eq(outboxMessage.id, id)))[0];

describe("the outbox", () => {
  it("delivers over SMTP once: one recipient, both parts, file, stable Message-ID, marked as automatic", async () => {
    const content = Buffer.from("%PDF-1.7 test");
    const id = await enqueue({
      replyTo: { name: "The Leader", address: "leader@example.test" },
      files: [{ fileName: "Pack list.pdf", contentType: "application/pdf", content }],
    });
    expect(await runOutboxOnce(transport)).toBe(1);
    expect(await runOutboxOnce(transport)).toBe(0);
    const [got, ...more] = server.received;
    expect(more).toEqual([]);
    expect(got?.recipients).toEqual(["ada@example.test"]);
    expect(got?.mail.messageId).toBe((await load(id))?.messageId);
    expect(got?.mail.headers.get("auto-submitted")).toBe("auto-generated");
    expect(got?.mail.replyTo?.value[0]?.address).toBe("leader@example.test");
    expect(got?.mail.text).toContain("Text.");
    expect(got?.mail.html).toContain("<td");
    expect(got?.mail.attachments).toMatchObject([{ filename: "Pack list.pdf", contentType: "application/pdf" }]);
    expect(Buffer.compare(got?.mail.attachments[0]?.content ?? Buffer.from(""), content)).toBe(0);
    expect(await load(id)).toMatchObject({ state: "sent", attempts: 1, leaseUntil: null });
  });

  it("goes with the transaction that caused it", async () => {
    await expect(
      withTransaction(async (tx) => {
        const to = { name: "Ada", address: "ada@example.test" };
        await enqueueMessage(tx, { kind: "papers", requestId: newId(), to, mail: mail() });
        throw new Error("no");
      }),
    ).rejects.toThrow("no");
    expect(await getDb().select().from(outboxMessage)).toEqual([]);
  });

  it("tries again after 451, three times, then delivers once", async () => {
    server.answerWith(451, 451, 451);
    const id = await enqueue();
    for (const [minutes, state, attempts] of [
      [0, "waiting", 1],
      [0.5, "waiting", 1],
      [2, "waiting", 2],
      [9, "waiting", 3],
      [60, "sent", 4],
    ] as const) {
      await runOutboxOnce(transport, minutesLater(minutes));
      expect(await load(id)).toMatchObject({ state, attempts });
    }
    expect(server.received).toHaveLength(1);
  });

  it("stops after 550, shows why, and tries again when asked to", async () => {
    const cast = await makeCast();
    server.answerWith(550);
    const id = await enqueue({ tripId: cast.tripId });
    await runOutboxOnce(transport);
    await runOutboxOnce(transport, minutesLater(10_000));
    expect(server.received).toEqual([]);
    const ref = { tripId: cast.tripId };
    const { ctx } = cast.leader;
    expect(await listMessages({ ctx, input: ref })).toMatchObject([
      { state: "failed", attempts: 1, lastError: expect.stringContaining("550") },
    ]);
    for (const [who, code] of [
      [cast.stranger, "not-found"],
      [cast.otherLeader, "not-found"],
      [cast.participant, "forbidden"],
      [cast.coLeader, "forbidden"],
    ] as const) {
      await expect(retryMessage({ ctx: who.ctx, input: { ...ref, messageId: id } })).rejects.toMatchObject({ code });
      await expect(listMessages({ ctx: who.ctx, input: ref })).rejects.toMatchObject({ code });
    }
    await retryMessage({ ctx, input: { ...ref, messageId: id } });
    await runOutboxOnce(transport);
    expect(server.received).toHaveLength(1);
    await expect(retryMessage({ ctx, input: { ...ref, messageId: id } })).rejects.toMatchObject({ code: "conflict" });
  });

  it("loses nothing while the mail server is down, and sends when it is back", async () => {
    const dead = await startMailServer();
    await dead.close();
    const nowhere = createTransport(dead.url);
    const ids = await Promise.all([1, 2, 3].map((n) => enqueue({ to: { name: "A", address: `a${n}@example.test` } })));
    expect(await runOutboxOnce(nowhere)).toBe(3);
    for (const id of ids) expect(await load(id)).toMatchObject({ state: "waiting", attempts: 1 });
    expect((await load(ids[0] ?? ""))?.lastError).toBe("The mail server could not be reached.");
    await runOutboxOnce(transport, minutesLater(2));
    expect(server.received).toHaveLength(3);
  });

  it("takes over what a stopped worker had begun, with the same Message-ID, and lets two workers share", async () => {
    const id = await enqueue();
    await getDb()
      .update(outboxMessage)
      .set({ state: "sending", attempts: 1, leaseUntil: new Date(Date.now() + 60_000) })
      .where(eq(outboxMessage.id, id));
    expect(await runOutboxOnce(transport)).toBe(0);
    await Promise.all([runOutboxOnce(transport, minutesLater(3)), runOutboxOnce(transport, minutesLater(3))]);
    expect(server.received.map((one) => one.mail.messageId)).toEqual([(await load(id))?.messageId]);
  });

  it("keeps the order for each person: the later one waits for the earlier", async () => {
    server.answerWith(451);
    await enqueue({ mail: mail("first"), createdAt: new Date(Date.now() - 2000) });
    await enqueue({ mail: mail("second"), createdAt: new Date(Date.now() - 1000) });
    await enqueue({ mail: mail("other"), to: { name: "Bo", address: "bo@example.test" } });
    await runOutboxOnce(transport);
    expect(server.received.map((one) => one.mail.subject)).toEqual(["other"]);
    await runOutboxOnce(transport, minutesLater(2));
    expect(server.received.map((one) => one.mail.subject)).toEqual(["other", "first", "second"]);
  });

  it.each([
    "a@x.test\r\nRCPT TO:<evil@x.test>",
    "a@x.test, evil@x.test",
    "Smith, evil@x.test <a@x.test>",
    "g: evil@x.test;",
    "",
  ])("takes no address like %j", async (address) => {
    await expect(enqueue({ to: { name: "A", address } })).rejects.toThrow();
    await expect(enqueue({ replyTo: { name: "A", address } })).rejects.toThrow();
    expect(await getDb().select().from(outboxMessage)).toEqual([]);
  });

  it("lets no line break of a name, subject or file name become a header", async () => {
    await enqueue({
      to: { name: 'Ada\r\nBcc: evil@x.test "<evil@x.test>"', address: "ada@example.test" },
      replyTo: { name: "L\r\nBcc: evil@x.test", address: "leader@example.test" },
      mail: { ...mail(), subject: "Hello\r\nBcc: evil@x.test" },
      files: [{ fileName: 'a"\r\nX-Evil: 1/../b.pdf', contentType: "application/pdf", content: Buffer.from("x") }],
    });
    await runOutboxOnce(transport);
    const [got] = server.received;
    expect(got?.recipients).toEqual(["ada@example.test"]);
    expect(got?.mail.bcc).toBeUndefined();
    expect(got?.mail.headers.has("x-evil")).toBe(false);
    expect(got?.raw).not.toMatch(/^(Bcc|X-Evil):/im);
    expect(got?.mail.attachments[0]?.filename).not.toMatch(/["\r\n/\\]/);
  });

  it("escapes what people wrote in the HTML part", () => {
    const { html } = renderLetter({
      subject: "<script>alert(1)</script>",
      greeting: "Hello <img src=x onerror=alert(1)>",
      paragraphs: ['"><b>'],
      link: { label: "<i>", url: 'https://x.test/?a="><script>' },
      footnotes: [],
    });
    expect(html).not.toMatch(/<(script|img|b|i)[ >]/);
  });
});

describe("waiting between tries", () => {
  it("is 1, 5, 30 min, 2 h, 8 h ± 20 %, then over for refusals; three days when nobody answers", () => {
    const minutes = (attempts: number, chance: number) =>
      (nextTryInMs({ responseCode: 451, attempts, ageMs: 0 }, chance) ?? Number.NaN) / 60_000;
    expect([1, 2, 3, 4, 5].map((attempts) => minutes(attempts, 0.5))).toEqual([1, 5, 30, 120, 480]);
    expect(minutes(1, 0)).toBeCloseTo(0.8);
    expect(minutes(1, 1)).toBeCloseTo(1.2);
    expect(nextTryInMs({ responseCode: 451, attempts: 6, ageMs: 0 }, 0)).toBeNull();
    expect(nextTryInMs({ responseCode: 550, attempts: 1, ageMs: 0 }, 0)).toBeNull();
    expect(nextTryInMs({ responseCode: null, attempts: 20, ageMs: 2 * 86_400_000 }, 0.5)).toBe(480 * 60_000);
    expect(nextTryInMs({ responseCode: null, attempts: 20, ageMs: 4 * 86_400_000 }, 0.5)).toBeNull();
  });
});

describe("the local fake server", () => {
  it("keeps what it is sent and passes nothing on", async () => {
    const fake = await startFakeSmtpServer(captureMail);
    const toFake = createTransport(fake.url);
    await enqueue({ mail: mail("For the demo") });
    await runOutboxOnce(toFake);
    toFake.close();
    await fake.close();
    const rows = await getDb().select().from(capturedMail);
    expect(rows).toMatchObject([{ toAddress: "ada@example.test", subject: "For the demo" }]);
    expect(rows[0]?.raw.toString()).toContain("Auto-Submitted: auto-generated");
  });
});

const fakeSource = (): PaperSource & { rendered: string[] } => {
  const rendered: string[] = [];
  return {
    rendered,
    getDocument: async ({ input }) =>
      ({ kind: input.paper.kind, of: "personId" in input.paper ? input.paper.personId : "" }) as never,
    render: async (documents, { size }) => {
      const text = `%PDF ${size} ${JSON.stringify(documents)}`;
      rendered.push(text);
      return Buffer.from(text);
    },
  };
};

describe("sending papers", () => {
  const input = (cast: Awaited<ReturnType<typeof makeCast>>) => ({
    tripId: cast.tripId,
    requestId: newId(),
    personIds: [cast.personIds.coLeader, cast.personIds.participant],
    pieces: ["pack-list" as const, "booklet" as const],
    subject: "Your papers",
    message: "Bring dry socks.",
    paperSize: "A4" as const,
  });

  it("gives each person their own pages; what is the same for all is rendered and kept once", async () => {
    const cast = await makeCast();
    const source = fakeSource();
    expect(await sendPapers({ ctx: cast.leader.ctx, input: input(cast), source })).toEqual({ messageCount: 2 });
    expect(source.rendered).toHaveLength(3);
    await runOutboxOnce(transport);
    const mine = server.received.find((one) => one.recipients[0] === cast.participant.email);
    expect(mine?.mail.attachments.map((one) => one.filename)).toEqual([
      `Pack list ${cast.participant.name}.pdf`,
      "Booklet.pdf",
    ]);
    expect(mine?.mail.attachments[0]?.content.toString()).toContain(cast.personIds.participant);
    const bytes = mine?.mail.attachments.map((one) => one.content.toString()).join() ?? "";
    expect(bytes).not.toContain(cast.personIds.coLeader);
    expect(mine?.mail.text).toContain("Bring dry socks.");
    expect(await getDb().select().from(outboxAttachment)).toHaveLength(4);
    const messages = await listMessages({ ctx: cast.leader.ctx, input: { tripId: cast.tripId } });
    expect(messages.map((one) => [one.state, one.files.length])).toEqual([
      ["sent", 2],
      ["sent", 2],
    ]);
  });

  it("has one effect for a double click and for a repeat", async () => {
    const cast = await makeCast();
    const once = input(cast);
    const call = () => sendPapers({ ctx: cast.leader.ctx, input: once, source: fakeSource() });
    expect(await Promise.all([call(), call()])).toEqual([{ messageCount: 2 }, { messageCount: 2 }]);
    expect(await call()).toEqual({ messageCount: 2 });
    expect(await getDb().select().from(outboxMessage)).toHaveLength(2);
  });

  it.each(["stranger", "otherLeader", "participant", "coLeader"] as const)("is refused to %s", async (who) => {
    const cast = await makeCast();
    const source = fakeSource();
    const code = who === "stranger" || who === "otherLeader" ? "not-found" : "forbidden";
    await expect(sendPapers({ ctx: cast[who].ctx, input: input(cast), source })).rejects.toMatchObject({ code });
    expect(source.rendered).toEqual([]);
    expect(await getDb().select().from(outboxMessage)).toEqual([]);
  });

  it("sends nothing to anybody when one of them is on another trip", async () => {
    const cast = await makeCast();
    const personIds = [cast.personIds.participant, cast.otherPersonId];
    const call = sendPapers({ ctx: cast.leader.ctx, input: { ...input(cast), personIds }, source: fakeSource() });
    await expect(call).rejects.toMatchObject({ code: "not-found" });
    expect(await getDb().select().from(outboxMessage)).toEqual([]);
  });

  it("writes nothing when a paper can't be rendered", async () => {
    const cast = await makeCast();
    const source = { ...fakeSource(), render: () => Promise.reject(new Error("no ink")) };
    await expect(sendPapers({ ctx: cast.leader.ctx, input: input(cast), source })).rejects.toThrow("no ink");
    expect(await getDb().select().from(outboxMessage)).toEqual([]);
    expect(await getDb().select().from(outboxFile)).not.toContainEqual(expect.objectContaining({ id: "no ink" }));
  });

  it("says which piece is empty for whom", async () => {
    const cast = await makeCast();
    const call = sendPapers({
      ctx: cast.leader.ctx,
      input: { ...input(cast), pieces: ["pitch-cards"] },
      source: fakeSource(),
    });
    await expect(call).rejects.toMatchObject({ code: "bad-input", fieldErrors: { pieces: [expect.any(String)] } });
  });

  it.each([
    ["personIds", { personIds: [] }],
    ["personIds", { personIds: Array.from({ length: 101 }, () => newId()) }],
    ["pieces", { pieces: [], message: "" }],
    ["subject", { subject: "" }],
    ["subject", { subject: "x".repeat(100_000) }],
    ["message", { message: "x".repeat(1_000_000) }],
    ["requestId", { requestId: "1" }],
    ["paperSize", { paperSize: "A0" }],
  ])("names the field %s for bad input %#", async (field, bad) => {
    const cast = await makeCast();
    const call = sendPapers({
      ctx: cast.leader.ctx,
      input: { ...input(cast), ...bad } as Parameters<typeof sendPapers>[0]["input"],
      source: fakeSource(),
    });
    await expect(call).rejects.toMatchObject({ code: "bad-input", fieldErrors: { [field]: [expect.any(String)] } });
  });

  it("refuses with a time to wait when somebody sends too much", async () => {
    const leader = await makeUser();
    const cast = await makeCast();
    await makePerson(cast.tripId, "leader", leader);
    const personIds = [
      ...Object.values(cast.personIds),
      ...(await Promise.all(
        Array.from({ length: 97 }, (_, n) =>
          makePerson(cast.tripId, "participant", { name: `G${n}`, email: `g${n}@example.test` }),
        ),
      )),
    ];
    const call = () =>
      sendPapers({
        ctx: leader.ctx,
        input: { ...input(cast), requestId: newId(), personIds, pieces: ["booklet"] },
        source: fakeSource(),
      });
    for (let index = 0; index < 3; index += 1) expect(await call()).toEqual({ messageCount: 100 });
    await expect(call()).rejects.toMatchObject({ code: "too-many", retryAfterS: expect.any(Number), status: 429 });
    expect(await getDb().select().from(outboxMessage)).toHaveLength(300);
    expect(await readOutbox("g0@example.test")).toHaveLength(3);
  });
});
