import { ORIGIN, Browser } from "../../helpers/browser";
import "../../helpers/database";
import { createAccount } from "@/lib/services/account/create-account";
import { beforeAll, describe, expect, it } from "vitest";
import { z } from "zod";
import { AppError, ERROR_STATUS, type ErrorCode } from "@/lib/errors";
import { idSchema } from "@/lib/domain/ids";
import { route } from "@/lib/http/route";

const PASSWORD = "four pegs in wet sand";
const browser = new Browser();
let calls = 0;

beforeAll(async () => {
  await createAccount({ input: { name: "Ada", email: "ada@example.test", password: PASSWORD } });
  await browser.call("/sign-in/email", { email: "ada@example.test", password: PASSWORD });
});

const echo = route({
  params: z.object({ id: idSchema }),
  query: z.object({ size: z.enum(["A4", "LETTER"]).default("A4") }),
  body: z.object({ count: z.number().int().min(1) }),
  maxBytes: 1000,
  handler: ({ ctx, params, query, body }) => {
    calls += 1;
    return { name: ctx.actor.name, ...params, ...query, ...body };
  },
});
const ID = "a".repeat(26);

function post(
  body: string,
  more: { headers?: Record<string, string>; id?: string; from?: Browser; query?: string } = {},
) {
  const request = new Request(`${ORIGIN}/api/things/x${more.query ?? ""}`, {
    method: "POST",
    headers: (more.from ?? browser).headers({ "content-type": "application/json", ...more.headers }),
    body,
  });
  return echo(request, { params: Promise.resolve({ id: more.id ?? ID }) });
}

describe("a route", () => {
  it("answers with what its handler gives, never to be kept", async () => {
    const response = await post('{"count":2}', { query: "?size=LETTER" });
    expect(response.status).toBe(200);
    expect(await response.json()).toEqual({ name: "Ada", id: ID, size: "LETTER", count: 2 });
    expect(response.headers.get("cache-control")).toBe("private, no-store");
  });

  it.each([
    ["nobody is signed in", '{"count":2}', { from: new Browser() }, 401],
    ["the body is not JSON", "{", {}, 400],
    ["the body is of another type", "count=2", { headers: { "content-type": "text/plain" } }, 400],
    ["the body is not UTF-8 JSON at all", "\u0000", {}, 400],
    ["the body is too large", `{"count":2,"x":"${"x".repeat(1000)}"}`, {}, 413],
    ["a field is missing", "{}", {}, 400],
    ["a field is null", "null", {}, 400],
    ["a number is a text", '{"count":"2"}', {}, 400],
    ["a number is too large to be one", '{"count":1e400}', {}, 400],
    ["the prototype is set", '{"__proto__":{"count":2}}', {}, 400],
    ["a query is unknown", '{"count":2}', { query: "?size=A0" }, 400],
    ["the identifier has no form", '{"count":2}', { id: "../../etc" }, 404],
    ["another site asks", '{"count":2}', { headers: { origin: "https://evil.test" } }, 403],
    ["a sandboxed page asks", '{"count":2}', { headers: { origin: "null" } }, 403],
  ] as const)("refuses when %s", async (_, body, more, status) => {
    const before = calls;
    const response = await post(body, more);
    expect(response.status).toBe(status);
    expect(await response.json()).toMatchObject({
      error: {
        code: expect.any(String),
        message: expect.any(String),
        requestId: expect.stringMatching(/^[0-9a-z]{26}$/),
      },
    });
    expect(response.headers.get("cache-control")).toBe("private, no-store");
    expect(calls).toBe(before);
  });

  it("refuses a body without length that grows beyond the limit", async () => {
    let sent = 0;
    const body = new ReadableStream<Uint8Array>({
      pull(controller) {
        sent += 500;
        controller.enqueue(new Uint8Array(500).fill(32));
        if (sent > 1_000_000) controller.close();
      },
    });
    const request = new Request(`${ORIGIN}/api/things/x`, {
      method: "POST",
      headers: browser.headers({ "content-type": "application/json" }),
      body,
      duplex: "half",
    } as RequestInit);
    const response = await echo(request, { params: Promise.resolve({ id: ID }) });
    expect(response.status).toBe(413);
    expect(sent).toBeLessThan(10_000);
  });

  it.each(Object.entries(ERROR_STATUS) as [ErrorCode, number][])("maps %s to %i", async (code, status) => {
    const failing = route({
      handler: () => {
        throw new AppError(code, "A sentence.", code === "too-many" ? { retryAfterS: 7 } : {});
      },
    });
    const request = new Request(`${ORIGIN}/api/x`, { headers: browser.headers() });
    const response = await failing(request, { params: Promise.resolve({}) });
    expect(response.status).toBe(status);
    expect(response.headers.get("retry-after")).toBe(code === "too-many" ? "7" : null);
  });

  it("tells nothing of an error that is ours", async () => {
    const failing = route({
      handler: () => {
        throw new Error("secret path /root/x");
      },
    });
    const request = new Request(`${ORIGIN}/api/x`, { headers: browser.headers() });
    const response = await failing(request, { params: Promise.resolve({}) });
    expect(response.status).toBe(500);
    const text = await response.text();
    expect(text).not.toContain("secret");
    expect(JSON.parse(text)).toMatchObject({ error: { code: "internal", requestId: expect.any(String) } });
  });
});
