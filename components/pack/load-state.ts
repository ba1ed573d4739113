import {
  comparableLimits,
  type LoadPersonView,
  type LoadPieceView,
  type LoadPlanView,
  type LoadShareView,
} from "@/lib/domain/pack/load-view";

/** Where pieces are that nobody carries yet. */
export const NOBODY = "nobody";

export type Shares = readonly LoadShareView[];

/** Pieces in one place: with a person, or with nobody. */
export interface Stack {
  readonly piece: LoadPieceView;
  readonly placeId: string;
  readonly count: number;
  readonly isFixed: boolean;
}

export function stacksAt(plan: LoadPlanView, shares: Shares, placeId: string): Stack[] {
  return plan.pieces.flatMap((piece): Stack[] => {
    const own = shares.filter((share) => share.key === piece.key);
    if (placeId === NOBODY) {
      const count = piece.count - own.reduce((sum, share) => sum + share.count, 0);
      return count > 0 ? [{ piece, placeId, count, isFixed: false }] : [];
    }
    const count = own.reduce((sum, share) => sum + (share.personId === placeId ? share.count : 0), 0);
    const isFixed = own.some((share) => share.personId === placeId && share.isFixed);
    return count > 0 ? [{ piece, placeId, count, isFixed }] : [];
  });
}

/** Moves `count` of a piece; what arrives is not fixed unless what is there is. */
export function moveStack(shares: Shares, stack: Stack, toId: string, count: number): Shares {
  if (stack.placeId === toId) return shares;
  const { key } = stack.piece;
  const moved = Math.min(count, stack.count);
  const others = shares.filter(
    (share) => share.key !== key || (share.personId !== stack.placeId && share.personId !== toId),
  );
  const countOf = (personId: string) =>
    shares.reduce((sum, share) => sum + (share.key === key && share.personId === personId ? share.count : 0), 0);
  const isFixed = (personId: string) =>
    shares.some((share) => share.key === key && share.personId === personId && share.isFixed);
  const share = (personId: string, many: number): Shares =>
    personId !== NOBODY && many > 0 ? [{ key, personId, count: many, isFixed: isFixed(personId) }] : [];
  return [
    ...others,
    ...share(stack.placeId, stack.placeId === NOBODY ? 0 : countOf(stack.placeId) - moved),
    ...share(toId, (toId === NOBODY ? 0 : countOf(toId)) + moved),
  ];
}

export function setFixed(shares: Shares, stack: Stack, isFixed: boolean): Shares {
  return shares.map((share) =>
    share.key === stack.piece.key && share.personId === stack.placeId ? { ...share, isFixed } : share,
  );
}

export interface PersonTotal {
  readonly person: LoadPersonView;
  /** Of the group's, kg. */
  readonly groupKg: number;
  /** With own things, kg; they count as nothing when they are not said. */
  readonly totalKg: number;
  /** Total ÷ limit; by the average limit where none is said, so that loads can be compared. */
  readonly share: number;
}

export function totalsOf(plan: LoadPlanView, shares: Shares): PersonTotal[] {
  const limits = comparableLimits(plan.people);
  return plan.people.map((person) => {
    const groupKg = stacksAt(plan, shares, person.id).reduce(
      (sum, { piece, count }) => sum + (piece.massKgEach ?? 0) * count,
      0,
    );
    const totalKg = groupKg + (person.baseMassKg ?? 0);
    return { person, groupKg, totalKg, share: totalKg / (limits.get(person.id) ?? 1) };
  });
}
