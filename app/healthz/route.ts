export const dynamic = "force-dynamic";

/** The process answers; asks nothing else. */
export function GET(): Response {
  return Response.json({ status: "ok" }, { headers: { "Cache-Control": "no-store" } });
}
