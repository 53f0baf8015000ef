// Candidates that the documents themselves declare: "A, also called B", "A (B)", "A, or B,", "A, formerly B", "A was renamed to B".
import type { Corpus } from '../../corpus/corpus.js';
import { TokenFlag } from '../../tokens/tokens.js';
import type { PairCollector } from './evidence.js';
import type { Segments } from './segment.js';

/** Most tokens between the two terms. */
const REACH = 8;

/** A statement of the documents that two terms name one thing. */
export interface Statement {
  readonly a: number;
  readonly b: number;
  /** An outright statement, one that a name was changed for the other, or merely parentheses and commas. */
  readonly kind: 'outright' | 'renaming' | 'loose';
  /** Index of the earlier occurrence. */
  readonly at: number;
}

/** Finds all statements, in order of their places. */
export function findStatements(corpus: Corpus, segments: Segments): Statement[] {
  const { stream, vocabulary } = corpus;
  const found: Statement[] = [];
  const textAt = (row: number): string => (row < stream.length ? vocabulary.textOf(stream.fold[row]!) : '');
  const starts = (row: number): boolean => row >= stream.length || (stream.flags[row]! & TokenFlag.sentenceStart) !== 0;
  for (let i = 1; i < segments.count; i++) {
    const left = segments.term[i - 1]!;
    const right = segments.term[i]!;
    const from = segments.first[i - 1]! + segments.length[i - 1]!;
    const until = segments.first[i]!;
    if (left === right || until - from > REACH || until === from || !OPENING.has(textAt(from))) continue;
    const after = until + segments.length[i]!;
    const words: string[] = [];
    let broken = starts(until);
    for (let row = from; row < until && !broken; row++) {
      broken = starts(row);
      const text = textAt(row);
      if (!DETERMINERS.has(text)) words.push(text);
    }
    if (broken) continue;
    const between = words.join(' ');
    const ends = starts(after) || /^[,.;:)\]–—]$/.test(textAt(after));
    const isParenthesis = between === '(' && textAt(after) === ')';
    const isApposition = between === ', or' && /^[,;]$/.test(textAt(after)) && !listsThree(corpus, from, segments, i);
    if (RENAMING.test(between)) {
      if (ends) found.push({ a: left, b: right, kind: 'renaming', at: i - 1 });
    } else if (isOutright(words)) {
      if (ends) found.push({ a: left, b: right, kind: 'outright', at: i - 1 });
    } else if (isParenthesis || isApposition) found.push({ a: left, b: right, kind: 'loose', at: i - 1 });
  }
  return found;
}

/** The first word or sign of what stands between two names of one thing. */
const OPENING = new Set([
  ',',
  '(',
  'or',
  'is',
  'are',
  'was',
  'were',
  'has',
  'have',
  'had',
  'used',
  'which',
  'that',
  'also',
  'aka',
  'a.k.a',
  'a.k.a.',
  '–',
  '—',
  'sometimes',
  'often',
  'and',
  '”',
  '"',
]);
/** What stands between the two names where one took the other's place; words that pass are left out. */
const RENAMING =
  /^(?:(?:has|have|had) been|was|were|,|\() (?:(?:recently|since|now|later) )?renamed (?:to|as|from)$|^(?:\(|,|,? ?which|that)? ?(?:(?:was|were|is|are) )?(?:formerly|previously|originally)(?: (?:known|named|called))?(?: as)?$|^used to be (?:called|known as|named)$/;
const DETERMINERS = new Set(['a', 'an', 'the', 'your', 'its', 'their', '“', '"', "'", '”']);
const NAMING = new Set([
  'called',
  'known',
  'named',
  'termed',
  'aka',
  'a.k.a',
  'a.k.a.',
  'synonymous',
  'formerly',
  'previously',
]);
const BESIDE_NAMING = new Set(
  ', ( is are or and – — which that sometimes often also otherwise commonly usually more most simply historically now as better referred to with was were can be'.split(
    ' ',
  ),
);

/** "also called", "formerly", "which is also known as" and nothing else. */
function isOutright(words: readonly string[]): boolean {
  const first = words[0];
  if (first === undefined || first === 'called' || first === 'named' || first === 'known') return false;
  if (words.includes('referred') && words.includes('also')) return words.every((word) => BESIDE_NAMING.has(word));
  if (!words.some((word) => NAMING.has(word))) return words.includes('also') && first === '(' && words.length === 2;
  const names = words.filter((word) => NAMING.has(word));
  const isFormer = names.every((word) => word === 'formerly' || word === 'previously');
  return (
    words.every((word) => BESIDE_NAMING.has(word) || NAMING.has(word)) &&
    (isFormer
      ? first === '(' || first === ','
      : words.some((word) =>
          [
            'also',
            'otherwise',
            'sometimes',
            'commonly',
            'often',
            'aka',
            'a.k.a',
            'a.k.a.',
            'synonymous',
            'or',
          ].includes(word),
        ))
  );
}

/** "A, B, or C,": a list, not an apposition. */
function listsThree(corpus: Corpus, from: number, segments: Segments, i: number): boolean {
  const { stream, vocabulary } = corpus;
  const before = segments.first[i - 1]! - 1;
  const at = [before, before - 1, before - 2].filter((row) => row >= 0 && row < from);
  return at.some((row) => vocabulary.textOf(stream.fold[row]!) === ',');
}

/** Kinds of statement, the one that tells most first. */
const TELLING: readonly Statement['kind'][] = ['renaming', 'outright', 'loose'];

/** Adds each stated pair once, with the number of its statements and the document of the first. */
export function pairByStatements(corpus: Corpus, segments: Segments, pairs: PairCollector): void {
  const byPair = new Map<string, { first: Statement; outright: number; renaming: number; loose: number }>();
  for (const statement of findStatements(corpus, segments)) {
    const key = `${Math.min(statement.a, statement.b)} ${Math.max(statement.a, statement.b)}`;
    const known = byPair.get(key) ?? { first: statement, outright: 0, renaming: 0, loose: 0 };
    known[statement.kind]++;
    if (TELLING.indexOf(statement.kind) < TELLING.indexOf(known.first.kind)) known.first = statement;
    byPair.set(key, known);
  }
  for (const { first, outright, renaming, loose } of byPair.values()) {
    const { stream } = corpus;
    const page = corpus.documents[stream.documentOf(segments.first[first.at]!)]!.uri;
    const rows = {
      from: segments.first[first.at]!,
      until: segments.first[first.at + 1]! + segments.length[first.at + 1]!,
    };
    const quoted = quote(corpus, rows.from, rows.until);
    const count = outright + renaming + loose;
    pairs.add(first.a, first.b, {
      kind: renaming > 0 ? 'renaming' : 'definition',
      strength:
        outright + renaming > 0 ? Math.min(1, 0.8 + 0.1 * (outright + renaming)) : Math.min(0.6, 0.2 + 0.1 * loose),
      text: `${shortName(page)} says “${quoted}”${count > 1 ? `, and so do ${count - 1} more places` : ''}`,
      value: count,
    });
  }
}

function quote(corpus: Corpus, from: number, until: number): string {
  const { stream, vocabulary } = corpus;
  let text = '';
  const end = until < stream.length && vocabulary.textOf(stream.spelling[until]!) === ')' ? until + 1 : until;
  for (let row = from; row < end; row++) {
    const space = row > from && (stream.flags[row]! & TokenFlag.spaceBefore) !== 0 ? ' ' : '';
    text += space + vocabulary.textOf(stream.spelling[row]!);
  }
  return text;
}

function shortName(uri: string): string {
  return uri.slice(uri.lastIndexOf('/') + 1);
}
