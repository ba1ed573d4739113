import type { Metadata } from "next";
import { readCheck } from "@/components/quick-check/check-state";
import { QuickCheck } from "@/components/quick-check/quick-check";
import { PageHeading } from "@/components/ui/layout";
import { requireContext } from "@/lib/auth/session";
import { getPreferences } from "@/lib/services/preferences/get-preferences";

export const metadata: Metadata = { title: "Quick check" };

interface QuickCheckPageProps {
  readonly searchParams: Promise<Record<string, string | string[] | undefined>>;
}

/** One anchor in one ground under one line, for anybody signed in. */
export default async function QuickCheckPage({ searchParams }: QuickCheckPageProps) {
  const preferences = await getPreferences({ ctx: await requireContext() });
  return (
    <>
      <PageHeading title="Quick check" lead="What one anchor holds in one ground under one line." />
      <QuickCheck initial={readCheck(await searchParams)} preferences={preferences} />
    </>
  );
}
