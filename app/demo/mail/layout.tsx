import Link from "next/link";
import type { ReactNode } from "react";
import { BrandMark } from "@/components/shell/brand-mark";

export default function DemoMailLayout({ children }: { readonly children: ReactNode }) {
  return (
    <div className="mx-auto max-w-[64rem] px-4 py-8 sm:px-8">
      <header className="mb-8">
        <Link href="/" className="inline-flex min-h-11 items-center gap-2 text-18 font-extrabold">
          <BrandMark />
          Leestead
        </Link>
      </header>
      <main id="main">{children}</main>
    </div>
  );
}
