import "server-only";
import { APIError } from "better-auth/api";
import { headers } from "next/headers";
import { redirect } from "next/navigation";
import { cache } from "react";
import { newId } from "@/lib/domain/ids";
import type { Context } from "@/lib/services/context/context";
import { getAuth } from "./auth";
import { isSessionTooOld } from "./session-age";

/** Set by proxy.ts on every request to a page or route. */
export const REQUEST_ID_HEADER = "x-request-id";
export const PATH_HEADER = "x-leestead-path";

async function findSession(from: Headers) {
  try {
    return await getAuth().api.getSession({ headers: from, query: { disableCookieCache: true } });
  } catch (error) {
    // Too old: beforeAuth has just ended it.
    if (error instanceof APIError && error.statusCode === 401) return null;
    throw error;
  }
}

/** Who these headers belong to, or null. */
export async function readContext(from: Headers): Promise<Context | null> {
  const found = await findSession(from);
  if (!found || !found.user.emailVerified || isSessionTooOld(found.session.createdAt)) return null;
  const { id: userId, name, email } = found.user;
  return { actor: { userId, name, email }, requestId: from.get(REQUEST_ID_HEADER) ?? newId() };
}

/** Which of somebody's sessions this request belongs to. */
export async function getSessionId(): Promise<string | null> {
  const found = await findSession(await headers());
  return found?.session.id ?? null;
}

/** Of the running request; asked once however often it is called. */
export const getContext = cache(async (): Promise<Context | null> => readContext(await headers()));

/** For pages: whoever is not signed in goes to sign in and comes back. */
export async function requireContext(): Promise<Context> {
  const ctx = await getContext();
  if (ctx) return ctx;
  const path = (await headers()).get(PATH_HEADER);
  redirect(path && path !== "/" ? `/sign-in?next=${encodeURIComponent(path)}` : "/sign-in");
}
