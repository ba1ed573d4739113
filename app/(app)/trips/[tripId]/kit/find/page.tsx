import { ConfirmButton } from "@/components/ui/confirm-button";
import { KitFound } from "@/components/kit/find/kit-found";
import { KitSearchForm } from "@/components/kit/find/kit-search-form";
import { KitShort } from "@/components/kit/find/kit-short";
import { describeResult } from "@/components/kit/find/kit-words";
import { PageBody } from "@/components/trip/page-body";
import { LinkButton } from "@/components/ui/button";
import { Cautions, PageHeading, Section } from "@/components/ui/layout";
import { formatInstant } from "@/lib/format/days";
import { getKitSearch } from "@/lib/services/kit-search/get-kit-search";
import { loadTrip } from "../../_lib/load-trip";
import { acceptKitAction } from "./actions";

export const metadata = { title: "Find a kit" };

export default async function FindKitPage({ params }: { readonly params: Promise<{ tripId: string }> }) {
  const { ctx, trip, preferences } = await loadTrip(params, "kit.edit");
  const view = await getKitSearch({ ctx, input: { tripId: trip.id } });
  const { result } = view;
  const outcome = result?.outcome ?? null;
  const mayTakeOver = outcome?.status === "found" && result?.acceptedAt === null && !result.isStale;
  return (
    <PageBody>
      <PageHeading title={describeResult(result)} lead={result && describeWhen(result, trip.timeZone)}>
        {mayTakeOver && (
          <ConfirmButton
            label="Take this kit over"
            title="Take this kit over"
            confirmLabel="Take it over"
            look="outline"
            action={acceptKitAction}
            values={{ tripId: trip.id }}
          >
            The counts of the kit and the staking plans of these camps become as found. Pinned anchors stay. Each
            earlier plan stays in its history.
          </ConfirmButton>
        )}
        <LinkButton href={`/trips/${trip.id}/kit`} look="quiet">
          Back to the kit
        </LinkButton>
      </PageHeading>
      {result?.isStale && (
        <p className="mb-6 max-w-[46rem] border-l-4 border-ochre bg-ochre-wash px-4 py-3 text-15">
          Camps, shelters, anchors or plans changed since. This kit may no longer hold: search again.
        </p>
      )}
      {outcome?.status === "found" && (
        <KitFound kit={outcome} tripId={trip.id} speedUnit={preferences.speedUnit} leftOut={result?.leftOut ?? []} />
      )}
      {outcome?.status === "short" && (
        <KitShort camps={outcome.camps} tripId={trip.id} speedUnit={preferences.speedUnit} />
      )}
      <Section
        title={result ? "Search again" : "What it is made of"}
        lead="The lightest kit with which every camp holds in its gust after its windy night. The kit and the plans stay as they are until you take a result over."
      >
        <KitSearchForm tripId={trip.id} view={view} />
      </Section>
      <Cautions />
    </PageBody>
  );
}

function describeWhen(
  { foundByName, foundAt, acceptedAt }: { foundByName: string; foundAt: string; acceptedAt: string | null },
  timeZone: string,
): string {
  const found = `Found by ${foundByName}, ${formatInstant(new Date(foundAt), timeZone)}.`;
  return acceptedAt ? `${found} Taken over ${formatInstant(new Date(acceptedAt), timeZone)}.` : found;
}
