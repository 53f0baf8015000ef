// What writers replaced in earlier versions of the documents: one term by another, in an otherwise unchanged sentence.
import { times } from './wording.js';

/** A term that a commit replaced by another one in a document. All words in lower case as written, one space apart. */
export interface Replacement {
  readonly from: string;
  readonly to: string;
  /** Up to two words that stand right before it, the same in both versions; empty at a boundary. */
  readonly before: string;
  /** Up to two words that stand right behind it. */
  readonly after: string;
  /** True where the new term stood in the sentence before, or the old one stands there still: then rather a mistake was mended. */
  readonly mends: boolean;
  /** Which page it was done on: a number that only stands for it. */
  readonly page: number;
  /** The sentences of the page in which it was done: a hash of each as it was before, ascending. */
  readonly sentences: readonly number[];
}

/** The replacements of each commit that made some; the order of commits means nothing. */
export interface PastEdits {
  readonly commits: readonly (readonly Replacement[])[];
}

/**
 * How often one term was replaced by another, and how often in a sentence that held both: "the server answers the server" was a
 * mistake, and whoever mended it took the two for two things. A sentence that several commits
 * changed alike (taken over from one branch to another) counts once.
 */
export interface ReplacementCount {
  readonly commits: number;
  readonly pages: number;
  readonly sentences: number;
  /** Sentences that held both, which count in neither of the others. */
  readonly mended: number;
}

/** A pair of terms, numbered by the caller, with the edits from the one to the other. */
export interface ReplacedPair<T> extends ReplacementCount {
  readonly from: T;
  readonly to: T;
}

const NEVER: ReplacementCount = { commits: 0, pages: 0, sentences: 0, mended: 0 };

/** A count under way. */
class Tally {
  commits = 0;
  mended = 0;
  private last = -1;
  private readonly seen = new Set<number>();
  private readonly onPages = new Set<number>();

  get pages(): number {
    return this.onPages.size;
  }

  get sentences(): number {
    return this.seen.size - this.mended;
  }

  add(commit: number, { page, sentences, mends }: Replacement): void {
    const fresh = sentences.filter((sentence) => !this.seen.has(sentence));
    for (const sentence of fresh) this.seen.add(sentence);
    if (fresh.length === 0) return;
    if (mends) {
      this.mended += fresh.length;
      return;
    }
    this.onPages.add(page);
    if (this.last !== commit) this.commits++;
    this.last = commit;
  }
}

/**
 * Counts replacements of terms by terms. `termOf` says which term some words are, or that they are none; of the replaced
 * words with their surroundings the longest counts that is a term in both versions: of “query parameter”, replaced by “URL
 * parameter”, the two long terms. In order of the commits and their replacements.
 */
export function countReplacements<T>(edits: PastEdits, termOf: (words: string) => T | undefined): ReplacedPair<T>[] {
  const found = new Map<T, Map<T, Tally>>();
  edits.commits.forEach((replacements, commit) => {
    for (const replacement of replacements) {
      const pair = longestTerms(replacement, termOf);
      if (pair === undefined) continue;
      const targets = found.get(pair.from) ?? new Map<T, Tally>();
      const tally = targets.get(pair.to) ?? new Tally();
      found.set(pair.from, targets);
      targets.set(pair.to, tally);
      tally.add(commit, replacement);
    }
  });
  return [...found].flatMap(([from, targets]) =>
    [...targets].map(([to, { commits, pages, sentences, mended }]) => ({
      from,
      to,
      commits,
      pages,
      sentences,
      mended,
    })),
  );
}

/** What edits between two terms come to: one way, and seldom or never against it. */
export interface Direction {
  /** How often it was done independently: by commits, or on pages where one commit went over several. */
  readonly times: number;
  /** True from {@link FEWEST_TIMES} times on: once it may have been anything. */
  readonly isHabit: boolean;
  /** The clause that tells a writer, without the terms: how often one way, and how often the other. */
  readonly text: string;
}

/** From so many times on, replacing is a habit. */
export const FEWEST_TIMES = 2;
/** Of replacements one way, at most this share may stand against them: the other way round, or in sentences that held both. */
const MOST_AGAINST = 1 / 3;

/** Judges replacements one way by those the other way; undefined where they do not clearly go this way. */
export function directionOf(forth: ReplacementCount, back: ReplacementCount = NEVER): Direction | undefined {
  const against = forth.mended + back.sentences + back.mended;
  if (forth.sentences === 0 || against > MOST_AGAINST * forth.sentences) return undefined;
  const number = Math.max(forth.commits, forth.pages);
  const isOnce = forth.sentences === 1 && back.sentences === 0;
  const other = back.sentences === 0 ? 'never' : times(back.sentences);
  return {
    times: number,
    isHabit: number >= FEWEST_TIMES,
    text: isOnce ? times(1) : `${times(forth.sentences)}, ${other} the other way round`,
  };
}

/** How often one of two terms, each given by all its ways of writing, was replaced by the other. */
export function replacedBetween(
  edits: PastEdits,
  a: readonly string[],
  b: readonly string[],
): { readonly aByB: ReplacementCount; readonly bByA: ReplacementCount } {
  const sides = new Map<string, 'a' | 'b'>();
  for (const form of b) sides.set(form.toLowerCase(), 'b');
  for (const form of a) sides.set(form.toLowerCase(), 'a');
  const counts = countReplacements(edits, (words) => sides.get(words));
  return {
    aByB: counts.find(({ from, to }) => from === 'a' && to === 'b') ?? NEVER,
    bByA: counts.find(({ from, to }) => from === 'b' && to === 'a') ?? NEVER,
  };
}

function longestTerms<T>(
  { from, to, before, after }: Replacement,
  termOf: (words: string) => T | undefined,
): { from: T; to: T } | undefined {
  const left = beginnings(before.split(' ').reverse()).map((words) => words.reverse().join(' '));
  const right = beginnings(after.split(' ')).map((words) => words.join(' '));
  const around = left.flatMap((one) => right.map((other) => [one, other] as const));
  const wordsIn = (text: string): number => (text === '' ? 0 : text.split(' ').length);
  around.sort(([a, b], [c, d]) => wordsIn(c) + wordsIn(d) - wordsIn(a) - wordsIn(b));
  for (const [one, other] of around) {
    const whole = (words: string): string => [one, words, other].filter((part) => part !== '').join(' ');
    const source = termOf(whole(from));
    const target = source === undefined ? undefined : termOf(whole(to));
    if (source !== undefined && target !== undefined)
      return source === target ? undefined : { from: source, to: target };
  }
  return undefined;
}

/** The empty beginning of some words, that of one word, and so on. */
function beginnings(words: readonly string[]): string[][] {
  const some = words.filter((word) => word !== '');
  return [...Array(some.length + 1).keys()].map((length) => some.slice(0, length));
}
