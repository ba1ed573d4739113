/** Run as a program of its own, so that it can be killed: sends what is in the outbox of DATABASE_URL, until it is empty. */
import { createTransport } from "@/lib/email/transport";
import { env } from "@/lib/env";
import { runOutboxOnce } from "@/lib/services/post/run-outbox";

const transport = createTransport(env.smtpUrl ?? "");

// What a killed worker had begun is due again when its lease is over: each worker's clock goes ahead by that.
process.once("message", (aheadMs: number) => {
  void runOutboxOnce(transport, { now: () => new Date(Date.now() + aheadMs) }).then(() => process.exit(0));
});
process.send?.("ready");
