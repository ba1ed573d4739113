import { itemAt } from "../indexed";
import type { Carrier, LoadItem, LoadShare } from "./types";

/** Relative loads closer than this are equal. */
const EQUAL = 1e-9;
/** Nodes of the exact search; a few items are done long before. */
const MOST_NODES = 60_000;
/** Rounds of moving and swapping from the first share. */
const MOST_ROUNDS = 2_000;

interface Draft {
  /** By item: place of the carrier. */
  readonly at: number[];
  /** By carrier, kg. */
  readonly loadsKg: number[];
}

interface Setting {
  readonly carriers: readonly Carrier[];
  readonly items: readonly LoadItem[];
  /** By item: places of those who may carry it. */
  readonly allowed: readonly (readonly number[])[];
}

const relative = ({ carriers }: Setting, loadsKg: readonly number[], at: number): number =>
  itemAt(loadsKg, at) / itemAt(carriers, at).limitKg;

const largestOf = (setting: Setting, loadsKg: readonly number[]): number =>
  Math.max(0, ...setting.carriers.map((_, at) => relative(setting, loadsKg, at)));

function readSetting(carriers: readonly Carrier[], items: readonly LoadItem[]): Setting {
  if (carriers.length === 0) throw new RangeError("Nobody is there to carry.");
  if (carriers.some((one) => !(one.limitKg > 0) || !(one.baseMassKg >= 0))) {
    throw new RangeError("Limits must be above 0 kg and own things 0 kg or more.");
  }
  if (items.some((item) => !(item.massKg >= 0))) throw new RangeError("Masses must be 0 kg or more.");
  const all = carriers.map((_, at) => at);
  const allowed = items.map((item) => {
    const own = item.carrierIds && all.filter((at) => item.carrierIds?.includes(itemAt(carriers, at).id));
    return own && own.length > 0 ? own : all;
  });
  return { carriers, items, allowed };
}

/**
 * Least possible largest load ÷ limit, whatever the share: all of it spread like water over those who may carry it, for
 * each group of people that some items can't leave, and each item with whoever is best for it.
 */
export function boundShare(carriers: readonly Carrier[], items: readonly LoadItem[]): number {
  const setting = readSetting(carriers, items);
  const groups = new Map(setting.allowed.map((places) => [places.join(), places]));
  groups.set(
    "all",
    carriers.map((_, at) => at),
  );
  const spread = [...groups.values()].map((places) => {
    const isOwn = new Set(places);
    const massKg = items.reduce(
      (sum, item, at) => sum + (itemAt(setting.allowed, at).every((place) => isOwn.has(place)) ? item.massKg : 0),
      0,
    );
    return fillLevel(
      places.map((place) => itemAt(carriers, place)),
      massKg,
    );
  });
  const single = items.map((item, at) =>
    Math.min(
      ...itemAt(setting.allowed, at).map((place) => {
        const { baseMassKg, limitKg } = itemAt(carriers, place);
        return (baseMassKg + item.massKg) / limitKg;
      }),
    ),
  );
  const base = carriers.map((one) => one.baseMassKg / one.limitKg);
  return Math.max(0, ...base, ...spread, ...single);
}

/** The level to which so much mass fills people up, those first who have least of their limit. */
function fillLevel(carriers: readonly Carrier[], massKg: number): number {
  const sorted = [...carriers].sort((a, b) => a.baseMassKg / a.limitKg - b.baseMassKg / b.limitKg);
  let [base, limit] = [0, 0];
  let level = 0;
  for (const [at, one] of sorted.entries()) {
    base += one.baseMassKg;
    limit += one.limitKg;
    level = (base + massKg) / limit;
    const next = sorted[at + 1];
    if (!next || level <= next.baseMassKg / next.limitKg) break;
  }
  return level;
}

/** Heaviest first, each to whoever then has the least of their limit (longest processing time, Graham 1969). */
function shareGreedily(setting: Setting, order: readonly number[]): Draft {
  const loadsKg = setting.carriers.map((one) => one.baseMassKg);
  const at = setting.items.map(() => 0);
  for (const item of order) {
    const { massKg } = itemAt(setting.items, item);
    const best = itemAt(setting.allowed, item).reduce((a, b) =>
      (itemAt(loadsKg, b) + massKg) / itemAt(setting.carriers, b).limitKg <
      (itemAt(loadsKg, a) + massKg) / itemAt(setting.carriers, a).limitKg - EQUAL
        ? b
        : a,
    );
    at[item] = best;
    loadsKg[best] = itemAt(loadsKg, best) + massKg;
  }
  return { at, loadsKg };
}

/** Moves and swaps items from whoever has most of their limit, while that makes the loads more even. */
function improve(setting: Setting, draft: Draft): void {
  for (let round = 0; round < MOST_ROUNDS; round += 1) {
    const order = setting.carriers
      .map((_, at) => at)
      .sort((a, b) => relative(setting, draft.loadsKg, b) - relative(setting, draft.loadsKg, a));
    if (!order.some((heavy) => improveOne(setting, draft, heavy))) return;
  }
}

function improveOne(setting: Setting, draft: Draft, heavy: number): boolean {
  const { items, allowed } = setting;
  const gainOf = (other: number, deltaKg: number) => {
    const [from, to] = [itemAt(draft.loadsKg, heavy), itemAt(draft.loadsKg, other)];
    const limitsKg = [itemAt(setting.carriers, heavy).limitKg, itemAt(setting.carriers, other).limitKg] as const;
    const before = [from / limitsKg[0], to / limitsKg[1]] as const;
    const after = [(from - deltaKg) / limitsKg[0], (to + deltaKg) / limitsKg[1]] as const;
    // Evening two people out must not make the worse off of them worse.
    if (Math.max(...after) > Math.max(...before) + EQUAL) return 0;
    return before[0] ** 2 + before[1] ** 2 - after[0] ** 2 - after[1] ** 2;
  };
  let best = { gain: EQUAL, item: -1, other: -1, swap: -1, deltaKg: 0 };
  draft.at.forEach((place, item) => {
    if (place !== heavy) return;
    const { massKg } = itemAt(items, item);
    for (const other of itemAt(allowed, item)) {
      if (other === heavy) continue;
      const gain = gainOf(other, massKg);
      if (gain > best.gain) best = { gain, item, other, swap: -1, deltaKg: massKg };
    }
    draft.at.forEach((other, swap) => {
      if (other === heavy || !itemAt(allowed, item).includes(other) || !itemAt(allowed, swap).includes(heavy)) return;
      const deltaKg = massKg - itemAt(items, swap).massKg;
      const gain = gainOf(other, deltaKg);
      if (gain > best.gain) best = { gain, item, other, swap, deltaKg };
    });
  });
  if (best.item < 0) return false;
  draft.at[best.item] = best.other;
  if (best.swap >= 0) draft.at[best.swap] = heavy;
  draft.loadsKg[heavy] = itemAt(draft.loadsKg, heavy) - best.deltaKg;
  draft.loadsKg[best.other] = itemAt(draft.loadsKg, best.other) + best.deltaKg;
  return true;
}

/** Branch and bound, heaviest item first; gives up after MOST_NODES nodes. Returns whether it saw everything. */
function searchAll(setting: Setting, order: readonly number[], best: { draft: Draft; largest: number }, bound: number) {
  const loadsKg = setting.carriers.map((one) => one.baseMassKg);
  const at = setting.items.map(() => 0);
  let nodes = 0;
  const visit = (depth: number, sofar: number): boolean => {
    nodes += 1;
    if (nodes > MOST_NODES) return false;
    const item = order[depth];
    if (item === undefined) {
      best.draft = { at: [...at], loadsKg: [...loadsKg] };
      best.largest = sofar;
      return true;
    }
    const { massKg } = itemAt(setting.items, item);
    const places = [...itemAt(setting.allowed, item)].sort(
      (a, b) => relative(setting, loadsKg, a) - relative(setting, loadsKg, b),
    );
    const seen = new Set<string>();
    for (const place of places) {
      const { limitKg } = itemAt(setting.carriers, place);
      const before = itemAt(loadsKg, place);
      const next = Math.max(sofar, (before + massKg) / limitKg);
      // Two people with the same load and limit are the same only where nothing binds items to people.
      const key = `${before}|${limitKg}`;
      const isSame = places.length === setting.carriers.length && seen.has(key) && !hasTies(setting);
      seen.add(key);
      if (next >= best.largest - EQUAL || isSame) continue;
      loadsKg[place] = before + massKg;
      at[item] = place;
      const isWhole = visit(depth + 1, next);
      loadsKg[place] = before;
      if (!isWhole) return false;
      if (best.largest <= bound + EQUAL) return true;
    }
    return true;
  };
  return visit(0, Math.max(0, ...setting.carriers.map((one) => one.baseMassKg / one.limitKg)));
}

const hasTies = ({ allowed, carriers }: Setting): boolean => allowed.some((places) => places.length < carriers.length);

/**
 * Shares items among people so that the largest load ÷ limit is least. Exact for a few items (branch and bound); else a
 * share made even by moves and swaps, with the bound that says how far from the best it can be at most. The same input
 * gives the same share. An item that nobody on the list may carry goes to anybody. Throws without people, or with
 * negative masses or limits that are not above 0.
 */
export function shareLoads(carriers: readonly Carrier[], items: readonly LoadItem[]): LoadShare {
  const setting = readSetting(carriers, items);
  const bound = boundShare(carriers, items);
  const order = items.map((_, at) => at).sort((a, b) => itemAt(items, b).massKg - itemAt(items, a).massKg || a - b);
  const draft = shareGreedily(setting, order);
  improve(setting, draft);
  const best = { draft, largest: largestOf(setting, draft.loadsKg) };
  const isWhole = best.largest > bound + EQUAL ? searchAll(setting, order, best, bound) : true;
  improve(setting, best.draft);
  const largest = largestOf(setting, best.draft.loadsKg);
  return {
    carrierIds: best.draft.at.map((place) => itemAt(carriers, place).id),
    largest,
    bound: isWhole ? largest : bound,
  };
}
