// Parallel places: stretches of the documents that say one thing twice, and how each of them reads as terms and words.
import type { Corpus } from '../../../corpus/corpus.js';
import { FactFlag } from '../../../facts/flags.js';
import { TAG, TokenFlag } from '../../../tokens/tokens.js';
import type { Segments } from '../segment.js';

/** Where two passages come from that say one thing. */
export type ParallelSource = 'link-heading' | 'same-target' | 'title' | 'caption' | 'sentence';

/** Rows `[first, end)` of the token stream. */
export interface Passage {
  readonly first: number;
  readonly end: number;
}

/** Two passages that say one thing. */
export interface Parallel {
  readonly source: ParallelSource;
  readonly one: Passage;
  readonly other: Passage;
}

/** One place at which one unit of a {@link Reading} stands for another. */
export interface Substitution {
  readonly source: ParallelSource;
  readonly one: number;
  readonly other: number;
  /** The rows at which each stands. */
  readonly rowOfOne: number;
  readonly rowOfOther: number;
}

/** A passage as it is compared: its terms and other content words; words of grammar and signs are left out. */
export interface Reading {
  /** A term is its index; any other word is {@link wordUnit} of its dictionary form. */
  readonly units: readonly number[];
  /** The first row of each unit. */
  readonly rows: readonly number[];
}

/** The unit of a word that is no term: below zero. */
export function wordUnit(lemma: number): number {
  return -lemma - 1;
}

/** The dictionary form of a unit below zero. */
export function lemmaOfUnit(unit: number): number {
  return -unit - 1;
}

/** Both terms, or both other words: only these stand for one another. */
export function areOfOneKind(one: number, other: number): boolean {
  return one >= 0 === other >= 0;
}

/** Reads passages of one corpus. */
export class PassageReader {
  constructor(
    readonly corpus: Corpus,
    private readonly segments: Segments,
  ) {}

  /** Where the last passage ended among the occurrences of terms: passages mostly follow one another. */
  private next = 0;

  /** The units of a passage; a term counts where it lies wholly inside. */
  read({ first, end }: Passage): Reading {
    const { stream } = this.corpus;
    const { segments } = this;
    const units: number[] = [];
    const rows: number[] = [];
    let at = this.next;
    const isBehind = at === 0 || segments.first[at - 1]! < first;
    if (!isBehind || (at < segments.count && first - segments.first[at]! > NEARBY))
      at = firstAtOrAfter(segments.first, first);
    for (let row = first; row < end;) {
      while (at < segments.count && segments.first[at]! < row) at++;
      const isTerm = at < segments.count && segments.first[at] === row && row + segments.length[at]! <= end;
      if (isTerm || tellsApart(stream.flags[row]!, stream.tag[row]!)) {
        units.push(isTerm ? segments.term[at]! : wordUnit(stream.lemma[row]!));
        rows.push(row);
      }
      row += isTerm ? segments.length[at]! : 1;
    }
    this.next = at;
    return { units, rows };
  }
}

/** Fewer rows than this are walked, not searched. */
const NEARBY = 200;

/** Content words; numbers and stand-ins for code tell passages apart as words do. */
function tellsApart(flags: number, tag: number): boolean {
  const isContent = (flags & (TokenFlag.word | FactFlag.functionWord)) === TokenFlag.word;
  return isContent || tag === TAG.NUM || tag === TAG.OPAQUE;
}

function firstAtOrAfter(firsts: Uint32Array, row: number): number {
  let low = 0;
  let high = firsts.length;
  while (low < high) {
    const middle = (low + high) >>> 1;
    if (firsts[middle]! < row) low = middle + 1;
    else high = middle;
  }
  return low;
}
