import { ROLE_NAMES } from "@/lib/domain/permissions/permissions";
import type { ContactSheetView } from "@/lib/domain/people-views";

type SheetPerson = ContactSheetView["people"][number];

const telHref = (phone: string) => `tel:${phone.replace(/[^+0-9]/g, "")}`;

function Phone({ phone, of }: { readonly phone: string; readonly of: string }) {
  return (
    <a href={telHref(phone)} className="inline-flex min-h-11 items-center font-semibold text-spruce tabular-nums">
      {phone}
      <span className="sr-only">, call {of}</span>
    </a>
  );
}

/** Everybody with whom to call and what to know. */
export function ContactSheet({ people }: { readonly people: readonly SheetPerson[] }) {
  return (
    <ul aria-label="Contact sheet">
      {people.map((person) => (
        <li key={person.id} className="grid gap-x-8 gap-y-3 border-t border-hair py-4 lg:grid-cols-[14rem_1fr_1fr]">
          <div className="min-w-0">
            <p className="text-15 font-bold break-words">{person.name}</p>
            <p className="text-13 text-pencil">{ROLE_NAMES[person.role]}</p>
            {typeof person.details === "object" && person.details?.phone && (
              <Phone phone={person.details.phone} of={person.name} />
            )}
          </div>
          <PersonNotes person={person} />
        </li>
      ))}
    </ul>
  );
}

function PersonNotes({ person: { details } }: { readonly person: SheetPerson }) {
  if (details === null) return <p className="text-15 text-ember lg:col-span-2">Has written nothing yet.</p>;
  if (details === "unreadable") {
    return (
      <p className="text-15 text-rowan lg:col-span-2">
        Can&rsquo;t be read with the keys that this server has. Ask whoever runs it.
      </p>
    );
  }
  return (
    <>
      <div className="min-w-0">
        <p className="text-13 text-pencil">In an emergency</p>
        {details.emergencyContacts.length === 0 && <p className="text-15 text-ember">nobody named</p>}
        {details.emergencyContacts.map((contact) => (
          <p key={`${contact.name} ${contact.phone}`} className="text-15 break-words">
            {contact.name}
            {contact.relation && <span className="text-pencil">, {contact.relation}</span>}
            <br />
            <Phone phone={contact.phone} of={contact.name} />
          </p>
        ))}
      </div>
      <div className="flex min-w-0 flex-col gap-2">
        <Note title="Health" text={details.health} />
        <Note title="Food" text={details.diet} />
      </div>
    </>
  );
}

function Note({ title, text }: { readonly title: string; readonly text: string }) {
  return (
    <div>
      <p className="text-13 text-pencil">{title}</p>
      <p className="text-15 break-words whitespace-pre-wrap">{text || <span className="text-pencil">nothing</span>}</p>
    </div>
  );
}
