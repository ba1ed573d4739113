/** Somebody who carries. Masses in kg. */
export interface Carrier {
  readonly id: string;
  /** Own things, which nobody else takes; 0 when not said. */
  readonly baseMassKg: number;
  /** The most that this person should carry, own things included, above 0. */
  readonly limitKg: number;
}

/** One piece of the group's that is carried whole. */
export interface LoadItem {
  readonly id: string;
  readonly massKg: number;
  /** Only these may carry it; null = anybody. Somebody whom it is fixed to is the only one. */
  readonly carrierIds: readonly string[] | null;
}

export interface LoadShare {
  /** By item, in the order of the items: who carries it. */
  readonly carrierIds: readonly string[];
  /** The largest load ÷ limit. */
  readonly largest: number;
  /** No share is better than this. */
  readonly bound: number;
}
