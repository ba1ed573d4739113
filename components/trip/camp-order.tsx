"use client";

import Link from "next/link";
import { useOptimistic, useRef, useState, useTransition, type ReactNode } from "react";
import { Button } from "@/components/ui/button";
import { IDLE, type ActionState } from "@/lib/domain/action-state";

export interface OrderedCamp {
  readonly id: string;
  readonly name: string;
  readonly detail: string;
  /** Copy and delete, made by the page. */
  readonly actions: ReactNode;
}

/** The camps in order; two buttons move one up or down, and the new order is saved at once. */
export function CampOrder({
  tripId,
  camps,
  action,
}: {
  readonly tripId: string;
  readonly camps: readonly OrderedCamp[];
  readonly action: (state: ActionState, order: object) => Promise<ActionState>;
}) {
  const [order, setOrder] = useOptimistic(camps);
  const [isSaving, startSaving] = useTransition();
  const [message, setMessage] = useState("");
  const list = useRef<HTMLOListElement>(null);

  const move = (index: number, by: -1 | 1) => {
    const next = [...order];
    const [camp] = next.splice(index, 1);
    if (!camp) return;
    next.splice(index + by, 0, camp);
    startSaving(async () => {
      setOrder(next);
      const answer = await action(IDLE, { tripId, campIds: next.map((one) => one.id) });
      setMessage(
        answer.status === "refused" ? answer.formError : `${camp.name} is now ${index + by + 1} of ${next.length}.`,
      );
      // The button that was pressed may now be at the end of the list and off; the camp keeps the focus.
      list.current?.querySelector<HTMLElement>(`[data-camp="${camp.id}"] a`)?.focus();
    });
  };

  return (
    <>
      <p role="status" className="mb-2 min-h-6 text-15 text-pencil">
        {isSaving ? "Saving the order…" : message}
      </p>
      <ol ref={list}>
        {order.map((camp, index) => (
          <li
            key={camp.id}
            data-camp={camp.id}
            className="grid grid-cols-[auto_minmax(0,1fr)] items-center gap-x-4 gap-y-2 border-t border-hair py-3 sm:grid-cols-[auto_minmax(0,1fr)_auto]"
          >
            <span className="flex gap-1">
              <Button
                look="quiet"
                className="w-11"
                disabled={index === 0 || isSaving}
                aria-label={`Move ${camp.name} up`}
                onClick={() => move(index, -1)}
              >
                <Arrow isUp />
              </Button>
              <Button
                look="quiet"
                className="w-11"
                disabled={index === order.length - 1 || isSaving}
                aria-label={`Move ${camp.name} down`}
                onClick={() => move(index, 1)}
              >
                <Arrow isUp={false} />
              </Button>
            </span>
            <span className="min-w-0">
              <Link
                href={`/trips/${tripId}/camps/${camp.id}/place`}
                className="font-bold hover:text-spruce hover:underline"
              >
                {camp.name}
              </Link>
              <span className="block text-13 text-pencil">{camp.detail}</span>
            </span>
            <span className="col-span-2 flex flex-wrap gap-2 sm:col-span-1">{camp.actions}</span>
          </li>
        ))}
      </ol>
    </>
  );
}

function Arrow({ isUp }: { readonly isUp: boolean }) {
  return (
    <svg
      width="16"
      height="16"
      viewBox="0 0 16 16"
      aria-hidden="true"
      fill="none"
      stroke="currentColor"
      strokeWidth="2"
    >
      <path d={isUp ? "M8 14V3M3.5 7.5 8 3l4.5 4.5" : "M8 2v11M3.5 8.5 8 13l4.5-4.5"} strokeLinecap="round" />
    </svg>
  );
}
