import { makeCast, makePerson, makeTrip, makeUser, type TestUser } from "../../helpers/actors";
import { clearLimits, readLinkToken, readOutbox } from "../../helpers/outbox";
import { and, eq } from "drizzle-orm";
import { beforeEach, describe, expect, it } from "vitest";
import { getDb } from "@/db/client";
import {
  camp,
  carry,
  changeLog,
  invitation,
  outboxMessage,
  person,
  pitch,
  session,
  shelter,
  sleeper,
  user,
} from "@/db/schema";
import { newId } from "@/lib/domain/ids";
import { createAccount } from "@/lib/services/account/create-account";
import { prepareAccountDeletion } from "@/lib/services/account/prepare-account-deletion";
import { acceptInvitation } from "@/lib/services/invitations/accept-invitation";
import { getInvitation } from "@/lib/services/invitations/get-invitation";
import { signUpWithInvitation } from "@/lib/services/invitations/sign-up-with-invitation";
import { createPerson } from "@/lib/services/people/create-person";
import { deletePerson } from "@/lib/services/people/delete-person";
import { findPersonDependents } from "@/lib/services/people/find-person-dependents";
import { invitePerson } from "@/lib/services/people/invite-person";
import { listPeople } from "@/lib/services/people/list-people";
import { updatePerson } from "@/lib/services/people/update-person";

type Cast = Awaited<ReturnType<typeof makeCast>>;
const PASSWORD = "four pegs in wet sand";
let count = 0;
const newEmail = () => `guest-${(count += 1)}@example.test`;

beforeEach(clearLimits);

async function addGuest(cast: Cast, email = newEmail()) {
  const { personId } = await createPerson({
    ctx: cast.leader.ctx,
    input: { tripId: cast.tripId, name: "Wren Hale", email, role: "participant" },
  });
  return { personId, email, token: await readLinkToken(email) };
}

const loadPerson = async (id: string) => (await getDb().select().from(person).where(eq(person.id, id)))[0];

describe("who may", () => {
  it.each(["create", "update", "delete", "invite", "dependents"] as const)(
    "%s: the leader of this trip only",
    async (verb) => {
      const cast = await makeCast();
      const guest = await addGuest(cast);
      const before = await getDb().select().from(person).where(eq(person.tripId, cast.tripId));
      const mails = await getDb().select().from(outboxMessage);
      const { tripId } = cast;
      const call = ({ ctx }: TestUser) =>
        ({
          create: () => createPerson({ ctx, input: { tripId, name: "X", email: newEmail(), role: "leader" } }),
          update: () =>
            updatePerson({ ctx, input: { tripId, personId: guest.personId, name: "X", role: "leader", version: 1 } }),
          delete: () => deletePerson({ ctx, input: { tripId, personId: guest.personId, confirmed: true } }),
          invite: () => invitePerson({ ctx, input: { tripId, personId: guest.personId } }),
          dependents: () => findPersonDependents({ ctx, input: { tripId, personId: guest.personId } }),
        })[verb]();
      for (const [who, code] of [
        [cast.stranger, "not-found"],
        [cast.otherLeader, "not-found"],
        [cast.participant, "forbidden"],
        [cast.coLeader, "forbidden"],
      ] as const) {
        await expect(call(who)).rejects.toMatchObject({ code });
      }
      expect(await getDb().select().from(person).where(eq(person.tripId, tripId))).toEqual(before);
      expect(await getDb().select().from(outboxMessage)).toEqual(mails);
    },
  );

  it("list: leader and co-leader", async () => {
    const cast = await makeCast();
    const list = ({ ctx }: TestUser) => listPeople({ ctx, input: { tripId: cast.tripId } });
    expect((await list(cast.leader)).map((one) => [one.role, one.isSelf, one.state])).toEqual([
      ["leader", true, "joined"],
      ["co-leader", false, "joined"],
      ["participant", false, "joined"],
    ]);
    expect(await list(cast.coLeader)).toHaveLength(3);
    await expect(list(cast.participant)).rejects.toMatchObject({ code: "forbidden" });
    await expect(list(cast.stranger)).rejects.toMatchObject({ code: "not-found" });
  });

  it("does not reach people of another trip through the own one", async () => {
    const cast = await makeCast();
    const foreign = { tripId: cast.tripId, personId: cast.otherPersonId };
    const { ctx } = cast.leader;
    await expect(deletePerson({ ctx, input: { ...foreign, confirmed: true } })).rejects.toMatchObject({
      code: "not-found",
    });
    await expect(invitePerson({ ctx, input: foreign })).rejects.toMatchObject({ code: "not-found" });
    await expect(
      updatePerson({ ctx, input: { ...foreign, name: "X", role: "participant", version: 1 } }),
    ).rejects.toMatchObject({ code: "not-found" });
    expect((await loadPerson(cast.otherPersonId))?.role).toBe("leader");
  });

  it("counts at once: a leader who was just made participant can't add anybody any more", async () => {
    const cast = await makeCast();
    const { tripId, personIds, leader, coLeader } = cast;
    await updatePerson({
      ctx: leader.ctx,
      input: { tripId, personId: personIds.coLeader, name: "Co", role: "leader", version: 1 },
    });
    await updatePerson({
      ctx: coLeader.ctx,
      input: { tripId, personId: personIds.leader, name: "Was leader", role: "participant", version: 1 },
    });
    await expect(
      createPerson({ ctx: leader.ctx, input: { tripId, name: "X", email: newEmail(), role: "leader" } }),
    ).rejects.toMatchObject({ code: "forbidden" });
  });
});

describe("adding somebody", () => {
  it("puts a verified account on the trip at once and tells them", async () => {
    const cast = await makeCast();
    const known = await makeUser();
    const { state } = await createPerson({
      ctx: cast.leader.ctx,
      input: { tripId: cast.tripId, name: "Known", email: known.email.toUpperCase(), role: "co-leader" },
    });
    expect(state).toBe("joined");
    expect((await readOutbox(known.email)).map((one) => one.kind)).toEqual(["invitation"]);
    expect(await listPeople({ ctx: known.ctx, input: { tripId: cast.tripId } })).toHaveLength(4);
  });

  it("does not trust an account whose address was never confirmed", async () => {
    const cast = await makeCast();
    const unproven = await makeUser({ emailVerified: false });
    const { state } = await createPerson({
      ctx: cast.leader.ctx,
      input: { tripId: cast.tripId, name: "Unproven", email: unproven.email, role: "participant" },
    });
    expect(state).toBe("invited");
  });

  it("refuses the same address twice, naming who has it", async () => {
    const cast = await makeCast();
    const { email } = await addGuest(cast);
    await expect(addGuest(cast, email)).rejects.toMatchObject({
      code: "conflict",
      fieldErrors: { email: [expect.stringContaining("Wren Hale")] },
    });
  });

  it.each([
    ["name", { name: "" }],
    ["name", { name: "x".repeat(1_000_000) }],
    ["email", { email: "a@x.test\r\nRCPT TO:<evil@x.test>" }],
    ["email", { email: "a@x.test, evil@x.test" }],
    ["email", { email: "Smith, evil@x.test <a@x.test>" }],
    ["email", { email: `${"(".repeat(100_000)}a@x.test` }],
    ["email", { email: 7 }],
    ["role", { role: "owner" }],
  ] as const)("names the field %s for bad input %#", async (field, bad) => {
    const cast = await makeCast();
    const before = await getDb().select().from(outboxMessage);
    const input = { tripId: cast.tripId, name: "X", email: newEmail(), role: "participant", ...bad };
    const call = createPerson({ ctx: cast.leader.ctx, input: input as Parameters<typeof createPerson>[0]["input"] });
    await expect(call).rejects.toMatchObject({ code: "bad-input", fieldErrors: { [field]: [expect.any(String)] } });
    expect(await getDb().select().from(outboxMessage)).toEqual(before);
  });

  it("limits how many invitations one person sends in an hour", async () => {
    const leader = await makeUser();
    const tripId = await makeTrip();
    await makePerson(tripId, "leader", leader);
    const personId = await makePerson(tripId, "participant", { name: "Guest", email: newEmail() });
    for (let index = 0; index < 60; index += 1) await invitePerson({ ctx: leader.ctx, input: { tripId, personId } });
    await expect(invitePerson({ ctx: leader.ctx, input: { tripId, personId } })).rejects.toMatchObject({
      code: "too-many",
      retryAfterS: expect.any(Number),
    });
  });
});

describe("a trip keeps a leader", () => {
  it("refuses to take away or demote the only one", async () => {
    const { tripId, leader, personIds } = await makeCast();
    const ref = { tripId, personId: personIds.leader };
    await expect(deletePerson({ ctx: leader.ctx, input: { ...ref, confirmed: true } })).rejects.toMatchObject({
      code: "in-use",
    });
    await expect(
      updatePerson({ ctx: leader.ctx, input: { ...ref, name: "L", role: "participant", version: 1 } }),
    ).rejects.toMatchObject({ code: "in-use" });
    expect((await loadPerson(personIds.leader))?.role).toBe("leader");
  });

  it("does not count somebody who has not joined", async () => {
    const cast = await makeCast();
    const guest = await addGuest(cast);
    const { tripId, leader, personIds } = cast;
    await updatePerson({
      ctx: leader.ctx,
      input: { tripId, personId: guest.personId, name: "Wren", role: "leader", version: 1 },
    });
    await expect(
      deletePerson({ ctx: leader.ctx, input: { tripId, personId: personIds.leader, confirmed: true } }),
    ).rejects.toMatchObject({ code: "in-use" });
  });

  it("when two leaders take each other off at the same moment", async () => {
    const { tripId, leader, coLeader, personIds } = await makeCast();
    await updatePerson({
      ctx: leader.ctx,
      input: { tripId, personId: personIds.coLeader, name: "Second", role: "leader", version: 1 },
    });
    const results = await Promise.allSettled([
      deletePerson({ ctx: leader.ctx, input: { tripId, personId: personIds.coLeader, confirmed: true } }),
      deletePerson({ ctx: coLeader.ctx, input: { tripId, personId: personIds.leader, confirmed: true } }),
    ]);
    expect(results.map((one) => one.status).sort()).toEqual(["fulfilled", "rejected"]);
    const leaders = and(eq(person.tripId, tripId), eq(person.role, "leader"));
    expect(await getDb().select().from(person).where(leaders)).toHaveLength(1);
  });

  it("also when an account is to be deleted; a trip with nobody else goes with it", async () => {
    const { leader } = await makeCast();
    await expect(prepareAccountDeletion(leader.id)).rejects.toMatchObject({
      code: "in-use",
      userMessage: expect.stringContaining("Ridge and river"),
    });
    const hermit = await makeUser();
    const tripId = await makeTrip();
    const personId = await makePerson(tripId, "leader", hermit);
    await prepareAccountDeletion(hermit.id);
    expect(await loadPerson(personId)).toBeUndefined();
  });
});

describe("changing somebody", () => {
  it("tells the second of two who was first, and keeps what is there", async () => {
    const { tripId, leader, personIds } = await makeCast();
    const input = { tripId, personId: personIds.participant, role: "participant" as const, version: 1 };
    await updatePerson({ ctx: leader.ctx, input: { ...input, name: "First" } });
    await expect(updatePerson({ ctx: leader.ctx, input: { ...input, name: "Second" } })).rejects.toMatchObject({
      code: "conflict",
      details: { current: expect.objectContaining({ name: "First", version: 2 }) },
    });
  });

  it("says what depends on somebody before they are taken off, then takes it along", async () => {
    const { tripId, leader, personIds } = await makeCast();
    const now = new Date();
    const [campId, shelterId, pitchId] = [newId(), newId(), newId()];
    const stamps = { createdAt: now, updatedAt: now };
    await getDb()
      .insert(camp)
      .values({ id: campId, tripId, position: 0, name: "Flat", ...stamps });
    const spec = { kind: "ridge-tarp", dimensions: {} } as unknown as typeof shelter.$inferInsert.spec;
    await getDb()
      .insert(shelter)
      .values({ id: shelterId, tripId, position: 0, name: "Tarp", sleeps: 2, spec, ...stamps });
    await getDb().insert(pitch).values({
      id: pitchId,
      tripId,
      campId,
      shelterId,
      position: 0,
      headingDeg: 0,
      patch: "main",
      dimensions: {},
      lineLengthsM: {},
      updatedAt: now,
    });
    const personId = personIds.participant;
    await getDb().insert(sleeper).values({ id: newId(), tripId, campId, personId, pitchId });
    await getDb().insert(carry).values({ id: newId(), tripId, personId, shelterId, count: 1 });
    const input = { tripId, personId };
    const sentences = await findPersonDependents({ ctx: leader.ctx, input });
    expect(sentences).toEqual(["They have a sleeping place at 1 camp.", "They carry 1 piece of the group's gear."]);
    await expect(deletePerson({ ctx: leader.ctx, input })).rejects.toMatchObject({
      code: "in-use",
      details: { dependents: sentences },
    });
    expect(await loadPerson(personId)).toBeDefined();
    await deletePerson({ ctx: leader.ctx, input: { ...input, confirmed: true } });
    expect(await getDb().select().from(sleeper).where(eq(sleeper.personId, personId))).toEqual([]);
    const log = await getDb().select().from(changeLog).where(eq(changeLog.entityId, personId));
    expect(log).toMatchObject([{ action: "delete", entity: "person", userId: leader.id }]);
  });
});

describe("an invitation", () => {
  it("keeps only the hash of its token, which has 256 bits", async () => {
    const cast = await makeCast();
    const { personId, token } = await addGuest(cast);
    expect(Buffer.from(token, "base64url")).toHaveLength(32);
    const [row] = await getDb().select().from(invitation).where(eq(invitation.personId, personId));
    expect(row?.tokenHash).toMatch(/^[0-9a-f]{64}$/);
    expect(JSON.stringify(row)).not.toContain(token);
  });

  it("makes a confirmed account and joins, once", async () => {
    const cast = await makeCast();
    const { personId, email, token } = await addGuest(cast);
    expect(await getInvitation({ input: { token } })).toMatchObject({
      tripName: "Ridge and river",
      personName: "Wren Hale",
      email,
      hasAccount: false,
      own: { answer: null, isFull: false, isClosed: false },
    });
    const input = { token, name: "Wren", password: PASSWORD };
    const results = await Promise.allSettled([signUpWithInvitation({ input }), signUpWithInvitation({ input })]);
    expect(results.map((one) => one.status).sort()).toEqual(["fulfilled", "rejected"]);
    const [account] = await getDb().select().from(user).where(eq(user.email, email));
    expect(account?.emailVerified).toBe(true);
    expect((await loadPerson(personId))?.userId).toBe(account?.id);
    await expect(getInvitation({ input: { token } })).rejects.toMatchObject({ code: "conflict" });
    await expect(signUpWithInvitation({ input })).rejects.toMatchObject({ code: "conflict" });
  });

  it("takes an account that was never confirmed away from whoever made it", async () => {
    const cast = await makeCast();
    const email = newEmail();
    const squatter = await makeUser({ email, emailVerified: false });
    const stamps = { createdAt: new Date(), updatedAt: new Date() };
    const held = { id: newId(), userId: squatter.id, token: newId(), expiresAt: new Date(Date.now() + 60_000) };
    await getDb()
      .insert(session)
      .values({ ...held, ...stamps });
    const { token } = await addGuest(cast, email);
    await signUpWithInvitation({ input: { token, name: "Wren", password: PASSWORD } });
    expect(await getDb().select().from(session).where(eq(session.userId, squatter.id))).toEqual([]);
  });

  it("is for the address it was sent to", async () => {
    const cast = await makeCast();
    const { personId, token } = await addGuest(cast);
    await expect(acceptInvitation({ ctx: cast.stranger.ctx, input: { token } })).rejects.toMatchObject({
      code: "forbidden",
    });
    expect((await loadPerson(personId))?.userId).toBeNull();
    expect((await getInvitation({ input: { token } })).personName).toBe("Wren Hale");
  });

  it("is accepted by the account with that address, once, in the role that the person has now", async () => {
    const cast = await makeCast();
    const { personId, email, token } = await addGuest(cast);
    await updatePerson({
      ctx: cast.leader.ctx,
      input: { tripId: cast.tripId, personId, name: "Wren Hale", role: "co-leader", version: 1 },
    });
    const { userId } = await createAccount({ input: { name: "Wren", email, password: PASSWORD } });
    const ctx = { actor: { userId, name: "Wren", email }, requestId: newId() };
    expect(await acceptInvitation({ ctx, input: { token } })).toEqual({ tripId: cast.tripId });
    expect(await listPeople({ ctx, input: { tripId: cast.tripId } })).toHaveLength(4);
    await expect(acceptInvitation({ ctx, input: { token } })).rejects.toMatchObject({ code: "conflict" });
  });

  it("stops working when a new one is sent, when its time is over, and when the person is taken off", async () => {
    const cast = await makeCast();
    const { personId, email, token } = await addGuest(cast);
    const ref = { tripId: cast.tripId, personId };
    await invitePerson({ ctx: cast.leader.ctx, input: ref });
    const newer = await readLinkToken(email);
    expect(newer).not.toBe(token);
    await expect(getInvitation({ input: { token } })).rejects.toMatchObject({ code: "not-found" });

    await getDb()
      .update(invitation)
      .set({ expiresAt: new Date(Date.now() - 1000) })
      .where(eq(invitation.personId, personId));
    const late = { token: newer, name: "Wren", password: PASSWORD };
    await expect(signUpWithInvitation({ input: late })).rejects.toMatchObject({ code: "conflict" });
    const states = await listPeople({ ctx: cast.leader.ctx, input: { tripId: cast.tripId } });
    expect(states.find((one) => one.id === personId)?.state).toBe("expired");

    await invitePerson({ ctx: cast.leader.ctx, input: ref });
    const newest = await readLinkToken(email);
    await deletePerson({ ctx: cast.leader.ctx, input: ref });
    await expect(getInvitation({ input: { token: newest } })).rejects.toMatchObject({ code: "not-found" });
  });

  it.each(["", "x", "../../etc/passwd", "' OR 1=1--", "a".repeat(43)])("unknown token %j is nothing", async (token) => {
    await expect(getInvitation({ input: { token } })).rejects.toMatchObject({ code: "not-found" });
  });

  it("refuses a common password and leaves the link usable", async () => {
    const cast = await makeCast();
    const { token } = await addGuest(cast);
    await expect(signUpWithInvitation({ input: { token, name: "W", password: "password" } })).rejects.toMatchObject({
      code: "bad-input",
      fieldErrors: { password: [expect.any(String)] },
    });
    expect((await getInvitation({ input: { token } })).personName).toBe("Wren Hale");
  });
});
