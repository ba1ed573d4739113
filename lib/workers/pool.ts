import { Worker } from "node:worker_threads";

/** Why a task gave no result; the caller turns it into a sentence for people. */
export class WorkerFailure extends Error {
  constructor(
    readonly reason: "busy" | "timed-out" | "crashed" | "task-failed",
    message: string,
  ) {
    super(message);
    this.name = "WorkerFailure";
  }
}

export type WorkerAnswer = { readonly result: unknown } | { readonly failure: string };

interface Task {
  readonly payload: unknown;
  readonly resolve: (result: unknown) => void;
  readonly reject: (error: Error) => void;
  /** A task whose thread dies for no fault of its own is tried on a fresh one, once. */
  hasBeenTried: boolean;
}

interface PoolOptions {
  readonly threads: number;
  readonly timeoutMs: number;
  /** Waiting tasks beyond this are refused at once instead of piling up. */
  readonly maxWaiting: number;
  readonly memoryMb: number;
}

/** Threads that run one bundled script, started when first needed, one task at a time each, replaced when they die. */
export class WorkerPool {
  private readonly waiting: Task[] = [];
  private readonly idle: Worker[] = [];
  private threadCount = 0;

  constructor(
    private readonly script: string,
    private readonly options: PoolOptions,
  ) {}

  run(payload: unknown): Promise<unknown> {
    if (this.waiting.length >= this.options.maxWaiting) {
      return Promise.reject(new WorkerFailure("busy", `${this.waiting.length} tasks are waiting already.`));
    }
    return new Promise((resolve, reject) => {
      this.waiting.push({ payload, resolve, reject, hasBeenTried: false });
      this.startNext();
    });
  }

  /** Stops every idle thread; those at work end with their task. */
  async close(): Promise<void> {
    const threads = this.idle.splice(0);
    this.threadCount -= threads.length;
    await Promise.all(threads.map((thread) => thread.terminate()));
  }

  private startNext(): void {
    if (this.waiting.length === 0) return;
    const thread = this.idle.pop() ?? this.openThread();
    const task = thread && this.waiting.shift();
    if (thread && task) this.give(thread, task);
  }

  private openThread(): Worker | undefined {
    if (this.threadCount >= this.options.threads) return undefined;
    this.threadCount += 1;
    const thread = new Worker(/* turbopackIgnore: true */ this.script, {
      // Conditions and loaders of this process are not those that the bundle was made for.
      execArgv: [],
      resourceLimits: { maxOldGenerationSizeMb: this.options.memoryMb },
    });
    // A thread that waits for work must not keep the process from ending.
    thread.unref();
    // Without a listener, an error in a thread would end the process; a thread that dies idle is forgotten.
    thread.on("error", () => undefined);
    thread.on("exit", () => {
      const place = this.idle.indexOf(thread);
      if (place < 0) return;
      this.idle.splice(place, 1);
      this.threadCount -= 1;
    });
    return thread;
  }

  private give(thread: Worker, task: Task): void {
    thread.ref();
    const timer = setTimeout(() => {
      finish();
      this.drop(thread);
      task.reject(new WorkerFailure("timed-out", `No result after ${this.options.timeoutMs} ms.`));
      this.startNext();
    }, this.options.timeoutMs);
    const onMessage = (answer: WorkerAnswer) => {
      finish();
      thread.unref();
      this.idle.push(thread);
      if ("failure" in answer) task.reject(new WorkerFailure("task-failed", answer.failure));
      else task.resolve(answer.result);
      this.startNext();
    };
    const onDeath = (cause: unknown) => {
      finish();
      this.drop(thread);
      if (task.hasBeenTried) task.reject(new WorkerFailure("crashed", `The thread ended: ${String(cause)}`));
      else this.waiting.unshift({ ...task, hasBeenTried: true });
      this.startNext();
    };
    const finish = () => {
      clearTimeout(timer);
      thread.off("message", onMessage).off("error", onDeath).off("exit", onDeath);
    };
    thread.on("message", onMessage).on("error", onDeath).on("exit", onDeath);
    thread.postMessage(task.payload);
  }

  private drop(thread: Worker): void {
    this.threadCount -= 1;
    void thread.terminate();
  }
}
