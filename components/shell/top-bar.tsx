import Link from "next/link";
import type { ReactNode } from "react";
import { BrandMark } from "./brand-mark";

/** The bar at the top: the name, where you are, and you. */
export function TopBar({ children, account }: { readonly children?: ReactNode; readonly account?: ReactNode }) {
  return (
    <header className="no-print border-b border-hair">
      <div className="flex min-h-14 flex-wrap items-center gap-x-4 gap-y-1 px-4 sm:px-6">
        <Link href="/trips" className="flex min-h-11 items-center gap-2 text-18 font-extrabold">
          <BrandMark />
          Leestead
        </Link>
        <div className="flex min-w-0 flex-1 flex-wrap items-center gap-x-4">{children}</div>
        {account}
      </div>
    </header>
  );
}
