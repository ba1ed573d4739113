import { PageBody } from "@/components/trip/page-body";
import { ActionForm, SubmitButton } from "@/components/ui/action-form";
import { buttonClass } from "@/components/ui/button";
import { EmptyState, PageHeading } from "@/components/ui/layout";
import { formatInstant } from "@/lib/format/days";
import { plural } from "@/lib/format/words";
import { listOwnMessages } from "@/lib/services/post/own-messages";
import { loadTrip } from "../_lib/load-trip";
import { markMessageReadAction } from "./actions";

export const metadata = { title: "Messages" };

export default async function MessagesPage({ params }: { readonly params: Promise<{ tripId: string }> }) {
  const { ctx, trip } = await loadTrip(params, "answer.own");
  const messages = await listOwnMessages({ ctx, input: { tripId: trip.id } });
  const unread = messages.filter((message) => message.readAt === null).length;
  return (
    <PageBody>
      <PageHeading
        title={unread > 0 ? `${plural(unread, "message")} to read` : "Messages to you"}
        lead="The leader only knows that you have read one when you say so here."
      >
        <a href={`/api/trips/${trip.id}/calendar`} className={buttonClass("outline")}>
          Into my calendar
        </a>
      </PageHeading>
      {messages.length === 0 && (
        <EmptyState title="Nothing yet">
          <p>What the leader sends to you by mail stands here, too.</p>
        </EmptyState>
      )}
      <ul aria-label="Messages to you" className="max-w-[46rem]">
        {messages.map((message) => (
          <li key={message.id} className="border-t border-hair py-5 first:border-t-0">
            <h2 className="text-18 font-bold break-words">{message.subject}</h2>
            <p className="text-13 text-pencil">
              {formatInstant(message.sentAt, trip.timeZone)}
              {message.files.length > 0 && `, with ${message.files.join(", ")}`}
            </p>
            <p className="my-3 text-15 break-words whitespace-pre-wrap">{message.text}</p>
            {message.readAt ? (
              <p className="text-13 text-pencil">You read it: {formatInstant(message.readAt, trip.timeZone)}</p>
            ) : (
              <ActionForm action={markMessageReadAction}>
                <input type="hidden" name="tripId" value={trip.id} />
                <input type="hidden" name="messageId" value={message.id} />
                <SubmitButton look="outline">
                  I have read it <span className="sr-only">: {message.subject}</span>
                </SubmitButton>
              </ActionForm>
            )}
          </li>
        ))}
      </ul>
    </PageBody>
  );
}
