import { MyNights } from "@/components/pack/my-nights";
import { TickList } from "@/components/pack/tick-list";
import { PaperLink } from "@/components/papers/paper-list";
import { paperHref } from "@/components/papers/paper-links";
import { PageBody } from "@/components/trip/page-body";
import { Cautions, PageHeading, Section } from "@/components/ui/layout";
import type { PackListView } from "@/lib/domain/views";
import { formatDayRange } from "@/lib/format/days";
import { formatMass } from "@/lib/format/masses";
import { plural } from "@/lib/format/words";
import { getPackList } from "@/lib/services/pack/get-pack-list";
import { loadTrip } from "../_lib/load-trip";
import { tickPackItemAction } from "./actions";

export const metadata = { title: "Mine" };

export default async function MinePage({ params }: { readonly params: Promise<{ tripId: string }> }) {
  const { ctx, trip, preferences } = await loadTrip(params, "paper.own");
  const list = await getPackList({ ctx, input: { tripId: trip.id, personId: "self" } });
  const size = preferences.paperSize;
  return (
    <PageBody>
      <PageHeading title={describeMine(list)} lead={`${trip.name}, ${formatDayRange(trip.startDate, trip.endDate)}`}>
        <PaperLink
          href={paperHref(trip.id, { paper: "pack-list", personId: list.person.id }, size)}
          label="My pack list"
        />
      </PageHeading>
      <Section title="Nights">
        <MyNights tripId={trip.id} nights={list.nights} size={size} />
      </Section>
      <div className="grid gap-x-12 lg:grid-cols-2">
        <Section title="I bring">
          <TickList
            legend="I bring"
            lines={list.own}
            tripId={trip.id}
            action={tickPackItemAction}
            emptyText="The leader has not written a list yet."
          />
        </Section>
        <Section
          title="I carry for the group"
          actions={list.group.length > 0 && <p className="text-15 text-pencil">{formatMass(list.groupMassKg)}</p>}
        >
          <TickList
            legend="I carry for the group"
            lines={list.group}
            tripId={trip.id}
            action={tickPackItemAction}
            emptyText="Nothing is given to you yet."
          />
        </Section>
      </div>
      {trip.notes && (
        <Section title="From the leader">
          <p className="max-w-[46rem] text-15 whitespace-pre-wrap">{trip.notes}</p>
        </Section>
      )}
      <Cautions />
    </PageBody>
  );
}

/** What is still to do, in one line. */
function describeMine({ own, group, nights }: PackListView): string {
  const lines = [...own, ...group];
  const left = lines.filter((line) => !line.isTicked).length;
  if (lines.length > 0 && left > 0) return `${plural(left, "thing")} still to pack`;
  if (nights.some((night) => night.shelterName === null)) return "Your place to sleep is not settled yet";
  return lines.length > 0 ? "You are packed" : "Your pages";
}
