"use client";

import Link from "next/link";
import { verdictHeadline, VERDICT_TONES, gustWords } from "@/components/results/verdict-words";
import { formatSpeed } from "@/lib/format/speeds";
import { useBoard } from "./board-context";
import { GapList } from "./gap-list";

/** The headline is the verdict, in words; below it why. */
export function VerdictPanel() {
  const { view, board, shelter, pitch, preferences } = useBoard();
  const { result, isPreview } = board;
  const isWaiting = board.waiting.has(pitch.id);
  const words = isWaiting ? "working out…" : verdictHeadline(shelter, preferences.speedUnit);
  const tone = isWaiting ? "text-pencil" : VERDICT_TONES[shelter.verdict];
  const weakest = shelter.tieOuts.find((one) => one.tieOutId === shelter.weakestTieOutId);
  // The shelter that gives way first in a rising wind, which need not be the one with the smallest margin.
  const first = result.shelters.find((one) => one.holdsToGustMs !== null && one.holdsToGustMs === result.holdsToGustMs);
  const worst = first && first.pitchId !== shelter.pitchId && first.verdict !== "holds" ? first : null;
  return (
    <section aria-labelledby="verdict-heading">
      <p className="text-13 text-pencil">{isPreview ? "This shelter would then" : "This shelter"}</p>
      <h2 id="verdict-heading" className={`text-24 font-extrabold sm:text-34 ${tone}`}>
        {isPreview ? asWouldBe(words) : words}
      </h2>
      <p className="mt-1 text-15">
        {result.designGustMs !== null && `Planned gust ${formatSpeed(result.designGustMs, preferences.speedUnit)}. `}
        {!isWaiting && weakest?.margin != null && (
          <>
            Weakest: tie-out {weakest.number}. {weakest.capacity?.status === "ok" && `${weakest.capacity.sentence} `}
            <Link
              href={`/trips/${view.trip.id}/camps/${view.camp.id}/working/${pitch.id}/${weakest.tieOutId}`}
              className="font-semibold text-spruce"
            >
              How this was calculated
            </Link>
          </>
        )}
      </p>
      {worst && (
        <p className="mt-1 text-15">
          Worse at this camp: {worst.name}, {verdictHeadline(worst, preferences.speedUnit)}.
        </p>
      )}
      {!worst && result.holdsToGustMs !== null && result.shelters.length > 1 && (
        <p className="mt-1 text-15 text-pencil">
          The whole camp holds to {gustWords(result.holdsToGustMs, preferences.speedUnit)}.
        </p>
      )}
      <GapList />
    </section>
  );
}

/** "holds to 81 km/h" → "hold to 81 km/h", after "would then". */
function asWouldBe(words: string): string {
  return words.replace("holds to", "hold to").replace("gives way", "give way").replace("loses its", "lose its");
}
