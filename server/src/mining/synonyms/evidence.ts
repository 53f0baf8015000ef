// What speaks for two terms being one concept: pairs of terms, each with its evidence from independent sources.

/** Where evidence comes from. */
export type EvidenceKind =
  | 'list'
  | 'dictionary'
  | 'component'
  | 'definition'
  | 'renaming'
  | 'link-target'
  | 'parallel-place'
  | 'near-sentence'
  | 'past-edit'
  | 'containment'
  | 'neighbours';

/** One piece of evidence for a pair, with a sentence fragment for a writer. */
export interface Evidence {
  readonly kind: EvidenceKind;
  /** How strongly it speaks for one concept, from 0 (not at all) to 1. */
  readonly strength: number;
  readonly text: string;
  /** The figure behind it. */
  readonly value: number;
  /** For a differing part: the two words, and how the sentence ends. */
  readonly parts?: { readonly words: readonly [string, string]; readonly says: string };
}

/** Two terms by their index, the smaller first. */
export interface Pair {
  readonly a: number;
  readonly b: number;
  readonly evidence: readonly Evidence[];
}

/** Collects evidence by pair. */
export class PairCollector {
  private readonly found = new Map<number, { a: number; b: number; evidence: Evidence[] }>();

  /** @param terms the number of terms, an upper bound of their indexes */
  constructor(private readonly terms: number) {}

  add(one: number, other: number, evidence: Evidence): void {
    if (one === other) return;
    const a = Math.min(one, other);
    const b = Math.max(one, other);
    const key = a * this.terms + b;
    const pair = this.found.get(key);
    if (pair === undefined) this.found.set(key, { a, b, evidence: [evidence] });
    else pair.evidence.push(evidence);
  }

  /** All pairs in order of their indexes, which is the order of uses. */
  pairs(): Pair[] {
    return [...this.found.values()].sort((x, y) => x.a - y.a || x.b - y.b);
  }
}
