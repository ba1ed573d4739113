import { checkReadiness } from "@/lib/services/health/check-readiness";

export const dynamic = "force-dynamic";

export async function GET(): Promise<Response> {
  const { isReady, checks } = await checkReadiness();
  return Response.json(
    { status: isReady ? "ok" : "not ready", checks },
    { status: isReady ? 200 : 503, headers: { "Cache-Control": "no-store" } },
  );
}
