/** Bits of a set of kinds: bit i is the i-th carried kind, then come the things found at the camp. */
export type KindSet = number;

/** A set of kinds has at most so many members: they are the bits of a whole number. */
export const MOST_KINDS = 24;
export const MOST_FOUND = 6;
export const MOST_SPARES = 3;

/** A kind of anchor that the kit may be made of. */
export interface CarriedKind {
  readonly id: string;
  readonly name: string;
  /** Mass of one in tenths of a gram, 0 or more; whole, so that sums are exact. */
  readonly massUnits: number;
  /** Work of setting one beyond that of a stake, in stakes, 0 or more: what has to be buried costs more than its mass. */
  readonly extraWork: number;
  /** How many there are to take at most, 0 or more. */
  readonly most: number;
}

/** Something found at one camp that may be used there, at a price in work. */
export interface FoundKind {
  readonly id: string;
  readonly name: string;
  readonly most: number;
  /** Work of setting one, in stakes. */
  readonly work: number;
}

/** One anchor that a tie-out needs; a tie-out with two in line needs two. */
export interface KitNeed {
  readonly pitchId: string;
  readonly tieOutId: string;
  /** The tie-out's number and the shelter's name, for people. */
  readonly number: number;
  readonly shelterName: string;
  /** The kinds that hold there after the windy night; of a pinned tie-out the kind that is pinned. */
  readonly kinds: KindSet;
  readonly isPinned: boolean;
}

export interface KitCamp {
  readonly id: string;
  readonly name: string;
  readonly found: readonly FoundKind[];
  readonly needs: readonly KitNeed[];
}

/** Which anchors to carry, and how many, so that every need of every camp can be met with them. */
export interface KitProblem {
  readonly kinds: readonly CarriedKind[];
  readonly camps: readonly KitCamp[];
  /** However many pieces (0…3) are lost or bent, whichever they are, every camp can still be staked with the rest. */
  readonly spares: number;
  /** Mass, tenths of a gram, that the group would rather carry than do the work of setting one stake. */
  readonly workPriceUnits: number;
}

export interface KitSolution {
  /** Pieces of each kind. */
  readonly counts: readonly number[];
  /** By camp: how many of each thing found there are used. */
  readonly foundUsed: readonly (readonly number[])[];
  /** Mass and priced work, tenths of a gram. */
  readonly cost: number;
  /** No kit costs less than this; equal to `cost` when the kit is proven the lightest. */
  readonly bound: number;
}

/** Needs of one camp that can't all be met with what there is. */
export interface KitShortfall {
  readonly campId: string;
  readonly campName: string;
  /** Tie-outs that only these kinds hold … */
  readonly needs: readonly KitNeed[];
  readonly kinds: KindSet;
  /** … and how many pieces of them there are. */
  readonly available: number;
}

/** Solves a program in the LP format of CPLEX; the value of a name that is not in the answer is 0. */
export type ProgramSolver = (program: string) => {
  readonly status: "optimal" | "infeasible" | "stopped";
  /** Of the best found; null when none was found. */
  readonly values: Readonly<Record<string, number>> | null;
};
