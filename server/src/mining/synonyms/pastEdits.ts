// Candidates from earlier versions of the documents: terms of which writers replaced one by the other.
import { alignmentDistance } from '../../base/editDistance.js';
import { spellingKey } from '../../lexicon/spelling.js';
import { termKey } from '../../lexicon/termKey.js';
import { countReplacements, directionOf, FEWEST_TIMES } from '../pastEdits.js';
import type { PastEdits } from '../pastEdits.js';
import type { PairCollector } from './evidence.js';
import type { Term } from './terms.js';

/** The strength of a single replacement: no more than a hint. */
const ONCE = 0.2;
/** Up to so many edits part a word from a slip of the pen, where they are no more than a third of it. */
const SLIP = 2;

/** Adds the pairs of terms, both still in use, of which writers replaced one by the other, and not the other by it. */
export function pairByPastEdits(terms: readonly Term[], edits: PastEdits | undefined, pairs: PairCollector): void {
  if (edits === undefined) return;
  const byKey = new Map(terms.map(({ key }, index) => [key, index]));
  const counts = countReplacements(edits, (words) => byKey.get(pastEditKey(words)));
  const ways = new Map(counts.map((count) => [`${count.from} ${count.to}`, count]));
  for (const count of counts) {
    const direction = directionOf(count, ways.get(`${count.to} ${count.from}`));
    const [from, to] = [terms[count.from]!.words.join(' '), terms[count.to]!.words.join(' ')];
    if (direction === undefined || isOneWord(from, to)) continue;
    const value = direction.times;
    const strength = direction.isHabit ? value / (value + FEWEST_TIMES) : ONCE;
    const text = `writers replaced “${from}” by “${to}” ${direction.text}`;
    pairs.add(count.from, count.to, { kind: 'past-edit', strength, text, value });
  }
}

/** The key that a term with these words has. */
export function pastEditKey(text: string): string {
  const words = text.split(' ');
  const last = words.pop()!;
  return words.map((word) => spellingKey(word).replaceAll('-', '')).join('') + termKey(last);
}

/** True for a word beside a slip of it (“form”, “from”) or beside another form of it (“attack”, “attacker”). */
function isOneWord(a: string, b: string): boolean {
  const [short, long] = a.length < b.length ? [a, b] : [b, a];
  if (short.length > 2 && long.startsWith(short.slice(0, Math.max(3, short.length - 1)))) return true;
  return alignmentDistance(a, b) <= Math.min(SLIP, long.length / 3);
}
