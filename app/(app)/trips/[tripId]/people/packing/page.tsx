import Link from "next/link";
import { LimitForm } from "@/components/pack/limit-form";
import { LoadBoard } from "@/components/pack/load-board";
import { totalsOf } from "@/components/pack/load-state";
import { OneButtonForm } from "@/components/forms/one-button-form";
import { SplitForm } from "@/components/pack/split-form";
import { ThingsEditor } from "@/components/pack/things-editor";
import { PackListEditor } from "@/components/pack/pack-list-editor";
import { PageBody } from "@/components/trip/page-body";
import { LinkButton } from "@/components/ui/button";
import { PageHeading, Section } from "@/components/ui/layout";
import type { LoadPlanView } from "@/lib/domain/pack/load-view";
import { SEASON_NAMES, SEASONS } from "@/lib/domain/pack/seasons";
import { formatMass } from "@/lib/format/masses";
import { formatFixed, withUnit } from "@/lib/format/numbers";
import { joinWords, startSentence } from "@/lib/format/words";
import { getLoadPlan } from "@/lib/services/pack/get-load-plan";
import { listPackItems } from "@/lib/services/pack/list-pack-items";
import { loadTrip } from "../../_lib/load-trip";
import {
  addSeasonItemsAction,
  assignCarryAction,
  saveGroupThingsAction,
  saveLimitAction,
  savePackItemsAction,
  saveShelterSplitAction,
  shareOutEvenlyAction,
} from "./actions";

interface PackingPageProps {
  readonly params: Promise<{ tripId: string }>;
  readonly searchParams: Promise<{ person?: string }>;
}

export const metadata = { title: "Bring and carry" };

export default async function PackingPage({ params, searchParams }: PackingPageProps) {
  const { ctx, trip } = await loadTrip(params, "pack.edit");
  const input = { tripId: trip.id };
  const [carry, items] = await Promise.all([getLoadPlan({ ctx, input }), listPackItems({ ctx, input })]);
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
        <p className="mb-4 max-w-[46rem] text-15 text-pencil">{describeFairness(carry)}</p>
        <LoadBoard plan={carry} tripId={trip.id} action={assignCarryAction} />
      </Section>
      <div className="grid gap-x-12 xl:grid-cols-2">
        <Section
          title="What each can carry"
          lead="Everybody can enter this on their own page. A limit here goes first."
        >
          {carry.people.map((person) => (
            <LimitForm
              key={`${person.id} ${person.baseMassKg} ${person.limitKg}`}
              person={person}
              tripId={trip.id}
              action={saveLimitAction}
            />
          ))}
        </Section>
        <div>
          <Section title="Things of the group" lead="What is neither shelter nor kit.">
            <ThingsEditor things={carry.things} tripId={trip.id} action={saveGroupThingsAction} />
          </Section>
          {carry.shelters.length > 0 && (
            <Section title="Shelters apart" lead="Fly and poles can go to different people; anchors are in the kit.">
              {carry.shelters.map((shelter) => (
                <SplitForm
                  key={`${shelter.id} ${shelter.polesMassKg} ${shelter.staysWithSleepers}`}
                  shelter={shelter}
                  tripId={trip.id}
                  action={saveShelterSplitAction}
                />
              ))}
            </Section>
          )}
        </div>
      </div>
      <Section title="Who has packed">
        <ul className="grid gap-x-10 sm:grid-cols-2">
          {carry.people.map((person) => (
            <li key={person.id} className="flex items-baseline justify-between gap-3 border-t border-hair py-2 text-15">
              <span>{person.name}</span>
              <span className={person.packedCount === person.lineCount ? "font-semibold text-spruce" : "text-pencil"}>
                {describePacked(person)}
              </span>
            </li>
          ))}
        </ul>
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
        {!chosen && (
          <div className="mb-4 flex flex-wrap items-center gap-x-2">
            <p className="text-15 text-pencil">Add what is usual in</p>
            {SEASONS.map((season) => (
              <OneButtonForm key={season} action={addSeasonItemsAction} values={{ tripId: trip.id, season }}>
                {startSentence(SEASON_NAMES[season])}
              </OneButtonForm>
            ))}
          </div>
        )}
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

function describeLoads({ pieces, shares }: LoadPlanView): string {
  if (pieces.length === 0) return "Nothing to carry for the group yet";
  const all = pieces.reduce((sum, piece) => sum + piece.count, 0);
  const left = all - shares.reduce((sum, share) => sum + share.count, 0);
  if (left <= 0) return "Everything is carried by somebody";
  return `${left} ${left === 1 ? "piece is" : "pieces are"} carried by nobody`;
}

/** By what loads are compared, what is missing for it, and who is over their limit. */
function describeFairness(plan: LoadPlanView): string {
  if (plan.people.length === 0) return "Nobody is on this trip yet.";
  const totals = totalsOf(plan, plan.shares);
  const unsaid = plan.people.filter((person) => person.limitKg === null);
  const over = totals.filter(({ person, share }) => person.limitKg !== null && share > 1);
  const shares = totals.map((total) => total.share);
  const [least, most] = [Math.min(...shares), Math.max(...shares)];
  const sentences: string[] = [];
  if (unsaid.length === plan.people.length) {
    sentences.push("Nobody has said a limit: loads are shared by mass alone.");
  } else {
    sentences.push(`Loads are between ${percent(least)} and ${percent(most)} of the limit.`);
    if (unsaid.length > 0) {
      sentences.push(
        `${joinWords(unsaid.map((one) => one.name))}: no limit said, counted with the average of the others.`,
      );
    }
  }
  if (over.length > 0) {
    const kg = over.reduce((sum, { person, totalKg }) => sum + totalKg - (person.limitKg ?? 0), 0);
    sentences.push(
      `${joinWords(over.map(({ person }) => person.name))} would carry ${formatMass(kg)} more than the limit. Leave something behind, raise a limit, or move it.`,
    );
  }
  const noBase = plan.people.filter((person) => person.baseMassKg === null);
  if (noBase.length > 0) {
    sentences.push(`Own things not said, counted as nothing: ${joinWords(noBase.map((one) => one.name))}.`);
  }
  return sentences.join(" ");
}

const percent = (share: number): string => withUnit(formatFixed(share * 100), "%");

function describePacked({ packedCount, lineCount }: LoadPlanView["people"][number]): string {
  if (lineCount === 0) return "nothing on the list";
  return packedCount === lineCount ? "packed" : `${packedCount} of ${lineCount} packed`;
}
