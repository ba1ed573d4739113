import type { FoundKit } from "@/lib/calc/kit/search-kit";
import { formatMargin } from "@/lib/format/numbers";
import { massOfUnits } from "./kit-words";

const SHOWN = 4;

/** The found kit beside as many anchors of one kind, best first. */
export function AlikeTable({ kit }: { readonly kit: FoundKit }) {
  const mixed = Math.min(...kit.camps.flatMap((camp) => camp.weakest?.margin ?? []));
  const kinds = kit.kinds.filter((kind) => kind.count > 0).length;
  const count = kit.kinds.reduce((sum, kind) => sum + kind.count, 0);
  return (
    <div className="overflow-x-auto">
      <table className="w-full max-w-[46rem] border-collapse text-left text-15">
        <thead>
          <tr className="text-13 text-pencil [&>th]:pr-4 [&>th]:pb-2 [&>th]:font-normal">
            <th scope="col">Kit</th>
            <th scope="col">Together</th>
            <th scope="col">Camps held</th>
            <th scope="col">Weakest</th>
          </tr>
        </thead>
        <tbody>
          <tr className="border-t border-hair font-bold [&>*]:py-2.5 [&>*]:pr-4">
            <th scope="row">{kinds > 1 ? `${count} of ${kinds} kinds, as found` : `${count}, as found`}</th>
            <td className="whitespace-nowrap">{massOfUnits(kit.massUnits)}</td>
            <td>
              {kit.camps.length} of {kit.camps.length}
            </td>
            <td>{Number.isFinite(mixed) ? formatMargin(mixed) : "–"}</td>
          </tr>
          {kit.alike.slice(0, SHOWN).map((alike) => (
            <tr key={alike.kind} className="border-t border-hair [&>*]:py-2.5 [&>*]:pr-4">
              <th scope="row" className="font-normal">
                {alike.count} × {kit.kinds[alike.kind]?.name}
              </th>
              <td className="whitespace-nowrap">{massOfUnits(alike.massUnits)}</td>
              <td>
                {alike.campsHeld} of {kit.camps.length}
              </td>
              <td>
                {formatMargin(alike.weakest)}
                {alike.weakest < 1 && alike.campName && <span className="text-pencil">, {alike.campName}</span>}
              </td>
            </tr>
          ))}
        </tbody>
      </table>
    </div>
  );
}
