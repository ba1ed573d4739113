import { databaseFile } from "../../helpers/database";
import { startMailServer, type MailServer } from "../../helpers/mail-server";
import { fork } from "node:child_process";
import { rmSync } from "node:fs";
import path from "node:path";
import { build } from "esbuild";
import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { getDb, withTransaction } from "@/db/client";
import { outboxMessage } from "@/db/schema";
import { newId } from "@/lib/domain/ids";
import { renderLetter } from "@/lib/email/letter";
import { enqueueMessage } from "@/lib/services/post/enqueue-message";

const MAILS = 500;
const KILLS = 50;
/** Longer than the lease of a message. */
const LEASE_AHEAD_MS = 130_000;

let server: MailServer;
beforeAll(async () => {
  server = await startMailServer();
});
afterAll(async () => {
  await server.close();
});

const bundle = path.join(process.cwd(), "node_modules", ".leestead-tests", `outbox-worker-${process.pid}.mjs`);

/** One file, so that a start takes a moment only. */
beforeAll(async () => {
  await build({
    entryPoints: ["tests/helpers/outbox-worker.ts"],
    outfile: bundle,
    bundle: true,
    platform: "node",
    format: "esm",
    packages: "external",
    tsconfig: "tsconfig.json",
    logLevel: "error",
  });
});
afterAll(() => rmSync(bundle, { force: true }));

interface Worker {
  readonly ready: Promise<void>;
  readonly gone: Promise<void>;
  go(round: number): void;
  kill(): void;
}

function startWorker(): Worker {
  const child = fork(bundle, [], {
    execArgv: ["--conditions=react-server"],
    env: {
      ...process.env,
      DATABASE_URL: `file:${databaseFile}`,
      SMTP_URL: server.url,
      MAIL_FROM: "post@leestead.test",
    },
    stdio: ["ignore", "ignore", "inherit", "ipc"],
  });
  return {
    ready: new Promise((resolve) => child.once("message", () => resolve())),
    gone: new Promise((resolve) => child.once("exit", () => resolve())),
    go: (round) => void child.send(round * LEASE_AHEAD_MS),
    kill: () => void child.kill("SIGKILL"),
  };
}

const pause = (ms: number) => new Promise<void>((resolve) => setTimeout(resolve, ms));

/** Until so many mails more have arrived: a kill hits a worker at work, however busy the machine is. */
async function waitForMails(count: number): Promise<void> {
  const wanted = Math.min(server.received.length + count, MAILS);
  while (server.received.length < wanted) await pause(1);
}

/** The next gets ready while one works, so that the time goes into sending, not into starting. */
async function killAgainAndAgain(): Promise<void> {
  let next = startWorker();
  for (let kill = 1; kill <= KILLS; kill += 1) {
    const worker = next;
    await worker.ready;
    next = startWorker();
    worker.go(kill);
    await waitForMails(1 + ((kill * 5) % 9));
    await pause(kill % 7);
    worker.kill();
    await worker.gone;
  }
  await next.ready;
  next.go(KILLS + 1);
  await next.gone;
}

describe("500 mails with the worker killed 50 times", () => {
  it("reach everybody; a second copy has the same Message-ID, and there are no more of them than kills", async () => {
    const mail = renderLetter({ subject: "Cards", greeting: "Hello,", paragraphs: ["Text."], footnotes: ["Small."] });
    await withTransaction(async (tx) => {
      for (let i = 0; i < MAILS; i += 1) {
        const to = { name: `P ${i}`, address: `p${i}@example.test` };
        await enqueueMessage(tx, { kind: "papers", requestId: newId(), to, mail });
      }
    });
    await killAgainAndAgain();
    const rows = await getDb().select().from(outboxMessage);
    expect(rows.filter((row) => row.state !== "sent")).toEqual([]);

    const copies = new Map<string, string[]>();
    for (const one of server.received) {
      expect(one.recipients).toHaveLength(1);
      const address = one.recipients[0] ?? "";
      copies.set(address, [...(copies.get(address) ?? []), one.mail.messageId ?? ""]);
    }
    expect(copies.size).toBe(MAILS);
    for (const row of rows) {
      const ids = copies.get(row.toAddress) ?? [];
      expect(ids.length).toBeGreaterThanOrEqual(1);
      expect(new Set(ids)).toEqual(new Set([row.messageId]));
    }
    expect(server.received.length - MAILS).toBeLessThanOrEqual(KILLS);
    // Killed in the middle of work, not before or after all of it: some had been begun by one worker and sent by another.
    expect(rows.some((row) => row.attempts > 1)).toBe(true);
  }, 300_000);
});
