// What earlier decisions have in common: spacing, long or short forms, capitals, and words within terms.
import { termKey } from '../termbase/termKey.js';
import type { TermEntry } from '../termbase/termbase.js';
import type { DecidedConcept } from './decisions.js';

/** How a preferred term differs from a rival, such as `open` over `closed` spelling. */
export interface Contrast {
  readonly chosen: Manner;
  readonly rival: Manner;
}

/** One of the ways of writing a term that decisions choose between. */
export type Manner = 'open' | 'hyphenated' | 'closed' | 'full form' | 'abbreviation' | 'lower case' | 'capitals';

/** How often earlier decisions chose a manner over its rival, and the other way round. */
export interface Tally {
  readonly contrast: Contrast;
  readonly chosen: number;
  readonly against: number;
}

/** A word or phrase within terms that an earlier decision replaces by another. */
export interface PartChoice {
  readonly preferred: string;
  readonly deprecated: string;
}

/** What was decided before, as examples for what is still open. It never changes. */
export class Precedents {
  private readonly tallies = new Map<string, number>();
  private readonly parts = new Map<string, Set<string>>();

  constructor(concepts: readonly DecidedConcept[]) {
    for (const { terms } of concepts) {
      for (const { entry, preferred } of terms) {
        if (entry.status !== 'deprecated') continue;
        const contrast = contrastOf(preferred, entry);
        if (contrast !== undefined) this.count(contrast);
        const replacing = this.parts.get(entry.key) ?? new Set();
        this.parts.set(entry.key, replacing.add(preferred.key));
      }
    }
  }

  /** The tally of the difference between two terms, where they differ in one of the known manners. */
  tallyOf(chosen: string, rival: string): Tally | undefined {
    const contrast = contrastOf({ text: chosen }, { text: rival });
    if (contrast === undefined) return undefined;
    const reverse = { chosen: contrast.rival, rival: contrast.chosen };
    return {
      contrast,
      chosen: this.tallies.get(nameOf(contrast)) ?? 0,
      against: this.tallies.get(nameOf(reverse)) ?? 0,
    };
  }

  /**
   * The earlier decision that turns `rival` into `chosen` when its words are replaced within the term:
   * with *sign in* over *log in*, *sign in page* is to *log in page* as the decided terms are to each other.
   */
  partChoice(chosen: string, rival: string): PartChoice | undefined {
    const wanted = termKey(chosen).split(' ');
    const given = termKey(rival).split(' ');
    let start = 0;
    while (start < Math.min(wanted.length, given.length) && wanted[start] === given[start]) start++;
    let end = 0;
    const shared = Math.min(wanted.length, given.length) - start;
    while (end < shared && wanted.at(-1 - end) === given.at(-1 - end)) end++;
    // The differing words alone may be less than the decided terms (sign in, log in), so they are widened step by step.
    for (let before = 0; before <= start; before++) {
      for (let after = 0; after <= end; after++) {
        const preferred = wanted.slice(start - before, wanted.length - end + after).join(' ');
        const deprecated = given.slice(start - before, given.length - end + after).join(' ');
        if (this.parts.get(deprecated)?.has(preferred) === true) return { preferred, deprecated };
      }
    }
    return undefined;
  }

  private count(contrast: Contrast): void {
    const name = nameOf(contrast);
    this.tallies.set(name, (this.tallies.get(name) ?? 0) + 1);
  }
}

function nameOf({ chosen, rival }: Contrast): string {
  return `${chosen} over ${rival}`;
}

type Named = Pick<TermEntry, 'text'> & Partial<Pick<TermEntry, 'termType'>>;

function contrastOf(a: Named, b: Named): Contrast | undefined {
  const spacing = /[\s-]+/gu;
  const keyA = termKey(a.text);
  const keyB = termKey(b.text);
  if (keyA === keyB) return a.text === b.text ? undefined : pair(capitalsOf(a.text), capitalsOf(b.text));
  if (keyA.replace(spacing, '') === keyB.replace(spacing, '')) return pair(spacingOf(keyA), spacingOf(keyB));
  if (isShortFor(b, a)) return { chosen: 'full form', rival: 'abbreviation' };
  return isShortFor(a, b) ? { chosen: 'abbreviation', rival: 'full form' } : undefined;
}

function pair(chosen: Manner, rival: Manner): Contrast | undefined {
  return chosen === rival ? undefined : { chosen, rival };
}

function spacingOf(key: string): Manner {
  if (key.includes('-')) return 'hyphenated';
  return key.includes(' ') ? 'open' : 'closed';
}

function capitalsOf(text: string): Manner {
  return text === text.toLowerCase() ? 'lower case' : 'capitals';
}

/** True where the short one is marked as a short form, or is made of the initials of the long one's words. */
function isShortFor(short: Named, long: Named): boolean {
  const marked = short.termType === 'abbreviation' || short.termType === 'acronym' || short.termType === 'shortForm';
  if (marked && long.termType !== short.termType) return true;
  const words = termKey(long.text).split(/[\s-]+/u);
  const initials = words.map((word) => String.fromCodePoint(word.codePointAt(0) ?? 0x20)).join('');
  return words.length > 1 && initials === termKey(short.text);
}
