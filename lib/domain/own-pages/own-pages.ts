/**
 * What stands on one person's pages, in the form in which two versions are compared. Kept with each copy that was
 * printed or sent, so old papers can be told from those that still say the right thing.
 */
export interface OwnPages {
  readonly nights: readonly OwnNight[];
  readonly bring: readonly OwnLine[];
  readonly carry: readonly OwnLine[];
  readonly pitches: readonly OwnPitch[];
  /** Whom to call, one line each. */
  readonly contacts: readonly string[];
}

export interface OwnNight {
  readonly campId: string;
  readonly campName: string;
  /** yyyy-mm-dd. */
  readonly day: string;
  /** A shelter's name, "outside", or null: not placed yet. */
  readonly place: string | null;
  readonly withNames: readonly string[];
}

export interface OwnLine {
  readonly key: string;
  readonly name: string;
}

export interface OwnPitch {
  readonly pitchId: string;
  readonly campName: string;
  readonly name: string;
  readonly headingDeg: number;
  /** Dimensions and line lengths as canonical text: compared, never shown. */
  readonly shape: string;
  /** The camp's ground and wind as canonical text: compared, never shown. */
  readonly place: string;
  /** Anchors left in the tray, which the advice for softer ground names. */
  readonly spares: string;
  readonly tieOuts: readonly OwnTieOut[];
}

export interface OwnTieOut {
  readonly tieOutId: string;
  readonly number: number;
  /** Null: no anchor yet. */
  readonly anchor: string | null;
  /** Everything done there in words: lean, knot, second stake, rock. */
  readonly rigging: string;
}
