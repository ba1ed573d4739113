import type { Instrumentation } from "next";

export async function register(): Promise<void> {
  // In these very words the bundler understands it, and leaves the rest out of what it builds for the edge.
  if (process.env.NEXT_RUNTIME === "nodejs") {
    const { startServer } = await import("@/lib/services/health/start-server");
    await startServer();
  }
}

export const onRequestError: Instrumentation.onRequestError = async (error, request, context) => {
  if (process.env.NEXT_RUNTIME === "nodejs") {
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
  }
};
