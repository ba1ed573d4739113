import { countWithin, groupNeeds, listKinds, supplyOf, type NeedClass } from "./match";
import type { CarriedKind, FoundKind, KindSet, KitCamp, KitProblem } from "./types";

/** At least so many pieces of these kinds; of the kit alone, or of the kit and what is used at one camp. */
export interface CoverRow {
  /** Carried kinds. */
  readonly carried: KindSet;
  /** Bits of what is found at the camp, counted from 0. */
  readonly found: KindSet;
  /** Place of the camp whose found things are meant; −1 when there are none in the row. */
  readonly camp: number;
  readonly least: number;
}

/** Sets of one camp that are written down at once; the rest are looked for when they are missed. */
const MOST_SETS = 1500;

/** The sets of kinds that matter: the classes' own and everything that is put together from them. */
function listUnions(classes: readonly NeedClass[]): { readonly sets: readonly KindSet[]; readonly isWhole: boolean } {
  const sets = new Set<KindSet>();
  for (const { kinds } of classes) {
    for (const set of [...sets]) {
      sets.add(set | kinds);
      if (sets.size > MOST_SETS) return { sets: [...sets], isWhole: false };
    }
    sets.add(kinds);
  }
  return { sets: [...sets], isWhole: true };
}

export function splitSet(set: KindSet, kindCount: number): { readonly carried: KindSet; readonly found: KindSet } {
  const carried = set & ((1 << kindCount) - 1);
  return { carried, found: set >>> kindCount };
}

/**
 * What P. Hall's condition asks of a kit at one camp for this set: pieces of the set ≥ needs that only the set can meet.
 * With spares also: where what is found does not do, the carried part has to be so many larger. Losing pieces hurts most
 * when they are all of one tight set, so that these rows together mean "whichever are lost".
 */
export function rowsOfSet(
  problem: KitProblem,
  campAt: number,
  classes: readonly NeedClass[],
  set: KindSet,
): CoverRow[] {
  const camp = problem.camps[campAt];
  if (!camp) return [];
  const { carried, found } = splitSet(set, problem.kinds.length);
  const least = countWithin(classes, set);
  const rows: CoverRow[] = [{ carried, found, camp: found === 0 ? -1 : campAt, least }];
  const stillCarried =
    least -
    supplyOf(
      found,
      camp.found.map((one) => one.most),
    );
  if (problem.spares > 0 && stillCarried > 0) {
    rows.push({ carried, found: 0, camp: -1, least: stillCarried + problem.spares });
  }
  return rows;
}

/** The sets of a camp that matter, and whether they are all of them. */
export function listSets(camp: KitCamp): { readonly sets: readonly KindSet[]; readonly isWhole: boolean } {
  return listUnions(groupNeeds(camp.needs));
}

/** Rows that a kit has to obey; `isWhole` says that obeying them is enough. Of equal rows the strictest is kept. */
export function listCoverRows(problem: KitProblem): { readonly rows: readonly CoverRow[]; readonly isWhole: boolean } {
  const strictest = new Map<string, CoverRow>();
  let isWhole = true;
  problem.camps.forEach((camp, campAt) => {
    const classes = groupNeeds(camp.needs);
    const own = listUnions(classes);
    isWhole &&= own.isWhole;
    for (const set of own.sets) {
      rowsOfSet(problem, campAt, classes, set).forEach((row) => keepStrictest(strictest, row));
    }
  });
  return { rows: [...strictest.values()], isWhole };
}

function keepStrictest(rows: Map<string, CoverRow>, row: CoverRow): void {
  const key = `${row.carried}|${row.camp}|${row.found}`;
  const known = rows.get(key);
  if (!known || known.least < row.least) rows.set(key, row);
}

/** What one piece costs, tenths of a gram: its mass, and the work that setting it takes beyond a stake's. */
export const pieceCost = (problem: Pick<KitProblem, "workPriceUnits">, kind: CarriedKind): number =>
  kind.massUnits + Math.round(kind.extraWork * problem.workPriceUnits);

/** What using one found thing costs, tenths of a gram. */
export const foundCost = (problem: Pick<KitProblem, "workPriceUnits">, found: FoundKind): number =>
  Math.round(found.work * problem.workPriceUnits);

/** A piece counts for so much, so that among kits of equal cost the one with the fewest pieces is taken. */
const COST_SCALE = 10_000;

export const kindName = (kind: number): string => `k${kind}`;
export const foundName = (camp: number, found: number): string => `f${camp}_${found}`;

const sumOf = (terms: readonly string[]): string => (terms.length > 0 ? terms.join(" + ") : "0 none");

/** The program in LP format: whole counts of each kind (and of found things at each camp) of least cost. */
export function writeProgram(problem: KitProblem, rows: readonly CoverRow[], isRelaxed = false): string {
  const counts = problem.kinds.map((kind, at) => ({
    name: kindName(at),
    cost: pieceCost(problem, kind) * COST_SCALE + 1,
    most: kind.most,
  }));
  const used = problem.camps.flatMap((camp, campAt) =>
    camp.found.map((found, at) => ({
      name: foundName(campAt, at),
      cost: foundCost(problem, found) * COST_SCALE + 1,
      most: found.most,
    })),
  );
  const all = [...counts, ...used];
  const lines = rows.map((row, at) => {
    const terms = [
      ...listKinds(row.carried).map(kindName),
      ...listKinds(row.found).map((found) => foundName(row.camp, found)),
    ];
    return ` r${at}: ${sumOf(terms)} >= ${row.least}`;
  });
  return [
    "Minimize",
    ` cost: ${sumOf(all.map(({ name, cost }) => `${cost} ${name}`))}`,
    "Subject To",
    ...lines,
    "Bounds",
    ...all.map(({ name, most }) => ` 0 <= ${name} <= ${most}`),
    " 0 <= none <= 0",
    ...(isRelaxed || all.length === 0 ? [] : ["General", ` ${all.map((one) => one.name).join(" ")}`]),
    "End",
  ].join("\n");
}
