// Companions by co-occurrence: the words that share a window, sentence, paragraph, section or document with a term.
import type { Corpus } from '../../corpus/corpus.js';
import { cellsOf, pmi } from '../../corpus/statistics/association.js';
import type { Marginals } from '../../corpus/statistics/association.js';
import { presenceInformation } from '../../corpus/statistics/probability.js';
import { isContent } from '../../corpus/stream.js';
import type { TokenStream } from '../../corpus/stream.js';
import { TokenFlag } from '../../tokens/tokens.js';
import type { Use } from '../places.js';
import { attraction } from './companion.js';
import type { CompanionFigures } from './companion.js';
import { cutInto } from './segments.js';
import { shownWord } from './shownWord.js';
import type { SegmentKind } from './segments.js';

/** A word that meets a term in segments of one kind; information in bits, from the smoothed counts. */
export interface CoOccurring extends CompanionFigures {
  /** Segments that hold the word. */
  readonly segments: number;
  /** I(word; term): how much the presence of one tells of the other's. */
  readonly mutualInformation: number;
  /** H(word): how uncertain the word's presence in a segment is by itself, … */
  readonly entropy: number;
  /** … and H(word | term): how uncertain it stays where the term's presence is known. */
  readonly conditionalEntropy: number;
  /** log2 of how many times more often both meet than chance would have it (pointwise mutual information). */
  readonly lift: number;
}

/** The companions of a term in segments of one kind. */
export interface SegmentCompanions {
  readonly kind: SegmentKind;
  /** Segments of this kind in the corpus; for windows, the words of content that could stand in one. */
  readonly all: number;
  /** Segments that hold the term; for windows, the words of content that stand in one of its windows. */
  readonly withTerm: number;
  readonly companions: readonly CoOccurring[];
}

/** Words and signs to either side that a window takes in. */
export const WINDOW = 5;
const KEPT_ROWS = 200;

/** Gathers every word of content that meets a term, in no order. */
export function companionsBySegment(corpus: Corpus, uses: readonly Use[], kind: SegmentKind): SegmentCompanions {
  const own = ownRows(uses);
  return kind === 'window' ? byWindow(corpus, uses, own) : bySegmentOf(corpus, uses, own, kind);
}

interface Met {
  count: number;
  readonly rows: number[];
  readonly documents: Set<number>;
}

/**
 * Surface co-occurrence (Evert 2008, §4.1): the units are words of content; a word is in a window where a use of the term stands
 * within {@link WINDOW} words of it in its sentence.
 */
function byWindow(corpus: Corpus, uses: readonly Use[], own: ReadonlySet<number>): SegmentCompanions {
  const { stream } = corpus;
  const met = new Map<number, Met>();
  const taken = new Set<number>();
  const take = (row: number, use: Use): void => {
    if (taken.has(row) || own.has(row) || !isCompanionWord(stream, row)) return;
    taken.add(row);
    meet(met, stream, stream.lemma[row]!, use.row);
  };
  for (const use of uses) {
    for (let row = use.row, steps = 0; steps < WINDOW && row > 0; steps++) {
      if ((stream.flags[row]! & TokenFlag.sentenceStart) !== 0) break;
      take(--row, use);
    }
    for (let row = use.row + use.length, steps = 0; steps < WINDOW && row < stream.length; row++, steps++) {
      if ((stream.flags[row]! & TokenFlag.sentenceStart) !== 0) break;
      take(row, use);
    }
  }
  const totals = new Map<number, number>();
  let all = 0;
  for (let row = 0; row < stream.length; row++) {
    if (own.has(row) || !isCompanionWord(stream, row)) continue;
    all++;
    totals.set(stream.lemma[row]!, (totals.get(stream.lemma[row]!) ?? 0) + 1);
  }
  return figures(corpus, 'window', met, totals, taken.size, all);
}

/** Textual co-occurrence (Evert 2008, §4.2): the units are segments; each counts once, however often it holds a word. */
function bySegmentOf(
  corpus: Corpus,
  uses: readonly Use[],
  own: ReadonlySet<number>,
  kind: Exclude<SegmentKind, 'window'>,
): SegmentCompanions {
  const { stream } = corpus;
  const of = cutInto(stream, kind);
  const useIn = new Map<number, number>();
  for (const { row } of uses) if (!useIn.has(of[row]!)) useIn.set(of[row]!, row);
  const totals = new Map<number, number>();
  const met = new Map<number, Met>();
  let all = 0;
  for (let row = 0; row < stream.length;) {
    const segment = of[row]!;
    const words = new Set<number>();
    let counted = false;
    for (; row < stream.length && of[row] === segment; row++) {
      counted ||= stream.counted[row] === 1;
      if (!own.has(row) && isCompanionWord(stream, row)) words.add(stream.lemma[row]!);
    }
    // A repeated or closed segment is none.
    if (!counted) continue;
    all++;
    const use = useIn.get(segment);
    for (const word of words) {
      totals.set(word, (totals.get(word) ?? 0) + 1);
      if (use !== undefined) meet(met, stream, word, use);
    }
  }
  return figures(corpus, kind, met, totals, useIn.size, all);
}

function meet(met: Map<number, Met>, stream: TokenStream, word: number, row: number): void {
  let known = met.get(word);
  if (known === undefined) met.set(word, (known = { count: 0, rows: [], documents: new Set() }));
  known.count++;
  known.documents.add(stream.documentOf(row));
  if (known.rows.length < KEPT_ROWS) known.rows.push(row);
}

function figures(
  corpus: Corpus,
  kind: SegmentKind,
  met: ReadonlyMap<number, Met>,
  totals: ReadonlyMap<number, number>,
  withTerm: number,
  all: number,
): SegmentCompanions {
  const companions = [...met].map(([word, { count, rows, documents }]): CoOccurring => {
    const counts: Marginals = { c1: withTerm, c2: totals.get(word)!, c12: count, n: all };
    const { entropy2, conditional2, mutual } = presenceInformation(counts);
    return {
      ...{ word: shownWord(corpus, word), count, documents: documents.size, rows },
      strength: attraction(cellsOf(counts)),
      ...{ segments: counts.c2, mutualInformation: mutual, entropy: entropy2, conditionalEntropy: conditional2 },
      lift: pmi(counts),
    };
  });
  return { kind, all, withTerm, companions };
}

/** The rows of the term itself, which is no companion of its own. */
function ownRows(uses: readonly Use[]): ReadonlySet<number> {
  const rows = new Set<number>();
  for (const { row, length } of uses) for (let at = row; at < row + length; at++) rows.add(at);
  return rows;
}

function isCompanionWord(stream: TokenStream, row: number): boolean {
  return isContent(stream, row) && (stream.flags[row]! & TokenFlag.identifier) === 0;
}
