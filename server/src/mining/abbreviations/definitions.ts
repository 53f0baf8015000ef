// Where the documents explain their abbreviations: "long form (LF)", "LF (long form)", "LF stands for long form".
import type { Corpus } from '../../corpus/corpus.js';
import { TokenFlag } from '../../tokens/tokens.js';
import { endRowOfBlock, firstRowOfBlock, followsOn } from '../../corpus/stream.js';
import { singularKey } from '../wording.js';
import { aligns, JOINED, longestAlignment } from './alignment.js';

/** One explanation of a short form. */
export interface Definition {
  /** The short form as written, without a plural s. */
  readonly short: string;
  readonly shortRow: number;
  readonly longRow: number;
  readonly longLength: number;
  /** The long form's words in lower case, the last folded to singular, hyphens resolved: one key for its ways of writing. */
  readonly longKey: string;
}

/** A short form in parentheses: letters, of which two are capitals or one is beside a digit; a plural s may follow. */
const SHORT = /^(?=.{2,11}$)\p{L}[\p{L}\p{N}]*(?:[-&/.][\p{L}\p{N}]+)*$/u;

/** The longest long form that is read, in words. */
const LONGEST_LONG = 12;

/** All explanations of short forms in a corpus, in document order. */
export function findDefinitions(corpus: Corpus): Definition[] {
  const { stream, vocabulary } = corpus;
  const found: Definition[] = [];
  const opening = vocabulary.find('(');
  if (opening !== undefined) {
    for (const row of stream.rowsOf(opening)) {
      const definition = longThenShort(corpus, row) ?? shortThenLong(corpus, row);
      if (definition !== undefined) found.push(definition);
    }
  }
  for (const verb of ['stands', 'short']) {
    const id = vocabulary.find(verb);
    if (id === undefined) continue;
    for (const row of stream.rowsOf(id)) {
      const definition = standsFor(corpus, row, verb);
      if (definition !== undefined) found.push(definition);
    }
  }
  return found.sort((a, b) => a.shortRow - b.shortRow);
}

/** The short form that a spelling is, its plural s taken off, or undefined where it is none. */
export function shortFormOf(spelling: string): string | undefined {
  const text = /\p{Lu}s$/u.test(spelling) ? spelling.slice(0, -1) : spelling;
  if (!SHORT.test(text)) return undefined;
  const capitals = text.match(/\p{Lu}/gu)?.length ?? 0;
  return capitals >= 2 || (capitals === 1 && /\p{N}/u.test(text)) ? text : undefined;
}

/** The letters and digits of a short form, in lower case. */
export function lettersOf(short: string): string {
  return short.toLowerCase().replace(/[^\p{L}\p{N}]/gu, '');
}

/** The parts of a word that may give letters: cut at hyphens, slashes and before inner capitals; see {@link JOINED}. */
export function partsOf(spelling: string): string[] {
  return spelling
    .replace(/(\p{Ll})(\p{Lu})/gu, '$1-$2')
    .toLowerCase()
    .split(/[-/]/)
    .filter((part) => part !== '')
    .map((part, index) => (index === 0 ? part : JOINED + part));
}

function longThenShort(corpus: Corpus, opening: number): Definition | undefined {
  const { stream } = corpus;
  const short = shortAt(corpus, opening + 1);
  if (short === undefined || !closes(corpus, opening + 2)) return undefined;
  const words: string[][] = [];
  const start = firstRowOfBlock(stream, opening);
  for (let row = opening - 1; row >= start && words.length < 16; row--) {
    if ((stream.flags[row]! & TokenFlag.word) === 0 || stream.counted[row] !== 1) break;
    words.unshift(partsOf(spellingAt(corpus, row)));
    if (!followsOn(stream, row)) break;
  }
  const length = longestAlignment(lettersOf(short), words);
  return length === 0 ? undefined : makeDefinition(corpus, short, opening + 1, opening - length, length);
}

function shortThenLong(corpus: Corpus, opening: number): Definition | undefined {
  const { stream } = corpus;
  if (opening === firstRowOfBlock(stream, opening)) return undefined;
  const short = shortAt(corpus, opening - 1);
  return short === undefined ? undefined : readLong(corpus, short, opening - 1, opening + 1, true);
}

function standsFor(corpus: Corpus, row: number, verb: string): Definition | undefined {
  const { stream, vocabulary } = corpus;
  if (row + 2 >= endRowOfBlock(stream, row) || stream.fold[row + 1] !== vocabulary.find('for')) return undefined;
  const shortRow = verb === 'stands' ? row - 1 : row - 2;
  if (shortRow < firstRowOfBlock(stream, row)) return undefined;
  const short = shortAt(corpus, shortRow);
  return short === undefined ? undefined : readLong(corpus, short, shortRow, row + 2, false);
}

/** Reads a long form from `first` on: to the closing parenthesis, or as far as the letters go. */
function readLong(
  corpus: Corpus,
  short: string,
  shortRow: number,
  first: number,
  toParenthesis: boolean,
): Definition | undefined {
  const { stream } = corpus;
  const end = endRowOfBlock(stream, shortRow);
  let from = first;
  if (/^(?:an?|the)$/.test(spellingAt(corpus, from).toLowerCase())) from++;
  const parts: string[] = [];
  let longest: Definition | undefined;
  for (let row = from; row < end && row - from < LONGEST_LONG; row++) {
    const isWord = (stream.flags[row]! & TokenFlag.word) !== 0 && stream.counted[row] === 1;
    if (!isWord || (row > from && !followsOn(stream, row))) break;
    parts.push(...partsOf(spellingAt(corpus, row)));
    const complete = parts.length > 1 && aligns(lettersOf(short), parts);
    if (complete && (!toParenthesis || closes(corpus, row + 1))) {
      longest = makeDefinition(corpus, short, shortRow, from, row + 1 - from);
    }
  }
  return longest;
}

function makeDefinition(
  corpus: Corpus,
  short: string,
  shortRow: number,
  longRow: number,
  longLength: number,
): Definition {
  const words: string[] = [];
  for (let i = 0; i < longLength; i++)
    words.push(
      ...spellingAt(corpus, longRow + i)
        .toLowerCase()
        .split('-'),
    );
  return { short, shortRow, longRow, longLength, longKey: longKeyOf(words) };
}

/** The key that the ways of writing one long form share: its words in lower case, the last in the singular. */
export function longKeyOf(words: readonly string[]): string {
  return [...words.slice(0, -1), singularKey(words[words.length - 1]!)].join(' ');
}

function shortAt(corpus: Corpus, row: number): string | undefined {
  const { stream } = corpus;
  if (row < 0 || row >= stream.length) return undefined;
  if ((stream.flags[row]! & TokenFlag.word) === 0 || stream.counted[row] !== 1) return undefined;
  return shortFormOf(spellingAt(corpus, row));
}

/** True where a parenthesis, or what stands in it, ends at a row. */
function closes(corpus: Corpus, row: number): boolean {
  return row < corpus.stream.length && /^[),;]/.test(spellingAt(corpus, row));
}

function spellingAt(corpus: Corpus, row: number): string {
  return row < corpus.stream.length ? corpus.vocabulary.textOf(corpus.stream.spelling[row]!) : '';
}
