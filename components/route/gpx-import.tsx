"use client";

import { useRouter } from "next/navigation";
import { useId, useState } from "react";
import { buttonClass } from "@/components/ui/button";
import { formatDistance } from "@/lib/format/distances";
import type { Preferences } from "@/lib/domain/preferences";

interface Answer {
  readonly lengthM: number;
  readonly pointCount: number;
  readonly placeCount: number;
  readonly snapped: number;
}

type State =
  | { readonly kind: "idle" }
  | { readonly kind: "busy"; readonly name: string }
  | { readonly kind: "done"; readonly text: string }
  | { readonly kind: "refused"; readonly text: string };

const LARGEST = 12 * 1024 * 1024;

async function upload(tripId: string, file: File, unit: Preferences["lengthUnit"]): Promise<State> {
  if (file.size > LARGEST) return { kind: "refused", text: "That file is too large: at most 12 MB." };
  try {
    const query = new URLSearchParams({ name: file.name.slice(0, 200) });
    const response = await fetch(`/api/gpx/${tripId}?${query}`, {
      method: "POST",
      body: file,
      headers: { "Content-Type": "application/gpx+xml" },
    });
    const body: unknown = await response.json();
    if (!response.ok) {
      const { message } = (body as { error: { message: string } }).error;
      return { kind: "refused", text: `${message} Nothing was changed.` };
    }
    const { lengthM, pointCount, placeCount, snapped } = body as Answer;
    const parts = [
      `${file.name}: ${formatDistance(lengthM, unit)} in ${pointCount} points`,
      placeCount > 0 ? `${placeCount} places` : null,
      snapped > 0 ? `${snapped} camps put on the line` : null,
    ];
    return { kind: "done", text: `${parts.filter((part) => part !== null).join(", ")}.` };
  } catch {
    return { kind: "refused", text: "The file did not get through. Nothing was changed; try again." };
  }
}

/** A GPX file chosen on this device; it takes the place of the line there is. */
export function GpxImport({
  tripId,
  unit,
  isReplacing,
}: {
  readonly tripId: string;
  readonly unit: Preferences["lengthUnit"];
  readonly isReplacing: boolean;
}) {
  const id = useId();
  const router = useRouter();
  const [state, setState] = useState<State>({ kind: "idle" });
  const isBusy = state.kind === "busy";
  const take = async (file: File | undefined) => {
    if (!file) return;
    setState({ kind: "busy", name: file.name });
    const answer = await upload(tripId, file, unit);
    setState(answer);
    if (answer.kind === "done") router.refresh();
  };
  return (
    <div>
      <label
        htmlFor={id}
        className={buttonClass(isReplacing ? "outline" : "primary", "cursor-pointer has-focus-visible:outline-2")}
      >
        {isReplacing ? "Replace by a GPX file" : "Import a GPX file"}
        <input
          id={id}
          type="file"
          accept=".gpx,application/gpx+xml,application/xml,text/xml"
          disabled={isBusy}
          className="sr-only"
          onChange={(event) => {
            const file = event.target.files?.[0];
            // So that the same file can be chosen again after it was mended.
            event.target.value = "";
            void take(file);
          }}
        />
      </label>
      <p role="status" className="mt-2 text-15 text-pencil">
        {state.kind === "busy" && `Reading ${state.name}…`}
        {state.kind === "done" && state.text}
      </p>
      {state.kind === "refused" && (
        <p role="alert" className="mt-2 border-l-4 border-rowan bg-rowan-wash px-4 py-3 text-15">
          {state.text}
        </p>
      )}
    </div>
  );
}
