// How alike two sparse vectors of weighted features are: cosine, Lin and weighted Jaccard.

/** Feature ids in strictly rising order and a weight for each. */
export interface SparseVector {
  readonly ids: Uint32Array;
  readonly weights: Float64Array;
}

/** A measure between 0 and 1 (cosine of vectors with negative weights: from −1). */
export type Similarity = (a: SparseVector, b: SparseVector) => number;

/**
 * Builds a vector from pairs that need not be sorted.
 * @throws RangeError for an id given twice, or a weight that is no finite number.
 */
export function sparseVector(features: Iterable<readonly [id: number, weight: number]>): SparseVector {
  const sorted = [...features].sort((a, b) => a[0] - b[0]);
  const vector = { ids: new Uint32Array(sorted.length), weights: new Float64Array(sorted.length) };
  sorted.forEach(([id, weight], i) => {
    if (!Number.isInteger(id) || id < 0 || id > 0xffffffff)
      throw new RangeError(`feature id ${id} is no unsigned 32-bit number`);
    if (i > 0 && vector.ids[i - 1] === id) throw new RangeError(`feature ${id} is given twice`);
    if (!Number.isFinite(weight)) throw new RangeError(`the weight of feature ${id} is ${weight}`);
    vector.ids[i] = id;
    vector.weights[i] = weight;
  });
  return vector;
}

/** Cosine of the angle between two vectors; 0 when either has no weight. */
export function cosine(a: SparseVector, b: SparseVector): number {
  const norm = Math.sqrt(squares(a)) * Math.sqrt(squares(b));
  if (norm === 0) return 0;
  let dot = 0;
  overlap(a, b, (x, y) => {
    dot += x * y;
  });
  return Math.max(-1, Math.min(1, dot / norm));
}

/**
 * Lin's measure, Σ over shared features of (x + y) over Σ of all weights of both (Lin 1998, "Automatic retrieval and
 * clustering of similar words", eq. 4). Weights must not be negative.
 */
export function lin(a: SparseVector, b: SparseVector): number {
  const all = total(a) + total(b);
  if (all === 0) return 0;
  let shared = 0;
  overlap(a, b, (x, y) => {
    if (x > 0 && y > 0) shared += x + y;
  });
  return Math.min(1, shared / all);
}

/** Weighted Jaccard, Σ min/Σ max (Grefenstette 1994). Weights must not be negative. */
export function jaccard(a: SparseVector, b: SparseVector): number {
  let smaller = 0;
  overlap(a, b, (x, y) => {
    smaller += x < y ? x : y;
  });
  const larger = total(a) + total(b) - smaller;
  return larger <= 0 ? 0 : Math.min(1, smaller / larger);
}

/** Walks the features that both vectors have, in rising order of id. */
function overlap(a: SparseVector, b: SparseVector, visit: (x: number, y: number) => void): void {
  const { ids: left, weights: leftWeights } = a;
  const { ids: right, weights: rightWeights } = b;
  let i = 0;
  let j = 0;
  while (i < left.length && j < right.length) {
    const x = left[i] as number;
    const y = right[j] as number;
    if (x === y) visit(leftWeights[i++] as number, rightWeights[j++] as number);
    else if (x < y) i++;
    else j++;
  }
}

function squares(vector: SparseVector): number {
  let sum = 0;
  for (const weight of vector.weights) sum += weight * weight;
  return sum;
}

function total(vector: SparseVector): number {
  let sum = 0;
  for (const weight of vector.weights) {
    if (weight < 0) throw new RangeError(`this similarity needs weights of at least 0, not ${weight}`);
    sum += weight;
  }
  return sum;
}
