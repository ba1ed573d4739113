import type { Metadata } from "next";
import Link from "next/link";
import { redirect } from "next/navigation";
import { ActionForm, SubmitButton } from "@/components/ui/action-form";
import { TextField } from "@/components/ui/fields";
import { getContext } from "@/lib/auth/session";
import { signUpAction } from "../actions";
import { AuthHeading } from "../_components/auth-heading";
import { NewPasswordField } from "../_components/new-password-field";

export const metadata: Metadata = { title: "Make an account" };

export default async function SignUpPage() {
  if (await getContext()) redirect("/trips");
  return (
    <>
      <AuthHeading title="Make an account">You confirm your address by a link that comes by mail.</AuthHeading>
      <ActionForm action={signUpAction} doneText={null} className="flex flex-col gap-4">
        <TextField label="Name" name="name" autoComplete="name" required hint="As your group knows you." />
        <TextField label="E-mail" name="email" type="email" autoComplete="username" required />
        <NewPasswordField label="Password" name="password" />
        <SubmitButton>Make an account</SubmitButton>
      </ActionForm>
      <p className="mt-6">
        <Link href="/sign-in" className="inline-flex min-h-11 items-center text-spruce underline">
          You have one already? Sign in
        </Link>
      </p>
    </>
  );
}
