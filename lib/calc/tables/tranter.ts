/**
 * Tranter's corrections: hours actually needed for a day of so many hours by Naismith's rule, by fitness, which is the
 * minutes taken for 1000 ft (300 m) of ascent in half a mile (800 m). A row ends where the table calls it too much.
 * Source: P. Tranter's table as printed in E. Langmuir, Mountaincraft and Leadership. Row 15 was read in two reprints,
 * the others in one; where that has 6¼ (30 minutes, 5 hours), which breaks the row, stands the 6¾ known from memory.
 */
export const TRANTER_NAISMITH_H = [2, 3, 4, 5, 6, 7, 8, 9, 10, 12, 14, 16, 18, 20, 22, 24] as const;

export const TRANTER = {
  15: [1, 1.5, 2, 2.75, 3.5, 4.5, 5.5, 6.75, 7.75, 10, 12.5, 14.5, 17, 19.5, 22, 24],
  20: [1.25, 2.25, 3.25, 4.5, 5.5, 6.5, 7.75, 8.75, 10, 12.5, 15, 17.5, 20, 23],
  25: [1.5, 3, 4.25, 5.5, 7, 8.5, 10, 11.5, 13.25, 15, 17.5],
  30: [2, 3.5, 5, 6.75, 8.5, 10.5, 12.5, 14.5],
  40: [2.75, 4.25, 5.75, 7.5, 9.5, 11.5],
  50: [3.25, 4.75, 6.5, 8.5],
} as const satisfies Record<number, readonly number[]>;

export type TranterFitness = keyof typeof TRANTER;
export const TRANTER_FITNESS: readonly TranterFitness[] = [15, 20, 25, 30, 40, 50];

/** The row so many lines down the table, for heavy packs, soft ground or weather; null below its end. */
export function lowerFitness(fitness: TranterFitness, lines: number): TranterFitness | null {
  return TRANTER_FITNESS[TRANTER_FITNESS.indexOf(fitness) + lines] ?? null;
}
