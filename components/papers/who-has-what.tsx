import type { MessageView, PersonView } from "@/lib/domain/views";
import { formatInstant } from "@/lib/format/days";

/** The last papers that went to each person. */
export function WhoHasWhat({
  people,
  messages,
  timeZone,
}: {
  readonly people: readonly PersonView[];
  /** Newest first. */
  readonly messages: readonly MessageView[];
  readonly timeZone: string;
}) {
  return (
    <ul>
      {people.map((person) => {
        const last = messages.find(
          (message) => message.toAddress === person.email && message.files.length > 0 && !message.isTest,
        );
        return (
          <li
            key={person.id}
            className="grid gap-x-6 border-t border-hair py-2.5 first:border-t-0 sm:grid-cols-[12rem_minmax(0,1fr)]"
          >
            <p className="text-15 font-semibold">{person.name}</p>
            <p className="text-15">
              {last ? (
                <>
                  {last.subject}
                  <span className="text-pencil">
                    {", "}
                    {last.state === "sent" && last.sentAt
                      ? `sent ${formatInstant(last.sentAt, timeZone)}`
                      : last.state === "failed"
                        ? "not sent"
                        : "on its way"}
                  </span>
                </>
              ) : (
                <span className="text-pencil">nothing sent yet</span>
              )}
            </p>
          </li>
        );
      })}
    </ul>
  );
}
