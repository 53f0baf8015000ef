// One word in several capitals (GitHub, Github): asked where it is plainly a name and one way leads.
import { compareCodeUnits } from '../../base/order.js';
import type { Work } from '../../base/work.js';
import type { Corpus } from '../../corpus/corpus.js';
import { Zone } from '../../prose/zones.js';
import { isKnown } from '../../lexicon/synonyms.js';
import { countDocuments, examplePlacesOf, isInsideSentence } from '../places.js';
import type { Use } from '../places.js';
import { questionId } from '../question.js';
import type { Question } from '../question.js';
import { byUses, makeTerm, numberForms, pages, singularKey, times } from '../wording.js';
import type { Mentions } from './mentions.js';

const CONFIDENCE = { inner: 0.9, first: 0.85 } as const;

/**
 * The least that is asked about: the share that the leading way has among all; the uses and documents of another way; the
 * same for a way all in lower case, which is as often a command or a field, and the leading way's uses beside it.
 */
const LEAST = {
  inner: { share: 0.6, uses: 2, documents: 2 },
  lower: { share: 0.85, uses: 5, documents: 4, leading: 20 },
} as const;

/** Words between two resting points. */
const STRIDE = 5000;

interface Way {
  /** As spelled, without a plural s. */
  readonly text: string;
  readonly uses: readonly Use[];
}

/**
 * Questions about capitals. Their order is not defined.
 * @param settled lower-case texts of terms that other questions are about already
 */
export function* askCapitals(corpus: Corpus, mentions: Mentions, settled: ReadonlySet<string>): Work<Question[]> {
  const { vocabulary } = corpus;
  const questions: Question[] = [];
  const asked = new Set<string>();
  for (let id = 0; id < vocabulary.size; id++) {
    if (id % STRIDE === 0) yield;
    const fold = vocabulary.foldOf(id);
    if (fold === id || corpus.usesOfWord(id) < LEAST.inner.uses || !mayBeName(corpus, id, fold)) continue;
    const key = singularKey(vocabulary.textOf(fold));
    if (asked.has(key) || settled.has(key) || settled.has(vocabulary.textOf(fold))) continue;
    asked.add(key);
    const question = askWord(corpus, mentions, key);
    if (question !== undefined) questions.push(question);
  }
  return questions;
}

/** A quick look at the counts: a word that is mostly in lower case is no name, one that never varies no mix. */
function mayBeName(corpus: Corpus, id: number, fold: number): boolean {
  const total = corpus.stream.rowsOf(fold).length;
  const lower = corpus.usesOfWord(fold);
  if (lower > total * (1 - LEAST.inner.share)) return false;
  return lower >= LEAST.lower.uses || corpus.usesOfWord(id) + lower < total;
}

function askWord(corpus: Corpus, mentions: Mentions, key: string): Question | undefined {
  const ways = waysOf(corpus, mentions, key);
  const lead = ways[0];
  if (ways.length < 2 || lead === undefined || lead.text.length < 2 || !/^[\p{L}\p{N}]+$/u.test(lead.text))
    return undefined;
  if (/^\p{Ll}/u.test(lead.text) || isWord(key)) return undefined;
  const total = ways.reduce((sum, way) => sum + way.uses.length, 0);
  const lower = ways.find((way) => way.text === way.text.toLowerCase());
  const others = ways.slice(1).filter((way) => isMix(corpus, lead, way, lead.uses.length / total, lower));
  return others.length === 0 ? undefined : makeQuestion(corpus, lead, others);
}

/** The spellings of a word, singular and plural together, inside sentences of running text, most used first. */
function waysOf(corpus: Corpus, mentions: Mentions, key: string): Way[] {
  const { stream, vocabulary } = corpus;
  const ways = new Map<string, Use[]>();
  for (const form of numberForms(key)) {
    const fold = vocabulary.find(form);
    if (fold === undefined) continue;
    for (const row of stream.rowsOf(fold)) {
      if (!isInsideSentence(stream, row) || mentions.isMention(row, 1)) continue;
      const spelling = vocabulary.textOf(stream.spelling[row]!);
      const text = form === `${key}s` && spelling.endsWith('s') ? spelling.slice(0, -1) : spelling;
      const uses = ways.get(text);
      if (uses === undefined) ways.set(text, [{ row, length: 1 }]);
      else uses.push({ row, length: 1 });
    }
  }
  return [...ways]
    .map(([text, uses]) => ({ text, uses: uses.sort((a, b) => a.row - b.row) }))
    .sort((a, b) => b.uses.length - a.uses.length || compareCodeUnits(a.text, b.text));
}

/** Names that are words as well (Broker, Docker, Serverless) may stand for the common thing. */
function isWord(key: string): boolean {
  const parts = ['noun', 'verb', 'adjective'] as const;
  const bases = [key, key.replace(/(?:ing|less|ed|er)$/, ''), key.replace(/ing$/, 'e')];
  // Two letters are an abbreviation whatever the dictionary says (ID, DB).
  return key.length > 2 && bases.some((base) => parts.some((part) => isKnown(base, part)));
}

function isMix(corpus: Corpus, lead: Way, way: Way, share: number, lower: Way | undefined): boolean {
  if (way === lower) {
    const { share: leastShare, uses: leastUses, documents: leastDocuments, leading } = LEAST.lower;
    // Small letters on a page whose code has them as well are a command's or a file's name.
    const uses = way.uses.filter(({ row }) => !corpus.stream.isNameInCode(row));
    const enough = uses.length >= leastUses && countDocuments(corpus.stream, uses) >= leastDocuments;
    return share >= leastShare && enough && lead.uses.length >= leading;
  }
  // A link may be the title of another's page.
  const own = way.uses.filter(({ row }) => (corpus.stream.zones[row]! & Zone.linkText) === 0);
  const documents = countDocuments(corpus.stream, own);
  if (own.length < LEAST.inner.uses || documents < LEAST.inner.documents || share < LEAST.inner.share) return false;
  if (lower !== undefined && lower.uses.length > way.uses.length) return false;
  // DNs beside DNS is a plural.
  if (isShouted(lead.text) && way.text === `${lead.text.slice(0, -1)}s`) return false;
  // A word set in capitals is emphasis or a command; a small first letter makes an identifier.
  return !(isShouted(way.text) && !isShouted(lead.text)) && !/^\p{Ll}+\p{Lu}/u.test(way.text);
}

function isShouted(text: string): boolean {
  return text === text.toUpperCase();
}

function makeQuestion(corpus: Corpus, lead: Way, others: readonly Way[]): Question {
  const { stream } = corpus;
  const sides = [lead, ...others]
    .map((way) => ({
      way,
      term: makeTerm([{ text: way.text, count: way.uses.length }], countDocuments(stream, way.uses)),
    }))
    .sort((a, b) => byUses(a.term, b.term));
  const inner = others.some((way) => way.text !== way.text.toLowerCase());
  const confidence = inner ? CONFIDENCE.inner : CONFIDENCE.first;
  const outside = others.reduce((sum, way) => sum + way.uses.length, 0);
  const ways = sides.map(({ term }) => `“${term.text}” ${times(term.uses)} on ${pages(term.documents)}`);
  return {
    id: questionId(
      'variant',
      sides.map(({ term }) => term),
    ),
    kind: 'variant',
    confidence,
    worth: confidence * outside,
    terms: sides.map(({ term }) => term),
    reasons: [
      {
        kind: 'capitals',
        text: `one name in different capitals, inside sentences: ${ways.join(', ')}`,
        value: outside,
      },
    ],
    places: examplePlacesOf(
      stream,
      sides.map(({ way }) => way.uses),
    ),
  };
}
