"use client";

import { QueryClient, QueryClientProvider } from "@tanstack/react-query";
import { lazy, Suspense, useCallback, useMemo, useState } from "react";
import type { Preferences } from "@/lib/domain/preferences";
import type { CampPlanView } from "@/lib/domain/views";
import { Cautions } from "@/components/ui/layout";
import { BoardContext, type BoardContextValue } from "./board-context";
import { BoardDrag } from "./board-drag";
import { BoardHeading } from "./board-heading";
import { BoardNotice } from "./board-notice";
import { BoardToolbar, type OpenPanel } from "./board-toolbar";
import { ConflictDialog } from "./conflict-dialog";
import { placeFromTray } from "./drag-change";
import { KitTray } from "./kit-tray";
import { PhoneSheet } from "./phone-sheet";
import { isSameSpot, type Spot } from "./plan-change";
import { PlanDrawing } from "./plan-drawing";
import { ProposalPanel } from "./proposal-panel";
import { RankedList } from "./ranked-list";
import { ShelterTabs } from "./shelter-tabs";
import type { BoardStart } from "./start-board-view";
import { TieOutDetail } from "./tie-out-detail";
import { useIsWide } from "./use-is-wide";
import { useProposal } from "./use-proposal";
import { useStakingBoard } from "./use-staking-board";
import { VerdictPanel } from "./verdict-panel";

/** Opened seldom, and it brings the kinds of shelter with it. */
const PitchPanel = lazy(() => import("./pitch-panel").then((module) => ({ default: module.PitchPanel })));

export interface StakingBoardProps {
  readonly view: CampPlanView;
  /** Worked out on the server from the same view. */
  readonly start: BoardStart;
  readonly preferences: Preferences;
  /** Whose unsaved changes are kept on this device. */
  readonly userId: string;
}

/** The staking plan of a camp. Needs at least one pitched shelter. */
export function StakingBoard(props: StakingBoardProps) {
  const [client] = useState(() => new QueryClient());
  return (
    <QueryClientProvider client={client}>
      <Board {...props} />
    </QueryClientProvider>
  );
}

function Board({ view, start, preferences, userId }: StakingBoardProps) {
  const board = useStakingBoard(view, start, userId);
  const isWide = useIsWide();
  const [chosenPitchId, setChosenPitchId] = useState<string | null>(board.result.weakest?.pitchId ?? null);
  const [chosen, setChosen] = useState<Spot | null>(board.result.weakest);
  const [armedAnchorId, setArmedAnchorId] = useState<string | null>(null);
  const [isDragging, setIsDragging] = useState(false);
  const [isWindUp, setIsWindUp] = useState(false);
  const [openPanel, setOpenPanel] = useState<OpenPanel>(null);
  const [isSheetOpen, setIsSheetOpen] = useState(false);
  const proposal = useProposal(board);
  const anchors = useMemo(() => new Map(view.tray.map((anchor) => [anchor.id, anchor])), [view.tray]);

  const pitch = board.pitches.find((one) => one.id === chosenPitchId) ?? board.pitches[0];
  const shelter = board.result.shelters.find((one) => one.pitchId === pitch?.id);
  const selected = chosen?.pitchId === pitch?.id ? chosen : null;
  const selectedResult = shelter?.tieOuts.find((one) => isSameSpot(one, selected)) ?? null;
  const model = pitch ? board.models.get(pitch.id) : null;

  const { engine, prepared, state, apply } = board;
  const putAnchor = useCallback(
    (anchorId: string, spot: Spot) => {
      if (!engine || !prepared) return;
      const found = prepared.shelters.find((one) => one.pitch.pitchId === spot.pitchId);
      const number = found?.tieOuts.find((one) => one.tieOut.id === spot.tieOutId)?.tieOut.number;
      const placement = placeFromTray(engine, prepared, state.placements, anchorId, spot);
      const name = prepared.anchors.get(anchorId)?.name ?? "The anchor";
      apply({ type: "place", placement }, `${name} is at tie-out ${number ?? ""} now.`);
    },
    [engine, prepared, state.placements, apply],
  );
  const touchSpot = useCallback(
    (spot: Spot) => {
      if (armedAnchorId) {
        putAnchor(armedAnchorId, spot);
        setArmedAnchorId(null);
      }
      setChosen(spot);
      setIsSheetOpen(true);
    },
    [armedAnchorId, putAnchor],
  );
  const selectPitch = useCallback(
    (pitchId: string) => {
      setChosenPitchId(pitchId);
      const tieOutId = board.result.shelters.find((one) => one.pitchId === pitchId)?.weakestTieOutId;
      setChosen(tieOutId ? { pitchId, tieOutId } : null);
    },
    [board.result.shelters],
  );

  if (!pitch || !shelter) return null;
  const value: BoardContextValue = {
    view,
    groundName: start.groundName,
    preferences,
    board,
    pitch,
    shelter,
    anchors,
    selected,
    selectedResult,
    armedAnchorId,
    arm: setArmedAnchorId,
    touchSpot,
    putAnchor,
    selectPitch,
    isDragging,
  };
  const detail = selectedResult && <TieOutDetail result={selectedResult} />;
  return (
    <BoardContext value={value}>
      <BoardDrag
        board={board}
        shelter={shelter}
        anchors={anchors}
        onDragging={setIsDragging}
        onDropped={(_piece, target) => target.kind === "spot" && setChosen(target.spot)}
      >
        <div className="flex flex-col lg:grid lg:grid-cols-[minmax(0,1fr)_25rem]">
          <div className="contents min-w-0 lg:flex lg:flex-col lg:gap-3 lg:px-7 lg:pt-6 lg:pb-8">
            <div className="contents gap-x-6 gap-y-3 lg:flex lg:flex-wrap lg:items-start lg:justify-between">
              <div className="order-1 px-4 pt-5 sm:px-7 lg:min-w-60 lg:flex-1 lg:p-0">
                <BoardHeading />
              </div>
              <div className="order-4 px-4 pt-4 sm:px-7 lg:p-0">
                <BoardToolbar
                  isWindUp={isWindUp}
                  onWindUp={setIsWindUp}
                  open={openPanel}
                  onOpen={setOpenPanel}
                  proposal={proposal}
                />
              </div>
            </div>
            <div className="order-5 px-4 sm:px-7 lg:order-2 lg:p-0">
              {openPanel === "pitch" && (
                <Suspense fallback={<p className="text-15 text-pencil">One moment…</p>}>
                  <PitchPanel />
                </Suspense>
              )}
              {openPanel === "proposal" && <ProposalPanel proposal={proposal} onClose={() => setOpenPanel(null)} />}
            </div>
            <div className="order-3 flex min-w-0 flex-col gap-3 px-4 sm:px-7 lg:p-0">
              <ShelterTabs />
              <BoardNotice />
              {model && <PlanDrawing key={pitch.id} model={model} isWindUp={isWindUp} />}
            </div>
            <div className="order-6 px-4 py-4 sm:px-7 lg:p-0">
              <KitTray />
            </div>
          </div>
          <div className="contents min-w-0 lg:block lg:border-l lg:border-hair lg:bg-sheet">
            <div className="order-2 px-4 pt-3 pb-3 sm:px-7 lg:px-5 lg:pt-6 lg:pb-4">
              <VerdictPanel />
            </div>
            <div className={`order-7 ${isWide ? "" : isSheetOpen ? "pb-[46dvh]" : "pb-20"}`}>
              <RankedList detail={isWide ? detail : null} />
              <div className="flex flex-col gap-4 px-5 py-6">
                {board.result.retension && <p className="text-15">{board.result.retension}</p>}
                <Cautions />
              </div>
            </div>
          </div>
        </div>
        {!isWide && selectedResult && (
          <PhoneSheet result={selectedResult} isOpen={isSheetOpen} onToggle={setIsSheetOpen}>
            {detail}
          </PhoneSheet>
        )}
      </BoardDrag>
      <ConflictDialog />
    </BoardContext>
  );
}
