// Companions of a term: what goes with it by grammatical relation and by co-occurrence, and which longer terms hold it whole.
import { findUses } from '../../corpus/concordance.js';
import type { Corpus } from '../../corpus/corpus.js';
import { countDocuments } from '../places.js';
import type { Use } from '../places.js';
import { companionsByRelation } from './byRelation.js';
import type { RelatedCompanion } from './byRelation.js';
import { companionsBySegment } from './coOccurrence.js';
import type { SegmentCompanions } from './coOccurrence.js';
import { ranked } from './companion.js';
import type { Floor } from './companion.js';
import type { SegmentKind } from './segments.js';
import { outsideWholes, wholenessOf, wholesAround } from './wholes.js';
import type { Wholeness } from './wholes.js';
import { wordMargins } from './wordMargins.js';

export { COMPANION_RELATIONS } from './grammar.js';
export type { CompanionRelation } from './grammar.js';
export { SEGMENT_KINDS } from './segments.js';
export type { SegmentKind } from './segments.js';
export type { RelatedCompanion } from './byRelation.js';
export type { CoOccurring } from './coOccurrence.js';
export type { Wholeness } from './wholes.js';
export type { Floor } from './companion.js';

/** Everything that goes with one term in one corpus. */
export interface CompanionsOfTerm {
  /** Uses in which the term stands for itself, in no longer term that is kept whole. */
  readonly uses: readonly Use[];
  readonly documents: number;
  readonly related: readonly RelatedCompanion[];
  /** What every one of the `related` reaches. */
  readonly floor: Floor;
  readonly segments: SegmentCompanions;
  /** What every companion of `segments` reaches. */
  readonly segmentFloor: Floor;
  /** The term itself, where it has several words and is used often enough to tell. */
  readonly whole: Wholeness | undefined;
  /** Longer terms that hold this one and are kept whole; their uses are not counted above. */
  readonly heldIn: readonly Wholeness[];
}

/** All that goes with a term given by its forms, strongest first; see {@link CompanionsOfTerm}. */
export function findCompanions(corpus: Corpus, forms: readonly string[], kind: SegmentKind): CompanionsOfTerm {
  const all = usesOfForms(corpus, forms);
  const heldIn = wholesAround(corpus, all);
  const uses = outsideWholes(corpus, all, heldIn);
  const { floor, companions: related } = ranked(companionsByRelation(corpus, uses));
  const segments = companionsBySegment(corpus, uses, kind);
  const { floor: segmentFloor, companions } = ranked(segments.companions);
  return {
    ...{ uses, documents: countDocuments(corpus.stream, uses), related, floor },
    ...{ segments: { ...segments, companions }, segmentFloor },
    ...{ whole: wholenessOf(corpus, commonestForm(corpus, forms)), heldIn },
  };
}

/** The strongest companions of a term by relation, measured roughly for showing at once; none where it is not used. */
export function companionsOf(corpus: Corpus, forms: readonly string[], most: number): RelatedCompanion[] {
  return ranked(companionsByRelation(corpus, usesOfForms(corpus, forms), wordMargins(corpus))).companions.slice(
    0,
    most,
  );
}

/** The uses of all forms of a term, in the order of the stream; a form inside a longer one at its place is not counted. */
export function usesOfForms(corpus: Corpus, forms: readonly string[]): Use[] {
  const byRow = new Map<number, number>();
  for (const form of new Set(forms.map((text) => text.toLowerCase()))) {
    const length = form.trim().split(/\s+/).length;
    for (const row of findUses(corpus, form).rows) byRow.set(row, Math.max(length, byRow.get(row) ?? 0));
  }
  return [...byRow].map(([row, length]) => ({ row, length })).sort((a, b) => a.row - b.row);
}

function commonestForm(corpus: Corpus, forms: readonly string[]): number[] {
  let best: { words: number[]; uses: number } = { words: [], uses: 0 };
  for (const form of forms) {
    const uses = findUses(corpus, form).rows.length;
    if (uses <= best.uses) continue;
    best = {
      words: form
        .toLowerCase()
        .trim()
        .split(/\s+/)
        .map((word) => corpus.vocabulary.find(word)!),
      uses,
    };
  }
  return best.words;
}
