import "server-only";
import { betterAuth } from "better-auth";
import { APIError } from "better-auth/api";
import { drizzleAdapter } from "better-auth/adapters/drizzle";
import { magicLink } from "better-auth/plugins/magic-link";
import { and, eq } from "drizzle-orm";
import { getDb, withTransaction } from "@/db/client";
import * as schema from "@/db/schema";
import { newId } from "@/lib/domain/ids";
import { personNameSchema } from "@/lib/domain/person/schema";
import { emailSchema } from "@/lib/domain/text";
import type { RenderedMail } from "@/lib/email/letter";
import {
  renderExistingAccountMail,
  renderResetMail,
  renderSignInLinkMail,
  renderVerificationMail,
} from "@/lib/email/templates/account-mails";
import { env } from "@/lib/env";
import { AppError } from "@/lib/errors";
import { log } from "@/lib/log";
import { prepareAccountDeletion } from "@/lib/services/account/prepare-account-deletion";
import { linkPeopleToUser } from "@/lib/services/people/link-people-to-user";
import { enqueueMessage, type NewMessage } from "@/lib/services/post/enqueue-message";
import { afterAuth, beforeAuth } from "./auth-hooks";
import { PASSWORD_MAX, PASSWORD_MIN } from "./password-rules";

type Recipient = { readonly name: string; readonly email: string };

/** Into the outbox: the answer never waits for a mail server, so its time tells nothing about the address. */
async function post(kind: NewMessage["kind"], user: Recipient, mail: RenderedMail): Promise<void> {
  const to = { name: user.name, address: user.email };
  await withTransaction((tx) => enqueueMessage(tx, { kind, requestId: newId(), to, mail }));
}

function pageUrl(path: string, query: Readonly<Record<string, string>> = {}): string {
  const url = new URL(path, env.appUrl);
  for (const [name, value] of Object.entries(query)) url.searchParams.set(name, value);
  return url.href;
}

function cleanUser<User extends { name?: string | undefined; email?: string | undefined }>(user: User): User {
  const name = user.name === undefined ? undefined : personNameSchema.safeParse(user.name);
  const email = user.email === undefined ? undefined : emailSchema.safeParse(user.email);
  for (const one of [name, email]) {
    if (one?.success === false) {
      throw new APIError("BAD_REQUEST", {
        code: "BAD_INPUT",
        message: one.error.issues[0]?.message ?? "Not accepted.",
      });
    }
  }
  return { ...user, ...(name ? { name: name.data } : {}), ...(email ? { email: email.data } : {}), image: null };
}

/** Only to who has shown that the address is theirs; the answer on the screen is the same for everybody. */
async function postSignInLink(address: string, token: string): Promise<void> {
  const email = emailSchema.safeParse(address);
  if (!email.success) return;
  const [known] = await getDb()
    .select({ name: schema.user.name, email: schema.user.email })
    .from(schema.user)
    .where(and(eq(schema.user.email, email.data), eq(schema.user.emailVerified, true)));
  if (!known) return;
  const mail = renderSignInLinkMail({ name: known.name, url: pageUrl("/sign-in/by-link", { token }) });
  await post("sign-in-link", known, mail);
}

async function letAccountGo(userId: string): Promise<void> {
  try {
    await prepareAccountDeletion(userId);
  } catch (error) {
    if (!(error instanceof AppError)) throw error;
    throw new APIError("CONFLICT", { code: "IN_USE", message: error.userMessage });
  }
}

function logUnlessRefusal(error: unknown): void {
  if (error instanceof APIError && error.statusCode < 500) return;
  log.error("auth failed", error);
}

function createAuth() {
  // Without a proxy that vouches for addresses, everybody shares one bucket: it has to be wider.
  const isAddressKnown = env.trustedIpHeader !== undefined;
  const limit = (window: number, perAddress: number, shared: number) => ({
    window,
    max: isAddressKnown ? perAddress : shared,
  });
  return betterAuth({
    appName: "Leestead",
    baseURL: env.appUrl,
    basePath: "/api/auth",
    secret: env.authSecret,
    trustedOrigins: [env.appUrl],
    database: drizzleAdapter(getDb(), { provider: "sqlite", schema, transaction: true }),
    telemetry: { enabled: false },
    logger: { level: "error", log: (level, message) => log.warn("auth", { level, message: message.slice(0, 200) }) },
    onAPIError: { onError: logUnlessRefusal },
    emailAndPassword: {
      enabled: true,
      autoSignIn: false,
      minPasswordLength: PASSWORD_MIN,
      maxPasswordLength: PASSWORD_MAX,
      requireEmailVerification: true,
      revokeSessionsOnPasswordReset: true,
      resetPasswordTokenExpiresIn: 3600,
      sendResetPassword: ({ user, token }) =>
        post("reset", user, renderResetMail({ name: user.name, url: pageUrl("/reset-password", { token }) })),
      onExistingUserSignUp: ({ user }) =>
        post("existing-account", user, renderExistingAccountMail({ name: user.name, url: pageUrl("/sign-in") })),
    },
    emailVerification: {
      sendOnSignUp: true,
      sendOnSignIn: true,
      expiresIn: 86_400,
      autoSignInAfterVerification: false,
      sendVerificationEmail: ({ user, token }) =>
        post("verification", user, renderVerificationMail({ name: user.name, url: pageUrl("/verify", { token }) })),
      afterEmailVerification: async (user) => {
        await withTransaction((tx) => linkPeopleToUser(tx, { userId: user.id, email: user.email }));
      },
    },
    verification: { storeIdentifier: "hashed" },
    session: { expiresIn: 7 * 86_400, updateAge: 86_400, freshAge: 86_400 },
    user: { deleteUser: { enabled: true, beforeDelete: (user) => letAccountGo(user.id) } },
    rateLimit: {
      enabled: true,
      storage: "database",
      window: 60,
      max: isAddressKnown ? 60 : 600,
      customRules: {
        "/sign-in/email": limit(10, 3, 60),
        "/sign-up/email": limit(60, 5, 60),
        "/request-password-reset": limit(60, 3, 30),
        "/send-verification-email": limit(60, 3, 30),
        "/sign-in/magic-link": limit(60, 3, 30),
        "/magic-link/verify": limit(60, 10, 100),
        "/change-password": limit(10, 3, 60),
        "/delete-user": limit(10, 3, 60),
        "/get-session": false,
      },
    },
    advanced: {
      cookiePrefix: "leestead",
      useSecureCookies: env.appUrl.startsWith("https://"),
      disableOriginCheck: false,
      disableCSRFCheck: false,
      ipAddress: { ipAddressHeaders: env.trustedIpHeader ? [env.trustedIpHeader] : [], ipv6Subnet: 64 },
      database: { generateId: () => newId() },
      defaultCookieAttributes: { httpOnly: true, sameSite: "lax", path: "/" },
    },
    databaseHooks: {
      user: {
        create: { before: async (user) => ({ data: cleanUser(user) }) },
        update: { before: async (user) => ({ data: cleanUser(user) }) },
      },
    },
    hooks: { before: beforeAuth, after: afterAuth },
    plugins: [
      magicLink({
        disableSignUp: true,
        storeToken: "hashed",
        expiresIn: 15 * 60,
        sendMagicLink: ({ email, token }) => postSignInLink(email, token),
      }),
    ],
  });
}

export type Auth = ReturnType<typeof createAuth>;

let auth: Auth | undefined;

/** Made at first use: `next build` imports every route and has no settings. */
export function getAuth(): Auth {
  auth ??= createAuth();
  return auth;
}
