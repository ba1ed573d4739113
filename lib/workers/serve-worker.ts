import { parentPort } from "node:worker_threads";
import type { WorkerAnswer } from "./pool";

/** The inside of a worker thread: answers each message with the task's result, or says why there is none. */
export function serveWorker<Payload, Result>(task: (payload: Payload) => Result | Promise<Result>): void {
  const port = parentPort;
  if (!port) throw new Error("This script runs in a worker thread only.");
  port.on("message", async (payload: Payload) => {
    let answer: WorkerAnswer;
    try {
      answer = { result: await task(payload) };
    } catch (error) {
      answer = { failure: error instanceof Error ? `${error.name}: ${error.message}` : String(error) };
    }
    port.postMessage(answer);
  });
}
