import { eq } from "drizzle-orm";
import { getDb } from "@/db/client";
import { person, trip } from "@/db/schema";
import { newId } from "@/lib/domain/ids";
import { addDays } from "@/lib/format/days";
import { saveAnswer } from "@/lib/services/answers/save-answer";
import type { Context } from "@/lib/services/context/context";
import { saveOwnDetails } from "@/lib/services/details/save-own-details";
import { saveEmergencyPlan } from "@/lib/services/emergency/save-emergency-plan";
import { sendEmergencyPlan } from "@/lib/services/emergency/send-emergency-plan";
import { planSend } from "@/lib/services/planned-sends/plan-send";
import { updateRoster } from "@/lib/services/roster/update-roster";
import { saveTemplate } from "@/lib/services/templates/save-template";

type ContextOf = (email: string) => Context;

/** Invented. The browser tests look for parts of it in whatever other people are shown. */
const DETAILS = [
  {
    email: "runa@leestead.example",
    phone: "+99 000 03 10",
    emergencyContacts: [{ name: "Edda Amsel", phone: "+99 000 03 11", relation: "sister" }],
    health: "",
    diet: "Eats everything.",
  },
  {
    email: "tobi@leestead.example",
    phone: "+99 000 03 20",
    emergencyContacts: [{ name: "Femi Oduya", phone: "+99 000 03 21", relation: "husband" }],
    health: "Left knee: saddle-sore after long descents, takes his own poles.",
    diet: "",
  },
  {
    email: "marco@leestead.example",
    phone: "+99 000 03 40",
    emergencyContacts: [
      { name: "Giulia Ferrobello", phone: "+99 000 03 41", relation: "mother" },
      { name: "Nino Ferrobello", phone: "+99 000 03 42", relation: "brother" },
    ],
    health: "Asthma with hazel pollen. Inhaler in the lid of the rucksack, second one with Tobi.",
    diet: "No nuts.",
  },
] as const;

const ANSWERS = [
  { email: "kirsi@leestead.example", value: "yes", note: "" },
  { email: "marco@leestead.example", value: "yes", note: "I come by the late train." },
  { email: "lucja@leestead.example", value: "yes", note: "" },
  { email: "ihor@leestead.example", value: "maybe", note: "Waiting for my shifts." },
] as const;

async function listPersonIds(tripId: string): Promise<string[]> {
  const rows = await getDb().select({ id: person.id }).from(person).where(eq(person.tripId, tripId));
  return rows.map((row) => row.id);
}

/** Answers, own details, the emergency plan that somebody at home has, a template and a message for later. */
export async function writeAboutPeople(leader: Context, contextOf: ContextOf, tripId: string): Promise<void> {
  const [row] = await getDb().select({ startDate: trip.startDate }).from(trip).where(eq(trip.id, tripId));
  const startDate = row?.startDate ?? "";
  await updateRoster({
    ctx: leader,
    input: {
      tripId,
      version: 0,
      capacity: 8,
      answerBy: addDays(startDate, -21),
      remindDaysBefore: 3,
      keepDetailsDays: 30,
    },
  });
  for (const { email, value, note } of ANSWERS) {
    await saveAnswer({ ctx: contextOf(email), input: { tripId, value, note } });
  }
  for (const { email, emergencyContacts, ...details } of DETAILS) {
    const input = {
      tripId,
      version: 0,
      hasConsent: true as const,
      emergencyContacts: [...emergencyContacts],
      ...details,
    };
    await saveOwnDetails({ ctx: contextOf(email), input });
  }
  await saveEmergencyPlan({
    ctx: leader,
    input: {
      tripId,
      version: 0,
      meetingPoints: "The bridge below Skarn Edge, at every full hour. Without light: stay where you are.",
      wayOut: "From Skarn Edge down the east burn to the forest road, 2 h, then left to the hut at the lake.",
      groupPhone: "+99 000 03 10",
      dueBackDay: addDays(startDate, 5),
      dueBackTime: "18:00",
      outsideName: "Edda Amsel",
      outsideEmail: "edda@leestead.example",
      outsidePhone: "+99 000 03 11",
      steps: [
        { afterMinutes: 60, who: "The group", phone: "+99 000 03 10", action: "Ring, and send a text." },
        { afterMinutes: 180, who: "Hut at the lake", phone: "+99 000 03 00", action: "Ask whether they came by." },
        { afterMinutes: 360, who: "Mountain rescue", phone: "112", action: "Call, and read this plan to them." },
      ],
    },
  });
  await sendEmergencyPlan({ ctx: leader, input: { tripId, requestId: newId() } });
  await saveTemplate({
    ctx: leader,
    input: {
      tripId,
      name: "Train and meeting",
      subject: "{trip}: the train, and where we meet",
      body: "Hello {name},\n\nwe meet on the platform, in front of the last coach. Whoever comes later rings me.\n\n{leader}",
    },
  });
  await planSend({
    ctx: leader,
    input: {
      tripId,
      requestId: newId(),
      personIds: await listPersonIds(tripId),
      pieces: ["pack-list", "calendar"],
      subject: "{trip}: one week to go",
      message: "Hello {name},\n\nin a week we are on our way. Look through your list once more.\n\n{leader}",
      paperSize: "A4",
      sendDay: addDays(startDate, -7),
      sendTime: "08:00",
    },
  });
}
