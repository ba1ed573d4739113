"use client";

import { useEffect, useRef, useState } from "react";
import { Button } from "@/components/ui/button";
import { IDLE, type ActionState } from "@/lib/domain/action-state";

const MOST = 500;
/** Several quick presses become one save. */
const PAUSE_MS = 450;

type Counted = ActionState<{ readonly version: number }>;
export type SaveCount = (state: Counted, input: object) => Promise<Counted>;

/** One fewer, one more; never below zero. What could not be saved goes back and says why. */
export function CountStepper({
  name,
  count: savedCount,
  version,
  ids,
  action,
}: {
  readonly name: string;
  readonly count: number;
  readonly version: number;
  /** Go along with the count and the version. */
  readonly ids: Readonly<Record<string, string>>;
  readonly action: SaveCount;
}) {
  const [count, setCount] = useState(savedCount);
  const [status, setStatus] = useState("");
  const [isRefused, setIsRefused] = useState(false);
  const known = useRef({ count: savedCount, version });
  const timer = useRef<ReturnType<typeof setTimeout>>(undefined);
  const isBusy = useRef(false);
  const wanted = useRef(savedCount);

  useEffect(() => {
    if (version <= known.current.version) return;
    known.current = { count: savedCount, version };
    if (!isBusy.current && !timer.current) {
      wanted.current = savedCount;
      setCount(savedCount);
    }
  }, [savedCount, version]);

  const flush = async () => {
    timer.current = undefined;
    if (isBusy.current) return;
    isBusy.current = true;
    setStatus("Saving…");
    try {
      while (wanted.current !== known.current.count) {
        const next = wanted.current;
        const answer = await action(IDLE, { ...ids, count: next, version: known.current.version });
        if (answer.status !== "done") {
          setCount(known.current.count);
          wanted.current = known.current.count;
          setIsRefused(true);
          setStatus(answer.status === "refused" ? answer.formError : "");
          return;
        }
        known.current = { count: next, version: answer.data.version };
      }
      setStatus("Saved.");
    } catch {
      setIsRefused(true);
      setStatus("Not saved: no connection. Press again to retry.");
    } finally {
      isBusy.current = false;
    }
  };
  const step = (by: number) => {
    const next = Math.min(MOST, Math.max(0, count + by));
    setCount(next);
    setIsRefused(false);
    setStatus("Not saved yet.");
    wanted.current = next;
    clearTimeout(timer.current);
    timer.current = setTimeout(() => void flush(), PAUSE_MS);
  };

  return (
    <div role="group" aria-label={`Count of ${name}`}>
      <div className="inline-flex items-center">
        <Button
          look="quiet"
          className="w-11 text-18"
          aria-label={`One fewer ${name}`}
          disabled={count === 0}
          onClick={() => step(-1)}
        >
          −
        </Button>
        <output className="min-w-9 text-center text-18 font-bold">{count}</output>
        <Button
          look="quiet"
          className="w-11 text-18"
          aria-label={`One more ${name}`}
          disabled={count === MOST}
          onClick={() => step(1)}
        >
          +
        </Button>
      </div>
      <p
        role="status"
        className={`max-w-56 text-13 ${status === "" ? "sr-only" : ""} ${isRefused ? "font-semibold text-rowan" : "text-pencil"}`}
      >
        {status}
      </p>
    </div>
  );
}
