import { AnswerForm } from "@/components/answers/answer-form";
import { describeOwnAnswer } from "@/components/answers/answer-words";
import { OwnDetailsForm } from "@/components/details/own-details-form";
import { PageBody } from "@/components/trip/page-body";
import { ConfirmButton } from "@/components/ui/confirm-button";
import { PageHeading, Section } from "@/components/ui/layout";
import type { OwnDetailsView } from "@/lib/domain/people-views";
import { AppError } from "@/lib/errors";
import { formatInstant } from "@/lib/format/days";
import { getOwnAnswer } from "@/lib/services/answers/get-own-answer";
import { getOwnDetails } from "@/lib/services/details/get-own-details";
import { loadTrip } from "../_lib/load-trip";
import { deleteOwnDetailsAction, saveAnswerAction, saveOwnDetailsAction } from "./actions";

export const metadata = { title: "About me" };

/** The rest of the page stays usable when the key is not there. */
async function readDetails(work: Promise<OwnDetailsView>): Promise<OwnDetailsView | string> {
  try {
    return await work;
  } catch (error) {
    if (error instanceof AppError && error.code === "unavailable") return error.userMessage;
    throw error;
  }
}

export default async function DetailsPage({ params }: { readonly params: Promise<{ tripId: string }> }) {
  const { ctx, trip } = await loadTrip(params, "details.own");
  const input = { tripId: trip.id };
  const answer = await getOwnAnswer({ ctx, input });
  const own = await readDetails(getOwnDetails({ ctx, input }));
  return (
    <PageBody>
      <PageHeading title="About you" lead={describeOwnAnswer(answer)} />
      {!answer.isCalledOff && (
        <Section title="Your answer">
          <AnswerForm action={saveAnswerAction} hidden={input} own={answer} />
        </Section>
      )}
      <Section
        title="Contact and health"
        lead="You write it, the leader and the co-leaders read it, nobody else. It stands in no mail and on nobody else's page."
      >
        {typeof own === "string" ? (
          <p className="text-15 text-rowan">{own}</p>
        ) : (
          <>
            <OwnDetailsForm key={own.version} action={saveOwnDetailsAction} tripId={trip.id} own={own} />
            {own.consent && (
              <div className="mt-8 flex flex-wrap items-center justify-between gap-4 border-t border-hair pt-4">
                <p className="text-15 text-pencil">Agreed to on {formatInstant(own.consent.at, trip.timeZone)}.</p>
                <ConfirmButton
                  label="Delete what I wrote"
                  title="Delete your contact and health notes?"
                  confirmLabel="Delete them"
                  action={deleteOwnDetailsAction}
                  values={input}
                >
                  They are gone at once and for good. The leader then has no number to call for you.
                </ConfirmButton>
              </div>
            )}
          </>
        )}
      </Section>
    </PageBody>
  );
}
