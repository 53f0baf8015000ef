// Finds many terms at once in running text, in all their forms, longest first; scanning allocates nothing.
import { invariant } from '../base/invariant.js';
import { FORMS, termForms, type PartOfSpeech } from '../rewrite/inflect.js';
import { ASCII_FOLD, foldSlow } from './foldWord.js';
import { normalSeparator, toPattern, type Pattern } from './pattern.js';
import { bitOf, TermTrie } from './termTrie.js';
import { Gap, WordReader } from './wordReader.js';
import { WordTable } from './wordTable.js';

/** A term to look for. */
export interface MatchableTerm {
  readonly text: string;
  readonly partOfSpeech?: PartOfSpeech;
  /** Only this very case counts. */
  readonly caseSensitive?: boolean;
}

/** Receives one match: index of the term, range of UTF-16 units, index into {@link FORMS}. */
export type OnMatch = (termIndex: number, start: number, end: number, formIndex: number) => void;

/**
 * A compiled list of terms. Words are runs of letters, digits and underscores, compared without case; a run of white space
 * (line breaks included) is one space; a hyphen is not a space. At each word the longest term wins, the scan goes on behind it,
 * and terms that share one spelling are all reported, in the order of the list.
 */
export class TermMatcher {
  private readonly patterns: readonly Pattern[];
  private readonly termOf: Int32Array;
  private readonly formOf: Uint8Array;
  private readonly words = new WordTable();
  private readonly trie: TermTrie;
  private readonly longest: number;
  private readonly reader = new WordReader(this.words);
  private scanning = false;

  constructor(terms: readonly MatchableTerm[]) {
    const patterns: Pattern[] = [];
    for (const [term, { text, partOfSpeech, caseSensitive }] of terms.entries()) {
      const seen = new Set<string>();
      for (const { form, text: spelling } of termForms(text, partOfSpeech)) {
        if (seen.has(spelling)) continue;
        seen.add(spelling);
        const pattern = toPattern(spelling, term, FORMS.indexOf(form), caseSensitive ?? false);
        if (pattern) patterns.push(pattern);
      }
    }
    this.patterns = patterns;
    this.termOf = Int32Array.from(patterns, ({ term }) => term);
    this.formOf = Uint8Array.from(patterns, ({ form }) => form);
    for (const pattern of patterns) for (const word of pattern.words) this.words.enter(word);
    this.words.freeze();
    this.trie = new TermTrie(patterns, this.words);
    this.longest = patterns.reduce((most, { words }) => Math.max(most, words.length), 1);
  }

  /** Reports the terms in `text` between `from` and `to`, left to right, without overlaps. `onMatch` must not scan with this matcher. */
  scan(text: string, from: number, to: number, onMatch: OnMatch): void {
    if (this.patterns.length === 0) return;
    invariant(!this.scanning, 'a matcher scans one text at a time');
    this.scanning = true;
    try {
      this.run(text, from, Math.min(to, text.length), onMatch);
    } finally {
      this.scanning = false;
    }
  }

  private run(text: string, from: number, end: number, onMatch: OnMatch): void {
    const { reader } = this;
    const { roots, separatorCount } = this.trie;
    let at = from;
    let free = from;
    reader.count = 0;
    do {
      at = reader.read(text, at, end);
      // Words that a term could run beyond the chunk from wait for the next one.
      const stop = at >= end ? reader.count : reader.count - this.longest;
      const { ids, starts, gaps, count } = reader;
      let k = 0;
      while (k < stop) {
        const id = ids[k]!;
        const root = id < 0 ? 0 : roots[id * 2]!;
        // Most first words lead nowhere: no term ends with them, and the next word's bit is clear.
        const matched =
          root < 0 || (root > 0 && this.mayGoOn(roots[id * 2 + 1]!, gaps[k + 1]!, ids[k + 1]!, separatorCount))
            ? this.matchFrom(text, k, Math.abs(root), root < 0, from, free, end, onMatch)
            : -1;
        if (matched < 0) k++;
        else {
          free = matched;
          while (k < count && starts[k]! < matched) k++;
        }
      }
      reader.drop(k);
    } while (at < end);
  }

  private mayGoOn(ways: number, gap: number, id: number, separatorCount: number): boolean {
    if (ways === 0 || id < 0) return false;
    return gap === Gap.other || (ways & bitOf(id * separatorCount + gap)) !== 0;
  }

  /** Tries the terms that begin with word `k`; reports the longest and returns its end, or −1. */
  private matchFrom(
    text: string,
    k: number,
    first: number,
    accepts: boolean,
    from: number,
    free: number,
    end: number,
    onMatch: OnMatch,
  ): number {
    const { reader, trie } = this;
    let node = first;
    let last = k;
    let best = accepts ? this.reach(text, node, k, last, from, free, end) : -1;
    let bestNode = node;
    let bestLast = last;
    while (trie.ways[node] !== 0 && last + 1 < reader.count) {
      const id = reader.ids[last + 1]!;
      if (id < 0) break;
      const separator = this.separatorBefore(text, last + 1);
      if (separator < 0) break;
      const symbol = id * trie.separatorCount + separator;
      if ((trie.ways[node]! & bitOf(symbol)) === 0) break;
      const target = trie.step(node, symbol);
      if (target === 0) break;
      last++;
      node = Math.abs(target);
      if (target > 0) continue;
      const reached = this.reach(text, node, k, last, from, free, end);
      if (reached > best) {
        best = reached;
        bestNode = node;
        bestLast = last;
      }
    }
    if (best < 0) return -1;
    const particular = trie.particular[bestNode] === 1;
    for (let index = trie.accept[bestNode]!; index !== 0; index = trie.next[index - 1]!) {
      if (particular && this.particularEnd(text, this.patterns[index - 1]!, k, bestLast, from, free, end) !== best)
        continue;
      const start = reader.starts[k]! - (particular ? this.patterns[index - 1]!.lead.length : 0);
      onMatch(this.termOf[index - 1]!, start, best, this.formOf[index - 1]!);
    }
    return best;
  }

  /** The furthest end of a pattern at the node that fits the words `k` to `last`, or −1. */
  private reach(text: string, node: number, k: number, last: number, from: number, free: number, end: number): number {
    const { trie } = this;
    if (!this.isSpelled(text, node, k, last)) return -1;
    if (trie.particular[node] === 0) return this.reader.ends[last]!;
    let furthest = -1;
    for (let index = trie.accept[node]!; index !== 0; index = trie.next[index - 1]!) {
      furthest = Math.max(furthest, this.particularEnd(text, this.patterns[index - 1]!, k, last, from, free, end));
    }
    return furthest;
  }

  private particularEnd(
    text: string,
    pattern: Pattern,
    k: number,
    last: number,
    from: number,
    free: number,
    end: number,
  ): number {
    const { lead, tail, exact } = pattern;
    const start = this.reader.starts[k]! - lead.length;
    const stop = this.reader.ends[last]! + tail.length;
    if (lead !== '' && (start < from || start < free || !text.startsWith(lead, start))) return -1;
    if (tail !== '' && (stop > end || !text.startsWith(tail, this.reader.ends[last]))) return -1;
    if (exact !== undefined && text.slice(start, stop).replace(/\s+/g, ' ') !== exact) return -1;
    return stop;
  }

  /** The number of the separator before a word, or −1 where no term has it. */
  private separatorBefore(text: string, word: number): number {
    const gap = this.reader.gaps[word]!;
    if (gap !== Gap.other) return gap;
    const start = this.reader.ends[word - 1]!;
    const end = this.reader.starts[word]!;
    if (isSpaceRun(text, start, end)) return Gap.space;
    if (end - start === 1 && isHyphen(text.charCodeAt(start))) return Gap.hyphen;
    if (this.trie.separatorCount === 2 || end - start > 64) return -1;
    return this.trie.separator(normalSeparator(text.slice(start, end)));
  }

  /** True where the words `k` to `last` are the node's, unit by unit: their hashes alone could deceive. */
  private isSpelled(text: string, node: number, k: number, last: number): boolean {
    const { spellings, units } = this.trie;
    const start = this.reader.starts[k]!;
    const stop = this.reader.ends[last]!;
    let unitAt = spellings[node * 2]!;
    if (stop - start !== spellings[node * 2 + 1]! - unitAt) return this.isSpelledSlow(text, node, k, last);
    for (let at = start; at < stop; at++, unitAt++) {
      const unit = text.charCodeAt(at);
      const wanted = units[unitAt]!;
      // Separators were compared on the way here.
      if (wanted !== 0 && (unit >= 128 || ASCII_FOLD[unit] !== wanted)) return this.isSpelledSlow(text, node, k, last);
    }
    return true;
  }

  private isSpelledSlow(text: string, node: number, k: number, last: number): boolean {
    const { words } = this.patterns[this.trie.accept[node]! - 1]!;
    const { starts, ends } = this.reader;
    for (let index = k; index <= last; index++) {
      if (foldSlow(text.slice(starts[index], ends[index])) !== words[index - k]) return false;
    }
    return true;
  }
}

function isSpaceRun(text: string, start: number, end: number): boolean {
  for (let at = start; at < end; at++) {
    const unit = text.charCodeAt(at);
    if (unit !== 32 && (unit < 9 || unit > 13) && unit !== 0xa0 && (unit < 0x2000 || !/\s/.test(text.charAt(at))))
      return false;
  }
  return start < end;
}

function isHyphen(unit: number): boolean {
  return unit === 45 || unit === 0x2010 || unit === 0x2011;
}
