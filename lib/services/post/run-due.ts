import { log } from "@/lib/log";
import { sendDigests } from "../notices/send-digests";
import { runPlannedSends } from "../planned-sends/run-planned-sends";
import { remindDue } from "../answers/remind";
import { deleteOldDetails, resealDetails } from "../details/tend-details";

/** What happens by itself when its time has come. Each is safe to run again, and in two processes at once. */
const JOBS = {
  reminders: remindDue,
  oldDetails: deleteOldDetails,
  olderKeys: resealDetails,
  plannedSends: (now: Date) => runPlannedSends(now),
  digests: sendDigests,
} as const satisfies Record<string, (now: Date) => Promise<number>>;

/** One that fails keeps none of the others. */
export async function runDue(now = new Date()): Promise<void> {
  for (const [name, run] of Object.entries(JOBS)) {
    try {
      const count = await run(now);
      if (count > 0) log.info("due work done", { name, count });
    } catch (error) {
      log.error("due work", error, { name });
    }
  }
}
