import type { Placement, TrayAnchor } from "@/lib/calc/types";
import { findShockCordFault } from "@/lib/domain/plan/count-shock-cords";
import { applyPlanChange } from "@/lib/domain/plan/reduce";
import type { PlanChange, PlanIntent } from "@/lib/domain/plan/schema";
import type { PitchDetails } from "@/lib/domain/shelter/schema";
import type { PlanSaveResult } from "@/lib/domain/views";
import { changeBetween } from "./plan-change";

/** What the plan has to obey; the server judges by the same rules. */
export interface BoardRules {
  readonly tray: readonly TrayAnchor[];
  readonly shockCordCount: number;
  readonly isTieOut: (pitchId: string, tieOutId: string) => boolean;
}

/** One step that can be taken back. */
export type Step =
  | { readonly kind: "plan"; readonly placements: readonly Placement[] }
  | { readonly kind: "pitch"; readonly pitchId: string; readonly details: PitchDetails };

export interface Notice {
  readonly tone: "refused" | "done";
  readonly text: string;
  /** Lets the same words be said again. */
  readonly count: number;
}

export interface Conflict {
  readonly by: string;
  readonly at: string;
  readonly changes: readonly string[];
  readonly theirs: readonly Placement[];
}

export interface BoardState {
  readonly placements: readonly Placement[];
  readonly past: readonly Step[];
  readonly future: readonly Step[];
  /** Changes that the server has not answered yet, in order. */
  readonly pending: readonly PlanIntent[];
  readonly planVersion: number;
  readonly savedAt: string | null;
  readonly savedByName: string | null;
  readonly notice: Notice | null;
  readonly conflict: Conflict | null;
}

export type BoardAction =
  | { readonly type: "change"; readonly change: PlanChange; readonly intentId: string; readonly done?: string }
  | { readonly type: "undo" | "redo"; readonly intentId: string; readonly pitchDetails?: PitchDetails }
  | { readonly type: "pitch-changed"; readonly pitchId: string; readonly before: PitchDetails }
  | { readonly type: "saved"; readonly result: PlanSaveResult }
  | { readonly type: "restore"; readonly pending: readonly PlanIntent[] }
  | {
      readonly type: "reload";
      readonly placements: readonly Placement[];
      readonly planVersion: number;
      readonly savedAt: string | null;
      readonly savedByName: string | null;
    }
  | { readonly type: "take-theirs" }
  | { readonly type: "keep-mine"; readonly intentId: string }
  | { readonly type: "say"; readonly tone: Notice["tone"]; readonly text: string }
  | { readonly type: "hush" };

export function startBoard(view: {
  readonly placements: readonly Placement[];
  readonly planVersion: number;
  readonly savedAt: string | null;
  readonly savedByName: string | null;
}): BoardState {
  const { placements, planVersion, savedAt, savedByName } = view;
  return {
    placements,
    planVersion,
    savedAt,
    savedByName,
    past: [],
    future: [],
    pending: [],
    notice: null,
    conflict: null,
  };
}

/** Why a plan can't be changed so, or the plan after it. */
export function tryChange(placements: readonly Placement[], change: PlanChange, rules: BoardRules) {
  const next = applyPlanChange(placements, change, rules.tray, rules.isTieOut);
  if (!next.ok) return next;
  const reason = findShockCordFault(next.placements, rules.shockCordCount);
  return reason === null ? next : { ok: false as const, reason };
}

export function reduceBoard(state: BoardState, action: BoardAction, rules: BoardRules): BoardState {
  switch (action.type) {
    case "change":
      return change(state, action.change, action.intentId, rules, action.done);
    case "undo":
    case "redo":
      return step(state, action, rules);
    case "pitch-changed": {
      const taken: Step = { kind: "pitch", pitchId: action.pitchId, details: action.before };
      return { ...state, past: [...state.past, taken], future: [] };
    }
    case "saved":
      return takeAnswer(state, action.result, rules);
    case "restore": {
      const placements = replay(state.placements, action.pending, rules);
      return { ...state, placements, pending: [...action.pending, ...state.pending] };
    }
    case "reload":
      if (state.pending.length > 0 || state.conflict || action.planVersion <= state.planVersion) return state;
      return {
        ...state,
        placements: action.placements,
        planVersion: action.planVersion,
        savedAt: action.savedAt,
        savedByName: action.savedByName,
      };
    case "take-theirs":
      if (!state.conflict) return state;
      return {
        ...state,
        past: [...state.past, { kind: "plan", placements: state.placements }],
        future: [],
        placements: state.conflict.theirs,
        conflict: null,
      };
    case "keep-mine":
      return keepMine(state, action.intentId);
    case "say":
      return say(state, action.tone, action.text);
    case "hush":
      return { ...state, notice: null };
  }
}

function say(state: BoardState, tone: Notice["tone"], text: string): BoardState {
  return { ...state, notice: { tone, text, count: (state.notice?.count ?? 0) + 1 } };
}

function change(state: BoardState, wanted: PlanChange, intentId: string, rules: BoardRules, done?: string): BoardState {
  const next = tryChange(state.placements, wanted, rules);
  if (!next.ok) return say(state, "refused", next.reason);
  const changed: BoardState = {
    ...state,
    placements: next.placements,
    past: [...state.past, { kind: "plan", placements: state.placements }],
    future: [],
    pending: [...state.pending, { intentId, baseVersion: state.planVersion, change: wanted }],
    notice: null,
  };
  return done ? say(changed, "done", done) : changed;
}

function step(
  state: BoardState,
  action: Extract<BoardAction, { type: "undo" | "redo" }>,
  rules: BoardRules,
): BoardState {
  const isUndo = action.type === "undo";
  const from = isUndo ? state.past : state.future;
  const target = from.at(-1);
  if (!target) return state;
  const rest = from.slice(0, -1);
  const withStacks = (next: BoardState, back: Step): BoardState => ({
    ...next,
    past: isUndo ? rest : [...state.past, back],
    future: isUndo ? [...state.future, back] : rest,
  });
  if (target.kind === "pitch") {
    if (!action.pitchDetails) return state;
    return withStacks(state, { kind: "pitch", pitchId: target.pitchId, details: action.pitchDetails });
  }
  const wanted = changeBetween(state.placements, target.placements);
  const back: Step = { kind: "plan", placements: state.placements };
  if (!wanted) return withStacks(state, back);
  const next = tryChange(state.placements, wanted, rules);
  // What the step used may be gone from the tray by now.
  if (!next.ok) return say(state, "refused", next.reason);
  const pending = [...state.pending, { intentId: action.intentId, baseVersion: state.planVersion, change: wanted }];
  return withStacks({ ...state, placements: next.placements, pending, notice: null }, back);
}

function takeAnswer(state: BoardState, result: PlanSaveResult, rules: BoardRules): BoardState {
  const answered = new Set(result.outcomes.map((one) => one.intentId));
  const rest = state.pending.filter((intent) => !answered.has(intent.intentId));
  const saved = {
    ...state,
    pending: rest,
    planVersion: result.planVersion,
    savedAt: result.savedAt,
    savedByName: result.savedByName,
  };
  const conflicts = result.outcomes.filter((one) => one.outcome === "conflict");
  const last = conflicts.at(-1);
  if (last) {
    const changes = [...new Set(conflicts.flatMap((one) => one.changes))];
    // What came after is part of "mine" already, so nothing is sent until the person has chosen.
    return { ...saved, pending: [], conflict: { by: last.by, at: last.at, changes, theirs: result.placements } };
  }
  const refused = result.outcomes.find((one) => one.outcome === "refused");
  const next = { ...saved, placements: replay(result.placements, rest, rules) };
  return refused ? say(next, "refused", refused.reason) : next;
}

function replay(
  placements: readonly Placement[],
  intents: readonly PlanIntent[],
  rules: BoardRules,
): readonly Placement[] {
  return intents.reduce((plan, intent) => {
    const next = tryChange(plan, intent.change, rules);
    return next.ok ? next.placements : plan;
  }, placements);
}

function keepMine(state: BoardState, intentId: string): BoardState {
  if (!state.conflict) return state;
  const wanted = changeBetween(state.conflict.theirs, state.placements);
  const pending = wanted ? [{ intentId, baseVersion: state.planVersion, change: wanted }] : [];
  return {
    ...state,
    past: [...state.past, { kind: "plan", placements: state.conflict.theirs }],
    future: [],
    pending,
    conflict: null,
  };
}
