import { cookies } from "next/headers";
import type { ReactNode } from "react";
import { AccountMenu } from "@/components/shell/account-menu";
import { toTheme } from "@/components/shell/themes";
import { TopBar } from "@/components/shell/top-bar";
import { requireContext } from "@/lib/auth/session";

/** A page outside any trip: the bar at the top and one column. */
export async function PlainPage({ children }: { readonly children: ReactNode }) {
  const ctx = await requireContext();
  const theme = toTheme((await cookies()).get("theme")?.value);
  return (
    <>
      <TopBar account={<AccountMenu name={ctx.actor.name} theme={theme} />} />
      <main id="main" className="mx-auto max-w-[64rem] px-4 py-8 sm:px-8">
        {children}
      </main>
    </>
  );
}
