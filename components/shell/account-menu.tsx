import Link from "next/link";
import { ThemeSwitch } from "./theme-switch";
import type { Theme } from "./themes";

/** Initials that open the account, quick check, knots, own gear and the light. */
export function AccountMenu({ name, theme }: { readonly name: string; readonly theme: Theme }) {
  const initials = name
    .split(/\s+/)
    .map((word) => [...word][0] ?? "")
    .slice(0, 2)
    .join("")
    .toUpperCase();
  return (
    <details className="group relative">
      <summary
        aria-label={`Menu of ${name}`}
        className="flex size-11 list-none items-center justify-center rounded-full border border-ink text-13 font-bold [&::-webkit-details-marker]:hidden"
      >
        {initials}
      </summary>
      <nav
        aria-label="You"
        className="absolute right-0 z-40 mt-2 flex w-60 flex-col rounded-sheet border border-hair bg-sheet p-2 shadow-float"
      >
        <p className="truncate px-3 py-2 text-13 text-pencil">{name}</p>
        {[
          ["/trips", "Trips"],
          ["/quick-check", "Quick check"],
          ["/knots", "Knots"],
          ["/pull-tests", "Practice field"],
          ["/gear", "Own gear"],
          ["/account", "Account and units"],
        ].map(([href = "", label]) => (
          <Link key={href} href={href} className="flex min-h-11 items-center rounded-field px-3 hover:bg-spruce-wash">
            {label}
          </Link>
        ))}
        <div className="px-3">
          <ThemeSwitch initial={theme} />
        </div>
      </nav>
    </details>
  );
}
