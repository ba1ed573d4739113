"use client";

import { useEffect, useId, useRef } from "react";
import type { ReactNode } from "react";
import { Button } from "./button";

interface DialogProps {
  readonly isOpen: boolean;
  readonly onClose: () => void;
  readonly title: string;
  readonly children: ReactNode;
}

/** A modal sheet: the browser's own dialog, so focus, Escape and the page behind are taken care of. */
export function Dialog({ isOpen, onClose, title, children }: DialogProps) {
  const dialog = useRef<HTMLDialogElement>(null);
  const titleId = useId();
  useEffect(() => {
    const element = dialog.current;
    if (!element) return;
    if (isOpen && !element.open) element.showModal();
    if (!isOpen && element.open) element.close();
  }, [isOpen]);
  return (
    <dialog
      ref={dialog}
      onClose={onClose}
      aria-labelledby={titleId}
      className="m-auto w-[min(34rem,calc(100vw-2rem))] rounded-sheet border border-hair bg-sheet p-6 text-ink shadow-float backdrop:bg-black/40"
    >
      <div className="mb-3 flex items-start justify-between gap-4">
        <h2 id={titleId} className="text-18 font-bold">
          {title}
        </h2>
        <Button look="quiet" onClick={onClose} className="-mt-2 -mr-2">
          Close
        </Button>
      </div>
      {isOpen && children}
    </dialog>
  );
}
