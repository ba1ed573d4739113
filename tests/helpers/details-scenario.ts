/**
 * Run as a program of its own, so that all it prints can be read: people write about themselves, everything that can
 * go wrong goes wrong, everybody asks for everything they may. Prints what was handed out as one line of JSON to file
 * descriptor 3's stand-in, the file named by OUT.
 */
import { writeFileSync } from "node:fs";
import { eq } from "drizzle-orm";
import { closeDb, getDb } from "@/db/client";
import { migrateDatabase } from "@/db/migrate-database";
import { capturedMail, outboxMessage, person, trip, user } from "@/db/schema";
import { newId } from "@/lib/domain/ids";
import type { Role } from "@/lib/domain/permissions/permissions";
import { startFakeSmtpServer } from "@/lib/email/fake-smtp-server";
import { createTransport } from "@/lib/email/transport";
import { log } from "@/lib/log";
import { exportAccount } from "@/lib/services/account/export-account";
import { getOwnAnswer } from "@/lib/services/answers/get-own-answer";
import { saveAnswer } from "@/lib/services/answers/save-answer";
import type { Context } from "@/lib/services/context/context";
import { getContactSheet } from "@/lib/services/details/get-contact-sheet";
import { getOwnDetails } from "@/lib/services/details/get-own-details";
import { saveOwnDetails } from "@/lib/services/details/save-own-details";
import { resealDetails } from "@/lib/services/details/tend-details";
import { saveEmergencyPlan } from "@/lib/services/emergency/save-emergency-plan";
import { sendEmergencyPlan } from "@/lib/services/emergency/send-emergency-plan";
import { exportPeople } from "@/lib/services/people/export-people";
import { listPeople } from "@/lib/services/people/list-people";
import { captureMail } from "@/lib/services/post/capture-mail";
import { listMessages } from "@/lib/services/post/list-messages";
import { runDue } from "@/lib/services/post/run-due";
import { runOutboxOnce } from "@/lib/services/post/run-outbox";
import { getTripOverview } from "@/lib/services/trips/get-trip-overview";

export const CANARY = "zyzzyva-canary";

async function makeMember(tripId: string, name: string, role: Role): Promise<Context> {
  const now = new Date();
  const id = newId();
  const email = `${name.toLowerCase()}@example.test`;
  await getDb().insert(user).values({ id, name, email, emailVerified: true, createdAt: now, updatedAt: now });
  await getDb().insert(person).values({ id: newId(), tripId, userId: id, name, email, role, createdAt: now });
  return { actor: { userId: id, name, email }, requestId: newId() };
}

/** The answer as text, or the refusal as people see it. */
async function ask(work: () => Promise<unknown>): Promise<string> {
  try {
    return JSON.stringify(await work());
  } catch (error) {
    log.error("refused", error);
    return JSON.stringify(error, Object.getOwnPropertyNames(error));
  }
}

await migrateDatabase(getDb());
const tripId = newId();
const now = new Date();
await getDb()
  .insert(trip)
  .values({ id: tripId, name: "Ridge", startDate: "2199-06-01", timeZone: "UTC", createdAt: now, updatedAt: now });
const leader = await makeMember(tripId, "Leader", "leader");
const self = await makeMember(tripId, "Self", "participant");
const other = await makeMember(tripId, "Other", "participant");

const details = {
  tripId,
  phone: "+99 000 77 66",
  emergencyContacts: [{ name: `${CANARY}-contact`, phone: "+99 000 77 67", relation: `${CANARY}-relation` }],
  health: `${CANARY}-health`,
  diet: `${CANARY}-diet`,
};
await saveOwnDetails({ ctx: self, input: { ...details, version: 0, hasConsent: true } });
const refusals = [
  await ask(() => saveOwnDetails({ ctx: self, input: { ...details, version: 9, hasConsent: true } })),
  await ask(() => saveOwnDetails({ ctx: self, input: { ...details, version: 1, hasConsent: false as true } })),
  await ask(() =>
    saveOwnDetails({ ctx: self, input: { ...details, version: 1, hasConsent: true, diet: `${CANARY} `.repeat(100) } }),
  ),
  await ask(() => getContactSheet({ ctx: other, input: { tripId } })),
];
await saveAnswer({ ctx: self, input: { tripId, value: "yes", note: "" } });
const plan = {
  tripId,
  version: 0,
  dueBackDay: "2199-06-05",
  dueBackTime: "18:00",
  outsideName: "Out",
  outsideEmail: "out@example.test",
};
const steps = [{ afterMinutes: 60, who: "Hut", phone: "", action: "Ask." }];
await saveEmergencyPlan({ ctx: leader, input: { ...plan, steps } });
await sendEmergencyPlan({ ctx: leader, input: { tripId, requestId: newId() } });
await runDue();
await resealDetails();
const fake = await startFakeSmtpServer(captureMail);
const transport = createTransport(fake.url);
await runOutboxOnce(transport);
transport.close();
await fake.close();
const mails = await getDb().select().from(capturedMail);
const input = { tripId };
const toOthers = [
  ...refusals,
  await ask(() => exportAccount({ ctx: other })),
  await ask(() => getOwnDetails({ ctx: other, input })),
  await ask(() => getOwnAnswer({ ctx: other, input })),
  await ask(() => listPeople({ ctx: leader, input })),
  await ask(() => exportPeople({ ctx: leader, input })),
  await ask(() => listMessages({ ctx: leader, input })),
  await ask(() => getTripOverview({ ctx: leader, input })),
  await ask(() => getDb().select().from(outboxMessage).where(eq(outboxMessage.tripId, tripId))),
  ...mails.map((mail) => mail.raw.toString("utf8")),
];
const toThose = {
  self: await ask(() => getOwnDetails({ ctx: self, input })),
  export: await ask(() => exportAccount({ ctx: self })),
  leader: await ask(() => getContactSheet({ ctx: leader, input })),
};
writeFileSync(process.env.OUT ?? "", JSON.stringify({ toOthers, toThose, mailCount: mails.length }));
if (process.env.KEEP_WAL !== "1") await closeDb();
process.exit(0);
