import { z } from "zod";
import { withTransaction } from "@/db/client";
import { personNameSchema } from "@/lib/domain/person/schema";
import { emailSchema } from "@/lib/domain/text";
import { parseInput } from "../trips/parse-input";
import { hashNewPassword, insertVerifiedAccount } from "./internal";

const createAccountInput = z.object({
  name: personNameSchema,
  email: emailSchema,
  password: z.string(),
});

/** For scripts that fill a database; people sign up through /api/auth. The address counts as confirmed. */
export async function createAccount({
  input,
}: {
  input: z.input<typeof createAccountInput>;
}): Promise<{ userId: string }> {
  const { name, email, password } = parseInput(createAccountInput, input);
  const passwordHash = await hashNewPassword(password, email);
  return withTransaction(async (tx) => ({ userId: await insertVerifiedAccount(tx, { name, email, passwordHash }) }));
}
