import { AnswerForm } from "@/components/answers/answer-form";
import { describeOwnAnswer } from "@/components/answers/answer-words";
import { PageBody } from "@/components/trip/page-body";
import { PageHeading, Section } from "@/components/ui/layout";
import { getOwnAnswer } from "@/lib/services/answers/get-own-answer";
import { loadTrip } from "../_lib/load-trip";
import { saveAnswerAction } from "./actions";

export const metadata = { title: "About me" };

export default async function DetailsPage({ params }: { readonly params: Promise<{ tripId: string }> }) {
  const { ctx, trip } = await loadTrip(params, "details.own");
  const own = await getOwnAnswer({ ctx, input: { tripId: trip.id } });
  return (
    <PageBody>
      <PageHeading title="About you" lead={describeOwnAnswer(own)} />
      {!own.isCalledOff && (
        <Section title="Your answer">
          <AnswerForm action={saveAnswerAction} hidden={{ tripId: trip.id }} own={own} />
        </Section>
      )}
    </PageBody>
  );
}
