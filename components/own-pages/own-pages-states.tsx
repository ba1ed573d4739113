import { ChangeList } from "./change-list";
import { CopyLine } from "./copy-line";
import type { OwnPagesState } from "@/lib/domain/own-pages/views";
import { formatInstant } from "@/lib/format/days";
import { plural } from "@/lib/format/words";

/** Per person: which version of their pages is printed or sent, what is old by now, and which version they have read. */
export function OwnPagesStates({
  states,
  version,
  timeZone,
}: {
  readonly states: readonly OwnPagesState[];
  readonly version: number;
  readonly timeZone: string;
}) {
  return (
    <ul>
      {states.map((state) => {
        const old = state.copies.find((copy) => copy.changes.length > 0);
        return (
          <li
            key={state.personId}
            className="grid gap-x-6 gap-y-1 border-t border-hair py-3 first:border-t-0 sm:grid-cols-[12rem_minmax(0,1fr)]"
          >
            <p className="text-15 font-semibold">{state.name}</p>
            <div className="flex flex-col gap-1">
              {state.copies.length === 0 && <p className="text-15 text-pencil">No copy printed or sent yet.</p>}
              {state.copies.map((copy) => (
                <CopyLine key={copy.way} copy={copy} version={version} timeZone={timeZone} />
              ))}
              <ReadLine state={state} timeZone={timeZone} />
              {old && (
                <details>
                  <summary className="flex min-h-11 items-center text-15 font-semibold text-spruce">
                    {plural(old.changes.length, "change")} since version {old.version}
                  </summary>
                  <ChangeList changes={old.changes} />
                </details>
              )}
            </div>
          </li>
        );
      })}
    </ul>
  );
}

function ReadLine({ state, timeZone }: { readonly state: OwnPagesState; readonly timeZone: string }) {
  if (state.readAt === null) return <p className="text-15 text-pencil">Has not said they read them.</p>;
  return (
    <p className="text-15">
      Read version {state.readVersion}
      <span className="text-pencil">, {formatInstant(state.readAt, timeZone)}</span>
      {state.unread.length > 0 && (
        <strong className="text-ember"> {plural(state.unread.length, "change")} not read yet</strong>
      )}
    </p>
  );
}
