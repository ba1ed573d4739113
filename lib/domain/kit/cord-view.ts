import type { CordNeed } from "@/lib/calc/cord";

/** Lines and shock cords that the plans need, and what the kit has of them. */
export interface CordView extends CordNeed {
  /** Most shock cords that one camp's plan uses, and how many the kit has. */
  readonly shockCordsUsed: number;
  readonly shockCordsOwned: number;
  /** Cord in the kit, m. */
  readonly ownedM: number;
}
