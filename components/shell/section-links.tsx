"use client";

import Link from "next/link";
import { usePathname } from "next/navigation";

export interface SectionLink {
  readonly href: string;
  readonly label: string;
  /** Only this very page, not those below it. */
  readonly isExact?: boolean;
}

/** Links between the parts of a trip or a camp; the longest path that fits is where you are. */
export function SectionLinks({ label, links }: { readonly label: string; readonly links: readonly SectionLink[] }) {
  const path = usePathname();
  const here = links
    .filter((link) => path === link.href || (!link.isExact && path.startsWith(`${link.href}/`)))
    .toSorted((a, b) => b.href.length - a.href.length)[0];
  return (
    <nav aria-label={label}>
      <ul className="flex gap-x-5 overflow-x-auto whitespace-nowrap lg:flex-wrap">
        {links.map((link) => (
          <li key={link.href}>
            <Link
              href={link.href}
              aria-current={link === here ? "page" : undefined}
              className="flex min-h-11 items-center border-b-2 border-transparent text-15 hover:border-hair aria-[current]:border-ink aria-[current]:font-bold"
            >
              {link.label}
            </Link>
          </li>
        ))}
      </ul>
    </nav>
  );
}
