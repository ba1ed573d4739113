import type { Placement, TrayAnchor } from "./types";

/** How many of each anchor are still in the tray while placements take them; never below zero. */
export class Stock {
  readonly #left: Map<string, number>;

  constructor(tray: readonly TrayAnchor[], placements: readonly Placement[] = []) {
    this.#left = new Map(tray.map((anchor) => [anchor.id, anchor.count]));
    placements.forEach((placement) => this.takeAll(placement));
  }

  /** 0 for an anchor that is not in the tray. */
  left(anchorId: string): number {
    return this.#left.get(anchorId) ?? 0;
  }

  take(anchorId: string): void {
    if (this.left(anchorId) > 0) this.#left.set(anchorId, this.left(anchorId) - 1);
  }

  /** The anchor of a placement and its second in line. */
  takeAll(placement: Placement): void {
    this.take(placement.anchorId);
    if (placement.tandem) this.take(placement.tandem.anchorId);
  }

  toRecord(): Record<string, number> {
    return Object.fromEntries(this.#left);
  }
}
