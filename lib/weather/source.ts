/** What a forecast says of one hour at a place, SI. Null: it does not say. */
export interface ForecastHour {
  /** Milliseconds since 1970, UTC. */
  readonly atMs: number;
  /** Mean wind at 10 m. */
  readonly meanMs: number | null;
  /** Strongest gust at 10 m of the hour before. */
  readonly gustMs: number | null;
  /** Wind from, degrees clockwise from north. */
  readonly fromDeg: number | null;
  /** Rain of the hour before, mm. */
  readonly rainMm: number | null;
  readonly temperatureC: number | null;
}

export interface ForecastRequest {
  readonly latitude: number;
  readonly longitude: number;
  /** Null: the service takes the height of its own map. */
  readonly altitudeM: number | null;
  /** UTC days, yyyy-mm-dd, both included. */
  readonly fromDay: string;
  readonly toDay: string;
  readonly askedAt: Date;
}

/** Where forecasts come from: a hosted service, or the sample kept here. Throws `ForecastTrouble` and nothing else. */
export interface ForecastSource {
  /** As it stands beside every value. */
  readonly name: string;
  /** Invented, for demonstration: not a forecast. */
  readonly isSample: boolean;
  fetchHours(request: ForecastRequest): Promise<readonly ForecastHour[]>;
}

export type TroubleKind = "slow" | "down" | "refused" | "not-covered" | "too-large" | "malformed" | "absurd";

const SENTENCES: Readonly<Record<TroubleKind, string>> = {
  slow: "The forecast service did not answer in time.",
  down: "The forecast service can't be reached.",
  refused: "The forecast service refused the question.",
  "not-covered": "The forecast service has nothing for these nights yet. Forecasts reach one to two weeks ahead.",
  "too-large": "The forecast service answered with far more than was asked for.",
  malformed: "The forecast service answered something that can't be read.",
  absurd: "The forecast service answered with values that can't be true.",
};

/** No forecast came, and why; `detail` is for the log. */
export class ForecastTrouble extends Error {
  readonly sentence: string;

  constructor(
    readonly kind: TroubleKind,
    readonly detail: string,
  ) {
    super(`${kind}: ${detail}`);
    this.name = "ForecastTrouble";
    this.sentence = SENTENCES[kind];
  }
}
