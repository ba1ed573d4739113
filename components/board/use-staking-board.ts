"use client";

import { useCallback, useEffect, useMemo, useReducer, useState } from "react";
import { useRouter } from "next/navigation";
import { evaluatePlacements } from "@/lib/calc/camp";
import { prepareCamp } from "@/lib/calc/prepare-camp";
import { buildShelter } from "@/lib/calc/shelter-kinds";
import type { Placement, ShelterModel } from "@/lib/calc/types";
import { newId } from "@/lib/domain/new-id";
import { toCampInput } from "@/lib/domain/plan/to-camp-input";
import type { PlanChange } from "@/lib/domain/plan/schema";
import type { PitchDetails } from "@/lib/domain/shelter/schema";
import type { CampPlanView } from "@/lib/domain/views";
import { reduceBoard, startBoard, tryChange, type BoardAction, type BoardRules, type BoardState } from "./board-state";
import { createCalcClient } from "./calc-client";
import type { Spot } from "./plan-change";
import { useCampPitches } from "./use-camp-pitches";
import { usePlanSaving } from "./use-plan-saving";

/** A shelter that can't be built has no drawing; the calculation names the gap. */
function buildOrNull(spec: Parameters<typeof buildShelter>[0]): ShelterModel | null {
  try {
    return buildShelter(spec);
  } catch (error) {
    if (error instanceof RangeError) return null;
    throw error;
  }
}

/** Everything a staking plan on the screen knows and can do. */
export function useStakingBoard(view: CampPlanView, userId: string) {
  const router = useRouter();
  const [calc] = useState(createCalcClient);
  useEffect(() => () => calc.close(), [calc]);

  const isTieOut = useMemo(() => {
    const known = new Map(
      view.pitches.map((pitch) => [pitch.id, new Set(buildOrNull(pitch.spec)?.tieOuts.map((tieOut) => tieOut.id))]),
    );
    return (pitchId: string, tieOutId: string) => known.get(pitchId)?.has(tieOutId) ?? false;
  }, [view.pitches]);
  const rules: BoardRules = useMemo(
    () => ({ tray: view.tray, shockCordCount: view.shockCordCount, isTieOut }),
    [view.tray, view.shockCordCount, isTieOut],
  );
  const [state, dispatch] = useReducer(
    (before: BoardState, action: BoardAction) => reduceBoard(before, action, rules),
    view,
    startBoard,
  );
  const { placements, planVersion, savedAt, savedByName } = view;
  useEffect(() => {
    dispatch({ type: "reload", placements, planVersion, savedAt, savedByName });
  }, [placements, planVersion, savedAt, savedByName]);

  // The line of nights beside the plan shows this camp's verdict too.
  const refresh = useCallback(() => router.refresh(), [router]);
  const refuse = useCallback(
    (text: string) => {
      dispatch({ type: "say", tone: "refused", text });
      refresh();
    },
    [refresh],
  );
  const { pitches, waiting, changePitch } = useCampPitches(view, calc, { onRefused: refuse, onSaved: refresh });
  const scope = { tripId: view.trip.id, campId: view.camp.id };
  const { saving, retry } = usePlanSaving(state, dispatch, scope, userId, refresh);

  const [preview, setPreview] = useState<readonly Placement[] | null>(null);
  const prepared = useMemo(
    () => prepareCamp(toCampInput(view.camp.details, pitches, view.tray, [])),
    [view.camp.details, pitches, view.tray],
  );
  const saved = useMemo(() => evaluatePlacements(prepared, state.placements), [prepared, state.placements]);
  const result = useMemo(() => (preview ? evaluatePlacements(prepared, preview) : saved), [prepared, preview, saved]);
  const models = useMemo(() => new Map(pitches.map((pitch) => [pitch.id, buildOrNull(pitch.spec)])), [pitches]);
  const campInput = useMemo(
    () => toCampInput(view.camp.details, pitches, view.tray, state.placements),
    [view.camp.details, pitches, view.tray, state.placements],
  );

  const apply = useCallback(
    (change: PlanChange, done?: string) =>
      dispatch({ type: "change", change, intentId: newId(), ...(done ? { done } : {}) }),
    [],
  );
  const showPreview = useCallback(
    (change: PlanChange | null) => {
      if (!change) return setPreview(null);
      const next = tryChange(state.placements, change, rules);
      setPreview(next.ok ? next.placements : null);
    },
    [state.placements, rules],
  );
  const repitch = useCallback(
    (pitchId: string, details: PitchDetails) => {
      const pitch = pitches.find((one) => one.id === pitchId);
      if (!pitch) return;
      dispatch({ type: "pitch-changed", pitchId, before: pitch.details });
      changePitch(pitchId, details);
    },
    [pitches, changePitch],
  );
  const travel = useCallback(
    (type: "undo" | "redo") => {
      const target = (type === "undo" ? state.past : state.future).at(-1);
      if (target?.kind !== "pitch") return dispatch({ type, intentId: newId() });
      const pitch = pitches.find((one) => one.id === target.pitchId);
      if (!pitch) return;
      dispatch({ type, intentId: newId(), pitchDetails: pitch.details });
      changePitch(target.pitchId, target.details);
    },
    [state.past, state.future, pitches, changePitch],
  );

  return {
    state,
    dispatch,
    calc,
    pitches,
    waiting,
    models,
    prepared,
    result,
    isPreview: preview !== null,
    campInput,
    saving,
    retry,
    apply,
    showPreview,
    repitch,
    undo: () => travel("undo"),
    redo: () => travel("redo"),
  };
}

export type StakingBoardModel = ReturnType<typeof useStakingBoard>;
export type { Spot };
