/** One thing of the group's that is carried: a shelter or a part of it, a kind of anchor or cord, something of its own. */
export interface LoadPieceView {
  /** "shelter:<id>", "fly:<id>", "poles:<id>", "kit:<id>", "thing:<id>". */
  readonly key: string;
  readonly name: string;
  /** Null: nobody has weighed it. */
  readonly massKgEach: number | null;
  readonly count: number;
  /** Only these may carry it; null = anybody. */
  readonly carrierIds: readonly string[] | null;
}

export interface LoadShareView {
  readonly key: string;
  readonly personId: string;
  readonly count: number;
  readonly isFixed: boolean;
}

export interface LoadPersonView {
  readonly id: string;
  readonly name: string;
  /** Own things; null = not said. */
  readonly baseMassKg: number | null;
  /** Own things included; null = not said. */
  readonly limitKg: number | null;
  readonly packedCount: number;
  readonly lineCount: number;
}

/** Who carries what, and what it is shared by. */
export interface LoadPlanView {
  readonly people: readonly LoadPersonView[];
  readonly pieces: readonly LoadPieceView[];
  readonly shares: readonly LoadShareView[];
  readonly shelters: readonly {
    readonly id: string;
    readonly name: string;
    readonly massKg: number | null;
    readonly polesMassKg: number | null;
    readonly staysWithSleepers: boolean;
    readonly hasPoles: boolean;
  }[];
  readonly things: readonly { readonly id: string; readonly name: string; readonly massKg: number }[];
}

/** Share of the limit that is counted for who has none: as if everybody could carry alike. */
export function comparableLimits(
  people: readonly Pick<LoadPersonView, "id" | "limitKg">[],
): ReadonlyMap<string, number> {
  const known = people.flatMap((one) => one.limitKg ?? []);
  const usual = known.length > 0 ? known.reduce((sum, one) => sum + one, 0) / known.length : 1;
  return new Map(people.map((one) => [one.id, one.limitKg ?? usual]));
}
