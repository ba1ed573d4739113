import { z } from "zod";
import { getDb, withTransaction } from "@/db/client";
import { invitationTokenSchema, personNameSchema } from "@/lib/domain/person/schema";
import { newId } from "@/lib/domain/ids";
import { hashNewPassword, insertVerifiedAccount } from "../account/internal";
import { linkPeopleToUser } from "../people/link-people-to-user";
import { parseInput } from "../trips/parse-input";
import { loadOpenInvitation, spendInvitation } from "./internal";

const signUpWithInvitationInput = z.object({
  token: invitationTokenSchema,
  name: personNameSchema,
  /** Empty: none, they sign in by links. */
  password: z.string({ error: "Enter a password." }),
});

/** Makes the account and joins the trip in one step. The link came by mail, so the address is confirmed by it. */
export async function signUpWithInvitation({
  input,
}: {
  input: z.input<typeof signUpWithInvitationInput>;
}): Promise<{ tripId: string; email: string }> {
  const { token, name, password } = parseInput(signUpWithInvitationInput, input);
  const { email } = (await loadOpenInvitation(getDb(), token)).person;
  const passwordHash = password === "" ? null : await hashNewPassword(password, email);
  return withTransaction(async (tx) => {
    const row = await loadOpenInvitation(tx, token);
    const userId = await insertVerifiedAccount(tx, { name, email: row.person.email, passwordHash });
    await spendInvitation(tx, row, { actor: { userId, name, email: row.person.email }, requestId: newId() });
    await linkPeopleToUser(tx, { userId, email: row.person.email });
    return { tripId: row.person.tripId, email: row.person.email };
  });
}
