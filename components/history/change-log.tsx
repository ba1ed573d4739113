import Link from "next/link";
import type { ChangeEntry } from "@/lib/domain/history/views";
import type { PlanHistoryEntry } from "@/lib/domain/views";
import { formatInstant } from "@/lib/format/days";

export function ChangeLog({
  entries,
  timeZone,
}: {
  readonly entries: readonly ChangeEntry[];
  readonly timeZone: string;
}) {
  if (entries.length === 0) return <p className="text-15 text-pencil">Nothing was changed here yet.</p>;
  return (
    <ol aria-label="Changes, newest first">
      {entries.map((entry) => (
        <li
          key={entry.id}
          className="grid gap-x-6 border-t border-hair py-2.5 sm:grid-cols-[9rem_minmax(0,1fr)] sm:items-baseline"
        >
          <p className="text-13 text-pencil">{formatInstant(entry.at, timeZone)}</p>
          <p className="text-15">
            <span className="font-semibold">{entry.byName}</span> {entry.what}
            <span className="block text-pencil">{entry.summary}</span>
          </p>
        </li>
      ))}
    </ol>
  );
}

/** Versions of one camp's staking plan, each with the way to look at it and bring it back. */
export function PlanVersions({
  entries,
  tripId,
  campId,
  timeZone,
}: {
  /** Newest first. */
  readonly entries: readonly PlanHistoryEntry[];
  readonly tripId: string;
  readonly campId: string;
  readonly timeZone: string;
}) {
  const newest = entries[0]?.planVersion;
  if (newest === undefined) return <p className="text-15 text-pencil">This plan was never changed.</p>;
  return (
    <ol aria-label="Versions of the staking plan, newest first">
      {entries.map((entry) => (
        <li
          key={entry.intentId}
          className="grid gap-x-6 border-t border-hair py-2 sm:grid-cols-[9rem_minmax(0,1fr)_auto] sm:items-baseline"
        >
          <p className="text-13 text-pencil">
            version {entry.planVersion}
            <span className="block">{formatInstant(entry.at, timeZone)}</span>
          </p>
          <p className="text-15">
            <span className="font-semibold">{entry.byName}</span>
            <span className="block">{entry.sentence}</span>
          </p>
          {entry.planVersion === newest ? (
            <p className="flex min-h-11 items-center text-15 text-pencil">as it is now</p>
          ) : (
            <Link
              href={`/trips/${tripId}/history/${campId}/${entry.planVersion}`}
              className="inline-flex min-h-11 items-center text-15 font-semibold text-spruce hover:underline"
            >
              Look at it<span className="sr-only">, version {entry.planVersion}</span>
            </Link>
          )}
        </li>
      ))}
    </ol>
  );
}
