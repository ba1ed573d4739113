"use client";

import { useId, useState } from "react";
import { Button } from "@/components/ui/button";
import { parsePosition, type ParsedPosition } from "@/lib/calc/places/parse-position";
import type { LatLon } from "@/lib/calc/places/utm";

/** Six decimals of a degree are a hand's breadth. */
const DIGITS = 6;

function describe({ kind, sideM }: ParsedPosition): string {
  if (kind === "degrees") return "Read as degrees. Save to keep it.";
  if (kind === "utm") return "Read as UTM, WGS 84. Save to keep it.";
  const square = sideM >= 1000 ? `${sideM / 1000} km` : `${sideM} m`;
  const middle = sideM > 1 ? `: the middle of its square of ${square}` : "";
  return `Read as a grid reference${middle}. Save to keep it.`;
}

/** A position as it stands on a map or a device, turned into latitude and longitude. */
export function PositionEntry({ onFound }: { readonly onFound: (place: LatLon) => void }) {
  const id = useId();
  const [typed, setTyped] = useState("");
  const [answer, setAnswer] = useState<{ readonly text: string; readonly isProblem: boolean } | null>(null);
  const read = () => {
    const parsed = parsePosition(typed);
    if ("problem" in parsed) return setAnswer({ text: parsed.problem, isProblem: true });
    const { latitude, longitude } = parsed.place;
    onFound({ latitude: Number(latitude.toFixed(DIGITS)), longitude: Number(longitude.toFixed(DIGITS)) });
    setAnswer({ text: describe(parsed), isProblem: false });
  };
  return (
    <div className="mb-5 max-w-[40rem]">
      <label htmlFor={id} className="text-15 font-semibold">
        From a map or device
      </label>
      <div className="mt-1 flex gap-2">
        <input
          id={id}
          value={typed}
          autoComplete="off"
          aria-describedby={`${id}-hint`}
          aria-invalid={answer?.isProblem || undefined}
          onChange={(event) => setTyped(event.target.value)}
          onKeyDown={(event) => {
            if (event.key !== "Enter") return;
            // Enter reads the position; it does not send the whole form.
            event.preventDefault();
            read();
          }}
          className="min-h-11 w-full min-w-0 rounded-field border border-pencil bg-sheet px-3 py-2 text-15 text-ink aria-[invalid]:border-rowan"
        />
        <Button onClick={read}>Read</Button>
      </div>
      <p id={`${id}-hint`} className="mt-1 text-13 text-pencil">
        Degrees (61.93, 8.72), UTM (32V 485361 6866520) or a grid reference (32V MP 85361 66520).
      </p>
      <p role="status" className={`text-13 font-semibold ${answer?.isProblem ? "text-rowan" : "text-spruce"}`}>
        {answer?.text}
      </p>
    </div>
  );
}
