// Candidates from earlier versions of the documents: terms of which writers replaced one by the other.
import { termKey } from '../../lexicon/termKey.js';
import { spellingKey } from '../../lexicon/spelling.js';
import type { PastEdits } from '../pastEdits.js';
import { times } from '../wording.js';
import type { PairCollector } from './evidence.js';
import type { Term } from './terms.js';

/** Adds the pairs of terms that are both still in use and that writers replaced, whichever way. */
export function pairByPastEdits(terms: readonly Term[], edits: PastEdits | undefined, pairs: PairCollector): void {
  if (edits === undefined) return;
  const byKey = new Map(terms.map(({ key }, index) => [key, index]));
  for (const { from, to, commits } of edits.replacements) {
    const a = byKey.get(keyOf(from));
    const b = byKey.get(keyOf(to));
    if (a === undefined || b === undefined) continue;
    const text = `earlier edits replaced “${from}” by “${to}” ${times(commits)}`;
    pairs.add(a, b, { kind: 'past-edit', strength: 0, text, value: commits });
  }
}

/** The key that a term with these words has. */
function keyOf(text: string): string {
  const words = text.split(' ');
  const last = words.pop()!;
  return words.map((word) => spellingKey(word).replaceAll('-', '')).join('') + termKey(last);
}
