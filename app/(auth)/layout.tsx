import Link from "next/link";
import type { ReactNode } from "react";
import { BrandMark } from "@/components/shell/brand-mark";

export default function AuthLayout({ children }: { readonly children: ReactNode }) {
  return (
    <div className="mx-auto flex min-h-dvh w-full max-w-[26rem] flex-col px-4 py-8 sm:py-16">
      <header className="mb-10 self-start">
        <Link href="/" className="flex min-h-11 items-center gap-2 text-18 font-extrabold">
          <BrandMark />
          Leestead
        </Link>
      </header>
      <main id="main">{children}</main>
    </div>
  );
}
