// Companions: the words that go with a term more often than chance would have it.
import { compareCodeUnits } from '../base/order.js';
import type { Corpus } from '../corpus/corpus.js';
import { findUses } from '../corpus/concordance.js';
import { logLikelihoodRatio } from '../corpus/statistics/association.js';
import { FactFlag } from '../facts/flags.js';
import { TAG, TokenFlag } from '../tokens/tokens.js';

/** Where a companion stands to its term. */
export type CompanionPlace = 'before' | 'after' | 'verb';

/** One word that goes with a term. */
export interface Companion {
  /** The word in its dictionary form. */
  readonly word: string;
  readonly place: CompanionPlace;
  readonly count: number;
  /** Log-likelihood ratio G² of the pair (Dunning 1993), in nats × 2. */
  readonly strength: number;
}

/** G² above which a pair is no accident: χ² with one degree of freedom at p = .001. */
const NO_ACCIDENT = 10.83;
/** How far before a term its verb may stand, in tokens. */
const REACH = 4;

/**
 * The companions of a term given by its forms: content words right before and after it, and the verb that governs it.
 * Strongest first, ties by code units.
 */
export function companionsOf(corpus: Corpus, forms: readonly string[], most: number): Companion[] {
  const { stream, vocabulary } = corpus;
  const counts = new Map<string, { lemma: number; place: CompanionPlace; count: number }>();
  const put = (place: CompanionPlace, row: number): void => {
    const lemma = stream.lemma[row]!;
    const key = `${place} ${lemma}`;
    const known = counts.get(key);
    if (known === undefined) counts.set(key, { lemma, place, count: 1 });
    else known.count++;
  };
  let uses = 0;
  for (const form of new Set(forms.map((text) => text.toLowerCase()))) {
    const length = form.split(/\s+/).length;
    for (const first of findUses(corpus, form).rows) {
      uses++;
      if (isCompanion(corpus, first - 1, first) && stream.tag[first - 1] !== TAG.VERB) put('before', first - 1);
      if (isCompanion(corpus, first + length, first + length)) put('after', first + length);
      const verb = verbBefore(corpus, first);
      if (verb !== undefined) put('verb', verb);
    }
  }
  const all = stream.length;
  const lemmaUses = usesOfLemmas(corpus);
  return [...counts.values()]
    .filter(({ count }) => count >= 2)
    .map(({ lemma, place, count }) => {
      const elsewhere = Math.max(0, lemmaUses[lemma]! - count);
      const cells = { both: count, onlyFirst: uses - count, onlySecond: elsewhere, neither: all - uses - elsewhere };
      return { word: vocabulary.textOf(lemma), place, count, strength: logLikelihoodRatio(cells) };
    })
    .filter(({ strength }) => strength >= NO_ACCIDENT)
    .sort((a, b) => b.strength - a.strength || compareCodeUnits(a.word, b.word) || compareCodeUnits(a.place, b.place))
    .slice(0, most);
}

/** True where a row holds a content word of the same sentence; `later` is the later row of the two neighbours. */
function isCompanion({ stream }: Corpus, row: number, later: number): boolean {
  if (row < 0 || later >= stream.length || stream.counted[row] === 0) return false;
  const flags = stream.flags[row]!;
  const breaks = (stream.flags[later]! & TokenFlag.sentenceStart) !== 0;
  return !breaks && (flags & TokenFlag.word) !== 0 && (flags & FactFlag.functionWord) === 0;
}

/** The row of the verb that stands before a noun phrase, over its article and modifiers. */
function verbBefore({ stream }: Corpus, first: number): number | undefined {
  for (let row = first - 1, steps = 0; row >= 0 && steps < REACH; row--, steps++) {
    if ((stream.flags[row + 1]! & TokenFlag.sentenceStart) !== 0 || stream.counted[row] === 0) return undefined;
    const tag = stream.tag[row]!;
    if (tag === TAG.VERB) return row;
    if (tag !== TAG.DET && tag !== TAG.ADJ && tag !== TAG.NOUN && tag !== TAG.PRON && tag !== TAG.NUM) return undefined;
  }
  return undefined;
}

const LEMMA_USES = new WeakMap<Corpus, Uint32Array>();

function usesOfLemmas(corpus: Corpus): Uint32Array {
  let uses = LEMMA_USES.get(corpus);
  if (uses === undefined) {
    const { stream } = corpus;
    uses = new Uint32Array(corpus.vocabulary.size);
    for (let row = 0; row < stream.length; row++) if (stream.counted[row] === 1) uses[stream.lemma[row]!]!++;
    LEMMA_USES.set(corpus, uses);
  }
  return uses;
}
