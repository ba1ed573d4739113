"use client";

import { useState } from "react";
import { Button } from "@/components/ui/button";
import { TextField } from "@/components/ui/fields";
import type { Contact } from "@/lib/domain/trip/schema";

const MOST = 12;

/** Lines of the contact sheet, printed on every card. */
export function ContactFields({
  contacts,
  onChanged,
}: {
  readonly contacts: readonly Contact[];
  readonly onChanged: () => void;
}) {
  const [rows, setRows] = useState(() => contacts.map((contact, index) => ({ key: index, contact })));
  const [nextKey, setNextKey] = useState(contacts.length);
  const blank: Contact = { name: "", phone: "", note: "" };
  return (
    <div className="flex flex-col gap-5">
      {rows.length === 0 && (
        <p className="text-15 text-pencil">No contact lines yet: mountain rescue, the emergency number, a warden.</p>
      )}
      {rows.map(({ key, contact }, index) => (
        <fieldset
          key={key}
          className="grid items-end gap-4 border-t border-hair pt-4 sm:grid-cols-[1fr_1fr_1.4fr_auto]"
        >
          <legend className="sr-only">{`Contact ${index + 1}`}</legend>
          <TextField name={`contacts.${index}.name`} label="Who" maxLength={80} defaultValue={contact.name} />
          <TextField
            name={`contacts.${index}.phone`}
            label="Telephone"
            type="tel"
            autoComplete="off"
            maxLength={30}
            defaultValue={contact.phone}
          />
          <TextField name={`contacts.${index}.note`} label="Note" maxLength={120} defaultValue={contact.note} />
          <Button
            look="quiet"
            onClick={() => {
              setRows(rows.filter((row) => row.key !== key));
              onChanged();
            }}
          >
            Remove <span className="sr-only">{`contact ${index + 1}`}</span>
          </Button>
        </fieldset>
      ))}
      {rows.length < MOST && (
        <div>
          <Button
            onClick={() => {
              setRows([...rows, { key: nextKey, contact: blank }]);
              setNextKey(nextKey + 1);
              onChanged();
            }}
          >
            Add a contact line
          </Button>
        </div>
      )}
    </div>
  );
}
