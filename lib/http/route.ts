import "server-only";
import type { z } from "zod";
import { readContext, REQUEST_ID_HEADER } from "@/lib/auth/session";
import { newId } from "@/lib/domain/ids";
import { env } from "@/lib/env";
import { AppError } from "@/lib/errors";
import type { Context } from "@/lib/services/context/context";
import { errorResponse, NO_STORE } from "./error-response";
import { readJson } from "./read-body";

type Output<Schema> = Schema extends z.ZodType ? z.output<Schema> : undefined;

interface RouteOptions<Params, Query, Body> {
  readonly params?: Params;
  readonly query?: Query;
  readonly body?: Body;
  /** Of the body; 256 kB when not given. */
  readonly maxBytes?: number;
  readonly handler: (given: {
    readonly ctx: Context;
    readonly params: Output<Params>;
    readonly query: Output<Query>;
    readonly body: Output<Body>;
    readonly request: Request;
  }) => Promise<Response | object> | Response | object;
}

interface Segment {
  readonly params: Promise<Record<string, string | string[] | undefined>>;
}

/** A change may only come from our own pages, whatever the browser makes of cookies. */
export function refuseForeignOrigin(request: Request): void {
  if (request.method === "GET" || request.method === "HEAD") return;
  const origin = request.headers.get("origin");
  const site = request.headers.get("sec-fetch-site");
  const isForeign =
    origin !== null ? origin !== env.appUrl : site !== null && site !== "same-origin" && site !== "none";
  if (isForeign) throw new AppError("forbidden", "That request came from another site.");
}

async function parseParams(schema: z.ZodType, segment: Segment): Promise<unknown> {
  const parsed = schema.safeParse(await segment.params);
  // An identifier of the wrong form names nothing, like any other that isn't there.
  if (!parsed.success) throw new AppError("not-found", "There is nothing at this address.");
  return parsed.data;
}

/** A route handler for people who are signed in: parses, calls, shapes the answer, and turns every error into JSON. */
export function route<
  Params extends z.ZodType | undefined = undefined,
  Query extends z.ZodType | undefined = undefined,
  Body extends z.ZodType | undefined = undefined,
>(options: RouteOptions<Params, Query, Body>) {
  return async (request: Request, segment: Segment): Promise<Response> => {
    const requestId = request.headers.get(REQUEST_ID_HEADER) ?? newId();
    try {
      refuseForeignOrigin(request);
      const ctx = await readContext(request.headers);
      if (!ctx) throw new AppError("unauthenticated", "Sign in first.");
      const params = options.params && (await parseParams(options.params, segment));
      const query = options.query?.parse(Object.fromEntries(new URL(request.url).searchParams));
      const body = options.body?.parse(await readJson(request, options.maxBytes ?? 256 * 1024));
      const answer = await options.handler({
        ctx: { ...ctx, requestId },
        params: params as Output<Params>,
        query: query as Output<Query>,
        body: body as Output<Body>,
        request,
      });
      const response = answer instanceof Response ? answer : Response.json(answer);
      response.headers.set("Cache-Control", NO_STORE);
      return response;
    } catch (error) {
      return errorResponse(error, requestId);
    }
  };
}
