import { NewCampForm } from "@/components/trip/camp-forms";
import { PageBody } from "@/components/trip/page-body";
import { PageHeading } from "@/components/ui/layout";
import { loadTrip } from "../../_lib/load-trip";
import { createCampAction } from "../actions";

export const metadata = { title: "New camp" };

export default async function NewCampPage({ params }: { readonly params: Promise<{ tripId: string }> }) {
  const { trip } = await loadTrip(params, "camp.arrange");
  return (
    <PageBody>
      <PageHeading title="New camp" lead="It comes after the last one. Ground and wind are next." />
      <NewCampForm action={createCampAction} tripId={trip.id} />
    </PageBody>
  );
}
