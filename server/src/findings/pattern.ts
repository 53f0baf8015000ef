// A term as the matcher stores it: folded words with the separators between them, and what may stand before and after.
import { foldSlow, isWordUnit } from './foldWord.js';

/** One spelling of one term, cut into words. `separators[k]` stands between words k and k + 1. */
export interface Pattern {
  readonly term: number;
  readonly form: number;
  readonly words: readonly string[];
  readonly separators: readonly string[];
  /** Signs before the first word, as in `.NET`, and after the last, as in `C++`; usually empty. */
  readonly lead: string;
  readonly tail: string;
  /** The spelling to be met exactly (white space aside), for case-sensitive terms. */
  readonly exact: string | undefined;
}

/** The ranges of the words of a text, as flat pairs of start and end. */
function wordRanges(text: string): number[] {
  const ranges: number[] = [];
  for (let at = 0; at < text.length;) {
    if (!isWordUnit(text, at)) {
      at++;
      continue;
    }
    const start = at;
    while (at < text.length && isWordUnit(text, at)) at++;
    ranges.push(start, at);
  }
  return ranges;
}

/** A separator's normal form: white space with nothing else is one space; typographic hyphens and apostrophes are plain. */
export function normalSeparator(raw: string): string {
  if (/^\s+$/.test(raw)) return ' ';
  return raw
    .replace(/\u2019/g, "'")
    .replace(/[\u2010\u2011]/g, '-')
    .replace(/\s+/g, ' ');
}

/** Cuts a spelling into a pattern; undefined where it has no word in it. */
export function toPattern(text: string, term: number, form: number, caseSensitive: boolean): Pattern | undefined {
  const trimmed = text.trim();
  const ranges = wordRanges(trimmed);
  if (ranges.length === 0) return undefined;
  const words: string[] = [];
  const separators: string[] = [];
  for (let k = 0; k < ranges.length; k += 2) {
    words.push(foldSlow(trimmed.slice(ranges[k], ranges[k + 1])));
    if (k > 0) separators.push(normalSeparator(trimmed.slice(ranges[k - 1], ranges[k])));
  }
  return {
    term,
    form,
    words,
    separators,
    lead: trimmed.slice(0, ranges[0]),
    tail: trimmed.slice(ranges[ranges.length - 1]),
    exact: caseSensitive ? trimmed.replace(/\s+/g, ' ') : undefined,
  };
}
