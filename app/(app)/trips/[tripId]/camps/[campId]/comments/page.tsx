import { CommentThreadView } from "@/components/comments/comment-thread";
import { PageBody } from "@/components/trip/page-body";
import { LinkButton } from "@/components/ui/button";
import { PageHeading } from "@/components/ui/layout";
import { orNotFound } from "@/lib/http/or-not-found";
import { getCamp } from "@/lib/services/camps/get-camp";
import { listComments } from "@/lib/services/comments/list-comments";
import { loadTrip } from "../../../_lib/load-trip";
import { createCommentAction, deleteCommentAction } from "../../../comments/actions";

interface CommentsPageProps {
  readonly params: Promise<{ tripId: string; campId: string }>;
}

export const metadata = { title: "Comments" };

export default async function CampCommentsPage({ params }: CommentsPageProps) {
  const { campId } = await params;
  const { ctx, trip } = await loadTrip(params, "comment.read");
  const camp = await orNotFound(getCamp({ ctx, input: { tripId: trip.id, campId } }));
  const subject = { about: "camp", campId } as const;
  const thread = await listComments({ ctx, input: { tripId: trip.id, subject } });
  return (
    <PageBody>
      <PageHeading title={`Comments on ${camp.details.name}`} lead="Between leader and co-leader.">
        <LinkButton href={`/trips/${trip.id}/history?camp=${campId}`} look="quiet">
          Who changed what here
        </LinkButton>
      </PageHeading>
      <CommentThreadView
        thread={thread}
        tripId={trip.id}
        subject={subject}
        timeZone={trip.timeZone}
        actions={{ create: createCommentAction, remove: deleteCommentAction }}
      />
    </PageBody>
  );
}
