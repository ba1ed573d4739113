import type { Metadata } from "next";
import { LinkButton } from "@/components/ui/button";
import { env } from "@/lib/env";
import { AuthHeading } from "../_components/auth-heading";

export const metadata: Metadata = { title: "Look into your mail" };

const CONFIRM =
  "A link to confirm your address is on its way. It works for 24 hours. Nothing after a few minutes? Look into the spam folder, or sign in: that sends a new one.";
const TEXTS: Readonly<Record<string, string>> = {
  reset:
    "If there is an account with that address, a link to choose a new password is on its way. It works for one hour.",
  link: "If there is an account with that address, a link to sign in is on its way. It works for 15 minutes and once.",
};

interface CheckMailPageProps {
  readonly searchParams: Promise<{ for?: string | string[] }>;
}

export default async function CheckMailPage({ searchParams }: CheckMailPageProps) {
  const { for: reason } = await searchParams;
  return (
    <>
      <AuthHeading title="Look into your mail">{(typeof reason === "string" && TEXTS[reason]) || CONFIRM}</AuthHeading>
      <div className="flex flex-wrap gap-3">
        <LinkButton href="/sign-in">To sign in</LinkButton>
        {env.isDemo && !env.smtpUrl && <LinkButton href="/demo/mail">Mails of this demo</LinkButton>}
      </div>
    </>
  );
}
