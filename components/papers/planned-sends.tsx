import { ConfirmButton } from "@/components/ui/confirm-button";
import type { FormAction } from "@/components/ui/action-form";
import type { PlannedSendView } from "@/lib/domain/people-views";
import { formatInstant } from "@/lib/format/days";

/** What goes out by itself at its time, and what could not. */
export function PlannedSends({
  tripId,
  timeZone,
  planned,
  cancel,
}: {
  readonly tripId: string;
  readonly timeZone: string;
  readonly planned: readonly PlannedSendView[];
  readonly cancel: FormAction<null>;
}) {
  return (
    <ul aria-label="Messages for later">
      {planned.map((one) => (
        <li
          key={one.id}
          className="grid items-center gap-x-6 gap-y-1 border-t border-hair py-3 first:border-t-0 sm:grid-cols-[12rem_minmax(0,1fr)_auto]"
        >
          <p className={`text-15 font-semibold ${one.state === "failed" ? "text-rowan" : ""}`}>
            {one.state === "failed" ? "did not go" : formatInstant(one.sendAt, timeZone)}
          </p>
          <div className="min-w-0">
            <p className="text-15 break-words">{one.subject}</p>
            <p className="text-13 break-words text-pencil">{one.reason ?? `to ${one.names.join(", ")}`}</p>
          </div>
          {one.state === "planned" && (
            <ConfirmButton
              look="quiet"
              label="Do not send"
              title="Take this message back?"
              confirmLabel="Do not send it"
              action={cancel}
              values={{ tripId, plannedSendId: one.id }}
            >
              It is not sent at its time. The words are gone with it.
            </ConfirmButton>
          )}
        </li>
      ))}
    </ul>
  );
}
