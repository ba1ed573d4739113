import type { Working } from "@/lib/calc/types";
import { formatSignificant, withUnit } from "@/lib/format/numbers";

/** Three significant figures, so that the next step can be followed by hand; whole numbers stay whole. */
export function formatWorkingValue({ value, unit }: Pick<Working, "value" | "unit">): string {
  if (typeof value === "string") return value;
  const isWhole = Number.isInteger(value) && Math.abs(value) < 100_000;
  return withUnit(isWhole ? String(value).replace("-", "−") : formatSignificant(value, 3), unit);
}

/** "s_u" with a low u, as it is printed in books. */
function Symbol({ text }: { readonly text: string }) {
  const [base, low] = text.split(/_(.*)/s);
  return low ? (
    <>
      {base}
      <sub>{low}</sub>
    </>
  ) : (
    base
  );
}

/** The steps of a result: symbol, meaning, value with unit, source. On a narrow screen each step is a block. */
export function WorkingTable({
  caption,
  workings,
}: {
  readonly caption: string;
  readonly workings: readonly Working[];
}) {
  return (
    <table className="block w-full border-collapse text-15 sm:table">
      <caption className="sr-only">{caption}</caption>
      <thead className="sr-only sm:not-sr-only sm:table-header-group">
        <tr className="border-b border-hair text-left text-13 text-pencil">
          <th scope="col" className="w-20 py-2 pr-3 font-normal">
            Symbol
          </th>
          <th scope="col" className="py-2 pr-3 font-normal">
            What it is
          </th>
          <th scope="col" className="w-40 py-2 pr-4 text-right font-normal">
            Value
          </th>
          <th scope="col" className="w-[34%] py-2 font-normal">
            Source
          </th>
        </tr>
      </thead>
      <tbody className="block sm:table-row-group">
        {workings.map((working, index) => (
          <tr
            key={index}
            className="grid grid-cols-[minmax(0,1fr)_auto] gap-x-4 border-b border-hair py-2 sm:table-row sm:py-0 [&>*]:break-inside-avoid"
          >
            <td className="font-semibold italic sm:py-2 sm:pr-3 sm:align-top">
              <Symbol text={working.symbol} />
            </td>
            <th scope="row" className="col-span-2 row-start-2 text-left font-normal sm:py-2 sm:pr-3 sm:align-top">
              {working.meaning}
            </th>
            <td className="col-start-2 row-start-1 text-right font-bold sm:py-2 sm:pr-4 sm:align-top">
              {formatWorkingValue(working)}
            </td>
            <td className="col-span-2 text-13 text-pencil sm:py-2 sm:align-top">{working.source}</td>
          </tr>
        ))}
      </tbody>
    </table>
  );
}
