// The terms of a corpus: nouns and runs of words around a noun that are used often enough and hold together, and verbs.
import { compareCodeUnits } from '../../base/order.js';
import type { Work } from '../../base/work.js';
import type { Corpus } from '../../corpus/corpus.js';
import { npmi } from '../../corpus/statistics/association.js';
import { cValues } from '../../corpus/statistics/termhood.js';
import { singularOf } from '../../lexicon/plurals.js';
import { spellingKey } from '../../lexicon/spelling.js';
import { termKey } from '../../lexicon/termKey.js';
import type { WordUses } from './wordUse.js';

/** Fewest uses of a term that is asked about. */
const FEWEST_USES = 5;
/** Fewest uses of one inflected form that adds to a term. */
const FEWEST_FORM_USES = 2;
/** A run of words is a term where it is worth this much by C-value, … */
const LEAST_C_VALUE = 4;
/** … and its words attract one another this much, by NPMI. */
const LEAST_ATTRACTION = 0.1;

/** Adjectives that say nothing of a concept when they open a term: grammar rather than terminology. */
const GENERIC = new Set(
  `other same different new old such many several few various certain first second third last next previous following above
  own specific particular given single multiple additional further more most less least available necessary possible
  important common similar whole entire full current existing appropriate relevant good better best large small high low
  long short simple main general actual real desired required corresponding respective recommended example sample`.split(
    /\s+/,
  ),
);

/** A noun term: all its ways of writing, singular and plural, under one key. */
export interface Term {
  /** Identity: the words' texts in one spelling, joined, the last one singular; ways of writing share it. */
  readonly key: string;
  /** The words, in lower case, of its most used form, the last one singular. */
  readonly words: readonly string[];
  /** Surface runs (lower-case vocabulary numbers) that are this term; most used first. */
  readonly forms: readonly TermForm[];
  /** All uses, also inside longer terms. */
  readonly uses: number;
}

export interface TermForm {
  readonly words: readonly number[];
  readonly uses: number;
}

interface Candidate {
  readonly key: string;
  readonly forms: TermForm[];
  uses: number;
}

/** The noun terms of a corpus, in order of uses and code units. */
export function* findNounTerms(corpus: Corpus, uses: WordUses): Work<Term[]> {
  const { vocabulary, grams } = corpus;
  const candidates = new Map<string, Candidate>();
  const text = (word: number): string => vocabulary.textOf(word);
  const keys: (string | undefined)[] = [];
  const keyOf = (word: number): string => (keys[word] ??= termKey(text(word)));
  const inner: (string | undefined)[] = [];
  const innerKeyOf = (word: number): string => (inner[word] ??= spellingKey(text(word)).replaceAll('-', ''));
  const add = (words: number[], count: number): void => {
    const last = words.length - 1;
    const key = words.map((word, index) => (index === last ? keyOf(word) : innerKeyOf(word))).join('');
    let candidate = candidates.get(key);
    if (candidate === undefined) candidates.set(key, (candidate = { key, forms: [], uses: 0 }));
    candidate.forms.push({ words, uses: count });
    candidate.uses += count;
  };
  for (let word = 0; word < vocabulary.size; word++) {
    const count = uses.count(word, 'noun');
    if (count >= FEWEST_FORM_USES && isTermWord(text(word))) add([word], count);
  }
  yield;
  const places = placesOfWords(vocabulary.size, uses, text);
  for (let gram = 0; gram < grams.size; gram++) {
    const count = corpus.usesOfGram(gram);
    if (count >= FEWEST_FORM_USES) {
      const words = grams.wordsOf(gram);
      if (isNounShaped(words, places)) add(words, count);
    }
    if (gram % 50_000 === 0) yield;
  }
  const frequent = [...candidates.values()].filter((candidate) => candidate.uses >= FEWEST_USES);
  yield;
  const inOrder = (a: TermForm, b: TermForm): number =>
    b.uses - a.uses || compareCodeUnits(a.words.map(text).join(' '), b.words.map(text).join(' '));
  for (const { forms } of frequent) forms.sort(inOrder);
  return keepTogether(corpus, frequent).map(({ key, forms, uses: count }) => {
    const words = forms[0]!.words.map(text);
    words.push(singularOf(words.pop()!));
    return { key, words, forms, uses: count };
  });
}

/** Drops runs of words that are mere neighbours. */
function keepTogether(corpus: Corpus, candidates: Candidate[]): Candidate[] {
  candidates.sort((a, b) => b.uses - a.uses || compareCodeUnits(a.key, b.key));
  const values = cValues(
    candidates.map(({ forms, key, uses }) => ({ words: wordsForNesting(corpus, forms[0]!, key), frequency: uses })),
    'smoothed',
  );
  const usesOfKey = new Map(candidates.map(({ key, uses }) => [key, uses]));
  const all = candidates.reduce((sum, { forms, uses }) => (forms[0]!.words.length === 1 ? sum + uses : sum), 0);
  return candidates.filter(({ forms, uses }, index) => {
    const { words } = forms[0]!;
    if (words.length === 1) return true;
    if (values[index]! < LEAST_C_VALUE) return false;
    const head = usesOfKey.get(termKey(corpus.vocabulary.textOf(words[words.length - 1]!)));
    const rest = restUses(corpus, words.slice(0, -1));
    if (head === undefined || rest === 0) return true;
    return (
      npmi({ c1: Math.max(rest, uses), c2: Math.max(head, uses), c12: uses, n: Math.max(all, rest, head) }) >
      LEAST_ATTRACTION
    );
  });
}

/** The words of a candidate as nesting compares them; the key stands in where two candidates would be alike. */
function wordsForNesting(corpus: Corpus, form: TermForm, key: string): string[] {
  if (form.words.length === 1) return [key];
  const words = form.words.map((word) => corpus.vocabulary.textOf(word));
  return [...words.slice(0, -1), termKey(words[words.length - 1]!)];
}

function restUses(corpus: Corpus, words: readonly number[]): number {
  if (words.length === 1) return corpus.stream.rowsOf(words[0]!).length;
  const gram = corpus.grams.find(words);
  return gram === undefined ? 0 : corpus.usesOfGram(gram);
}

function isTermWord(text: string): boolean {
  return text.length > 1 && /^\p{L}[\p{L}\p{M}\d'’+#.-]*$/u.test(text);
}

/** Where in a noun term a word may stand. */
const Place = { first: 1, inside: 2, last: 4 } as const;

/** The places of every word, judged by how it is used in the whole corpus, not by one tag. */
function placesOfWords(words: number, uses: WordUses, text: (word: number) => string): Uint8Array {
  const places = new Uint8Array(words);
  for (let word = 0; word < words; word++) {
    const spelled = text(word);
    if (!isTermWord(spelled)) continue;
    const noun = uses.share(word, 'noun');
    const isModifier =
      noun + uses.share(word, 'adjective') >= 0.5 || (uses.share(word, 'verb') >= 0.3 && /(ed|ing|en)$/.test(spelled));
    if (noun >= 0.4) places[word]! |= Place.last;
    if (isModifier) places[word]! |= GENERIC.has(spelled) ? Place.inside : Place.inside | Place.first;
  }
  return places;
}

/** (adjective | noun | participle)* noun. */
function isNounShaped(words: readonly number[], places: Uint8Array): boolean {
  const last = words.length - 1;
  return words.every((word, index) => {
    const place = index === last ? Place.last : index === 0 ? Place.first : Place.inside;
    return (places[word]! & place) !== 0;
  });
}
