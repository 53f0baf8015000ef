// All tokens of a corpus in one row of columns, and where each word stands: derived whole from a snapshot's documents.
import { FactFlag } from '../facts/flags.js';
import { isOpen } from '../prose/zones.js';
import type { ZoneSet } from '../prose/zones.js';
import { TokenFlag } from '../tokens/tokens.js';
import type { CorpusDocument } from './corpusDocument.js';
import type { Vocabulary } from './vocabulary.js';

/**
 * The tokens of all documents, one row a token, documents in order of their URIs. Word columns hold vocabulary numbers.
 */
export interface TokenStream {
  readonly length: number;
  /** The word as spelled. */
  readonly spelling: Uint32Array;
  /** The word in lower case: the identity of words in n-grams. */
  readonly fold: Uint32Array;
  readonly lemma: Uint32Array;
  readonly tag: Uint8Array;
  readonly flags: Uint8Array;
  readonly zones: Uint16Array;
  /** 1 where the token counts: in open zones, and in the first block (in document order) of its prose. */
  readonly counted: Uint8Array;
  /** Document `d` has the rows `[documentFirst[d], documentFirst[d + 1])`. */
  readonly documentFirst: Uint32Array;
  /** Block `b`, numbered through, has the rows `[blockFirst[b], blockFirst[b + 1])`. */
  readonly blockFirst: Uint32Array;
  readonly blockKind: Uint8Array;
  /** The rows of counted tokens of a lower-case word, ascending. */
  rowsOf(fold: number): Uint32Array;
  /** The document of a row. */
  documentOf(row: number): number;
  /** The block (numbered through) of a row. */
  blockOf(row: number): number;
  /** True where the word of a row, spelled so, is a name in its document's code as well. */
  isNameInCode(row: number): boolean;
}

/** True where a counted word follows the row before it with nothing but white space between. */
export function followsOn(stream: TokenStream, row: number): boolean {
  const flags = stream.flags[row]!;
  return (
    (flags & TokenFlag.word) !== 0 &&
    (flags & TokenFlag.spaceBefore) !== 0 &&
    (flags & TokenFlag.sentenceStart) === 0 &&
    (stream.flags[row - 1]! & TokenFlag.possessive) === 0 &&
    stream.counted[row] === 1
  );
}

/** True for a counted word that is not one of grammar. */
export function isContent(stream: TokenStream, row: number): boolean {
  const wanted = TokenFlag.word | FactFlag.functionWord;
  return stream.counted[row] === 1 && (stream.flags[row]! & wanted) === TokenFlag.word;
}

/** The first row of the block that a row stands in. */
export function firstRowOfBlock(stream: TokenStream, row: number): number {
  return stream.blockFirst[stream.blockOf(row)]!;
}

/** One after the last row of the block that a row stands in. */
export function endRowOfBlock(stream: TokenStream, row: number): number {
  return stream.blockFirst[stream.blockOf(row) + 1]!;
}

/** Lays the documents' columns end to end and indexes the counted tokens by word. */
export function makeStream(documents: readonly CorpusDocument[], vocabulary: Vocabulary, closed: ZoneSet): TokenStream {
  const length = documents.reduce((sum, { facts }) => sum + facts.word.length, 0);
  const blockCount = documents.reduce((sum, { facts }) => sum + facts.blockKind.length, 0);
  const spelling = new Uint32Array(length);
  const fold = new Uint32Array(length);
  const lemma = new Uint32Array(length);
  const tag = new Uint8Array(length);
  const flags = new Uint8Array(length);
  const zones = new Uint16Array(length);
  const counted = new Uint8Array(length);
  const documentFirst = new Uint32Array(documents.length + 1);
  const blockFirst = new Uint32Array(blockCount + 1);
  const blockKind = new Uint8Array(blockCount);
  const seenBlocks = new Set<number>();
  let row = 0;
  let block = 0;
  documents.forEach(({ facts, ids, blocks }, documentIndex) => {
    tag.set(facts.tag, row);
    flags.set(facts.flags, row);
    zones.set(facts.zones, row);
    blockKind.set(facts.blockKind, block);
    for (let b = 0; b < blocks.length; b++) {
      const first = !seenBlocks.has(blocks[b]!);
      if (first) seenBlocks.add(blocks[b]!);
      for (let i = facts.blockFirst[b]!; i < facts.blockFirst[b + 1]!; i++) {
        const id = ids[facts.word[i]!]!;
        spelling[row + i] = id;
        fold[row + i] = vocabulary.foldOf(id);
        lemma[row + i] = ids[facts.lemma[i]!]!;
        counted[row + i] = first && isOpen(facts.zones[i]!, closed) ? 1 : 0;
      }
      blockFirst[block + b] = row + facts.blockFirst[b]!;
    }
    row += facts.word.length;
    block += blocks.length;
    documentFirst[documentIndex + 1] = row;
  });
  blockFirst[blockCount] = row;
  const index = indexRows(fold, counted, vocabulary.size);
  const documentOf = (at: number): number => lastAtOrBefore(documentFirst, at);
  return {
    ...{ length, spelling, fold, lemma, tag, flags, zones, counted, documentFirst, blockFirst, blockKind },
    rowsOf: (word) => index.rows.subarray(index.first[word] ?? 0, index.first[word + 1] ?? 0),
    documentOf,
    blockOf: (at) => lastAtOrBefore(blockFirst, at),
    isNameInCode: (at) => {
      const document = documentOf(at);
      const { facts } = documents[document]!;
      return facts.inCode[facts.word[at - documentFirst[document]!]!] === 1;
    },
  };
}

/** A counting sort of the counted rows by word. */
function indexRows(fold: Uint32Array, counted: Uint8Array, words: number): { rows: Uint32Array; first: Uint32Array } {
  const first = new Uint32Array(words + 1);
  let total = 0;
  for (let row = 0; row < fold.length; row++) {
    if (counted[row] === 1) {
      first[fold[row]! + 1]!++;
      total++;
    }
  }
  for (let word = 0; word < words; word++) first[word + 1]! += first[word]!;
  const next = first.slice();
  const rows = new Uint32Array(total);
  for (let row = 0; row < fold.length; row++) if (counted[row] === 1) rows[next[fold[row]!]!++] = row;
  return { rows, first };
}

/** The last index `i` with `firsts[i] <= at`, leaving out the closing entry. */
function lastAtOrBefore(firsts: Uint32Array, at: number): number {
  let low = 0;
  let high = firsts.length - 2;
  while (low < high) {
    const middle = (low + high + 1) >>> 1;
    if (firsts[middle]! <= at) low = middle;
    else high = middle - 1;
  }
  return low;
}
