import { hashPassword } from "better-auth/crypto";
import { eq } from "drizzle-orm";
import type { Transaction } from "@/db/client";
import { account, session, user } from "@/db/schema";
import { findPasswordFault } from "@/lib/auth/password-rules";
import { newId } from "@/lib/domain/ids";
import { AppError } from "@/lib/errors";

/** Slow on purpose, so call it before a transaction. */
export async function hashNewPassword(password: string, email: string): Promise<string> {
  const fault = await findPasswordFault(password, email);
  if (fault) throw new AppError("bad-input", fault, { fieldErrors: { password: [fault] } });
  return hashPassword(password);
}

interface VerifiedAccount {
  readonly name: string;
  readonly email: string;
  /** Null: signs in by links. */
  readonly passwordHash: string | null;
}

/**
 * An account of somebody who has shown that the address is theirs. One with that address that was never confirmed may
 * be anybody's: its password and its sessions go.
 */
export async function insertVerifiedAccount(
  tx: Transaction,
  { name, email, passwordHash }: VerifiedAccount,
): Promise<string> {
  const now = new Date();
  const [known] = await tx.select().from(user).where(eq(user.email, email));
  if (known?.emailVerified) {
    throw new AppError("conflict", "There is an account with this address already. Sign in with it.");
  }
  const userId = known?.id ?? newId();
  if (known) {
    await tx.delete(session).where(eq(session.userId, userId));
    await tx.delete(account).where(eq(account.userId, userId));
    await tx.update(user).set({ name, emailVerified: true, updatedAt: now }).where(eq(user.id, userId));
  } else {
    await tx.insert(user).values({ id: userId, name, email, emailVerified: true, createdAt: now, updatedAt: now });
  }
  if (passwordHash === null) return userId;
  await tx.insert(account).values({
    id: newId(),
    userId,
    accountId: userId,
    providerId: "credential",
    password: passwordHash,
    createdAt: now,
    updatedAt: now,
  });
  return userId;
}
