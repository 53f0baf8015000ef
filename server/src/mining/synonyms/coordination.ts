// How often the documents set two terms side by side as two things: "A and B", "A or B", "from A to B", lists and tables.
import type { Corpus } from '../../corpus/corpus.js';
import type { TokenStream } from '../../corpus/stream.js';
import { TokenFlag } from '../../tokens/tokens.js';
import type { Vocabulary } from '../../corpus/vocabulary.js';
import type { Segments } from './segment.js';
import type { Term } from './terms.js';

/** Counts of one pair's side-by-side uses. */
export interface SideBySide {
  /** "A and B", "A or B", "A, B and C", "A/B". */
  readonly coordinated: number;
  /** "from A to B", "unlike A, B", "A instead of B", "A versus B". */
  readonly contrasted: number;
}

/** What may stand between two coordinated terms, with commas; words that pass before the second term are left out first. */
const COORDINATING = new Set([
  'and',
  'or',
  'nor',
  ',',
  '/',
  '&',
  ', and',
  ', or',
  'and/or',
  'as well as',
  ', as well as',
  '|',
  ', but',
  ';',
]);
const CONTRASTING = new Set(
  `to|into|than|versus|vs|vs.|rather than|, not|not|but not|instead of|, rather than|, instead of|over|in contrast to|
  |unlike|, unlike|, whereas|, while|from|with|by|as opposed to|, as opposed to|compared to|compared with|differs from|differ from
  |is different from|are different from|is not|are not|is not to be confused with|are not to be confused with
  |not to be confused with|, not to be confused with|, which is not|( not|( not to be confused with`
    .split('|')
    .map((words) => words.trim()),
);
const PASSING = new Set([
  'a',
  'an',
  'the',
  'your',
  'its',
  'their',
  'any',
  'each',
  'every',
  'all',
  'both',
  'either',
  'another',
  'other',
  'one',
  'some',
  'no',
  'new',
]);
/** Most tokens between two terms that are looked at. */
const REACH = 8;
/** Longest run of coordinated terms that is followed. */
const LONGEST_LIST = 12;

/** Counts side-by-side uses of all pairs of terms that `wanted` holds, by `a · terms + b`, a < b. */
export function countSideBySide(
  corpus: Corpus,
  segments: Segments,
  terms: readonly Term[],
  wanted: ReadonlySet<number>,
): Map<number, SideBySide> {
  const { stream, vocabulary } = corpus;
  const counts = new Map<number, { coordinated: number; contrasted: number }>();
  const count = (one: number, other: number, kind: 'coordinated' | 'contrasted'): void => {
    const key = Math.min(one, other) * terms.length + Math.max(one, other);
    if (one === other || !wanted.has(key)) return;
    const found = counts.get(key) ?? { coordinated: 0, contrasted: 0 };
    found[kind]++;
    counts.set(key, found);
  };
  const elliptic = ellipticTerms(terms);
  const kinds = kindsBetween(vocabulary);
  const involved = new Uint8Array(terms.length);
  for (const key of wanted) involved[Math.floor(key / terms.length)] = involved[key % terms.length] = 1;
  let list: number[] = [];
  for (let i = 1; i < segments.count; i++) {
    const end = segments.first[i - 1]! + segments.length[i - 1]!;
    const start = segments.first[i]!;
    const concerns = list.length > 0 || involved[segments.term[i - 1]!] === 1 || involved[segments.term[i]!] === 1;
    const between = concerns && start - end <= REACH ? wordsBetween(stream, vocabulary, kinds, end, start) : undefined;
    if (between === undefined || !(COORDINATING.has(between) || CONTRASTING.has(between))) {
      list = [];
      continue;
    }
    const left = segments.term[i - 1]!;
    const right = segments.term[i]!;
    if (COORDINATING.has(between)) {
      if (list.length === 0) list.push(left);
      for (const earlier of list) count(earlier, right, 'coordinated');
      const completed = elliptic(terms[left]!, terms[right]!);
      if (completed !== undefined) count(completed, right, 'coordinated');
      list.push(right);
      if (list.length > LONGEST_LIST) list = [];
    } else {
      count(left, right, 'contrasted');
      list = [];
    }
  }
  return counts;
}

/** "input and output files": the term that the first noun stands for, with the second term's other words. */
function ellipticTerms(terms: readonly Term[]): (left: Term, right: Term) => number | undefined {
  const ofKey = new Map(terms.map((term, index) => [term.words.join(' '), index]));
  return (left, right) => {
    for (let from = 1; from < right.words.length; from++) {
      const found = ofKey.get([...left.words, ...right.words.slice(from)].join(' '));
      if (found !== undefined) return found;
    }
    return undefined;
  };
}

/** The lower-case words and signs between two rows without passing words; undefined where they set nothing side by side. */
function wordsBetween(
  stream: TokenStream,
  vocabulary: Vocabulary,
  kinds: Uint8Array,
  from: number,
  until: number,
): string | undefined {
  const { flags, fold } = stream;
  for (let row = from; row < until; row++)
    if (kinds[fold[row]!] === OTHER || (flags[row]! & TokenFlag.sentenceStart) !== 0) return undefined;
  if ((flags[until]! & TokenFlag.sentenceStart) !== 0) return undefined;
  let words = '';
  for (let row = from; row < until; row++)
    if (kinds[fold[row]!] === JOINING) words += `${words === '' ? '' : ' '}${vocabulary.textOf(fold[row]!)}`;
  return words;
}

/** Kinds of words by what they do between two terms: no more than divide them, part of what sets them side by side, or passing. */
const OTHER = 0;
const JOINING = 1;
const PASSED = 2;

function kindsBetween(vocabulary: Vocabulary): Uint8Array {
  const kinds = new Uint8Array(vocabulary.size);
  const mark = (text: string, kind: number): void => {
    const word = vocabulary.find(text);
    if (word !== undefined) kinds[word] = kind;
  };
  for (const between of [...COORDINATING, ...CONTRASTING]) for (const text of between.split(' ')) mark(text, JOINING);
  for (const text of PASSING) mark(text, PASSED);
  return kinds;
}
