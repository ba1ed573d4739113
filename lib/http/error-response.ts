import { AppError, toAppError } from "@/lib/errors";
import { log } from "@/lib/log";

export const NO_STORE = "private, no-store";

/** Any error as JSON; what is not a refusal of ours is logged and answered with a generic sentence. */
export function errorResponse(error: unknown, requestId: string): Response {
  const known = toAppError(error);
  if (!known || known.code === "unavailable") log.error("request failed", error, { requestId });
  const shown =
    known ?? new AppError("unavailable", "Something went wrong on our side. What was saved before is safe; try again.");
  const headers = new Headers({ "Cache-Control": NO_STORE });
  if (shown.retryAfterS !== undefined) headers.set("Retry-After", String(shown.retryAfterS));
  return Response.json(
    {
      error: {
        code: known ? shown.code : "internal",
        message: shown.userMessage,
        fieldErrors: shown.fieldErrors,
        details: shown.details ?? null,
        requestId,
      },
    },
    { status: known ? shown.status : 500, headers },
  );
}
