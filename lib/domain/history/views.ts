export interface ChangeEntry {
  readonly id: string;
  readonly at: string;
  readonly byName: string;
  /** "changed the staking plan" */
  readonly what: string;
  readonly summary: string;
}

export interface TripHistory {
  readonly entries: readonly ChangeEntry[];
  /** Everybody who changed something, to choose from. */
  readonly people: readonly { readonly userId: string; readonly name: string }[];
  /** To go on from; null when these are all. */
  readonly olderThan: string | null;
}

/** An earlier staking plan beside the one of now. */
export interface PlanPreview {
  readonly campId: string;
  readonly campName: string;
  readonly version: number;
  readonly currentVersion: number;
  readonly byName: string;
  readonly at: string;
  /** Only tie-outs that differ. */
  readonly rows: readonly {
    readonly key: string;
    readonly where: string;
    readonly now: string;
    readonly then: string;
  }[];
  /** What can't come back: its shelter, tie-out or anchor is not there any more. */
  readonly leftOut: readonly string[];
}
