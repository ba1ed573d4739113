import { Browser } from "../../helpers/browser";
import { makeCast, makeUser } from "../../helpers/actors";
import { databaseFile } from "../../helpers/database";
import { clearLimits, readLinkToken, readOutbox } from "../../helpers/outbox";
import { codeOf } from "../../helpers/refusals";
import { readFileSync } from "node:fs";
import { eq, like } from "drizzle-orm";
import { beforeEach, describe, expect, it } from "vitest";
import { checkpointDb, getDb } from "@/db/client";
import { user, verification } from "@/db/schema";
import { readContext } from "@/lib/auth/session";
import { signUpWithInvitation } from "@/lib/services/invitations/sign-up-with-invitation";
import { createPerson } from "@/lib/services/people/create-person";

beforeEach(clearLimits);

const ask = (email: string) => new Browser().call("/sign-in/magic-link", { email });

async function open(token: string) {
  const browser = new Browser();
  const response = await browser.call(`/magic-link/verify?token=${encodeURIComponent(token)}`);
  return { browser, response, ctx: await readContext(browser.headers()) };
}

describe("signing in by a link", () => {
  it("works once, for who has the mail; the token is nowhere in the file", async () => {
    const { email, id } = await makeUser();
    expect((await ask(email)).status).toBe(200);
    const token = await readLinkToken(email);
    expect((await readOutbox(email)).map((one) => one.kind)).toEqual(["sign-in-link"]);
    expect((await open(token)).ctx?.actor.userId).toBe(id);
    expect((await open(token)).ctx).toBeNull();
    await checkpointDb();
    // The mail itself waits in the outbox; nothing else may know the token.
    await getDb().$client.execute("delete from outbox_message");
    await getDb().$client.execute("vacuum");
    await checkpointDb();
    expect(readFileSync(databaseFile).includes(token)).toBe(false);
  });

  it("is over after its time", async () => {
    const { email } = await makeUser();
    await ask(email);
    await getDb()
      .update(verification)
      .set({ expiresAt: new Date(Date.now() - 1000) })
      .where(like(verification.identifier, "%"));
    expect((await open(await readLinkToken(email))).ctx).toBeNull();
  });

  it("makes no account, and answers the same whether there is one", async () => {
    const { email } = await makeUser();
    const known = await ask(email);
    const unknown = await ask("nobody-here@example.test");
    expect([unknown.status, await unknown.text()]).toEqual([known.status, await known.text()]);
    expect(await readOutbox("nobody-here@example.test")).toEqual([]);
    expect(await getDb().select().from(user).where(eq(user.email, "nobody-here@example.test"))).toEqual([]);
  });

  it("is not sent to an account whose address nobody has confirmed", async () => {
    const { email } = await makeUser({ emailVerified: false });
    await ask(email);
    expect(await readOutbox(email)).toEqual([]);
  });

  it.each(["", "x", "a".repeat(32), "../../x", "x".repeat(5000)])("takes no token like %j", async (token) => {
    const { response, ctx } = await open(token);
    expect(response.status).toBeLessThan(500);
    expect(ctx).toBeNull();
  });

  it("is how somebody signs in who joined without a password", async () => {
    const { leader, tripId } = await makeCast();
    const email = "no-password@example.test";
    await createPerson({ ctx: leader.ctx, input: { tripId, name: "Wren", email, role: "participant" } });
    await signUpWithInvitation({ input: { token: await readLinkToken(email), name: "Wren", password: "" } });
    await ask(email);
    const { ctx } = await open(await readLinkToken(email));
    expect(ctx?.actor.email).toBe(email);
    const wrong = await new Browser().call("/sign-in/email", { email, password: "four pegs in wet sand" });
    expect(wrong.status).toBe(401);
  });
});

describe("two accounts for one address", () => {
  const PASSWORD = "four pegs in wet sand";
  const signUp = (email: string) => new Browser().call("/sign-up/email", { name: "Second", email, password: PASSWORD });
  const countOf = async (email: string) => (await getDb().select().from(user).where(like(user.email, email))).length;

  it.each([
    ["capitals", "KIM@EXAMPLE.TEST"],
    ["spaces around it", " kim@example.test "],
    ["the Kelvin sign for a k", "\u212Aim@example.test"],
    ["wide letters", "ｋｉｍ@example.test"],
    ["a letter of another script", "kіm@example.test"],
    ["a mark that joins the letter", "kim\u0301@example.test"],
    ["a dotted capital i", "k\u0130m@example.test"],
    ["a space of no width", "ki\u200Bm@example.test"],
  ])("is refused with %s", async (_, form) => {
    await getDb().delete(user).where(eq(user.email, "kim@example.test"));
    await makeUser({ email: "kim@example.test", name: "Kim" });
    const before = (await getDb().select().from(user)).length;
    const response = await signUp(form);
    expect(response.status).toBeLessThan(500);
    expect(await getDb().select().from(user)).toHaveLength(before);
    expect(await countOf("kim@example.test")).toBe(1);
  });

  it("nor can one address be on a trip twice", async () => {
    const { leader, tripId } = await makeCast();
    const add = (email: string) =>
      createPerson({ ctx: leader.ctx, input: { tripId, name: "Kim", email, role: "participant" } });
    await add("kim.b@example.test");
    expect(await codeOf(add("KIM.B@example.test"))).toBe("conflict");
    expect(await codeOf(add("\u212Aim.b@example.test"))).toBe("conflict");
    expect(await codeOf(add("ｋim.b@example.test"))).toBe("bad-input");
  });
});
