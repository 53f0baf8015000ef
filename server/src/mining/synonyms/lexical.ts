// Candidates from lists: whole terms that our list of equivalents or the general dictionary calls the same.
import type { PairCollector } from './evidence.js';
import { lexicalLink, Meanings } from './links.js';
import type { Term } from './terms.js';

/** Adds the pairs of terms that stand in one set of equivalents, or share a sense in the dictionary. */
export function pairByLists(terms: readonly Term[], pairs: PairCollector): void {
  const texts = terms.map(({ words }) => words.join(' '));
  const meanings = new Meanings(['noun']);
  meanings.forEachRelated(texts, (a, b) => {
    const link = lexicalLink(texts[a]!, texts[b]!, 'noun', meanings.keyOf);
    if (link === undefined) return;
    const text =
      link.source === 'list'
        ? 'the trade often uses both for one thing'
        : 'a general dictionary gives both as names of one thing';
    pairs.add(a, b, { kind: link.source, strength: link.strength, text, value: link.strength });
  });
}

/** Visits every two members of a list. */
export function forEachPair<T>(members: readonly T[], visit: (a: T, b: T) => void): void {
  for (let i = 0; i < members.length; i++) {
    for (let j = i + 1; j < members.length; j++) visit(members[i]!, members[j]!);
  }
}
