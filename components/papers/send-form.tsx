"use client";

import { useState } from "react";
import { ActionForm, SubmitButton, useFieldErrors, type FormAction } from "@/components/ui/action-form";
import { Button } from "@/components/ui/button";
import { ChoiceField, FieldError, SelectField, TextArea, TextField } from "@/components/ui/fields";
import type { PaperSize } from "@/lib/domain/paper/schema";
import { fillTemplate, TEMPLATE_WORDS, type TemplateValues, type TemplateView } from "@/lib/domain/post/fill-template";

export interface Recipient {
  readonly id: string;
  readonly name: string;
  readonly email: string;
  readonly role: string;
}

interface SendFormProps {
  readonly action: FormAction<null>;
  readonly tripId: string;
  readonly initialSubject: string;
  readonly people: readonly Recipient[];
  readonly pieces: readonly { readonly key: string; readonly name: string }[];
  readonly paperSize: PaperSize;
  /** Made once per sending: pressing twice has one effect. */
  readonly requestId: string;
  /** The mail's text with the marks [[name]], [[message]] and [[files]]; by whether there is a message and a file. */
  readonly previews: MailPreviews;
  readonly templates: readonly TemplateView[];
  /** What the words in braces become, but for the name. */
  readonly values: Omit<TemplateValues, "name">;
}

export interface MailPreviews {
  readonly both: string;
  readonly messageOnly: string;
  readonly filesOnly: string;
}

function fillPreview(
  previews: MailPreviews,
  given: { readonly name: string; readonly message: string; readonly files: readonly string[] },
): string {
  const { name, message, files } = given;
  const text = files.length === 0 ? previews.messageOnly : message ? previews.both : previews.filesOnly;
  const parts: Readonly<Record<string, string>> = {
    name,
    message: message || "nothing yet",
    files: files.join("\n– "),
  };
  return text.replace(/\[\[(name|message|files)\]\]/g, (_, key: string) => parts[key] ?? "");
}

/** Who gets what, with which words; the mail is read before it goes. */
export function SendForm(props: SendFormProps) {
  const { action, tripId, initialSubject, people, pieces, paperSize, requestId, previews, templates, values } = props;
  const [personIds, setPersonIds] = useState<readonly string[]>(people.map((person) => person.id));
  const [pieceKeys, setPieceKeys] = useState<readonly string[]>(["pack-list", "pitch-cards"]);
  const [subject, setSubject] = useState(initialSubject);
  const [message, setMessage] = useState("");
  const chosen = people.filter((person) => personIds.includes(person.id));
  const first = chosen[0];
  const chosenPieces = pieces.filter((piece) => pieceKeys.includes(piece.key));
  const fill = (text: string) => fillTemplate(text, { ...values, name: first?.name ?? "…" });
  const preview = fillPreview(previews, {
    name: first?.name ?? "…",
    message: fill(message.trim()),
    files: chosenPieces.map((piece) => (piece.key === "calendar" ? piece.name : `${piece.name} (PDF)`)),
  });
  return (
    <ActionForm action={action} className="grid gap-x-10 gap-y-8 lg:grid-cols-2">
      <div className="flex min-w-0 flex-col gap-6">
        <input type="hidden" name="tripId" value={tripId} />
        <input type="hidden" name="requestId" value={requestId} />
        <TickList
          legend={`Recipients, ${personIds.length} of ${people.length}`}
          name="personIds"
          options={people.map((person) => ({
            key: person.id,
            label: person.name,
            detail: `${person.role}, ${person.email}`,
          }))}
          chosen={personIds}
          onChange={setPersonIds}
          hasAll
        />
        <TickList
          legend="What goes with it"
          name="pieces"
          options={pieces.map((piece) => ({ key: piece.key, label: piece.name }))}
          chosen={pieceKeys}
          onChange={setPieceKeys}
        />
        <ChoiceField
          legend="Paper"
          name="paperSize"
          options={[
            { value: "A4", label: "A4" },
            { value: "LETTER", label: "US Letter" },
          ]}
          defaultValue={paperSize}
        />
        <SelectField
          name="template"
          label="Words to start from"
          options={templates.map((one, index) => ({ value: String(index), label: one.name }))}
          placeholder="My own"
          onChange={(event) => {
            const template = templates[Number(event.target.value)];
            if (!template || event.target.value === "") return;
            setSubject(template.subject);
            setMessage(template.body);
          }}
        />
        <TextField
          name="subject"
          label="Subject"
          maxLength={150}
          value={subject}
          onChange={(event) => setSubject(event.target.value)}
        />
        <TextArea
          name="message"
          label="Message"
          rows={5}
          maxLength={4000}
          value={message}
          onChange={(event) => setMessage(event.target.value)}
          hint={`May stay empty. Each mail fills in ${TEMPLATE_WORDS.map(({ word }) => word).join(", ")}.`}
        />
      </div>
      <div className="min-w-0">
        <h3 className="mb-2 text-15 font-bold">Preview</h3>
        <div className="border border-hair bg-sheet p-5 text-15">
          <p className="text-13 text-pencil">
            To {first ? `${first.name}, ${first.email}` : "nobody yet"}
            {chosen.length > 1 && ` and ${chosen.length - 1} more, one mail each`}
          </p>
          <p className="mt-2 border-b border-hair pb-3 text-18 font-bold break-words">
            {fill(subject) || "No subject"}
          </p>
          <p className="mt-3 break-words whitespace-pre-wrap">{preview}</p>
        </div>
        <div className="mt-5 flex flex-wrap gap-3">
          <SubmitButton>{chosen.length === 1 ? "Send to 1 person" : `Send to ${chosen.length} people`}</SubmitButton>
          <SubmitButton look="outline" name="intent" value="test">
            Send me a test
          </SubmitButton>
        </div>
        <details className="mt-6 border-t border-hair pt-2">
          <summary className="flex min-h-11 cursor-pointer items-center text-15 font-semibold text-spruce">
            Send it later
          </summary>
          <div className="grid items-start gap-4 pt-2 sm:grid-cols-2">
            <TextField name="sendDay" label="Day" type="date" />
            <TextField name="sendTime" label="Time" type="time" hint="On the trip's clock." />
          </div>
          <p className="mt-2 text-13 text-pencil">The papers are made then, as the plan is then.</p>
          <div className="mt-3">
            <SubmitButton look="outline" name="intent" value="later">
              Send it then
            </SubmitButton>
          </div>
        </details>
        <details className="border-t border-hair pt-2">
          <summary className="flex min-h-11 cursor-pointer items-center text-15 font-semibold text-spruce">
            Keep these words as a template
          </summary>
          <div className="pt-2">
            <TextField name="templateName" label="Name of the template" maxLength={60} autoComplete="off" />
          </div>
          <div className="mt-3">
            <SubmitButton look="outline" name="intent" value="template">
              Keep them
            </SubmitButton>
          </div>
        </details>
      </div>
    </ActionForm>
  );
}

function TickList({
  legend,
  name,
  options,
  chosen,
  onChange,
  hasAll = false,
}: {
  readonly legend: string;
  readonly name: string;
  readonly options: readonly { readonly key: string; readonly label: string; readonly detail?: string }[];
  readonly chosen: readonly string[];
  readonly onChange: (keys: readonly string[]) => void;
  readonly hasAll?: boolean;
}) {
  const errors = useFieldErrors(name);
  return (
    <fieldset>
      <legend className="text-15 font-semibold">{legend}</legend>
      <input type="hidden" name={`${name}:json`} value={JSON.stringify(chosen)} />
      {hasAll && (
        <div className="-ml-4 flex gap-1">
          <Button look="quiet" onClick={() => onChange(options.map((option) => option.key))}>
            Everybody
          </Button>
          <Button look="quiet" onClick={() => onChange([])}>
            Nobody
          </Button>
        </div>
      )}
      {options.map((option) => (
        <label key={option.key} className="flex min-h-11 items-center gap-3 border-t border-hair py-1.5">
          <input
            type="checkbox"
            checked={chosen.includes(option.key)}
            onChange={(event) =>
              onChange(
                event.target.checked
                  ? options.map((one) => one.key).filter((key) => key === option.key || chosen.includes(key))
                  : chosen.filter((key) => key !== option.key),
              )
            }
            className="size-5 shrink-0 accent-spruce"
          />
          <span className="min-w-0">
            {option.label}
            {option.detail && <span className="block text-13 break-all text-pencil">{option.detail}</span>}
          </span>
        </label>
      ))}
      <FieldError errors={errors} />
    </fieldset>
  );
}
