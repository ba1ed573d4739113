"use client";

import { useCallback, useEffect, useMemo, useReducer, useState } from "react";
import { useRouter } from "next/navigation";
import type { Placement, ShelterModel, ShelterSpec } from "@/lib/calc/types";
import { newId } from "@/lib/domain/new-id";
import { toCampInput } from "@/lib/domain/plan/to-camp-input";
import type { PlanChange } from "@/lib/domain/plan/schema";
import type { PitchDetails } from "@/lib/domain/shelter/schema";
import type { CampPlanView } from "@/lib/domain/views";
import { reduceBoard, startBoard, tryChange, type BoardAction, type BoardRules, type BoardState } from "./board-state";
import { createCalcClient } from "./calc-client";
import type { Spot } from "./plan-change";
import type { BoardStart } from "./start-board-view";
import { useCampPitches } from "./use-camp-pitches";
import { useEngine, type Engine } from "./use-engine";
import { usePlanSaving } from "./use-plan-saving";

/** A shelter that can't be built has no drawing; the calculation names the gap. */
function buildOrNull(engine: Engine, spec: ShelterSpec): ShelterModel | null {
  try {
    return engine.buildShelter(spec);
  } catch (error) {
    if (error instanceof RangeError) return null;
    throw error;
  }
}

/** Everything a staking plan on the screen knows and can do. */
export function useStakingBoard(view: CampPlanView, start: BoardStart, userId: string) {
  const router = useRouter();
  const [calc] = useState(createCalcClient);
  useEffect(() => {
    calc.open();
    return () => calc.close();
  }, [calc]);

  const engine = useEngine();

  const isTieOut = useMemo(() => {
    const known = new Map(
      Object.entries(start.models).map(([id, model]) => [id, new Set(model?.tieOuts.map((tieOut) => tieOut.id))]),
    );
    return (pitchId: string, tieOutId: string) => known.get(pitchId)?.has(tieOutId) ?? false;
  }, [start.models]);
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
  const pitched = useCampPitches(view, calc, engine, { onRefused: refuse, onSaved: refresh });
  const { pitches, changePitch } = pitched;
  const scope = { tripId: view.trip.id, campId: view.camp.id };
  const { saving, retry } = usePlanSaving(state, dispatch, scope, userId, refresh);

  const [preview, setPreview] = useState<readonly Placement[] | null>(null);
  const prepared = useMemo(
    () => engine && engine.prepareCamp(toCampInput(view.camp.details, pitches, view.tray, [], view.learned)),
    [engine, view.camp.details, pitches, view.tray, view.learned],
  );
  const shown = preview ?? state.placements;
  const result = useMemo(
    () => (engine && prepared ? engine.evaluatePlacements(prepared, shown) : start.result),
    [engine, prepared, shown, start.result],
  );
  const models = useMemo(
    () =>
      new Map(pitches.map((pitch) => [pitch.id, engine ? buildOrNull(engine, pitch.spec) : start.models[pitch.id]])),
    [engine, pitches, start.models],
  );
  // Without the calculation, the server's numbers stand for the server's plan and for no other.
  const isBehind = !engine && state.placements !== view.placements;
  const waiting = useMemo(
    () => (isBehind ? new Set(pitches.map((pitch) => pitch.id)) : pitched.waiting),
    [isBehind, pitches, pitched.waiting],
  );
  const campInput = useMemo(
    () => toCampInput(view.camp.details, pitches, view.tray, state.placements, view.learned),
    [view.camp.details, pitches, view.tray, state.placements, view.learned],
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
    engine,
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
