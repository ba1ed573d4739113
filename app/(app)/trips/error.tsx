"use client";

import { Button } from "@/components/ui/button";
import { EmptyState } from "@/components/ui/layout";

export default function TripsError({ error, retry }: { readonly error: unknown; readonly retry: () => void }) {
  const number = error instanceof Error && "digest" in error ? String(error.digest) : null;
  return (
    <div className="px-4 py-10 sm:px-8">
      <h1 className="sr-only">Something went wrong</h1>
      <EmptyState title="This page could not be shown">
        <p>
          What you saved is safe. Try again; if it stays like this, tell whoever runs this Leestead
          {number ? ` and give them this number: ${number}` : ""}.
        </p>
        <Button onClick={() => retry()}>Try again</Button>
      </EmptyState>
    </div>
  );
}
