"use client";

import { useId, useState } from "react";
import { FieldError } from "@/components/ui/fields";
import { MAX_PHOTO_BYTES, shrinkPhoto, type ChosenPhoto } from "./photo-upload";

/** One photo. It is made small here; where it was taken goes along only when somebody ticks that. */
export function PhotoField({ onChange }: { readonly onChange: (photo: ChosenPhoto | null) => void }) {
  const id = useId();
  const [file, setFile] = useState<File | null>(null);
  const [keepsPosition, setKeepsPosition] = useState(false);
  const [problem, setProblem] = useState("");

  const choose = async (chosen: File | null, keeps: boolean) => {
    setFile(chosen);
    setKeepsPosition(keeps);
    setProblem("");
    onChange(null);
    if (!chosen) return;
    if (keeps && chosen.size > MAX_PHOTO_BYTES) {
      return setProblem("With its position a photo goes as it is, and this one is over 5 MB. Leave the position out.");
    }
    try {
      onChange({ content: keeps ? chosen : await shrinkPhoto(chosen), keepsPosition: keeps });
    } catch {
      setProblem("That is not a photo that this browser can read. JPEG, PNG and WebP work.");
    }
  };

  return (
    <div className="flex flex-col gap-1">
      <label htmlFor={id} className="text-15 font-semibold">
        Photo
      </label>
      <input
        id={id}
        type="file"
        accept="image/jpeg,image/png,image/webp"
        aria-describedby={problem ? `${id}-error` : undefined}
        onChange={(event) => void choose(event.target.files?.[0] ?? null, keepsPosition)}
        className="min-h-11 w-full min-w-0 text-15 file:mr-3 file:min-h-11 file:rounded-field file:border file:border-spruce file:bg-transparent file:px-3 file:font-semibold file:text-spruce"
      />
      {file && (
        <label className="flex min-h-11 items-center gap-3 text-15">
          <input
            type="checkbox"
            checked={keepsPosition}
            onChange={(event) => void choose(file, event.target.checked)}
            className="size-5 shrink-0 accent-spruce"
          />
          Keep where it was taken
        </label>
      )}
      <FieldError id={`${id}-error`} errors={problem ? [problem] : []} />
    </div>
  );
}
