// Which word sequences are terms: C-value, and how much more often a term is used here than elsewhere.

/** How the length of a term counts: as published, single words score 0; smoothed, they keep a small weight. */
export type LengthWeight = 'published' | 'smoothed';

/** A candidate term's frequency and how it lives inside longer candidates. */
export interface Nesting {
  /** Number of words, at least 1. */
  readonly length: number;
  /** All occurrences, those inside longer candidates included. */
  readonly frequency: number;
  /** Sum over the longer candidates of their *net* occurrences, those inside still longer ones counted once. */
  readonly nested: number;
  /** Number of different longer candidates that hold this one. */
  readonly containers: number;
}

/** A candidate as words in order, with all its occurrences. */
export interface Candidate {
  readonly words: readonly string[];
  readonly frequency: number;
}

/**
 * C-value = w(length) · (f − nested/containers) (Frantzi, Ananiadou & Mima 2000, eq. 2), w = log2(length) as
 * published or log2(length + 0.1), by which single words and longer ones share one scale (common practice).
 * @throws RangeError when the counts contradict each other.
 */
export function cValue(nesting: Nesting, weight: LengthWeight = 'published'): number {
  const { length, frequency, nested, containers } = nesting;
  if (!Number.isInteger(length) || length < 1)
    throw new RangeError(`length must be a whole number of words, not ${length}`);
  if (!(frequency >= 0) || !(nested >= 0) || !Number.isFinite(frequency + nested)) {
    throw new RangeError(`frequency (${frequency}) and nested (${nested}) must be finite counts of at least 0`);
  }
  if (!Number.isInteger(containers) || containers < 0 || (containers === 0 && nested > 0)) {
    throw new RangeError(`${nested} nested occurrences cannot lie in ${containers} longer terms`);
  }
  const free = containers === 0 ? frequency : frequency - nested / containers;
  return Math.log2(weight === 'published' ? length : length + 0.1) * free;
}

/**
 * C-values of a list of candidates, in its order. Works from the longest down, as the paper's algorithm does, so that
 * an occurrence inside two nested longer candidates is counted once.
 * @throws RangeError when a candidate has no words or occurs twice in the list.
 */
export function cValues(candidates: readonly Candidate[], weight: LengthWeight = 'published'): number[] {
  const index = new Map<string, number>();
  candidates.forEach((candidate, i) => {
    const key = candidate.words.join(' ');
    if (candidate.words.length === 0 || index.has(key))
      throw new RangeError(`candidate "${key}" is empty or given twice`);
    index.set(key, i);
  });
  const nested = new Float64Array(candidates.length);
  const containers = new Uint32Array(candidates.length);
  const longestFirst = candidates
    .map((_, i) => i)
    .sort((a, b) => lengthAt(candidates, b) - lengthAt(candidates, a) || a - b);
  for (const i of longestFirst) {
    const candidate = candidates[i];
    if (candidate === undefined) continue;
    const net = candidate.frequency - (nested[i] ?? 0);
    for (const j of partsOf(candidate.words, index)) {
      nested[j] = (nested[j] ?? 0) + Math.max(0, net);
      containers[j] = (containers[j] ?? 0) + 1;
    }
  }
  return candidates.map((candidate, i) =>
    cValue(
      {
        length: candidate.words.length,
        frequency: candidate.frequency,
        nested: nested[i] ?? 0,
        containers: containers[i] ?? 0,
      },
      weight,
    ),
  );
}

/**
 * How much more often a term is used here than in a reference: ln of the ratio of the two smoothed rates
 * (c + ½)/(size + 1). Positive: a term of this field. Common practice, no source.
 */
export function rateRatio(here: { count: number; size: number }, reference: { count: number; size: number }): number {
  for (const { count, size } of [here, reference]) {
    if (!(count >= 0) || !(size > 0) || !Number.isFinite(size) || count > size) {
      throw new RangeError(`${count} occurrences among ${size} words are impossible`);
    }
  }
  return Math.log(((here.count + 0.5) / (here.size + 1)) * ((reference.size + 1) / (reference.count + 0.5)));
}

function lengthAt(candidates: readonly Candidate[], i: number): number {
  return candidates[i]?.words.length ?? 0;
}

/** Indices of the other candidates that stand inside these words, each once. */
function partsOf(words: readonly string[], index: ReadonlyMap<string, number>): Set<number> {
  const found = new Set<number>();
  for (let length = words.length - 1; length >= 1; length--) {
    for (let start = 0; start + length <= words.length; start++) {
      const j = index.get(words.slice(start, start + length).join(' '));
      if (j !== undefined) found.add(j);
    }
  }
  return found;
}
