import { expect, test, type APIRequestContext, type APIResponse } from "@playwright/test";
import { CO_LEADER, LEADER, openAs, PARTICIPANT, PASSWORD } from "./people";
import { TINY_PNG } from "../helpers/tiny-png";
import { CALLERS, PAGE_ROWS, ROUTE_ROWS, type Caller, type Outcome } from "./role-matrix";

/** Every page and route handler over HTTP, as each of the six callers, on the demo's trip. */
const OTHER_LEADER = "nadia@leestead.example";
const STRANGER = `stranger.${Date.now().toString(36)}@leestead.example`;
const TRIP_NAME = "Skarn Edge round";
/** On no page of somebody who is not on the trip. */
const OF_THE_TRIP = [TRIP_NAME, "Otterbed", "Marrow Tarn", "Tobi Oduya", CO_LEADER, "+99 000 01 42"];
/** On no page that a co-leader is refused. */
const OF_THE_LEADER = ["marco@leestead.example", "+99 000 01 42"];
/** On no page that a participant is refused, though they know the trip. */
const OF_LEADERS = [CO_LEADER, "marco@leestead.example", "+99 000 01 42", "Way down: the cairned path"];

/** What people wrote about themselves: for themselves and for who leads, on two pages only. */
const ABOUT_PEOPLE = ["saddle-sore", "hazel pollen", "Giulia Ferrobello", "+99 000 03 41", "Femi Oduya"];
const MAY_TELL_LEADERS = ["/trips/[tripId]/people/contacts", "GET /api/trips/[tripId]/contact-sheet"];
/** The co-leader finds their own there. */
const OWN_PLACES = ["/trips/[tripId]/details", "GET /api/account/export"];

interface Plan {
  readonly people: readonly { readonly id: string; readonly name: string }[];
  readonly pitches: readonly { readonly id: string; readonly version: number; readonly details: object }[];
  readonly placements: readonly { readonly pitchId: string; readonly tieOutId: string }[];
}

let as: Record<Caller, APIRequestContext>;
const ids: Record<string, string> = {};
const people: Record<string, string> = {};

const found = (text: string, pattern: RegExp): string => {
  const value = pattern.exec(text)?.[1];
  if (!value) throw new Error(`${String(pattern)} is not there`);
  return value;
};

test.beforeAll(async ({ playwright, browser }, { project }) => {
  const baseURL = project.use.baseURL ?? "";
  const open = () => playwright.request.newContext({ baseURL, extraHTTPHeaders: { origin: baseURL } });
  const signIn = async (email: string) => {
    const context = await open();
    const response = await context.post("/api/auth/sign-in/email", { data: { email, password: PASSWORD } });
    expect(response.status(), email).toBe(200);
    return context;
  };
  const nobody = await open();
  const readMailTo = async (address: string) => {
    let text = "";
    await expect(async () => {
      const list = await (await nobody.get("/demo/mail")).text();
      const at = list.indexOf(`to ${address}`) >= 0 ? list.indexOf(`to ${address}`) : list.indexOf(address);
      expect(at).toBeGreaterThan(0);
      const links = [...list.slice(0, at).matchAll(/\/demo\/mail\/([0-9a-z]{20,})/g)];
      const id = links.at(-1)?.[1] ?? "";
      ids.id = id;
      text = await (await nobody.get(`/demo/mail/${id}`)).text();
    }).toPass({ timeout: 60_000 });
    return text;
  };

  await nobody.post("/api/auth/sign-up/email", { data: { name: "Sten Alone", email: STRANGER, password: PASSWORD } });
  const verification = found(await readMailTo(STRANGER), /\/verify\?token=([A-Za-z0-9._-]+)/);
  await nobody.get(`/api/auth/verify-email?token=${verification}`);
  ids.token = found(await readMailTo("junko@leestead.example"), /\/invitation\/([A-Za-z0-9_-]{43})/);

  as = {
    nobody,
    stranger: await signIn(STRANGER),
    participant: await signIn(PARTICIPANT),
    coLeader: await signIn(CO_LEADER),
    leader: await signIn(LEADER),
    otherLeader: await signIn(OTHER_LEADER),
  };

  const page = await openAs(browser, LEADER);
  const href = await page.getByRole("link", { name: TRIP_NAME }).first().getAttribute("href");
  ids.tripId = found(href ?? "", /^\/trips\/([0-9a-z]+)/);
  await page.goto("/gear/new?type=shelter&kind=pyramid");
  await page.getByRole("button", { name: "Add to own gear" }).click();
  await expect(page).toHaveURL(/\/gear$/);
  await page.context().close();

  const read = async (path: string) => (await as.leader.get(path)).text();
  ids.gearId = found(await read("/gear"), /\/gear\/([0-9a-z]{20,})/);
  const trip = `/trips/${ids.tripId}`;
  ids.campId = found(await read(trip), new RegExp(`${trip}/camps/([0-9a-z]{20,})`));
  ids.shelterId = found(await read(`${trip}/shelters`), new RegExp(`${trip}/shelters/([0-9a-z]{20,})`));
  ids.kitItemId = found(await read(`${trip}/kit`), new RegExp(`${trip}/kit/([0-9a-z]{20,})`));
  const pulls = `${trip}/camps/${ids.campId}/pull-tests`;
  ids.pullTestId = found(await read(pulls), new RegExp(`${pulls}/([0-9a-z]{20,})`));
  ids.practicePullId = found(await read("/pull-tests"), /"\/pull-tests\/([0-9a-z]{20,})/);
  const plan = (await (await as.leader.get(`/api${trip}/camps/${ids.campId}/plan`)).json()) as Plan;
  ids.pitchId = plan.placements[0]?.pitchId ?? "";
  ids.version = "1";
  ids.tieOutId = plan.placements[0]?.tieOutId ?? "";
  for (const { id, name } of plan.people) people[name] = id;
});

test.afterAll(async () => {
  for (const context of Object.values(as ?? {})) await context.dispose();
});

const fill = (pattern: string) => pattern.replace(/\[(\w+)\]/g, (_, key: string) => ids[key] ?? `no-${key}`);

/** Nothing that the caller may not know, wherever in the bytes. */
async function expectSilent(response: APIResponse, caller: Caller, what: string): Promise<void> {
  const body = await response.text();
  const words = { participant: OF_LEADERS, coLeader: OF_THE_LEADER }[caller as string] ?? OF_THE_TRIP;
  for (const word of words) {
    expect(body.includes(word), `${what} tells ${caller} “${word}”`).toBe(false);
  }
}

/** One reading that fits a camp as well as a practice field. */
const PULL_TABLE = `pulled_at,place,ground,wetness,anchor,lean_deg,line_angle_deg,force,unit,outcome
2027-01-02,Matrix,firm-moist-loam,usual,three-blade-200,0,45,18,kgf,came-out
`;

/** Health notes and emergency contacts are in no answer but those they are meant for. */
async function expectDiscreet(response: APIResponse, caller: Caller, name: string, what: string): Promise<void> {
  if ((caller === "leader" || caller === "coLeader") && MAY_TELL_LEADERS.includes(name)) return;
  if (caller === "coLeader" && OWN_PLACES.includes(name)) return;
  const body = await response.text();
  for (const word of ABOUT_PEOPLE) expect(body.includes(word), `${what} tells ${caller} “${word}”`).toBe(false);
}

const FORMS: readonly [string, Record<string, string>][] = [
  ["page", {}],
  ["data of a navigation", { RSC: "1" }],
  ["prefetched data", { RSC: "1", "Next-Router-Prefetch": "1" }],
  [
    "data that claims to have passed the proxy",
    { RSC: "1", "x-middleware-subrequest": "proxy:proxy:proxy:proxy:proxy" },
  ],
];

/** Data without the number by which the framework tells its versions apart is sent there first. */
async function getPage(request: APIRequestContext, path: string, headers: Record<string, string>) {
  const first = await request.get(path, { headers, maxRedirects: 0 });
  const { location } = first.headers();
  const isSamePage = location && new URL(location, "http://own.invalid").searchParams.has("_rsc");
  return isSamePage ? request.get(location, { headers, maxRedirects: 0 }) : first;
}

/** Where an answer leads, as the page itself or inside the data of a navigation. */
async function readTarget(response: APIResponse): Promise<string> {
  const { location } = response.headers();
  if (location) return new URL(location, "http://own.invalid").pathname;
  return /NEXT_REDIRECT;\w+;([^;"?]+)/.exec(await response.text())?.[1] ?? "";
}

const TARGETS: Readonly<Partial<Record<Outcome, () => string>>> = {
  "sign-in": () => "/sign-in",
  "to-trips": () => "/trips",
  "to-mine": () => `/trips/${ids.tripId}/mine`,
};

/** Data of a navigation may say so inside, after the first bytes; a page says it by its status. */
async function expectNotFound(response: APIResponse, isData: boolean, what: string): Promise<void> {
  if (isData && response.status() === 200) {
    expect(await response.text(), what).toContain("NEXT_HTTP_ERROR_FALLBACK;404");
  } else expect(response.status(), what).toBe(404);
}

for (const { name, outcome } of PAGE_ROWS) {
  test(`page ${name}`, async () => {
    for (const caller of CALLERS) {
      const expected = outcome[caller];
      for (const [form, headers] of FORMS) {
        const what = `${form} ${name} for ${caller}`;
        const response = await getPage(as[caller], fill(name), headers);
        expect(response.headers()["cache-control"], what).toContain("no-store");
        if (expected !== "allowed") await expectSilent(response, caller, what);
        await expectDiscreet(response, caller, name, what);
        // What is prefetched ends where the first part that asks who is there begins.
        if ("Next-Router-Prefetch" in headers) expect(response.status(), what).toBeLessThan(500);
        else if (expected === "allowed") {
          expect(response.status(), what).toBe(200);
          // A part that failed after the first bytes leaves its mark.
          expect(await response.text(), what).not.toMatch(/data-dgst=|NEXT_HTTP_ERROR_FALLBACK|NEXT_REDIRECT/);
        } else if (expected === "not-found") await expectNotFound(response, "RSC" in headers, what);
        else {
          expect([200, 303, 307], what).toContain(response.status());
          expect(await readTarget(response), what).toBe(TARGETS[expected]?.());
        }
      }
    }
  });
}

async function callRoute(name: string, when: string | undefined, caller: Caller): Promise<APIResponse> {
  const [method = "", pattern = ""] = name.split(" ");
  const request = as[caller];
  const api = fill(pattern);
  const readPitch = async () => {
    const plan = (await (await as.leader.get(`/api/trips/${ids.tripId}/camps/${ids.campId}/plan`)).json()) as Plan;
    const pitch = plan.pitches.find((one) => one.id === ids.pitchId);
    if (!pitch) throw new Error("The pitch is gone.");
    return pitch;
  };
  switch (name) {
    case "GET /api/auth/[...all]":
      return request.get("/api/auth/get-session");
    case "POST /api/auth/[...all]":
      return request.post("/api/auth/request-password-reset", { data: { email: "nobody-at-all@leestead.example" } });
    case "POST /api/quick-check":
      return request.post(api, {
        data: { anchor: "three-blade-200", ground: { kind: "firm-moist-loam", wetness: "usual" }, lineAngleDeg: 45 },
      });
    case "POST /api/trips/[tripId]/camps/[campId]/plan": {
      const change = { type: "lift", pitchId: ids.pitchId, tieOutId: "none-there" };
      const intentId = `m${Date.now().toString(36)}${caller.toLowerCase()}`.padEnd(26, "0");
      return request.post(api, { data: { intents: [{ intentId, baseVersion: 0, change }] } });
    }
    case "GET /api/pull-tests/practice-sheet":
      return request.get(api, { params: { ground: "firm-moist-loam" }, timeout: 60_000 });
    case "POST /api/trips/[tripId]/camps/[campId]/pull-tests":
    case "POST /api/pull-tests":
      return request.post(api, { headers: { "content-type": "text/csv" }, data: PULL_TABLE });
    case "PUT /api/pull-tests/[pullTestId]/photo":
      return request.put(api, { data: Buffer.from(TINY_PNG) });
    case "POST /api/trips/[tripId]/kit-search": {
      // One search a trip: the one before is stopped first.
      await as.leader.delete(api);
      const kinds = [{ source: "library", id: "three-blade-200", most: null }];
      const terms = { foundCampIds: [], spares: 0, workPriceKg: 0, allowDoubling: false };
      return request.post(api, { data: { settings: { kinds, campIds: [ids.campId], ...terms } } });
    }
    case "POST /api/trips/[tripId]/camps/[campId]/analyses":
      return request.post(api, { data: { pitchId: ids.pitchId, details: (await readPitch()).details } });
    case "PATCH /api/trips/[tripId]/camps/[campId]/pitches/[pitchId]": {
      const { version, details } = await readPitch();
      return request.patch(api, { data: { version, details } });
    }
    case "GET /api/trips/[tripId]/papers": {
      const [paper = "", whose] = (when ?? "").split(" of the ");
      const personId = people[whose === "participant" ? "Kirsi Lindqvist" : "Runa Amsel"] ?? "";
      return request.get(api, { params: { paper, campId: ids.campId ?? "", personId }, timeout: 60_000 });
    }
    case "POST /api/gpx/[tripId]": {
      // The trip's own way again, so that it stays as it was for whoever comes after.
      const own = await (await as.leader.get(api)).text();
      return request.post(api, { data: own, headers: { "Content-Type": "application/gpx+xml" } });
    }
    case "GET /demo/mail/[id]/[n]": {
      // The demo's first mails carry no file: then it is the same "not there" for everybody.
      return request.get(api.replace("no-n", "0"));
    }
    default:
      return request.fetch(api, { method });
  }
}

const STATUS: Readonly<Partial<Record<Outcome, number>>> = {
  allowed: 200,
  "not-found": 404,
  "signed-out": 401,
  forbidden: 403,
};

for (const { name, when, outcome } of ROUTE_ROWS) {
  test(`${name} ${when ?? ""}`, async () => {
    for (const caller of CALLERS) {
      const expected = outcome[caller];
      const what = `${name} ${when ?? ""} for ${caller}`;
      const response = await callRoute(name, when, caller);
      const status = name === "GET /demo/mail/[id]/[n]" ? 404 : STATUS[expected];
      expect(response.status(), `${what}: ${(await response.text()).slice(0, 200)}`).toBe(status);
      expect(response.headers()["cache-control"], what).toContain("no-store");
      if (expected !== "allowed") await expectSilent(response, caller, what);
      await expectDiscreet(response, caller, name, what);
    }
  });
}

test("leaders do find it on the contact sheet", async () => {
  const sheet = await (await as.coLeader.get(`/trips/${ids.tripId}/people/contacts`)).text();
  for (const word of ABOUT_PEOPLE) expect(sheet).toContain(word);
});

test("a route has no other methods", async () => {
  for (const name of new Set(ROUTE_ROWS.map((row) => row.name.split(" ")[1] ?? ""))) {
    if (name.startsWith("/api/auth")) continue;
    const known = ROUTE_ROWS.filter((row) => row.name.endsWith(` ${name}`)).map((row) => row.name.split(" ")[0]);
    for (const method of ["GET", "POST", "PUT", "PATCH", "DELETE"].filter((one) => !known.includes(one))) {
      const response = await as.leader.fetch(fill(name), { method, data: method === "GET" ? undefined : {} });
      expect(response.status(), `${method} ${name}`).toBe(405);
    }
  }
});

test("odd addresses are not found, and tell nothing", async ({ baseURL }) => {
  const trip = `/trips/${ids.tripId}`;
  const camp = `${trip}/camps/${ids.campId}`;
  const odd = [
    "/trips/x",
    "/trips/__proto__",
    `/trips/${"x".repeat(300)}`,
    "/trips/%00",
    "/trips/%E0%A4%A",
    "/trips/..%2f..%2fetc%2fpasswd",
    `${trip}/camps/x`,
    `${trip}/camps/x/place`,
    `${trip}/kit/x`,
    `${trip}/shelters/x`,
    `${trip}/shelters/new?kind=__proto__`,
    `${camp}/working/x/y`,
    `${camp}/working/${ids.pitchId}/__proto__`,
    "/gear/x",
    "/demo/mail/x",
    "/demo/mail/x/0",
    "/dev-board",
    "/.env",
    "/.git/HEAD",
    "/_next/image?url=http%3A%2F%2F127.0.0.1%2F&w=64&q=75",
    `/${"y".repeat(20_000)}`,
  ];
  for (const path of odd) {
    for (const caller of ["nobody", "stranger", "leader"] as const) {
      const response = await as[caller].get(path, { maxRedirects: 0 });
      const what = `${path.slice(0, 80)} for ${caller}: ${response.status()}`;
      expect(response.status(), what).toBeLessThan(500);
      expect(response.status() === 200, what).toBe(false);
      if (caller !== "leader") await expectSilent(response, caller, what);
    }
  }
  for (const path of [trip, camp, `${trip}/people`]) {
    for (const way of [
      `${path}.rsc`,
      `${path}.segments/_tree.segment.rsc`,
      `${baseURL}/${path}`,
      `${path}/%2e`,
      `${path}?_rsc=1`,
    ]) {
      for (const caller of ["nobody", "stranger", "otherLeader"] as const) {
        const response = await as[caller].get(way, { maxRedirects: 0 });
        expect(response.status(), way).toBeLessThan(500);
        await expectSilent(response, caller, way);
      }
    }
  }
});
