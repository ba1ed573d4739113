import { shareLoads } from "@/lib/calc/load/share-loads";
import type { LoadItem } from "@/lib/calc/load/types";
import { comparableLimits, type LoadPlanView, type LoadShareView } from "./load-view";

/** Small pieces of one kind go together up to this, kg: nobody wants one peg from each of a dozen kinds. */
const BUNDLE_KG = 0.25;

export interface SharedOut {
  readonly shares: readonly LoadShareView[];
  /** Largest load ÷ limit, and the least that it could be. */
  readonly largest: number;
  readonly bound: number;
}

/**
 * Shares everything that is not fixed so that the largest load by its limit is least. A piece of unknown mass counts as
 * nothing; who has said no limit counts with the average of the others, and when nobody has, all count alike.
 */
export function shareOut(plan: LoadPlanView): SharedOut {
  const limits = comparableLimits(plan.people);
  const fixed = plan.shares.filter((share) => share.isFixed);
  const massOf = new Map(plan.pieces.map((piece) => [piece.key, piece.massKgEach ?? 0]));
  const carriers = plan.people.map(({ id, baseMassKg }) => ({
    id,
    limitKg: limits.get(id) ?? 1,
    baseMassKg:
      (baseMassKg ?? 0) +
      fixed.reduce((sum, share) => sum + (share.personId === id ? share.count * (massOf.get(share.key) ?? 0) : 0), 0),
  }));
  const bundles = plan.pieces.flatMap((piece) => {
    const fixedCount = fixed.reduce((sum, share) => sum + (share.key === piece.key ? share.count : 0), 0);
    const each = piece.massKgEach ?? 0;
    const size = each > 0 ? Math.max(1, Math.floor(BUNDLE_KG / each)) : piece.count;
    const left = piece.count - fixedCount;
    return Array.from({ length: Math.ceil(left / size) }, (_, at) => {
      const count = Math.min(size, left - at * size);
      const item: LoadItem = { id: piece.key, massKg: each * count, carrierIds: piece.carrierIds };
      return { item, count };
    });
  });
  const share = shareLoads(
    carriers,
    bundles.map((bundle) => bundle.item),
  );
  const merged = new Map<string, LoadShareView>();
  bundles.forEach(({ item, count }, at) => {
    const personId = share.carrierIds[at] ?? "";
    const key = `${item.id} ${personId}`;
    merged.set(key, { key: item.id, personId, count: (merged.get(key)?.count ?? 0) + count, isFixed: false });
  });
  return { shares: [...fixed, ...merged.values()], largest: share.largest, bound: share.bound };
}
