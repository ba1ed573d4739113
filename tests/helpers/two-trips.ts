import { Browser } from "./browser";
import { makeCast, makePerson, makeTrip, makeUser, type TestUser } from "./actors";
import { makeCampKit, placementOf, shelterOf, windyCamp } from "./camp-kit";
import { practicePullOf, pullOf, TINY_PNG } from "./pulls";
import { clearLimits, readLinkToken } from "./outbox";
import { hashPassword } from "better-auth/crypto";
import { and, eq, isNull } from "drizzle-orm";
import { getDb } from "@/db/client";
import { account, forecast, kitSearch, messageTemplate, outboxMessage, packItem, session, trip } from "@/db/schema";
import { newId } from "@/lib/domain/ids";
import { builtInAnchor } from "@/lib/calc/tables/anchors";
import { fingerprint } from "@/lib/services/kit-search/internal";
import { loadTripState } from "@/lib/services/plan/load-trip-state";
import { createAlternative } from "@/lib/services/camps/create-alternative";
import { createComment } from "@/lib/services/comments/create-comment";
import { createCamp } from "@/lib/services/camps/create-camp";
import { fetchForecast } from "@/lib/services/forecast/fetch-forecast";
import { sampleSource } from "@/lib/weather/sample-source";
import type { Context } from "@/lib/services/context/context";
import { saveOwnDetails } from "@/lib/services/details/save-own-details";
import { saveEmergencyPlan } from "@/lib/services/emergency/save-emergency-plan";
import { sendEmergencyPlan } from "@/lib/services/emergency/send-emergency-plan";
import { createGear } from "@/lib/services/gear/create-gear";
import { createKitItem } from "@/lib/services/kit/create-kit-item";
import { savePackItems } from "@/lib/services/pack/save-pack-items";
import { createPerson } from "@/lib/services/people/create-person";
import { invitePerson } from "@/lib/services/people/invite-person";
import { planSend } from "@/lib/services/planned-sends/plan-send";
import { saveTemplate } from "@/lib/services/templates/save-template";
import { savePlanIntents } from "@/lib/services/plan/save-plan-intents";
import { createCampPullTest, createPracticePullTest } from "@/lib/services/pull-tests/create-pull-test";
import { savePhoto } from "@/lib/services/pull-tests/photo/save-photo";
import { importGpx } from "@/lib/services/route/import-gpx";
import { createShelter } from "@/lib/services/shelters/create-shelter";
import { saveSleepers } from "@/lib/services/sleepers/save-sleepers";
import type { Caller } from "../e2e/role-matrix";

export const PASSWORD = "four pegs in wet sand";

/** Three points over a rise, and a place beside the second. */
export const SHORT_WAY = `<gpx version="1.1" xmlns="http://www.topografix.com/GPX/1/1">
<wpt lat="60.011" lon="8.01"><name>Cairn</name></wpt>
<trk><name>Way</name><trkseg>
<trkpt lat="60" lon="8"><ele>300</ele></trkpt>
<trkpt lat="60.003" lon="8.003"><ele>330</ele></trkpt>
<trkpt lat="60.006" lon="8.006"><ele>380</ele></trkpt>
<trkpt lat="60.01" lon="8.01"><ele>420</ele></trkpt>
<trkpt lat="60.02" lon="8.01"><ele>350</ele></trkpt>
</trkseg></trk></gpx>`;

export const cordOf = (name: string) => ({
  type: "cord" as const,
  name,
  material: "polyester" as const,
  diameterMm: 3,
  lengthM: 10,
  massKg: 0.1,
  count: 2,
});

/** A kit that was found and waits to be taken over. */
async function keepFoundKit(tripId: string, { campId, bladeId }: { campId: string; bladeId: string }) {
  const settings = {
    kinds: [{ source: "kit" as const, id: bladeId, most: 6 }],
    campIds: [campId],
    foundCampIds: [],
    spares: 0,
    workPriceKg: 0,
    allowDoubling: false,
  };
  const { name, spec, massKg } = builtInAnchor("three-blade-200");
  const outcome = {
    status: "found" as const,
    kinds: [{ id: bladeId, name, spec, massKg, count: 5 }],
    massUnits: 1750,
    cost: 1750,
    bound: 1750,
    gap: 0,
    spares: 0,
    camps: [],
    reasons: [],
    curve: [],
    alike: [],
  };
  const basis = fingerprint(await loadTripState(getDb(), tripId), settings);
  const row = { tripId, settings, outcome, basis, foundByName: "Ada", foundAt: new Date() };
  await getDb().insert(kitSearch).values(row);
}

/** A trip with one of everything in use, and one of everything to spare. */
async function fillTrip(ctx: Context, tripId: string, sleeperId: string) {
  const kit = await makeCampKit(ctx, tripId, { latitude: 61.93, longitude: 8.72 });
  const { campId: spareCampId } = await createCamp({
    ctx,
    input: { tripId, details: windyCamp({ name: "Low Barn" }) },
  });
  const { shelterId: spareShelterId } = await createShelter({
    ctx,
    input: { tripId, details: shelterOf("pyramid", { name: "Spare pyramid" }) },
  });
  const { kitItemId: cordId } = await createKitItem({ ctx, input: { tripId, details: cordOf("Spare cord") } });
  const placement = placementOf(kit.pitchId, "ridge-front", kit.bladeId);
  await savePlanIntents({
    ctx,
    input: {
      tripId,
      campId: kit.campId,
      intents: [{ intentId: newId(), baseVersion: 0, change: { type: "place", placement } }],
    },
  });
  await saveSleepers({
    ctx,
    input: { tripId, campId: kit.campId, sleepers: [{ personId: sleeperId, pitchId: kit.pitchId }] },
  });
  const line = { id: null, name: "Mug", isGroupThing: false, massKg: 0.1 };
  await savePackItems({ ctx, input: { tripId, personId: null, items: [line] } });
  const [item] = await getDb()
    .select({ id: packItem.id })
    .from(packItem)
    .where(and(eq(packItem.tripId, tripId), isNull(packItem.personId)));
  const { campId: alternativeId } = await createAlternative({
    ctx,
    input: { tripId, campId: spareCampId, name: "Bield under the barn" },
  });
  const at = new Date(Date.now() - 3_600_000);
  await fetchForecast({ ctx, input: { tripId, campId: kit.campId }, source: sampleSource, at });
  const [fetched] = await getDb().select({ id: forecast.id }).from(forecast).where(eq(forecast.tripId, tripId));
  const waitingEmail = `waiting-${tripId.toLowerCase()}@example.test`;
  const { personId: waitingId } = await createPerson({
    ctx,
    input: { tripId, name: "Wanda Waiting", email: waitingEmail, role: "participant" },
  });
  const messageId = newId();
  const now = new Date();
  await getDb()
    .insert(outboxMessage)
    .values({
      id: messageId,
      tripId,
      kind: "papers",
      requestId: newId(),
      toName: "Wanda Waiting",
      toAddress: `failed-${waitingEmail}`,
      subject: "Cards",
      text: "Cards",
      html: "<p>Cards</p>",
      messageId: `<${messageId}@leestead.test>`,
      state: "failed",
      nextAttemptAt: now,
      createdAt: now,
    });
  const pullTestId = newId();
  const practicePullId = newId();
  await createCampPullTest({ ctx, input: { tripId, campId: kit.campId, ...pullOf(pullTestId) } });
  await createPracticePullTest({ ctx, input: practicePullOf(practicePullId) });
  await savePhoto({ ctx, input: { pullTestId, keepsPosition: false, content: TINY_PNG } });
  await importGpx({ ctx, input: { tripId, fileName: "way.gpx" }, bytes: new TextEncoder().encode(SHORT_WAY) });
  const { gearId } = await createGear({ ctx, input: { details: { type: "anchor", anchor: cordOf("Own cord") } } });
  // Last: a change of what it stands on would make it out of date.
  await keepFoundKit(tripId, kit);
  return {
    ...kit,
    spareCampId,
    alternativeId,
    forecastId: fetched?.id ?? "",
    spareShelterId,
    cordId,
    packItemId: item?.id ?? "",
    waitingId,
    waitingEmail,
    messageId,
    gearId,
    pullTestId,
    practicePullId,
  };
}

export type FilledTrip = Awaited<ReturnType<typeof fillTrip>> & { readonly tripId: string };

let passwordHash: Promise<string> | undefined;

async function signInAs(who: TestUser): Promise<Browser> {
  await clearLimits();
  const browser = new Browser();
  const response = await browser.call("/sign-in/email", { email: who.email, password: PASSWORD });
  if (response.status !== 200) throw new Error(`Nobody could sign in as ${who.email}: ${response.status}`);
  return browser;
}

async function givePassword(who: TestUser): Promise<void> {
  passwordHash ??= hashPassword(PASSWORD);
  const now = new Date();
  const row = { userId: who.id, accountId: who.id, providerId: "credential", createdAt: now, updatedAt: now };
  await getDb()
    .insert(account)
    .values({ ...row, id: newId(), password: await passwordHash });
}

/** Details of each, and an emergency plan that somebody outside has. */
async function writeAboutPeople(tripId: string, people: readonly TestUser[], leader: TestUser): Promise<void> {
  for (const { ctx } of people) {
    await saveOwnDetails({
      ctx,
      input: { tripId, version: 0, phone: "+99 000 11 22", health: "Asthma.", hasConsent: true },
    });
  }
  const { ctx } = leader;
  await saveEmergencyPlan({
    ctx,
    input: {
      tripId,
      version: 0,
      dueBackDay: "2027-06-10",
      dueBackTime: "17:00",
      outsideName: "Ines Marlow",
      outsideEmail: "ines@example.test",
      steps: [{ afterMinutes: 60, who: "Hut", phone: "", action: "Ask whether they came by." }],
    },
  });
  await sendEmergencyPlan({ ctx, input: { tripId, requestId: newId() } });
}

/** A template, a message for later, and one that the leader was sent. */
async function writePost(tripId: string, { ctx, id }: TestUser, personId: string) {
  await saveTemplate({ ctx, input: { tripId, name: "Mine", subject: "Hello", body: "Words." } });
  const [template] = await getDb().select().from(messageTemplate).where(eq(messageTemplate.tripId, tripId));
  const plannedSendId = newId();
  const words = { personIds: [personId], pieces: [], subject: "Later", message: "Words.", paperSize: "A4" as const };
  const when = { sendDay: "2027-06-01", sendTime: "08:00" };
  await planSend({ ctx, input: { tripId, requestId: plannedSendId, ...words, ...when } });
  const ownMessageId = newId();
  const now = new Date();
  await getDb()
    .insert(outboxMessage)
    .values({
      id: ownMessageId,
      tripId,
      personId,
      kind: "papers",
      requestId: newId(),
      toName: "Leader",
      toAddress: `own-${id.toLowerCase()}@example.test`,
      subject: "Read me",
      text: "Words",
      html: "<p>Words</p>",
      messageId: `<${ownMessageId}@leestead.test>`,
      state: "sent",
      nextAttemptAt: now,
      createdAt: now,
      sentAt: now,
    });
  return { templateId: template?.id ?? "", plannedSendId, ownMessageId };
}

/** Two trips with leaders of their own, everybody signed in with a real session, and open links of each kind. */
export async function makeTwoTrips() {
  const cast = await makeCast();
  const users: Record<Exclude<Caller, "nobody">, TestUser> = {
    stranger: cast.stranger,
    participant: cast.participant,
    coLeader: cast.coLeader,
    leader: cast.leader,
    otherLeader: cast.otherLeader,
  };
  for (const who of Object.values(users)) await givePassword(who);
  // With somebody else on it, so that its leader can't just go.
  const companion = await makeUser();
  const companionId = await makePerson(cast.otherTripId, "participant", companion);
  await getDb().update(trip).set({ name: "Hidden valley" }).where(eq(trip.id, cast.tripId));

  const a: FilledTrip = {
    tripId: cast.tripId,
    ...(await fillTrip(cast.leader.ctx, cast.tripId, cast.personIds.participant)),
  };
  const b: FilledTrip = {
    tripId: cast.otherTripId,
    ...(await fillTrip(cast.otherLeader.ctx, cast.otherTripId, companionId)),
  };

  const posted = await writePost(a.tripId, users.leader, cast.personIds.leader);
  await writeAboutPeople(a.tripId, [users.leader, users.coLeader, users.participant], users.leader);

  const [ofPapers] = await getDb().select({ updatedAt: trip.updatedAt }).from(trip).where(eq(trip.id, a.tripId));
  // By the co-leader, so that both who lead may delete it.
  const commentId = newId();
  const subject = { about: "camp" as const, campId: a.campId };
  await createComment({
    ctx: cast.coLeader.ctx,
    input: { tripId: a.tripId, commentId, subject, body: "Wet at the wall." },
  });

  const browsers = {
    nobody: new Browser(),
    stranger: await signInAs(users.stranger),
    participant: await signInAs(users.participant),
    coLeader: await signInAs(users.coLeader),
    leader: await signInAs(users.leader),
    otherLeader: await signInAs(users.otherLeader),
  } satisfies Record<Caller, Browser>;
  await signInAs(users.leader);
  const ownSessions = await getDb().select().from(session).where(eq(session.userId, users.leader.id));
  const currentToken = decodeURIComponent(browsers.leader.cookie).split("session_token=")[1]?.split(".")[0];
  const otherSession = ownSessions.find((one) => one.token !== currentToken);

  const thirdTripId = await makeTrip({ name: "Third trip" });
  const thirdLeader = await makeUser();
  await makePerson(thirdTripId, "leader", thirdLeader);
  const { name, email } = users.stranger;
  const personId = await makePerson(thirdTripId, "participant", { name, email });
  await invitePerson({ ctx: thirdLeader.ctx, input: { tripId: thirdTripId, personId } });

  const newcomer = { name: "Nils New", email: "newcomer@example.test", password: PASSWORD };
  await new Browser().call("/sign-up/email", newcomer);
  await new Browser().call("/request-password-reset", { email: users.coLeader.email });
  await new Browser().call("/sign-in/magic-link", { email: users.participant.email });
  return {
    ...posted,
    a,
    b,
    users,
    browsers,
    personIds: cast.personIds,
    otherPersonId: cast.otherPersonId,
    companionId,
    commentId,
    /** Of anything that stands on papers of the first trip. */
    changedAt: ofPapers?.updatedAt.getTime() ?? 0,
    leaderSessionId: otherSession?.id ?? "",
    tokens: {
      invitation: await readLinkToken(a.waitingEmail),
      invitationOfStranger: await readLinkToken(email),
      verification: await readLinkToken(newcomer.email),
      signInLink: await readLinkToken(users.participant.email),
      reset: await readLinkToken(users.coLeader.email),
    },
  };
}

export type TwoTrips = Awaited<ReturnType<typeof makeTwoTrips>>;
