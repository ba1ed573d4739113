import { actAs, callAction, loadActions, type Action, type Answer } from "./load-actions";
import { formOf, validForms } from "./valid-forms";
import { clearLimits } from "../../helpers/outbox";
import { hashTables, keepRows } from "../../helpers/table-hash";
import { makeTwoTrips, type TwoTrips } from "../../helpers/two-trips";
import { ACTION_ROWS, CALLERS, type Caller, type Outcome } from "../../e2e/role-matrix";
import { beforeAll, beforeEach, describe, expect, it } from "vitest";
import { newId } from "@/lib/domain/ids";

let given: TwoTrips;
let actions: Readonly<Record<string, Action>>;
let forms: ReturnType<typeof validForms>;
let restore: () => Promise<void>;
let before: Awaited<ReturnType<typeof hashTables>>;

beforeAll(async () => {
  given = await makeTwoTrips();
  actions = await loadActions();
  forms = validForms(given);
  await clearLimits();
  restore = await keepRows();
  before = await hashTables();
});

beforeEach(async () => {
  await restore();
});

async function callAs(caller: Caller, name: string, form = forms[name]): Promise<Answer> {
  const action = actions[name];
  if (!action || !form) throw new Error(`No action or no form for ${name}`);
  actAs(given.browsers[caller]);
  return callAction(action, formOf(form));
}

/** The sentence is all that tells a refusal's kind on the screen. */
const SENTENCES: Readonly<Partial<Record<Outcome, RegExp>>> = {
  "signed-out": /^You are signed out\./,
  "not-found": /^There is no such /,
  forbidden: /^Your role on this trip does not let you /,
  refused:
    /^(This invitation was sent to another address|That device is signed out already|You are the only leader of)/,
};

/** What changes nothing although it is allowed: the one who signs out was not signed in. */
const WITHOUT_TRACE = new Set(["(auth)#signOutAction nobody"]);

describe("server actions", () => {
  it("all have data to be called with", () => {
    expect(Object.keys(forms).sort()).toEqual(Object.keys(actions).sort());
    expect(Object.keys(actions).sort()).toEqual(ACTION_ROWS.map((row) => row.name).sort());
  });

  const cases = ACTION_ROWS.flatMap(({ name, outcome }) =>
    CALLERS.map((caller) => [name, caller, outcome[caller]] as const),
  );

  it.each(cases)("%s by %s: %s", async (name, caller, outcome) => {
    const answer = await callAs(caller, name);
    const after = await hashTables();
    if (outcome === "allowed") {
      expect(answer.status, JSON.stringify(answer)).toMatch(/^(done|redirected)$/);
      if (!WITHOUT_TRACE.has(`${name} ${caller}`)) expect(after).not.toEqual(before);
      return;
    }
    expect(after).toEqual(before);
    if (answer.status !== "refused") throw new Error(`${name} was done by ${caller}`);
    expect(answer.formError).toMatch(SENTENCES[outcome] ?? /^$/);
    expect(answer.fieldErrors).toEqual({});
    expect(answer.formError).not.toMatch(caller === "stranger" || caller === "otherLeader" ? /Hidden valley/ : /^$/);
  });

  const ofTrips = ACTION_ROWS.filter((row) => row.name.startsWith("trips/[tripId]")).map((row) => row.name);

  it.each(ofTrips)("%s tells a stranger the same of this trip as of one that never was", async (name) => {
    const real = await callAs("stranger", name);
    const never = await callAs("stranger", name, { ...forms[name], tripId: newId() });
    expect(never).toEqual(real);
  });
});
