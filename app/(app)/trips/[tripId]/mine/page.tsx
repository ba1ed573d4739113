import { KnotCard } from "@/components/knots/knot-drawing";
import { ChangeList } from "@/components/own-pages/change-list";
import { CopyLine } from "@/components/own-pages/copy-line";
import { OwnPitchCard } from "@/components/own-pages/own-card";
import { ReadForm } from "@/components/own-pages/read-form";
import { MyNights } from "@/components/pack/my-nights";
import { OwnLoadForm } from "@/components/pack/own-load-form";
import { TickList } from "@/components/pack/tick-list";
import { PaperLink } from "@/components/papers/paper-list";
import { paperHref } from "@/components/papers/paper-links";
import { PageBody } from "@/components/trip/page-body";
import { Cautions, PageHeading, Section } from "@/components/ui/layout";
import { KNOT_GUIDE } from "@/lib/domain/knots/knots";
import type { OwnHome } from "@/lib/domain/own-pages/views";
import type { PackListView } from "@/lib/domain/views";
import { formatDay, formatDayRange } from "@/lib/format/days";
import { formatMass } from "@/lib/format/masses";
import { plural } from "@/lib/format/words";
import { getOwnHome } from "@/lib/services/own-pages/get-own-home";
import { getOwnLoad } from "@/lib/services/pack/save-person-load";
import { loadTrip } from "../_lib/load-trip";
import { markOwnPagesReadAction, saveOwnLoadAction, tickPackItemAction } from "./actions";

export const metadata = { title: "Mine" };

export default async function MinePage({ params }: { readonly params: Promise<{ tripId: string }> }) {
  const { ctx, trip, preferences } = await loadTrip(params, "paper.own");
  const home = await getOwnHome({ ctx, input: { tripId: trip.id } });
  const { list, cards } = home;
  const load = await getOwnLoad({ ctx, input: { tripId: trip.id } });
  const size = preferences.paperSize;
  const paper = { paper: "pitch-and-pack", personId: list.person.id } as const;
  const knots = KNOT_GUIDE.filter(({ key }) => cards.some((card) => card.steps.some((step) => step.knot === key)));
  return (
    <PageBody>
      <PageHeading
        title={describeMine(home)}
        lead={`${trip.name}, ${formatDayRange(trip.startDate, trip.endDate)}. ${describeFirstNight(list)}`}
      >
        <PaperLink href={paperHref(trip.id, { ...paper, fold: "flat" }, size)} label="My pages" />
        <PaperLink href={paperHref(trip.id, { ...paper, fold: "pocket" }, size)} label="To fold for the pocket" />
      </PageHeading>
      <WhatChanged home={home} tripId={trip.id} timeZone={trip.timeZone} />
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
      <Section title="What I can carry" lead="So that the group's things are shared out fairly.">
        <OwnLoadForm load={load} tripId={trip.id} action={saveOwnLoadAction} />
      </Section>
      {cards.length > 0 && (
        <Section title="How my shelters are pitched">
          {cards.map((card, index) => (
            <OwnPitchCard key={card.pitchId} card={card} isOpen={index === 0} />
          ))}
        </Section>
      )}
      {knots.length > 0 && (
        <Section
          title="Knots I need"
          lead="Drawn open. The dark tip is the end you tie with; the arrow is the part that takes the load."
        >
          {knots.map((knot) => (
            <div key={knot.key} id={`knot-${knot.key}`} className="mb-8 scroll-mt-4">
              <h3 className="mb-3 text-15 font-bold">{knot.name}</h3>
              <KnotCard knot={knot} />
            </div>
          ))}
        </Section>
      )}
      {trip.notes && (
        <Section title="From the leader">
          <p className="max-w-[46rem] text-15 whitespace-pre-wrap">{trip.notes}</p>
        </Section>
      )}
      <Cautions />
    </PageBody>
  );
}

function WhatChanged({
  home,
  tripId,
  timeZone,
}: {
  readonly home: OwnHome;
  readonly tripId: string;
  readonly timeZone: string;
}) {
  const { changes, copies, look, version, changedAt } = home;
  const since = look ? "since you last said you read them" : "since your paper left";
  const isRead = look !== null && changes?.length === 0;
  return (
    <Section title={`My pages, version ${version}`}>
      <div className="flex max-w-[46rem] flex-col gap-4">
        {changes !== null && changes.length > 0 && (
          <div>
            <p className="mb-2 text-15 font-semibold">
              {plural(changes.length, "change")} {since}
            </p>
            <ChangeList changes={changes} />
          </div>
        )}
        {isRead && <p className="text-15">You have read them as they are. Nothing has changed since.</p>}
        {changes === null && <p className="text-15">Read them through once. Later changes are then shown here.</p>}
        {copies.map((copy) => (
          <CopyLine key={copy.way} copy={copy} version={version} timeZone={timeZone} />
        ))}
        {!isRead && <ReadForm action={markOwnPagesReadAction} tripId={tripId} changedAt={changedAt} />}
      </div>
    </Section>
  );
}

/** What is still to do, in one line. */
function describeMine({ list: { own, group, nights }, changes }: OwnHome): string {
  const lines = [...own, ...group];
  const left = lines.filter((line) => !line.isTicked).length;
  if (changes !== null && changes.length > 0) return `${plural(changes.length, "change")} on your pages`;
  if (lines.length > 0 && left > 0) return `${plural(left, "thing")} still to pack`;
  if (nights.some((night) => night.shelterName === null)) return "Your place to sleep is not settled yet";
  return lines.length > 0 ? "You are packed" : "Your pages";
}

function describeFirstNight({ nights }: PackListView): string {
  const [first] = nights;
  return first ? `First night: ${formatDay(first.day)}, ${first.campName}.` : "No nights are planned yet.";
}
