// One term inside another (embedding, vector embedding): candidates where hardly any other word modifies the shorter one.
import type { Corpus } from '../../corpus/corpus.js';
import { TAG, TokenFlag } from '../../tokens/tokens.js';
import type { PairCollector } from './evidence.js';
import { isGeneralNoun } from './generalWords.js';
import type { Occurrences } from './occurrences.js';
import type { Segments } from './segment.js';
import type { Term } from './terms.js';

/** Fewest uses of the longer term, and of the shorter one with no word before it. */
const FEWEST_USES = 5;
/** From this share of the shorter term's modified uses, what modifies it tells no kind of it from others. */
const LEAST_SHARE = 0.3;
/** Least share of the pages of the rarer term that have both. */
const LEAST_TOGETHER = 0.2;

/** Adds each term with the one at its end where that modifier makes up most of what modifies it, on pages that have both. */
export function pairByContainment(
  corpus: Corpus,
  terms: readonly Term[],
  segments: Segments,
  occurrences: Occurrences,
  pairs: PairCollector,
): void {
  const byText = new Map(terms.map(({ words }, index) => [words.join(' '), index]));
  const modified = new Map<number, number>();
  const ends: { long: number; short: number }[] = [];
  terms.forEach(({ words }, long) => {
    for (let at = 1; at < words.length; at++) {
      const short = byText.get(words.slice(at).join(' '));
      if (short === undefined) continue;
      modified.set(short, (modified.get(short) ?? 0) + segments.uses[long]!);
      if (segments.uses[long]! >= FEWEST_USES) ends.push({ long, short });
    }
  });
  const pagesOf = once((term) => new Set(occurrences.usesOf(term).map(({ row }) => corpus.stream.documentOf(row))));
  const behindOthersOf = once((term) => countBehindModifiers(corpus, occurrences, term));
  for (const { long, short } of ends) {
    const { words } = terms[long]!;
    const modifier = words.slice(0, words.length - terms[short]!.words.length).join(' ');
    if (modifier.endsWith('ing') || isGeneralNoun(terms[short]!.words.join(' '))) continue;
    if (segments.uses[short]! < FEWEST_USES || segments.uses[long]! < LEAST_SHARE * modified.get(short)!) continue;
    const behindOthers = behindOthersOf(short);
    const share = segments.uses[long]! / (modified.get(short)! + behindOthers);
    if (share < LEAST_SHARE || segments.uses[short]! - behindOthers < FEWEST_USES) continue;
    const [ofLong, ofShort] = [pagesOf(long), pagesOf(short)];
    const together = [...ofLong].filter((page) => ofShort.has(page)).length;
    if (together < LEAST_TOGETHER * Math.min(ofLong.size, ofShort.size)) continue;
    pairs.add(long, short, {
      kind: 'containment',
      strength: share,
      text: `where a word stands before “${terms[short]!.words.join(' ')}”, it is “${modifier}” in ${Math.round(100 * share)} %; ${together === 1 ? 'one page has' : `${together} pages have`} both`,
      value: share,
    });
  }
}

function once<T>(find: (term: number) => T): (term: number) => T {
  const found = new Map<number, T>();
  return (term) => {
    if (!found.has(term)) found.set(term, find(term));
    return found.get(term)!;
  };
}

/** Uses of a term right behind a noun or adjective with which it makes no term. */
function countBehindModifiers({ stream }: Corpus, occurrences: Occurrences, term: number): number {
  let count = 0;
  for (const { row } of occurrences.usesOf(term)) {
    if (row === 0 || (stream.flags[row]! & TokenFlag.sentenceStart) !== 0) continue;
    const tag = stream.tag[row - 1]!;
    if (tag === TAG.NOUN || tag === TAG.PROPN || tag === TAG.ADJ) count++;
  }
  return count;
}
