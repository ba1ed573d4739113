"use client";

import { Button } from "@/components/ui/button";
import { EmptyState } from "@/components/ui/layout";

export default function CampError({
  error,
  retry,
}: {
  readonly error: Error & { digest?: string };
  readonly retry: () => void;
}) {
  return (
    <div className="px-4 py-8 sm:px-7">
      <h1 className="sr-only">This camp could not be shown</h1>
      <EmptyState title="This camp could not be shown">
        <p>
          What was saved is safe, and changes that were not saved yet are kept on this device. Try again
          {error.digest ? `; if it stays like this, say this number: ${error.digest}` : ""}.
        </p>
        <Button onClick={() => retry()}>Try again</Button>
      </EmptyState>
    </div>
  );
}
