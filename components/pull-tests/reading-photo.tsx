"use client";

import Image from "next/image";
import { useRouter } from "next/navigation";
import { useState } from "react";
import { Button } from "@/components/ui/button";
import { PhotoField } from "./photo-field";
import { uploadPhoto, type ChosenPhoto } from "./photo-upload";

/** The photo of a reading: looked at, replaced, taken away. */
export function ReadingPhoto({
  pullTestId,
  hasPhoto,
  alt,
}: {
  readonly pullTestId: string;
  readonly hasPhoto: boolean;
  readonly alt: string;
}) {
  const router = useRouter();
  const [round, setRound] = useState(0);
  const [photo, setPhoto] = useState<ChosenPhoto | null>(null);
  const [words, setWords] = useState("");
  const [isBusy, setIsBusy] = useState(false);
  const address = `/api/pull-tests/${pullTestId}/photo`;

  const finish = (problem: string | null, done: string) => {
    setIsBusy(false);
    setWords(problem ?? done);
    if (problem) return;
    setPhoto(null);
    setRound((count) => count + 1);
    router.refresh();
  };
  const send = async () => {
    if (!photo) return;
    setIsBusy(true);
    finish(await uploadPhoto(pullTestId, photo), "The photo is saved.");
  };
  const remove = async () => {
    setIsBusy(true);
    const isGone = await fetch(address, { method: "DELETE" }).then(
      (answer) => answer.ok,
      () => false,
    );
    finish(isGone ? null : "The photo could not be deleted. Try again.", "The photo is deleted.");
  };

  return (
    <div className="flex max-w-[26rem] flex-col items-start gap-3">
      {hasPhoto && (
        <>
          <Image
            src={`${address}?round=${round}`}
            alt={alt}
            width={416}
            height={312}
            className="h-auto max-w-full rounded-sheet border border-hair"
          />
          <Button look="danger" disabled={isBusy} onClick={() => void remove()}>
            Delete the photo
          </Button>
        </>
      )}
      <PhotoField key={round} onChange={setPhoto} />
      {photo && (
        <Button look="primary" disabled={isBusy} onClick={() => void send()}>
          {hasPhoto ? "Replace the photo" : "Save the photo"}
        </Button>
      )}
      <p role="status" className={words ? "text-15" : "sr-only"}>
        {words}
      </p>
    </div>
  );
}
