import Link from "next/link";
import { CarryForm } from "@/components/pack/carry-form";
import { OneButtonForm } from "@/components/forms/one-button-form";
import { PackListEditor } from "@/components/pack/pack-list-editor";
import { PageBody } from "@/components/trip/page-body";
import { LinkButton } from "@/components/ui/button";
import { PageHeading, Section } from "@/components/ui/layout";
import type { CarryPlanView } from "@/lib/domain/views";
import { getCarryPlan } from "@/lib/services/pack/get-carry-plan";
import { listPackItems } from "@/lib/services/pack/list-pack-items";
import { loadTrip } from "../../_lib/load-trip";
import { assignCarryAction, savePackItemsAction, shareOutEvenlyAction } from "./actions";

interface PackingPageProps {
  readonly params: Promise<{ tripId: string }>;
  readonly searchParams: Promise<{ person?: string }>;
}

export const metadata = { title: "Bring and carry" };

export default async function PackingPage({ params, searchParams }: PackingPageProps) {
  const { ctx, trip } = await loadTrip(params, "pack.edit");
  const input = { tripId: trip.id };
  const [carry, items] = await Promise.all([getCarryPlan({ ctx, input }), listPackItems({ ctx, input })]);
  const wanted = (await searchParams).person;
  const chosen = carry.people.find((person) => person.id === wanted) ?? null;
  const here = `/trips/${trip.id}/people/packing`;
  const own = items.filter((item) => item.personId === (chosen?.id ?? null));
  return (
    <PageBody>
      <PageHeading
        title={describeLoads(carry)}
        lead="What everybody brings, what one person brings, and who carries what."
      >
        <LinkButton href={`/trips/${trip.id}/people`} look="quiet">
          Back to people
        </LinkButton>
      </PageHeading>
      <Section
        title="Who carries the group's gear"
        actions={
          <OneButtonForm action={shareOutEvenlyAction} values={{ tripId: trip.id }} look="outline">
            Share out evenly
          </OneButtonForm>
        }
      >
        <CarryForm action={assignCarryAction} tripId={trip.id} plan={carry} />
      </Section>
      <Section title="Pack lists">
        <nav aria-label="Whose list" className="mb-5">
          <ul className="flex flex-wrap gap-x-5">
            {[{ id: null, name: "Everybody" }, ...carry.people].map((person) => (
              <li key={person.id ?? "all"}>
                <Link
                  href={person.id === null ? here : `${here}?person=${person.id}`}
                  scroll={false}
                  aria-current={person.id === (chosen?.id ?? null) ? "true" : undefined}
                  className="inline-flex min-h-11 items-center border-b-2 border-transparent text-15 text-spruce aria-[current]:border-ink aria-[current]:font-bold aria-[current]:text-ink"
                >
                  {person.name}
                </Link>
              </li>
            ))}
          </ul>
        </nav>
        <p className="mb-3 text-15 text-pencil">
          {chosen ? `Only ${chosen.name} brings these, on top of what everybody brings.` : "Everybody brings these."}
        </p>
        <div className="max-w-[52rem]">
          <PackListEditor
            key={chosen?.id ?? "all"}
            action={savePackItemsAction}
            tripId={trip.id}
            personId={chosen?.id ?? null}
            items={own}
          />
        </div>
      </Section>
    </PageBody>
  );
}

function describeLoads({ shelters, kitItems }: CarryPlanView): string {
  const left =
    shelters.filter((shelter) => shelter.carrierId === null).length +
    kitItems.reduce((sum, item) => sum + Math.max(0, item.leftCount), 0);
  if (shelters.length + kitItems.length === 0) return "Nothing to carry for the group yet";
  return left === 0
    ? "Everything is carried by somebody"
    : `${left} ${left === 1 ? "piece is" : "pieces are"} carried by nobody`;
}
