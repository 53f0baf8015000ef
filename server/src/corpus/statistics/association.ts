// How strongly two events go together: measures over the counts of each and of both.

/**
 * Counts by margin: `c1` and `c2` units have the first and the second event, `c12` of them have both, out of `n`.
 * Not to be confused with {@link Cells}, whose entries do not overlap.
 */
export interface Marginals {
  readonly c1: number;
  readonly c2: number;
  readonly c12: number;
  readonly n: number;
}

/** A 2 × 2 contingency table: every unit is in exactly one cell. */
export interface Cells {
  readonly both: number;
  readonly onlyFirst: number;
  readonly onlySecond: number;
  readonly neither: number;
}

/**
 * Returns the same counts if they can be true of one set of units.
 * @throws RangeError that names the contradiction.
 */
export function checkedMarginals(counts: Marginals): Marginals {
  const { c1, c2, c12, n } = counts;
  for (const [name, value] of [
    ['c1', c1],
    ['c2', c2],
    ['c12', c12],
    ['n', n],
  ] as const) {
    if (!Number.isFinite(value) || value < 0)
      throw new RangeError(`${name} must be a finite count of at least 0, not ${value}`);
  }
  if (n === 0) throw new RangeError('n is 0: there is nothing to count');
  if (c12 > c1 || c12 > c2) throw new RangeError(`c12 (${c12}) exceeds c1 (${c1}) or c2 (${c2})`);
  if (c1 > n || c2 > n) throw new RangeError(`c1 (${c1}) or c2 (${c2}) exceeds n (${n})`);
  if (n - c1 - c2 + c12 < 0) throw new RangeError(`c1 (${c1}) + c2 (${c2}) − c12 (${c12}) exceeds n (${n})`);
  return counts;
}

/** The contingency table that the margins imply. */
export function cellsOf(counts: Marginals): Cells {
  const { c1, c2, c12, n } = checkedMarginals(counts);
  return { both: c12, onlyFirst: c1 - c12, onlySecond: c2 - c12, neither: n - c1 - c2 + c12 };
}

/** The margins of a contingency table. */
export function marginalsOf(cells: Cells): Marginals {
  const { both, onlyFirst, onlySecond, neither } = checkedCells(cells);
  return { c1: both + onlyFirst, c2: both + onlySecond, c12: both, n: both + onlyFirst + onlySecond + neither };
}

/**
 * Pointwise mutual information in bits, log2 (c12 · n)/(c1 · c2) (Church & Hanks 1990).
 * −Infinity when the two never meet.
 * @throws RangeError when either event never happens: the measure is undefined.
 */
export function pmi(counts: Marginals): number {
  const { c1, c2, c12, n } = checkedMarginals(counts);
  if (c1 === 0 || c2 === 0) throw new RangeError('PMI is undefined for an event that never happens');
  return Math.log2((c12 / c1) * (n / c2));
}

/**
 * Normalised PMI between −1 (never together) over 0 (independent) to 1 (only ever together) (Bouma 2009).
 * Two events that are always both present tell nothing about each other: 0.
 */
export function npmi(counts: Marginals): number {
  const bits = pmi(counts);
  if (counts.c12 === 0) return -1;
  if (counts.c12 === counts.n) return 0;
  return Math.min(1, bits / -Math.log2(counts.c12 / counts.n));
}

/** PMI in bits where it is positive, else 0 (Niwa & Nitta 1994; Jurafsky & Martin, 3rd ed., ch. 6). */
export function ppmi(counts: Marginals): number {
  return Math.max(0, pmi(counts));
}

/**
 * Student's t of a co-occurrence, (c12 − c1·c2/n)/√c12, with the variance approximated by the mean
 * (Manning & Schütze 1999, §5.3.1). −Infinity when the two never meet though they were expected to.
 */
export function tScore(counts: Marginals): number {
  const { c1, c2, c12, n } = checkedMarginals(counts);
  const surplus = c12 - (c1 / n) * c2;
  if (c12 > 0) return surplus / Math.sqrt(c12);
  return surplus < 0 ? -Infinity : 0;
}

/** Dice coefficient 2·c12/(c1 + c2), between 0 and 1; 0 when neither event happens. */
export function dice(counts: Marginals): number {
  const { c1, c2, c12 } = checkedMarginals(counts);
  return c1 + c2 === 0 ? 0 : (2 * c12) / (c1 + c2);
}

/**
 * Log-likelihood ratio G² = 2 Σ observed · ln(observed/expected) (Dunning 1993); χ² distributed with one degree of
 * freedom. Empty cells contribute 0, which is the limit.
 */
export function logLikelihoodRatio(cells: Cells): number {
  const { c1, c2, n } = marginalsOf(cells);
  const sum =
    share(cells.both, c1, c2, n) +
    share(cells.onlyFirst, c1, n - c2, n) +
    share(cells.onlySecond, n - c1, c2, n) +
    share(cells.neither, n - c1, n - c2, n);
  return Math.max(0, 2 * sum);
}

/**
 * Pearson's χ² of a 2 × 2 table without continuity correction (Manning & Schütze 1999, eq. 5.7).
 * 0 when a margin is empty: such a table shows no dependence.
 */
export function chiSquared(cells: Cells): number {
  const { c1, c2, n } = marginalsOf(cells);
  const { both, onlyFirst, onlySecond, neither } = cells;
  if (c1 === 0 || c2 === 0 || c1 === n || c2 === n) return 0;
  const difference = both * neither - onlyFirst * onlySecond;
  return (difference / c1) * (difference / c2) * (n / (n - c1) / (n - c2));
}

function share(observed: number, row: number, column: number, n: number): number {
  return observed === 0 ? 0 : observed * Math.log((observed / row) * (n / column));
}

function checkedCells(cells: Cells): Cells {
  const values = [cells.both, cells.onlyFirst, cells.onlySecond, cells.neither];
  for (const value of values) {
    if (!Number.isFinite(value) || value < 0)
      throw new RangeError(`a cell must be a finite count of at least 0, not ${value}`);
  }
  if (values.every((value) => value === 0)) throw new RangeError('the table is empty: there is nothing to count');
  return cells;
}
