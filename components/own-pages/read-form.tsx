"use client";

import { useRouter } from "next/navigation";
import { ActionForm, SubmitButton, type FormAction } from "@/components/ui/action-form";

/** "I have read this": the leader then sees it, and later changes are shown against it. */
export function ReadForm({
  action,
  tripId,
  changedAt,
}: {
  readonly action: FormAction<null>;
  readonly tripId: string;
  readonly changedAt: number;
}) {
  const router = useRouter();
  return (
    <ActionForm action={action} onDone={() => router.refresh()}>
      <input type="hidden" name="tripId" value={tripId} />
      <input type="hidden" name="changedAt:number" value={changedAt} />
      <SubmitButton className="min-h-12 w-full sm:w-auto">I have read my pages</SubmitButton>
    </ActionForm>
  );
}
