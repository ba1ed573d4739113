"use client";

import { Button } from "@/components/ui/button";
import { EmptyState } from "@/components/ui/layout";

export default function ErrorPage({
  error,
  retry,
}: {
  readonly error: Error & { digest?: string };
  retry: () => void;
}) {
  return (
    <main id="main" className="px-6 py-16">
      <h1 className="sr-only">Something went wrong</h1>
      <EmptyState title="This page could not be shown">
        <p>
          What you saved is safe. Try again; if it stays like this, tell whoever runs this Leestead
          {error.digest ? ` and give them this number: ${error.digest}` : ""}.
        </p>
        <Button onClick={retry}>Try again</Button>
      </EmptyState>
    </main>
  );
}
