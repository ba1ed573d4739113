import Link from "next/link";
import { Section } from "@/components/ui/layout";
import type { Remedy, ShortCamp } from "@/lib/calc/kit/explain-shortfall";
import type { Preferences } from "@/lib/domain/preferences";
import { formatHoldsTo, formatSpeed } from "@/lib/format/speeds";
import { joinWords, plural } from "@/lib/format/words";
import { nameSpots } from "./kit-words";

/** Camps that no kit of the chosen anchors holds: where, why, up to which gust, and what would change that. */
export function KitShort({
  camps,
  tripId,
  speedUnit,
}: {
  readonly camps: readonly ShortCamp[];
  readonly tripId: string;
  readonly speedUnit: Preferences["speedUnit"];
}) {
  return (
    <Section title="Where it fails, and what would change that">
      <ul>
        {camps.map((camp) => (
          <li key={camp.campId} className="border-t border-hair py-4">
            <h3 className="text-15 font-bold">{camp.campName}</h3>
            <p className="mt-1 max-w-[46rem] text-15">{describeShort(camp)}</p>
            <p className="mt-1 max-w-[46rem] text-15">
              {camp.holdsToMs < 0.5
                ? "Nothing of what there is holds, in any wind."
                : `After its windy night, with everything there is, it holds to ${formatHoldsTo(camp.holdsToMs, speedUnit)}; the plan says ${formatSpeed(camp.gustMs, speedUnit)}.`}
            </p>
            <h4 className="mt-3 text-13 text-pencil">What would change that</h4>
            <ul className="mt-1 max-w-[46rem] list-disc pl-5 text-15">
              {camp.remedies.map((remedy) => (
                <li key={remedy.type}>{describeRemedy(remedy, camp.campName)}</li>
              ))}
              <li>
                <Link href={`/trips/${tripId}/camps/${camp.campId}`} className="text-spruce underline">
                  Pitch lower, turn the shelters or lengthen their lines
                </Link>{" "}
                there.
              </li>
              <li>Camp somewhere else, or stay away when that wind is forecast.</li>
            </ul>
          </li>
        ))}
      </ul>
    </Section>
  );
}

function describeShort(camp: ShortCamp): string {
  if (camp.fallen.length > 0) {
    return `${joinWords(camp.fallen)} ${camp.fallen.length === 1 ? "has" : "have"} no standing shape in that gust, whatever holds the lines.`;
  }
  const where = nameSpots(camp.spots);
  const pinned = camp.isPinned ? " A pinned anchor that gives way is among them: take the pin off." : "";
  if (camp.kindNames.length === 0) return `None of the chosen anchors holds at ${where}.${pinned}`;
  const only = `At ${where} only ${joinWords(camp.kindNames)} hold`;
  return `${only}: ${plural(camp.needed, "piece")} needed, ${camp.available} there.${pinned}`;
}

function describeRemedy(remedy: Remedy, campName: string): string {
  const pieces = (all: readonly { readonly name: string; readonly count: number }[]) =>
    joinWords(all.map((one) => `${one.count} × ${one.name}`));
  switch (remedy.type) {
    case "more":
      return `Take more: ${pieces(remedy.pieces)}.`;
    case "other-kinds":
      return `Take ${pieces(remedy.pieces)}, also from the library.`;
    case "found-and-more":
      return `Use what is found at ${campName}, and take ${pieces(remedy.pieces)}.`;
    case "found":
      return `Use what is found at ${campName}.`;
    case "doubling":
      return "Allow two in line.";
    case "fewer-spares":
      return "Do without spares.";
  }
}
