// Candidates from earlier versions of the documents: terms of which writers replaced one by the other.
import { alignmentDistance } from '../../base/editDistance.js';
import { spellingKey } from '../../lexicon/spelling.js';
import { termKey } from '../../lexicon/termKey.js';
import { countReplacements } from '../pastEdits.js';
import type { PastEdits, ReplacedPair } from '../pastEdits.js';
import { times } from '../wording.js';
import type { PairCollector } from './evidence.js';
import type { Term } from './terms.js';

/** From so many commits or pages on, replacing is a habit; once it may have been a correction of fact. */
const FEWEST_TIMES = 2;
/** Of replacements one way, at most this share may stand against them: the other way round, or in sentences that hold both. */
const MOST_AGAINST = 1 / 3;
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
    const back = ways.get(`${count.to} ${count.from}`);
    const against = count.mended + (back === undefined ? 0 : back.sentences + back.mended);
    if (count.sentences === 0 || against > MOST_AGAINST * count.sentences) continue;
    const [from, to] = [terms[count.from]!.words.join(' '), terms[count.to]!.words.join(' ')];
    if (isOneWord(from, to)) continue;
    const value = timesOf(count);
    const strength = value < FEWEST_TIMES ? ONCE : value / (value + FEWEST_TIMES);
    const text = `writers replaced “${from}” by “${to}” ${times(count.sentences)}, ${back === undefined ? 'never' : 'seldom'} the other way round`;
    pairs.add(count.from, count.to, { kind: 'past-edit', strength, text, value });
  }
}

/** How often it was done independently: by commits, or on pages where one commit went over several. */
function timesOf({ commits, pages }: ReplacedPair<unknown>): number {
  return Math.max(commits, pages);
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
