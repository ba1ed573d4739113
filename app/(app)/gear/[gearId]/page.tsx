import { notFound } from "next/navigation";
import { KitItemForm } from "@/components/kit/kit-item-form";
import { ShelterForm } from "@/components/shelters/shelter-form";
import { LinkButton } from "@/components/ui/button";
import { PageHeading } from "@/components/ui/layout";
import { requireContext } from "@/lib/auth/session";
import { listGear } from "@/lib/services/gear/list-gear";
import { getPreferences } from "@/lib/services/preferences/get-preferences";
import { updateGearAction } from "../actions";

export const metadata = { title: "Own gear" };

export default async function GearItemPage({ params }: { readonly params: Promise<{ gearId: string }> }) {
  const ctx = await requireContext();
  const { gearId } = await params;
  const item = (await listGear({ ctx })).find((one) => one.id === gearId);
  if (!item) notFound();
  const { details } = item;
  const shared = {
    action: updateGearAction,
    values: { gearId, "version:number": String(item.version), "details.type": details.type },
    saveLabel: "Save",
    conflictHref: `/gear/${gearId}`,
  };
  return (
    <>
      <PageHeading
        title={details.type === "shelter" ? details.shelter.name : details.anchor.name}
        lead="A change here leaves the copies on trips as they are."
      >
        <LinkButton href="/gear" look="quiet">
          All own gear
        </LinkButton>
      </PageHeading>
      {details.type === "shelter" ? (
        <ShelterForm
          {...shared}
          details={details.shelter}
          path="details.shelter"
          lengthUnit={(await getPreferences({ ctx })).lengthUnit}
        />
      ) : (
        <KitItemForm {...shared} details={details.anchor} path="details.anchor" />
      )}
    </>
  );
}
