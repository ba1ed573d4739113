/**
 * Giving each row (a tie-out) one thing out of several kinds (anchors), of which there are only so many.
 *
 * Sources. Sum: H. W. Kuhn, "The Hungarian method for the assignment problem", Naval Research Logistics Quarterly 2
 * (1955). Bottleneck: O. Gross, "The bottleneck assignment problem", RAND P-1630 (1959). Matching: J. Hopcroft and
 * R. Karp, SIAM J. Computing 2 (1973). Lexicographic bottleneck: R. E. Burkard and F. Rendl, "Lexicographic bottleneck
 * problems", Operations Research Letters 10 (1991): it is a sum problem whose costs are vectors that count how many
 * rows stand at each level, compared from the worst level on. All cited from memory.
 */

import { itemAt } from "./indexed";

/** Rows × kinds. A value is better the larger it is; null means this kind can't be used there. */
export interface GroupedProblem {
  /** One array per row with one entry per kind; finite numbers or null. */
  readonly values: readonly (readonly (number | null)[])[];
  /** How many there are of each kind, 0 or more. */
  readonly counts: readonly number[];
  /** What it is worth to leave a row without anything, one per row; usually below every other value. */
  readonly emptyValues: readonly number[];
  /** Whole-number costs of using one of a kind, most important first; they decide among equals. Default none. */
  readonly costs?: readonly (readonly number[])[];
  /** The kind each row has now, −1 = none of these; the last tie-break is to change as few rows as can be. */
  readonly present?: readonly number[];
}

/** The kind given to each row; null = the row stays empty. */
export type Assignment = readonly (number | null)[];

const at = (array: ArrayLike<number>, index: number): number => array[index] ?? 0;

/** Sorted levels without repeats, worst first. */
function levelsOf(problem: GroupedProblem): Float64Array {
  const all: number[] = [...problem.emptyValues];
  for (const row of problem.values) for (const value of row) if (value !== null) all.push(value);
  if (all.some((value) => !Number.isFinite(value))) throw new RangeError("Values must be finite numbers or null.");
  return Float64Array.from(new Set(all)).sort();
}

/**
 * Sign of (e_a − e_b) − (e_c − e_d), unit vectors compared from the worst level (0) on: which of two moves, from level
 * b to a or from level d to c, leaves the better picture. Negative: the first.
 */
function compareMoves(a: number, b: number, c: number, d: number): number {
  let from = -1;
  for (;;) {
    let level = Infinity;
    if (a > from && a < level) level = a;
    if (b > from && b < level) level = b;
    if (c > from && c < level) level = c;
    if (d > from && d < level) level = d;
    if (level === Infinity) return 0;
    const net = (a === level ? 1 : 0) - (b === level ? 1 : 0) - (c === level ? 1 : 0) + (d === level ? 1 : 0);
    if (net !== 0) return net;
    from = level;
  }
}

const NO_COSTS: readonly number[] = [];

/**
 * A cost in the ordered group ℤ^levels × ℤ^costs, kept sparse: how many rows more (or fewer) stand at which level,
 * worst level first, then the tie-break costs.
 */
class Label {
  readonly levels: Int32Array;
  readonly counts: Int32Array;
  readonly costs: Float64Array;
  length = 0;
  isSet = false;

  constructor(capacity: number, costCount: number) {
    this.levels = new Int32Array(capacity);
    this.counts = new Int32Array(capacity);
    this.costs = new Float64Array(costCount);
  }

  clear(): void {
    this.length = 0;
    this.costs.fill(0);
    this.isSet = false;
  }

  copyFrom(other: Label): void {
    for (let i = 0; i < other.length; i++) {
      this.levels[i] = at(other.levels, i);
      this.counts[i] = at(other.counts, i);
    }
    this.length = other.length;
    for (let i = 0; i < other.costs.length; i++) this.costs[i] = at(other.costs, i);
    this.isSet = other.isSet;
  }

  /** Adds `count` rows at `level`. */
  add(level: number, count: number): void {
    let place = 0;
    while (place < this.length && at(this.levels, place) < level) place++;
    if (place < this.length && at(this.levels, place) === level) {
      const sum = at(this.counts, place) + count;
      if (sum !== 0) {
        this.counts[place] = sum;
        return;
      }
      for (let i = place; i < this.length - 1; i++) {
        this.levels[i] = at(this.levels, i + 1);
        this.counts[i] = at(this.counts, i + 1);
      }
      this.length--;
      return;
    }
    for (let i = this.length; i > place; i--) {
      this.levels[i] = at(this.levels, i - 1);
      this.counts[i] = at(this.counts, i - 1);
    }
    this.levels[place] = level;
    this.counts[place] = count;
    this.length++;
  }

  addCosts(costs: readonly number[], sign: 1 | -1): void {
    for (let i = 0; i < this.costs.length; i++) this.costs[i] = at(this.costs, i) + sign * at(costs, i);
  }

  /** The last of the costs counts the rows that change. */
  addChanges(changes: number): void {
    const last = this.costs.length - 1;
    this.costs[last] = at(this.costs, last) + changes;
  }

  isLessThan(other: Label): boolean {
    return this.isLessWith(-1, -1, NO_COSTS, NO_COSTS, 0, other);
  }

  /**
   * Whether this label, with one row more at level `gained` and one fewer at `lost`, with the costs `added` instead of
   * `dropped` and `changes` more rows changed, is less than `other`. Levels of −1 stand for none.
   */
  isLessWith(
    gained: number,
    lost: number,
    added: readonly number[],
    dropped: readonly number[],
    changes: number,
    other: Label,
  ): boolean {
    let mine = 0;
    let theirs = 0;
    let from = -1;
    for (;;) {
      let level = Infinity;
      if (mine < this.length) level = at(this.levels, mine);
      if (theirs < other.length && at(other.levels, theirs) < level) level = at(other.levels, theirs);
      if (gained > from && gained < level) level = gained;
      if (lost > from && lost < level) level = lost;
      if (level === Infinity) break;
      let net = (gained === level ? 1 : 0) - (lost === level ? 1 : 0);
      if (mine < this.length && at(this.levels, mine) === level) net += at(this.counts, mine++);
      if (theirs < other.length && at(other.levels, theirs) === level) net -= at(other.counts, theirs++);
      if (net !== 0) return net < 0;
      from = level;
    }
    const last = this.costs.length - 1;
    for (let i = 0; i <= last; i++) {
      const moved = i === last ? changes : at(added, i) - at(dropped, i);
      const difference = at(this.costs, i) + moved - at(other.costs, i);
      if (difference !== 0) return difference < 0;
    }
    return false;
  }
}

/**
 * The assignment that is best in its worst row, then in its second worst, and so on; among those the least of the
 * first tie-break cost, then of the second … and last with the fewest changes from what each row has now.
 *
 * Exact. Successive shortest augmenting paths (the Hungarian method, row by row) need no more of a cost than that it
 * can be added, subtracted and ordered; so they also hold for vectors that count the rows at each level and are
 * compared from the worst level on (Burkard & Rendl 1991). Paths are searched over the kinds only, because all of one
 * kind are alike. Deterministic: among full equals the earlier kind wins.
 *
 * Throws RangeError when sizes do not fit together or a number is not finite.
 */
export function assignLexicographic(problem: GroupedProblem): Assignment {
  const rows = problem.values.length;
  const kinds = problem.counts.length;
  const kindsAndEmpty = kinds + 1;
  if (problem.emptyValues.length !== rows || problem.values.some((row) => row.length !== kinds)) {
    throw new RangeError("Each row needs one value per kind and one for staying empty.");
  }
  if (problem.counts.some((count) => !Number.isInteger(count) || count < 0)) {
    throw new RangeError("Counts are whole numbers from 0.");
  }
  const costCount = (problem.costs?.[0]?.length ?? 0) + 1;
  const noCosts: readonly number[] = new Array<number>(costCount).fill(0);
  const costOf = (kind: number): readonly number[] => problem.costs?.[kind] ?? noCosts;
  const presentOf = problem.present ?? [];
  /** 1 when the row would get something else than it has, else 0. */
  const changeOf = (row: number, kind: number): number => (presentOf[row] === kind ? 0 : 1);

  const levels = levelsOf(problem);
  const levelOf = new Map<number, number>();
  levels.forEach((value, level) => levelOf.set(value, level));
  const rank = new Int32Array(rows * kindsAndEmpty).fill(-1);
  for (let row = 0; row < rows; row++) {
    for (let kind = 0; kind < kinds; kind++) {
      const value = itemAt(problem.values, row)[kind] ?? null;
      if (value !== null && at(problem.counts, kind) > 0) rank[row * kindsAndEmpty + kind] = levelOf.get(value) ?? -1;
    }
    rank[row * kindsAndEmpty + kinds] = levelOf.get(problem.emptyValues[row] ?? 0) ?? -1;
  }

  const kindOfRow = new Int32Array(rows).fill(-1);
  const rowsOfKind: number[][] = Array.from({ length: kindsAndEmpty }, () => []);
  const isFree = (kind: number) => kind === kinds || itemAt(rowsOfKind, kind).length < at(problem.counts, kind);
  /** The row of `from` that is moved to `to` at the least cost; −1 = none can. */
  const mover = new Int32Array(kindsAndEmpty * kindsAndEmpty).fill(-1);
  const findMovers = (from: number) => {
    for (let to = 0; to < kindsAndEmpty; to++) {
      let best = -1;
      for (const row of rowsOfKind[from] ?? []) {
        const gained = at(rank, row * kindsAndEmpty + to);
        if (to === from || gained < 0) continue;
        if (best >= 0) {
          const order = compareMoves(
            gained,
            at(rank, row * kindsAndEmpty + from),
            at(rank, best * kindsAndEmpty + to),
            at(rank, best * kindsAndEmpty + from),
          );
          const changes = changeOf(row, to) - changeOf(row, from) - changeOf(best, to) + changeOf(best, from);
          if (order > 0 || (order === 0 && (changes > 0 || (changes === 0 && row > best)))) continue;
        }
        best = row;
      }
      mover[from * kindsAndEmpty + to] = best;
    }
  };

  const labels = Array.from({ length: kindsAndEmpty }, () => new Label(2 * kindsAndEmpty + 4, costCount));
  const previous = new Int32Array(kindsAndEmpty);

  for (let row = 0; row < rows; row++) {
    let changed: number[] = [];
    labels.forEach((label, kind) => {
      label.clear();
      previous[kind] = -1;
      const level = at(rank, row * kindsAndEmpty + kind);
      if (level < 0) return;
      label.add(level, 1);
      label.addCosts(costOf(kind), 1);
      label.addChanges(changeOf(row, kind));
      label.isSet = true;
      changed.push(kind);
    });
    // Bellman–Ford over the kinds; without a negative cycle it settles within as many rounds as there are kinds.
    for (let round = 0; round <= kindsAndEmpty && changed.length > 0; round++) {
      const next = new Set<number>();
      for (const from of changed) {
        const label = labels[from];
        if (!label || isFree(from)) continue;
        for (let to = 0; to < kindsAndEmpty; to++) {
          const moved = at(mover, from * kindsAndEmpty + to);
          const target = labels[to];
          if (moved < 0 || !target) continue;
          const gained = at(rank, moved * kindsAndEmpty + to);
          const lost = at(rank, moved * kindsAndEmpty + from);
          const changes = changeOf(moved, to) - changeOf(moved, from);
          if (target.isSet && !label.isLessWith(gained, lost, costOf(to), costOf(from), changes, target)) continue;
          target.copyFrom(label);
          target.add(gained, 1);
          target.add(lost, -1);
          target.addCosts(costOf(to), 1);
          target.addCosts(costOf(from), -1);
          target.addChanges(changes);
          previous[to] = from;
          next.add(to);
        }
      }
      changed = [...next].sort((a, b) => a - b);
    }
    let end = kinds;
    for (let kind = kinds - 1; kind >= 0; kind--) {
      const label = labels[kind];
      const best = labels[end];
      if (label?.isSet && best && isFree(kind) && !best.isLessThan(label)) end = kind;
    }
    const touched = [end];
    for (let kind = end; at(previous, kind) >= 0; kind = at(previous, kind)) {
      const from = at(previous, kind);
      const moved = at(mover, from * kindsAndEmpty + kind);
      rowsOfKind[from] = itemAt(rowsOfKind, from).filter((one) => one !== moved);
      rowsOfKind[kind]?.push(moved);
      kindOfRow[moved] = kind;
      touched.push(from);
      end = from;
    }
    rowsOfKind[end]?.push(row);
    kindOfRow[row] = end;
    for (const kind of touched) findMovers(kind);
  }
  return Array.from(kindOfRow, (kind) => (kind === kinds ? null : kind));
}

/**
 * The largest value that every row can reach at once, with one assignment that reaches it; null when some row must
 * stay empty. Threshold search with augmenting paths (Gross 1959; Hopcroft & Karp 1973 for the matching).
 */
export function assignBottleneck(
  values: readonly (readonly (number | null)[])[],
  counts: readonly number[],
): { readonly value: number; readonly kinds: readonly number[] } | null {
  const levels = Float64Array.from(new Set(values.flat().filter((value): value is number => value !== null))).sort();
  const match = (threshold: number): number[] | null => {
    const kindOfRow = new Array<number>(values.length).fill(-1);
    const rowsOfKind: number[][] = counts.map(() => []);
    const place = (row: number, seen: Set<number>): boolean => {
      for (let kind = 0; kind < counts.length; kind++) {
        const value = values[row]?.[kind] ?? null;
        if (value === null || value < threshold || seen.has(kind)) continue;
        seen.add(kind);
        const holders = itemAt(rowsOfKind, kind);
        const yielding = holders.length < at(counts, kind) ? row : holders.find((holder) => place(holder, seen));
        if (yielding === undefined) continue;
        rowsOfKind[kind] = [...holders.filter((one) => one !== yielding), row];
        kindOfRow[row] = kind;
        return true;
      }
      return false;
    };
    for (let row = 0; row < values.length; row++) if (!place(row, new Set())) return null;
    return kindOfRow;
  };
  let best: { value: number; kinds: number[] } | null = null;
  let low = 0;
  let high = levels.length - 1;
  while (low <= high) {
    const middle = (low + high) >> 1;
    const threshold = at(levels, middle);
    const kinds = match(threshold);
    if (kinds) {
      best = { value: threshold, kinds };
      low = middle + 1;
    } else high = middle - 1;
  }
  return best;
}

/**
 * The assignment of each row to its own column with the least sum of costs: Hungarian method with potentials
 * (Kuhn 1955), O(rows² · columns). `costs` is rows × columns, rows ≤ columns, finite. Throws RangeError otherwise.
 */
export function assignLeastSum(costs: readonly (readonly number[])[]): readonly number[] {
  const rows = costs.length;
  const columns = costs[0]?.length ?? 0;
  if (costs.some((row) => row.length !== columns || row.some((cost) => !Number.isFinite(cost))) || rows > columns) {
    throw new RangeError("Costs form a finite matrix with at least as many columns as rows.");
  }
  // Index 0 is a stand-in, rows and columns count from 1.
  const rowPotential = new Float64Array(rows + 1);
  const columnPotential = new Float64Array(columns + 1);
  const rowOfColumn = new Int32Array(columns + 1);
  const cameFrom = new Int32Array(columns + 1);
  for (let row = 1; row <= rows; row++) {
    rowOfColumn[0] = row;
    const slack = new Float64Array(columns + 1).fill(Infinity);
    const isDone = new Uint8Array(columns + 1);
    let column = 0;
    do {
      isDone[column] = 1;
      const current = at(rowOfColumn, column);
      let step = Infinity;
      let nearest = 0;
      for (let other = 1; other <= columns; other++) {
        if (at(isDone, other) === 1) continue;
        const reduced = (costs[current - 1]?.[other - 1] ?? 0) - at(rowPotential, current) - at(columnPotential, other);
        if (reduced < at(slack, other)) {
          slack[other] = reduced;
          cameFrom[other] = column;
        }
        if (at(slack, other) < step) {
          step = at(slack, other);
          nearest = other;
        }
      }
      for (let other = 0; other <= columns; other++) {
        if (at(isDone, other) === 1) {
          const held = at(rowOfColumn, other);
          rowPotential[held] = at(rowPotential, held) + step;
          columnPotential[other] = at(columnPotential, other) - step;
        } else slack[other] = at(slack, other) - step;
      }
      column = nearest;
    } while (at(rowOfColumn, column) !== 0);
    while (column !== 0) {
      const before = at(cameFrom, column);
      rowOfColumn[column] = at(rowOfColumn, before);
      column = before;
    }
  }
  const columnOfRow = new Array<number>(rows).fill(-1);
  for (let column = 1; column <= columns; column++) {
    const row = at(rowOfColumn, column);
    if (row > 0) columnOfRow[row - 1] = column - 1;
  }
  return columnOfRow;
}
