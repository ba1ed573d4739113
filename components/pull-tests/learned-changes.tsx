import { StateMark, stateWord } from "@/components/drawing/state-mark";
import type { ShelterChange, ShelterStanding } from "@/lib/domain/pull-test/views";
import type { Preferences } from "@/lib/domain/preferences";
import { formatMargin } from "@/lib/format/numbers";
import { gustWords } from "../results/verdict-words";

/** Each shelter's plan by the table, and by what the readings say. */
export function LearnedChanges({
  changes,
  speedUnit,
}: {
  readonly changes: readonly ShelterChange[];
  readonly speedUnit: Preferences["speedUnit"];
}) {
  return (
    <table className="w-full max-w-[46rem] border-collapse text-left text-15">
      <caption className="sr-only">What each shelter holds to by the table and with the readings</caption>
      <thead>
        <tr className="text-13 text-pencil">
          <th scope="col" className="py-2 pr-3 font-normal">
            Shelter
          </th>
          <th scope="col" className="py-2 pr-3 font-normal">
            By the table
          </th>
          <th scope="col" className="py-2 font-normal">
            With the readings
          </th>
        </tr>
      </thead>
      <tbody>
        {changes.map((change) => (
          <tr key={change.pitchId} className="border-t border-hair align-top">
            <th scope="row" className="py-2.5 pr-3 font-semibold">
              {change.name}
            </th>
            <td className="py-2.5 pr-3 text-pencil">
              <Standing standing={change.byTable} speedUnit={speedUnit} />
            </td>
            <td className="py-2.5 font-semibold">
              <Standing standing={change.learned} speedUnit={speedUnit} />
            </td>
          </tr>
        ))}
      </tbody>
    </table>
  );
}

function Standing({
  standing,
  speedUnit,
}: {
  readonly standing: ShelterStanding;
  readonly speedUnit: Preferences["speedUnit"];
}) {
  const { verdict, holdsToGustMs, margin } = standing;
  return (
    <>
      <span className="flex items-center gap-2">
        <StateMark verdict={verdict} isDecorative />
        {stateWord(verdict)}
        {holdsToGustMs !== null && `, to ${gustWords(holdsToGustMs, speedUnit)}`}
      </span>
      {margin !== null && (
        <span className="text-13 font-normal text-pencil">weakest margin {formatMargin(margin)}</span>
      )}
    </>
  );
}
