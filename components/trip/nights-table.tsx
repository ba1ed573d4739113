import Link from "next/link";
import type { Preferences } from "@/lib/domain/preferences";
import type { CampSummary } from "@/lib/domain/views";
import { formatDayShort } from "@/lib/format/days";
import { formatAltitude } from "@/lib/format/lengths";
import { formatSpeed } from "@/lib/format/speeds";
import { CampVerdict } from "./camp-verdict";

const NTH = ["", "second night", "third night", "fourth night", "fifth night", "sixth night", "seventh night"];

/** Each night on one line: day, camp, what it stands on and must stand, and whether it does. */
export function NightsTable({
  tripId,
  camps,
  preferences,
}: {
  readonly tripId: string;
  readonly camps: readonly CampSummary[];
  readonly preferences: Preferences;
}) {
  const { speedUnit, lengthUnit } = preferences;
  const nights = camps.flatMap((camp) => camp.days.map((day, index) => ({ camp, day, index })));
  return (
    <table className="w-full border-collapse text-left">
      <caption className="sr-only">Nights of the trip</caption>
      <thead className="sr-only">
        <tr>
          <th scope="col">Night</th>
          <th scope="col">Camp</th>
          <th scope="col">Planned gust</th>
          <th scope="col">Verdict</th>
        </tr>
      </thead>
      <tbody>
        {nights.map(({ camp, day, index }) => (
          <tr
            key={`${camp.id}-${day}`}
            className="grid grid-cols-[4.5rem_minmax(0,1fr)] items-center gap-x-3 border-t border-hair py-3 sm:table-row sm:py-0 sm:[&>*]:py-3.5 sm:[&>*]:pr-4 sm:[&>*]:align-middle"
          >
            <th scope="row" className="text-15 font-bold whitespace-nowrap sm:w-24">
              {formatDayShort(day)}
            </th>
            <td className="min-w-0">
              <Link
                href={`/trips/${tripId}/camps/${camp.id}`}
                className="inline-block text-15 font-bold hover:text-spruce hover:underline"
              >
                {camp.name}
              </Link>
              <span className="block text-13 text-pencil">
                {index > 0
                  ? (NTH[index] ?? `night ${index + 1} here`)
                  : [
                      camp.groundName ?? "ground not known yet",
                      camp.altitudeM === null ? null : formatAltitude(camp.altitudeM, lengthUnit),
                    ]
                      .filter(Boolean)
                      .join(" · ")}
              </span>
            </td>
            <td className="col-start-2 text-15 sm:w-52">
              {camp.designGustMs === null ? (
                <span className="text-pencil">no gust planned</span>
              ) : (
                `gust ${formatSpeed(camp.designGustMs, speedUnit)}`
              )}
              {index === 0 && camp.weakest && camp.verdict !== "holds" && (
                <span className="block text-13 text-pencil">{camp.weakest}</span>
              )}
            </td>
            <td className="col-start-2 text-15 sm:w-56">
              <CampVerdict camp={camp} unit={speedUnit} />
            </td>
          </tr>
        ))}
      </tbody>
    </table>
  );
}
