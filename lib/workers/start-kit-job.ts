import { existsSync } from "node:fs";
import { join } from "node:path";
import { Worker } from "node:worker_threads";
import type { KitOutcome } from "@/lib/calc/kit/search-kit";
import type { KitSearch } from "@/lib/calc/kit/search-input";
import { env } from "@/lib/env";
import { runKitSearch, type KitMessage, type KitProgress } from "./kit-task";

/** A search that somebody stopped, that took too long, or whose thread died. */
export class KitJobEnded extends Error {
  constructor(
    readonly reason: "cancelled" | "timed-out" | "failed",
    message: string,
  ) {
    super(message);
    this.name = "KitJobEnded";
  }
}

export interface KitJob {
  readonly outcome: Promise<KitOutcome>;
  cancel(): void;
}

const LONGEST_MS = 120_000;
const MEMORY_MB = 512;

/** A thread of its own for each search, so that it can be stopped at any moment. */
export function runKitThread(script: string, search: KitSearch, onProgress: (progress: KitProgress) => void): KitJob {
  const thread = new Worker(/* turbopackIgnore: true */ script, {
    execArgv: [],
    resourceLimits: { maxOldGenerationSizeMb: MEMORY_MB },
  });
  let end: (error: KitJobEnded) => void = () => undefined;
  const outcome = new Promise<KitOutcome>((resolve, reject) => {
    const timer = setTimeout(() => end(new KitJobEnded("timed-out", `No kit after ${LONGEST_MS} ms.`)), LONGEST_MS);
    const finish = () => {
      clearTimeout(timer);
      void thread.terminate();
    };
    end = (error) => {
      finish();
      reject(error);
    };
    thread.on("message", (message: KitMessage) => {
      if ("progress" in message) return onProgress(message.progress);
      if ("failure" in message) return end(new KitJobEnded("failed", message.failure));
      finish();
      resolve(message.result);
    });
    thread.on("error", (error) => end(new KitJobEnded("failed", String(error))));
    thread.on("exit", () => end(new KitJobEnded("failed", "The thread ended.")));
  });
  thread.postMessage(search);
  return { outcome, cancel: () => end(new KitJobEnded("cancelled", "Stopped.")) };
}

/** Where no bundle was built, in development and tests, the search runs in this thread, from the source. */
function runHere(search: KitSearch, onProgress: (progress: KitProgress) => void): KitJob {
  let isCancelled = false;
  const refuseCancelled = () => {
    if (isCancelled) throw new KitJobEnded("cancelled", "Stopped.");
  };
  const work = async () => {
    await new Promise((resolve) => setImmediate(resolve));
    refuseCancelled();
    const outcome = await runKitSearch(search, (step, done, total) => onProgress({ step, done, total }));
    refuseCancelled();
    return outcome;
  };
  return { outcome: work(), cancel: () => void (isCancelled = true) };
}

export function startKitJob(search: KitSearch, onProgress: (progress: KitProgress) => void): KitJob {
  const script = join(/* turbopackIgnore: true */ process.cwd(), ".next", "workers", "kit.mjs");
  const isBundled = env.isProduction && existsSync(script);
  return isBundled ? runKitThread(script, search, onProgress) : runHere(search, onProgress);
}
