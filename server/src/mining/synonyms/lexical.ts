// Candidates from lists: whole terms that our list of equivalents or the general dictionary calls the same.
import { equivalentSets } from '../../lexicon/equivalents.js';
import { termKey } from '../../lexicon/termKey.js';
import { wordNetTable } from '../../lexicon/wordnet.js';
import type { PairCollector } from './evidence.js';
import { lexicalLink } from './links.js';
import type { Term } from './terms.js';

/** Senses beyond this place of a word are not looked at. */
const SENSES = 4;

/** Adds the pairs of terms that stand in one set of equivalents, or share a sense in the dictionary. */
export function pairByLists(terms: readonly Term[], pairs: PairCollector): void {
  const ofKey = new Map(terms.map((term, index) => [term.key, index]));
  for (const set of equivalentSets()) {
    if (set.pos !== 'noun') continue;
    const members = [...new Set(set.terms.map((term) => ofKey.get(termKey(term))))].filter((at) => at !== undefined);
    forEachPair(members, (a, b) => link(terms, a, b, pairs));
  }
  const ofSense = new Map<number, number[]>();
  const table = wordNetTable('noun');
  terms.forEach(({ words }, index) => {
    const lemma = table.numberOf(words.join(' '));
    if (lemma < 0) return;
    for (const sense of table.sensesOf(lemma).subarray(0, SENSES)) {
      const members = ofSense.get(sense);
      if (members === undefined) ofSense.set(sense, [index]);
      else members.push(index);
    }
  });
  const seen = new Set<number>();
  for (const members of ofSense.values()) {
    forEachPair(members, (a, b) => {
      const key = Math.min(a, b) * terms.length + Math.max(a, b);
      if (!seen.has(key)) link(terms, a, b, pairs, 'dictionary');
      seen.add(key);
    });
  }
}

function link(terms: readonly Term[], a: number, b: number, pairs: PairCollector, only?: 'dictionary'): void {
  const found = lexicalLink(terms[a]!.words.join(' '), terms[b]!.words.join(' '), 'noun');
  if (found === undefined || (only !== undefined && found.source !== only)) return;
  const text =
    found.source === 'list'
      ? 'the trade uses both for one thing'
      : 'a general dictionary gives both as names of one thing';
  pairs.add(a, b, { kind: found.source, strength: found.strength, text, value: found.strength });
}

/** Visits every two members of a list. */
export function forEachPair<T>(members: readonly T[], visit: (a: T, b: T) => void): void {
  for (let i = 0; i < members.length; i++) {
    for (let j = i + 1; j < members.length; j++) visit(members[i]!, members[j]!);
  }
}
