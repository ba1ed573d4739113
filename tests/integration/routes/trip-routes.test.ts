import { beforeAll, describe, expect, it } from "vitest";
import { makePerson, makeUser } from "../../helpers/actors";
import { Browser, ORIGIN } from "../../helpers/browser";
import { makeCampKit, placementOf } from "../../helpers/camp-kit";
import { readPdf } from "../pdf/read-pdf";
import { POST as quickCheck } from "@/app/api/quick-check/route";
import { POST as analyse } from "@/app/api/trips/[tripId]/camps/[campId]/analyses/route";
import { PATCH as patchPitch } from "@/app/api/trips/[tripId]/camps/[campId]/pitches/[pitchId]/route";
import { GET as getPlan, POST as postPlan } from "@/app/api/trips/[tripId]/camps/[campId]/plan/route";
import { GET as getPaper } from "@/app/api/trips/[tripId]/papers/route";
import { readContext } from "@/lib/auth/session";
import { dependable } from "@/lib/calc/verdict";
import { newId } from "@/lib/domain/ids";
import type { CampPlanView, PlanSaveResult } from "@/lib/domain/views";
import { createAccount } from "@/lib/services/account/create-account";
import type { Context } from "@/lib/services/context/context";
import { createTrip } from "@/lib/services/trips/create-trip";

type Params = Record<string, string>;
type Handler = (request: Request, segment: { params: Promise<Params> }) => Promise<Response>;

const leader = new Browser();
const stranger = new Browser();
let ctx: Context;
let tripId: string;
let kit: Awaited<ReturnType<typeof makeCampKit>>;

async function signIn(browser: Browser, name: string): Promise<Context> {
  const email = `${name.toLowerCase()}@example.test`;
  const password = "four pegs in wet sand";
  await createAccount({ input: { name, email, password } });
  await browser.call("/sign-in/email", { email, password });
  const found = await readContext(browser.headers());
  if (!found) throw new Error("not signed in");
  return found;
}

function call(handler: Handler, browser: Browser, params: Params, body?: unknown, query = "", method = "POST") {
  const headers = browser.headers(body === undefined ? {} : { "content-type": "application/json" });
  const text = body === undefined ? null : typeof body === "string" ? body : JSON.stringify(body);
  const request = new Request(`${ORIGIN}/api/x${query}`, {
    method: body === undefined ? "GET" : method,
    headers,
    body: text,
  });
  return handler(request, { params: Promise.resolve(params) });
}

beforeAll(async () => {
  ctx = await signIn(leader, "Ada");
  await signIn(stranger, "Bo");
  const details = { name: 'Źdźbło "round"; part 2', startDate: "2027-06-11", timeZone: "Europe/Oslo" };
  tripId = (await createTrip({ ctx, input: details })).tripId;
  kit = await makeCampKit(ctx, tripId);
});

describe("/plan", () => {
  it("reads and saves, and answers strangers and the signed-out alike with nothing", async () => {
    const params = { tripId, campId: kit.campId };
    const plan = (await (await call(getPlan, leader, params)).json()) as CampPlanView;
    expect(plan.planVersion).toBe(0);
    const change = { type: "place", placement: placementOf(kit.pitchId, "hem-left", kit.bladeId) };
    const body = { intents: [{ intentId: newId(), baseVersion: 0, change }] };
    expect((await call(postPlan, stranger, params, body)).status).toBe(404);
    expect((await call(getPlan, stranger, params)).status).toBe(404);
    expect((await call(postPlan, new Browser(), params, body)).status).toBe(401);
    const saved = (await (await call(postPlan, leader, params, body)).json()) as PlanSaveResult;
    expect(saved.outcomes[0]?.outcome).toBe("applied");
    expect((await call(getPlan, leader, { tripId, campId: "../../etc" })).status).toBe(404);
  });

  const bad: [string, unknown, string][] = [
    ["no intents", {}, "intents"],
    ["an empty list", { intents: [] }, "intents"],
    ["a lean that is no number", { intents: [{ leanDeg: "NaN" }] }, "intents.0.change.placement.leanDeg"],
    ["a lean out of range", { intents: [{ leanDeg: 61 }] }, "intents.0.change.placement.leanDeg"],
    ["a lean beyond numbers", { intents: [{ leanDeg: 1e308 }] }, "intents.0.change.placement.leanDeg"],
    ["an unknown knot", { intents: [{ knot: "granny" }] }, "intents.0.change.placement.knot"],
    [
      "a tie-out of a million letters",
      { intents: [{ tieOutId: "x".repeat(9e5) }] },
      "intents.0.change.placement.tieOutId",
    ],
    ["a negative version", { intents: [{ baseVersion: -1 }] }, "intents.0.baseVersion"],
  ];
  it.each(bad)("refuses %s and names the field", async (_, body, field) => {
    const params = { tripId, campId: kit.campId };
    const before = (await (await call(getPlan, leader, params)).json()) as CampPlanView;
    const { intents } = body as { intents?: Record<string, unknown>[] };
    const full = {
      ...(body as object),
      ...(intents && {
        intents: intents.map(({ baseVersion = 1, ...more }) => ({
          intentId: newId(),
          baseVersion,
          change: { type: "place", placement: { ...placementOf(kit.pitchId, "hem-right", kit.bladeId), ...more } },
        })),
      }),
    };
    const response = await call(postPlan, leader, params, full);
    expect(response.status).toBe(400);
    const { error } = (await response.json()) as { error: { fieldErrors: Record<string, string[]> } };
    expect(Object.keys(error.fieldErrors)).toEqual([field]);
    expect((await (await call(getPlan, leader, params)).json()) as CampPlanView).toEqual(before);
  });

  it("stops a body that is too large", async () => {
    const response = await call(postPlan, leader, { tripId, campId: kit.campId }, "x".repeat(1024 * 1024 + 1));
    expect(response.status).toBe(413);
  });
});

describe("/pitches and /analyses", () => {
  const details = { headingDeg: 350, patch: "main", dimensions: { ridgeHeightM: 1 }, lineLengthsM: {} };

  it("try a pitch out and save it", async () => {
    const params = { tripId, campId: kit.campId };
    const tried = await call(analyse, leader, params, { pitchId: kit.pitchId, details });
    const { analysis } = (await tried.json()) as { analysis: { design: { tieOuts: unknown[] } } };
    expect(analysis.design.tieOuts).toHaveLength(8);
    expect((await call(analyse, stranger, params, { pitchId: kit.pitchId, details })).status).toBe(404);
    const one = { ...params, pitchId: kit.pitchId };
    expect((await call(patchPitch, stranger, one, { version: 1, details }, "", "PATCH")).status).toBe(404);
    expect((await call(patchPitch, leader, one, { version: 1, details }, "", "PATCH")).status).toBe(200);
    const stale = await call(patchPitch, leader, one, { version: 1, details }, "", "PATCH");
    expect(stale.status).toBe(409);
    expect(((await stale.json()) as { error: { details: unknown } }).error.details).toMatchObject({ by: "Ada" });
  });
});

describe("/papers", () => {
  it("prints a pitch card as a PDF with a name that every browser reads", async () => {
    const query = `?paper=pitch-card&campId=${kit.campId}&pitchId=${kit.pitchId}&size=LETTER`;
    const response = await call(getPaper, leader, { tripId }, undefined, query);
    expect(response.status).toBe(200);
    expect(response.headers.get("content-type")).toBe("application/pdf");
    expect(response.headers.get("cache-control")).toBe("private, no-store");
    const disposition = response.headers.get("content-disposition") ?? "";
    expect(disposition).toMatch(/^inline; filename="[^"\\]*"; filename\*=UTF-8''[A-Za-z0-9._~%-]+$/);
    expect(decodeURIComponent(disposition.split("UTF-8''")[1] ?? "")).toContain("Źdźbło round; part 2");
    const pdf = await readPdf(new Uint8Array(await response.arrayBuffer()));
    // US Letter is 8.5 × 11 inches of 72 points.
    expect(pdf.pages[0]).toMatchObject({ width: 612, height: 792 });
    expect(pdf.text).toContain("Ridge tarp");
  });

  it.each([
    ["?paper=wall-poster", 400],
    ["?paper=field-card", 400],
    ["?paper=booklet&size=A0", 400],
    ["", 400],
  ])("refuses %s", async (query, status) => {
    expect((await call(getPaper, leader, { tripId }, undefined, query)).status).toBe(status);
  });

  it("is not there for strangers, and stops at the limit", async () => {
    expect((await call(getPaper, stranger, { tripId }, undefined, "?paper=booklet")).status).toBe(404);
    expect((await call(getPaper, new Browser(), { tripId }, undefined, "?paper=booklet")).status).toBe(401);
    const hasty = await makeUser();
    await makePerson(tripId, "leader", hasty);
    const { consumeQuota } = await import("@/lib/services/quota/consume-quota");
    await consumeQuota("pdf", ctx.actor.userId, 59);
    const query = `?paper=field-card&campId=${kit.campId}`;
    const response = await call(getPaper, leader, { tripId }, undefined, query);
    expect(response.status).toBe(429);
    expect(Number(response.headers.get("retry-after"))).toBeGreaterThan(0);
  });
});

describe("/quick-check", () => {
  const check = (body: unknown, browser = leader) => call(quickCheck, browser, {}, body);
  const ground = { kind: "firm-moist-loam", wetness: "usual" };

  it("answers one anchor in one ground with its working", async () => {
    const response = await check({ anchor: "three-blade-200", ground, lineAngleDeg: 30 });
    const { anchor, results } = (await response.json()) as {
      anchor: { name: string };
      results: {
        lineAngleDeg: number;
        leanDeg: number;
        capacity: { status: string; medianN: number; scatter: number; dependableN: number; workings: unknown[] };
      }[];
    };
    expect(anchor.name).toBe("Three-blade, 200 mm");
    expect(results).toHaveLength(1);
    const capacity = results[0]?.capacity;
    expect(capacity?.status).toBe("ok");
    expect(capacity?.dependableN).toBeCloseTo(dependable(capacity?.medianN ?? 0, capacity?.scatter ?? 0), 6);
    expect(capacity?.workings?.length).toBeGreaterThan(3);
  });

  it("sweeps angles and leans", async () => {
    const body = {
      anchor: "three-blade-200",
      ground,
      lineAngleDeg: { from: 0, to: 60, step: 15 },
      leanDeg: { from: -10, to: 30, step: 20 },
    };
    const { results } = (await (await check(body)).json()) as { results: { lineAngleDeg: number; leanDeg: number }[] };
    expect([...new Set(results.map((one) => one.lineAngleDeg))]).toEqual([0, 15, 30, 45, 60]);
    expect([...new Set(results.map((one) => one.leanDeg))]).toEqual([-10, 10, 30]);
  });

  const fine = { anchor: "three-blade-200", ground, lineAngleDeg: 30 };
  it.each([
    ["an unknown anchor", { ...fine, anchor: "no-such-anchor" }, "anchor"],
    ["a ground that there isn't", { ...fine, ground: { kind: "lava", wetness: "usual" } }, "ground.kind"],
    ["a line into the ground", { ...fine, lineAngleDeg: -1 }, "lineAngleDeg"],
    [
      "too many results",
      { ...fine, lineAngleDeg: { from: 0, to: 90, step: 1 }, leanDeg: { from: 0, to: 60, step: 1 } },
      "lineAngleDeg.step",
    ],
    ["a second anchor that there isn't", { ...fine, tandem: { anchor: "nope", spacingM: 0.2 } }, "tandem.anchor"],
  ])("refuses %s", async (_, body, field) => {
    const response = await check(body);
    expect(response.status).toBe(400);
    const { error } = (await response.json()) as { error: { fieldErrors: Record<string, string[]> } };
    expect(Object.keys(error.fieldErrors)).toEqual([field]);
  });

  it("is for people who are signed in", async () => {
    expect((await check(fine, new Browser())).status).toBe(401);
    expect((await check(fine, stranger)).status).toBe(200);
  });
});
