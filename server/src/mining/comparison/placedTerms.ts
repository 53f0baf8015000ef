// Two terms put among the noun terms of a corpus, with all their uses: verbs, and terms too rare to be found by themselves.
import type { Corpus } from '../../corpus/corpus.js';
import { termKey } from '../../lexicon/termKey.js';
import type { Use } from '../places.js';
import type { Nouns } from '../synonyms/nouns.js';
import type { Segments } from '../synonyms/segment.js';
import type { Term } from '../synonyms/terms.js';
import type { ComparedTerm } from './comparison.js';

/** Terms with their places, and the indexes of the two terms asked for. */
export interface PlacedTerms {
  readonly terms: readonly Term[];
  readonly segments: Segments;
  readonly places: readonly [number, number];
}

/** Finds the two among the terms, or adds them; their uses are those given, and what they overlap gives way. */
export function withTerms(corpus: Corpus, nouns: Nouns, pair: readonly [ComparedTerm, ComparedTerm]): PlacedTerms {
  const terms = [...nouns.terms];
  const places = pair.map(({ text, uses }) => {
    const words = text.toLowerCase().split(/\s+/);
    const known = terms.findIndex((term) => term.words.join(' ') === words.join(' '));
    if (known >= 0) return known;
    terms.push({ key: `compared ${termKey(text)}`, words, forms: formsOf(corpus, uses), uses: uses.length });
    return terms.length - 1;
  }) as [number, number];
  return { terms, places, segments: placed(nouns.segments, terms.length, pair, places) };
}

function formsOf({ stream }: Corpus, uses: readonly Use[]): Term['forms'] {
  const counts = new Map<string, { words: number[]; uses: number }>();
  for (const { row, length } of uses) {
    const words = [...stream.fold.subarray(row, row + length)];
    const known = counts.get(words.join(' '));
    if (known === undefined) counts.set(words.join(' '), { words, uses: 1 });
    else known.uses++;
  }
  return [...counts.values()].sort((a, b) => b.uses - a.uses);
}

/** The occurrences with those of the two terms put in, in order of their rows. */
function placed(
  before: Segments,
  terms: number,
  pair: readonly [ComparedTerm, ComparedTerm],
  places: readonly [number, number],
): Segments {
  const own = pair.flatMap(({ uses }, side) => uses.map((use) => ({ ...use, term: places[side]! })));
  const held = new Set<number>();
  for (const { row, length } of own) for (let at = row; at < row + length; at++) held.add(at);
  for (let i = 0; i < before.count; i++) {
    const [row, length, term] = [before.first[i]!, before.length[i]!, before.term[i]!];
    if (places.includes(term)) continue;
    let isFree = true;
    for (let at = row; at < row + length; at++) isFree &&= !held.has(at);
    if (isFree) own.push({ row, length, term });
  }
  own.sort((a, b) => a.row - b.row);
  const uses = new Uint32Array(terms);
  for (const { term } of own) uses[term]!++;
  return {
    count: own.length,
    uses,
    term: Uint32Array.from(own, ({ term }) => term),
    first: Uint32Array.from(own, ({ row }) => row),
    length: Uint8Array.from(own, ({ length }) => length),
  };
}
