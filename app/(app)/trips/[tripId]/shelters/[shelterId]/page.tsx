import { notFound } from "next/navigation";
import { CommentThreadView } from "@/components/comments/comment-thread";
import { ShelterForm } from "@/components/shelters/shelter-form";
import { PageBody } from "@/components/trip/page-body";
import { LinkButton } from "@/components/ui/button";
import { PageHeading, Section } from "@/components/ui/layout";
import { joinWords } from "@/lib/format/words";
import { listComments } from "@/lib/services/comments/list-comments";
import { listShelters } from "@/lib/services/shelters/list-shelters";
import { loadTrip } from "../../_lib/load-trip";
import { createCommentAction, deleteCommentAction } from "../../comments/actions";
import { updateShelterAction } from "../actions";

interface ShelterPageProps {
  readonly params: Promise<{ tripId: string; shelterId: string }>;
}

export const metadata = { title: "Shelter" };

export default async function ShelterPage({ params }: ShelterPageProps) {
  const { shelterId } = await params;
  const { ctx, trip, preferences } = await loadTrip(params, "shelter.edit");
  const shelter = (await listShelters({ ctx, input: { tripId: trip.id } })).find((one) => one.id === shelterId);
  if (!shelter) notFound();
  const subject = { about: "shelter", shelterId: shelter.id } as const;
  const thread = await listComments({ ctx, input: { tripId: trip.id, subject } });
  const here = `/trips/${trip.id}/shelters`;
  return (
    <PageBody>
      <PageHeading
        title={shelter.details.name}
        lead={
          shelter.campNames.length === 0
            ? "Pitched nowhere yet."
            : `Pitched at ${joinWords(shelter.campNames)}: a change here changes the verdict there.`
        }
      >
        <LinkButton href={here} look="quiet">
          All shelters
        </LinkButton>
      </PageHeading>
      <ShelterForm
        key={shelter.id}
        action={updateShelterAction}
        details={shelter.details}
        values={{ tripId: trip.id, shelterId: shelter.id, "version:number": String(shelter.version) }}
        lengthUnit={preferences.lengthUnit}
        saveLabel="Save the shelter"
        conflictHref={`${here}/${shelter.id}`}
      />
      <div className="mt-12">
        <Section title="Comments">
          <CommentThreadView
            thread={thread}
            tripId={trip.id}
            subject={subject}
            timeZone={trip.timeZone}
            actions={{ create: createCommentAction, remove: deleteCommentAction }}
          />
        </Section>
      </div>
    </PageBody>
  );
}
