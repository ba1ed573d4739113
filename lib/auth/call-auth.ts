import "server-only";
import { parseSetCookieHeader } from "better-auth/cookies";
import { cookies, headers } from "next/headers";
import { env } from "@/lib/env";
import { AppError } from "@/lib/errors";
import { getAuth } from "./auth";

interface Call {
  readonly method?: "GET" | "POST";
  readonly body?: Readonly<Record<string, unknown>>;
  /** Of the form, for the message of an error about the password. */
  readonly passwordField?: string;
}

const SENTENCES: Readonly<Record<string, string>> = {
  INVALID_EMAIL_OR_PASSWORD: "This address and this password do not go together.",
  INVALID_EMAIL: "That is not an e-mail address.",
  EMAIL_NOT_VERIFIED: "Confirm your address first: a new mail with the link is on its way.",
  INVALID_TOKEN: "This link does not work any more. Ask for a new one.",
  TOKEN_EXPIRED: "This link has run out. Ask for a new one.",
  new_user_signup_disabled: "This link does not work any more. Ask for a new one.",
  INVALID_PASSWORD: "That is not your password.",
  SESSION_EXPIRED: "Sign in again.",
};

/** Through the same door as everybody (/api/auth), so that limits, origin and headers count; cookies are passed on. */
export async function callAuth(path: string, { method = "POST", body, passwordField }: Call = {}): Promise<unknown> {
  const incoming = await headers();
  const outgoing = new Headers({ origin: env.appUrl });
  for (const name of ["cookie", "user-agent", ...(env.trustedIpHeader ? [env.trustedIpHeader] : [])]) {
    const value = incoming.get(name);
    if (value) outgoing.set(name, value);
  }
  if (body) outgoing.set("content-type", "application/json");
  const response = await getAuth().handler(
    new Request(`${env.appUrl}/api/auth${path}`, {
      method,
      headers: outgoing,
      ...(body ? { body: JSON.stringify(body) } : {}),
    }),
  );
  const jar = await cookies();
  for (const header of response.headers.getSetCookie()) {
    for (const [name, cookie] of parseSetCookieHeader(header)) {
      jar.set(name, decodeURIComponent(cookie.value), {
        path: cookie.path ?? "/",
        httpOnly: cookie.httponly ?? true,
        secure: cookie.secure ?? false,
        sameSite: cookie.samesite ?? "lax",
        ...(cookie["max-age"] === undefined ? {} : { maxAge: cookie["max-age"] }),
      });
    }
  }
  const answer: unknown = await response.json().catch(() => null);
  if (response.ok) return answer;
  throw toRefusal(response, answer, passwordField);
}

function toRefusal(response: Response, answer: unknown, passwordField: string | undefined): Error {
  const said = typeof answer === "object" && answer !== null ? (answer as Record<string, unknown>) : {};
  // Where a link is refused, the answer is a way back with the reason in it.
  const back = response.headers.get("location");
  const reason = back && URL.canParse(back) ? new URL(back).searchParams.get("error") : null;
  const code = typeof said.code === "string" ? said.code : (reason ?? "");
  const message = typeof said.message === "string" ? said.message : "";
  if (response.status === 429) {
    const seconds = Number(response.headers.get("x-retry-after") ?? response.headers.get("retry-after") ?? 60);
    const wait = seconds < 90 ? `${seconds} s` : `${Math.ceil(seconds / 60)} min`;
    return new AppError("too-many", `Too many tries. Wait ${wait}, then try again.`, { retryAfterS: seconds });
  }
  if (response.status >= 500) return new Error(`auth answered ${response.status} ${code}`);
  if (code === "PASSWORD_REFUSED" && passwordField) {
    return new AppError("bad-input", message, { fieldErrors: { [passwordField]: [message] } });
  }
  const isOurs = code === "BAD_INPUT" || code === "IN_USE" || code === "PASSWORD_REFUSED";
  const sentence = SENTENCES[code] ?? (isOurs ? message : "That was not accepted. Look at what you typed.");
  return new AppError(code === "IN_USE" ? "in-use" : "bad-input", sentence);
}
