"use client";

import { useRouter } from "next/navigation";
import { useEffect } from "react";
import { ActionForm, SubmitButton, type FormAction } from "@/components/ui/action-form";
import type { MessageView } from "@/lib/domain/views";
import { formatInstant } from "@/lib/format/days";
import { plural } from "@/lib/format/words";

const STATE_WORDS: Readonly<Record<MessageView["state"], string>> = {
  waiting: "waiting",
  sending: "being sent",
  sent: "sent",
  failed: "not sent",
};
const TONES: Readonly<Record<MessageView["state"], string>> = {
  waiting: "text-ember",
  sending: "text-tarn",
  sent: "text-ink",
  failed: "text-rowan",
};
const EVERY_MS = 4000;

/** Each message and its fate; looks again by itself while one is on its way. */
export function MessageList({
  tripId,
  timeZone,
  messages,
  retry,
}: {
  readonly tripId: string;
  readonly timeZone: string;
  readonly messages: readonly MessageView[];
  readonly retry: FormAction<null>;
}) {
  const router = useRouter();
  const isMoving = messages.some((message) => message.state === "waiting" || message.state === "sending");
  useEffect(() => {
    if (!isMoving) return;
    const timer = setInterval(() => {
      if (document.visibilityState === "visible") router.refresh();
    }, EVERY_MS);
    return () => clearInterval(timer);
  }, [isMoving, router]);
  return (
    <ul aria-label="Messages">
      {messages.map((message) => (
        <li
          key={message.id}
          className="grid gap-x-6 gap-y-2 border-t border-hair py-3.5 sm:grid-cols-[minmax(0,1fr)_minmax(0,1.2fr)_13rem]"
        >
          <div className="min-w-0">
            <p className="text-15 font-bold">{message.toName}</p>
            <p className="text-13 break-all text-pencil">{message.toAddress}</p>
          </div>
          <div className="min-w-0">
            <p className="text-15">{message.subject}</p>
            <p className="text-13 break-words text-pencil">{message.files.join(", ") || "nothing attached"}</p>
          </div>
          <div className="text-15">
            <p className={`flex items-center gap-2 font-semibold ${TONES[message.state]}`}>
              <MessageMark state={message.state} />
              {STATE_WORDS[message.state]}
              {message.sentAt && (
                <span className="font-normal text-pencil">{formatInstant(message.sentAt, timeZone)}</span>
              )}
            </p>
            {message.readAt && (
              <p className="text-13 text-pencil">says they have read it, {formatInstant(message.readAt, timeZone)}</p>
            )}
            {message.state !== "sent" && message.attempts > 0 && (
              <p className="text-13 text-pencil">
                {plural(message.attempts, "attempt")}
                {message.nextAttemptAt && `, next ${formatInstant(message.nextAttemptAt, timeZone)}`}
              </p>
            )}
            {message.lastError && message.state !== "sent" && (
              <p className="text-13 break-words text-rowan">{message.lastError}</p>
            )}
            {(message.state === "failed" || (message.state === "waiting" && message.attempts > 0)) && (
              <ActionForm action={retry} doneText={null}>
                <input type="hidden" name="tripId" value={tripId} />
                <input type="hidden" name="messageId" value={message.id} />
                <SubmitButton look="quiet">
                  Try again <span className="sr-only">to send to {message.toName}</span>
                </SubmitButton>
              </ActionForm>
            )}
          </div>
        </li>
      ))}
    </ul>
  );
}

/** Drawn, so that the state does not rest on colour: ring, half, disc, barred ring. */
function MessageMark({ state }: { readonly state: MessageView["state"] }) {
  return (
    <svg
      width="16"
      height="16"
      viewBox="0 0 16 16"
      aria-hidden="true"
      fill="none"
      stroke="currentColor"
      strokeWidth="1.6"
    >
      <circle
        cx="8"
        cy="8"
        r="5.5"
        fill={state === "sent" ? "currentColor" : "none"}
        strokeDasharray={state === "waiting" ? "2.5 2" : undefined}
      />
      {state === "sending" && <path d="M8 2.5a5.5 5.5 0 0 1 0 11z" fill="currentColor" />}
      {state === "failed" && <path d="M1 8h14" strokeWidth="2" />}
    </svg>
  );
}
