"use client";

import { createContext, useContext } from "react";
import type { ShelterResult, TieOutResult, TrayAnchor } from "@/lib/calc/types";
import type { Preferences } from "@/lib/domain/preferences";
import type { CampPlanView, PitchView } from "@/lib/domain/views";
import type { Spot } from "./plan-change";
import type { StakingBoardModel } from "./use-staking-board";

export interface BoardContextValue {
  readonly view: CampPlanView;
  readonly groundName: string | null;
  readonly preferences: Preferences;
  readonly board: StakingBoardModel;
  /** The shelter that is shown. */
  readonly pitch: PitchView;
  readonly shelter: ShelterResult;
  readonly anchors: ReadonlyMap<string, TrayAnchor>;
  readonly selected: Spot | null;
  readonly selectedResult: TieOutResult | null;
  /** Picked up by a tap: the next tie-out that is tapped gets it. */
  readonly armedAnchorId: string | null;
  readonly arm: (anchorId: string | null) => void;
  /** A tap on a tie-out: puts down what is picked up, or selects. */
  readonly touchSpot: (spot: Spot) => void;
  readonly putAnchor: (anchorId: string, spot: Spot) => void;
  readonly selectPitch: (pitchId: string) => void;
  readonly isDragging: boolean;
}

export const BoardContext = createContext<BoardContextValue | null>(null);

export function useBoard(): BoardContextValue {
  const value = useContext(BoardContext);
  if (!value) throw new Error("Parts of the staking plan stand inside it.");
  return value;
}
