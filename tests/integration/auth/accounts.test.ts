import { ORIGIN, Browser } from "../../helpers/browser";
import { readFileSync } from "node:fs";
import { databaseFile } from "../../helpers/database";
import { clearLimits, readLinkToken, readOutbox } from "../../helpers/outbox";
import { eq } from "drizzle-orm";
import { beforeEach, describe, expect, it } from "vitest";
import { checkpointDb, getDb } from "@/db/client";
import { session, user } from "@/db/schema";
import { readContext } from "@/lib/auth/session";

const PASSWORD = "four pegs in wet sand";
let count = 0;
const newEmail = () => `walker-${(count += 1)}@example.test`;

async function signUp(email: string, body: Record<string, unknown> = {}) {
  return new Browser().call("/sign-up/email", { name: "Ada Moss", email, password: PASSWORD, ...body });
}

async function makeVerified(email = newEmail()): Promise<string> {
  expect((await signUp(email)).status).toBe(200);
  const token = await readLinkToken(email);
  expect((await new Browser().call(`/verify-email?token=${encodeURIComponent(token)}`)).status).toBe(200);
  return email;
}

async function signIn(email: string, password = PASSWORD, browser = new Browser()) {
  const response = await browser.call("/sign-in/email", { email, password });
  return { browser, response };
}

beforeEach(clearLimits);

describe("signing up", () => {
  it("needs a confirmed address before the first sign-in", async () => {
    const email = newEmail();
    expect((await signUp(email)).status).toBe(200);
    const { response } = await signIn(email);
    expect(response.status).toBe(403);
    const token = await readLinkToken(email);
    await new Browser().call(`/verify-email?token=${encodeURIComponent(token)}`);
    const later = await signIn(email);
    expect(later.response.status).toBe(200);
    expect(await readContext(later.browser.headers())).toMatchObject({ actor: { email, name: "Ada Moss" } });
  });

  it("answers the same whether an address has an account or not, and tells the owner by mail", async () => {
    const known = await makeVerified();
    const first = await signUp(newEmail());
    const second = await signUp(known);
    expect(second.status).toBe(first.status);
    const shape = async (response: Response) => Object.keys((await response.json()).user).sort();
    expect(await shape(second)).toEqual(await shape(first));
    expect((await readOutbox(known)).at(-1)).toMatchObject({ kind: "existing-account" });
    expect((await signIn(known)).response.status).toBe(200);
  });

  it.each([
    ["7 characters", "a1b2c3d", 400],
    ["8 characters", "q7!xZr2k", 200],
    ["64 characters", "k".repeat(30) + "lmnopqrstuvw".repeat(3).slice(0, 34), 200],
    ["128 characters", "x7 ".repeat(43).slice(0, 128), 200],
    ["129 characters", "x7 ".repeat(43), 400],
    ["the most common one", "password", 400],
    ["a row of digits", "12345678", 400],
    ["a common one in capitals", "QWERTY123", 400],
    ["one letter only", "aaaaaaaaaaaaaaaa", 400],
    ["spaces and letters", "a camp in the lee of", 200],
  ])("password: %s → %s", async (_, password, status) => {
    expect((await signUp(newEmail(), { password })).status).toBe(status);
  });

  it("does not sign in with the first 72 characters of a long password", async () => {
    const email = newEmail();
    const password = "x7 ".repeat(42);
    await signUp(email, { password });
    await new Browser().call(`/verify-email?token=${encodeURIComponent(await readLinkToken(email))}`);
    expect((await signIn(email, password.slice(0, 72))).response.status).toBe(401);
    expect((await signIn(email, password)).response.status).toBe(200);
  });

  it("refuses a name that is too long or empty and cleans control characters and direction marks", async () => {
    expect((await signUp(newEmail(), { name: "x".repeat(10_001) })).status).toBe(400);
    expect((await signUp(newEmail(), { name: "\u0000\u202E" })).status).toBe(400);
    const email = newEmail();
    await signUp(email, { name: "Ada\r\nBcc: x@evil.test\u202E" });
    const [row] = await getDb().select().from(user).where(eq(user.email, email));
    expect(row?.name).toBe("AdaBcc: x@evil.test");
  });

  it("takes no rights, ids or pictures from the form", async () => {
    const email = newEmail();
    await signUp(email, { emailVerified: true, id: "x".repeat(26), image: "javascript:alert(1)", role: "leader" });
    const [row] = await getDb().select().from(user).where(eq(user.email, email));
    expect(row).toMatchObject({ emailVerified: false, image: null });
    expect(row?.id).toMatch(/^[0-9a-z]{26}$/);
  });

  it.each([
    "a@x.test\r\nRCPT TO:<evil@x.test>",
    "a@x.test, b@x.test",
    "Smith, evil@x.test <a@x.test>",
    "a@x.test\u0000",
    "group: a@x.test;",
  ])("refuses the address %j", async (email) => {
    expect((await signUp(email)).status).toBe(400);
    expect(await getDb().select().from(user).where(eq(user.name, "evil"))).toEqual([]);
  });
});

describe("signing in", () => {
  it("sets a cookie that scripts and other sites don't get, and adopts none that was preset", async () => {
    const email = await makeVerified();
    const browser = new Browser();
    browser.jar.set("leestead.session_token", "preset-by-somebody-else.signature");
    await signIn(email, PASSWORD, browser);
    const cookie = browser.lastSetCookies.find((one) => one.startsWith("leestead.session_token=")) ?? "";
    expect(cookie).toMatch(/HttpOnly/i);
    expect(cookie).toMatch(/SameSite=Lax/i);
    expect(cookie).toMatch(/Path=\//i);
    expect(cookie).not.toMatch(/Domain=/i);
    expect(cookie).not.toContain("preset");
    const token = decodeURIComponent(cookie.split(";")[0]?.split("=")[1] ?? "").split(".")[0] ?? "";
    expect(token.length).toBeGreaterThanOrEqual(32);
  });

  it("answers the same to a wrong password and to an unknown address", async () => {
    const email = await makeVerified();
    const wrong = await signIn(email, "not the password at all");
    const unknown = await signIn(newEmail(), "not the password at all");
    expect(wrong.response.status).toBe(401);
    expect(unknown.response.status).toBe(401);
    expect(await unknown.response.json()).toEqual(await wrong.response.json());
  });

  it("refuses another origin, with and without a cookie", async () => {
    const email = await makeVerified();
    const { browser } = await signIn(email);
    const foreign = { origin: "https://evil.test" };
    const change = { currentPassword: PASSWORD, newPassword: "another four words here" };
    expect((await browser.call("/change-password", change, foreign)).status).toBe(403);
    expect((await browser.call("/change-password", change, { origin: "null" })).status).toBe(403);
    const signedOut = await new Browser().call("/sign-in/email", { email, password: PASSWORD }, foreign);
    expect(signedOut.status).toBe(403);
  });

  it.each(["https://evil.test", "//evil.test", "/\\evil.test", "javascript:alert(1)"])(
    "does not lead to %s afterwards",
    async (callbackURL) => {
      const email = await makeVerified();
      const response = await new Browser().call("/sign-in/email", { email, password: PASSWORD, callbackURL });
      expect(response.status).toBe(403);
    },
  );

  it("pauses an account after ten wrong passwords, wherever they come from, and says how long", async () => {
    const email = await makeVerified();
    for (let attempt = 0; attempt < 10; attempt += 1) {
      expect((await signIn(email, `wrong password ${attempt}`)).response.status).toBe(401);
    }
    const { response } = await signIn(email);
    expect(response.status).toBe(429);
    expect(Number(response.headers.get("retry-after"))).toBeGreaterThan(0);
    await clearLimits();
    expect((await signIn(email)).response.status).toBe(200);
  });

  it("refuses a body that is too large, not JSON, or of the wrong type without a 500", async () => {
    for (const body of ["x".repeat(20_000), "{", '{"email":1,"password":[]}', "null", '{"__proto__":{"a":1}}']) {
      const response = await new Browser().call("/sign-in/email", body);
      expect(response.status).toBeGreaterThanOrEqual(400);
      expect(response.status).toBeLessThan(500);
    }
  });
});

describe("the limit of requests", () => {
  it("answers 429 with Retry-After, keeps its count in the database, and is shared while no address is trusted", async () => {
    const statuses: number[] = [];
    let last: Response | undefined;
    for (let index = 0; index < 31; index += 1) {
      last = await new Browser({ "x-forwarded-for": `192.0.2.${index}` }).call("/request-password-reset", {
        email: newEmail(),
      });
      statuses.push(last.status);
    }
    expect(statuses.slice(0, 30).every((status) => status === 200)).toBe(true);
    expect(statuses[30]).toBe(429);
    expect(Number(last?.headers.get("retry-after"))).toBeGreaterThan(0);
    expect(last?.headers.get("cache-control")).toBe("private, no-store");
  });
});

describe("a new password", () => {
  it("signs everybody out, works once, and its token is nowhere in the database in plain text", async () => {
    const email = await makeVerified();
    const { browser } = await signIn(email);
    expect(await readContext(browser.headers())).not.toBeNull();
    await new Browser().call("/request-password-reset", { email });
    const token = await readLinkToken(email);
    await getDb().run("delete from outbox_message");
    await getDb().run("vacuum");
    await checkpointDb();
    expect(readFileSync(databaseFile).includes(token)).toBe(false);

    const newPassword = "another four words here";
    expect((await new Browser().call("/reset-password", { token, newPassword: "password" })).status).toBe(400);
    expect((await new Browser().call("/reset-password", { token, newPassword })).status).toBe(200);
    expect(await readContext(browser.headers())).toBeNull();
    expect((await new Browser().call("/reset-password", { token, newPassword })).status).toBe(400);
    expect((await signIn(email)).response.status).toBe(401);
    expect((await signIn(email, newPassword)).response.status).toBe(200);
  });

  it("sends the link to our own address, whatever Host the request names, and answers unknown addresses alike", async () => {
    const email = await makeVerified();
    const known = await new Browser().call(
      "/request-password-reset",
      { email, redirectTo: "/reset-password" },
      { host: "evil.test", "x-forwarded-host": "evil.test" },
    );
    const unknown = await new Browser().call("/request-password-reset", { email: newEmail() });
    expect(await known.json()).toEqual(await unknown.json());
    const mail = (await readOutbox(email)).at(-1);
    expect(mail?.text).toContain(`${ORIGIN}/reset-password?token=`);
    expect(mail?.text).not.toContain("evil.test");
  });

  it("when changed, ends the other sessions even if the request does not ask for it", async () => {
    const email = await makeVerified();
    const { browser: here } = await signIn(email);
    const { browser: there } = await signIn(email);
    const change = { currentPassword: PASSWORD, newPassword: "another four words here", revokeOtherSessions: false };
    expect((await here.call("/change-password", change)).status).toBe(200);
    expect(await readContext(here.headers())).not.toBeNull();
    expect(await readContext(there.headers())).toBeNull();
  });
});

describe("a session", () => {
  it("ends at sign-out, also for a copy of the cookie", async () => {
    const { browser } = await signIn(await makeVerified());
    const copy = new Browser();
    for (const [name, value] of browser.jar) copy.jar.set(name, value);
    await browser.call("/sign-out", {});
    expect(await readContext(copy.headers())).toBeNull();
  });

  it("ends when idle too long, and after 30 days whatever its use", async () => {
    const email = await makeVerified();
    const { browser } = await signIn(email);
    const actor = (await readContext(browser.headers()))?.actor;
    const mine = eq(session.userId, actor?.userId ?? "");
    const day = 86_400_000;
    await getDb()
      .update(session)
      .set({ createdAt: new Date(Date.now() - 31 * day) })
      .where(mine);
    expect(await readContext(browser.headers())).toBeNull();
    const refused = await browser.call("/update-user", { name: "Somebody Else" });
    expect(refused.status).toBe(401);

    const again = await signIn(email);
    await getDb()
      .update(session)
      .set({ expiresAt: new Date(Date.now() - 1000) })
      .where(mine);
    expect(await readContext(again.browser.headers())).toBeNull();
  });

  it("needs the password to delete the account, and ends with it", async () => {
    const email = await makeVerified();
    const { browser } = await signIn(email);
    expect((await browser.call("/delete-user", { password: "not the password at all" })).status).toBe(400);
    expect((await browser.call("/delete-user", { password: PASSWORD })).status).toBe(200);
    expect(await readContext(browser.headers())).toBeNull();
    expect(await getDb().select().from(user).where(eq(user.email, email))).toEqual([]);
  });
});
