import type { CordView } from "@/lib/domain/kit/cord-view";
import { formatFixed, withUnit } from "@/lib/format/numbers";
import { joinWords, plural } from "@/lib/format/words";
import { listNumbers } from "./find/kit-words";

const metres = (lengthM: number): string => withUnit(formatFixed(lengthM, lengthM % 1 === 0 ? 0 : 1), "m");

/** Guy lines by shelter, as they are cut, and the total with what is carried on top. */
export function CordTable({ cord }: { readonly cord: CordView }) {
  return (
    <>
      <ul>
        {cord.shelters.map((shelter) => (
          <li
            key={shelter.name}
            className="grid gap-x-6 gap-y-1 border-t border-hair py-3 text-15 sm:grid-cols-[14rem_minmax(0,1fr)_6rem]"
          >
            <p className="font-bold">
              {shelter.name}
              <span className="block text-13 font-normal text-pencil">
                {plural(shelter.lineCount, "line")}, {withUnit(String(shelter.diameterMm), "mm")}
              </span>
            </p>
            <ul>
              {shelter.lines.map((line) => (
                <li key={line.lengthM}>
                  {line.count} × {metres(line.lengthM)}
                  <span className="text-pencil">
                    , {line.count === 1 ? "tie-out" : "tie-outs"} {listNumbers(line.tieOuts)}
                  </span>
                </li>
              ))}
            </ul>
            <p className="font-semibold sm:text-right">{metres(shelter.totalM)}</p>
          </li>
        ))}
      </ul>
      <p className="border-t border-hair pt-3 text-15">
        {describeTotal(cord)} <span className="text-pencil">{describeOwned(cord)}</span>
      </p>
    </>
  );
}

function describeTotal({ lineCount, totalM, spareM }: CordView): string {
  return `${plural(lineCount, "line")}, ${metres(totalM)} together; with a tenth to spare ${metres(totalM + spareM)}.`;
}

function describeOwned({ ownedM, spareM, shockCordsUsed, shockCordsOwned }: CordView): string {
  const parts = [
    `The kit has ${metres(ownedM)} of cord${ownedM < spareM ? `, ${metres(spareM - ownedM)} less than that spare` : ""}`,
  ];
  if (shockCordsUsed > 0)
    parts.push(`${shockCordsUsed} of ${plural(shockCordsOwned, "shock cord")} are in use at one camp`);
  return `${joinWords(parts)}.`;
}
