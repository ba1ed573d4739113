import { makeCast, makePerson, makeTrip, makeUser } from "../../helpers/actors";
import { clearLimits } from "../../helpers/outbox";
import { codeOf, refusalOf } from "../../helpers/refusals";
import { readTrip } from "../../helpers/table-hash";
import { and, eq } from "drizzle-orm";
import fc from "fast-check";
import { afterEach, beforeEach, describe, expect, it, vi } from "vitest";
import { getDb } from "@/db/client";
import { person, personalDetail, trip, tripCalendar, user } from "@/db/schema";
import { addDays } from "@/lib/format/days";
import { exportAccount } from "@/lib/services/account/export-account";
import { prepareAccountDeletion } from "@/lib/services/account/prepare-account-deletion";
import { deleteOwnDetails } from "@/lib/services/details/delete-own-details";
import { getContactSheet } from "@/lib/services/details/get-contact-sheet";
import { getOwnDetails } from "@/lib/services/details/get-own-details";
import { saveOwnDetails } from "@/lib/services/details/save-own-details";
import { seal, unseal } from "@/lib/services/details/seal";
import { deleteOldDetails, resealDetails } from "@/lib/services/details/tend-details";
import { saveAnswer } from "@/lib/services/answers/save-answer";

beforeEach(clearLimits);

type Cast = Awaited<ReturnType<typeof makeCast>>;
type Who = "leader" | "coLeader" | "participant" | "stranger" | "otherLeader";

const DETAILS = {
  phone: "+99 000 22 11",
  emergencyContacts: [{ name: "Ada Moss", phone: "112", relation: "sister" }],
  health: "Asthma: inhaler in the left pocket.",
  diet: "No nuts.",
};

const write = (cast: Cast, who: Who, over: object = {}) =>
  saveOwnDetails({
    ctx: cast[who].ctx,
    input: { tripId: cast.tripId, version: 0, hasConsent: true, ...DETAILS, ...over },
  });
const read = (cast: Cast, who: Who) => getOwnDetails({ ctx: cast[who].ctx, input: { tripId: cast.tripId } });
const sheet = (cast: Cast, who: Who) => getContactSheet({ ctx: cast[who].ctx, input: { tripId: cast.tripId } });
const rowsOf = (tripId: string) => getDb().select().from(personalDetail).where(eq(personalDetail.tripId, tripId));

describe("own details", () => {
  it("are written by oneself, kept with what was agreed to and when, and read by who leads", async () => {
    const cast = await makeCast();
    await write(cast, "participant");
    const own = await read(cast, "participant");
    expect(own).toMatchObject({ details: DETAILS, version: 1 });
    expect(own.consent?.text).toMatch(/deleted 30 days after the trip/);
    expect(Date.parse(own.consent?.at ?? "")).toBeGreaterThan(Date.now() - 60_000);
    for (const who of ["leader", "coLeader"] as const) {
      const { people } = await sheet(cast, who);
      expect(people.map((one) => [one.role, one.details])).toEqual([
        ["leader", null],
        ["co-leader", null],
        ["participant", DETAILS],
      ]);
    }
  });

  it.each([
    ["participant", "forbidden"],
    ["stranger", "not-found"],
    ["otherLeader", "not-found"],
  ] as const)("are not shown to %s", async (who, code) => {
    const cast = await makeCast();
    await write(cast, "coLeader");
    expect(await codeOf(sheet(cast, who))).toBe(code);
    if (who === "participant") expect((await read(cast, who)).details.health).toBe("");
    else expect(await codeOf(read(cast, who))).toBe(code);
    if (who !== "participant") expect(await codeOf(write(cast, who))).toBe(code);
  });

  it("are not kept without a yes, nor over a newer state", async () => {
    const cast = await makeCast();
    expect((await refusalOf(write(cast, "participant", { hasConsent: false }))).fieldErrors).toHaveProperty(
      "hasConsent",
    );
    expect(await rowsOf(cast.tripId)).toEqual([]);
    await write(cast, "participant");
    expect(await codeOf(write(cast, "participant", { health: "other" }))).toBe("conflict");
    expect((await read(cast, "participant")).details.health).toBe(DETAILS.health);
  });

  it.each([
    ["phone", { phone: "call me" }],
    ["health", { health: "x".repeat(5000) }],
    ["diet", { diet: 7 }],
    ["emergencyContacts", { emergencyContacts: Array.from({ length: 4 }, () => ({ name: "A", phone: "112" })) }],
    ["emergencyContacts.0.phone", { emergencyContacts: [{ name: "A", phone: "" }] }],
    ["emergencyContacts.0.name", { emergencyContacts: [{ name: "x".repeat(5000), phone: "112" }] }],
    ["emergencyContacts", { emergencyContacts: "mum" }],
  ])("name the field %s for bad input %#", async (field, bad) => {
    const cast = await makeCast();
    expect((await refusalOf(write(cast, "participant", bad))).fieldErrors).toHaveProperty(field);
    expect(await rowsOf(cast.tripId)).toEqual([]);
  });

  it("leave out lines that were left empty", async () => {
    const cast = await makeCast();
    const empty = { name: "", phone: " ", relation: "" };
    await write(cast, "participant", { emergencyContacts: [empty, ...DETAILS.emergencyContacts, empty] });
    expect((await read(cast, "participant")).details.emergencyContacts).toEqual(DETAILS.emergencyContacts);
  });

  it("go when the person says so, at once, and only their own", async () => {
    const cast = await makeCast();
    await write(cast, "participant");
    await write(cast, "coLeader");
    await deleteOwnDetails({ ctx: cast.participant.ctx, input: { tripId: cast.tripId } });
    expect((await rowsOf(cast.tripId)).map((row) => row.personId)).toEqual([cast.personIds.coLeader]);
    expect(await codeOf(deleteOwnDetails({ ctx: cast.stranger.ctx, input: { tripId: cast.tripId } }))).toBe(
      "not-found",
    );
  });

  it("go by themselves so many days after the trip, not a day before", async () => {
    const cast = await makeCast();
    await write(cast, "participant");
    // No camps: the trip's last day is its first.
    const [row] = await getDb().select().from(trip).where(eq(trip.id, cast.tripId));
    const at = (days: number) => new Date(`${addDays(row?.startDate ?? "", days)}T12:00:00Z`);
    await deleteOldDetails(at(30));
    expect(await rowsOf(cast.tripId)).toHaveLength(1);
    await deleteOldDetails(at(31));
    expect(await rowsOf(cast.tripId)).toEqual([]);
  });

  it("go that long after the trip is called off, too", async () => {
    const cast = await makeCast();
    await write(cast, "participant");
    const day = new Date("2026-01-10T12:00:00Z");
    await getDb()
      .insert(tripCalendar)
      .values({ tripId: cast.tripId, uid: "x", fingerprint: "", calledOffAt: day, updatedAt: day });
    await deleteOldDetails(new Date("2026-02-09T12:00:00Z"));
    expect(await rowsOf(cast.tripId)).toHaveLength(1);
    await deleteOldDetails(new Date("2026-02-10T12:00:00Z"));
    expect(await rowsOf(cast.tripId)).toEqual([]);
  });

  it("leave out who does not come", async () => {
    const cast = await makeCast();
    await write(cast, "participant");
    await saveAnswer({ ctx: cast.participant.ctx, input: { tripId: cast.tripId, value: "no" } });
    expect((await sheet(cast, "leader")).people.map((one) => one.role)).toEqual(["leader", "co-leader"]);
  });
});

describe("an account that goes", () => {
  it("takes its details along and leaves the trips of others whole", async () => {
    const cast = await makeCast();
    const secondTripId = await makeTrip({ name: "Second" });
    await makePerson(secondTripId, "leader", await makeUser());
    await makePerson(secondTripId, "participant", cast.participant);
    await write(cast, "participant");
    await write(cast, "coLeader");
    const before = await readTrip(cast.tripId);
    await prepareAccountDeletion(cast.participant.id);
    await getDb().delete(user).where(eq(user.id, cast.participant.id));
    const after = await readTrip(cast.tripId);
    for (const [table, rows] of Object.entries(before)) {
      if (table === "personal_detail" || table === "person") continue;
      expect(after[table], table).toEqual(rows);
    }
    expect((await rowsOf(cast.tripId)).map((row) => row.personId)).toEqual([cast.personIds.coLeader]);
    const here = and(eq(person.tripId, cast.tripId), eq(person.id, cast.personIds.participant));
    expect(await getDb().select().from(person).where(here)).toMatchObject([
      { userId: null, name: cast.participant.name },
    ]);
    expect(await getDb().select().from(person).where(eq(person.tripId, secondTripId))).toHaveLength(2);
  });

  it("has been able to take everything with it: an export names every part", async () => {
    const cast = await makeCast();
    await write(cast, "participant");
    const data = JSON.parse(JSON.stringify(await exportAccount({ ctx: cast.participant.ctx }))) as Record<
      string,
      unknown
    >;
    expect(data).toMatchObject({
      account: { email: cast.participant.email },
      trips: [{ role: "participant", details: { ...DETAILS, consent: { text: expect.any(String) } } }],
    });
    const others = JSON.stringify(await exportAccount({ ctx: cast.leader.ctx }));
    expect(others).not.toContain("inhaler");
    expect(others).not.toContain(cast.participant.email);
  });
});

describe("sealing", () => {
  const place = { rowId: "row1", personId: "person1", tripId: "trip1" };

  it("gives back any text, and never the same twice", () => {
    fc.assert(
      fc.property(fc.string({ unit: "grapheme", maxLength: 300 }), (whole) => {
        const sealed = seal(whole, place);
        expect(unseal(sealed, place)).toBe(whole);
        expect(seal(whole, place)).not.toBe(sealed);
        if (whole.length > 6) expect(Buffer.from(sealed).includes(whole)).toBe(false);
      }),
      { seed: 11 },
    );
  });

  it("refuses what was changed in any character, or moved to another row, person or trip", () => {
    const sealed = seal("Asthma", place);
    for (let i = 0; i < sealed.length; i += 1) {
      const other = sealed[i] === "A" ? "B" : "A";
      const changed = `${sealed.slice(0, i)}${other}${sealed.slice(i + 1)}`;
      let opened: string | null = null;
      try {
        opened = unseal(changed, place);
      } catch (error) {
        expect(error).toMatchObject({ code: "unavailable" });
      }
      // The last letter of base64url may carry bits that mean nothing.
      if (opened !== null) expect(opened).toBe("Asthma");
    }
    for (const over of [{ rowId: "row2" }, { personId: "person2" }, { tripId: "trip2" }]) {
      expect(() => unseal(sealed, { ...place, ...over })).toThrow(/can't be read/);
    }
    for (const bad of ["", "t1", "t1...", "zz.AAAA.BBBB.CCCC", "t1.AAAA.BBBB.CCCC"]) {
      expect(() => unseal(bad, place)).toThrow(/can't be read/);
    }
  });

  describe("under a new key", () => {
    const OLD = process.env.DETAILS_KEYS ?? "";
    const NEW = "t2:Zm9yLXRlc3RzLW9ubHktMDEyMzQ1Njc4OWFiY2RlZiE=";

    /** Settings are read once: modules are loaded anew under others. The database stays. */
    async function under(keys: string) {
      vi.resetModules();
      vi.stubEnv("DETAILS_KEYS", keys);
      const tend = await import("@/lib/services/details/tend-details");
      const own = await import("@/lib/services/details/get-own-details");
      const all = await import("@/lib/services/details/get-contact-sheet");
      return { ...tend, ...own, ...all };
    }

    afterEach(() => {
      vi.unstubAllEnvs();
      vi.resetModules();
    });

    it("everything is sealed again, opens as before, and the old key can go", async () => {
      const cast = await makeCast();
      await write(cast, "participant");
      await resealDetails();
      expect((await rowsOf(cast.tripId))[0]?.sealed).toMatch(/^t1\./);
      const both = await under(`${NEW},${OLD}`);
      expect(await both.resealDetails()).toBeGreaterThan(0);
      expect(await both.resealDetails()).toBe(0);
      expect((await rowsOf(cast.tripId))[0]?.sealed).toMatch(/^t2\./);
      const only = await under(NEW);
      const input = { tripId: cast.tripId };
      expect((await only.getOwnDetails({ ctx: cast.participant.ctx, input })).details).toEqual(DETAILS);
      const lost = await under(OLD);
      await expect(lost.getOwnDetails({ ctx: cast.participant.ctx, input })).rejects.toMatchObject({
        code: "unavailable",
      });
      const { people } = await lost.getContactSheet({ ctx: cast.leader.ctx, input });
      expect(people.map((one) => one.details)).toEqual([null, null, "unreadable"]);
    });
  });
});
