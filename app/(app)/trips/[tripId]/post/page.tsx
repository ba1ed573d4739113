import { MessageList } from "@/components/papers/message-list";
import { PageBody } from "@/components/trip/page-body";
import { LinkButton } from "@/components/ui/button";
import { EmptyState, PageHeading } from "@/components/ui/layout";
import type { MessageView } from "@/lib/domain/views";
import { plural } from "@/lib/format/words";
import { listMessages } from "@/lib/services/post/list-messages";
import { loadTrip } from "../_lib/load-trip";
import { retryMessageAction } from "./actions";

export const metadata = { title: "Post" };

export default async function PostPage({ params }: { readonly params: Promise<{ tripId: string }> }) {
  const { ctx, trip, can } = await loadTrip(params, "post.read");
  const messages = await listMessages({ ctx, input: { tripId: trip.id } });
  if (messages.length === 0) {
    return (
      <PageBody>
        <PageHeading title="Post" />
        <EmptyState title="Nothing has been sent yet">
          <p>Invitations and cards that you send stand here with their state, one line for each recipient.</p>
          {can("post.send") && (
            <LinkButton href={`/trips/${trip.id}/papers#send`} look="primary">
              Preview and send
            </LinkButton>
          )}
        </EmptyState>
      </PageBody>
    );
  }
  return (
    <PageBody>
      <PageHeading
        title={describePost(messages)}
        lead="Nothing is lost while the mail server is away: it is tried again."
      />
      <MessageList tripId={trip.id} timeZone={trip.timeZone} messages={messages} retry={retryMessageAction} />
    </PageBody>
  );
}

function describePost(messages: readonly MessageView[]): string {
  const count = (state: MessageView["state"]) => messages.filter((message) => message.state === state).length;
  const failed = count("failed");
  const open = count("waiting") + count("sending");
  if (failed > 0) return `${plural(failed, "message was", "messages were")} not sent`;
  if (open > 0) return `${plural(open, "message is", "messages are")} on the way`;
  return messages.length === 1 ? "The message is sent" : `All ${messages.length} messages are sent`;
}
