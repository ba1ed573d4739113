"use client";

import { useState } from "react";
import { ActionForm, SubmitButton, type FormAction } from "@/components/ui/action-form";
import { Button } from "@/components/ui/button";
import { Dialog } from "@/components/ui/dialog";
import { TextArea } from "@/components/ui/fields";

/** Calls the trip off, or back on, with a word to everybody. */
export function CallOffForm({
  action,
  tripId,
  requestId,
  isCalledOff,
}: {
  readonly action: FormAction<null>;
  readonly tripId: string;
  readonly requestId: string;
  readonly isCalledOff: boolean;
}) {
  const [isOpen, setIsOpen] = useState(false);
  const label = isCalledOff ? "It takes place after all" : "Call the trip off";
  return (
    <>
      <Button look={isCalledOff ? "outline" : "danger"} onClick={() => setIsOpen(true)}>
        {label}
      </Button>
      <Dialog isOpen={isOpen} onClose={() => setIsOpen(false)} title={`${label}?`}>
        <ActionForm action={action} onDone={() => setIsOpen(false)}>
          <input type="hidden" name="tripId" value={tripId} />
          <input type="hidden" name="requestId" value={requestId} />
          <input type="hidden" name="isOff:boolean" value={String(!isCalledOff)} />
          <p className="mb-4 text-15">
            {isCalledOff
              ? "Everybody who has not said no gets a mail, and the entry comes back into their calendars."
              : "Everybody who has not said no gets a mail that takes the entry out of their calendars. Reminders and planned messages stop. Nothing of the plan is deleted."}
          </p>
          <TextArea name="message" label="A word to them" rows={4} maxLength={2000} hint="May stay empty." />
          <div className="mt-5 flex flex-wrap gap-3">
            <SubmitButton look={isCalledOff ? "primary" : "danger"}>{label}</SubmitButton>
            <Button look="quiet" onClick={() => setIsOpen(false)}>
              Leave it
            </Button>
          </div>
        </ActionForm>
      </Dialog>
    </>
  );
}
