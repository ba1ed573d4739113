"use client";

import { useState } from "react";
import { ConfirmButton } from "@/components/ui/confirm-button";
import type { FormAction } from "@/components/ui/action-form";
import type { PlanPreview } from "@/lib/domain/history/views";

/** The one button of a preview. The change gets its id once, so that a second press does nothing more. */
export function RestorePlan({
  action,
  tripId,
  preview,
  intentId,
}: {
  readonly action: FormAction<null>;
  readonly tripId: string;
  readonly preview: PlanPreview;
  readonly intentId: string;
}) {
  const [id] = useState(intentId);
  return (
    <ConfirmButton
      label="Bring this plan back"
      title={`Bring version ${preview.version} back`}
      confirmLabel="Bring it back"
      look="outline"
      action={action}
      values={{
        tripId,
        campId: preview.campId,
        "version:number": String(preview.version),
        "baseVersion:number": String(preview.currentVersion),
        intentId: id,
      }}
    >
      <p>
        The plan becomes as it was then, as a new version. The one of now stays in the history and can be brought back
        the same way.
      </p>
    </ConfirmButton>
  );
}
