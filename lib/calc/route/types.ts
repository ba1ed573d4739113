/** A line on the ground, cut into stations of equal spacing; heights are smoothed. Metres throughout. */
export interface Profile {
  readonly lengthM: number;
  /** Between two stations; the last piece may be shorter. */
  readonly stepM: number;
  /** One per station, smoothed; null where nothing is known within reach. */
  readonly heightsM: readonly (number | null)[];
}

/** What a leg asks of those who walk it. Heights are null where part of the leg has none. */
export interface LegFacts {
  readonly distanceM: number;
  readonly ascentM: number | null;
  readonly descentM: number | null;
  /** Of the descent, what lies on slopes of 5° to 12°. */
  readonly gentleDescentM: number | null;
  /** Of the descent, what lies on slopes steeper than 12°. */
  readonly steepDescentM: number | null;
  /** Hours by Tobler's function over the pieces; null without heights. */
  readonly toblerH: number | null;
}

export interface WalkedPiece {
  readonly distanceM: number;
  /** Rise ÷ run; negative downhill. */
  readonly slope: number;
}
