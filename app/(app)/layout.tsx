import type { ReactNode } from "react";
import { requireContext } from "@/lib/auth/session";

/** Signed-in part: nobody gets past without a session; each service still checks for itself. */
export default async function AppLayout({ children }: { readonly children: ReactNode }) {
  await requireContext();
  return children;
}
