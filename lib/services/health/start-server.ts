import { checkpointDb } from "@/db/client";
import { checkEnv } from "@/lib/env";
import { log } from "@/lib/log";
import { closeWorkers } from "@/lib/workers/run-in-worker";
import { startPost } from "../post/start-post";
import { checkReadiness } from "./check-readiness";

const store = globalThis as typeof globalThis & { leesteadIsStarted?: boolean };

/** Once per process, before the first request. Next.js itself finishes the requests in flight when told to stop. */
export async function startServer(): Promise<void> {
  if (store.leesteadIsStarted) return;
  store.leesteadIsStarted = true;
  try {
    checkEnv();
  } catch (error) {
    console.error(error instanceof Error ? error.message : error);
    process.exit(1);
  }
  const { checks } = await checkReadiness();
  if (checks.database !== "ok" || checks.migrations !== "ok") {
    console.error("The database is not of this version: run npm run db:migrate.");
  }
  const post = await startPost();
  let isStopping = false;
  const stop = () => {
    if (isStopping) return;
    isStopping = true;
    Promise.all([keepCheckpointing(), post.stop(), closeWorkers()]).catch((error: unknown) => log.error("stop", error));
  };
  process.once("SIGTERM", stop);
  process.once("SIGINT", stop);
}

/** At once, since the process may end in the next moment, and again while requests in flight still write. */
async function keepCheckpointing(): Promise<void> {
  await checkpointDb();
  setTimeout(() => void keepCheckpointing().catch(() => undefined), 50).unref();
}
