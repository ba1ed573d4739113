import type { Metadata } from "next";
import Link from "next/link";
import { redirect } from "next/navigation";
import { ActionForm, SubmitButton } from "@/components/ui/action-form";
import { TextField } from "@/components/ui/fields";
import { toOwnPath } from "@/lib/auth/next-path";
import { getContext } from "@/lib/auth/session";
import { env } from "@/lib/env";
import { signInAction } from "../actions";
import { AuthHeading } from "../_components/auth-heading";
import { DemoLogIns } from "../_components/demo-log-ins";

export const metadata: Metadata = { title: "Sign in" };

const DONE: Readonly<Record<string, string>> = {
  verified: "Your address is confirmed. Sign in.",
  reset: "Your new password is set and you are signed out everywhere. Sign in with it.",
  "signed-out": "You are signed out.",
  deleted: "Your account is deleted.",
};

interface SignInPageProps {
  readonly searchParams: Promise<{ next?: string | string[]; done?: string | string[] }>;
}

export default async function SignInPage({ searchParams }: SignInPageProps) {
  const { next, done } = await searchParams;
  const path = toOwnPath(next);
  if (await getContext()) redirect(path);
  const notice = typeof done === "string" ? DONE[done] : undefined;
  return (
    <>
      <AuthHeading title="Sign in" />
      {notice && (
        <p role="status" className="mb-6 border-l-4 border-spruce bg-spruce-wash px-4 py-3">
          {notice}
        </p>
      )}
      <ActionForm action={signInAction} doneText={null} className="flex flex-col gap-4">
        <input type="hidden" name="next" value={path} />
        <TextField label="E-mail" name="email" type="email" autoComplete="username" required />
        <TextField label="Password" name="password" type="password" autoComplete="current-password" required />
        <SubmitButton>Sign in</SubmitButton>
      </ActionForm>
      <p className="mt-6 flex flex-wrap gap-x-6">
        <Link href="/sign-in/by-link" className="inline-flex min-h-11 items-center text-spruce underline">
          Sign in by a link
        </Link>
        <Link href="/forgot-password" className="inline-flex min-h-11 items-center text-spruce underline">
          Forgotten your password?
        </Link>
        <Link href="/sign-up" className="inline-flex min-h-11 items-center text-spruce underline">
          Make an account
        </Link>
      </p>
      {env.isDemo && <DemoLogIns />}
    </>
  );
}
