import { actAs, callAction, loadActions, type Action } from "../role-matrix/load-actions";
import { formOf, validForms } from "../role-matrix/valid-forms";
import { makePerson } from "../../helpers/actors";
import { ORIGIN } from "../../helpers/browser";
import { placementOf } from "../../helpers/camp-kit";
import { hashTables, keepRows, readTrip } from "../../helpers/table-hash";
import { makeTwoTrips, type TwoTrips } from "../../helpers/two-trips";
import { beforeAll, beforeEach, describe, expect, it } from "vitest";
import { GET as getPapers } from "@/app/api/trips/[tripId]/papers/route";
import { POST as postAnalysis } from "@/app/api/trips/[tripId]/camps/[campId]/analyses/route";
import { PATCH as patchPitch } from "@/app/api/trips/[tripId]/camps/[campId]/pitches/[pitchId]/route";
import { GET as getPlan, POST as postPlan } from "@/app/api/trips/[tripId]/camps/[campId]/plan/route";
import type { PlanChange } from "@/lib/domain/plan/schema";
import { newId } from "@/lib/domain/ids";
import type { PlanSaveResult } from "@/lib/domain/views";

/**
 * Ids of trip B inside requests about trip A, sent by somebody who leads both: every permission is there, so that only
 * the scope of each query stands in the way.
 */
let given: TwoTrips;
let actions: Readonly<Record<string, Action>>;
let restore: () => Promise<void>;
let before: Awaited<ReturnType<typeof hashTables>>;

beforeAll(async () => {
  given = await makeTwoTrips();
  await makePerson(given.b.tripId, "leader", given.users.leader);
  actions = await loadActions();
  restore = await keepRows();
  before = await hashTables();
});

beforeEach(async () => {
  await restore();
  actAs(given.browsers.leader);
});

/** Each id of trip A with its like of trip B. */
function listTwins(): [string, string][] {
  const { a, b } = given;
  const twins = (Object.keys(a) as (keyof typeof a)[])
    .filter((key) => key !== "tripId" && key !== "waitingEmail")
    .map((key): [string, string] => [a[key], b[key]]);
  return [...twins, [given.personIds.leader, given.otherPersonId], [given.personIds.participant, given.companionId]];
}

/** Forms beyond the valid ones whose lists name things of the trip. */
function listForms(): [string, object][] {
  const { a, personIds } = given;
  const camp = { tripId: a.tripId, campId: a.campId };
  const line = { name: "Mug", isGroupThing: false, massKg: null };
  return [
    ...Object.entries(validForms(given)),
    [
      "trips/[tripId]/people/packing#savePackItemsAction",
      { tripId: a.tripId, personId: null, items: [{ id: a.packItemId, ...line }] },
    ],
    [
      "trips/[tripId]/people/packing#assignCarryAction",
      { tripId: a.tripId, carries: [{ type: "shelter", personId: personIds.leader, shelterId: a.shelterId }] },
    ],
    [
      "trips/[tripId]/camps/[campId]/shelters#saveSleepersAction",
      { ...camp, sleepers: [{ personId: personIds.participant, pitchId: null }] },
    ],
  ];
}

async function refuses(name: string, form: object): Promise<void> {
  const action = actions[name];
  if (!action) throw new Error(`No action ${name}`);
  const answer = await callAction(action, formOf(form as Parameters<typeof formOf>[0]));
  expect(answer, `${name} ${JSON.stringify(form)}`).toMatchObject({ status: "refused" });
  expect(await hashTables()).toEqual(before);
}

describe("actions", () => {
  it("refuse each id of another trip, wherever in the request it stands, and store nothing", async () => {
    const tried: string[] = [];
    for (const [name, form] of listForms()) {
      const text = JSON.stringify(form);
      for (const [own, foreign] of listTwins()) {
        if (!text.includes(own) || own === given.a.gearId) continue;
        // A reading alone says where it belongs, and this person leads there too.
        if (own === given.a.pullTestId && !("tripId" in form)) continue;
        await refuses(name, JSON.parse(text.replaceAll(own, foreign)) as object);
        tried.push(`${name} ${own}`);
      }
    }
    expect(tried.length).toBeGreaterThan(30);
  });

  it("refuse this trip's ids under the other trip's id", async () => {
    let count = 0;
    for (const [name, form] of listForms()) {
      const text = JSON.stringify(form);
      if (!("tripId" in form) || !listTwins().some(([own]) => text.includes(own))) continue;
      await refuses(name, { ...form, tripId: given.b.tripId });
      count += 1;
    }
    expect(count).toBeGreaterThan(20);
  });

  it("refuse gear of somebody else", async () => {
    for (const name of ["gear#updateGearAction", "gear#deleteGearAction"]) {
      await refuses(name, { ...validForms(given)[name], gearId: given.b.gearId });
    }
  });
});

function request(method: string, query: string, body?: unknown): Request {
  return new Request(`${ORIGIN}/api/x${query}`, {
    method,
    headers: given.browsers.leader.headers(body === undefined ? {} : { "content-type": "application/json" }),
    ...(body === undefined ? {} : { body: JSON.stringify(body) }),
  });
}
const segment = (params: Record<string, string>) => ({ params: Promise.resolve(params) });

async function savePlan(params: { tripId: string; campId: string }, change: PlanChange, intentId = newId()) {
  const body = { intents: [{ intentId, baseVersion: 1, change }] };
  const response = await postPlan(request("POST", "", body), segment(params));
  return { status: response.status, result: (await response.json()) as PlanSaveResult };
}

describe("route handlers", () => {
  it("do not know the other trip's camp, pitch or person under this trip", async () => {
    const { a, b } = given;
    const details = { headingDeg: 10, patch: "main", dimensions: {}, lineLengthsM: {} };
    const patch = (campId: string, pitchId: string) =>
      patchPitch(request("PATCH", "", { version: 1, details }), segment({ tripId: a.tripId, campId, pitchId }));
    const analyse = (campId: string, pitchId: string) =>
      postAnalysis(request("POST", "", { pitchId, details }), segment({ tripId: a.tripId, campId }));
    const paper = (query: string) => getPapers(request("GET", query), segment({ tripId: a.tripId }));
    const answers = [
      await getPlan(request("GET", ""), segment({ tripId: a.tripId, campId: b.campId })),
      await patch(b.campId, b.pitchId),
      await patch(a.campId, b.pitchId),
      await patch(b.campId, a.pitchId),
      await analyse(b.campId, b.pitchId),
      await analyse(a.campId, b.pitchId),
      await paper(`?paper=field-card&campId=${b.campId}`),
      await paper(`?paper=pitch-card&campId=${b.campId}&pitchId=${b.pitchId}`),
      await paper(`?paper=pitch-card&campId=${a.campId}&pitchId=${b.pitchId}`),
      await paper(`?paper=pack-list&personId=${given.companionId}`),
    ];
    expect(answers.map((one) => one.status)).toEqual(answers.map(() => 404));
    expect(await hashTables()).toEqual(before);
  });

  it("refuse a change of a plan that names the other trip's pitch or anchor, in each kind of change", async () => {
    const { a, b } = given;
    const own = { pitchId: a.pitchId, tieOutId: "ridge-front" };
    const foreign = { pitchId: b.pitchId, tieOutId: "ridge-front" };
    const on = (pitchId: string, anchorId: string, secondId?: string) =>
      placementOf(pitchId, "ridge-rear", anchorId, secondId ? { tandem: { anchorId: secondId, spacingM: 0.3 } } : {});
    const changes: PlanChange[] = [
      { type: "place", placement: on(b.pitchId, a.bladeId) },
      { type: "place", placement: on(a.pitchId, b.bladeId) },
      { type: "place", placement: on(a.pitchId, a.bladeId, b.wideId) },
      { type: "replace", placements: [on(b.pitchId, a.bladeId)] },
      { type: "replace", placements: [on(a.pitchId, b.bladeId)] },
      { type: "swap", from: own, to: foreign },
      { type: "swap", from: foreign, to: own },
    ];
    for (const change of changes) {
      const { result } = await savePlan({ tripId: a.tripId, campId: a.campId }, change);
      expect(result.outcomes[0]?.outcome, JSON.stringify(change)).toBe("refused");
    }
    expect(await hashTables()).toEqual(before);
    expect((await savePlan({ tripId: a.tripId, campId: b.campId }, { type: "lift", ...foreign })).status).toBe(404);
    expect(await hashTables()).toEqual(before);
  });

  it("lift nothing of the other trip: there is nothing to lift here", async () => {
    const { a, b } = given;
    const other = await readTrip(b.tripId);
    const lift = { type: "lift", pitchId: b.pitchId, tieOutId: "ridge-front" } as const;
    const { result } = await savePlan({ tripId: a.tripId, campId: a.campId }, lift);
    expect(result.planVersion).toBe(1);
    expect(result.placements).toHaveLength(1);
    expect(await readTrip(b.tripId)).toEqual(other);
  });

  it("refuse the number of a change that was made on the other trip", async () => {
    const { a, b } = given;
    const intentId = newId();
    const lift = (pitchId: string): PlanChange => ({ type: "lift", pitchId, tieOutId: "ridge-front" });
    await savePlan({ tripId: b.tripId, campId: b.campId }, lift(b.pitchId), intentId);
    const { result } = await savePlan({ tripId: a.tripId, campId: a.campId }, lift(a.pitchId), intentId);
    expect(result.outcomes[0]).toMatchObject({ outcome: "refused" });
    expect(result.placements).toHaveLength(1);
  });
});
