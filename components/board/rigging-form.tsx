"use client";

import Link from "next/link";
import { useId, useState } from "react";
import type { ReactNode } from "react";
import { KNOTS } from "@/lib/calc/tables/lines";
import type { Placement, TrayAnchor } from "@/lib/calc/types";
import { formatLean } from "@/lib/format/angles";
import { lengthFromUnit } from "@/lib/format/lengths";
import { isDriven } from "./anchor-kind";
import { useBoard } from "./board-context";
import { CommitNumber } from "./commit-number";
import { useIsWide } from "./use-is-wide";

const CONTROL = "min-h-11 w-full min-w-0 rounded-field border border-pencil bg-sheet px-2 text-15";

/** How one anchor is rigged: lean, depth, second in line, rock, shock cord, knot, and the line itself. */
export function RiggingForm({ placement, anchor }: { readonly placement: Placement; readonly anchor: TrayAnchor }) {
  const { view, board, preferences } = useBoard();
  const isWide = useIsWide();
  const put = (change: Partial<Placement>) => board.apply({ type: "place", placement: { ...placement, ...change } });
  const canLean = isDriven(anchor.spec);
  const { left } = board.result;
  const seconds = view.tray.filter(
    (one) => isDriven(one.spec) && ((left[one.id] ?? 0) > 0 || one.id === placement.tandem?.anchorId),
  );
  const pitch = board.pitches.find((one) => one.id === placement.pitchId);
  const tieOut = board.models.get(placement.pitchId)?.tieOuts.find((one) => one.id === placement.tieOutId);
  const perMetre = 1 / lengthFromUnit(1, preferences.lengthUnit);
  return (
    <details open={isWide}>
      <summary className="min-h-11 content-center text-15 font-semibold">Rigging</summary>
      <div className="grid grid-cols-[repeat(auto-fill,minmax(min(100%,9rem),1fr))] gap-x-4 gap-y-3">
        {canLean && <LeanField placement={placement} onCommit={(leanDeg) => put({ leanDeg })} />}
        {canLean && (
          <CommitNumber
            label="Left out of the ground, mm"
            value={Math.round(placement.depthOutM * 1000)}
            min={0}
            max={1500}
            onCommit={(mm) => put({ depthOutM: mm / 1000 })}
          />
        )}
        {canLean && (
          <Field label="Second in line">
            {(id) => (
              <select
                id={id}
                className={CONTROL}
                value={placement.tandem?.anchorId ?? ""}
                onChange={(event) => {
                  const second = seconds.find((one) => one.id === event.target.value);
                  const { engine } = board;
                  if (!engine) return;
                  put({
                    tandem: second
                      ? { anchorId: second.id, spacingM: engine.tandemSpacingM(anchor.spec, second.spec) }
                      : null,
                  });
                }}
              >
                <option value="">None</option>
                {seconds.map((one) => (
                  <option key={one.id} value={one.id}>
                    {one.name}
                  </option>
                ))}
              </select>
            )}
          </Field>
        )}
        {canLean && placement.tandem && (
          <CommitNumber
            label="Behind it by, mm"
            value={Math.round(placement.tandem.spacingM * 1000)}
            min={20}
            max={3000}
            onCommit={(mm) => placement.tandem && put({ tandem: { ...placement.tandem, spacingM: mm / 1000 } })}
          />
        )}
        {canLean && (view.camp.details.hasRocks || placement.rockKg > 0) && (
          <CommitNumber
            label="Rock on it, kg"
            value={placement.rockKg}
            min={0}
            max={200}
            onCommit={(rockKg) => put({ rockKg })}
          />
        )}
        <Field label="Knot">
          {(id) => (
            <select
              id={id}
              className={CONTROL}
              value={placement.knot}
              onChange={(event) => {
                const knot = KNOTS.find((one) => one.id === event.target.value);
                if (knot) put({ knot: knot.id });
              }}
            >
              {KNOTS.map((knot) => (
                <option key={knot.id} value={knot.id}>
                  {knot.name}
                </option>
              ))}
            </select>
          )}
        </Field>
        <Link
          href={`/knots#${placement.knot}`}
          className="inline-flex min-h-11 items-center self-end text-15 font-semibold text-spruce hover:underline"
        >
          How to tie it
        </Link>
        {pitch && tieOut && (
          <CommitNumber
            label={`Line, ${preferences.lengthUnit}`}
            value={Number((tieOut.lineLengthM * perMetre).toFixed(2))}
            min={0}
            max={30 * perMetre}
            onCommit={(length) =>
              board.repitch(pitch.id, {
                ...pitch.details,
                lineLengthsM: {
                  ...pitch.details.lineLengthsM,
                  [tieOut.id]: lengthFromUnit(length, preferences.lengthUnit),
                },
              })
            }
          />
        )}
        <label className="flex min-h-11 items-center gap-2 self-end text-15">
          <input
            type="checkbox"
            className="size-5 accent-spruce"
            checked={placement.shockCord}
            onChange={(event) => put({ shockCord: event.target.checked })}
          />
          Shock cord
        </label>
      </div>
    </details>
  );
}

function Field({ label, children }: { readonly label: string; readonly children: (id: string) => ReactNode }) {
  const id = useId();
  return (
    <div className="flex min-w-0 flex-col gap-1">
      <label htmlFor={id} className="text-13 text-pencil">
        {label}
      </label>
      {children(id)}
    </div>
  );
}

/** The margins follow while the slider moves; the change is made when it is let go. */
function LeanField({
  placement,
  onCommit,
}: {
  readonly placement: Placement;
  readonly onCommit: (leanDeg: number) => void;
}) {
  const { board } = useBoard();
  const id = useId();
  const [draft, setDraft] = useState<number | null>(null);
  const leanDeg = draft ?? placement.leanDeg;
  const commit = () => {
    board.showPreview(null);
    if (draft !== null && draft !== placement.leanDeg) onCommit(draft);
    setDraft(null);
  };
  return (
    <div className="col-span-full flex min-w-0 flex-col gap-1">
      <label htmlFor={id} className="text-13 text-pencil">
        Lean: <span className="font-semibold text-ink">{formatLean(leanDeg)}</span>
      </label>
      <input
        id={id}
        type="range"
        min={-10}
        max={60}
        step={5}
        value={leanDeg}
        aria-valuetext={formatLean(leanDeg)}
        onChange={(event) => {
          const next = event.target.valueAsNumber;
          setDraft(next);
          board.showPreview({ type: "place", placement: { ...placement, leanDeg: next } });
        }}
        onPointerUp={commit}
        onKeyUp={commit}
        onBlur={commit}
        className="h-11 w-full accent-spruce"
      />
    </div>
  );
}
