"use client";

import "./globals.css";
import { Button } from "@/components/ui/button";
import { EmptyState } from "@/components/ui/layout";

export default function GlobalError({
  error,
  retry,
}: {
  readonly error: Error & { digest?: string };
  retry: () => void;
}) {
  return (
    <html lang="en">
      <body className="min-h-dvh bg-paper font-sans text-ink">
        <main id="main" className="px-6 py-16">
          <h1 className="sr-only">Something went wrong</h1>
          <EmptyState title="Leestead could not be shown">
            <p>What you saved is safe. Try again.{error.digest ? ` Number: ${error.digest}` : ""}</p>
            <Button onClick={retry}>Try again</Button>
          </EmptyState>
        </main>
      </body>
    </html>
  );
}
