import { actAs, callAction, loadActions, type Action, type Answer } from "../role-matrix/load-actions";
import { formOf, validForms } from "../role-matrix/valid-forms";
import { windyCamp } from "../../helpers/camp-kit";
import { HOSTILE, SEED, spoilt } from "../../helpers/hostile-values";
import { clearLimits } from "../../helpers/outbox";
import { hashTables, keepRows } from "../../helpers/table-hash";
import { makeTwoTrips, type TwoTrips } from "../../helpers/two-trips";
import { ACTION_ROWS } from "../../e2e/role-matrix";
import fc from "fast-check";
import { beforeAll, beforeEach, describe, expect, it } from "vitest";
import { listTrips } from "@/lib/services/trips/list-trips";
import { getTripOverview } from "@/lib/services/trips/get-trip-overview";

let given: TwoTrips;
let actions: Readonly<Record<string, Action>>;
let forms: ReturnType<typeof validForms>;
let restore: () => Promise<void>;
let before: Awaited<ReturnType<typeof hashTables>>;

beforeAll(async () => {
  given = await makeTwoTrips();
  actions = await loadActions();
  forms = validForms(given);
  restore = await keepRows();
  before = await hashTables();
});

beforeEach(async () => {
  await restore();
  actAs(given.browsers.leader);
});

async function call(name: string, form: FormData | object): Promise<Answer> {
  const action = actions[name];
  if (!action) throw new Error(`No action ${name}`);
  return callAction(action, form);
}

/** The form of an action, nested parts laid over its valid ones. */
const formWith = (name: string, over: object) => formOf({ ...forms[name], ...over });

const OURS = /went wrong on our side/;

/** What was sent is refused by a reason for people, never as a fault of ours, and nothing of it is there. */
async function expectRefused(answer: Answer, what: string): Promise<void> {
  if (answer.status !== "refused") throw new Error(`${what} was accepted`);
  expect(answer.formError, what).not.toMatch(OURS);
  expect(answer.formError, what).toMatch(/\S/);
  expect(JSON.stringify(answer).length, what).toBeLessThan(20_000);
  expect(await hashTables(), what).toEqual(before);
}

const CAMP = "trips/[tripId]/camps#updateCampAction";
const WEATHER = "trips/[tripId]/camps/[campId]/weather";
const FORECAST = `${WEATHER}#fetchForecastAction`;
const ACCEPT = `${WEATHER}#acceptForecastAction`;
const BESIDE = `${WEATHER}#createAlternativeAction`;
const TRIP = "trips/[tripId]/settings#updateTripAction";
const PITCH = "trips/[tripId]/camps/[campId]/shelters#updatePitchAction";
const SLEEPERS = "trips/[tripId]/camps/[campId]/shelters#saveSleepersAction";
const KIT = "trips/[tripId]/kit#addKitItemAction";
const COUNT = "trips/[tripId]/kit#countKitItemAction";
const PERSON = "trips/[tripId]/people#createPersonAction";
const SEND = "trips/[tripId]/papers#sendPapersAction";
const CARRY = "trips/[tripId]/people/packing#assignCarryAction";
const ROSTER = "trips/[tripId]/people#updateRosterAction";
const IMPORT = "trips/[tripId]/people#importPeopleAction";
const ANSWER = "trips/[tripId]/details#saveAnswerAction";
const DETAILS = "trips/[tripId]/details#saveOwnDetailsAction";
const EMERGENCY = "trips/[tripId]/emergency#saveEmergencyPlanAction";
const THINGS = "trips/[tripId]/people/packing#saveGroupThingsAction";
const SPLIT = "trips/[tripId]/people/packing#saveShelterSplitAction";
const LIMIT = "trips/[tripId]/people/packing#saveLimitAction";
const SEASON = "trips/[tripId]/people/packing#addSeasonItemsAction";
const OWN_LOAD = "trips/[tripId]/mine#saveOwnLoadAction";
const COPY = "trips#copyTripAction";
const GUST = { kind: "gust" };
const million = "x".repeat(1e6);

const camp = (over: object) => ({ details: { ...windyCamp(), ...over } });
const kit = (over: object) => ({ details: { ...(forms[KIT]?.details as object), ...over } });

/** Action, what is wrong, what is sent instead, and the field that has to be named. */
const ROWS: readonly [string, string, () => object, string][] = [
  [CAMP, "a gust that is no number", () => camp({ wind: { ...GUST, speedMs: "NaN" } }), "details.wind.speedMs"],
  [CAMP, "a gust of 1e308", () => camp({ wind: { ...GUST, speedMs: 1e308 } }), "details.wind.speedMs"],
  [CAMP, "a gust of -1", () => camp({ wind: { ...GUST, speedMs: -1 } }), "details.wind.speedMs"],
  [CAMP, "a gust of 90.1 m/s", () => camp({ wind: { ...GUST, speedMs: 90.1 } }), "details.wind.speedMs"],
  [CAMP, "a latitude off the globe", () => camp({ latitude: 90.01, longitude: 8 }), "details.latitude"],
  [CAMP, "a longitude off the globe", () => camp({ latitude: 60, longitude: -180.01 }), "details.longitude"],
  [CAMP, "half a position", () => camp({ latitude: 60 }), "details.longitude"],
  [CAMP, "more nights than are", () => camp({ nights: 9007199254740992 }), "details.nights"],
  [CAMP, "half a night", () => camp({ nights: 1.5 }), "details.nights"],
  [CAMP, "a name of a million letters", () => camp({ name: million }), "details.name"],
  [CAMP, "a name of control characters", () => camp({ name: "\u0000\u202E" }), "details.name"],
  [CAMP, "notes of a million letters", () => camp({ notes: million }), "details.notes"],
  [CAMP, "ground on the moon", () => camp({ ground: { kind: "regolith", wetness: "dry" } }), "details.ground.kind"],
  [CAMP, "hazards as text", () => camp({ hazards: "tide" }), "details.hazards"],
  [CAMP, "a hazard of our own", () => camp({ hazards: ["dragons"] }), "details.hazards.0"],
  [CAMP, "water beyond the horizon", () => camp({ waterDistanceM: 20_001 }), "details.waterDistanceM"],
  [CAMP, "water behind one's back", () => camp({ waterDistanceM: -1 }), "details.waterDistanceM"],
  [CAMP, "a way out of a million letters", () => camp({ wayOut: million }), "details.wayOut"],
  [CAMP, "a meeting point that can't be text", () => camp({ meetingPoint: { toString: 1 } }), "details.meetingPoint"],
  [FORECAST, "a camp that is no identifier", () => ({ campId: "../x" }), "campId"],
  [ACCEPT, "a forecast that is no identifier", () => ({ forecastId: "__proto__" }), "forecastId"],
  [ACCEPT, "a version that is none", () => ({ version: 0.5 }), "version"],
  [BESIDE, "an alternative without a name", () => ({ name: "\u0000" }), "name"],
  [BESIDE, "an alternative with a name of a million letters", () => ({ name: million }), "name"],
  [CAMP, "a version that is none", () => ({ version: 9007199254740993 }), "version"],
  [CAMP, "no version", () => ({ version: null }), "version"],
  [CAMP, "a camp that is no identifier", () => ({ campId: "__proto__" }), "campId"],
  [TRIP, "no day", () => ({ startDate: "" }), "startDate"],
  [TRIP, "the 30th of February", () => ({ startDate: "2027-02-30" }), "startDate"],
  [TRIP, "a day after the calendar ends", () => ({ startDate: "9999-12-31" }), "startDate"],
  [TRIP, "a day before it begins", () => ({ startDate: "0000-01-01" }), "startDate"],
  [TRIP, "a zone on no map", () => ({ timeZone: "Mars/Olympus" }), "timeZone"],
  [
    TRIP,
    "a telephone of letters",
    () => ({ contacts: [{ name: "A", phone: "call me", note: "" }] }),
    "contacts.0.phone",
  ],
  [
    TRIP,
    "contacts beyond twelve",
    () => ({ contacts: Array(13).fill({ name: "A", phone: "112", note: "" }) as object }),
    "contacts",
  ],
  [THINGS, "a thing of negative mass", () => ({ things: [{ id: null, name: "Pot", massKg: -1 }] }), "things.0.massKg"],
  [THINGS, "a thing without a name", () => ({ things: [{ id: null, name: " ", massKg: 1 }] }), "things.0.name"],
  [THINGS, "things as text", () => ({ things: "pots" }), "things"],
  [SPLIT, "poles as heavy as the shelter", () => ({ polesMassKg: 0.75 }), "polesMassKg"],
  [SPLIT, "poles of no number", () => ({ polesMassKg: "NaN" }), "polesMassKg"],
  [LIMIT, "a limit of nothing", () => ({ limitKg: 0 }), "limitKg"],
  [LIMIT, "own things of 1e308 kg", () => ({ baseMassKg: 1e308 }), "baseMassKg"],
  [SEASON, "a season of no year", () => ({ season: "monsoon" }), "season"],
  [OWN_LOAD, "a body of 3 kg", () => ({ bodyMassKg: 3 }), "bodyMassKg"],
  [OWN_LOAD, "nine tenths of the body mass", () => ({ limitPercent: 90 }), "limitShare"],
  [ROSTER, "no places at all", () => ({ capacity: 0 }), "capacity"],
  [ROSTER, "an answer wanted after the trip begins", () => ({ answerBy: "2027-12-24" }), "answerBy"],
  [ROSTER, "details kept for ever", () => ({ keepDetailsDays: 1e9 }), "keepDetailsDays"],
  [IMPORT, "a file without a header", () => ({ csv: "Ada,ada@example.test" }), "csv"],
  [IMPORT, "a file of a million letters", () => ({ csv: million }), "csv"],
  [ANSWER, "an answer that is none", () => ({ value: "perhaps" }), "value"],
  [ANSWER, "a note of a million letters", () => ({ note: million }), "note"],
  [DETAILS, "a telephone of letters", () => ({ phone: "call me" }), "phone"],
  [DETAILS, "no agreement", () => ({ hasConsent: false }), "hasConsent"],
  [DETAILS, "notes of a million letters", () => ({ health: million }), "health"],
  [EMERGENCY, "a day without a time", () => ({ dueBackTime: "" }), "dueBackTime"],
  [EMERGENCY, "two addresses", () => ({ outsideEmail: "a@x.test, b@x.test" }), "outsideEmail"],
  [SEND, "a message that says nothing", () => ({ pieces: [], message: "" }), "pieces"],
  [SEND, "a time that is over", () => ({ intent: "later", sendDay: "2001-01-01", sendTime: "08:00" }), "sendDay"],
  [SEND, "a template without a name", () => ({ intent: "template", message: "x", templateName: "" }), "templateName"],
  [COPY, "a day the wrong way round", () => ({ startDate: "01-09-2027" }), "startDate"],
  [PITCH, "a heading beyond the circle", () => ({ details: { headingDeg: 361, patch: "main" } }), "details.headingDeg"],
  [PITCH, "a patch that is not there", () => ({ details: { headingDeg: 1, patch: "third" } }), "details.patch"],
  [PITCH, "ground that the camp has not", () => ({ details: { headingDeg: 1, patch: "second" } }), "details.patch"],
  [
    PITCH,
    "a negative line",
    () => ({ details: { headingDeg: 1, patch: "main", lineLengthsM: { "hem-left": -1 } } }),
    "details.lineLengthsM.hem-left",
  ],
  [
    SLEEPERS,
    "somebody twice",
    () => ({ sleepers: Array(2).fill({ personId: given.personIds.leader, pitchId: null }) as object }),
    "sleepers",
  ],
  [SLEEPERS, "sleepers as an object", () => ({ sleepers: { length: 4_000_000_000 } }), "sleepers"],
  [KIT, "a negative count", () => kit({ count: -1 }), "details.count"],
  [KIT, "half a thing", () => kit({ count: 0.5 }), "details.count"],
  [KIT, "a mass of 1e308", () => kit({ massKg: 1e308 }), "details.massKg"],
  [KIT, "a thing of another kind", () => kit({ type: "anvil" }), "details.type"],
  [COUNT, "a count in hexadecimal", () => ({ count: "0x10" }), "details.count"],
  [COUNT, "a negative count", () => ({ count: -1 }), "details.count"],
  [PERSON, "an address with line breaks", () => ({ email: "bo@example.test\r\nBcc: eve@example.test" }), "email"],
  [PERSON, "two addresses", () => ({ email: "bo@example.test, eve@example.test" }), "email"],
  [PERSON, "an address with a name", () => ({ email: "Bo <bo@example.test>" }), "email"],
  [PERSON, "an address of a million letters", () => ({ email: `${million}@example.test` }), "email"],
  [PERSON, "a role of their own", () => ({ role: "owner" }), "role"],
  [PERSON, "no name", () => ({ name: "\r\n\t" }), "name"],
  [SEND, "nobody", () => ({ personIds: [] }), "personIds"],
  [SEND, "somebody twice", () => ({ personIds: Array(2).fill(given.personIds.leader) as object }), "personIds"],
  [SEND, "pieces that there are not", () => ({ pieces: ["map"] }), "pieces.0"],
  [SEND, "a subject of line breaks", () => ({ subject: "\r\n" }), "subject"],
  [
    CARRY,
    "a count of none",
    () => ({ carries: [{ type: "kit", personId: given.personIds.leader, kitItemId: given.a.cordId, count: 0 }] }),
    "carries.0.count",
  ],
  [
    CARRY,
    "more than there is",
    () => ({ carries: [{ type: "kit", personId: given.personIds.leader, kitItemId: given.a.cordId, count: 3 }] }),
    "carries",
  ],
  ["account#savePreferencesAction", "a unit of our own", () => ({ speedUnit: "furlongs" }), "speedUnit"],
  ["account#saveNameAction", "a name of a million letters", () => ({ name: million }), "name"],
  ["account#endSessionAction", "an object that can't be text", () => ({ sessionId: { toString: 1 } }), "sessionId"],
  [
    "trips/[tripId]/post#retryMessageAction",
    "an object that can't be text",
    () => ({ messageId: { toString: 1 } }),
    "messageId",
  ],
  [COUNT, "a trip that can't be text", () => ({ tripId: { toString: 1 } }), "tripId"],
  ["(auth)#signUpWithInvitationAction", "a name that can't be text", () => ({ name: { toString: 1 } }), "name"],
  ["(auth)#signUpAction", "an address with line breaks", () => ({ email: "a@example.test\nb" }), "email"],
  ["(auth)#signInAction", "a password of a million letters", () => ({ password: million }), "password"],
];

describe("bad input in a form", () => {
  it.each(ROWS)("%s: %s", async (name, what, over, field) => {
    const answer = await call(name, formWith(name, over()));
    await expectRefused(answer, what);
    if (answer.status !== "refused") return;
    expect(Object.keys(answer.fieldErrors)).toEqual([field]);
    expect(answer.fieldErrors[field]?.join(" ")).not.toBe("Invalid input");
  });

  it.each(ACTION_ROWS.map((row) => row.name))("%s with nothing at all", async (name) => {
    const isOfNothing = name.endsWith("#signOutAction");
    for (const empty of [new FormData(), {}, [], null, "text"] as object[]) {
      const answer = await call(name, empty);
      if (isOfNothing) await restore();
      else await expectRefused(answer, name);
    }
  });

  // Passwords are slow on purpose; these have their tests with the accounts.
  const fuzzed = ACTION_ROWS.map((row) => row.name).filter((name) => !/^(\(auth\)|account)#/.test(name));

  it.each(fuzzed)(
    "%s with random parts",
    async (name) => {
      const valid = forms[name];
      if (!valid) throw new Error(name);
      await fc.assert(
        fc.asyncProperty(spoilt(valid), fc.boolean(), async (body, isForm) => {
          if (typeof body !== "object" || body === null) return;
          await clearLimits();
          const answer = await call(name, isForm ? formOf(body as typeof valid) : body);
          if (answer.status === "refused") return expectRefused(answer, JSON.stringify(body).slice(0, 2000));
          // What was accepted can be shown.
          const trips = await listTrips({ ctx: given.users.leader.ctx });
          for (const { id } of trips) await getTripOverview({ ctx: given.users.leader.ctx, input: { tripId: id } });
          await restore();
        }),
        { seed: SEED, numRuns: 40 },
      );
    },
    180_000,
  );

  it("leaves no trace on what every object has", () => {
    expect(HOSTILE.length).toBeGreaterThan(30);
    expect(({} as Record<string, unknown>).polluted).toBeUndefined();
  });
});

describe("deleting what is in use", () => {
  it.each([
    [
      "trips/[tripId]/camps#deleteCampAction",
      /Otter Flat is in use\. 1 shelter is pitched there\..*1 anchor.*1 person/,
    ],
    [
      "trips/[tripId]/shelters#deleteShelterAction",
      /Ridge tarp is in use\. It is pitched at Otter Flat, with 1 anchor set/,
    ],
    ["trips/[tripId]/kit#deleteKitItemAction", /is in use\. 1 tie-out at Otter Flat uses it\./],
    [
      "trips/[tripId]/camps/[campId]/shelters#deletePitchAction",
      /Ridge tarp is in use\. Its staking plan has 1 anchor set/,
    ],
  ])("%s says first what depends on it", async (name, sentence) => {
    const answer = await call(name, formWith(name, { confirmed: false }));
    await expectRefused(answer, name);
    if (answer.status !== "refused") throw new Error(name);
    expect(answer.formError).toMatch(sentence);
    expect(Object.keys(answer.fieldErrors)).toEqual(["confirmed"]);
    expect((await call(name, formWith(name, { confirmed: true }))).status).toBe("done");
  });
});

describe("the ends of the wind", () => {
  it.each([0, 90])("a gust of %d m/s is taken, and the camp says what it comes to", async (speedMs) => {
    expect((await call(CAMP, formWith(CAMP, camp({ wind: { ...GUST, speedMs } })))).status).toBe("done");
    const { camps } = await getTripOverview({ ctx: given.users.leader.ctx, input: { tripId: given.a.tripId } });
    expect(camps[0]?.designGustMs).not.toBeNaN();
    expect(JSON.stringify(camps)).not.toMatch(/NaN|Infinity/);
  });
});
