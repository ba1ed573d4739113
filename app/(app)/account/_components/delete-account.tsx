"use client";

import { useState } from "react";
import { ActionForm, SubmitButton } from "@/components/ui/action-form";
import { Button } from "@/components/ui/button";
import { Dialog } from "@/components/ui/dialog";
import { TextField } from "@/components/ui/fields";
import { deleteAccountAction } from "../actions";

export function DeleteAccount({ hasPassword }: { readonly hasPassword: boolean }) {
  const [isOpen, setIsOpen] = useState(false);
  return (
    <>
      <Button look="danger" onClick={() => setIsOpen(true)}>
        Delete the account
      </Button>
      <Dialog isOpen={isOpen} onClose={() => setIsOpen(false)} title="Delete your account?">
        <p className="mb-5 text-15">
          Your log-in, your own gear and the trips on which nobody else is are gone for good. On trips of others your
          name stays in the leader&rsquo;s list; ask them to take it off. What you wrote about your health goes at once.
        </p>
        <ActionForm action={deleteAccountAction} doneText={null} className="flex flex-col gap-4">
          {hasPassword ? (
            <TextField label="Your password" name="password" type="password" autoComplete="current-password" required />
          ) : (
            <p className="text-15">You need to have signed in within the last day; otherwise sign in again first.</p>
          )}
          <div className="flex flex-wrap gap-3">
            <SubmitButton look="danger">Delete it</SubmitButton>
            <Button look="quiet" onClick={() => setIsOpen(false)}>
              Keep it
            </Button>
          </div>
        </ActionForm>
      </Dialog>
    </>
  );
}
