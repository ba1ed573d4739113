import type { Instrumentation } from "next";
import { isNodeRuntime } from "@/lib/env";

export async function register(): Promise<void> {
  if (!isNodeRuntime) return;
  const { startServer } = await import("@/lib/services/health/start-server");
  await startServer();
}

export const onRequestError: Instrumentation.onRequestError = async (error, request, context) => {
  if (!isNodeRuntime) return;
  const { log } = await import("@/lib/log");
  const digest = typeof error === "object" && error !== null && "digest" in error ? String(error.digest) : null;
  const requestId = request.headers["x-request-id"];
  log.error("request failed", error, {
    digest,
    requestId: typeof requestId === "string" ? requestId : null,
    method: request.method,
    route: context.routePath,
    kind: context.routeType,
  });
};
