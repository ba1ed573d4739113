import type { ReactNode } from "react";
import { PlainPage } from "../_shell/plain-page";

export default function PullTestsLayout({ children }: { readonly children: ReactNode }) {
  return <PlainPage>{children}</PlainPage>;
}
