import { CallOffForm } from "@/components/papers/call-off-form";
import { Concerned } from "@/components/papers/concerned";
import { MessageList } from "@/components/papers/message-list";
import { PlannedSends } from "@/components/papers/planned-sends";
import { PageBody } from "@/components/trip/page-body";
import { LinkButton } from "@/components/ui/button";
import { ConfirmButton } from "@/components/ui/confirm-button";
import { EmptyState, PageHeading, Section } from "@/components/ui/layout";
import { newId } from "@/lib/domain/new-id";
import type { MessageView } from "@/lib/domain/views";
import { plural } from "@/lib/format/words";
import { getOwnAnswer } from "@/lib/services/answers/get-own-answer";
import { listPlannedSends } from "@/lib/services/planned-sends/list-planned-sends";
import { listConcerned } from "@/lib/services/post/list-concerned";
import { listMessages } from "@/lib/services/post/list-messages";
import { listTemplates } from "@/lib/services/templates/list-templates";
import { loadTrip } from "../_lib/load-trip";
import { sendPapersAction } from "../papers/actions";
import { callOffTripAction, cancelPlannedSendAction, deleteTemplateAction, retryMessageAction } from "./actions";

export const metadata = { title: "Post" };

export default async function PostPage({ params }: { readonly params: Promise<{ tripId: string }> }) {
  const { ctx, trip, preferences } = await loadTrip(params, "post.read");
  const input = { tripId: trip.id };
  const [messages, planned, templates, own, concerned] = await Promise.all([
    listMessages({ ctx, input }),
    listPlannedSends({ ctx, input }),
    listTemplates({ ctx, input }),
    getOwnAnswer({ ctx, input }),
    listConcerned({ ctx, input }),
  ]);
  const ownTemplates = templates.filter((one) => one.id !== null);
  return (
    <PageBody>
      <PageHeading
        title={own.isCalledOff ? "The trip is called off" : describePost(messages)}
        lead="Nothing is lost while the mail server is away: it is tried again. Nothing follows who opens a mail."
      >
        <LinkButton href={`/trips/${trip.id}/papers#send`} look="primary">
          Write and send
        </LinkButton>
      </PageHeading>
      {concerned.people.length > 0 && (
        <Section title="Have old pages" lead="Their pages were sent, and something on them is different by now.">
          <Concerned
            concerned={concerned}
            action={sendPapersAction}
            tripId={trip.id}
            tripName={trip.name}
            requestId={newId()}
            paperSize={preferences.paperSize}
          />
        </Section>
      )}
      {planned.length > 0 && (
        <Section title="For later">
          <PlannedSends tripId={trip.id} timeZone={trip.timeZone} planned={planned} cancel={cancelPlannedSendAction} />
        </Section>
      )}
      <Section title="Messages">
        {messages.length === 0 ? (
          <EmptyState title="Nothing has been sent yet">
            <p>Invitations and cards that you send stand here with their state, one line for each recipient.</p>
          </EmptyState>
        ) : (
          <MessageList tripId={trip.id} timeZone={trip.timeZone} messages={messages} retry={retryMessageAction} />
        )}
      </Section>
      {ownTemplates.length > 0 && (
        <Section title="Templates of this trip">
          <ul>
            {ownTemplates.map((one) => (
              <li
                key={one.id}
                className="flex flex-wrap items-center justify-between gap-3 border-t border-hair py-2 first:border-t-0"
              >
                <p className="min-w-0 text-15 break-words">
                  <span className="font-semibold">{one.name}</span>
                  <span className="block text-13 text-pencil">{one.subject}</span>
                </p>
                <ConfirmButton
                  look="quiet"
                  label="Delete"
                  title={`Delete “${one.name}”?`}
                  confirmLabel="Delete it"
                  action={deleteTemplateAction}
                  values={{ tripId: trip.id, templateId: one.id ?? "" }}
                >
                  Messages that were sent with it stay.
                </ConfirmButton>
              </li>
            ))}
          </ul>
        </Section>
      )}
      <Section title={own.isCalledOff ? "Back on" : "Call off"}>
        <CallOffForm action={callOffTripAction} tripId={trip.id} requestId={newId()} isCalledOff={own.isCalledOff} />
      </Section>
    </PageBody>
  );
}

function describePost(messages: readonly MessageView[]): string {
  const count = (state: MessageView["state"]) => messages.filter((message) => message.state === state).length;
  const failed = count("failed");
  const open = count("waiting") + count("sending");
  if (messages.length === 0) return "Post";
  if (failed > 0) return `${plural(failed, "message was", "messages were")} not sent`;
  if (open > 0) return `${plural(open, "message is", "messages are")} on the way`;
  return messages.length === 1 ? "The message is sent" : `All ${messages.length} messages are sent`;
}
