// Multiword terms that some hands capitalise inside sentences and others do not (Shore Station, shore station).
import { compareCodeUnits } from '../../base/order.js';
import type { Work } from '../../base/work.js';
import type { Corpus } from '../../corpus/corpus.js';
import { LONGEST_GRAM } from '../../corpus/grams.js';
import { FactFlag } from '../../facts/flags.js';
import { Zone } from '../../prose/zones.js';
import { TokenFlag } from '../../tokens/tokens.js';
import { rowsOfSequence } from '../../corpus/concordance.js';
import { endRowOfBlock, followsOn } from '../../corpus/stream.js';
import { countDocuments, examplePlacesOf, isInsideSentence } from '../places.js';
import type { Use } from '../places.js';
import { questionId } from '../question.js';
import type { Question } from '../question.js';
import { byUses, LABELLED_THINGS, makeTerm, numberForms, pages, singularKey, spelledAt, times } from '../wording.js';

const CONFIDENCE = 0.85;

/** The least of either way: uses, documents, and its share of both; below it a capital is a slip or a title. */
const LEAST = { uses: 4, documents: 3, share: 0.25 } as const;

/** Verbs before the text of a control: capitals are right there. */
const BEFORE_LABELS = new Set(
  'select selects choose click press tap open enter named called titled see go pick'.split(' '),
);
/** Rows between two resting points. */
const STRIDE = 200_000;

/** Questions about capitalised phrases. Their order is not defined. */
export function* askPhrases(corpus: Corpus, settled: ReadonlySet<string>): Work<Question[]> {
  const names = yield* capitalisedPhrases(corpus);
  const questions: Question[] = [];
  for (const [key, capitalised] of names) {
    if (capitalised.length < LEAST.uses || settled.has(key)) continue;
    const question = askPhrase(corpus, key, capitalised);
    if (question !== undefined) questions.push(question);
  }
  return questions;
}

/**
 * Phrases of two to four content words that all begin with a capital, inside sentences and not part of a longer such
 * phrase, by their text in lower case with the last word in the singular.
 */
function* capitalisedPhrases(corpus: Corpus): Work<Map<string, Use[]>> {
  const { stream, vocabulary } = corpus;
  const found = new Map<string, Use[]>();
  const isCapitalised = (row: number): boolean =>
    stream.spelling[row] !== stream.fold[row] &&
    (stream.flags[row]! & (TokenFlag.identifier | FactFlag.functionWord)) === 0;
  for (let row = 0; row < stream.length; row++) {
    if (row % STRIDE === 0) yield;
    if (!isCapitalised(row) || (stream.flags[row]! & TokenFlag.word) === 0 || stream.counted[row] !== 1) continue;
    let end = row + 1;
    while (end < stream.length && isCapitalised(end) && followsOn(stream, end)) end++;
    const length = end - row;
    if (length >= 2 && length <= LONGEST_GRAM && isPlainUse(corpus, row, end) && allTitle(corpus, row, end)) {
      const words = [];
      for (let at = row; at < end; at++) words.push(vocabulary.textOf(stream.fold[at]!));
      const key = keyOf(words);
      const uses = found.get(key);
      if (uses === undefined) found.set(key, [{ row, length }]);
      else uses.push({ row, length });
    }
    row = end - 1;
  }
  return found;
}

/** One capital a word, then small letters: abbreviations and camel names keep theirs anyway. */
function allTitle(corpus: Corpus, row: number, end: number): boolean {
  for (let at = row; at < end; at++) {
    if (!/^\p{Lu}\p{Ll}+$/u.test(corpus.vocabulary.textOf(corpus.stream.spelling[at]!))) return false;
  }
  return true;
}

/** Inside a sentence, and neither a link's text, which may be a title, nor explained, labelled or quoted. */
function isPlainUse(corpus: Corpus, row: number, end: number): boolean {
  const { stream, vocabulary } = corpus;
  if (!isInsideSentence(stream, row) || (stream.zones[row]! & Zone.linkText) !== 0) return false;
  if (end >= endRowOfBlock(stream, row)) return false;
  const [before, after] = [vocabulary.textOf(stream.spelling[row - 1]!), vocabulary.textOf(stream.spelling[end]!)];
  if (BEFORE_LABELS.has(before.toLowerCase()) || LABELLED_THINGS.has(after)) return false;
  if (/^[,>]$/.test(before) && /^[,>]$/.test(after)) return false;
  const beforeArticle = vocabulary.textOf(stream.spelling[row - 2] ?? stream.spelling[row]!).toLowerCase();
  if (/^(?:the|on)$/i.test(before) && BEFORE_LABELS.has(beforeArticle)) return false;
  return !/^[(:"“‘'>/|&—–-]/.test(after) && !/^["“‘'>:/|&—–-]/.test(before);
}

function keyOf(words: readonly string[]): string {
  return [...words.slice(0, -1), singularKey(words[words.length - 1]!)].join(' ');
}

function askPhrase(corpus: Corpus, key: string, capitalised: readonly Use[]): Question | undefined {
  const { stream } = corpus;
  const plain = lowerUses(corpus, key.split(' '));
  const least = Math.min(plain.length, capitalised.length);
  if (least < LEAST.uses || least < LEAST.share * (plain.length + capitalised.length)) return undefined;
  const sides = [capitalised, plain].map((uses) => ({ uses, term: termOf(corpus, uses) }));
  if (sides.some(({ term }) => term.documents < LEAST.documents)) return undefined;
  sides.sort((a, b) => byUses(a.term, b.term));
  const ways = sides.map(({ term }) => `“${term.text}” ${times(term.uses)} on ${pages(term.documents)}`);
  return {
    id: questionId(
      'variant',
      sides.map(({ term }) => term),
    ),
    kind: 'variant',
    confidence: CONFIDENCE,
    worth: CONFIDENCE * sides[1]!.term.uses,
    terms: sides.map(({ term }) => term),
    reasons: [
      {
        kind: 'capitals',
        text: `inside sentences with and without capitals: ${ways.join(' and ')}`,
        value: sides[1]!.term.uses,
      },
    ],
    places: examplePlacesOf(
      stream,
      sides.map(({ uses }) => uses),
    ),
  };
}

/** The uses all in lower case, in the singular and plural. */
function lowerUses(corpus: Corpus, words: readonly string[]): Use[] {
  const { stream, vocabulary } = corpus;
  const head = words.slice(0, -1).map((word) => vocabulary.find(word));
  const uses: Use[] = [];
  for (const last of numberForms(words[words.length - 1]!)) {
    const folds = [...head, vocabulary.find(last)].filter((id) => id !== undefined);
    if (folds.length < words.length) continue;
    for (const row of rowsOfSequence(stream, folds)) {
      const isLower = folds.every((_, i) => stream.spelling[row + i] === stream.fold[row + i]);
      if (isLower && isInsideSentence(stream, row)) uses.push({ row, length: folds.length });
    }
  }
  return uses.sort((a, b) => a.row - b.row);
}

function termOf(corpus: Corpus, uses: readonly Use[]): ReturnType<typeof makeTerm> {
  const counts = new Map<string, number>();
  for (const use of uses) {
    const text = spelledAt(corpus.stream, corpus.vocabulary, use);
    counts.set(text, (counts.get(text) ?? 0) + 1);
  }
  const forms = [...counts].map(([text, count]) => ({ text, count })).sort((a, b) => compareCodeUnits(a.text, b.text));
  const singular = forms.find(
    ({ text }) => singularKey(text.toLowerCase().split(' ').pop()!) === text.toLowerCase().split(' ').pop(),
  );
  return makeTerm(forms, countDocuments(corpus.stream, uses), singular?.text);
}
