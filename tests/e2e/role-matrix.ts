/**
 * Who gets what: one row for every page, route handler and server action. Written by hand, not derived from the
 * permission table, so that a slip there shows. tests/unit/routes fails for a route without a row; the actions are
 * called in tests/integration/role-matrix, pages and route handlers over HTTP in role-matrix.spec.ts.
 */
export const CALLERS = ["nobody", "stranger", "participant", "coLeader", "leader", "otherLeader"] as const;
export type Caller = (typeof CALLERS)[number];

export type Outcome =
  | "allowed"
  /** As if it were not there. */
  | "not-found"
  /** Pages: to sign in, and back. */
  | "sign-in"
  /** Pages: on to one's own list of trips, or one's own pages of the trip. */
  | "to-trips"
  | "to-mine"
  /** Route handlers and actions: signed out, and the role does not let one. */
  | "signed-out"
  | "forbidden"
  /** Actions on one's own account or invitation that can't be done, with the reason. */
  | "refused";

interface Row {
  readonly name: string;
  /** When one route has several rows: which of them. */
  readonly when?: string;
  readonly outcome: Readonly<Record<Caller, Outcome>>;
}

function by(
  nobody: Outcome,
  stranger: Outcome,
  participant: Outcome,
  coLeader: Outcome,
  leader: Outcome,
  otherLeader: Outcome,
): Row["outcome"] {
  return { nobody, stranger, participant, coLeader, leader, otherLeader };
}

const row = (name: string, outcome: Row["outcome"], when?: string): Row => ({
  name,
  outcome,
  ...(when === undefined ? {} : { when }),
});

const YES = "allowed";
const NONE = "not-found";

const EVERYBODY = by(YES, YES, YES, YES, YES, YES);
const ENTRANCE = by(YES, "to-trips", "to-trips", "to-trips", "to-trips", "to-trips");
const PAGE_SIGNED_IN = by("sign-in", YES, YES, YES, YES, YES);
const PAGE_ON_TRIP = by("sign-in", NONE, YES, YES, YES, NONE);
const PAGE_LEADERS = by("sign-in", NONE, NONE, YES, YES, NONE);
const PAGE_LEADER = by("sign-in", NONE, NONE, NONE, YES, NONE);

/** Ids in the names stand for those of the leader's trip. */
export const PAGE_ROWS: readonly Row[] = [
  row("/", ENTRANCE),
  row("/sign-in", ENTRANCE),
  row("/sign-in/by-link", EVERYBODY),
  row("/sign-up", ENTRANCE),
  row("/forgot-password", EVERYBODY),
  row("/reset-password", EVERYBODY),
  row("/verify", EVERYBODY),
  row("/check-mail", EVERYBODY),
  row("/invitation/[token]", EVERYBODY),
  // Only where the demo sends to itself; elsewhere it is not there at all.
  row("/demo/mail", EVERYBODY),
  row("/demo/mail/[id]", EVERYBODY),
  row("/trips", PAGE_SIGNED_IN),
  row("/trips/new", PAGE_SIGNED_IN),
  row("/account", PAGE_SIGNED_IN),
  row("/quick-check", PAGE_SIGNED_IN),
  row("/knots", PAGE_SIGNED_IN),
  row("/gear", PAGE_SIGNED_IN),
  row("/gear/new", PAGE_SIGNED_IN),
  row("/gear/[gearId]", by("sign-in", NONE, NONE, NONE, YES, NONE), "gear of the leader"),
  row("/pull-tests", PAGE_SIGNED_IN),
  row("/pull-tests/compare", PAGE_SIGNED_IN),
  row("/pull-tests/[practicePullId]", by("sign-in", NONE, NONE, NONE, YES, NONE), "practice of the leader"),
  row("/trips/[tripId]", by("sign-in", NONE, "to-mine", YES, YES, NONE)),
  row("/trips/[tripId]/mine", PAGE_ON_TRIP),
  row("/trips/[tripId]/details", PAGE_ON_TRIP),
  row("/trips/[tripId]/messages", PAGE_ON_TRIP),
  row("/trips/[tripId]/settings", PAGE_LEADER),
  row("/trips/[tripId]/camps", PAGE_LEADER),
  row("/trips/[tripId]/camps/new", PAGE_LEADER),
  row("/trips/[tripId]/camps/[campId]", PAGE_LEADERS),
  row("/trips/[tripId]/camps/[campId]/place", PAGE_LEADERS),
  row("/trips/[tripId]/camps/[campId]/shelters", PAGE_LEADERS),
  row("/trips/[tripId]/pull-tests", PAGE_LEADERS),
  row("/trips/[tripId]/camps/[campId]/pull-tests", PAGE_LEADERS),
  row("/trips/[tripId]/camps/[campId]/pull-tests/[pullTestId]", PAGE_LEADERS),
  row("/trips/[tripId]/camps/[campId]/weather", PAGE_LEADERS),
  row("/trips/[tripId]/camps/[campId]/working/[pitchId]/[tieOutId]", PAGE_LEADERS),
  row("/trips/[tripId]/route", PAGE_LEADERS),
  row("/trips/[tripId]/shelters", PAGE_LEADERS),
  row("/trips/[tripId]/shelters/new", PAGE_LEADERS),
  row("/trips/[tripId]/shelters/[shelterId]", PAGE_LEADERS),
  row("/trips/[tripId]/kit", PAGE_LEADERS),
  row("/trips/[tripId]/kit/new", PAGE_LEADERS),
  row("/trips/[tripId]/kit/find", PAGE_LEADERS),
  row("/trips/[tripId]/kit/[kitItemId]", PAGE_LEADERS),
  row("/trips/[tripId]/people", PAGE_LEADERS),
  row("/trips/[tripId]/people/packing", PAGE_LEADERS),
  row("/trips/[tripId]/people/contacts", PAGE_LEADERS),
  row("/trips/[tripId]/emergency", PAGE_LEADERS),
  row("/trips/[tripId]/papers", PAGE_LEADERS),
  row("/trips/[tripId]/history", PAGE_LEADERS),
  row("/trips/[tripId]/history/[campId]/[version]", PAGE_LEADERS),
  row("/trips/[tripId]/camps/[campId]/comments", PAGE_LEADERS),
  row("/trips/[tripId]/post", PAGE_LEADER),
];

const ROUTE_SIGNED_IN = by("signed-out", YES, YES, YES, YES, YES);
const ROUTE_LEADERS = by("signed-out", NONE, "forbidden", YES, YES, NONE);
const ROUTE_LEADER = by("signed-out", NONE, "forbidden", "forbidden", YES, NONE);

/** A participant may print their own papers; others read as not there. */
const PAPER_OF_LEADERS = by("signed-out", NONE, NONE, YES, YES, NONE);
const PAPER_OF_PARTICIPANT = by("signed-out", NONE, YES, YES, YES, NONE);

export const ROUTE_ROWS: readonly Row[] = [
  row("GET /healthz", EVERYBODY),
  row("GET /readyz", EVERYBODY),
  row("GET /api/auth/[...all]", EVERYBODY),
  row("POST /api/auth/[...all]", EVERYBODY),
  row("GET /demo/mail/[id]/[n]", EVERYBODY),
  row("POST /api/quick-check", ROUTE_SIGNED_IN),
  row("GET /api/trips/[tripId]/camps/[campId]/pull-tests", ROUTE_LEADERS),
  row("POST /api/trips/[tripId]/camps/[campId]/pull-tests", ROUTE_LEADERS),
  row("GET /api/trips/[tripId]/camps/[campId]/practice-sheet", ROUTE_LEADERS),
  row("GET /api/pull-tests/practice-sheet", ROUTE_SIGNED_IN),
  row("GET /api/pull-tests", ROUTE_SIGNED_IN),
  row("POST /api/pull-tests", ROUTE_SIGNED_IN),
  row("PUT /api/pull-tests/[pullTestId]/photo", ROUTE_LEADERS),
  row("GET /api/pull-tests/[pullTestId]/photo", ROUTE_LEADERS),
  row("DELETE /api/pull-tests/[pullTestId]/photo", ROUTE_LEADERS),
  row("GET /api/trips/[tripId]/camps/[campId]/plan", ROUTE_LEADERS),
  row("POST /api/trips/[tripId]/camps/[campId]/plan", ROUTE_LEADERS),
  row("POST /api/trips/[tripId]/camps/[campId]/analyses", ROUTE_LEADERS),
  row("PATCH /api/trips/[tripId]/camps/[campId]/pitches/[pitchId]", ROUTE_LEADERS),
  row("GET /api/account/export", ROUTE_SIGNED_IN),
  row("GET /api/trips/[tripId]/people", ROUTE_LEADER),
  row("GET /api/trips/[tripId]/kit-search", ROUTE_LEADERS),
  row("POST /api/trips/[tripId]/kit-search", ROUTE_LEADERS),
  row("DELETE /api/trips/[tripId]/kit-search", ROUTE_LEADERS),
  row("GET /api/trips/[tripId]/contact-sheet", ROUTE_LEADERS),
  row("GET /api/gpx/[tripId]", ROUTE_LEADERS),
  row("POST /api/gpx/[tripId]", ROUTE_LEADER),
  row("GET /api/trips/[tripId]/calendar", by("signed-out", NONE, YES, YES, YES, NONE)),
  row("GET /api/trips/[tripId]/papers", PAPER_OF_LEADERS, "field-card"),
  row("GET /api/trips/[tripId]/papers", PAPER_OF_LEADERS, "booklet"),
  row("GET /api/trips/[tripId]/papers", PAPER_OF_LEADERS, "pack-list of the leader"),
  row("GET /api/trips/[tripId]/papers", PAPER_OF_PARTICIPANT, "pack-list of the participant"),
  row("GET /api/trips/[tripId]/papers", PAPER_OF_LEADERS, "pitch-and-pack of the leader"),
  row("GET /api/trips/[tripId]/papers", PAPER_OF_PARTICIPANT, "pitch-and-pack of the participant"),
];

const ACTION_SIGNED_IN = by("signed-out", YES, YES, YES, YES, YES);
const ACTION_ON_TRIP = by("signed-out", NONE, YES, YES, YES, NONE);
const ACTION_LEADERS = by("signed-out", NONE, "forbidden", YES, YES, NONE);
const ACTION_LEADER = by("signed-out", NONE, "forbidden", "forbidden", YES, NONE);
const ACTION_OWN = by("signed-out", NONE, NONE, NONE, YES, NONE);

export const ACTION_ROWS: readonly Row[] = [
  row("(auth)#signInAction", EVERYBODY),
  row("(auth)#signUpAction", EVERYBODY),
  row("(auth)#requestResetAction", EVERYBODY),
  row("(auth)#resetPasswordAction", EVERYBODY),
  row("(auth)#verifyAction", EVERYBODY),
  row("(auth)#signOutAction", EVERYBODY),
  row("(auth)#requestSignInLinkAction", EVERYBODY),
  row("(auth)#signInByLinkAction", EVERYBODY),
  row("(auth)#answerInvitationAction", EVERYBODY),
  row("(auth)#signUpWithInvitationAction", EVERYBODY),
  row(
    "(auth)#acceptInvitationAction",
    by("signed-out", YES, "refused", "refused", "refused", "refused"),
    "invitation of the stranger",
  ),
  row("account#saveNameAction", ACTION_SIGNED_IN),
  row("account#changePasswordAction", ACTION_SIGNED_IN),
  row("account#savePreferencesAction", ACTION_SIGNED_IN),
  row("account#signOutAction", ACTION_SIGNED_IN),
  row("account#endSessionAction", by("signed-out", "refused", "refused", "refused", YES, "refused"), "of the leader"),
  // Who leads a trip with others on it hands it over first.
  row("account#deleteAccountAction", by("signed-out", YES, YES, YES, "refused", "refused")),
  row("gear#createGearAction", ACTION_SIGNED_IN),
  row("gear#updateGearAction", ACTION_OWN, "gear of the leader"),
  row("gear#deleteGearAction", ACTION_OWN, "gear of the leader"),
  row("pull-tests#logPracticePullAction", ACTION_SIGNED_IN),
  row("pull-tests#updatePracticePullAction", ACTION_OWN, "practice of the leader"),
  row("pull-tests#switchPullTestAction", ACTION_LEADERS, "at a camp of the leader"),
  row("pull-tests#deletePullTestAction", ACTION_LEADERS, "at a camp of the leader"),
  row("trips#createTripAction", ACTION_SIGNED_IN),
  row("trips#copyTripAction", ACTION_LEADER),
  row("trips/[tripId]/settings#updateTripAction", ACTION_LEADER),
  row("trips/[tripId]/settings#deleteTripAction", ACTION_LEADER),
  row("trips/[tripId]/camps#createCampAction", ACTION_LEADER),
  row("trips/[tripId]/camps#updateCampAction", ACTION_LEADERS),
  row("trips/[tripId]/camps#copyCampAction", ACTION_LEADER),
  row("trips/[tripId]/camps#reorderCampsAction", ACTION_LEADER),
  row("trips/[tripId]/camps#deleteCampAction", ACTION_LEADER),
  row("trips/[tripId]/route#saveRouteSettingsAction", ACTION_LEADER),
  row("trips/[tripId]/route#placeCampAction", ACTION_LEADERS),
  row("trips/[tripId]/route#drawRouteAction", ACTION_LEADER),
  row("trips/[tripId]/route#deleteRouteAction", ACTION_LEADER),
  row("trips/[tripId]/route#createCampsFromPlacesAction", ACTION_LEADER),
  row("trips/[tripId]/camps/[campId]/weather#fetchForecastAction", ACTION_LEADERS),
  row("trips/[tripId]/camps/[campId]/weather#checkAllCampsAction", ACTION_LEADERS),
  row("trips/[tripId]/camps/[campId]/weather#acceptForecastAction", ACTION_LEADERS),
  row("trips/[tripId]/camps/[campId]/weather#createAlternativeAction", ACTION_LEADER),
  row("trips/[tripId]/camps/[campId]/weather#switchToAlternativeAction", ACTION_LEADERS),
  row("trips/[tripId]/camps/[campId]/shelters#createPitchAction", ACTION_LEADERS),
  row("trips/[tripId]/camps/[campId]/shelters#updatePitchAction", ACTION_LEADERS),
  row("trips/[tripId]/camps/[campId]/shelters#deletePitchAction", ACTION_LEADERS),
  row("trips/[tripId]/camps/[campId]/shelters#saveSleepersAction", ACTION_LEADERS),
  row("trips/[tripId]/camps/[campId]/pull-tests#logPullTestAction", ACTION_LEADERS),
  row("trips/[tripId]/camps/[campId]/pull-tests#updatePullTestAction", ACTION_LEADERS),
  row("trips/[tripId]/camps/[campId]/pull-tests#chooseElsewhereAction", ACTION_LEADERS),
  row("trips/[tripId]/camps/[campId]/pull-tests#startAgainAction", ACTION_LEADERS),
  row("trips/[tripId]/shelters#createShelterAction", ACTION_LEADERS),
  row("trips/[tripId]/shelters#updateShelterAction", ACTION_LEADERS),
  row("trips/[tripId]/shelters#copyShelterAction", ACTION_LEADERS),
  row("trips/[tripId]/shelters#deleteShelterAction", ACTION_LEADERS),
  row("trips/[tripId]/kit#createKitItemAction", ACTION_LEADERS),
  row("trips/[tripId]/kit#addKitItemAction", ACTION_LEADERS),
  row("trips/[tripId]/kit#updateKitItemAction", ACTION_LEADERS),
  row("trips/[tripId]/kit#countKitItemAction", ACTION_LEADERS),
  row("trips/[tripId]/kit#deleteKitItemAction", ACTION_LEADERS),
  row("trips/[tripId]/kit/find#acceptKitAction", ACTION_LEADERS),
  row("trips/[tripId]/people#createPersonAction", ACTION_LEADER),
  row("trips/[tripId]/people#updatePersonAction", ACTION_LEADER),
  row("trips/[tripId]/people#invitePersonAction", ACTION_LEADER),
  row("trips/[tripId]/people#updateRosterAction", ACTION_LEADER),
  row("trips/[tripId]/people#remindNowAction", ACTION_LEADER),
  row("trips/[tripId]/people#importPeopleAction", ACTION_LEADER),
  row("trips/[tripId]/details#saveAnswerAction", ACTION_ON_TRIP),
  row("trips/[tripId]/details#saveOwnDetailsAction", ACTION_ON_TRIP),
  row("trips/[tripId]/details#deleteOwnDetailsAction", ACTION_ON_TRIP),
  row("trips/[tripId]/emergency#saveEmergencyPlanAction", ACTION_LEADER),
  row("trips/[tripId]/emergency#sendEmergencyPlanAction", ACTION_LEADER),
  row("trips/[tripId]/emergency#tellBackSafelyAction", ACTION_LEADER),
  row("trips/[tripId]/people#deletePersonAction", ACTION_LEADER),
  row("trips/[tripId]/people/packing#savePackItemsAction", ACTION_LEADERS),
  row("trips/[tripId]/people/packing#assignCarryAction", ACTION_LEADERS),
  row("trips/[tripId]/people/packing#shareOutEvenlyAction", ACTION_LEADERS),
  row("trips/[tripId]/people/packing#saveGroupThingsAction", ACTION_LEADERS),
  row("trips/[tripId]/people/packing#saveShelterSplitAction", ACTION_LEADERS),
  row("trips/[tripId]/people/packing#saveLimitAction", ACTION_LEADERS),
  row("trips/[tripId]/people/packing#addSeasonItemsAction", ACTION_LEADERS),
  row("trips/[tripId]/mine#saveOwnLoadAction", ACTION_ON_TRIP),
  row("trips/[tripId]/mine#tickPackItemAction", ACTION_ON_TRIP),
  row("trips/[tripId]/mine#markOwnPagesReadAction", ACTION_ON_TRIP),
  row("trips/[tripId]/comments#createCommentAction", ACTION_LEADERS),
  row("trips/[tripId]/comments#deleteCommentAction", ACTION_LEADERS),
  row("trips/[tripId]/history#restorePlanVersionAction", ACTION_LEADERS),
  row("trips/[tripId]/papers#sendPapersAction", ACTION_LEADER),
  row("trips/[tripId]/post#retryMessageAction", ACTION_LEADER),
  row("trips/[tripId]/post#cancelPlannedSendAction", ACTION_LEADER),
  row("trips/[tripId]/post#deleteTemplateAction", ACTION_LEADER),
  row("trips/[tripId]/post#callOffTripAction", ACTION_LEADER),
  row(
    "trips/[tripId]/messages#markMessageReadAction",
    by("signed-out", NONE, NONE, NONE, YES, NONE),
    "message to the leader",
  ),
];
