// Reads the compact WordNet tables: from a word to its senses in order, from a sense to what it is linked with.
import * as data from './data/wordnet.js';
import { indexLines } from './lineIndex.js';

/** The parts of speech that WordNet knows. */
export type WordNetPos = 'noun' | 'verb' | 'adjective' | 'adverb';

/** All parts of speech, in a fixed order. */
export const wordNetParts: readonly WordNetPos[] = ['noun', 'verb', 'adjective', 'adverb'];

/** One part of speech, decoded on first use. */
export interface WordNetTable {
  /** Number of a lower-case lemma, words separated by a space; −1 when it is not there. */
  readonly numberOf: (lemma: string) => number;
  /** Senses of a lemma's number, the commonest first. */
  readonly sensesOf: (lemma: number) => Uint32Array;
  /** Direct hypernyms of a noun's or verb's sense; the head senses that an adjective's sense is similar to. */
  readonly linksOf: (sense: number) => Uint32Array;
  /** Whether the dictionary itself calls two lemmas antonyms. */
  readonly areAntonyms: (lemma1: number, lemma2: number) => boolean;
  /** Whether some words of two senses are antonyms. */
  readonly areOpposite: (sense1: number, sense2: number) => boolean;
}

const space = 32;
const exclamationMark = 33;

const tables = new Map<WordNetPos, WordNetTable>();

/** The table of one part of speech. */
export function wordNetTable(pos: WordNetPos): WordNetTable {
  let table = tables.get(pos);
  if (table === undefined) {
    table = decode(
      data[`${pos}Lemmas`],
      data[`${pos}Senses`],
      data[`${pos}Links`],
      data[`${pos}OppositeWords`],
      data[`${pos}OppositeSenses`],
    );
    tables.set(pos, table);
  }
  return table;
}

function decode(lemmas: string, senses: string, links: string, words: string, opposed: string): WordNetTable {
  const index = indexLines(lemmas);
  const senseLists = decodeLists(senses);
  const linkLists = decodeLists(links);
  const antonyms = decodePairs(words);
  const opposites = decodePairs(opposed);
  return {
    numberOf: index.find,
    sensesOf: (lemma) => senseLists.values.subarray(senseLists.starts[lemma], senseLists.starts[lemma + 1]),
    linksOf: (sense) => linkLists.values.subarray(linkLists.starts[sense], linkLists.starts[sense + 1]),
    areAntonyms: (lemma1, lemma2) => hasPair(antonyms, lemma1, lemma2),
    areOpposite: (sense1, sense2) => hasPair(opposites, sense1, sense2),
  };
}

/** Lists separated by a space; in a list, "!" is the next number never met before, else three digits are a number. */
function decodeLists(text: string): { starts: Uint32Array; values: Uint32Array } {
  const values = new Uint32Array(text.length);
  const starts = new Uint32Array(text.length + 2);
  let count = 0;
  let lists = 1;
  let unmet = 0;
  for (let at = 0; at < text.length;) {
    const mark = text.charCodeAt(at);
    if (mark === space) {
      starts[lists++] = count;
      at += 1;
    } else if (mark === exclamationMark) {
      values[count++] = unmet++;
      at += 1;
    } else {
      values[count++] = numberAt(text, at);
      at += 3;
    }
  }
  starts[lists] = count;
  return { starts: starts.slice(0, lists + 1), values: values.slice(0, count) };
}

/** Pairs as sorted numbers `smaller · 2²⁰ + larger`; numbers are below 85³ < 2²⁰. */
function decodePairs(text: string): Float64Array {
  const pairs = new Float64Array(text.length / 6);
  for (let i = 0; i < pairs.length; i++) pairs[i] = numberAt(text, 6 * i) * 0x100000 + numberAt(text, 6 * i + 3);
  return pairs.sort();
}

function hasPair(pairs: Float64Array, a: number, b: number): boolean {
  const wanted = Math.min(a, b) * 0x100000 + Math.max(a, b);
  let low = 0;
  let high = pairs.length - 1;
  while (low <= high) {
    const middle = (low + high) >> 1;
    const pair = pairs[middle] ?? 0;
    if (pair === wanted) return true;
    if (pair < wanted) low = middle + 1;
    else high = middle - 1;
  }
  return false;
}

function numberAt(text: string, at: number): number {
  return (digitAt(text, at) * 85 + digitAt(text, at + 1)) * 85 + digitAt(text, at + 2);
}

/** Digits run from "%" in rising order of code and leave out the backslash and the grave accent. */
function digitAt(text: string, at: number): number {
  const code = text.charCodeAt(at);
  return code - 37 - (code > 92 ? 1 : 0) - (code > 96 ? 1 : 0);
}
