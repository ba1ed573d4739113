import { PaperLink } from "@/components/papers/paper-list";
import { paperHref } from "@/components/papers/paper-links";
import type { PaperSize } from "@/lib/domain/paper/schema";
import type { PackListView } from "@/lib/domain/views";
import { formatDay } from "@/lib/format/days";
import { joinWords } from "@/lib/format/words";

/** Where one person sleeps, night by night, with whom, and the card that says how that shelter is pitched. */
export function MyNights({
  tripId,
  nights,
  size,
}: {
  readonly tripId: string;
  readonly nights: PackListView["nights"];
  readonly size: PaperSize;
}) {
  if (nights.length === 0) return <p className="text-15 text-pencil">The camps are not planned yet.</p>;
  return (
    <ol>
      {nights.map((night) => (
        <li
          key={night.day}
          className="grid gap-x-6 gap-y-1 border-t border-hair py-3.5 first:border-t-0 sm:grid-cols-[9rem_minmax(0,1fr)_minmax(0,1.2fr)_auto] sm:items-baseline"
        >
          <p className="text-15 font-bold">{formatDay(night.day)}</p>
          <p className="text-15 font-semibold">{night.campName}</p>
          <p className="text-15">
            {describePlace(night)}
            {night.withNames.length > 0 && (
              <span className="block text-13 text-pencil">with {joinWords(night.withNames)}</span>
            )}
          </p>
          {night.pitchId ? (
            <PaperLink
              href={paperHref(tripId, { paper: "pitch-card", campId: night.campId, pitchId: night.pitchId }, size)}
              label="Pitch card"
              of={`${night.shelterName ?? ""} at ${night.campName}`}
            />
          ) : (
            <span className="hidden sm:block" />
          )}
        </li>
      ))}
    </ol>
  );
}

function describePlace({ shelterName, pitchId }: PackListView["nights"][number]): string {
  if (pitchId && shelterName) return shelterName;
  return shelterName === null ? "not placed yet" : "outside, by choice";
}
