import type { CalcAnswer, CalcTaskName, CalcTasks } from "./calc-tasks";

/** Runs the long calculations beside the page; on the page itself where a worker can't be had. */
export interface CalcClient {
  /** Keeps the worker; undoes a `close` that has only just been asked for. */
  open(): void;
  run<Name extends CalcTaskName>(name: Name, input: CalcTasks[Name]["input"]): Promise<CalcTasks[Name]["output"]>;
  close(): void;
}

interface Waiting {
  readonly resolve: (output: never) => void;
  readonly reject: (error: Error) => void;
  readonly onPage: () => void;
}

const CLOSE_AFTER_MS = 1_000;

export function createCalcClient(): CalcClient {
  const waiting = new Map<number, Waiting>();
  let worker: Worker | null | undefined;
  let nextId = 1;
  let closing: ReturnType<typeof setTimeout> | undefined;

  const start = (): Worker | null => {
    if (typeof Worker === "undefined") return null;
    try {
      const opened = new Worker(new URL("./calc.worker.ts", import.meta.url), { type: "module" });
      opened.addEventListener("message", (event: MessageEvent<CalcAnswer>) => {
        const answer = event.data;
        const one = waiting.get(answer.id);
        waiting.delete(answer.id);
        if ("error" in answer) one?.reject(new Error(answer.error));
        else one?.resolve(answer.output as never);
      });
      opened.addEventListener("error", () => {
        worker = null;
        const left = [...waiting.values()];
        waiting.clear();
        for (const one of left) one.onPage();
      });
      return opened;
    } catch {
      return null;
    }
  };

  return {
    run: (name, input) =>
      new Promise((resolve, reject) => {
        const onPage = () => {
          import("./calc-tasks").then(({ runTask }) => resolve(runTask(name, input))).catch(reject);
        };
        if (worker === undefined) worker = start();
        if (!worker) {
          onPage();
          return;
        }
        const id = nextId;
        nextId += 1;
        waiting.set(id, { resolve, reject, onPage });
        worker.postMessage({ id, name, input });
      }),
    open: () => clearTimeout(closing),
    close: () => {
      // React may take a page down and put it up again at once; work under way must survive that.
      closing = setTimeout(() => {
        worker?.terminate();
        worker = undefined;
        waiting.clear();
      }, CLOSE_AFTER_MS);
    },
  };
}
