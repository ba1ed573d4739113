import { parentPort } from "node:worker_threads";
import type { KitSearch } from "@/lib/calc/kit/search-input";
import { runKitSearch, type KitMessage } from "./kit-task";

const port = parentPort;
if (!port) throw new Error("This script runs in a worker thread only.");
const tell = (message: KitMessage) => port.postMessage(message);

port.on("message", (search: KitSearch) => {
  runKitSearch(search, (step, done, total) => tell({ progress: { step, done, total } })).then(
    (result) => tell({ result }),
    (error: unknown) => tell({ failure: error instanceof Error ? `${error.name}: ${error.message}` : String(error) }),
  );
});
