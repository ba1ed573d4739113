"use client";

import { useRef, useState } from "react";
import { useRouter } from "next/navigation";
import { ActionForm, SubmitButton, type FormAction } from "@/components/ui/action-form";
import { Button } from "@/components/ui/button";
import { TextArea } from "@/components/ui/fields";
import { MAX_COMMENT, type CommentSubject } from "@/lib/domain/comment/schema";
import { newId } from "@/lib/domain/new-id";

/** A new comment; a button per person puts "@name" into it, which mails them. */
export function CommentForm({
  action,
  tripId,
  subject,
  people,
}: {
  readonly action: FormAction<null>;
  readonly tripId: string;
  readonly subject: CommentSubject;
  readonly people: readonly { readonly id: string; readonly name: string }[];
}) {
  const router = useRouter();
  const [body, setBody] = useState("");
  // Made when the first sending needs it. No state: drawing the form anew would empty the hidden field before it is read.
  const commentId = useRef("");
  const field = useRef<HTMLTextAreaElement>(null);
  function mention(name: string) {
    const at = field.current?.selectionStart ?? body.length;
    const before = body.slice(0, at);
    const gap = before === "" || /\s$/.test(before) ? "" : " ";
    setBody(`${before}${gap}@${name} ${body.slice(at)}`);
    field.current?.focus();
  }
  return (
    <ActionForm
      action={action}
      className="mt-6 border-t border-hair pt-4"
      onSubmitCapture={(event) => {
        commentId.current ||= newId();
        const hidden = event.currentTarget.elements.namedItem("commentId");
        if (hidden instanceof HTMLInputElement) hidden.value = commentId.current;
      }}
      onDone={() => {
        setBody("");
        commentId.current = "";
        router.refresh();
      }}
    >
      <input type="hidden" name="tripId" value={tripId} />
      <input type="hidden" name="subject:json" value={JSON.stringify(subject)} />
      <input type="hidden" name="commentId" defaultValue="" />
      <TextArea
        name="body"
        label="Comment"
        ref={field}
        value={body}
        maxLength={MAX_COMMENT}
        onChange={(event) => setBody(event.target.value)}
        hint={people.length > 0 ? "Call somebody by @name and they get it by e-mail." : undefined}
      />
      <div className="mt-3 flex flex-wrap items-center gap-2">
        {people.map((person) => (
          <Button key={person.id} look="quiet" onClick={() => mention(person.name)}>
            @{person.name}
          </Button>
        ))}
        <SubmitButton>Write the comment</SubmitButton>
      </div>
    </ActionForm>
  );
}
