import { Suspense } from "react";
import { OwnPagesStates } from "@/components/own-pages/own-pages-states";
import { PaperList } from "@/components/papers/paper-list";
import { SendForm } from "@/components/papers/send-form";
import { WhoHasWhat } from "@/components/papers/who-has-what";
import { PageBody, PageSkeleton } from "@/components/trip/page-body";
import { LinkButton } from "@/components/ui/button";
import { Cautions, PageHeading, Section } from "@/components/ui/layout";
import { newId } from "@/lib/domain/new-id";
import { isAllowed, ROLE_NAMES } from "@/lib/domain/permissions/permissions";
import { PIECES } from "@/lib/domain/post/schema";
import type { Preferences } from "@/lib/domain/preferences";
import type { TripView } from "@/lib/domain/views";
import { renderPapersMail } from "@/lib/email/templates/trip-mails";
import { formatDayRange, formatDayShort } from "@/lib/format/days";
import type { Context } from "@/lib/services/context/context";
import { listAlternatives } from "@/lib/services/camps/list-alternatives";
import { listCampSummaries } from "@/lib/services/camps/list-camp-summaries";
import { listOwnPagesStates } from "@/lib/services/own-pages/list-own-pages-states";
import { listPeople } from "@/lib/services/people/list-people";
import { listMessages } from "@/lib/services/post/list-messages";
import { listTemplates } from "@/lib/services/templates/list-templates";
import { getSleepingPlan } from "@/lib/services/sleepers/get-sleeping-plan";
import { loadTrip } from "../_lib/load-trip";
import { sendPapersAction } from "./actions";

export const metadata = { title: "Cards" };

export default async function PapersPage({ params }: { readonly params: Promise<{ tripId: string }> }) {
  const { ctx, trip, preferences } = await loadTrip(params, "paper.all");
  return (
    <PageBody>
      <Suspense fallback={<PageSkeleton />}>
        <Papers ctx={ctx} trip={trip} preferences={preferences} />
      </Suspense>
    </PageBody>
  );
}

async function Papers({ ctx, trip, preferences }: { ctx: Context; trip: TripView; preferences: Preferences }) {
  const input = { tripId: trip.id };
  const maySend = isAllowed(trip.role, "post.send");
  const [camps, people, states, messages] = await Promise.all([
    listCampSummaries({ ctx, input }),
    listPeople({ ctx, input }),
    listOwnPagesStates({ ctx, input }),
    isAllowed(trip.role, "post.read") ? listMessages({ ctx, input }) : [],
  ]);
  const alternatives = await listAlternatives({ ctx, input });
  const templates = maySend ? await listTemplates({ ctx, input }) : [];
  const sleeping = await Promise.all(
    camps.map((camp) => getSleepingPlan({ ctx, input: { tripId: trip.id, campId: camp.id } })),
  );
  return (
    <>
      <PageHeading
        title={`Cards and lists, version ${trip.paperVersion}`}
        lead="A change after cards have gone out makes a new version. Look at a piece before you send it."
      >
        {maySend && <LinkButton href="#send">Preview and send</LinkButton>}
      </PageHeading>
      <Section title="Look and print">
        <PaperList
          tripId={trip.id}
          initialSize={preferences.paperSize}
          camps={[
            ...camps.map((camp, index) => ({
              id: camp.id,
              name: camp.name,
              days: camp.days.map(formatDayShort).join(", "),
              pitches: (sleeping[index]?.pitches ?? []).map(({ id, name }) => ({ id, name })),
            })),
            ...alternatives.map(({ id, name, alternativeTo, pitches }) => ({
              id,
              name,
              days: `in bad weather, in place of ${alternativeTo.name}`,
              pitches,
            })),
          ]}
          people={people.map(({ id, name }) => ({ id, name }))}
        />
      </Section>
      <Section title="Each person’s copy" lead="What is printed or sent, and whether it still says the right thing.">
        <OwnPagesStates states={states} version={trip.paperVersion} timeZone={trip.timeZone} />
      </Section>
      {maySend && (
        <div id="send" className="scroll-mt-4">
          <Section title="Preview and send">
            <SendForm
              action={sendPapersAction}
              tripId={trip.id}
              initialSubject={`${trip.name}: your cards, version ${trip.paperVersion}`}
              people={people.map(({ id, name, email, role }) => ({ id, name, email, role: ROLE_NAMES[role] }))}
              pieces={PIECES}
              paperSize={preferences.paperSize}
              requestId={newId()}
              previews={{
                both: previewMail(ctx, trip, "[[message]]", ["[[files]]"]),
                messageOnly: previewMail(ctx, trip, "[[message]]", []),
                filesOnly: previewMail(ctx, trip, "", ["[[files]]"]),
              }}
              templates={templates}
              values={{
                trip: trip.name,
                dates: formatDayRange(trip.startDate, trip.endDate),
                leader: ctx.actor.name,
                link: `…/trips/${trip.id}`,
              }}
            />
          </Section>
          <Section
            title="Who has what"
            actions={
              <LinkButton href={`/trips/${trip.id}/post`} look="quiet">
                All messages
              </LinkButton>
            }
          >
            <WhoHasWhat people={people} messages={messages} timeZone={trip.timeZone} />
          </Section>
        </div>
      )}
      <Cautions />
    </>
  );
}

/** The mail as it will go out, with marks where name, message and files come in. */
function previewMail(ctx: Context, trip: TripView, message: string, fileNames: readonly string[]): string {
  return renderPapersMail({
    name: "[[name]]",
    leaderName: ctx.actor.name,
    tripName: trip.name,
    subject: "",
    message,
    fileNames,
    url: `…/trips/${trip.id}`,
  }).text;
}
