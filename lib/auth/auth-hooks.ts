import { APIError, createAuthMiddleware, getSessionFromCtx } from "better-auth/api";
import { deleteSessionCookie } from "better-auth/cookies";
import { log } from "@/lib/log";
import { countSignInFailure, findSignInPause, forgetSignInFailures } from "@/lib/services/quota/sign-in-failures";
import { findPasswordFault } from "./password-rules";
import { isSessionTooOld } from "./session-age";

const NEW_PASSWORD_FIELDS: Readonly<Record<string, string>> = {
  "/sign-up/email": "password",
  "/reset-password": "newPassword",
  "/change-password": "newPassword",
};

function readBody(body: unknown): Readonly<Record<string, unknown>> {
  return typeof body === "object" && body !== null ? (body as Record<string, unknown>) : {};
}

function textOf(value: unknown): string {
  return typeof value === "string" ? value : "";
}

export const beforeAuth = createAuthMiddleware(async (ctx) => {
  const body = readBody(ctx.body);
  const passwordField = NEW_PASSWORD_FIELDS[ctx.path];
  if (passwordField) {
    const fault = await findPasswordFault(textOf(body[passwordField]), textOf(body.email));
    if (fault) throw new APIError("BAD_REQUEST", { code: "PASSWORD_REFUSED", message: fault });
  }
  if (ctx.path === "/sign-in/email") {
    const pauseS = await findSignInPause(textOf(body.email));
    if (pauseS !== null) {
      const message = `Too many wrong passwords for this account. Try again in ${Math.ceil(pauseS / 60)} min.`;
      throw new APIError("TOO_MANY_REQUESTS", { code: "TOO_MANY", message }, { "Retry-After": String(pauseS) });
    }
    return;
  }
  const session = await getSessionFromCtx(ctx, { disableRefresh: true }).catch(() => null);
  if (session && isSessionTooOld(session.session.createdAt)) {
    await ctx.context.internalAdapter.deleteSession(session.session.token);
    deleteSessionCookie(ctx);
    throw new APIError("UNAUTHORIZED", { code: "SESSION_EXPIRED", message: "Sign in again." });
  }
  if (ctx.path === "/change-password") return { context: { body: { ...body, revokeOtherSessions: true } } };
});

export const afterAuth = createAuthMiddleware(async (ctx) => {
  if (ctx.path === "/magic-link/verify") {
    const userId = ctx.context.newSession?.user.id;
    if (userId) log.info("signed in", { userId });
    else log.warn("sign-in refused");
  }
  if (ctx.path !== "/sign-in/email") return;
  const email = textOf(readBody(ctx.body).email);
  const userId = ctx.context.newSession?.user.id;
  if (userId) {
    log.info("signed in", { userId });
    await forgetSignInFailures(email);
    return;
  }
  log.warn("sign-in refused");
  if (ctx.context.returned instanceof APIError && ctx.context.returned.statusCode === 401)
    await countSignInFailure(email);
});
