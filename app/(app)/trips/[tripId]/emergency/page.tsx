import { EmergencyForm } from "@/components/emergency/emergency-form";
import { EmergencySummary } from "@/components/emergency/emergency-summary";
import { PageBody } from "@/components/trip/page-body";
import { ActionForm, SubmitButton } from "@/components/ui/action-form";
import { LinkButton } from "@/components/ui/button";
import { Cautions, PageHeading, Section } from "@/components/ui/layout";
import { newId } from "@/lib/domain/new-id";
import type { EmergencyPlanView } from "@/lib/domain/people-views";
import { formatDay, formatInstant } from "@/lib/format/days";
import { joinWords } from "@/lib/format/words";
import { getEmergencyPlan } from "@/lib/services/emergency/get-emergency-plan";
import { loadTrip } from "../_lib/load-trip";
import { saveEmergencyPlanAction, sendEmergencyPlanAction, tellBackSafelyAction } from "./actions";

export const metadata = { title: "Emergency plan" };

export default async function EmergencyPage({ params }: { readonly params: Promise<{ tripId: string }> }) {
  const { ctx, trip, can } = await loadTrip(params, "contacts.read");
  const plan = await getEmergencyPlan({ ctx, input: { tripId: trip.id } });
  const mayEdit = can("emergency.edit");
  return (
    <PageBody>
      <PageHeading title={describePlan(plan)} lead={describeSent(plan, trip.timeZone)}>
        {mayEdit && plan.missing.length === 0 && plan.sentVersion !== plan.version && (
          <ActionForm action={sendEmergencyPlanAction}>
            <input type="hidden" name="tripId" value={trip.id} />
            <input type="hidden" name="requestId" value={newId()} />
            <SubmitButton>Send to {plan.outsideName}</SubmitButton>
          </ActionForm>
        )}
        {mayEdit && plan.sentVersion !== null && plan.backAt === null && (
          <ActionForm action={tellBackSafelyAction}>
            <input type="hidden" name="tripId" value={trip.id} />
            <input type="hidden" name="requestId" value={newId()} />
            <SubmitButton look="outline">We are all back</SubmitButton>
          </ActionForm>
        )}
        <LinkButton href={`/trips/${trip.id}/people/contacts`}>Contact sheet</LinkButton>
      </PageHeading>
      <div className="mb-10">
        <EmergencySummary plan={plan} />
      </div>
      {mayEdit && (
        <Section title="Change the plan" lead="This program calls nobody by itself: the contact outside does.">
          <EmergencyForm key={plan.version} action={saveEmergencyPlanAction} tripId={trip.id} plan={plan} />
        </Section>
      )}
      <Cautions />
    </PageBody>
  );
}

function describePlan(plan: EmergencyPlanView): string {
  if (plan.backAt) return "Everybody is back";
  if (plan.dueBackDay === "") return "Nobody knows yet when you are due back";
  return `Due back ${formatDay(plan.dueBackDay)}, ${plan.dueBackTime}`;
}

function describeSent(plan: EmergencyPlanView, timeZone: string): string {
  if (plan.backAt) return `${plan.outsideName} was told on ${formatInstant(plan.backAt, timeZone)}.`;
  if (plan.missing.length > 0) return `Before it can be sent, the plan needs ${joinWords(plan.missing)}.`;
  if (plan.sentVersion === null) return `Version ${plan.version}, sent to nobody yet.`;
  const sent = plan.sentAt ? ` on ${formatInstant(plan.sentAt, timeZone)}` : "";
  return plan.sentVersion === plan.version
    ? `${plan.outsideName} was sent version ${plan.version}${sent}.`
    : `${plan.outsideName} was sent version ${plan.sentVersion}${sent}; it is now version ${plan.version}.`;
}
