"use client";

import { useFieldErrors } from "@/components/ui/action-form";
import { Button } from "@/components/ui/button";

/** After somebody else was first: keep what you typed and save it over theirs, or look at theirs in another tab. */
export function ConflictChoice({ href }: { readonly href: string }) {
  const errors = useFieldErrors("version");
  if (errors.length === 0) return null;
  return (
    <div className="mb-6 flex flex-wrap items-center gap-3">
      <Button type="submit" name="keepMine:boolean" value="true" look="danger">
        Save mine over it
      </Button>
      <a href={href} target="_blank" rel="noreferrer" className="min-h-11 py-2.5 font-semibold text-spruce underline">
        See theirs in a new tab
      </a>
      <p className="text-13 text-pencil">What you typed stays here until you choose.</p>
    </div>
  );
}
