/** Where one small page stands on a sheet, and whether it stands on its head. */
export interface FoldedPlace {
  readonly page: 1 | 2 | 3 | 4;
  readonly column: 0 | 1;
  readonly row: 0 | 1;
  readonly isUpsideDown: boolean;
}

/**
 * Four pages on one side of a sheet that is folded twice: first the top half backwards, then the left half backwards.
 * The lower right quarter is then the front, the lower left one the back; the upper ones are seen turned over.
 */
export const POCKET_FOLD: readonly FoldedPlace[] = [
  { page: 1, column: 1, row: 1, isUpsideDown: false },
  { page: 2, column: 1, row: 0, isUpsideDown: true },
  { page: 3, column: 0, row: 0, isUpsideDown: true },
  { page: 4, column: 0, row: 1, isUpsideDown: false },
];
