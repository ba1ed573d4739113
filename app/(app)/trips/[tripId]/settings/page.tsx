import { CopyTripForm, DeleteTripForm, TripSettingsForm } from "@/components/forms/trip-settings-form";
import { PageBody } from "@/components/trip/page-body";
import { PageHeading, Section } from "@/components/ui/layout";
import { TIME_ZONES } from "@/lib/domain/trip/schema";
import { copyTripAction } from "../../actions";
import { loadTrip } from "../_lib/load-trip";
import { deleteTripAction, updateTripAction } from "./actions";

export const metadata = { title: "Settings" };

export default async function SettingsPage({ params }: { readonly params: Promise<{ tripId: string }> }) {
  const { trip, can } = await loadTrip(params, "trip.edit");
  return (
    <PageBody>
      <PageHeading title="Settings" lead="Name, dates, time zone, and the contacts on every card." />
      <TripSettingsForm action={updateTripAction} trip={trip} zones={TIME_ZONES} />
      <div className="mt-12">
        <Section
          title="Copy this trip"
          lead="Camps, shelters, kit and plans come along; the copy is a trip of its own."
        >
          <CopyTripForm action={copyTripAction} trip={trip} />
        </Section>
        {can("trip.delete") && (
          <Section title="Delete this trip">
            <DeleteTripForm action={deleteTripAction} trip={trip} />
          </Section>
        )}
      </div>
    </PageBody>
  );
}
