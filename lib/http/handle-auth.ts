import "server-only";
import { REQUEST_ID_HEADER } from "@/lib/auth/session";
import { newId } from "@/lib/domain/ids";
import { errorResponse, NO_STORE } from "./error-response";
import { readText } from "./read-body";

const MAX_BYTES = 16 * 1024;

/** In front of better-auth: a limit of size, the standard Retry-After, no caching, no bare 500s. */
export async function handleAuth(
  request: Request,
  handler: (request: Request) => Promise<Response>,
): Promise<Response> {
  try {
    const hasBody = request.method !== "GET" && request.method !== "HEAD";
    const body = hasBody ? await readText(request, MAX_BYTES) : undefined;
    const inner = new Request(request.url, {
      method: request.method,
      headers: request.headers,
      ...(body === undefined ? {} : { body }),
    });
    const answer = await handler(inner);
    if (answer.status >= 500) throw new Error(`auth answered ${answer.status}`);
    const response = new Response(answer.body, answer);
    const wait = response.headers.get("x-retry-after");
    if (wait) response.headers.set("Retry-After", wait);
    response.headers.set("Cache-Control", NO_STORE);
    return response;
  } catch (error) {
    return errorResponse(error, request.headers.get(REQUEST_ID_HEADER) ?? newId());
  }
}
