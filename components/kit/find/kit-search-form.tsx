"use client";

import { useRouter } from "next/navigation";
import { useEffect, useState } from "react";
import { AnchorMark } from "@/components/drawing/anchor-mark";
import { Button } from "@/components/ui/button";
import { MOST_SPARES } from "@/lib/calc/kit/types";
import { readDecimal } from "@/lib/domain/form-data";
import type { KitSearchSettings } from "@/lib/domain/kit/search-schema";
import type { KitCandidateView, KitProgressView, KitSearchView } from "@/lib/domain/kit/search-view";
import { formatMass } from "@/lib/format/masses";
import { joinWords } from "@/lib/format/words";
import { KitProgress } from "./kit-progress";
import { askProgress, startSearch, stopSearch } from "./kit-requests";

const POLL_MS = 700;
const CONTROL = "min-h-11 rounded-field border border-pencil bg-sheet px-3 text-15 disabled:opacity-55";
const GRAMS_PER_KILOGRAM = 1000;

interface KindState {
  readonly isChosen: boolean;
  /** As typed; empty = as many as are needed. */
  readonly most: string;
}

const keyOf = (kind: Pick<KitCandidateView, "source" | "id">) => `${kind.source}:${kind.id}`;
const asTyped = (value: number | null) => (value === null ? "" : String(value));

/** What the kit may be made of, for which camps and on which terms; then the search with its progress. */
export function KitSearchForm({ tripId, view }: { readonly tripId: string; readonly view: KitSearchView }) {
  const router = useRouter();
  const [kinds, setKinds] = useState<Readonly<Record<string, KindState>>>(() =>
    Object.fromEntries(view.candidates.map((one) => [keyOf(one), { isChosen: one.isChosen, most: asTyped(one.most) }])),
  );
  const [camps, setCamps] = useState(() => new Set(view.camps.filter((one) => one.isChosen).map((one) => one.id)));
  const [found, setFound] = useState(() => new Set(view.camps.filter((one) => one.allowFound).map((one) => one.id)));
  const [spares, setSpares] = useState(view.spares);
  const [price, setPrice] = useState(String(Math.round(view.workPriceKg * GRAMS_PER_KILOGRAM)));
  const [allowDoubling, setAllowDoubling] = useState(view.allowDoubling);
  const [progress, setProgress] = useState<KitProgressView>(view.progress);
  const [problems, setProblems] = useState<readonly string[]>([]);

  useEffect(() => {
    if (!progress.isRunning) return;
    const timer = setTimeout(async () => {
      const next = await askProgress(tripId).catch(() => progress);
      setProgress({ ...next });
      if (!next.isRunning) router.refresh();
    }, POLL_MS);
    return () => clearTimeout(timer);
  }, [progress, tripId, router]);

  const readSettings = (): Record<keyof KitSearchSettings, unknown> => {
    const grams = readDecimal(price);
    return {
      kinds: view.candidates.flatMap((one) => {
        const state = kinds[keyOf(one)];
        return state?.isChosen ? [{ source: one.source, id: one.id, most: readDecimal(state.most) }] : [];
      }),
      campIds: view.camps.filter((one) => camps.has(one.id)).map((one) => one.id),
      foundCampIds: view.camps.filter((one) => found.has(one.id) && camps.has(one.id)).map((one) => one.id),
      spares,
      workPriceKg: typeof grams === "number" ? grams / GRAMS_PER_KILOGRAM : grams,
      allowDoubling,
    };
  };
  const start = async () => {
    setProblems([]);
    const answer = await startSearch(tripId, readSettings());
    if (answer.problems.length > 0) setProblems(answer.problems);
    else setProgress({ isRunning: true, progress: null, failure: null });
  };
  const stop = async () => {
    await stopSearch(tripId).catch(() => undefined);
    setProgress(await askProgress(tripId).catch(() => ({ isRunning: false, progress: null, failure: null })));
  };
  const toggle = (set: ReadonlySet<string>, id: string) => {
    const next = new Set(set);
    if (!next.delete(id)) next.add(id);
    return next;
  };
  const setKind = (key: string, part: Partial<KindState>) =>
    setKinds((now) => ({ ...now, [key]: { ...(now[key] ?? { isChosen: false, most: "" }), ...part } }));

  return (
    <form
      onSubmit={(event) => {
        event.preventDefault();
        void start();
      }}
      noValidate
    >
      {(["kit", "gear", "library"] as const).map((source) => {
        const own = view.candidates.filter((one) => one.source === source);
        if (own.length === 0) return null;
        const rows = own.map((one) => (
          <KindRow
            key={keyOf(one)}
            kind={one}
            state={kinds[keyOf(one)]}
            onChange={(part) => setKind(keyOf(one), part)}
          />
        ));
        if (source !== "library") {
          return (
            <fieldset key={source} className="mb-6">
              <legend className="mb-1 text-15 font-semibold">{SOURCES[source]}</legend>
              <ul>{rows}</ul>
            </fieldset>
          );
        }
        return (
          <details key={source} className="mb-6" open={own.some((one) => one.isChosen)}>
            <summary className="flex min-h-11 items-center text-15 font-semibold text-spruce">
              {SOURCES[source]}
            </summary>
            <ul>{rows}</ul>
          </details>
        );
      })}
      <fieldset className="mb-6">
        <legend className="mb-1 text-15 font-semibold">Camps that have to hold</legend>
        {view.camps.length === 0 && <p className="text-15 text-pencil">There is no camp yet.</p>}
        <ul>
          {view.camps.map((camp) => (
            <li key={camp.id} className="border-t border-hair py-1.5">
              <label className="flex min-h-11 items-center gap-3 text-15">
                <input
                  type="checkbox"
                  className="size-5 shrink-0 accent-spruce"
                  checked={camps.has(camp.id)}
                  disabled={camp.gaps.length > 0}
                  onChange={() => setCamps(toggle(camps, camp.id))}
                />
                <span>
                  <span className="font-semibold">{camp.name}</span>
                  {camp.gaps.length > 0 && <span className="block text-13 text-pencil">{camp.gaps.join(" ")}</span>}
                </span>
              </label>
              {camp.foundNames.length > 0 && camp.gaps.length === 0 && (
                <label className="flex min-h-11 items-center gap-3 pl-8 text-15">
                  <input
                    type="checkbox"
                    className="size-5 shrink-0 accent-spruce"
                    checked={found.has(camp.id)}
                    disabled={!camps.has(camp.id)}
                    onChange={() => setFound(toggle(found, camp.id))}
                  />
                  <span>
                    Use what is found at {camp.name}
                    <span className="block text-13 text-pencil">{joinWords(camp.foundNames)}</span>
                  </span>
                </label>
              )}
            </li>
          ))}
        </ul>
      </fieldset>
      <div className="mb-6 grid max-w-[46rem] gap-5 sm:grid-cols-2">
        <label className="flex flex-col gap-1 text-15">
          <span className="font-semibold">Lost or bent on the way</span>
          <select value={spares} onChange={(event) => setSpares(Number(event.target.value))} className={CONTROL}>
            {Array.from({ length: MOST_SPARES + 1 }, (_, count) => (
              <option key={count} value={count}>
                {count === 0 ? "none: no spares" : `any ${count}`}
              </option>
            ))}
          </select>
          <span className="text-13 text-pencil">Every camp can still be staked with the rest.</span>
        </label>
        <label className="flex flex-col gap-1 text-15">
          <span className="font-semibold">Price of work, g</span>
          <input
            value={price}
            inputMode="decimal"
            onChange={(event) => setPrice(event.target.value)}
            className={CONTROL}
          />
          <span className="text-13 text-pencil">
            Carry up to so much rather than do the work of setting one stake. A rock is the work of three, a buried
            thing of six.
          </span>
        </label>
        <label className="flex min-h-11 items-center gap-3 text-15 sm:col-span-2">
          <input
            type="checkbox"
            className="size-5 shrink-0 accent-spruce"
            checked={allowDoubling}
            onChange={(event) => setAllowDoubling(event.target.checked)}
          />
          <span>Two in line where no single anchor holds</span>
        </label>
      </div>
      {problems.length > 0 && (
        <div role="alert" className="mb-4 max-w-[46rem] border-l-4 border-rowan bg-rowan-wash px-4 py-3 text-15">
          {problems.map((problem) => (
            <p key={problem}>{problem}</p>
          ))}
        </div>
      )}
      <div className="flex flex-wrap items-center gap-3">
        <Button type="submit" look="primary" disabled={progress.isRunning}>
          {progress.isRunning ? "Searching…" : "Find the lightest kit"}
        </Button>
        {progress.isRunning && <Button onClick={() => void stop()}>Stop</Button>}
      </div>
      <KitProgress view={progress} />
    </form>
  );
}

const SOURCES = {
  kit: "Anchors of the kit",
  gear: "Your own gear",
  library: "Anchors of the library",
} as const;

function KindRow({
  kind,
  state,
  onChange,
}: {
  readonly kind: KitCandidateView;
  readonly state: KindState | undefined;
  readonly onChange: (part: Partial<KindState>) => void;
}) {
  const isChosen = state?.isChosen ?? false;
  return (
    <li className="flex flex-wrap items-center justify-between gap-x-4 border-t border-hair py-1.5">
      <label className="flex min-h-11 min-w-0 items-center gap-3 text-15">
        <input
          type="checkbox"
          className="size-5 shrink-0 accent-spruce"
          checked={isChosen}
          onChange={(event) => onChange({ isChosen: event.target.checked })}
        />
        <AnchorMark spec={kind.spec} size={28} />
        <span>
          {kind.name} <span className="text-pencil">{formatMass(kind.massKg)}</span>
        </span>
      </label>
      <label className="flex items-center gap-2 pl-8 text-15 sm:pl-0">
        <span className="text-pencil">at most</span>
        <input
          aria-label={`At most so many of ${kind.name}; empty: as many as are needed`}
          inputMode="numeric"
          value={state?.most ?? ""}
          placeholder="any"
          disabled={!isChosen}
          onChange={(event) => onChange({ most: event.target.value })}
          className={`${CONTROL} w-20 text-right`}
        />
      </label>
    </li>
  );
}
