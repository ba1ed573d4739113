import { ActionForm, SubmitButton } from "@/components/ui/action-form";
import type { SessionView } from "@/lib/services/account/list-sessions";
import { endSessionAction } from "../actions";

interface SessionListProps {
  readonly sessions: readonly SessionView[];
  readonly currentId: string | null;
}

const when = new Intl.DateTimeFormat("en-GB", { dateStyle: "medium", timeStyle: "short", timeZone: "UTC" });

export function SessionList({ sessions, currentId }: SessionListProps) {
  return (
    <ul className="divide-y divide-hair">
      {sessions.map((one) => (
        <li key={one.id} className="flex flex-wrap items-center justify-between gap-x-6 gap-y-2 py-3">
          <div>
            <p className="font-semibold">
              {one.device}
              {one.id === currentId && <span className="font-normal text-pencil"> (this one)</span>}
            </p>
            <p className="text-13 text-pencil">Signed in {when.format(new Date(one.signedInAt))} UTC</p>
          </div>
          {one.id !== currentId && (
            <ActionForm action={endSessionAction}>
              <input type="hidden" name="sessionId" value={one.id} />
              <SubmitButton look="quiet">
                Sign out <span className="sr-only">{one.device}</span>
              </SubmitButton>
            </ActionForm>
          )}
        </li>
      ))}
    </ul>
  );
}
