import type { TwoTrips } from "../../helpers/two-trips";
import { cordOf, PASSWORD } from "../../helpers/two-trips";
import { practicePullOf, pullOf } from "../../helpers/pulls";
import { shelterOf, windyCamp } from "../../helpers/camp-kit";
import { newId } from "@/lib/domain/ids";

type Value = string | number | boolean | object | null;

/** As a form sends it: numbers and switches by their suffix, everything nested as JSON. */
export function formOf(values: Readonly<Record<string, Value>>): FormData {
  const form = new FormData();
  for (const [name, value] of Object.entries(values)) {
    if (typeof value === "string") form.append(name, value);
    else if (typeof value === "number") form.append(`${name}:number`, String(value));
    else if (typeof value === "boolean") form.append(`${name}:boolean`, String(value));
    else form.append(`${name}:json`, JSON.stringify(value));
  }
  return form;
}

/** Typed in grams, as the form of a cord does. */
const typedCord = (name: string, count = 2) => ({ ...cordOf(name), massKg: 100, count });
const OPEN_SETTINGS = {
  paceRatio: null,
  fitness: null,
  breakMinPerHour: null,
  pitchingMin: null,
  bodyKg: null,
  packKg: null,
  terrain: null,
  heat: null,
};
const NEW_PASSWORD = "two hitches on a cold ridge";

/** For each server action what a person who may do it would send, on the first trip. */
export function validForms(given: TwoTrips): Readonly<Record<string, Readonly<Record<string, Value>>>> {
  const { a, users, tokens, leaderSessionId } = given;
  const { tripId, campId } = a;
  const camp = { tripId, campId };
  return {
    "(auth)#signInAction": { email: users.leader.email, password: PASSWORD, next: "/trips" },
    "(auth)#signUpAction": { name: "Ada Moss", email: "ada@example.test", password: PASSWORD },
    "(auth)#requestResetAction": { email: users.leader.email },
    "(auth)#resetPasswordAction": { token: tokens.reset, password: NEW_PASSWORD },
    "(auth)#verifyAction": { token: tokens.verification },
    "(auth)#signOutAction": {},
    "(auth)#requestSignInLinkAction": { email: users.leader.email },
    "(auth)#signInByLinkAction": { token: tokens.signInLink },
    "(auth)#answerInvitationAction": { token: tokens.invitation, value: "maybe", note: "After work." },
    "(auth)#signUpWithInvitationAction": { token: tokens.invitation, name: "Wanda Waiting", password: PASSWORD },
    "(auth)#acceptInvitationAction": { token: tokens.invitationOfStranger },
    "account#saveNameAction": { name: "Another Name" },
    "account#changePasswordAction": { currentPassword: PASSWORD, newPassword: NEW_PASSWORD },
    "account#savePreferencesAction": { speedUnit: "knots", forceUnit: "N", lengthUnit: "m", paperSize: "A4" },
    "account#signOutAction": {},
    "account#endSessionAction": { sessionId: leaderSessionId },
    "account#deleteAccountAction": { password: PASSWORD },
    "gear#createGearAction": { details: { type: "anchor", anchor: typedCord("My cord") } },
    "gear#updateGearAction": {
      gearId: a.gearId,
      version: 1,
      details: { type: "anchor", anchor: typedCord("My cord") },
    },
    "gear#deleteGearAction": { gearId: a.gearId },
    "trips#createTripAction": { name: "New trip", startDate: "2027-08-01", timeZone: "Europe/Oslo", notes: "" },
    "trips#copyTripAction": { tripId, name: "Same again", startDate: "2027-09-01", withPeople: true },
    "trips/[tripId]/settings#updateTripAction": {
      tripId,
      version: 1,
      name: "Hidden valley, later",
      startDate: "2027-06-08",
      timeZone: "Europe/Oslo",
      notes: "",
      contacts: [{ name: "Warden", phone: "+99 000 01 42", note: "" }],
    },
    "trips/[tripId]/settings#deleteTripAction": { tripId, confirmName: "Hidden valley" },
    "trips/[tripId]/camps#createCampAction": { tripId, details: { name: "New camp", nights: 1 } },
    "trips/[tripId]/camps#updateCampAction": { ...camp, version: 1, details: windyCamp({ name: "Otter Flat, lower" }) },
    "trips/[tripId]/camps#copyCampAction": { ...camp, withSleepers: true },
    "trips/[tripId]/camps#reorderCampsAction": { tripId, campIds: [a.spareCampId, campId] },
    "trips/[tripId]/camps#deleteCampAction": { ...camp, confirmed: true },
    "trips/[tripId]/route#saveRouteSettingsAction": {
      tripId,
      version: 0,
      lengthUnit: "m",
      settings: { rule: "slowest", linesLower: 0, isOffPath: false, setOffMinute: "09:00", ...OPEN_SETTINGS },
      legs: [{ campId, leg: { distanceM: 12, ascentM: 300, descentM: 20, setOffMinute: "" } }],
      homeLeg: { distanceM: null, ascentM: null, descentM: null, setOffMinute: null },
    },
    "trips/[tripId]/route#placeCampAction": { ...camp, version: 1, atM: 900, position: "line" },
    "trips/[tripId]/route#drawRouteAction": {
      tripId,
      points: [
        { latitude: 60, longitude: 8 },
        { latitude: 60.1, longitude: 8.1 },
      ],
    },
    "trips/[tripId]/route#deleteRouteAction": { tripId },
    "trips/[tripId]/route#createCampsFromPlacesAction": { tripId, places: [0] },
    "trips/[tripId]/camps/[campId]/weather#fetchForecastAction": camp,
    "trips/[tripId]/camps/[campId]/weather#checkAllCampsAction": { tripId },
    "trips/[tripId]/camps/[campId]/weather#acceptForecastAction": { ...camp, forecastId: a.forecastId, version: 1 },
    "trips/[tripId]/camps/[campId]/weather#createAlternativeAction": { ...camp, name: "Bield below" },
    "trips/[tripId]/camps/[campId]/weather#switchToAlternativeAction": { tripId, campId: a.alternativeId },
    "trips/[tripId]/camps/[campId]/shelters#createPitchAction": { ...camp, shelterId: a.spareShelterId },
    "trips/[tripId]/camps/[campId]/shelters#updatePitchAction": {
      ...camp,
      pitchId: a.pitchId,
      version: 1,
      details: { headingDeg: 10, patch: "main", dimensions: {}, lineLengthsM: {} },
    },
    "trips/[tripId]/camps/[campId]/shelters#deletePitchAction": { ...camp, pitchId: a.pitchId, confirmed: true },
    "trips/[tripId]/camps/[campId]/shelters#saveSleepersAction": {
      ...camp,
      sleepers: [{ personId: given.personIds.leader, pitchId: a.pitchId }],
    },
    "trips/[tripId]/shelters#createShelterAction": { tripId, details: shelterOf("dome", { name: "Dome" }) },
    "trips/[tripId]/shelters#updateShelterAction": {
      tripId,
      shelterId: a.shelterId,
      version: 1,
      details: shelterOf("ridge-tarp", { name: "Wide tarp" }),
    },
    "trips/[tripId]/shelters#copyShelterAction": { tripId, shelterId: a.shelterId },
    "trips/[tripId]/shelters#deleteShelterAction": { tripId, shelterId: a.shelterId, confirmed: true },
    "trips/[tripId]/kit#createKitItemAction": { tripId, details: typedCord("More cord") },
    "trips/[tripId]/kit#addKitItemAction": { tripId, details: cordOf("More cord") },
    "trips/[tripId]/kit#updateKitItemAction": {
      tripId,
      kitItemId: a.cordId,
      version: 1,
      details: typedCord("Cord", 3),
    },
    "trips/[tripId]/kit#countKitItemAction": { tripId, kitItemId: a.cordId, version: 1, count: 5 },
    "trips/[tripId]/kit#deleteKitItemAction": { tripId, kitItemId: a.bladeId, confirmed: true },
    "trips/[tripId]/kit/find#acceptKitAction": { tripId },
    "trips/[tripId]/people#createPersonAction": {
      tripId,
      name: "Bo Byr",
      email: "bo@example.test",
      role: "participant",
    },
    "trips/[tripId]/people#updatePersonAction": {
      tripId,
      personId: a.waitingId,
      name: "Wanda W",
      role: "co-leader",
      version: 1,
    },
    "trips/[tripId]/people#invitePersonAction": { tripId, personId: a.waitingId },
    "trips/[tripId]/people#updateRosterAction": {
      tripId,
      version: 0,
      capacity: 8,
      answerBy: "2027-06-01",
      remindDaysBefore: 3,
      keepDetailsDays: 30,
    },
    "trips/[tripId]/people#remindNowAction": { tripId, requestId: newId() },
    "trips/[tripId]/people#importPeopleAction": { tripId, csv: "name,email\nCy Dale,cy@example.test", isTrial: false },
    "trips/[tripId]/details#saveAnswerAction": { tripId, value: "yes", note: "" },
    "trips/[tripId]/details#saveOwnDetailsAction": {
      tripId,
      version: 1,
      phone: "+99 000 22 11",
      emergencyContacts: [{ name: "Ada Moss", phone: "+99 000 22 12", relation: "sister" }],
      health: "Bee stings.",
      diet: "",
      hasConsent: true,
    },
    "trips/[tripId]/details#deleteOwnDetailsAction": { tripId },
    "trips/[tripId]/emergency#saveEmergencyPlanAction": {
      tripId,
      version: 1,
      dueBackDay: "2027-06-10",
      dueBackTime: "18:30",
      outsideName: "Ines Marlow",
      outsideEmail: "ines@example.test",
      steps: [{ afterMinutes: 120, who: "Mountain rescue", phone: "112", action: "Call and read this plan." }],
    },
    "trips/[tripId]/emergency#sendEmergencyPlanAction": { tripId, requestId: newId() },
    "trips/[tripId]/emergency#tellBackSafelyAction": { tripId, requestId: newId() },
    "trips/[tripId]/people#deletePersonAction": { tripId, personId: a.waitingId, confirmed: true },
    "trips/[tripId]/people/packing#savePackItemsAction": {
      tripId,
      personId: given.personIds.participant,
      items: [{ id: null, name: "Map", isGroupThing: true, massKg: 0.1 }],
    },
    "trips/[tripId]/people/packing#assignCarryAction": {
      tripId,
      carries: [{ type: "kit", personId: given.personIds.leader, kitItemId: a.cordId, count: 2 }],
    },
    "trips/[tripId]/people/packing#shareOutEvenlyAction": { tripId },
    "trips/[tripId]/people/packing#saveGroupThingsAction": {
      tripId,
      things: [{ id: null, name: "Stove", massKg: 0.4 }],
    },
    "trips/[tripId]/people/packing#saveShelterSplitAction": {
      tripId,
      shelterId: a.shelterId,
      polesMassKg: 0.2,
      staysWithSleepers: true,
    },
    "trips/[tripId]/people/packing#saveLimitAction": {
      tripId,
      personId: given.personIds.participant,
      baseMassKg: 9,
      limitKg: 16,
    },
    "trips/[tripId]/people/packing#addSeasonItemsAction": { tripId, season: "winter" },
    "trips/[tripId]/mine#saveOwnLoadAction": {
      tripId,
      baseMassKg: 9,
      bodyMassKg: 70,
      limitPercent: 25,
      limitKg: null,
    },
    "trips/[tripId]/mine#tickPackItemAction": { tripId, key: `item:${a.packItemId}`, isTicked: true },
    "trips/[tripId]/mine#markOwnPagesReadAction": { tripId, changedAt: given.changedAt },
    "trips/[tripId]/comments#createCommentAction": {
      tripId,
      commentId: newId(),
      subject: { about: "camp", campId },
      body: "Look at the wall, please.",
    },
    "trips/[tripId]/comments#deleteCommentAction": { tripId, commentId: given.commentId },
    "trips/[tripId]/history#restorePlanVersionAction": {
      tripId,
      campId,
      version: 1,
      baseVersion: 1,
      intentId: newId(),
    },
    "trips/[tripId]/papers#sendPapersAction": {
      tripId,
      requestId: newId(),
      personIds: [given.personIds.participant],
      pieces: ["pack-list"],
      subject: "Your cards",
      message: "",
      paperSize: "A4",
    },
    "trips/[tripId]/camps/[campId]/pull-tests#logPullTestAction": { ...camp, ...pullOf(newId()) },
    "trips/[tripId]/camps/[campId]/pull-tests#updatePullTestAction": { ...camp, ...pullOf(a.pullTestId), version: 1 },
    "trips/[tripId]/camps/[campId]/pull-tests#chooseElsewhereAction": { ...camp, patch: "main", usesElsewhere: false },
    "trips/[tripId]/camps/[campId]/pull-tests#startAgainAction": { ...camp, patch: "main" },
    "pull-tests#logPracticePullAction": practicePullOf(newId()),
    "pull-tests#updatePracticePullAction": { ...practicePullOf(a.practicePullId), version: 1 },
    "pull-tests#switchPullTestAction": { pullTestId: a.pullTestId, isOff: true },
    "pull-tests#deletePullTestAction": { pullTestId: a.pullTestId },
    "trips/[tripId]/post#retryMessageAction": { tripId, messageId: a.messageId },
    "trips/[tripId]/post#cancelPlannedSendAction": { tripId, plannedSendId: given.plannedSendId },
    "trips/[tripId]/post#deleteTemplateAction": { tripId, templateId: given.templateId },
    "trips/[tripId]/post#callOffTripAction": { tripId, requestId: newId(), isOff: true, message: "Too much wind." },
    "trips/[tripId]/messages#markMessageReadAction": { tripId, messageId: given.ownMessageId },
  };
}
