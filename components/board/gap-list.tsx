"use client";

import Link from "next/link";
import { useBoard } from "./board-context";

/** What is missing, each with where to say it. */
export function GapList() {
  const { view, board, shelter } = useBoard();
  const gaps = [...board.result.gaps, ...shelter.gaps].filter(
    (gap, index, all) =>
      gap.field !== "shelter.analysis" && all.findIndex((other) => other.message === gap.message) === index,
  );
  if (gaps.length === 0) return null;
  const base = `/trips/${view.trip.id}/camps/${view.camp.id}`;
  return (
    <ul aria-label="What is missing" className="mt-3 flex flex-col gap-1 border-l-4 border-ochre pl-3">
      {gaps.map((gap) => (
        <li key={`${gap.field} ${gap.message}`} className="text-15">
          {gap.message}{" "}
          <Link
            href={gap.field.startsWith("camp.") ? `${base}/place` : `${base}/shelters`}
            className="font-semibold text-spruce"
          >
            {gap.field.startsWith("camp.") ? "Ground and wind" : "Shelters"}
          </Link>
        </li>
      ))}
    </ul>
  );
}
