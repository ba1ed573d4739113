"use client";

import { useRef, useState, type ReactNode } from "react";
import { ActionForm, SubmitButton, type FormAction } from "@/components/ui/action-form";
import type { AnchorChoice } from "@/lib/domain/pull-test/views";
import { newId } from "@/lib/domain/new-id";
import { PhotoField } from "./photo-field";
import { uploadPhoto, type ChosenPhoto } from "./photo-upload";
import { PullFields, type PullStart } from "./pull-fields";

interface PullFormProps {
  readonly action: FormAction<{ pullTestId: string }>;
  /** Trip and camp; empty in the practice field. */
  readonly values: Readonly<Record<string, string>>;
  /** Of the first reading; each further one gets its own, so that nothing is logged twice. */
  readonly firstId: string;
  readonly anchors: readonly AnchorChoice[];
  readonly start: PullStart;
  /** Which ground it is: a patch of the camp, or the whole ground in the practice field. */
  readonly children?: ReactNode;
}

/** The set-up of the pull that was just logged, with an empty reading, for the next one. */
function keepSetUp(form: HTMLFormElement, start: PullStart): PullStart {
  const sent = new FormData(form);
  const text = (name: string) => String(sent.get(name) ?? "");
  const number = (name: string) => (text(name) === "" ? null : Number(text(name).replace(",", ".")));
  const unit = text("reading.forceUnit");
  return {
    anchorId: text("anchorId"),
    leanDeg: number("reading.leanDeg:number"),
    lineAngleDeg: number("reading.lineAngleDeg:number"),
    depthOutM: (number("reading.depthOutM:number") ?? 0) / 100,
    forceUnit: unit === "kgf" || unit === "lbf" || unit === "N" ? unit : start.forceUnit,
    wetness: text("reading.wetness"),
    force: null,
    outcome: null,
    note: "",
  };
}

/** Logs one pull after another: what stays the same stays, the reading starts empty again. */
export function PullForm({ action, values, firstId, anchors, start, children }: PullFormProps) {
  const box = useRef<HTMLDivElement>(null);
  const [next, setNext] = useState({ pullTestId: firstId, start, round: 0 });
  const [photo, setPhoto] = useState<ChosenPhoto | null>(null);
  const [photoState, setPhotoState] = useState("");

  const finish = async (saved: string) => {
    const form = box.current?.closest("form");
    setNext(({ start: before, round }) => ({
      pullTestId: newId(),
      start: form ? keepSetUp(form, before) : before,
      round: round + 1,
    }));
    setPhoto(null);
    if (!photo) return setPhotoState("");
    setPhotoState("Sending the photo…");
    const problem = await uploadPhoto(saved, photo);
    setPhotoState(problem ? `The reading is saved, the photo is not: ${problem}` : "The photo is saved.");
  };

  return (
    <ActionForm action={action} onDone={(data) => void finish(data.pullTestId)}>
      {Object.entries(values).map(([name, value]) => (
        <input key={name} type="hidden" name={name} value={value} />
      ))}
      <input type="hidden" name="pullTestId" value={next.pullTestId} />
      <div ref={box} className="flex flex-col gap-4">
        {children}
        <div key={next.round} className="flex flex-col gap-4">
          <PullFields anchors={anchors} start={next.start} isNew />
          <PhotoField onChange={setPhoto} />
        </div>
        <div>
          <SubmitButton>Log this pull</SubmitButton>
        </div>
      </div>
      <p role="status" className={photoState ? "mt-3 text-15" : "sr-only"}>
        {photoState}
      </p>
    </ActionForm>
  );
}
