import { ActionForm, SubmitButton, type FormAction } from "@/components/ui/action-form";
import type { ConcernedView } from "@/lib/domain/people-views";
import { plural } from "@/lib/format/words";

/** A change, and the new pages to exactly those whose pages it is on. */
export function Concerned({
  concerned: { people, subjects },
  action,
  tripId,
  tripName,
  requestId,
  paperSize,
}: {
  readonly concerned: ConcernedView;
  readonly action: FormAction<null>;
  readonly tripId: string;
  readonly tripName: string;
  readonly requestId: string;
  readonly paperSize: string;
}) {
  const ids = people.map((person) => person.personId);
  return (
    <div className="max-w-[52rem] border-l-4 border-ember pl-5">
      <ul className="mb-4">
        {subjects.map(({ subject, count }) => (
          <li key={subject} className="text-15">
            <span className="font-semibold">{subject}</span> changed: {plural(count, "person", "people")}
          </li>
        ))}
      </ul>
      <ul className="mb-5">
        {people.map((person) => (
          <li key={person.personId} className="border-t border-hair py-1">
            <details>
              <summary className="flex min-h-11 cursor-pointer items-center text-15">
                <span>
                  <span className="font-semibold">{person.name}</span>
                  <span className="text-pencil">
                    {" "}
                    has version {person.version}, {plural(person.changes.length, "change")} since
                  </span>
                </span>
              </summary>
              <ul className="list-disc pb-3 pl-5 text-15">
                {person.changes.map((change) => (
                  <li key={change}>{change}</li>
                ))}
              </ul>
            </details>
          </li>
        ))}
      </ul>
      <ActionForm action={action}>
        <input type="hidden" name="tripId" value={tripId} />
        <input type="hidden" name="requestId" value={requestId} />
        <input type="hidden" name="personIds:json" value={JSON.stringify(ids)} />
        <input type="hidden" name="pieces:json" value={JSON.stringify(["pitch-and-pack"])} />
        <input type="hidden" name="subject" value={`${tripName}: your pages have changed`} />
        <input
          type="hidden"
          name="message"
          value="Something on your pages has changed. The new ones come with this mail. Please put the old paper away."
        />
        <input type="hidden" name="paperSize" value={paperSize} />
        <SubmitButton>Send new pages to {people.length === 1 ? "this person" : `these ${people.length}`}</SubmitButton>
      </ActionForm>
    </div>
  );
}
