import { and, eq, inArray } from "drizzle-orm";
import { getDb, withTransaction } from "@/db/client";
import { outboxMessage, user } from "@/db/schema";
import { evaluateCamp } from "@/lib/calc/camp";
import { proposePlan } from "@/lib/calc/plan";
import type { CampInput, Placement, TrayAnchor } from "@/lib/calc/types";
import { blankCamp } from "@/lib/domain/camp/schema";
import { newId } from "@/lib/domain/ids";
import { toCampInput } from "@/lib/domain/plan/to-camp-input";
import { addDays, dayOf } from "@/lib/format/days";
import { getAuth } from "@/lib/auth/auth";
import { createCamp } from "@/lib/services/camps/create-camp";
import type { Context } from "@/lib/services/context/context";
import { createKitItem } from "@/lib/services/kit/create-kit-item";
import { saveGroupThings } from "@/lib/services/pack/save-group-things";
import { saveLimit } from "@/lib/services/pack/save-person-load";
import { saveShelterSplit } from "@/lib/services/pack/save-shelter-split";
import { shareOutEvenly } from "@/lib/services/pack/share-out-evenly";
import { createPerson } from "@/lib/services/people/create-person";
import { listPeople } from "@/lib/services/people/list-people";
import { createPitch } from "@/lib/services/pitches/create-pitch";
import { getCampPlan } from "@/lib/services/plan/get-camp-plan";
import { savePlanIntents } from "@/lib/services/plan/save-plan-intents";
import { createShelter } from "@/lib/services/shelters/create-shelter";
import { saveSleepers } from "@/lib/services/sleepers/save-sleepers";
import { createTrip } from "@/lib/services/trips/create-trip";
import { updateTrip } from "@/lib/services/trips/update-trip";
import { writeAboutPeople } from "./about-people";
import { DEMO_PASSWORD, DEMO_PEOPLE, SECOND_LEADER, type DemoPerson } from "./people";
import { seedCampPulls, seedPractice } from "./pull-tests";
import { seedRoute } from "./seed-route";
import { seedTalk } from "./seed-talk";
import { seedWeather } from "./seed-weather";
import { CAMPS, CARRY_LIMITS, CONTACTS, GROUP_THINGS, KIT, SHELTERS, SLEEPS_IN, TRIP } from "./skarn-edge";

/** An account through the front door; its address counts as verified, and the mail that asks for it isn't sent. */
async function createAccount({ name, email }: DemoPerson): Promise<Context> {
  await getAuth().api.signUpEmail({ body: { name, email, password: DEMO_PASSWORD } });
  return withTransaction(async (tx) => {
    await tx
      .delete(outboxMessage)
      .where(and(eq(outboxMessage.toAddress, email), inArray(outboxMessage.kind, ["verification"])));
    const [row] = await tx
      .update(user)
      .set({ emailVerified: true })
      .where(eq(user.email, email))
      .returning({ userId: user.id, name: user.name, email: user.email });
    if (!row) throw new Error(`No account was made for ${email}.`);
    return { actor: row, requestId: newId() };
  });
}

/** The Friday after six weeks from now, so that the trip always lies ahead. */
function chooseStartDate(): string {
  const inSixWeeks = addDays(dayOf(new Date(), TRIP.timeZone), 42);
  const week = Array.from({ length: 7 }, (_, index) => addDays(inSixWeeks, index));
  return week.find((day) => new Date(`${day}T00:00:00Z`).getUTCDay() === 5) ?? inSixWeeks;
}

/** On the worst night somebody has put the lightest stake where a wide one was: it gives way, and it can be mended. */
function weakenOne(
  input: CampInput,
  tray: readonly TrayAnchor[],
  placements: readonly Placement[],
): readonly Placement[] {
  const { shelters, left } = evaluateCamp({ ...input, placements });
  const [lightest] = tray
    .filter((anchor) => !anchor.found && (left[anchor.id] ?? 0) > 0)
    .sort((a, b) => a.massKg - b.massKg);
  const isWide = (id: string) => tray.some((anchor) => anchor.id === id && anchor.name.startsWith("Wide"));
  const [target] = shelters
    .flatMap((shelter) => shelter.tieOuts)
    .filter((one) => one.placement && isWide(one.placement.anchorId))
    .sort((a, b) => (b.priority ?? 0) - (a.priority ?? 0));
  if (!lightest || !target) throw new Error("The demo's worst night has no stake to spare.");
  return placements.map((one) =>
    one.pitchId === target.pitchId && one.tieOutId === target.tieOutId
      ? { ...one, anchorId: lightest.id, leanDeg: 0, tandem: null, rockKg: 0 }
      : one,
  );
}

async function planCamp(ctx: Context, tripId: string, campId: string, isWorst: boolean): Promise<void> {
  const plan = await getCampPlan({ ctx, input: { tripId, campId } });
  const input = toCampInput(plan.camp.details, plan.pitches, plan.tray, [], plan.learned);
  const { placements } = proposePlan(input, { allowFound: true, allowDoubling: true });
  const save = async (baseVersion: number, wanted: readonly Placement[]) => {
    const change = { type: "replace" as const, placements: [...wanted] };
    const intents = [{ intentId: newId(), baseVersion, change }];
    const { outcomes } = await savePlanIntents({ ctx, input: { tripId, campId, intents } });
    if (outcomes[0]?.outcome !== "applied") throw new Error(`The plan was not saved: ${JSON.stringify(outcomes)}`);
  };
  await save(0, placements);
  if (isWorst) await save(1, weakenOne(input, plan.tray, placements));
}

async function createMainTrip(ctx: Context): Promise<string> {
  const startDate = chooseStartDate();
  const { tripId } = await createTrip({ ctx, input: { ...TRIP, startDate } });
  await updateTrip({ ctx, input: { ...TRIP, startDate, tripId, version: 1, contacts: CONTACTS } });
  for (const { name, email, role } of DEMO_PEOPLE.slice(1)) {
    await createPerson({ ctx, input: { tripId, name, email, role } });
  }
  const people = await listPeople({ ctx, input: { tripId } });
  const personIds = DEMO_PEOPLE.map(({ email }) => people.find((one) => one.email === email)?.id ?? "");

  const shelterIds: string[] = [];
  for (const details of SHELTERS) shelterIds.push((await createShelter({ ctx, input: { tripId, details } })).shelterId);
  for (const details of KIT) await createKitItem({ ctx, input: { tripId, details } });
  for (const details of CAMPS) {
    const { campId } = await createCamp({ ctx, input: { tripId, details } });
    const pitchIds: string[] = [];
    for (const shelterId of shelterIds) {
      pitchIds.push((await createPitch({ ctx, input: { tripId, campId, shelterId } })).pitchId);
    }
    const sleepers = personIds.map((personId, index) => ({
      personId,
      pitchId: pitchIds[SLEEPS_IN[index] ?? 0] ?? null,
    }));
    await saveSleepers({ ctx, input: { tripId, campId, sleepers } });
    await planCamp(ctx, tripId, campId, details.name === "Skarn Edge");
    if (details === CAMPS[0]) await seedCampPulls(ctx, tripId, campId);
  }
  await saveGroupThings({ ctx, input: { tripId, things: [...GROUP_THINGS] } });
  for (const [index, limits] of CARRY_LIMITS.entries()) {
    const personId = personIds[index];
    if (personId) await saveLimit({ ctx, input: { tripId, personId, ...limits } });
  }
  const tunnelId = shelterIds.at(-1);
  if (tunnelId) {
    const split = { shelterId: tunnelId, polesMassKg: 0.52, staysWithSleepers: true };
    await saveShelterSplit({ ctx, input: { tripId, ...split } });
  }
  await shareOutEvenly({ ctx, input: { tripId } });
  await seedPractice(ctx);
  await seedRoute(ctx, tripId);
  await seedWeather(ctx, tripId);
  return tripId;
}

/** A trip that has only begun: shows what empty pages say. */
async function createSecondTrip(ctx: Context): Promise<string> {
  const startDate = addDays(chooseStartDate(), 21);
  const input = { name: "Two nights by the sound", timeZone: "Europe/Oslo", startDate, notes: "" };
  const { tripId } = await createTrip({ ctx, input });
  await createCamp({ ctx, input: { tripId, details: blankCamp("Gull Spit") } });
  return tripId;
}

export interface SeedReport {
  readonly tripIds: readonly string[];
  readonly logIns: readonly { readonly email: string; readonly role: string }[];
}

/** Demo data through the product's own services; null when there are accounts already: nothing is touched then. */
export async function seedDemo(): Promise<SeedReport | null> {
  const [somebody] = await getDb().select({ id: user.id }).from(user).limit(1);
  if (somebody) return null;
  const withAccount = DEMO_PEOPLE.filter((one) => one.hasAccount);
  const contexts = new Map<string, Context>();
  for (const one of [...withAccount, SECOND_LEADER]) contexts.set(one.email, await createAccount(one));
  const contextOf = (one: DemoPerson | undefined): Context => {
    const ctx = contexts.get(one?.email ?? "");
    if (!ctx) throw new Error("The demo needs a leader.");
    return ctx;
  };
  const tripIds = [await createMainTrip(contextOf(DEMO_PEOPLE[0])), await createSecondTrip(contextOf(SECOND_LEADER))];
  const [leader, coLeader, participant] = DEMO_PEOPLE.slice(0, 3).map(contextOf);
  if (leader && coLeader && participant) await seedTalk({ leader, coLeader, participant }, tripIds[0] ?? "");
  const byEmail = (email: string) => contextOf(withAccount.find((one) => one.email === email));
  await writeAboutPeople(contextOf(DEMO_PEOPLE[0]), byEmail, tripIds[0] ?? "");
  const logIns = [
    ...withAccount.map(({ email, role }) => ({ email, role })),
    { email: SECOND_LEADER.email, role: "leader of another trip" },
  ];
  return { tripIds, logIns };
}
