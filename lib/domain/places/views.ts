import type { MoonNight, SunDay } from "@/lib/places/sun-moon";

/** Where a camp is in every writing, and the light of each of its nights. */
export interface CampPlaceView {
  readonly position: string;
  /** Null near the poles, where they do not reach. */
  readonly utm: string | null;
  readonly mgrs: string | null;
  /** Degrees, positive east, on the first day; null on days that the model of the field does not cover. */
  readonly declinationDeg: number | null;
  readonly timeZone: string;
  readonly nights: readonly {
    readonly day: string;
    readonly evening: SunDay;
    /** Of the day after. */
    readonly morning: SunDay;
    readonly moon: MoonNight;
  }[];
}
