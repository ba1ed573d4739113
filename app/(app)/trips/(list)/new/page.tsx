import { TripForm } from "@/components/forms/trip-form";
import { PageHeading } from "@/components/ui/layout";
import { TIME_ZONES } from "@/lib/domain/trip/schema";
import { createTripAction } from "../../actions";

export const metadata = { title: "New trip" };

export default function NewTripPage() {
  return (
    <>
      <PageHeading title="New trip" lead="Camps, shelters, kit and people come next. You lead it." />
      <TripForm action={createTripAction} zones={TIME_ZONES} />
    </>
  );
}
