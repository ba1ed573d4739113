import { KitItemForm } from "@/components/kit/kit-item-form";
import { libraryShelter, ShelterLibrary } from "@/components/shelters/library";
import { ShelterForm } from "@/components/shelters/shelter-form";
import { LinkButton } from "@/components/ui/button";
import { PageHeading } from "@/components/ui/layout";
import { requireContext } from "@/lib/auth/session";
import { getPreferences } from "@/lib/services/preferences/get-preferences";
import { createGearAction } from "../actions";

interface NewGearPageProps {
  readonly searchParams: Promise<{ type?: string; kind?: string }>;
}

export const metadata = { title: "Add to own gear" };

export default async function NewGearPage({ searchParams }: NewGearPageProps) {
  const ctx = await requireContext();
  const { type, kind } = await searchParams;
  const back = (
    <LinkButton href="/gear" look="quiet">
      Back to own gear
    </LinkButton>
  );
  if (type === "anchor") {
    return (
      <>
        <PageHeading title="Add an anchor or cord" lead="With its own measurements.">
          {back}
        </PageHeading>
        <KitItemForm
          action={createGearAction}
          details={null}
          values={{ "details.type": "anchor" }}
          path="details.anchor"
          saveLabel="Add to own gear"
        />
      </>
    );
  }
  const details = libraryShelter(kind ?? "");
  if (!details) {
    return (
      <>
        <PageHeading title="Add a shelter" lead="Start from the kind that is nearest; its numbers come next.">
          {back}
        </PageHeading>
        <h2 className="sr-only">Kinds of shelter</h2>
        <ShelterLibrary hrefOf={(kindId) => `/gear/new?type=shelter&kind=${kindId}`} />
      </>
    );
  }
  const preferences = await getPreferences({ ctx });
  return (
    <>
      <PageHeading title={`Add: ${details.name}`} lead="Give it the numbers of yours. The drawing follows.">
        {back}
      </PageHeading>
      <ShelterForm
        action={createGearAction}
        details={details}
        values={{ "details.type": "shelter" }}
        path="details.shelter"
        lengthUnit={preferences.lengthUnit}
        saveLabel="Add to own gear"
      />
    </>
  );
}
