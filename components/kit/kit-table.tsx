import type { ReactNode } from "react";
import Link from "next/link";
import { AnchorMark } from "@/components/drawing/anchor-mark";
import type { KitItemView } from "@/lib/domain/views";
import { formatAnchorSpec } from "@/lib/format/anchors";
import { formatMass } from "@/lib/format/masses";
import { joinWords, startSentence } from "@/lib/format/words";

interface KitTableProps {
  readonly caption: string;
  readonly items: readonly KitItemView[];
  /** Null for who may only look. */
  readonly renderCount: ((item: KitItemView) => ReactNode) | null;
  readonly renderActions: ((item: KitItemView) => ReactNode) | null;
  readonly hrefOf: ((item: KitItemView) => string) | null;
}

/** The kit as a drawn set: each anchor by its section, how many, how heavy, and where most of them are used. */
export function KitTable({ caption, items, renderCount, renderActions, hrefOf }: KitTableProps) {
  return (
    <table className="w-full border-collapse text-left">
      <caption className="sr-only">{caption}</caption>
      <thead className="sr-only sm:not-sr-only sm:table-header-group">
        <tr className="text-13 text-pencil [&>th]:pr-4 [&>th]:pb-2 [&>th]:font-normal">
          <th scope="col" className="w-12">
            <span className="sr-only">Section</span>
          </th>
          <th scope="col">What</th>
          <th scope="col" className="w-24">
            Each
          </th>
          <th scope="col" className="w-44">
            Count
          </th>
          <th scope="col" className="w-28">
            Together
          </th>
          {renderActions && (
            <th scope="col" className="w-24">
              <span className="sr-only">Actions</span>
            </th>
          )}
        </tr>
      </thead>
      <tbody>
        {items.map((item) => (
          <tr
            key={item.id}
            className="grid grid-cols-[2.75rem_minmax(0,1fr)_auto] items-center gap-x-3 border-t border-hair py-3 sm:table-row sm:[&>*]:py-3 sm:[&>*]:pr-4 sm:[&>*]:align-middle"
          >
            <td className="row-span-3 self-start sm:w-12">
              {item.details.type === "anchor" ? (
                <AnchorMark spec={item.details.spec} size={38} />
              ) : (
                <CordMark item={item} />
              )}
            </td>
            <th scope="row" className="col-span-2 min-w-0 text-left font-normal">
              {hrefOf ? (
                <Link href={hrefOf(item)} className="text-15 font-bold hover:text-spruce hover:underline">
                  {item.details.name}
                </Link>
              ) : (
                <span className="text-15 font-bold">{item.details.name}</span>
              )}
              <span className="block text-13 text-pencil">{describeItem(item)}</span>
              {item.mostUsed > 0 && (
                <span className="block text-13 text-pencil">
                  at most {item.mostUsed} used, {joinWords(item.campNames)}
                </span>
              )}
            </th>
            <td className="hidden text-15 whitespace-nowrap sm:table-cell">{formatMass(item.details.massKg)}</td>
            <td className="col-start-2 row-start-2 -ml-4 sm:ml-0">
              {renderCount ? renderCount(item) : item.details.count}
            </td>
            <td className="col-start-2 row-start-3 text-15 whitespace-nowrap">
              <span className="text-pencil sm:hidden">{formatMass(item.details.massKg)} each, together </span>
              {formatMass(item.details.massKg * item.details.count)}
            </td>
            {renderActions && <td className="col-start-3 row-start-2 text-right">{renderActions(item)}</td>}
          </tr>
        ))}
      </tbody>
    </table>
  );
}

const LINE_NAMES = { polyester: "polyester", nylon: "nylon", uhmwpe: "UHMWPE" } as const;

function describeItem({ details }: KitItemView): string {
  switch (details.type) {
    case "anchor":
      return startSentence(formatAnchorSpec(details.spec));
    case "cord":
      return `Cord, ${LINE_NAMES[details.material]}, ${details.diameterMm}\u2009mm, pieces of ${details.lengthM}\u2009m`;
    case "shock-cord":
      return `Shock cord, pieces of ${details.lengthM}\u2009m`;
  }
}

/** A coil for cord, a spring for shock cord. */
function CordMark({ item }: { readonly item: KitItemView }) {
  return (
    <svg
      width="38"
      height="38"
      viewBox="0 0 24 24"
      aria-hidden="true"
      fill="none"
      stroke="currentColor"
      strokeWidth="1.6"
    >
      {item.details.type === "cord" ? (
        <path d="M12 5a7 7 0 1 0 7 7 5 5 0 1 0-5 4.6M12 9a3 3 0 1 0 3 3" strokeLinecap="round" />
      ) : (
        <path d="M2 12h3l1.5-5 3 10 3-10 3 10 3-10 1.5 5h2" strokeLinecap="round" strokeLinejoin="round" />
      )}
    </svg>
  );
}
