import Link from "next/link";
import { AnchorMark } from "@/components/drawing/anchor-mark";
import { Section } from "@/components/ui/layout";
import type { Forcing, Otherwise, PieceReason } from "@/lib/calc/kit/explain-kit";
import type { FoundKit } from "@/lib/calc/kit/search-kit";
import type { Preferences } from "@/lib/domain/preferences";
import { formatMass } from "@/lib/format/masses";
import { formatChance, formatMargin } from "@/lib/format/numbers";
import { joinWords, plural, startSentence } from "@/lib/format/words";
import { AlikeTable } from "./alike-table";
import { KitCurve } from "./kit-curve";
import { massOfUnits, nameSpots } from "./kit-words";

interface KitFoundProps {
  readonly kit: FoundKit;
  readonly tripId: string;
  readonly speedUnit: Preferences["speedUnit"];
  readonly leftOut: readonly string[];
}

/** A found kit: what is in it and why, what it does at each camp, what more wind costs, and what one kind would do. */
export function KitFound({ kit, tripId, speedUnit, leftOut }: KitFoundProps) {
  return (
    <>
      <p className="mb-6 max-w-[46rem] text-15">
        {kit.gap === 0
          ? "Proven: no lighter kit of these anchors does it."
          : `The time ran out: a kit may be up to ${formatChance(kit.gap)} lighter.`}
        {kit.spares > 0 &&
          ` Every camp can still be staked when any ${kit.spares === 1 ? "one is" : `${kit.spares} are`} lost or bent.`}
        {leftOut.length > 0 && ` Not covered: ${joinWords(leftOut)}.`}
      </p>
      <Section title="What is in it, and why">
        <ul>
          {kit.reasons.map((reason) => (
            <PieceRow key={reason.kind} kit={kit} reason={reason} />
          ))}
        </ul>
      </Section>
      <Section title="Camp by camp">
        <CampTable kit={kit} tripId={tripId} />
      </Section>
      <Section
        title="What more wind costs"
        lead="The lightest kit of the same anchors, with the gust of every camp stronger or lighter by so much."
      >
        <KitCurve points={kit.curve} speedUnit={speedUnit} />
      </Section>
      <Section
        title="All of one kind"
        lead="As many anchors, all alike: what mixing them is worth. Margins are the weakest of the route after its windy nights."
      >
        <AlikeTable kit={kit} />
      </Section>
    </>
  );
}

function PieceRow({ kit, reason }: { readonly kit: FoundKit; readonly reason: PieceReason }) {
  const kind = kit.kinds[reason.kind];
  if (!kind) return null;
  return (
    <li className="grid grid-cols-[2.75rem_minmax(0,1fr)] gap-x-3 border-t border-hair py-4 sm:grid-cols-[2.75rem_minmax(0,14rem)_minmax(0,1fr)]">
      <AnchorMark spec={kind.spec} size={38} />
      <p className="text-15">
        <span className="font-bold">
          {reason.count} × {kind.name}
        </span>
        <span className="block text-13 text-pencil">
          {formatMass(kind.massKg)} each, together {formatMass(kind.massKg * reason.count)}
        </span>
      </p>
      <div className="col-start-2 mt-2 flex flex-col gap-1 text-15 sm:col-start-3 sm:mt-0">
        {reason.forcedBy.slice(0, 2).map((forcing) => (
          <p key={forcing.campId}>{describeForcing(forcing, kind.name)}</p>
        ))}
        {reason.forcedBy.length > 2 && (
          <p className="text-pencil">The same at {joinWords(reason.forcedBy.slice(2).map((one) => one.campName))}.</p>
        )}
        <p className="text-13 text-pencil">
          {describeOtherwise("One fewer", reason.oneFewer, kit)}
          {reason.count > 1 && ` ${describeOtherwise("None of them", reason.without, kit)}`}
        </p>
      </div>
    </li>
  );
}

function describeForcing({ campName, spots, isForSpares }: Forcing, name: string): string {
  const where = `${campName}: ${nameSpots(spots)}`;
  return isForSpares
    ? `${where}. With one fewer of ${name}, losses could leave too few that hold there.`
    : `${where}. With one fewer of ${name}, too few that hold are left there.`;
}

function describeOtherwise(what: string, { massUnits, campNames }: Otherwise, kit: FoundKit): string {
  if (massUnits === null) {
    return `${what}: no kit of these anchors holds${campNames.length > 0 ? ` at ${joinWords(campNames)}` : ""}.`;
  }
  const more = massUnits - kit.massUnits;
  if (more === 0) return `${what}: another kit weighs the same.`;
  return `${what}: the lightest kit is ${massOfUnits(Math.abs(more))} ${more > 0 ? "heavier" : "lighter, with more work"}.`;
}

function CampTable({ kit, tripId }: { readonly kit: FoundKit; readonly tripId: string }) {
  return (
    <ul>
      {kit.camps.map((camp) => {
        const pieces = camp.placements.reduce((sum, one) => sum + (one.tandem ? 2 : 1), 0);
        const doubled = camp.placements.filter((one) => one.tandem).length;
        return (
          <li
            key={camp.campId}
            className="grid gap-x-6 gap-y-1 border-t border-hair py-3 text-15 sm:grid-cols-[14rem_minmax(0,1fr)]"
          >
            <Link
              href={`/trips/${tripId}/camps/${camp.campId}`}
              className="font-bold hover:text-spruce hover:underline"
            >
              {camp.campName}
            </Link>
            <p>
              {plural(pieces, "anchor")}
              {doubled > 0 && `, ${doubled} of them backed by a second in line`}
              {camp.foundUsed.length > 0 &&
                `, with ${joinWords(camp.foundUsed.map((one) => `${one.count} × ${one.name}`))} found there`}
              .
              <span className="block text-13 text-pencil">
                {camp.weakest
                  ? `${startSentence(`weakest in the morning: ${camp.weakest.label}`)}, margin ${formatMargin(camp.weakest.margin)}`
                  : "Only pinned anchors."}
              </span>
            </p>
          </li>
        );
      })}
    </ul>
  );
}
