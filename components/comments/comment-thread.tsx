import { ConfirmButton } from "@/components/ui/confirm-button";
import type { FormAction } from "@/components/ui/action-form";
import type { CommentSubject } from "@/lib/domain/comment/schema";
import type { CommentThread } from "@/lib/domain/comment/views";
import { formatInstant } from "@/lib/format/days";
import { joinWords } from "@/lib/format/words";
import { CommentForm } from "./comment-form";

/** What leader and co-leader said about a camp or a shelter, and the place to say more. */
export function CommentThreadView({
  thread,
  tripId,
  subject,
  timeZone,
  actions,
}: {
  readonly thread: CommentThread;
  readonly tripId: string;
  readonly subject: CommentSubject;
  readonly timeZone: string;
  readonly actions: { readonly create: FormAction<null>; readonly remove: FormAction<null> };
}) {
  return (
    <div className="max-w-[46rem]">
      {thread.comments.length === 0 && (
        <p className="mb-4 text-15 text-pencil">
          Nothing said yet. Leader and co-leader read this; participants do not.
        </p>
      )}
      <ol aria-label="Comments">
        {thread.comments.map((comment) => (
          <li key={comment.id} className="border-t border-hair py-4 first:border-t-0">
            <div className="flex flex-wrap items-baseline justify-between gap-x-4">
              <p className="text-15 font-semibold">
                {comment.byName}
                <span className="font-normal text-pencil"> · {formatInstant(comment.at, timeZone)}</span>
              </p>
              {comment.isDeletable && (
                <ConfirmButton
                  label="Delete"
                  title="Delete this comment"
                  confirmLabel="Delete it"
                  action={actions.remove}
                  values={{ tripId, commentId: comment.id }}
                  look="quiet"
                >
                  <p>It goes for everybody. A mail that it caused has gone out already.</p>
                </ConfirmButton>
              )}
            </div>
            <p className="text-15 whitespace-pre-wrap">{comment.body}</p>
            {comment.mentionNames.length > 0 && (
              <p className="text-13 text-pencil">mailed to {joinWords(comment.mentionNames)}</p>
            )}
          </li>
        ))}
      </ol>
      <CommentForm action={actions.create} tripId={tripId} subject={subject} people={thread.people} />
    </div>
  );
}
