/**
 * Beaufort scale: 10-minute mean wind at 10 m over open ground.
 * Source: WMO No. 306 Code table 1100 and WMO No. 8 (bands from memory; v = 0.836·B^1.5 falls inside every band).
 * The upper limit of force 12 (36.9 m/s) is that of the extended scale, where force 13 begins (from memory).
 */
export interface BeaufortRow {
  readonly number: number;
  readonly name: string;
  /** Lowest speed of the band, m/s. */
  readonly fromMs: number;
  /** Highest speed of the band, m/s. */
  readonly toMs: number;
  readonly landSign: string;
}

export const BEAUFORT: readonly BeaufortRow[] = [
  { number: 0, name: "Calm", fromMs: 0, toMs: 0.2, landSign: "Smoke rises straight up." },
  { number: 1, name: "Light air", fromMs: 0.3, toMs: 1.5, landSign: "Smoke drifts." },
  { number: 2, name: "Light breeze", fromMs: 1.6, toMs: 3.3, landSign: "Wind felt on the face, leaves rustle." },
  { number: 3, name: "Gentle breeze", fromMs: 3.4, toMs: 5.4, landSign: "Leaves and small twigs keep moving." },
  { number: 4, name: "Moderate breeze", fromMs: 5.5, toMs: 7.9, landSign: "Dust rises, small branches move." },
  { number: 5, name: "Fresh breeze", fromMs: 8.0, toMs: 10.7, landSign: "Small trees in leaf sway." },
  { number: 6, name: "Strong breeze", fromMs: 10.8, toMs: 13.8, landSign: "Large branches move, wires whistle." },
  { number: 7, name: "Near gale", fromMs: 13.9, toMs: 17.1, landSign: "Whole trees move, walking is hard work." },
  { number: 8, name: "Gale", fromMs: 17.2, toMs: 20.7, landSign: "Twigs break off." },
  { number: 9, name: "Strong gale", fromMs: 20.8, toMs: 24.4, landSign: "Slight damage to buildings." },
  { number: 10, name: "Storm", fromMs: 24.5, toMs: 28.4, landSign: "Trees are uprooted." },
  { number: 11, name: "Violent storm", fromMs: 28.5, toMs: 32.6, landSign: "Damage far and wide." },
  { number: 12, name: "Hurricane", fromMs: 32.7, toMs: 36.9, landSign: "Devastation." },
];
