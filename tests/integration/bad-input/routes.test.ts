import { Browser, ORIGIN } from "../../helpers/browser";
import { placementOf } from "../../helpers/camp-kit";
import { HOSTILE, SEED, spoilt } from "../../helpers/hostile-values";
import { clearLimits } from "../../helpers/outbox";
import { hashTables, keepRows } from "../../helpers/table-hash";
import { makeTwoTrips, type TwoTrips } from "../../helpers/two-trips";
import fc from "fast-check";
import { beforeAll, beforeEach, describe, expect, it } from "vitest";
import { GET as getAuthRoute, POST as postAuthRoute } from "@/app/api/auth/[...all]/route";
import { POST as postQuickCheck } from "@/app/api/quick-check/route";
import { POST as postAnalysis } from "@/app/api/trips/[tripId]/camps/[campId]/analyses/route";
import { PATCH as patchPitch } from "@/app/api/trips/[tripId]/camps/[campId]/pitches/[pitchId]/route";
import { GET as getPlan, POST as postPlan } from "@/app/api/trips/[tripId]/camps/[campId]/plan/route";
import { GET as getPapers } from "@/app/api/trips/[tripId]/papers/route";
import { GET as getMailFile } from "@/app/demo/mail/[id]/[n]/route";
import { newId } from "@/lib/domain/ids";

type Params = Record<string, string>;
type Handler = (request: Request, segment: { params: Promise<never> }) => Promise<Response>;

let given: TwoTrips;
let restore: () => Promise<void>;
let before: Awaited<ReturnType<typeof hashTables>>;

beforeAll(async () => {
  given = await makeTwoTrips();
  restore = await keepRows();
  before = await hashTables();
});

beforeEach(async () => {
  await restore();
  await clearLimits();
});

interface Target {
  readonly name: string;
  readonly method: "POST" | "PATCH";
  readonly handler: Handler;
  readonly params: () => Params;
  readonly maxBytes: number;
  readonly body: () => object;
}

const asHandler = (handler: unknown) => handler as Handler;
const details = { headingDeg: 10, patch: "main", dimensions: { ridgeHeightM: 1.3 }, lineLengthsM: { "hem-left": 0.5 } };
const section = { shape: "three-blade", bladeM: 0.02, thicknessM: 0.0012 };
const spec = { class: "stake", section, lengthM: 0.2, material: "aluminium-7075", headRatingN: null };

const TARGETS: readonly Target[] = [
  {
    name: "plan",
    method: "POST",
    handler: asHandler(postPlan),
    params: () => ({ tripId: given.a.tripId, campId: given.a.campId }),
    maxBytes: 1024 * 1024,
    body: () => {
      const { pitchId, bladeId, wideId } = given.a;
      const tandem = { anchorId: wideId, spacingM: 0.3 };
      const placement = placementOf(pitchId, "hem-left", bladeId, { tandem });
      const from = { pitchId, tieOutId: "ridge-front" };
      const changes = [
        { type: "place", placement },
        { type: "swap", from, to: { pitchId, tieOutId: "ridge-rear" } },
        { type: "lift", ...from },
        { type: "replace", placements: [placement] },
      ];
      return { intents: changes.map((change) => ({ intentId: newId(), baseVersion: 1, change })) };
    },
  },
  {
    name: "pitches",
    method: "PATCH",
    handler: asHandler(patchPitch),
    params: () => ({ tripId: given.a.tripId, campId: given.a.campId, pitchId: given.a.pitchId }),
    maxBytes: 256 * 1024,
    body: () => ({ version: 1, details }),
  },
  {
    name: "analyses",
    method: "POST",
    handler: asHandler(postAnalysis),
    params: () => ({ tripId: given.a.tripId, campId: given.a.campId }),
    maxBytes: 256 * 1024,
    body: () => ({ pitchId: given.a.pitchId, details }),
  },
  {
    name: "quick-check",
    method: "POST",
    handler: asHandler(postQuickCheck),
    params: () => ({}),
    maxBytes: 16 * 1024,
    body: () => ({
      anchor: spec,
      ground: { kind: "firm-moist-loam", wetness: "usual", slopeDeg: 3, learned: { factor: 1, scatter: 0.2 } },
      lineAngleDeg: { from: 10, to: 60, step: 10 },
      leanDeg: 10,
      depthOutM: 0.02,
      tandem: { anchor: "three-blade-200", spacingM: 0.3 },
      rockKg: 5,
      shockCord: true,
      line: { material: "polyester", diameterMm: 3 },
      knot: "bowline",
    }),
  },
];
const NAMES = TARGETS.map((target) => target.name);

function targetOf(name: string): Target {
  const target = TARGETS.find((one) => one.name === name);
  if (!target) throw new Error(name);
  return target;
}

interface Sending {
  readonly params?: Params;
  readonly headers?: Readonly<Record<string, string>>;
}

async function send(name: string, body: BodyInit, { params, headers }: Sending = {}): Promise<Response> {
  const { method, handler, params: own } = targetOf(name);
  const request = new Request(`${ORIGIN}/api/x`, {
    method,
    headers: given.browsers.leader.headers({ "content-type": "application/json", ...headers }),
    body,
    ...(body instanceof ReadableStream ? { duplex: "half" } : {}),
  });
  return handler(request, { params: Promise.resolve((params ?? own()) as never) });
}

interface ErrorBody {
  readonly error: {
    readonly code: string;
    readonly message: string;
    readonly fieldErrors: Readonly<Record<string, readonly string[]>>;
    readonly requestId: string;
  };
}

/** A refusal that says why, short, without anything of how we are built; nothing stored. */
async function expectRefused(response: Response, status: number | RegExp, what: string): Promise<ErrorBody["error"]> {
  const text = await response.text();
  expect(String(response.status), `${what}: ${text.slice(0, 300)}`).toMatch(
    typeof status === "number" ? new RegExp(`^${status}$`) : status,
  );
  expect(text.length, what).toBeLessThan(50_000);
  expect(text, what).not.toMatch(/node_modules|SQLITE|\.ts:\d|at async/);
  const { error } = JSON.parse(text) as ErrorBody;
  expect(error.message, what).toMatch(/\S/);
  expect(response.headers.get("cache-control"), what).toBe("private, no-store");
  expect(await hashTables(), what).toEqual(before);
  return error;
}

describe.each(NAMES)("/%s", (name) => {
  it("takes what is right, so that what follows is refused for the right reason", async () => {
    const response = await send(name, JSON.stringify(targetOf(name).body()));
    expect(response.status, await response.clone().text()).toBe(200);
  });

  it.each([
    ["half a body", () => '{"a":'],
    ["no body", () => ""],
    ["a body that is no text", () => new Uint8Array([0xff, 0xfe, 0x00, 0x80])],
    ["two bodies", () => "{}{}"],
    ["a number like none", () => '{"version":NaN}'],
    ["a list", () => "[]"],
    ["nothing", () => "null"],
    ["a body of a hundred thousand brackets", () => "[".repeat(10_000)],
    ["traps only", () => '{"__proto__":{"polluted":true},"constructor":{"prototype":{"polluted":true}}}'],
  ])("refuses %s", async (what, body) => {
    await expectRefused(await send(name, body()), 400, what);
    expect(({} as Record<string, unknown>).polluted).toBeUndefined();
  });

  it.each([
    "text/plain",
    "multipart/form-data; boundary=x",
    "application/x-www-form-urlencoded",
    "application/jsonx",
    "",
  ])("refuses a body that says it is %j", async (type) => {
    const response = await send(name, JSON.stringify(targetOf(name).body()), { headers: { "content-type": type } });
    await expectRefused(response, 400, type);
  });

  it("takes a body up to its limit and none beyond, said or not said beforehand", async () => {
    const { maxBytes, body } = targetOf(name);
    const text = JSON.stringify(body());
    const padded = (length: number) => text + " ".repeat(length - text.length);
    await expectRefused(await send(name, padded(maxBytes + 1)), 413, "one byte more");
    await expectRefused(await send(name, "{}", { headers: { "content-length": "999999999" } }), 413, "a long length");
    let chunks = 0;
    const endless = new ReadableStream<Uint8Array>({
      pull(controller) {
        chunks += 1;
        controller.enqueue(new Uint8Array(64 * 1024).fill(32));
      },
    });
    await expectRefused(await send(name, endless), 413, "an endless body");
    expect(chunks).toBeLessThan(maxBytes / (64 * 1024) + 4);
    expect((await send(name, padded(maxBytes))).status).toBe(200);
  });

  it("finds nothing at an address that is none", async () => {
    const own = targetOf(name).params();
    const body = JSON.stringify(targetOf(name).body());
    for (const key of Object.keys(own)) {
      for (const bad of ["", "%00", "\u0000", "../..", "__proto__", "x".repeat(100_000), "' OR 1=1--", newId()]) {
        await expectRefused(
          await send(name, body, { params: { ...own, [key]: bad } }),
          404,
          `${key}=${bad.slice(0, 20)}`,
        );
      }
    }
  });

  it("refuses each field that is missing or of another type, and names it", async () => {
    const valid = targetOf(name).body() as Record<string, unknown>;
    for (const [key, value] of Object.entries(valid)) {
      const { [key]: _gone, ...rest } = valid;
      const wrong = typeof value === "object" ? "text" : { an: "object" };
      for (const body of [{ ...rest, [key]: wrong }, rest]) {
        const response = await send(name, JSON.stringify(body));
        // Some of the quick check's fields have a default.
        if (response.status === 200 && !(key in body)) continue;
        const { fieldErrors } = await expectRefused(response, 400, key);
        expect(Object.keys(fieldErrors).every((field) => field.split(".")[0] === key)).toBe(true);
        for (const reason of Object.values(fieldErrors).flat()) expect(reason).toMatch(/^(?!Invalid input$)\S.+/);
      }
    }
  });

  it("never fails, whatever the parts of a body are", async () => {
    const seen = new Map<number, number>();
    await fc.assert(
      fc.asyncProperty(spoilt(targetOf(name).body()), async (body) => {
        const response = await send(name, JSON.stringify(body) ?? "");
        seen.set(response.status, (seen.get(response.status) ?? 0) + 1);
        const what = (JSON.stringify(body) ?? "").slice(0, 1000);
        if (response.status === 200) {
          expect(await response.text(), what).not.toMatch(/NaN|Infinity/);
          await restore();
        } else await expectRefused(response, /^(400|404|409|413)$/, what);
      }),
      { seed: SEED, numRuns: 300 },
    );
    expect(seen.get(400) ?? 0).toBeGreaterThan(100);
  }, 180_000);

  it("never fails, whatever JSON a body is", async () => {
    await fc.assert(
      fc.asyncProperty(fc.jsonValue({ maxDepth: 4 }), async (body) => {
        await expectRefused(await send(name, JSON.stringify(body)), 400, JSON.stringify(body));
      }),
      { seed: SEED, numRuns: 150 },
    );
  });
});

describe("the quick check's numbers", () => {
  const check = async (over: object) => {
    const response = await send("quick-check", JSON.stringify({ ...targetOf("quick-check").body(), ...over }));
    return expectRefused(response, 400, JSON.stringify(over));
  };

  it.each([
    [{ lineAngleDeg: -1 }, "lineAngleDeg"],
    [{ lineAngleDeg: 1e308 }, "lineAngleDeg"],
    [{ lineAngleDeg: "0x10" }, "lineAngleDeg"],
    [{ lineAngleDeg: { from: 60, to: 10, step: 5 } }, "lineAngleDeg.to"],
    [{ lineAngleDeg: { from: 0, to: 90, step: 0.001 } }, "lineAngleDeg.step"],
    [{ rockKg: -1 }, "rockKg"],
    [{ depthOutM: 1.6 }, "depthOutM"],
    [{ anchor: "no-such-anchor" }, "anchor"],
    [{ anchor: 7 }, "anchor"],
    [{ leanDeg: [] }, "leanDeg"],
    [{ tandem: { anchor: true, spacingM: 0.3 } }, "tandem.anchor"],
    [{ anchor: "__proto__" }, "anchor"],
    [{ anchor: { ...spec, lengthM: 0 } }, "anchor.lengthM"],
    [{ ground: { kind: "lava", wetness: "dry" } }, "ground.kind"],
    [{ tandem: { anchor: "three-blade-200", spacingM: 0 } }, "tandem.spacingM"],
    [{ knot: "granny" }, "knot"],
  ])("%j is refused at %s", async (over, field) => {
    const { fieldErrors } = await check(over);
    expect(Object.keys(fieldErrors)).toEqual([field]);
    expect(fieldErrors[field]?.join(" ")).not.toBe("Invalid input");
  });
});

describe("addresses", () => {
  const get = (handler: unknown, params: Params, query = "") =>
    asHandler(handler)(new Request(`${ORIGIN}/api/x${query}`, { headers: given.browsers.leader.headers() }), {
      params: Promise.resolve(params as never),
    });

  it("of papers name what is wrong with them", async () => {
    const { tripId, campId } = given.a;
    for (const [query, status] of [
      ["", 400],
      ["?paper=map", 400],
      ["?paper=field-card", 400],
      ["?paper=field-card&campId=", 400],
      ["?paper=field-card&campId=%00%00%00%00%00%00%00%00%00%00%00%00%00%00%00%00", 400],
      [`?paper=field-card&campId=${campId}&size=A0`, 400],
      [`?paper=field-card&campId=${newId()}`, 404],
      [`?paper=pitch-card&campId=${campId}&pitchId=${newId()}`, 404],
      [`?paper=pack-list&personId=${newId()}`, 404],
      ["?__proto__=x&constructor=y", 400],
      [`?paper=${"x".repeat(100_000)}`, 400],
    ] as const) {
      await expectRefused(await get(getPapers, { tripId }, query), status, query);
    }
  });

  it("that are none lead nowhere", async () => {
    for (const bad of HOSTILE.filter((one) => typeof one === "string")) {
      await expectRefused(await get(getPlan, { tripId: bad, campId: given.a.campId }), 404, bad.slice(0, 20));
      await expectRefused(await get(getPapers, { tripId: bad }, "?paper=booklet"), 404, bad.slice(0, 20));
      const params = { id: bad, n: bad };
      await expectRefused(await get(getMailFile, params), 404, bad.slice(0, 20));
    }
  });
});

describe("/api/auth", () => {
  const post = (path: string, body: BodyInit, type = "application/json") =>
    postAuthRoute(
      new Request(`${ORIGIN}/api/auth${path}`, {
        method: "POST",
        headers: new Browser().headers({ "content-type": type }),
        body,
      }),
    );

  it.each(["/sign-in/email", "/sign-up/email", "/request-password-reset", "/reset-password"])(
    "%s never fails, whatever it is sent",
    async (path) => {
      const valid = {
        email: "ada@example.test",
        password: "four pegs in wet sand",
        name: "Ada",
        newPassword: "x",
        token: "x",
      };
      const bodies = [
        "",
        "{",
        "null",
        "[]",
        "7",
        ...Object.keys(valid).flatMap((key) => HOSTILE.map((value) => JSON.stringify({ ...valid, [key]: value }))),
      ];
      const statuses = new Set<number>();
      for (const body of bodies.filter((one) => !one.includes("four pegs in wet sand") || !path.includes("sign-up"))) {
        await clearLimits();
        const { status } = await post(path, body);
        expect(status, body.slice(0, 300)).toBeLessThan(500);
        statuses.add(status);
      }
      expect(statuses.has(400)).toBe(true);
      expect((await post(path, "x".repeat(17 * 1024))).status).toBe(413);
      expect((await post(path, "a=b", "text/plain")).status).toBeLessThan(500);
    },
    180_000,
  );

  it("has nothing at odd addresses", async () => {
    for (const path of ["/", "/nothing", "/..%2f..", "/%00", "/sign-in", `/${"x".repeat(5000)}`]) {
      const response = await getAuthRoute(
        new Request(`${ORIGIN}/api/auth${path}`, { headers: new Browser().headers() }),
      );
      expect(response.status, path.slice(0, 50)).toBe(404);
    }
    expect(await hashTables()).toEqual(before);
  });
});
